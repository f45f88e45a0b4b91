import * as v from 'valibot';
import { FORMULA_KINDS } from '../media/dispersion.ts';
import type { Sketch } from './types.ts';

/*
 * The shape of a sketch file: which entries there are and of what kind. Ranges and references are the matter of the
 * rules. Unknown entries are faults, so a misspelt one is not lost in silence.
 */

const isObject = (input: unknown): boolean =>
  typeof input === 'object' && input !== null && !Array.isArray(input);

/** −0 is read as 0. */
const number = v.pipe(
  v.number(),
  v.transform((value) => value + 0),
);

const orNull = <T extends v.GenericSchema>(schema: T) => v.nullable(schema);

/** A number for all positions, or an object with one for each. */
const perPosition = v.lazy((input) => (isObject(input) ? v.record(v.string(), number) : number));

const oneDistance = v.lazy((input) => (typeof input === 'string' ? v.literal('infinity') : number));
const objectDistance = v.lazy((input) => (isObject(input) ? v.record(v.string(), oneDistance) : oneDistance));

const fixedMedium = v.strictObject({ name: v.string(), index: number, abbeNumber: orNull(number) });
const catalogueMedium = v.strictObject({ material: v.string() });
const codeMedium = v.strictObject({ code: v.string() });
const ownMedium = v.strictObject({
  name: v.string(),
  formula: v.strictObject({ kind: v.picklist(FORMULA_KINDS), coefficients: v.array(number) }),
  rangeNm: v.strictTuple([number, number]),
});
/** The kind of a solid medium is told by the entry that only it has. */
const solidMedium = v.lazy((input) => {
  const has = (key: string): boolean => isObject(input) && key in (input as object);
  if (has('material')) return catalogueMedium;
  if (has('code')) return codeMedium;
  return has('formula') ? ownMedium : fixedMedium;
});
const medium = v.lazy((input) => (typeof input === 'string' ? v.literal('air') : solidMedium));

const partBase = {
  id: v.string(),
  name: v.string(),
  note: v.string(),
  semiDiameterMm: orNull(number),
  space: v.strictObject({ lengthMm: perPosition, medium }),
};

export const partSchema = v.variant('kind', [
  v.strictObject({
    kind: v.literal('thin'),
    ...partBase,
    focalLengthMm: number,
    abbeNumber: orNull(number),
    index: orNull(number),
    // Files of version 1 have neither of these two.
    material: v.optional(orNull(solidMedium), null),
    shapeFactor: v.optional(orNull(number), null),
    roomFrontMm: number,
    roomBehindMm: number,
  }),
  v.strictObject({ kind: v.literal('stop'), ...partBase }),
  v.strictObject({ kind: v.literal('plate'), ...partBase, thicknessMm: number, material: solidMedium }),
  v.strictObject({
    kind: v.literal('glass'),
    ...partBase,
    surfaces: v.array(
      v.strictObject({
        radiusMm: orNull(number),
        conic: number,
        asphere: v.array(number),
        semiDiameterMm: orNull(number),
      }),
    ),
    fillings: v.array(v.strictObject({ thicknessMm: number, material: solidMedium })),
  }),
]);

const sensorSize = v.lazy((input) =>
  isObject(input) && 'diagonalMm' in (input as object)
    ? v.strictObject({ diagonalMm: number })
    : v.strictObject({ widthMm: number, heightMm: number }),
);

const aperture = v.variant('kind', [
  v.strictObject({ kind: v.literal('stopDiameter'), diameterMm: perPosition }),
  v.strictObject({ kind: v.literal('workingFNumber'), fNumber: number }),
  v.strictObject({ kind: v.literal('infinityFNumber'), fNumber: number }),
  v.strictObject({ kind: v.literal('objectNA'), na: number }),
  v.strictObject({ kind: v.literal('entrancePupilDiameter'), diameterMm: number }),
]);

const fieldSize = v.variant('kind', [
  v.strictObject({ kind: v.literal('angle'), angleDeg: number }),
  v.strictObject({ kind: v.literal('objectHeight'), heightMm: number }),
  v.strictObject({ kind: v.literal('imageHeight'), heightMm: number }),
]);

/** Every entry of a sketch but the parts, which are read one by one. */
export const sectionSchemas = {
  title: v.string(),
  notes: v.string(),
  object: v.strictObject({ distanceMm: objectDistance, medium }),
  image: v.picklist(['focus', 'fixed']),
  sensor: orNull(v.strictObject({ size: sensorSize, pixelPitchMm: orNull(number) })),
  registerMm: orNull(number),
  stop: orNull(v.string()),
  aperture,
  field: v.strictObject({ size: fieldSize, fractions: v.array(number), vignetting: number }),
  lines: v.strictObject({
    mainNm: number,
    shortNm: number,
    longNm: number,
    // Files of version 1 have neither weights nor further lines, nor the entry for air.
    weights: v.optional(v.strictObject({ main: number, short: number, long: number }), {
      main: 1,
      short: 1,
      long: 1,
    }),
    more: v.optional(v.array(v.strictObject({ wavelengthNm: number, weight: number })), []),
  }),
  air: v.optional(v.picklist(['unity', 'standard']), 'unity'),
  positions: v.array(v.strictObject({ id: v.string(), name: v.string() })),
  groups: v.array(v.strictObject({ id: v.string(), name: v.string(), partIds: v.array(v.string()) })),
  assumedIndex: number,
  blurMm: orNull(number),
} satisfies Record<Exclude<keyof Sketch, 'parts'>, v.GenericSchema>;

/** Parts on the clipboard. */
export const clipSchema = v.strictObject({
  format: v.literal('gapwright-parts'),
  parts: v.array(partSchema),
});
