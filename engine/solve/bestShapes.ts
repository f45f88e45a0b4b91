import { none, type Outcome, some } from '../outcome.ts';
import { axialOf } from '../paraxial/axial.ts';
import type { Train } from '../train/types.ts';
import type { Unsolvable } from './absence.ts';
import { leastSphericalShape, positionFactor, zeroComaShape } from './bending.ts';

/** Bendings of one part for the conjugates at which it works in its layout, as shape factors q = (R2 + R1)/(R2 − R1). */
export interface BestShapes {
  /** p = (u + u′)/(u − u′) of the axial ray. */
  readonly positionFactor: number;
  /** Least third-order spherical aberration. */
  readonly leastSpherical: number;
  /** No third-order coma with the stop at the part. */
  readonly zeroComa: number;
}

/**
 * The best bendings of a part of the train, thin or of glass, for a glass of this index, as if it were one thin lens in the medium in front of
 * it. 'no such part', 'no power' when the axial ray passes unbent.
 */
export function bestShapes(train: Train, part: number, glassIndex: number): Outcome<BestShapes, Unsolvable> {
  const front = train.partOf.indexOf(part);
  const rear = train.partOf.lastIndexOf(part);
  if (front < 0) return none('no such part');
  const { ray } = axialOf(train);
  const position = positionFactor(ray.nu[front]!, ray.nu[rear + 1]!);
  if (!position.ok) return position;
  const index = glassIndex / Math.abs(train.index[front]!);
  return some({
    positionFactor: position.value,
    leastSpherical: leastSphericalShape(index, position.value),
    zeroComa: zeroComaShape(index, position.value),
  });
}
