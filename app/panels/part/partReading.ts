import type { GlassPart, Part, PartId, PlatePart, ThinPart } from '../../../engine/index.ts';
import type { Reading } from '../../live/reading.ts';

/** The part of that id, if the sketch holds it. */
export const partIn = ({ sketch }: Reading, id: PartId): Part | undefined =>
  sketch.parts.find((part) => part.id === id);

/** The part's place along the axis, −1 when there is none of that id. */
export const indexIn = ({ sketch }: Reading, id: PartId): number =>
  sketch.parts.findIndex((part) => part.id === id);

/** A value of a thin part; null for any other. */
export const readThin =
  (id: PartId, read: (part: ThinPart) => number | null) =>
  (reading: Reading): number | null => {
    const part = partIn(reading, id);
    return part?.kind === 'thin' ? read(part) : null;
  };

/** A value of a plate; null for any other. */
export const readPlate =
  (id: PartId, read: (part: PlatePart) => number | null) =>
  (reading: Reading): number | null => {
    const part = partIn(reading, id);
    return part?.kind === 'plate' ? read(part) : null;
  };

/** A value of a glass part; null for any other. */
export const readGlass =
  <T>(id: PartId, read: (part: GlassPart) => T) =>
  (reading: Reading): T | null => {
    const part = partIn(reading, id);
    return part?.kind === 'glass' ? read(part) : null;
  };
