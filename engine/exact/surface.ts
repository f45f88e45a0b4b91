import type { Train } from '../train/types.ts';
import type { Vector } from './types.ts';

/** How the profile z(r) of a surface runs at one radius. */
export interface Run {
  /** dz/dr. */
  readonly slope: number;
  /** d²z/dr², 1/mm. */
  readonly bend: number;
  /** (dz/dr)/r, 1/mm; on the axis its limit, the vertex curvature. */
  readonly slopeOverRadius: number;
}

/**
 * Slope and bend of surface `surface` of the train at `radiusMm` from the axis: of z = c r²/(1 + √(1 − (1 + K)c²r²)) + A4 r⁴ + A6 r⁶ + …
 * The numbers are not finite at the edge of the conic and beyond.
 */
export function runAt(train: Train, surface: number, radiusMm: number): Run {
  const c = train.curvature[surface]!;
  const squared = radiusMm * radiusMm;
  const root = Math.sqrt(1 - (1 + train.conic[surface]!) * c * c * squared);
  const first = train.asphereFrom[surface]!;
  let slopeSum = 0;
  let bendSum = 0;
  for (let j = train.asphereFrom[surface + 1]! - 1; j >= first; j--) {
    const power = 4 + 2 * (j - first);
    slopeSum = slopeSum * squared + power * train.asphere[j]!;
    bendSum = bendSum * squared + power * (power - 1) * train.asphere[j]!;
  }
  const slopeOverRadius = c / root + slopeSum * squared;
  return {
    slope: slopeOverRadius * radiusMm,
    bend: c / (root * root * root) + bendSum * squared,
    slopeOverRadius,
  };
}

/** Unit normal of a surface at a point of it, in the frame of its vertex, with its z to the right. */
export function normalAt(train: Train, surface: number, xMm: number, yMm: number): Vector {
  if (train.thinPower[surface] !== 0) return [0, 0, 1];
  const { slopeOverRadius } = runAt(train, surface, Math.hypot(xMm, yMm));
  const length = 1 / Math.hypot(slopeOverRadius * xMm, slopeOverRadius * yMm, 1);
  return [-slopeOverRadius * xMm * length, -slopeOverRadius * yMm * length, length];
}
