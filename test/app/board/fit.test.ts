import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { fitted, foldOf, gridLengths, keyStepMm, scaleBar } from '../../../app/board/fit.ts';
import { newViewport, xOf, yOf } from '../../../app/board/viewport.ts';
import { anyViewport, SEED } from './generators.ts';

const margins = { left: 40, right: 60, top: 30, bottom: 50 };
const sheet = newViewport(1100, 680);

describe('fitting a layout into the sheet', () => {
  it('fills the width between the margins and stands the axis half-way between top and bottom', () => {
    const view = fitted(sheet, { fromMm: 0, toMm: 100, maxHeightMm: 20 }, margins);
    expect(xOf(view, 0)).toBeCloseTo(40, 9);
    expect(xOf(view, 100)).toBeCloseTo(1040, 9);
    expect(view.axisYPx).toBe(330);
  });

  it('stretches the heights to a plain figure that still fits', () => {
    // 600 px high, 10 px/mm: ±20 mm would allow 1.5, ±17 mm 1.76.
    expect(fitted(sheet, { fromMm: 0, toMm: 100, maxHeightMm: 20 }, margins).stretch).toBe(1.5);
    expect(fitted(sheet, { fromMm: 0, toMm: 100, maxHeightMm: 17 }, margins).stretch).toBe(1.75);
  });

  it('draws a very tall layout smaller and in the middle rather than flat', () => {
    const view = fitted(sheet, { fromMm: 0, toMm: 100, maxHeightMm: 500 }, margins);
    expect(view.stretch).toBe(0.25);
    expect(yOf(view, 500)).toBeCloseTo(30, 9);
    expect(xOf(view, 50)).toBeCloseTo(540, 9);
  });

  it('draws a folded space at its own width and scales the rest', () => {
    const fold = { fromMm: -500, toMm: -40, widthPx: 20 };
    const view = fitted({ ...sheet, fold }, { fromMm: -500, toMm: 110, maxHeightMm: 10 }, margins);
    expect(xOf(view, -500)).toBeCloseTo(40, 9);
    expect(xOf(view, -40)).toBeCloseTo(60, 9);
    expect(xOf(view, 110)).toBeCloseTo(1040, 9);
  });

  it('counts only the piece of a fold that is in range', () => {
    const fold = { fromMm: -500, toMm: -100, widthPx: 20 };
    const view = fitted({ ...sheet, fold }, { fromMm: -300, toMm: 110, maxHeightMm: 10 }, margins);
    expect(xOf(view, -300)).toBeCloseTo(40, 9);
    expect(xOf(view, 110)).toBeCloseTo(1040, 9);
  });

  it('always keeps both ends and the greatest height inside the margins', () => {
    const range = fc.record({
      fromMm: fc.double({ min: -1000, max: 1000, noNaN: true }),
      lengthMm: fc.double({ min: 1, max: 2000, noNaN: true }),
      maxHeightMm: fc.double({ min: 0.5, max: 300, noNaN: true }),
    });
    fc.assert(
      fc.property(anyViewport(), range, ({ fold }, { fromMm, lengthMm, maxHeightMm }) => {
        const ends = { fromMm, toMm: fromMm + lengthMm, maxHeightMm };
        const view = fitted({ ...sheet, fold }, ends, margins);
        expect(xOf(view, ends.fromMm)).toBeGreaterThan(margins.left - 1e-6);
        expect(xOf(view, ends.toMm)).toBeLessThan(sheet.widthPx - margins.right + 1e-6);
        expect(yOf(view, maxHeightMm)).toBeGreaterThan(margins.top - 1e-6);
      }),
      SEED,
    );
  });

  it('keeps the scale and centres a range without length', () => {
    const view = fitted({ ...sheet, pxPerMm: 4 }, { fromMm: 7, toMm: 7, maxHeightMm: 0 }, margins);
    expect(view.pxPerMm).toBe(4);
    expect(view.stretch).toBe(1);
    expect(xOf(view, 7)).toBeCloseTo(540, 9);
  });

  it('gives finite numbers on a sheet smaller than its margins', () => {
    const view = fitted(newViewport(50, 20), { fromMm: 0, toMm: 100, maxHeightMm: 5 }, margins);
    expect(Object.values(view).every((value) => value === null || Number.isFinite(value))).toBe(true);
  });
});

describe('folding a long space', () => {
  it('keeps a piece beside the parts and folds the rest up to the object', () => {
    expect(foldOf({ fromMm: -500, toMm: 0 }, 110)).toEqual({ fromMm: -500, toMm: -44, widthPx: 18 });
  });

  it('folds a long image space the other way round', () => {
    expect(foldOf({ fromMm: 50, toMm: 3000 }, 50, 'start')).toEqual({ fromMm: 70, toMm: 3000, widthPx: 18 });
  });

  it.each([
    ['a short space', { fromMm: -100, toMm: 0 }, 110],
    ['an object at infinity', { fromMm: Number.NEGATIVE_INFINITY, toMm: 0 }, 110],
    ['a space that runs backwards', { fromMm: 20, toMm: 0 }, 110],
    ['a layout without length', { fromMm: -100, toMm: 0 }, 0],
  ])('does not fold %s', (_name, space, restMm) => {
    expect(foldOf(space, restMm)).toBeNull();
  });
});

describe('round lengths', () => {
  it('shows a bar of 1, 2 or 5 that is nearly as wide as allowed', () => {
    expect(scaleBar({ ...sheet, pxPerMm: 6 })).toEqual({ length: 10, widthPx: 60 });
    expect(scaleBar({ ...sheet, pxPerMm: 11 }, 110)).toEqual({ length: 10, widthPx: 110 });
    expect(scaleBar({ ...sheet, pxPerMm: 22 }, 110)).toEqual({ length: 5, widthPx: 110 });
    expect(scaleBar({ ...sheet, pxPerMm: 700 })).toEqual({ length: 0.1, widthPx: 70 });
    expect(scaleBar({ ...sheet, pxPerMm: 6 }, 110, 25.4)).toEqual({
      length: 0.5,
      widthPx: 76.19999999999999,
    });
  });

  it('never shows a bar wider than allowed nor narrower than two fifths of it', () => {
    fc.assert(
      fc.property(fc.double({ min: -4, max: 3.3, noNaN: true }), (decade) => {
        const { length, widthPx } = scaleBar({ ...sheet, pxPerMm: 10 ** decade }, 100);
        expect(widthPx).toBeLessThanOrEqual(100 * (1 + 1e-12));
        expect(widthPx).toBeGreaterThanOrEqual(40 * (1 - 1e-12));
        expect([1, 2, 5]).toContain(Number(length.toExponential().split('e')[0]));
      }),
      SEED,
    );
  });

  it.each([
    [5, 1],
    [50, 0.1],
    [500, 0.01],
    [2000, 0.001],
    [0.001, 1],
  ])('steps by keys at %s px/mm in steps of %s mm', (pxPerMm, stepMm) => {
    expect(keyStepMm({ ...sheet, pxPerMm })).toBe(stepMm);
  });

  it.each([
    [5, 0.01],
    [50, 0.001],
    [2000, 0.0001],
    [0.001, 1],
  ])('steps in inches at %s px/mm in steps of %s in', (pxPerMm, stepInch) => {
    expect(keyStepMm({ ...sheet, pxPerMm }, 25.4)).toBeCloseTo(25.4 * stepInch, 12);
  });

  it('rules the sheet at round lengths outside the fold', () => {
    const view = { ...sheet, pxPerMm: 5, fold: { fromMm: -90, toMm: -30, widthPx: 20 } };
    expect(gridLengths(view, { fromMm: -105, toMm: 45 }, 100)).toEqual([-100, -20, 0, 20, 40]);
  });
});
