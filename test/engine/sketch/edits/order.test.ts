import { fc, test } from '@fast-check/vitest';
import { describe, expect } from 'vitest';
import { flipParts, reorderPart } from '../../../../engine/sketch/edits/order.ts';
import { setRoom } from '../../../../engine/sketch/edits/parts.ts';
import { anySketch } from '../arbitrary.ts';
import { gapsOf, id, idsOf, row } from '../layout.ts';

describe('reordering', () => {
  test('lets the parts change places and the spaces stay', () => {
    const sketch = reorderPart(row(10, 20, 30), id('p3'), 0);
    expect(idsOf(sketch)).toEqual(['p3', 'p1', 'p2']);
    expect(gapsOf(sketch)).toEqual([10, 20, 30]);
  });

  test('stops at the ends of the list', () => {
    expect(idsOf(reorderPart(row(1, 1, 1), id('p1'), 99))).toEqual(['p2', 'p3', 'p1']);
    expect(idsOf(reorderPart(row(1, 1, 1), id('p3'), -5))).toEqual(['p3', 'p1', 'p2']);
  });

  test('to the same place changes nothing', () => {
    const sketch = row(1, 1, 1);
    expect(reorderPart(sketch, id('p2'), 1)).toBe(sketch);
    expect(reorderPart(sketch, id('p9'), 1)).toBe(sketch);
    expect(reorderPart(sketch, id('p2'), Number.NaN)).toBe(sketch);
  });
});

describe('turning a run of parts round', () => {
  test('reverses the parts and the spaces between them, in place', () => {
    const sketch = flipParts(row(10, 20, 30, 40), [id('p2'), id('p4')]);
    expect(idsOf(sketch)).toEqual(['p1', 'p4', 'p3', 'p2']);
    expect(gapsOf(sketch)).toEqual([10, 30, 20, 40]);
  });

  test('reverses the whole layout', () => {
    const sketch = flipParts(row(10, 20, 30), [id('p1'), id('p2'), id('p3')]);
    expect(idsOf(sketch)).toEqual(['p3', 'p2', 'p1']);
    expect(gapsOf(sketch)).toEqual([20, 10, 30]);
  });

  test('swaps the room in front and behind, and keeps a riding stop on its part', () => {
    const sketch = flipParts({ ...setRoom(row(10, 20), id('p1'), 'front', 3), stop: id('p1') }, [id('p1')]);
    expect(sketch.parts[0]).toMatchObject({ roomFrontMm: 0, roomBehindMm: 3 });
    expect(sketch.stop).toBe('p1');
  });

  test('changes nothing for one part that is the same from both sides', () => {
    const sketch = row(10, 20);
    expect(flipParts(sketch, [id('p1')])).toBe(sketch);
    expect(flipParts(sketch, [id('p9')])).toBe(sketch);
  });

  test.prop([anySketch({ leastParts: 1 }), fc.nat(), fc.nat()])(
    'twice gives the layout back',
    (sketch, from, to) => {
      const ids = [from, to].map((pick) => sketch.parts[pick % sketch.parts.length]?.id ?? id('p1'));
      expect(flipParts(flipParts(sketch, ids), ids)).toEqual(sketch);
    },
  );
});
