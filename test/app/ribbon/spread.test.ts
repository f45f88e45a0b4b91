import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { type RowWish, spread } from '../../../app/ribbon/spread.ts';

const APART_PX = 10;
/** Sums of a few dozen px leave less than this, px. */
const ROUNDING_PX = 1e-9;

const wish = (atPx: number, halfPx = 20): RowWish => ({ atPx, halfPx });
const wide = (wishes: readonly RowWish[]) => spread(wishes, APART_PX, -1e6, 1e6);

describe('things in a row', () => {
  it('stand where they wish when there is room', () => {
    expect(wide([wish(0), wish(50), wish(200)])).toEqual([0, 50, 200]);
    expect(spread([], APART_PX, 0, 100)).toEqual([]);
  });

  it('give way to each other evenly', () => {
    expect(wide([wish(100), wish(110)])).toEqual([80, 130]);
    expect(wide([wish(100), wish(100), wish(100)])).toEqual([50, 100, 150]);
  });

  it('stay on the sheet', () => {
    expect(spread([wish(5), wish(10)], APART_PX, 0, 300)).toEqual([20, 70]);
    expect(spread([wish(290), wish(295)], APART_PX, 0, 300)).toEqual([230, 280]);
  });

  it('keep their order and their distance, whatever they wish', () => {
    const anyWish = fc.record({
      atPx: fc.integer({ min: 0, max: 400 }),
      halfPx: fc.integer({ min: 5, max: 60 }),
    });
    fc.assert(
      fc.property(fc.array(anyWish, { maxLength: 12 }), (wishes) => {
        const sorted = [...wishes].sort((a, b) => a.atPx - b.atPx);
        const places = spread(sorted, APART_PX, 0, 400);
        for (let i = 1; i < sorted.length; i++) {
          const needed = (sorted[i - 1]?.halfPx ?? 0) + APART_PX + (sorted[i]?.halfPx ?? 0);
          expect((places[i] ?? 0) - (places[i - 1] ?? 0)).toBeGreaterThanOrEqual(needed - ROUNDING_PX);
        }
        expect((places[0] ?? 1e6) - (sorted[0]?.halfPx ?? 0)).toBeGreaterThanOrEqual(-ROUNDING_PX);
      }),
    );
  });
});
