import type { PupilGrid } from './grids.ts';
import { aimRays, mapRays, type PupilMap, pupilMapOf } from './pupilMap.ts';
import { CODE, lostOf, MISSED, PATH, STRIDE, X, Y } from './rayBuffer.ts';
import { traceThrough } from './through.ts';
import type { ExactSetup, Lost } from './types.ts';

/** Which rays of every field and line are traced. Made once, by `sampleOf`. */
export interface Sample {
  /** Rays of a whole fan at equal steps of the stop's diameter; odd, or 0. */
  readonly fanRays: number;
  readonly grid: PupilGrid | null;
  /** Whether rims end rays. */
  readonly clip: boolean;
  /** Whether every ray is aimed, or placed between aimed ones. */
  readonly fine: boolean;
  /** x and y in the stop in turn: the chief ray, the fan in the meridian from −1 to 1, the half fan across it from 0 to 1, the traced points of the grid. */
  readonly points: Float64Array;
  readonly count: number;
}

/** Places of the rays of a bundle, counted in rays. */
export const CHIEF = 0;
export const TANGENTIAL = 1;
export const sagittalFrom = ({ fanRays }: Sample): number => TANGENTIAL + fanRays;
export const gridFrom = ({ fanRays }: Sample): number =>
  TANGENTIAL + fanRays + (fanRays === 0 ? 0 : (fanRays + 1) / 2);

/** The sample with a fan of at least `fanRays` rays each way (0: none) and the points of `grid`. */
export function sampleOf(
  fanRays: number,
  grid: PupilGrid | null,
  { clip = true, fine = false }: { readonly clip?: boolean; readonly fine?: boolean } = {},
): Sample {
  const odd = fanRays === 0 ? 0 : 2 * Math.max(1, Math.ceil((fanRays - 1) / 2)) + 1;
  const half = (odd - 1) / 2;
  const points = [0, 0];
  for (let i = 0; i < odd; i++) points.push(0, (i - half) / half);
  for (let i = 0; i <= half; i++) points.push(i / half, 0);
  for (let i = 0; grid && i < grid.traced; i++) points.push(grid.x[i]!, grid.y[i]!);
  return { fanRays: odd, grid, clip, fine, points: Float64Array.from(points), count: points.length / 2 };
}

/** The rays of one field in one line, behind the last surface. */
export interface Bundle {
  /** Why the chief ray does not get through; then `rays` mean nothing unless it is lost behind the stop. */
  readonly lost: Lost | null;
  /** `sample.count` rays as in rayBuffer.ts. The paths of a bundle may be compared. */
  readonly rays: Float64Array;
  /** Index of image space, positive. */
  readonly index: number;
}

/** One field in all lines. */
export interface FieldRays {
  readonly setup: ExactSetup;
  readonly sample: Sample;
  /** Share of the field. */
  readonly fraction: number;
  /** One for each line of the setup. */
  readonly bundles: readonly Bundle[];
}

/** Numbers that `traceFields` needs for so many fields. */
export const bufferSize = ({ lines }: ExactSetup, fields: number, { count }: Sample): number =>
  fields * lines.length * count * STRIDE;

/**
 * Traces the sample for all fields and lines, one batch for each. All analyses read from these rays. They lie in `buffer` (of `bufferSize`) when it is
 * given, and stay true until it is used again. The chief ray is never clipped: it is what the others are measured against.
 */
export function traceFields(
  setup: ExactSetup,
  fractions: readonly number[],
  sample: Sample,
  buffer = new Float64Array(bufferSize(setup, fractions.length, sample)),
): readonly FieldRays[] {
  const size = sample.count * STRIDE;
  let at = 0;
  return fractions.map((fraction) => ({
    setup,
    sample,
    fraction,
    bundles: setup.lines.map((_, line) => {
      const rays = buffer.subarray(at, at + size);
      at += size;
      return traceBundle(pupilMapOf(setup, line, fraction), sample, rays);
    }),
  }));
}

/** Traces the sample of one field and line into `rays`. */
function traceBundle(map: PupilMap, sample: Sample, rays: Float64Array): Bundle {
  const { setup, line, fraction } = map;
  const { train } = setup.lines[line] ?? setup.lines[0];
  const index = Math.abs(train.index[train.count]!);
  if (map.lost) {
    for (let i = 0; i < sample.count; i++) rays[i * STRIDE + CODE] = MISSED;
    return { lost: map.lost, rays, index };
  }
  if (sample.fine) aimRays(map, sample.points, sample.count, rays);
  else mapRays(map, sample.points, sample.count, rays);
  if (setup.object.kind === 'finite') {
    const { heightMm, zMm } = setup.object;
    countPathsFromChief(rays, sample.count, fraction * heightMm, zMm, Math.abs(train.index[0]!));
  }
  traceThrough(train, rays, 1, false);
  traceThrough(train, rays.subarray(STRIDE), sample.count - 1, sample.clip);
  return { lost: lostOf(rays[CODE]!), rays, index };
}

/**
 * Paths to the first vertex plane less that of the chief ray, |P − O| − |P₀ − O| in the form (P − P₀)·(P + P₀ − 2O)/(|P − O| + |P₀ − O|): the paths from
 * an object a kilometre away hold no millionth of a wave.
 */
function countPathsFromChief(
  rays: Float64Array,
  count: number,
  heightMm: number,
  zMm: number,
  index: number,
): void {
  const [x0, y0] = [rays[X]!, rays[Y]!];
  const length0 = Math.hypot(x0, y0 - heightMm, zMm);
  for (let at = 0; at < count * STRIDE; at += STRIDE) {
    const [x, y] = [rays[at + X]!, rays[at + Y]!];
    const length = Math.hypot(x, y - heightMm, zMm);
    const product = (x - x0) * (x + x0) + (y - y0) * (y + y0 - 2 * heightMm);
    rays[at + PATH] = (index * product) / (length + length0);
  }
}
