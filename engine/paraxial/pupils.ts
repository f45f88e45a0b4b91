import { none, type Outcome, some } from '../outcome.ts';
import type { Train } from '../train/types.ts';
import { type Absence, derive, derive2, finite, type Quantity } from './absence.ts';
import type { Axial } from './axial.ts';
import type { ReferenceRays } from './rays.ts';
import { isNegligible, rayScale } from './scale.ts';
import { type ParaxialRay, powerAt, rayThrough } from './trace.ts';

/** The image of a diaphragm, seen from one side. */
export interface DiaphragmImage {
  /** Entrance side: from the first vertex. Exit side: from the last vertex. Positive to the right, mm. */
  readonly zMm: Quantity;
  readonly diameterMm: Quantity;
  /** Image size over the diaphragm's own, signed. */
  readonly magnification: Quantity;
}

export interface Pupils {
  readonly stopSurface: Quantity;
  /** Null when there is no stop at all. */
  readonly limitedBy: 'stop' | 'rim' | null;
  /** Twice the marginal ray's height in the stop. */
  readonly stopDiameterMm: Quantity;
  readonly entrance: DiaphragmImage;
  readonly exit: DiaphragmImage;
}

/** The stop and its images into object and image space; 'pupil at infinity' on a telecentric side, 'no stop'. */
export function pupils(train: Train, rays: ReferenceRays): Pupils {
  const { stop, marginal } = rays;
  if (!stop.ok) {
    const absent = { zMm: stop, diameterMm: stop, magnification: stop };
    return { stopSurface: stop, limitedBy: null, stopDiameterMm: stop, entrance: absent, exit: absent };
  }
  const { surface, central, centralScale, limitedBy } = stop.value;
  const stopDiameterMm = marginal.ok ? finite(2 * Math.abs(marginal.value.y[surface]!)) : marginal;
  const { entrance, exit } = imagesOf(train, central, centralScale, stopDiameterMm, 'pupil at infinity');
  return { stopSurface: some(surface), limitedBy, stopDiameterMm, entrance, exit };
}

export interface Windows {
  /** What limits the field: the sensor, or the rim (surface) that cuts the chief ray first. */
  readonly fieldStop: Outcome<
    { readonly kind: 'sensor' } | { readonly kind: 'rim'; readonly surface: number },
    Absence
  >;
  readonly entrance: DiaphragmImage;
  readonly exit: DiaphragmImage;
}

/**
 * The field stop and its images. A fixed sensor of known size is the field stop; else the rim with the least semi-diameter over chief
 * ray height. `sensorHalfMm` is half the sensor's diagonal, or null. 'window at infinity', 'no stop', 'no field stop'.
 */
export function windows(
  train: Train,
  rays: ReferenceRays,
  axial: Axial,
  sensorHalfMm: number | null,
): Windows {
  const last = train.count - 1;
  const plane = axial.imagePlaneMm;
  if (sensorHalfMm !== null && train.imageZ !== null && plane.ok) {
    // The ray through the sensor's centre with nu = 1 there, carried back in front of the last refraction.
    const y = -plane.value / train.index[train.count]!;
    const nu = 1 + powerAt(train, last) * y;
    const ray = rayThrough(train, last, y, nu);
    const scale = rayScale(train, last, y, 1 + Math.abs(powerAt(train, last) * y));
    const diameter = some(2 * sensorHalfMm);
    const { entrance } = imagesOf(train, ray, scale, diameter, 'window at infinity');
    return {
      fieldStop: some({ kind: 'sensor' }),
      entrance,
      exit: { zMm: plane, diameterMm: diameter, magnification: some(1) },
    };
  }
  const rim = fieldRim(train, rays);
  if (!rim.ok) {
    const absent = { zMm: rim, diameterMm: rim, magnification: rim };
    return { fieldStop: rim, entrance: absent, exit: absent };
  }
  const ray = rayThrough(train, rim.value, 0, 1);
  const scale = rayScale(train, rim.value, 0, 1);
  const diameter = finite(2 * train.semiDiameter[rim.value]!);
  return {
    fieldStop: some({ kind: 'rim', surface: rim.value }),
    ...imagesOf(train, ray, scale, diameter, 'window at infinity'),
  };
}

/** In the stop the chief ray has no height, so it is never found. */
function fieldRim(train: Train, { chief }: ReferenceRays): Outcome<number, Absence> {
  if (!chief.ok) return chief;
  let least = Number.POSITIVE_INFINITY;
  let rim = -1;
  for (let k = 0; k < train.count; k++) {
    const ratio = train.semiDiameter[k]! / Math.abs(chief.value.y[k]!);
    if (ratio < least) {
      least = ratio;
      rim = k;
    }
  }
  return rim < 0 ? none('no field stop') : some(rim);
}

/** `ray` crosses the axis in the diaphragm with nu = 1: its end crossings are the images, 1/nu their magnifications. */
function imagesOf(
  train: Train,
  ray: ParaxialRay,
  scale: ParaxialRay,
  diameterMm: Quantity,
  absence: Absence,
): { entrance: DiaphragmImage; exit: DiaphragmImage } {
  const image = (space: number, surface: number): DiaphragmImage => {
    const nu = ray.nu[space]!;
    const atInfinity = isNegligible(nu, scale.nu[space]!);
    const magnification = atInfinity ? none(absence) : finite(1 / nu);
    return {
      zMm: derive(magnification, (m) => -train.index[space]! * ray.y[surface]! * m),
      magnification,
      diameterMm: derive2(magnification, diameterMm, (m, diameter) => Math.abs(m) * diameter),
    };
  };
  return { entrance: image(0, 0), exit: image(train.count, train.count - 1) };
}
