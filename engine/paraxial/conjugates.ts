import { none, some } from '../outcome.ts';
import type { Train } from '../train/types.ts';
import { derive, derive2, finite, type Quantity } from './absence.ts';
import { type Axial, axialOf } from './axial.ts';

/** Where object and image stand and how they compare. Lengths in mm. */
export interface Conjugates {
  /** In front of the first vertex, positive; 'object at infinity'. */
  readonly objectDistanceMm: Quantity;
  /** The paraxial image from the last vertex, positive to the right; 'image at infinity'. */
  readonly imageDistanceMm: Quantity;
  /** The image plane in use from the last vertex: the fixed sensor, else the paraxial image. */
  readonly imagePlaneMm: Quantity;
  /** Paraxial image minus plane in use, positive when the image falls behind it; 0 when the plane follows the focus. */
  readonly defocusMm: Quantity;
  /** Transverse, image height over object height = nu/nu′ of the axial ray. */
  readonly magnification: Quantity;
  /** dl′/dl = (n′/n)·m². */
  readonly longitudinalMagnification: Quantity;
  /** u′/u of the axial ray; 'object at infinity', 'image at infinity'. */
  readonly angularMagnification: Quantity;
  /** First vertex to the image plane in use. */
  readonly trackMm: Quantity;
  /** Object to the image plane in use. */
  readonly objectToImageMm: Quantity;
}

/** The conjugates of the whole train, read from the axial ray. */
export function conjugates(train: Train, axial: Axial = axialOf(train)): Conjugates {
  const { count, objectZ } = train;
  const { imageDistanceMm, imagePlaneMm, ray } = axial;
  const n = train.index[0]!;
  const nRear = train.index[count]!;
  const magnification = !imageDistanceMm.ok
    ? imageDistanceMm
    : objectZ === null
      ? none('object at infinity' as const)
      : finite(ray.nu[0]! / ray.nu[count]!);
  const trackMm = derive(imagePlaneMm, (plane) => train.z[count - 1]! + plane);
  return {
    objectDistanceMm: objectZ === null ? none('object at infinity') : some(-objectZ),
    imageDistanceMm,
    imagePlaneMm,
    defocusMm: derive2(imageDistanceMm, imagePlaneMm, (image, plane) => image - plane),
    magnification,
    longitudinalMagnification: derive(magnification, (m) => (nRear / n) * m * m),
    angularMagnification: derive(magnification, (m) => n / (nRear * m)),
    trackMm,
    objectToImageMm:
      objectZ === null ? none('object at infinity') : derive(trackMm, (track) => track - objectZ),
  };
}
