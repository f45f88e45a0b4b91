import { none } from '../outcome.ts';
import { isNegligible } from '../paraxial/scale.ts';
import { type Solved, solvedIf } from './absence.ts';

/** Focal lengths of two thin parts in air, 1/power, mm. */
export interface TwoElements {
  readonly firstFocalLengthMm: number;
  readonly secondFocalLengthMm: number;
}

/**
 * Two thin parts of a given focal length together, gap and back focus, for an object at infinity: f1 = d f/(f − B), f2 = −d B/(f − B − d)
 * (Smith, Modern Optical Engineering, on two-component systems). A back focus of f wants no first part, one of f − d no second.
 */
export function twoForBackFocus(wanted: {
  readonly focalLengthMm: number;
  readonly backFocusMm: number;
  readonly gapMm: number;
}): Solved<TwoElements> {
  const { focalLengthMm: f, backFocusMm: B, gapMm: d } = wanted;
  if (d === 0) return none('no gap');
  if (f === 0 || B === 0) return none('no such layout');
  return both([d * f, f - B, Math.abs(f)], [-d * B, f - B - d, Math.abs(f) + Math.abs(d)]);
}

/**
 * Two thin parts between an object and its image of magnification m, `objectDistanceMm` in front of the first and `objectToImageMm` apart:
 * with unit slope at the object y1 = s, y2 = −s′/m and v = (y2 − y1)/d, f1 = y1/(1 − v), f2 = y2/(v − 1/m); source as above.
 */
export function twoForRelay(wanted: {
  /** In front of the first part, positive. */
  readonly objectDistanceMm: number;
  readonly objectToImageMm: number;
  readonly magnification: number;
  readonly gapMm: number;
}): Solved<TwoElements> {
  const { objectDistanceMm: s, objectToImageMm, magnification: m, gapMm: d } = wanted;
  if (d === 0) return none('no gap');
  const imageDistance = objectToImageMm - s - d;
  const [y1, y2] = [s, -imageDistance / m];
  const slope = (y2 - y1) / d;
  if (m === 0 || y1 === 0 || y2 === 0) return none('no such layout');
  const scale = 1 + (Math.abs(y1) + Math.abs(y2)) / Math.abs(d);
  return both([y1, 1 - slope, scale], [y2, slope - 1 / m, scale + 1 / Math.abs(m)]);
}

/** A focal length as a quotient, and the scale by which its denominator counts as none: then the part has no power. */
type FocalLength = readonly [numerator: number, denominator: number, scale: number];

function both(first: FocalLength, second: FocalLength): Solved<TwoElements> {
  if (isNegligible(first[1], first[2])) return none('first needs no power');
  if (isNegligible(second[1], second[2])) return none('second needs no power');
  const pair = { firstFocalLengthMm: first[0] / first[1], secondFocalLengthMm: second[0] / second[1] };
  return solvedIf(pair, Object.values(pair));
}
