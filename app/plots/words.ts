import type { ExactSetup, LengthUnit } from '../../engine/index.ts';
import { digitsIn, mmPer } from '../../engine/index.ts';
import { type CurveInk, type CurveLine, fieldBundle } from '../board/styles.ts';
import { plain } from '../drawing/words.ts';

/** What a field is called by its share: the axis, the full field, or a share of it. */
export function fieldName(fraction: number): string {
  if (fraction === 0) return 'axis';
  return fraction === 1 ? 'full field' : `${plain(fraction, 3)} field`;
}

/** The colour of field number `index` of these, from the axis outwards: as its bundle has on the drawing. */
export function fieldInk(fractions: readonly number[], index: number): CurveInk {
  if (fractions[index] === 0) return 'axial';
  const offAxis = fractions.filter((fraction) => fraction !== 0);
  return INKS[fieldBundle(offAxis.indexOf(fractions[index] ?? 0), offAxis.length)] ?? 'field outer';
}

const INKS: Readonly<Partial<Record<string, CurveInk>>> = {
  'field inner bundle': 'field inner',
  'field middle bundle': 'field middle',
  'field outer bundle': 'field outer',
};

/** A line by its name and wavelength. */
export function lineName({ lines }: ExactSetup, line: number): string {
  const known = lines[line] ?? lines[0];
  return `${known.line} ${plain(known.wavelengthNm, 1)} nm`;
}

/** A line in one word. */
export const lineWord = ({ lines }: ExactSetup, line: number): string => (lines[line] ?? lines[0]).line;

/** The dash of a line. */
export const lineDash = ({ lines }: ExactSetup, line: number): CurveLine => (lines[line] ?? lines[0]).line;

/** A length of plots: how many of `unit` make a millimetre, and the decimals it is read with. */
export const lengthScale = (
  unit: LengthUnit,
  digits: number,
): { readonly unit: string; readonly digits: number; readonly perMm: number } => ({
  unit,
  digits: digitsIn(unit, digits),
  perMm: 1 / mmPer(unit),
});

/** "3 rays lost", or nothing. */
export const lostNote = (lost: number): readonly string[] =>
  lost === 0 ? [] : [lost === 1 ? '1 ray lost' : `${lost} rays lost`];

/** Values times a factor. */
export const scaled = (values: Float64Array, factor: number): Float64Array =>
  values.map((value) => value * factor + 0);
