import { none } from '../outcome.ts';
import { type Solved, solvedIf } from './absence.ts';

/** The two curvatures of a lens up to a factor: (1, −1) is equi-convex or equi-concave, (1, 0) flat behind, (1, 1) has equal radii. */
export interface Bending {
  readonly front: number;
  readonly rear: number;
}

/** The curvatures that go with the shape factor q = (R2 + R1)/(R2 − R1); equal radii have none. */
export const bendingOf = (shapeFactor: number): Bending => ({
  front: shapeFactor + 1,
  rear: shapeFactor - 1,
});

/** q = (R2 + R1)/(R2 − R1) = (c1 + c2)/(c1 − c2) of two curvatures; null for equal ones, which it cannot express. */
export function shapeFactorOf({ front, rear }: Bending): number | null {
  const q = (front + rear) / (front - rear);
  return Number.isFinite(q) ? q : null;
}

/**
 * p = (s′ + s)/(s′ − s) = (u + u′)/(u − u′) from the slopes of an axial ray in front of and behind a lens: −1 for an object at infinity, 0 at
 * magnification −1, +1 for an image at infinity. 'no power' when the ray is not bent.
 */
export function positionFactor(slopeInFront: number, slopeBehind: number): Solved<number> {
  if (slopeInFront === slopeBehind) return none('no power');
  const p = (slopeInFront + slopeBehind) / (slopeInFront - slopeBehind);
  return solvedIf(p, [p]);
}

/**
 * The shape factor of a thin lens with least third-order spherical aberration, q = −2(n² − 1)p/(n + 2), n relative to what surrounds it
 * (Jenkins and White, Fundamentals of Optics, chapter on lens aberrations; Welford, Aberrations of Optical Systems).
 */
export const leastSphericalShape = (index: number, position: number): number =>
  (-2 * (index * index - 1) * position) / (index + 2) + 0;

/** The shape factor of a thin lens without third-order coma when the stop is at it, q = −(2n + 1)(n − 1)p/(n + 1); sources as above. */
export const zeroComaShape = (index: number, position: number): number =>
  (-(2 * index + 1) * (index - 1) * position) / (index + 1) + 0;
