import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { type LabelWish, overlaps, placeLabels } from '../../../app/board/labels.ts';
import { SEED } from './generators.ts';

const bounds = { xPx: 0, yPx: 0, widthPx: 1000, heightPx: 600 };
const wish = (id: string, xPx: number, change: Partial<LabelWish> = {}): LabelWish => ({
  id,
  xPx,
  yPx: 300,
  widthPx: 60,
  heightPx: 16,
  priority: 1,
  sides: ['above', 'below', 'above right', 'above left'],
  ...change,
});

describe('placing labels', () => {
  it('puts a lone label on the side it likes best', () => {
    expect(placeLabels([wish('a', 100)], { bounds })[0]).toMatchObject({
      xPx: 70,
      yPx: 280,
      side: 'above',
      step: 0,
    });
  });

  it.each([
    ['left', 36, 292],
    ['right', 104, 292],
    ['below', 70, 304],
    ['above right', 100, 280],
    ['below left', 40, 304],
  ] as const)('stands %s of its point at the wished distance', (side, xPx, yPx) => {
    expect(placeLabels([wish('a', 100, { sides: [side] })], { bounds })[0]).toMatchObject({ xPx, yPx });
  });

  it('lets the more important of two neighbours have its place and moves the other', () => {
    const [first, second] = placeLabels([wish('a', 100), wish('b', 120, { priority: 5 })], { bounds });
    expect(second?.side).toBe('above');
    expect(first?.side).toBe('below');
  });

  it('staggers outwards when every side is taken', () => {
    const crowd = ['a', 'b', 'c'].map((id) => wish(id, 100, { sides: ['above'] }));
    const steps = placeLabels(crowd, { bounds, apartPx: 0 }).map((place) => place.step);
    expect(steps).toEqual([0, 1, 2]);
  });

  it('keeps clear of obstacles and of the edge of the sheet', () => {
    const obstacles = [{ xPx: 60, yPx: 270, widthPx: 80, heightPx: 28 }];
    expect(placeLabels([wish('a', 100)], { bounds, obstacles })[0]?.side).toBe('below');
    expect(placeLabels([wish('a', 100, { yPx: 5 })], { bounds })[0]?.side).toBe('below');
    expect(placeLabels([wish('a', 10)], { bounds })[0]?.side).toBe('above right');
  });

  it('says so when a label finds no room', () => {
    const tight = { xPx: 0, yPx: 0, widthPx: 10, heightPx: 10 };
    expect(placeLabels([wish('a', 5, { yPx: 5 })], { bounds: tight })[0]?.crowded).toBe(true);
  });

  it('leaves a pointed-at label on its side while its neighbour comes near', () => {
    const before = placeLabels([wish('a', 100), wish('b', 300, { priority: 5 })], { bounds });
    const near = [wish('a', 100), wish('b', 110, { priority: 5 })];
    expect(placeLabels(near, { bounds, former: before })[0]?.side).toBe('below');
    const kept = placeLabels(near, { bounds, former: before, frozen: new Set(['a']) });
    expect(kept.map((place) => place.side)).toEqual(['above', 'below']);
  });

  it('leaves a pointed-at label where it dodged to, also when its better side is free again', () => {
    const before = placeLabels([wish('a', 100), wish('b', 110, { priority: 5 })], { bounds });
    const alone = placeLabels([wish('a', 100)], { bounds, former: before, frozen: new Set(['a']) });
    expect([before[0]?.side, alone[0]?.side]).toEqual(['below', 'below']);
  });

  it('rather takes another side than cover a line, but stays beside its point', () => {
    const line = { xPx: 99, yPx: 200, widthPx: 2, heightPx: 90 };
    expect(placeLabels([wish('a', 100)], { bounds, lines: [line] })[0]).toMatchObject({
      side: 'below',
      step: 0,
    });
    const only = wish('a', 100, { sides: ['above'] });
    expect(placeLabels([only], { bounds, lines: [line] })[0]).toMatchObject({ side: 'above', step: 0 });
  });

  it('keeps labels side by side so far apart that they do not read as one', () => {
    const pair = [wish('a', 100, { sides: ['right'] }), wish('b', 170, { sides: ['right'] })];
    const stepOf = (asidePx: number) => placeLabels(pair, { bounds, asidePx })[1]?.step;
    expect([stepOf(8), stepOf(12)]).toEqual([0, 1]);
  });

  it('goes to a further point where the first has no room', () => {
    const obstacles = [{ xPx: 0, yPx: 200, widthPx: 300, heightPx: 300 }];
    const spread = wish('a', 100, { otherwise: [{ xPx: 400, yPx: 100, sides: ['right'] }] });
    expect(placeLabels([spread], { bounds, obstacles })[0]).toMatchObject({
      point: 1,
      side: 'right',
      xPx: 404,
    });
  });

  it('lets a frozen label dodge when it would cover another', () => {
    const before = placeLabels([wish('a', 100), wish('b', 300)], { bounds });
    const frozen = new Set(['a', 'b']);
    const [one, other] = placeLabels([wish('a', 100), wish('b', 110)], { bounds, former: before, frozen });
    expect([one?.side, other?.side]).toEqual(['above', 'below']);
  });

  it('gives what finds no room no room of others', () => {
    const crowd = Array.from({ length: 30 }, (_, i) => wish(`${i}`, 100));
    const placed = placeLabels(crowd, { bounds }).filter(({ crowded }) => !crowded);
    expect(placed.length).toBeLessThan(crowd.length);
    for (const [i, one] of placed.entries())
      for (const other of placed.slice(i + 1)) expect(overlaps(one, other)).toBe(false);
  });

  it('answers in the order of the wishes and never covers a label while there is room', () => {
    const spots = fc.uniqueArray(fc.integer({ min: 1, max: 12 }), { minLength: 1, maxLength: 12 });
    fc.assert(
      fc.property(spots, fc.infiniteStream(fc.integer({ min: 0, max: 3 })), (at, ranks) => {
        const wishes = at.map((i) => wish(`${i}`, 40 + 25 * i, { priority: ranks.next().value }));
        const places = placeLabels(wishes, { bounds });
        expect(places.map((place) => place.id)).toEqual(wishes.map((w) => w.id));
        for (const [i, one] of places.entries())
          for (const other of places.slice(i + 1)) expect(overlaps(one, other)).toBe(false);
      }),
      SEED,
    );
  });

  it('gives the same places for the same wishes', () => {
    const wishes = [wish('a', 100), wish('b', 105), wish('c', 90, { priority: 3 })];
    expect(placeLabels(wishes, { bounds })).toEqual(placeLabels(wishes, { bounds }));
  });
});
