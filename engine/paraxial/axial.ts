import { none, some } from '../outcome.ts';
import type { Train } from '../train/types.ts';
import type { Quantity } from './absence.ts';
import { axisCrossing, rayScale } from './scale.ts';
import { type ParaxialRay, paraxialRay } from './trace.ts';

/** A ray from the axial object point, of no particular size, and the image that it forms. */
export interface Axial {
  /** Leaves the object upwards, or runs parallel above the axis. */
  readonly ray: ParaxialRay;
  /** What was added up to get the ray's numbers. */
  readonly scale: ParaxialRay;
  /** Paraxial image from the last vertex; 'image at infinity', 'no parts'. */
  readonly imageDistanceMm: Quantity;
  /** The image plane in use from the last vertex: the fixed one, else the paraxial image. */
  readonly imagePlaneMm: Quantity;
}

/** The axial base ray: of unit nu from an object at a finite distance, of unit height from one at infinity. */
export function axialOf(train: Train): Axial {
  const { count, objectZ, imageZ } = train;
  const nu = objectZ === null ? 0 : 1;
  const y = objectZ === null ? 1 : -objectZ / train.index[0]!;
  const ray = paraxialRay(train, y, nu);
  const scale = rayScale(train, 0, y, nu);
  const imageDistanceMm = count === 0 ? none('no parts' as const) : imageOf(train, ray, scale);
  return {
    ray,
    scale,
    imageDistanceMm,
    imagePlaneMm: imageZ === null || count === 0 ? imageDistanceMm : some(imageZ - train.z[count - 1]!),
  };
}

const imageOf = ({ count, index }: Train, ray: ParaxialRay, scale: ParaxialRay): Quantity =>
  axisCrossing(index[count]!, ray.y[count - 1]!, ray.nu[count]!, scale.nu[count]!, 'image at infinity');
