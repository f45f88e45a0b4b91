import { none } from '../outcome.ts';
import type { Train } from '../train/types.ts';
import { derive, derive2, finite, type Quantity } from './absence.ts';
import type { Axial } from './axial.ts';
import type { FirstOrder } from './firstOrder.ts';
import { entrancePupilHeight, type ReferenceRays } from './rays.ts';
import { slopeIn } from './trace.ts';

/** How fast and how wide the light is. Angles in rad, positive when rising to the right; heights in mm. */
export interface Light {
  /** 1/(2 n′ |u′|), paraxial. */
  readonly workingFNumber: Quantity;
  /** |focal length| / entrance-pupil diameter. */
  readonly infinityFNumber: Quantity;
  /** n sin(arctan u) of the marginal ray at the object. */
  readonly objectNA: Quantity;
  /** n′ sin(arctan u′) of the marginal ray at the image. */
  readonly imageNA: Quantity;
  readonly entrancePupilDiameterMm: Quantity;
  /** H = nu·ȳ − nū·y, the same in every space (mm). */
  readonly lagrange: Quantity;
  /** Slope angle of the chief ray at the object. */
  readonly chiefAngleObjectRad: Quantity;
  /** Slope angle of the chief ray at the image plane. */
  readonly chiefAngleImageRad: Quantity;
  /** Its magnitude at the object: the half field angle. */
  readonly fieldAngleRad: Quantity;
  /** Where the chief ray leaves the object plane; 'object at infinity'. */
  readonly objectHeightMm: Quantity;
  /** Where the chief ray meets the image plane in use. */
  readonly imageHeightMm: Quantity;
}

/** What the marginal and the chief ray say at the object and at the image plane. */
export function light(train: Train, rays: ReferenceRays, axial: Axial, first: FirstOrder): Light {
  const { marginal, chief, stop } = rays;
  const { count, objectZ } = train;
  const sine = (space: number): Quantity =>
    marginal.ok
      ? finite(
          Math.abs(train.index[space]!) *
            Math.sin(Math.atan(Math.abs(slopeIn(train, marginal.value, space)))),
        )
      : marginal;
  const slopeAngle = (space: number): Quantity =>
    chief.ok ? finite(Math.atan(slopeIn(train, chief.value, space))) : chief;
  const pupil = marginal.ok ? entrancePupilHeight(train, marginal.value, axial, stop) : marginal;
  const converging = axial.imageDistanceMm;
  const chiefAngleObjectRad = slopeAngle(0);
  return {
    workingFNumber: marginal.ok
      ? derive(converging, () => 1 / (2 * Math.abs(marginal.value.nu[count]!)))
      : marginal,
    infinityFNumber: derive2(first.focalLengthMm, pupil, (focal, half) => Math.abs(focal) / (2 * half)),
    objectNA: objectZ === null ? none('object at infinity') : sine(0),
    imageNA: converging.ok ? sine(count) : converging,
    entrancePupilDiameterMm: derive(pupil, (half) => 2 * half),
    lagrange: !marginal.ok
      ? marginal
      : chief.ok
        ? finite(marginal.value.nu[0]! * chief.value.y[0]! - chief.value.nu[0]! * marginal.value.y[0]!)
        : chief,
    chiefAngleObjectRad,
    chiefAngleImageRad: slopeAngle(count),
    fieldAngleRad: derive(chiefAngleObjectRad, Math.abs),
    objectHeightMm:
      objectZ === null
        ? none('object at infinity')
        : chief.ok
          ? finite(chief.value.y[0]! + objectZ * slopeIn(train, chief.value, 0))
          : chief,
    imageHeightMm: chief.ok
      ? derive(
          axial.imagePlaneMm,
          (plane) => chief.value.y[count - 1]! + plane * slopeIn(train, chief.value, count),
        )
      : chief,
  };
}
