import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { gridOf } from '../../../engine/sheet/grid.ts';
import type { SheetOptions } from '../../../engine/sheet/table.ts';
import { given } from '../quantity.ts';

const options = (digits: number, unit: SheetOptions['unit'] = 'mm'): SheetOptions => ({
  datum: 'first part',
  digits,
  unit,
});

describe('the grid of printed lengths', () => {
  it('counts whole steps of the last digit', () => {
    expect(gridOf(options(3)).stepsOf(41.2187245423499)).toEqual({ ok: true, value: 41219 });
  });

  it('rounds halves away from zero on both sides', () => {
    const grid = gridOf(options(0));
    expect([2.5, -2.5, 3.5, -3.5].map((mm) => given(grid.stepsOf(mm)))).toEqual([3, -3, 4, -4]);
  });

  it('takes an inch as 25.4 mm exactly and gives it two more digits', () => {
    const grid = gridOf(options(3, 'in'));
    expect(grid.cellOf(grid.stepsOf(25.4))).toEqual({ kind: 'number', value: 1, digits: 5 });
    expect(grid.cellOf(grid.stepsOf(17.526))).toEqual({ kind: 'number', value: 0.69, digits: 5 });
  });

  it('shows no sign before a nought', () => {
    expect(gridOf(options(2)).lengthCellOf({ ok: true, value: -0.004 })).toEqual({
      kind: 'number',
      value: 0,
      digits: 2,
    });
    const cell = gridOf(options(2)).lengthCellOf({ ok: true, value: -0.004 });
    expect(cell.kind === 'number' && Object.is(cell.value, 0)).toBe(true);
  });

  it('says so when a length has more digits than can be counted', () => {
    const grid = gridOf(options(6));
    expect(grid.stepsOf(1e12)).toEqual({ ok: false, why: 'too long to print' });
    expect(grid.lengthCellOf({ ok: true, value: -1e12 })).toEqual({
      kind: 'absent',
      why: 'too long to print',
    });
  });

  it('hands on the reason of a length that does not exist', () => {
    expect(gridOf(options(3)).lengthCellOf({ ok: false, why: 'afocal' })).toEqual({
      kind: 'absent',
      why: 'afocal',
    });
  });

  it.each([-1, 7, 2.5, Number.NaN])('refuses %s digits, naming the number', (digits) => {
    expect(() => gridOf(options(digits))).toThrow(`not ${digits}`);
  });

  it('is never farther off than half a step, and counts its own lengths back exactly', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -1e6, max: 1e6, noNaN: true }),
        fc.integer({ min: 0, max: 6 }),
        fc.constantFrom('mm' as const, 'in' as const),
        (mm, digits, unit) => {
          const grid = gridOf(options(digits, unit));
          const steps = given(grid.stepsOf(mm));
          const stepMm = grid.mmOf(1);
          expect(Math.abs(grid.mmOf(steps) - mm)).toBeLessThanOrEqual(stepMm / 2 + ROUNDING * Math.abs(mm));
          expect(grid.stepsOf(grid.mmOf(steps))).toEqual({ ok: true, value: steps });
        },
      ),
    );
  });
});

/** Two roundings of a double, relative. */
const ROUNDING = 4 * Number.EPSILON;
