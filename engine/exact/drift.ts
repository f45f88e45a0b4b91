import { type ParaxialRay, paraxialRay } from '../paraxial/trace.ts';
import type { Train } from '../train/types.ts';
import { traceBatch } from './kernel.ts';
import { aimRays, mapRays, type PupilMap } from './pupilMap.ts';
import { CODE, lostOf, M, N, STRIDE, Y, Z } from './rayBuffer.ts';
import type { Lost } from './types.ts';

/** One ray as it is drawn, exact and paraxial. Polylines are z (from the first vertex) and y in turn, mm. */
export interface DrawnRay {
  /** Place in the stop, in shares of its radius. */
  readonly pupil: readonly [x: number, y: number];
  /** From the object (or where the drawing begins) over the points on the real surfaces to the end of the drawing, or to where the ray is lost. */
  readonly exact: Float64Array;
  readonly lost: Lost | null;
  /** The paraxial ray to the same point of the stop from the same object point, at the vertex planes. */
  readonly paraxial: Float64Array;
  /** Exact height where the ray meets the surface minus paraxial height in its vertex plane, for each surface that the ray meets, mm. */
  readonly heightDriftMm: Float64Array;
  /** Exact dy/dz minus paraxial slope behind each surface that the ray passes. */
  readonly slopeDrift: Float64Array;
  /** The same in the image plane in use; null when there is none, the ray is lost or runs back. */
  readonly imageDriftMm: number | null;
}

/** Where the drift of a bundle is largest. */
export interface LargestDrift {
  /** Place in the list of rays. */
  readonly ray: number;
  /** The surface, or the train's count for the image plane. */
  readonly surface: number;
  readonly driftMm: number;
}

export interface DrawnField {
  readonly rays: readonly DrawnRay[];
  /** Null when no ray meets a surface. */
  readonly largest: LargestDrift | null;
}

/** How a bundle is drawn. z from the first vertex, mm. */
export interface Drawn {
  /** Where light from infinity, or towards a virtual object, begins to be drawn. */
  readonly fromMm: number;
  /** Where it ends. */
  readonly toMm: number;
  /** Whether rims cut rays. */
  readonly clip: boolean;
  /** Whether every ray is aimed at its point of the stop, or placed by the map. */
  readonly aimed: boolean;
}

/**
 * All that a drawing shows of one field point: the exact and the paraxial rays to the same points of the stop (`pupil` has x and y in
 * turn), where and why rays are lost, and the drift between both, exact minus paraxial, positive up.
 */
export function drawnField(map: PupilMap, pupil: ArrayLike<number>, drawn: Drawn): DrawnField {
  const count = pupil.length / 2;
  const { train } = map.sight;
  const rays = new Float64Array(count * STRIDE);
  const start = drawn.aimed ? aimRays : mapRays;
  start(map, pupil, count, rays);
  const traces = Array.from({ length: count }, (_, i) => traceOf(map, pupil, i, rays, drawn));
  for (let k = 0; k < train.count; k++) {
    traceBatch(train, rays, count, drawn.clip, k, k + 1);
    for (const [i, trace] of traces.entries()) follow(trace, train, k, rays, i * STRIDE);
  }
  const list = traces.map((trace, i) => finish(trace, map, rays, i * STRIDE, drawn));
  return { rays: list, largest: largestOf(list, train.count) };
}

/** A ray on its way through the train. */
interface Trace {
  readonly pupil: readonly [number, number];
  readonly exact: number[];
  readonly paraxial: ParaxialRay;
  readonly heights: number[];
  readonly slopes: number[];
  /** Set from the start when no ray gets to the point; the one that was tried last is drawn as far as it goes. */
  readonly unaimed: Lost | null;
  lost: Lost | null;
}

function traceOf(
  map: PupilMap,
  pupil: ArrayLike<number>,
  i: number,
  rays: Float64Array,
  drawn: Drawn,
): Trace {
  const at = i * STRIDE;
  const unaimed = lostOf(rays[at + CODE]!);
  rays[at + CODE] = 0;
  const { source } = map.bundle;
  const fromObject = source.kind === 'finite' && source.zMm < 0;
  const z = fromObject ? source.zMm : drawn.fromMm;
  const ahead = z - rays[at + Z]!;
  return {
    pupil: [pupil[2 * i]!, pupil[2 * i + 1]!],
    exact: [z, rays[at + Y]! + (ahead === 0 ? 0 : (ahead * rays[at + M]!) / rays[at + N]!)],
    paraxial: paraxialOf(map, pupil[2 * i + 1]!),
    heights: [],
    slopes: [],
    unaimed,
    lost: null,
  };
}

/** In the line of the map, with the start of the main line's paraxial ray to that height in the stop. */
function paraxialOf({ setup, line, fraction, sight }: PupilMap, py: number): ParaxialRay {
  const { chief, marginal, stopSurface, lines } = setup;
  const up = Math.sign(marginal.y[stopSurface]!) * py;
  const nu = fraction * chief.nu[0]! + up * marginal.nu[0]!;
  const index = line === 0 ? 1 : sight.train.index[0]! / lines[0].train.index[0]!;
  return paraxialRay(sight.train, fraction * chief.y[0]! + up * marginal.y[0]!, nu * index);
}

/** Takes in what surface `k` did with the ray. */
function follow(trace: Trace, train: Train, k: number, rays: Float64Array, at: number): void {
  if (trace.lost) return;
  const vertex = train.z[k]!;
  const [y, slope] = [rays[at + Y]!, rays[at + M]! / rays[at + N]!];
  trace.lost = lostOf(rays[at + CODE]!);
  if (trace.lost?.why === 'missed') {
    // As far as the vertex plane of what it misses, unless it never gets there.
    const ahead = (k === 0 ? 0 : train.gap[k - 1]!) - rays[at + Z]!;
    const end = y + ahead * slope;
    if (ahead * rays[at + N]! > 0 && Number.isFinite(end)) trace.exact.push(vertex, end);
    return;
  }
  trace.exact.push(vertex + rays[at + Z]!, y);
  trace.heights.push(y - trace.paraxial.y[k]!);
  if (trace.lost) return;
  trace.slopes.push(slope - trace.paraxial.nu[k + 1]! / train.index[k + 1]!);
  if (trace.unaimed?.surface === k) {
    trace.lost = trace.unaimed;
    rays[at + CODE] = 1;
  }
}

function finish(trace: Trace, map: PupilMap, rays: Float64Array, at: number, drawn: Drawn): DrawnRay {
  const { train } = map.sight;
  const { exact, lost, heights, slopes, pupil, paraxial } = trace;
  const last = train.count - 1;
  const slope = rays[at + M]! / rays[at + N]!;
  const heightAt = (fromLastMm: number): number => rays[at + Y]! + (fromLastMm - rays[at + Z]!) * slope;
  const paraxialAt = (fromLastMm: number): number =>
    paraxial.y[last]! + (fromLastMm * paraxial.nu[train.count]!) / train.index[train.count]!;
  const end = drawn.toMm - train.z[last]!;
  const forward = rays[at + N]! * train.index[train.count]! > 0;
  if (!lost && forward) exact.push(drawn.toMm, heightAt(end));
  const { imagePlaneMm } = map.setup;
  const straight = [exact[0]!, paraxial.y[0]! + (exact[0]! * paraxial.nu[0]!) / train.index[0]!];
  for (let k = 0; k < train.count; k++) straight.push(train.z[k]!, paraxial.y[k]!);
  straight.push(drawn.toMm, paraxialAt(end));
  return {
    pupil,
    exact: Float64Array.from(exact),
    lost,
    paraxial: Float64Array.from(straight),
    heightDriftMm: Float64Array.from(heights),
    slopeDrift: Float64Array.from(slopes),
    imageDriftMm:
      lost || !forward || !imagePlaneMm.ok
        ? null
        : heightAt(imagePlaneMm.value) - paraxialAt(imagePlaneMm.value),
  };
}

/** The largest drift of all surfaces and the image. */
function largestOf(rays: readonly DrawnRay[], imagePlace: number): LargestDrift | null {
  let largest: LargestDrift | null = null;
  const take = (ray: number, surface: number, driftMm: number): void => {
    if (largest === null || Math.abs(driftMm) > Math.abs(largest.driftMm))
      largest = { ray, surface, driftMm };
  };
  for (const [i, { heightDriftMm, imageDriftMm }] of rays.entries()) {
    for (const [k, driftMm] of heightDriftMm.entries()) take(i, k, driftMm);
    if (imageDriftMm !== null) take(i, imagePlace, imageDriftMm);
  }
  return largest;
}
