import { describe, expect, it } from 'vitest';
import { newViewport, type Viewport, xOf } from '../../../app/board/viewport.ts';
import { manyOnScreen, onScreen } from '../../../app/drawing/project.ts';

const view: Viewport = { ...newViewport(800, 400), originMm: -100, pxPerMm: 2, stretch: 3 };
const folded: Viewport = { ...view, fold: { fromMm: -500, toMm: -40, widthPx: 18 } };

describe('a line on screen', () => {
  it('is scaled apart in length and height', () => {
    expect([...onScreen(view, Float64Array.of(-100, 0, 0, 10))]).toEqual([0, 200, 200, 140]);
  });

  it('that comes from beyond a fold begins where the fold ends, on its own straight line', () => {
    const points = onScreen(folded, Float64Array.of(-500, 0, 0, 10, 50, 10));
    expect(points[0]).toBe(xOf(folded, -40));
    expect(points[1]).toBeCloseTo(200 - (10 * 460 * 6) / 500, 9);
    expect(points[2]).toBe(xOf(folded, 0));
  });

  it('that begins behind the fold is drawn whole', () => {
    expect(onScreen(folded, Float64Array.of(-30, 1, 0, 2))[0]).toBe(xOf(folded, -30));
  });
});

describe('several lines on screen', () => {
  it('are laid behind each other, with the place where each begins', () => {
    const { points, starts } = manyOnScreen(view, [
      Float64Array.of(-100, 0, 0, 0),
      Float64Array.of(0, 0, 50, 1, 100, 0),
    ]);
    expect([...points]).toEqual([0, 200, 200, 200, 200, 200, 300, 194, 400, 200]);
    expect(starts).toEqual([0, 2]);
  });

  it('may be none', () =>
    expect(manyOnScreen(view, [])).toEqual({ points: new Float64Array(0), starts: [] }));
});
