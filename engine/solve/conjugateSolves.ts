import { none, some } from '../outcome.ts';
import { finite } from '../paraxial/absence.ts';
import { type Solved, solvedIf } from './absence.ts';

/**
 * How far in front of a thin part in air the object stands for a magnification m ≠ 0: f(1 − 1/m), mm, positive in front; negative for a virtual
 * object.
 */
export function objectForMagnification(focalLengthMm: number, magnification: number): Solved<number> {
  const distanceMm = finite(focalLengthMm * (1 - 1 / magnification));
  return distanceMm.ok ? some(distanceMm.value) : none('out of range');
}

/**
 * The two places of a thin part in air between an object and its image `objectToImageMm` = L apart: object distances (mm, positive in front)
 * (L ∓ √(L² − 4fL))/2, the near one first, whose product is fL. 'no such layout' when L is shorter than 4f.
 */
export function objectsForTrack(
  focalLengthMm: number,
  objectToImageMm: number,
): Solved<readonly [number, number]> {
  const L = objectToImageMm;
  const radicand = L * L - 4 * focalLengthMm * L;
  if (!(radicand >= 0) || L === 0) return none('no such layout');
  // The root that adds; the other follows from the product.
  const large = (L + Math.sign(L) * Math.sqrt(radicand)) / 2;
  const small = (focalLengthMm * L) / large;
  const pair = small <= large ? ([small, large] as const) : ([large, small] as const);
  return solvedIf(pair, pair);
}
