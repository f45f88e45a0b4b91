import { changeSpaceAt } from '../sketch/edits/change.ts';
import type { Medium, Sketch } from '../sketch/types.ts';
import { everyPosition } from '../sketch/values.ts';
import { type LengthUnit, lengthText } from '../units.ts';
import type { ThinEquivalent } from './thinEquivalent.ts';

/** A sketch with one part made otherwise, and what that did. */
export interface Remade {
  readonly sketch: Sketch;
  /** Focal length and principal planes of the glass. */
  readonly equivalent: ThinEquivalent;
  readonly notes: readonly Note[];
}

/** A plain sentence with its lengths in `unit`. */
export type Note = (unit: LengthUnit) => string;

/** A length by which something changes, with its sign. */
export const change = (lengthMm: number, unit: LengthUnit): string =>
  `${lengthMm < 0 ? '−' : '+'}${lengthText(Math.abs(lengthMm), unit)}`;

/** The medium in front of the part at `index`. */
export const mediumInFront = (sketch: Sketch, index: number): Medium =>
  sketch.parts[index - 1]?.space.medium ?? sketch.object.medium;

/**
 * The gaps in front of and behind a part longer by so much at every position: of the first part the object's distance unless it is at infinity, of
 * the last the sensor's. What is common to all positions stays common.
 */
export function changeGaps(sketch: Sketch, index: number, frontByMm: number, behindByMm: number): Sketch {
  const behind = longerBy(sketch, index, behindByMm);
  if (index > 0) return longerBy(behind, index - 1, frontByMm);
  const distanceMm = everyPosition(sketch.object.distanceMm, (distance) =>
    distance === 'infinity' ? distance : distance + frontByMm,
  );
  return { ...behind, object: { ...behind.object, distanceMm } };
}

const longerBy = (sketch: Sketch, index: number, byMm: number): Sketch =>
  changeSpaceAt(sketch, index, (space) => ({
    ...space,
    lengthMm: everyPosition(space.lengthMm, (length) => length + byMm),
  }));
