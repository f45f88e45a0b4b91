import { none, type Outcome, some } from '../outcome.ts';
import type { Train } from '../train/types.ts';
import type { Absence } from './absence.ts';
import { type Axial, axialOf } from './axial.ts';
import { isNegligible, rayScale } from './scale.ts';
import { isFiniteRay, type ParaxialRay, rayThrough } from './trace.ts';

/** What limits the axial bundle, and the ray through its centre. */
export interface Stop {
  /** It lies in front of the refraction of this surface. */
  readonly surface: number;
  /** Given by the sketch, or the rim that limits the axial bundle. */
  readonly limitedBy: 'stop' | 'rim';
  /** The ray that crosses the axis at the stop with nu = 1 there. */
  readonly central: ParaxialRay;
  /** What was added up to get the central ray's numbers. */
  readonly centralScale: ParaxialRay;
}

/** The stop in use: the given one, else the rim with the least semi-diameter over axial ray height; 'no stop' when all are open. */
export function stopOf(train: Train, axial: Axial = axialOf(train)): Outcome<Stop, Absence> {
  if (train.count === 0) return none('no parts');
  if (train.stopSurface >= 0) return stopAt(train, train.stopSurface, 'stop');
  const rim = limitingRim(train, axial);
  return rim < 0 ? none('no stop') : stopAt(train, rim, 'rim');
}

function stopAt(train: Train, surface: number, limitedBy: Stop['limitedBy']): Outcome<Stop, Absence> {
  const central = rayThrough(train, surface, 0, 1);
  const centralScale = rayScale(train, surface, 0, 1);
  return isFiniteRay(central) && isFiniteRay(centralScale)
    ? some({ surface, limitedBy, central, centralScale })
    : none('out of range');
}

/** A rim where the axial ray crosses the axis limits nothing. The first of equal rims is taken. */
function limitingRim(train: Train, { ray, scale }: Axial): number {
  let least = Number.POSITIVE_INFINITY;
  let rim = -1;
  for (let k = 0; k < train.count; k++) {
    if (isNegligible(ray.y[k]!, scale.y[k]!)) continue;
    const ratio = train.semiDiameter[k]! / Math.abs(ray.y[k]!);
    if (ratio < least) {
      least = ratio;
      rim = k;
    }
  }
  return rim;
}
