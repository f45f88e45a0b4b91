import { none, type Outcome, some } from '../outcome.ts';
import type { FieldSize } from '../sketch/types.ts';
import type { ApertureAt } from '../train/places.ts';
import type { Train } from '../train/types.ts';
import { type Absence, derive, finite, type Quantity } from './absence.ts';
import { type Axial, axialOf } from './axial.ts';
import { firstOrder } from './firstOrder.ts';
import { isNegligible } from './scale.ts';
import { type Stop, stopOf } from './stop.ts';
import { emptyRay, isFiniteRay, type ParaxialRay, scaledRay } from './trace.ts';

export type RayOutcome = Outcome<ParaxialRay, Absence>;

/** The two rays that everything about light and field is read from, and the stop that they belong to. */
export interface ReferenceRays {
  readonly stop: Outcome<Stop, Absence>;
  readonly marginal: RayOutcome;
  readonly chief: RayOutcome;
}

/** Marginal and chief ray, sharing their base rays. */
export function referenceRays(
  train: Train,
  aperture: ApertureAt,
  field: FieldSize,
  axial: Axial = axialOf(train),
  stop: Outcome<Stop, Absence> = stopOf(train, axial),
): ReferenceRays {
  return {
    stop,
    marginal: scaled(axial.ray, marginalFactor(train, aperture, axial, stop)),
    chief: stop.ok ? scaled(stop.value.central, chiefFactor(train, field, axial, stop.value)) : stop,
  };
}

/**
 * The axial ray through the upper edge of the aperture: it leaves the object upwards (or above the axis). Every kind of aperture is a
 * scaling of the same ray. Absent: 'no stop', 'no stop to size', 'stop at an image', 'image at infinity', 'afocal', 'object at infinity', 'pupil at infinity'.
 */
export function marginalRay(train: Train, aperture: ApertureAt): RayOutcome {
  const axial = axialOf(train);
  return scaled(axial.ray, marginalFactor(train, aperture, axial, stopOf(train, axial)));
}

/**
 * The ray through the centre of the stop from the edge of the field. An object at a finite distance has that edge below the
 * axis; from infinity the ray rises. Absent: 'no stop', 'stop at a focus', 'stop at an image', 'object at infinity', 'image at infinity'.
 */
export const chiefRay = (train: Train, aperture: ApertureAt, field: FieldSize): RayOutcome =>
  referenceRays(train, aperture, field).chief;

/**
 * The ray from the share `fraction` of the field through the share `pupil` of the stop's radius (1 is the upper edge):
 * fraction · chief + pupil · marginal. Written into `into` when given, so that a drawing needs no new arrays.
 */
export function bundle(
  train: Train,
  marginal: ParaxialRay,
  chief: ParaxialRay,
  fraction: number,
  pupil: number,
  into: ParaxialRay = emptyRay(train.count),
): ParaxialRay {
  for (let k = 0; k < train.count; k++) into.y[k] = fraction * chief.y[k]! + pupil * marginal.y[k]!;
  for (let k = 0; k <= train.count; k++) into.nu[k] = fraction * chief.nu[k]! + pupil * marginal.nu[k]!;
  return into;
}

/**
 * Height of the axial ray in the entrance pupil (mm, positive). From infinity it is the ray's height; else the height in the stop over
 * the stop's magnification into object space, which is the central ray's nu there. 'no stop', 'pupil at infinity', 'stop at an image'.
 */
export function entrancePupilHeight(
  train: Train,
  ray: ParaxialRay,
  axial: Axial,
  stop: Outcome<Stop, Absence>,
): Quantity {
  if (train.objectZ === null) return finite(Math.abs(ray.y[0]!));
  if (!stop.ok) return stop;
  const { surface, central, centralScale } = stop.value;
  if (isNegligible(axial.ray.y[surface]!, axial.scale.y[surface]!)) return none('stop at an image');
  if (isNegligible(central.nu[0]!, centralScale.nu[0]!)) return none('pupil at infinity');
  return finite(Math.abs(ray.y[surface]! / central.nu[0]!));
}

function marginalFactor(
  train: Train,
  aperture: ApertureAt,
  axial: Axial,
  stop: Outcome<Stop, Absence>,
): Quantity {
  const { ray, scale } = axial;
  const n = Math.abs(train.index[0]!);
  if (train.count === 0) return none('no parts');
  switch (aperture.kind) {
    case 'stopDiameter': {
      if (!stop.ok) return stop;
      // A rim that happens to limit the light is no stop whose diameter could be set.
      if (stop.value.limitedBy === 'rim') return none('no stop to size');
      const { surface } = stop.value;
      if (isNegligible(ray.y[surface]!, scale.y[surface]!)) return none('stop at an image');
      return finite(aperture.diameterMm / (2 * Math.abs(ray.y[surface]!)));
    }
    case 'workingFNumber':
      return derive(axial.imageDistanceMm, () => 1 / (2 * aperture.fNumber * Math.abs(ray.nu[train.count]!)));
    case 'infinityFNumber': {
      const focal = firstOrder(train).focalLengthMm;
      if (!focal.ok) return focal;
      const height = entrancePupilHeight(train, ray, axial, stop);
      return derive(height, (base) => Math.abs(focal.value) / (2 * aperture.fNumber * base));
    }
    case 'objectNA':
      if (train.objectZ === null) return none('object at infinity');
      if (aperture.na >= n) return none('NA beyond the medium');
      return finite((n * Math.tan(Math.asin(aperture.na / n))) / Math.abs(ray.nu[0]!));
    case 'entrancePupilDiameter':
      return derive(entrancePupilHeight(train, ray, axial, stop), (base) => aperture.diameterMm / (2 * base));
  }
}

function chiefFactor(train: Train, field: FieldSize, axial: Axial, stop: Stop): Quantity {
  const { central, centralScale } = stop;
  const { count, index, objectZ } = train;
  const parallel = isNegligible(central.nu[0]!, centralScale.nu[0]!);
  const objectReach = objectZ === null ? 0 : objectZ / index[0]!;
  const objectHeight = central.y[0]! + objectReach * central.nu[0]!;
  if (objectZ === null && parallel) return none('stop at a focus');
  if (
    objectZ !== null &&
    isNegligible(objectHeight, centralScale.y[0]! + Math.abs(objectReach) * centralScale.nu[0]!)
  ) {
    return none('stop at an image');
  }
  const side = objectZ === null ? Math.sign(central.nu[0]! / index[0]!) : -Math.sign(objectHeight);
  switch (field.kind) {
    case 'angle':
      if (parallel) return none('stop at a focus');
      return finite(side * Math.tan((field.angleDeg * Math.PI) / 180) * Math.abs(index[0]! / central.nu[0]!));
    case 'objectHeight':
      if (objectZ === null) return none('object at infinity');
      return finite((side * field.heightMm) / Math.abs(objectHeight));
    case 'imageHeight': {
      if (!axial.imagePlaneMm.ok) return axial.imagePlaneMm;
      const reach = axial.imagePlaneMm.value / index[count]!;
      const height = central.y[count - 1]! + reach * central.nu[count]!;
      const scale = centralScale.y[count - 1]! + Math.abs(reach) * centralScale.nu[count]!;
      if (isNegligible(height, scale)) return none('stop at an image');
      return finite((side * field.heightMm) / Math.abs(height));
    }
  }
}

function scaled(ray: ParaxialRay, factor: Quantity): RayOutcome {
  if (!factor.ok) return factor;
  const result = scaledRay(ray, factor.value);
  return isFiniteRay(result) ? some(result) : none('out of range');
}
