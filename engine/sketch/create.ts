import type {
  GlassPart,
  GlassSurface,
  GroupId,
  Lines,
  PartId,
  PlatePart,
  PositionId,
  Sketch,
  SolidMedium,
  StopPart,
  ThinPart,
} from './types.ts';

/** Reference lines in nm after ISO 7944: the mercury green e with F′ and C′, the helium yellow d with F and C. */
export const LINES: Readonly<Record<'e' | 'd', Pick<Lines, 'mainNm' | 'shortNm' | 'longNm'>>> = {
  e: { mainNm: 546.074, shortNm: 479.9914, longNm: 643.8469 },
  d: { mainNm: 587.5618, shortNm: 486.1327, longNm: 656.2725 },
};

/** A sketch without parts: object at infinity, image at the focus, f/4, a field of 10° and one position. */
export function emptySketch(title = 'Untitled'): Sketch {
  return {
    title,
    notes: '',
    object: { distanceMm: 'infinity', medium: 'air' },
    parts: [],
    image: 'focus',
    sensor: null,
    registerMm: null,
    stop: null,
    aperture: { kind: 'infinityFNumber', fNumber: 4 },
    field: { size: { kind: 'angle', angleDeg: 10 }, fractions: [0, 0.7, 1], vignetting: 0 },
    lines: { ...LINES.d, weights: { main: 1, short: 1, long: 1 }, more: [] },
    air: 'unity',
    positions: [{ id: 'only' as PositionId, name: 'only' }],
    groups: [],
    assumedIndex: 1.5,
    blurMm: null,
  };
}

const FIRST_ID = 'p1' as PartId;

/** An open thin part of the given focal length in mm, unnamed; `insertPart` gives it a fresh id when its own is taken. */
export function newThin(focalLengthMm: number, id: PartId = FIRST_ID): ThinPart {
  return {
    kind: 'thin',
    ...plainPart(id),
    focalLengthMm,
    abbeNumber: null,
    index: null,
    material: null,
    shapeFactor: null,
    roomFrontMm: 0,
    roomBehindMm: 0,
  };
}

/** An open diaphragm; it becomes the aperture stop only when the sketch's `stop` names it. */
export function newStop(id: PartId = FIRST_ID): StopPart {
  return { kind: 'stop', ...plainPart(id) };
}

/** The catalogue's borosilicate crown, of which new plates and lenses are. */
const CROWN: SolidMedium = { material: 'n-bk7' };

/** An open flat plate of crown glass, or of the given material. */
export function newPlate(thicknessMm = 1, id: PartId = FIRST_ID, material: SolidMedium = CROWN): PlatePart {
  return { kind: 'plate', ...plainPart(id), thicknessMm, material };
}

/** A surface without rim of its own; the radius null is flat. */
export const newSurface = (radiusMm: number | null): GlassSurface => ({
  radiusMm,
  conic: 0,
  asphere: [],
  semiDiameterMm: null,
});

/** An open singlet of the catalogue's borosilicate crown with equal radii of opposite sign. */
export function newGlass(radiusMm: number, thicknessMm: number, id: PartId = FIRST_ID): GlassPart {
  return {
    kind: 'glass',
    ...plainPart(id),
    surfaces: [newSurface(radiusMm), newSurface(-radiusMm)],
    fillings: [{ thicknessMm, material: CROWN }],
  };
}

function plainPart(id: PartId) {
  return { id, name: '', note: '', semiDiameterMm: null, space: { lengthMm: 0, medium: 'air' } } as const;
}

/** The first of p1, p2, … that no part of the sketch bears. */
export const freshPartId = (sketch: Sketch): PartId => freshId('p', sketch.parts) as PartId;

/** The first of pos1, pos2, … that no position of the sketch bears. */
export const freshPositionId = (sketch: Sketch): PositionId => freshId('pos', sketch.positions) as PositionId;

/** The first of g1, g2, … that no group of the sketch bears. */
export const freshGroupId = (sketch: Sketch): GroupId => freshId('g', sketch.groups) as GroupId;

function freshId(prefix: string, taken: readonly { readonly id: string }[]): string {
  const ids = new Set(taken.map((item) => item.id));
  let number = 1;
  while (ids.has(prefix + number)) number++;
  return prefix + number;
}
