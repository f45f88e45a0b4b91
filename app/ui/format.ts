import type { LengthUnit, Outcome } from '../../engine/index.ts';
import { digitsIn, mmPer } from '../../engine/index.ts';

const MINUS = '\u2212';
/** From here on a fixed number of decimals only widens the column. */
const POWER_OF_TEN_FROM = 1e7;
const SUPERSCRIPTS = '⁰¹²³⁴⁵⁶⁷⁸⁹';

/**
 * `value` with exactly `digits` decimals and a real minus sign; never "−0", never "NaN". Values of ten million and more are
 * written as a power of ten, an infinite one as ∞, and one that is not a number as a dash.
 */
export function formatNumber(value: number, digits: number): string {
  if (Number.isNaN(value)) return '–';
  if (!Number.isFinite(value)) return value > 0 ? '∞' : `${MINUS}∞`;
  if (Math.abs(value) >= POWER_OF_TEN_FROM) return asPowerOfTen(value, digits);
  const fixed = Math.abs(value).toFixed(digits);
  return value < 0 && Number(fixed) !== 0 ? MINUS + fixed : fixed;
}

function asPowerOfTen(value: number, digits: number): string {
  const [mantissa = '', exponent = ''] = Math.abs(value).toExponential(Math.min(digits, 3)).split('e+');
  const raised = [...exponent].map((digit) => SUPERSCRIPTS[Number(digit)]).join('');
  return `${value < 0 ? MINUS : ''}${mantissa}×10${raised}`;
}

/**
 * A length given in mm as a number in `unit`, without the unit. `digits` counts decimals of a millimetre (3 unless said);
 * inches get two more, which is the same fineness.
 */
export function formatLength(lengthMm: number, unit: LengthUnit, digits = 3): string {
  return formatNumber(lengthMm / mmPer(unit), digitsIn(unit, digits));
}

/** The outcome's value as `format` writes it, or the reason why there is none. */
export function formatOutcome<T>(outcome: Outcome<T>, format: (value: T) => string): string {
  return outcome.ok ? format(outcome.value) : outcome.why;
}
