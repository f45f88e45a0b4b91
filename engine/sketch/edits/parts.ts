import type {
  Filling,
  GlassPart,
  GlassSurface,
  Part,
  PartId,
  Sketch,
  SolidMedium,
  ThinPart,
} from '../types.ts';
import { changePart, withField, withFields } from './change.ts';

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

/** Sets the bending (R2 + R1)/(R2 − R1) meant for a thin part; null leaves it open. */
export const setShapeFactor = (sketch: Sketch, partId: PartId, shapeFactor: number | null): Sketch =>
  changeThin(sketch, partId, (part) => withField(part, 'shapeFactor', shapeFactor));

/** Sets the thickness in mm of a plate, or of one filling of a glass part; what is behind it moves along. */
export const setThickness = (sketch: Sketch, partId: PartId, thicknessMm: number, filling = 0): Sketch =>
  changePart(sketch, partId, (part) => {
    if (part.kind === 'plate') return withField(part, 'thicknessMm', thicknessMm);
    return changeFilling(part, filling, (own) => withField(own, 'thicknessMm', thicknessMm));
  });

/** Sets the material of a plate, of a thin part (null: none is meant), or of one filling of a glass part. */
export const setMaterial = (
  sketch: Sketch,
  partId: PartId,
  material: SolidMedium | null,
  filling = 0,
): Sketch =>
  changePart(sketch, partId, (part) => {
    if (part.kind === 'thin') return withField(part, 'material', material);
    if (material === null) return part;
    if (part.kind === 'plate') return withField(part, 'material', material);
    return changeFilling(part, filling, (own) => withField(own, 'material', material));
  });

/** Changes entries of one surface of a glass part, counted from 0. */
export const setSurface = (
  sketch: Sketch,
  partId: PartId,
  surface: number,
  change: Partial<GlassSurface>,
): Sketch =>
  changePart(sketch, partId, (part) => {
    const own = part.kind === 'glass' ? part.surfaces[surface] : undefined;
    if (part.kind !== 'glass' || own === undefined) return part;
    const next = withFields(own, change);
    return next === own ? part : { ...part, surfaces: part.surfaces.with(surface, next) };
  });

/** Gives a glass part other surfaces and fillings; what is behind it moves along when its length changes. */
export const setGlass = (
  sketch: Sketch,
  partId: PartId,
  glass: Pick<GlassPart, 'surfaces' | 'fillings'>,
): Sketch => changePart(sketch, partId, (part) => (part.kind === 'glass' ? withFields(part, glass) : part));

/** Sets the name of a part; an empty one is shown as the part's number. */
export const renamePart = (sketch: Sketch, partId: PartId, name: string): Sketch =>
  changePart(sketch, partId, (part) => withField(part, 'name', name));

/** Sets the note of a part. */
export const setNote = (sketch: Sketch, partId: PartId, note: string): Sketch =>
  changePart(sketch, partId, (part) => withField(part, 'note', note));

const changeThin = (sketch: Sketch, partId: PartId, change: (part: ThinPart) => Part): Sketch =>
  changePart(sketch, partId, (part) => (part.kind === 'thin' ? change(part) : part));

function changeFilling(part: Part, filling: number, change: (filling: Filling) => Filling): Part {
  const own = part.kind === 'glass' ? part.fillings[filling] : undefined;
  if (part.kind !== 'glass' || own === undefined) return part;
  const next = change(own);
  return next === own ? part : { ...part, fillings: part.fillings.with(filling, next) };
}
