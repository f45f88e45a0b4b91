/** The units a length can be shown in. The sketch itself is always in mm. */
export type LengthUnit = 'mm' | 'in';

/** Exact by definition of the inch. */
export const MM_PER_INCH = 25.4;

/** An inch is shown about as finely as a millimetre with two digits fewer. */
export const EXTRA_INCH_DIGITS = 2;

/** `lengthMm` as it stands in a sentence, with its unit; `digits` counts decimals of a millimetre, inches get two more. */
export const lengthText = (lengthMm: number, unit: LengthUnit, digits = 3): string =>
  unit === 'mm'
    ? `${lengthMm.toFixed(digits)} mm`
    : `${(lengthMm / MM_PER_INCH).toFixed(digits + EXTRA_INCH_DIGITS)} in`;
