import { mapOutcome, type Outcome } from '../outcome.ts';
import type { Absence } from '../paraxial/absence.ts';
import { type Bundle, type FieldRays, gridFrom, type Sample } from './bundles.ts';
import { CODE, L, M, N, STRIDE, X, Y, Z } from './rayBuffer.ts';

/**
 * Rays of one field in one line where they meet the image plane: places in mm, slopes dx/dz and dy/dz there, and the share of the pupil
 * that each stands for. Lost rays are left out and counted; `count` are through, and what lies behind them in the arrays means nothing.
 */
export interface Landing {
  readonly x: Float64Array;
  readonly y: Float64Array;
  readonly slopeX: Float64Array;
  readonly slopeY: Float64Array;
  readonly weight: Float64Array;
  count: number;
  lost: number;
}

/** A landing with room for `size` rays, its lists in one block. */
export function emptyLanding(size: number): Landing {
  const block = new Float64Array(5 * size);
  const list = (place: number) => block.subarray(place * size, (place + 1) * size);
  return { x: list(0), y: list(1), slopeX: list(2), slopeY: list(3), weight: list(4), count: 0, lost: 0 };
}

/** A landing and how much its line counts. */
export interface Weighted {
  readonly landing: Landing;
  readonly weight: number;
}

/** The landing by itself. */
export const alone = (landing: Landing): readonly Weighted[] => [{ landing, weight: 1 }];

/** Where the grid's rays of one field land, one landing for each line of the setup with that line's weight; 'image at infinity'. */
export const landingsOf = ({ setup, sample, bundles }: FieldRays): Outcome<readonly Weighted[], Absence> =>
  mapOutcome(setup.imagePlaneMm, (plane) =>
    bundles.map((bundle, line) => ({
      landing: land(bundle, sample, plane),
      weight: (setup.lines[line] ?? setup.lines[0]).weight,
    })),
  );

/** Where the rays of the sample's grid meet the plane `planeMm` behind the last vertex, those included that mirror traced ones. */
function land({ rays }: Bundle, sample: Sample, planeMm: number): Landing {
  const { grid } = sample;
  if (!grid) return emptyLanding(0);
  const landing = emptyLanding(grid.count);
  const { x, y, slopeX, slopeY, weight } = landing;
  const first = gridFrom(sample);
  let count = 0;
  for (let i = 0; i < grid.traced; i++) {
    const at = (first + i) * STRIDE;
    if (rays[at + CODE] !== 0) continue;
    const n = rays[at + N]!;
    const reach = planeMm - rays[at + Z]!;
    const [sx, sy] = [rays[at + L]! / n, rays[at + M]! / n];
    const [px, py, w] = [rays[at + X]! + reach * sx, rays[at + Y]! + reach * sy, grid.weight[i]!];
    for (let side = 1; side >= (grid.x[i] === 0 ? 1 : -1); side -= 2) {
      x[count] = side * px;
      y[count] = py;
      slopeX[count] = side * sx;
      slopeY[count] = sy;
      weight[count] = w;
      count++;
    }
  }
  landing.count = count;
  landing.lost = grid.count - count;
  return landing;
}
