import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  heightOf,
  newViewport,
  PX_PER_MM_LIMITS,
  panBy,
  refolded,
  resized,
  STRETCH_LIMITS,
  stretchBy,
  type Viewport,
  visibleRange,
  xOf,
  yOf,
  zOf,
  zoomAbout,
} from '../../../app/board/viewport.ts';
import { anyFactor, anyLengthMm, anyPx, anyViewport, SEED } from './generators.ts';

const plain: Viewport = { ...newViewport(1000, 600), originMm: -100, pxPerMm: 5, stretch: 2 };
const folded: Viewport = { ...plain, originMm: -500, fold: { fromMm: -480, toMm: -40, widthPx: 20 } };

/** Rounding of lengths up to 10⁴ mm at up to 10² px/mm: some 10⁶ px times a few units in the last place. */
const ROUNDING_PX = 1e-8;

describe('a view of a drawn sheet', () => {
  it('puts lengths to the right and heights upwards', () => {
    expect(xOf(plain, -100)).toBe(0);
    expect(xOf(plain, 0)).toBe(500);
    expect(yOf(plain, 0)).toBe(300);
    expect(yOf(plain, 10)).toBe(200);
    expect(heightOf(plain, 100)).toBe(20);
  });

  it('draws a folded space in its own narrow width and everything else to scale', () => {
    expect(xOf(folded, -480)).toBe(100);
    expect(xOf(folded, -40)).toBe(120);
    expect(xOf(folded, -260)).toBe(110);
    expect(xOf(folded, 0)).toBe(320);
    expect(zOf(folded, 115)).toBeCloseTo(-150, 10);
  });

  it('can begin inside the fold', () => {
    const inside = { ...folded, originMm: -260 };
    expect(xOf(inside, -40)).toBeCloseTo(10, 10);
    expect(xOf(inside, 0)).toBeCloseTo(210, 10);
  });

  it('says which lengths are in view', () => {
    expect(visibleRange(plain)).toEqual({ fromMm: -100, toMm: 100 });
  });

  it('finds the length and height of every point it draws, and the point of every length and height', () => {
    fc.assert(
      fc.property(anyViewport(), anyLengthMm(), anyPx(), (view, mm, px) => {
        expect(Math.abs(xOf(view, zOf(view, px)) - px)).toBeLessThan(ROUNDING_PX);
        expect(Math.abs(yOf(view, heightOf(view, px)) - px)).toBeLessThan(ROUNDING_PX);
        expect(Math.abs(xOf(view, zOf(view, xOf(view, mm))) - xOf(view, mm))).toBeLessThan(ROUNDING_PX);
        expect(heightOf(view, yOf(view, mm))).toBeCloseTo(mm, 6);
      }),
      SEED,
    );
  });

  it('never turns the order of two lengths round, folded or not', () => {
    fc.assert(
      fc.property(
        anyViewport(),
        anyLengthMm(),
        fc.double({ min: 1e-3, max: 1e4, noNaN: true }),
        (view, z, more) => {
          expect(xOf(view, z + more)).toBeGreaterThan(xOf(view, z));
        },
      ),
      SEED,
    );
  });
});

describe('panning', () => {
  it('moves every point by the same px', () => {
    fc.assert(
      fc.property(anyViewport(), anyLengthMm(), anyPx(), anyPx(), (view, z, dx, dy) => {
        const panned = panBy(view, dx, dy);
        expect(Math.abs(xOf(panned, z) - xOf(view, z) - dx)).toBeLessThan(ROUNDING_PX);
        expect(yOf(panned, 3) - yOf(view, 3)).toBeCloseTo(dy, 8);
      }),
      SEED,
    );
  });

  it('by nothing gives the same view', () => {
    expect(panBy(plain, 0, 0)).toBe(plain);
  });
});

describe('zooming', () => {
  it('keeps the length and the height under the pointer, and the stretch', () => {
    fc.assert(
      fc.property(anyViewport(), anyPx(), anyPx(), anyFactor(), (view, x, y, factor) => {
        const zoomed = zoomAbout(view, x, factor, y);
        expect(Math.abs(xOf(zoomed, zOf(view, x)) - x)).toBeLessThan(ROUNDING_PX);
        expect(Math.abs(yOf(zoomed, heightOf(view, y)) - y)).toBeLessThan(ROUNDING_PX);
        expect(zoomed.stretch).toBe(view.stretch);
      }),
      SEED,
    );
  });

  it('leaves the axis where it is when no height is given', () => {
    expect(zoomAbout(plain, 200, 3).axisYPx).toBe(plain.axisYPx);
  });

  it('stops at the limits, and there changes nothing more', () => {
    const near = zoomAbout(plain, 500, 1e9);
    expect(near.pxPerMm).toBe(PX_PER_MM_LIMITS.most);
    expect(zoomAbout(near, 500, 2)).toBe(near);
    expect(zoomAbout(plain, 500, 1e-9).pxPerMm).toBe(PX_PER_MM_LIMITS.least);
  });

  it.each([0, -1, Number.NaN, Number.POSITIVE_INFINITY])('by %s does nothing', (factor) => {
    expect(zoomAbout(plain, 10, factor)).toBe(plain);
    expect(stretchBy(plain, factor)).toBe(plain);
  });
});

describe('stretching the heights', () => {
  it('leaves lengths alone and stops at the limits', () => {
    const tall = stretchBy(plain, 3);
    expect(tall.stretch).toBe(6);
    expect(xOf(tall, 12)).toBe(xOf(plain, 12));
    expect(yOf(tall, 0)).toBe(yOf(plain, 0));
    expect(stretchBy(plain, 1e9).stretch).toBe(STRETCH_LIMITS.most);
  });
});

describe('another size or fold', () => {
  it('keeps the middle in the middle when the sheet is resized', () => {
    const wide = resized(plain, 1400, 300);
    expect(zOf(wide, 700)).toBeCloseTo(zOf(plain, 500), 10);
    expect(wide.axisYPx).toBe(150);
    expect(resized(plain, 1000, 600)).toBe(plain);
  });

  it('puts the axis half-way down a sheet that had no height', () => {
    expect(resized(newViewport(0, 0), 800, 400).axisYPx).toBe(200);
  });

  it('keeps a chosen point in place when a space is folded or opened', () => {
    const fold = { fromMm: -480, toMm: -40, widthPx: 20 };
    const closed = refolded(plain, fold, xOf(plain, 30));
    expect(xOf(closed, 30)).toBeCloseTo(xOf(plain, 30), 10);
    expect(refolded(closed, null, xOf(closed, 30)).originMm).toBeCloseTo(plain.originMm, 9);
  });
});
