/** The units a length can be shown in. The sketch itself is always in mm. */
export type LengthUnit = 'mm' | 'in';

/** Exact by definition of the inch. */
export const MM_PER_INCH = 25.4;

/** How many mm one `unit` is. */
export const mmPer = (unit: LengthUnit): number => (unit === 'in' ? MM_PER_INCH : 1);

/** An inch is shown about as finely as a millimetre with two digits fewer. */
const EXTRA_INCH_DIGITS = 2;

/** Decimals of a length in `unit` that is as fine as `digits` decimals of a millimetre, or a little finer. */
export const digitsIn = (unit: LengthUnit, digits: number): number =>
  unit === 'in' ? digits + EXTRA_INCH_DIGITS : digits;

/** `lengthMm` as it stands in a sentence, with its unit; `digits` counts decimals of a millimetre, inches get two more. */
export const lengthText = (lengthMm: number, unit: LengthUnit, digits = 3): string =>
  `${(lengthMm / mmPer(unit)).toFixed(digitsIn(unit, digits))} ${unit}`;
