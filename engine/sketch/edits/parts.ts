import type { FixedMedium, Part, PartId, PlatePart, Sketch, ThinPart } from '../types.ts';
import { changePart, withField } from './change.ts';

/*
 * Numbers and names of one part. Every one gives the same sketch back when there is no such part, when the part is of
 * another kind, or when the value is there already. What is not allowed is refused by the rules, not here.
 */

/** Sets the focal length of a thin part in mm. */
export const setFocalLength = (sketch: Sketch, partId: PartId, focalLengthMm: number): Sketch =>
  changeThin(sketch, partId, (part) => withField(part, 'focalLengthMm', focalLengthMm));

/** Turns a positive part into a negative one and back. */
export const flipSign = (sketch: Sketch, partId: PartId): Sketch =>
  changeThin(sketch, partId, (part) => withField(part, 'focalLengthMm', -part.focalLengthMm));

/** Sets half the clear diameter in mm; null opens the part. */
export const setSemiDiameter = (sketch: Sketch, partId: PartId, semiDiameterMm: number | null): Sketch =>
  changePart(sketch, partId, (part) => withField(part, 'semiDiameterMm', semiDiameterMm));

/** Sets the Abbe number of a thin part; null: unknown, no colour is computed for it. */
export const setAbbeNumber = (sketch: Sketch, partId: PartId, abbeNumber: number | null): Sketch =>
  changeThin(sketch, partId, (part) => withField(part, 'abbeNumber', abbeNumber));

/** Sets the index assumed for a thin part in the Petzval sum; null takes the sketch's own. */
export const setIndex = (sketch: Sketch, partId: PartId, index: number | null): Sketch =>
  changeThin(sketch, partId, (part) => withField(part, 'index', index));

/** Sets the room in mm reserved for real glass on one side of a thin part. */
export const setRoom = (sketch: Sketch, partId: PartId, side: 'front' | 'behind', roomMm: number): Sketch =>
  changeThin(sketch, partId, (part) =>
    withField(part, side === 'front' ? 'roomFrontMm' : 'roomBehindMm', roomMm),
  );

/** Sets the thickness of a plate in mm; what is behind it moves along. */
export const setThickness = (sketch: Sketch, partId: PartId, thicknessMm: number): Sketch =>
  changePlate(sketch, partId, (part) => withField(part, 'thicknessMm', thicknessMm));

/** Sets the material of a plate. */
export const setMaterial = (sketch: Sketch, partId: PartId, material: FixedMedium): Sketch =>
  changePlate(sketch, partId, (part) => withField(part, 'material', material));

/** Sets the name of a part; an empty one is shown as the part's number. */
export const renamePart = (sketch: Sketch, partId: PartId, name: string): Sketch =>
  changePart(sketch, partId, (part) => withField(part, 'name', name));

/** Sets the note of a part. */
export const setNote = (sketch: Sketch, partId: PartId, note: string): Sketch =>
  changePart(sketch, partId, (part) => withField(part, 'note', note));

const changeThin = (sketch: Sketch, partId: PartId, change: (part: ThinPart) => Part): Sketch =>
  changePart(sketch, partId, (part) => (part.kind === 'thin' ? change(part) : part));

const changePlate = (sketch: Sketch, partId: PartId, change: (part: PlatePart) => Part): Sketch =>
  changePart(sketch, partId, (part) => (part.kind === 'plate' ? change(part) : part));
