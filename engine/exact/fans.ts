import { none, type Outcome, some } from '../outcome.ts';
import type { Absence } from '../paraxial/absence.ts';
import { CHIEF, type FieldRays, sagittalFrom, TANGENTIAL } from './bundles.ts';
import { type Curve, curveOf } from './curve.ts';
import { xOn, yOn } from './imagePlane.ts';
import { CODE, M, STRIDE } from './rayBuffer.ts';
import {
  beyondFoot,
  exitPupil,
  pathsFromErrors,
  pathToSphere,
  type ReferenceSphere,
  referenceSphere,
} from './wavefront.ts';

/** Curves over the stop's diameter in the meridian (y) and across it (x), one for each line whose chief ray gets through. */
export interface Fans {
  readonly tangential: readonly Curve[];
  readonly sagittal: readonly Curve[];
}

/**
 * Transverse errors in mm on the image plane against the exact chief ray of the main line: heights (y) of the fan in the meridian, x of the
 * fan across it. 'image at infinity'; 'ray lost' when the main line has no chief ray.
 */
export function rayFans(field: FieldRays): Outcome<Fans, Absence> {
  const { setup, bundles } = field;
  if (!setup.imagePlaneMm.ok) return setup.imagePlaneMm;
  const plane = setup.imagePlaneMm.value;
  const main = bundles[0];
  if (!main || main.lost) return none('ray lost');
  const chief = yOn(main.rays, CHIEF * STRIDE, plane);
  return some({
    tangential: curves(field, (rays, at) => yOn(rays, at, plane) - chief, 'whole'),
    sagittal: curves(field, (rays, at) => xOn(rays, at, plane), 'odd'),
  });
}

/** Wavefront errors in waves of each line, and the sphere that they are measured against. */
export interface WavefrontFans {
  readonly sphere: ReferenceSphere;
  readonly tangential: readonly Curve[];
  /** Thin parts have no path of their own, so across the meridian there is none behind them. */
  readonly sagittal: Outcome<readonly Curve[], Absence>;
}

/**
 * Path of the chief ray less path of the ray, each up to the reference sphere about the main line's image point, in waves of its line:
 * undercorrected spherical aberration is positive. The image point is where the chief ray meets the plane `defocusMm` behind the image plane. In a train
 * with thin parts the fan in the meridian comes from the transverse errors. 'image at infinity', 'ray lost', 'pupil at the image'.
 */
export function wavefrontFans(field: FieldRays, defocusMm = 0): Outcome<WavefrontFans, Absence> {
  const { setup, bundles } = field;
  if (!setup.imagePlaneMm.ok) return setup.imagePlaneMm;
  const main = bundles[0];
  if (!main || main.lost) return none('ray lost');
  const { train } = setup.lines[0];
  const plane = setup.imagePlaneMm.value + defocusMm;
  const found = referenceSphere(main.rays, CHIEF, plane, exitPupil(train, setup.stopSurface));
  if (!found.ok) return found;
  const sphere = found.value;
  if (train.thinPower.some((power) => power !== 0)) {
    return some({ sphere, tangential: fromErrors(field, sphere), sagittal: none('thin parts') });
  }
  const waves = (rays: Float64Array, at: number, line: number): number => {
    const { index } = bundles[line] ?? main;
    const path = pathToSphere(rays, CHIEF * STRIDE, index, sphere) - pathToSphere(rays, at, index, sphere);
    return path / waveMm(field, line);
  };
  return some({
    sphere,
    tangential: curves(field, waves, 'whole'),
    sagittal: some(curves(field, waves, 'even')),
  });
}

const waveMm = ({ setup }: FieldRays, line: number): number =>
  (setup.lines[line] ?? setup.lines[0]).wavelengthNm * 1e-6;

type Read = (rays: Float64Array, at: number, line: number) => number;

/** The curves of all lines: of the fan in the meridian ('whole'), or of the half fan across it, whose other half is `odd` or `even`. */
function curves(field: FieldRays, read: Read, kind: 'whole' | 'odd' | 'even'): Curve[] {
  const { sample, bundles } = field;
  const half = (sample.fanRays - 1) / 2;
  const found: Curve[] = [];
  for (const [line, { lost, rays }] of bundles.entries()) {
    if (lost || sample.fanRays === 0) continue;
    const all = new Float64Array(sample.fanRays);
    for (let i = 0; i < sample.fanRays; i++) {
      const ray = kind === 'whole' ? TANGENTIAL + i : sagittalFrom(sample) + Math.abs(i - half);
      const at = ray * STRIDE;
      const sign = kind === 'odd' && i < half ? -1 : 1;
      all[i] = rays[at + CODE] === 0 ? sign * read(rays, at, line) : Number.NaN;
    }
    found.push(curveOf(line, pupilOf(sample.fanRays), all));
  }
  return found;
}

/** The wavefront of the fan in the meridian from its transverse errors. */
function fromErrors(field: FieldRays, sphere: ReferenceSphere): Curve[] {
  const { sample, bundles } = field;
  const { fanRays } = sample;
  const centre = (fanRays - 1) / 2;
  const found: Curve[] = [];
  for (const [line, { lost, rays, index }] of bundles.entries()) {
    if (lost || fanRays === 0) continue;
    const [height, cosine, paths] = [0, 1, 2].map(() => new Float64Array(fanRays)) as [
      Float64Array,
      Float64Array,
      Float64Array,
    ];
    // The chief ray itself is never clipped, so the fan can be followed from it.
    const placeOf = (i: number) => (i === centre ? CHIEF : TANGENTIAL + i) * STRIDE;
    for (let i = 0; i < fanRays; i++) {
      const at = placeOf(i);
      height[i] = yOn(rays, at, sphere.zMm) - sphere.yMm;
      cosine[i] = rays[at + M]!;
    }
    pathsFromErrors(height, cosine, index, centre, paths);
    const chief = index * beyondFoot(rays, CHIEF * STRIDE, sphere);
    for (let i = 0; i < fanRays; i++) {
      const clipped = rays[(TANGENTIAL + i) * STRIDE + CODE] !== 0;
      const path = paths[i]! + index * beyondFoot(rays, placeOf(i), sphere);
      paths[i] = clipped ? Number.NaN : (chief - path) / waveMm(field, line);
    }
    found.push(curveOf(line, pupilOf(fanRays), paths));
  }
  return found;
}

/** Shares of the stop's radius at which the rays of a fan stand. */
const pupilOf = (count: number): Float64Array =>
  Float64Array.from({ length: count }, (_, i) => (2 * i) / (count - 1) - 1);
