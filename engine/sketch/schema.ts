import * as v from 'valibot';
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
const medium = v.lazy((input) => (typeof input === 'string' ? v.literal('air') : fixedMedium));

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
    roomFrontMm: number,
    roomBehindMm: number,
  }),
  v.strictObject({ kind: v.literal('stop'), ...partBase }),
  v.strictObject({ kind: v.literal('plate'), ...partBase, thicknessMm: number, material: fixedMedium }),
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
  lines: v.strictObject({ mainNm: number, shortNm: number, longNm: number }),
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
