import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  distanceTo,
  type Grip,
  gripsAt,
  MOUSE_RADIUS_PX,
  TOUCH_RADIUS_PX,
} from '../../../app/board/grips.ts';
import { SEED } from './generators.ts';

type Place = Pick<Grip, 'id' | 'order' | 'xPx' | 'yPx' | 'line'>;

const point = (id: string, order: number, xPx: number, yPx: number): Place => ({
  id,
  order,
  xPx,
  yPx,
  line: null,
});
const upright = (id: string, order: number, xPx: number, topPx: number, bottomPx: number): Place => ({
  id,
  order,
  xPx,
  yPx: (topPx + bottomPx) / 2,
  line: { topPx, bottomPx },
});
const ids = (grips: readonly Place[]): readonly string[] => grips.map((grip) => grip.id);

describe('taking a grip', () => {
  it('takes the nearest one within the radius', () => {
    const grips = [point('far', 1, 0, 11), point('near', 9, 1, 0)];
    expect(ids(gripsAt(grips, 0, 0, MOUSE_RADIUS_PX))).toEqual(['near', 'far']);
    expect(gripsAt(grips, 100, 0, MOUSE_RADIUS_PX)).toEqual([]);
  });

  it('reaches further by touch than with a mouse', () => {
    const grips = [point('only', 1, 0, 20)];
    expect(gripsAt(grips, 0, 0, MOUSE_RADIUS_PX)).toHaveLength(0);
    expect(gripsAt(grips, 0, 0, TOUCH_RADIUS_PX)).toHaveLength(1);
  });

  it('ranks grips that are about as near by their order', () => {
    const grips = [point('sensor', 7, 0, 2), point('field end', 5, 0, -4), point('part', 6, 0, 0)];
    expect(ids(gripsAt(grips, 0, 0, MOUSE_RADIUS_PX))).toEqual(['field end', 'part', 'sensor']);
  });

  it('lets the rim of a part be taken at the end of the part’s own line', () => {
    const grips = [upright('part', 6, 50, 0, 100), point('rim', 4, 50, 0)];
    expect(ids(gripsAt(grips, 50, 4, MOUSE_RADIUS_PX))[0]).toBe('rim');
    expect(ids(gripsAt(grips, 50, 40, MOUSE_RADIUS_PX))[0]).toBe('part');
  });

  it('measures a line grip from the whole of its line and no further', () => {
    const line = upright('part', 6, 50, 0, 100);
    expect(distanceTo(line, 53, 80)).toBe(3);
    expect(distanceTo(line, 53, 104)).toBe(5);
  });

  it('lists every grip within the radius once and no other, whatever the order', () => {
    const anyGrip = fc
      .record({
        xPx: fc.integer({ min: -30, max: 30 }),
        yPx: fc.integer({ min: -30, max: 30 }),
        order: fc.integer({ min: 1, max: 10 }),
        half: fc.option(fc.integer({ min: 1, max: 40 })),
      })
      .map(({ xPx, yPx, order, half }) => ({
        id: '',
        xPx,
        yPx,
        order,
        line: half === null ? null : { topPx: yPx - half, bottomPx: yPx + half },
      }));
    fc.assert(
      fc.property(fc.array(anyGrip, { maxLength: 12 }), (grips) => {
        const near = gripsAt(grips, 0, 0, MOUSE_RADIUS_PX);
        expect(new Set(near)).toEqual(new Set(grips.filter((g) => distanceTo(g, 0, 0) <= MOUSE_RADIUS_PX)));
        const first = near[0];
        if (first === undefined) return;
        const least = Math.min(...near.map((g) => distanceTo(g, 0, 0)));
        expect(distanceTo(first, 0, 0)).toBeLessThanOrEqual(least + MOUSE_RADIUS_PX / 2);
      }),
      SEED,
    );
  });
});
