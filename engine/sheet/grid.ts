import type { Outcome } from '../outcome.ts';
import { none, some } from '../outcome.ts';
import { digitsIn, type LengthUnit, mmPer } from '../units.ts';
import type { Cell, SheetOptions } from './table.ts';
import { absentCell, numberCell } from './table.ts';

const MOST_DIGITS = 6;

/** Lengths as whole numbers of the last printed digit, so that sums and differences are exact. */
export interface Grid {
  readonly unit: LengthUnit;
  /** Behind the decimal point, in the unit. */
  readonly digits: number;
  /** The whole number of steps nearest to a length in mm, halves away from zero; absent when too long to be counted exactly. */
  readonly stepsOf: (mm: number) => Outcome<number, 'too long to print'>;
  /** A number of steps in mm. */
  readonly mmOf: (steps: number) => number;
  /** The cell that prints a number of steps in the unit, or the reason. */
  readonly cellOf: (steps: Outcome<number>) => Cell;
  /** The cell that prints a length in mm in the unit, or the reason. */
  readonly lengthCellOf: (mm: Outcome<number>) => Cell;
}

/** The grid of printed lengths. Throws a RangeError when the number of digits is not a whole number from 0 to 6. */
export function gridOf(options: SheetOptions): Grid {
  if (!Number.isInteger(options.digits) || options.digits < 0 || options.digits > MOST_DIGITS) {
    throw new RangeError(
      `gridOf: digits must be a whole number from 0 to ${MOST_DIGITS}, not ${options.digits}`,
    );
  }
  const unitMm = mmPer(options.unit);
  const digits = digitsIn(options.unit, options.digits);
  const stepsPerUnit = 10 ** digits;
  const stepsOf: Grid['stepsOf'] = (mm) => {
    const steps = Math.sign(mm) * Math.round((Math.abs(mm) / unitMm) * stepsPerUnit);
    return Number.isSafeInteger(steps) ? some(steps) : none('too long to print');
  };
  const cellOf: Grid['cellOf'] = (steps) =>
    steps.ok ? numberCell(steps.value / stepsPerUnit, digits) : absentCell(steps.why);
  return {
    unit: options.unit,
    digits,
    stepsOf,
    mmOf: (steps) => (steps / stepsPerUnit) * unitMm,
    cellOf,
    lengthCellOf: (mm) => cellOf(mm.ok ? stepsOf(mm.value) : mm),
  };
}
