import type { Train } from '../../engine/train/types.ts';

/** What the bare arithmetic reads and writes: flat arrays, one run of `surfaces` numbers for each position or ray. */
export interface BareRays {
  readonly trains: number;
  readonly surfaces: number;
  readonly raysPerTrain: number;
  readonly power: Float64Array;
  /** Gap over index, to the next surface. */
  readonly reducedGap: Float64Array;
  /** Height and index times slope in front of the first surface, for each ray of each train. */
  readonly start: Float64Array;
  readonly heights: Float64Array;
  readonly slopes: Float64Array;
}

/** The arrays for `raysPerTrain` rays through each of `trains`, all of the same number of surfaces. */
export function bareRays(trains: readonly Train[], raysPerTrain: number): BareRays {
  const surfaces = trains[0]?.count ?? 0;
  const power = new Float64Array(trains.length * surfaces);
  const reducedGap = new Float64Array(trains.length * surfaces);
  for (const [t, train] of trains.entries()) {
    for (let k = 0; k < surfaces; k++) {
      power[t * surfaces + k] = train.thinPower[k]!;
      reducedGap[t * surfaces + k] = train.gap[k]! / train.index[k + 1]!;
    }
  }
  const rays = trains.length * raysPerTrain;
  const start = new Float64Array(2 * rays);
  for (let ray = 0; ray < rays; ray++) {
    start[2 * ray] = 1 + (ray % raysPerTrain) / raysPerTrain;
    start[2 * ray + 1] = 0.01 * (ray % raysPerTrain);
  }
  return {
    trains: trains.length,
    surfaces,
    raysPerTrain,
    power,
    reducedGap,
    start,
    heights: new Float64Array(rays * surfaces),
    slopes: new Float64Array(rays * surfaces),
  };
}

/** Traces every ray, keeping its height at and its index times slope behind every surface; returns a number that depends on all. */
export function traceBareRays(bare: BareRays): number {
  const { trains, surfaces, raysPerTrain, power, reducedGap, start, heights, slopes } = bare;
  let sum = 0;
  for (let train = 0; train < trains; train++) {
    const from = train * surfaces;
    for (let ray = train * raysPerTrain; ray < (train + 1) * raysPerTrain; ray++) {
      const into = ray * surfaces;
      let y = start[2 * ray]!;
      let nu = start[2 * ray + 1]!;
      for (let k = 0; k < surfaces; k++) {
        nu -= power[from + k]! * y;
        heights[into + k] = y;
        slopes[into + k] = nu;
        y += reducedGap[from + k]! * nu;
      }
      sum += y + nu;
    }
  }
  return sum;
}
