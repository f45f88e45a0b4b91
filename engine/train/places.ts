import { lengthOf } from '../sketch/part.ts';
import type { Aperture, Setting, Sketch } from '../sketch/types.ts';
import { objectDistanceAt, valueAt } from '../sketch/values.ts';

/** Where everything stands at one setting, in mm from the first part's front vertex, positive to the right. */
export interface Places {
  /** Front and rear vertex of every part; the same number unless the part is thick. */
  readonly parts: readonly { readonly frontMm: number; readonly rearMm: number }[];
  /** The object, or null at infinity. */
  readonly objectMm: number | null;
  /** The fixed sensor plane, or null when the image follows the focus or there are no parts. */
  readonly sensorMm: number | null;
}

/** The places of all parts, the object and the fixed sensor at `setting`. */
export function placesOf(sketch: Sketch, setting: Setting): Places {
  const parts: { frontMm: number; rearMm: number }[] = [];
  let at = 0;
  for (const part of sketch.parts) {
    const rearMm = at + lengthOf(part);
    parts.push({ frontMm: at, rearMm });
    at = rearMm + valueAt(part.space.lengthMm, sketch.positions, setting);
  }
  const distance = objectDistanceAt(sketch.object.distanceMm, sketch.positions, setting);
  return {
    parts,
    objectMm: distance === 'infinity' ? null : -distance,
    sensorMm: sketch.image === 'fixed' && parts.length > 0 ? at : null,
  };
}

/** The aperture with its value at one setting. */
export type ApertureAt =
  | Exclude<Aperture, { kind: 'stopDiameter' }>
  | { readonly kind: 'stopDiameter'; readonly diameterMm: number };

/** The sketch's aperture at `setting`: a stop diameter that differs by position is resolved to its value there (mm). */
export function apertureAt(sketch: Sketch, setting: Setting): ApertureAt {
  const { aperture } = sketch;
  if (aperture.kind !== 'stopDiameter') return aperture;
  return {
    kind: 'stopDiameter',
    diameterMm: valueAt(aperture.diameterMm, sketch.positions, setting),
  };
}
