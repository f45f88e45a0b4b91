import { fc, test } from '@fast-check/vitest';
import { describe, expect } from 'vitest';
import { withGroups } from '../../../../engine/sketch/edits/change.ts';
import { joinGap, moveParts, setGap, setMedium, splitGap } from '../../../../engine/sketch/edits/gaps.ts';
import { tieParts } from '../../../../engine/sketch/edits/groups.ts';
import type { Sketch } from '../../../../engine/sketch/types.ts';
import { inspectionZoom, MIDDLE, NARROW, WIDE } from '../../demo.ts';
import { anyNumber, anySketch } from '../arbitrary.ts';
import { at, gapsOf, id, ONLY, placesFrom, row } from '../layout.ts';

const fixed = (sketch: Sketch): Sketch => ({ ...sketch, image: 'fixed' });
const finite = (sketch: Sketch): Sketch => ({ ...sketch, object: { ...sketch.object, distanceMm: 100 } });

describe('setting a gap', () => {
  test('changes only that number, so that everything behind moves along', () => {
    expect(gapsOf(setGap(row(10, 20, 30), id('p1'), 12, ONLY))).toEqual([12, 20, 30]);
  });

  test('with the other rule lets the next gap take up the difference', () => {
    expect(gapsOf(setGap(row(10, 20, 30), id('p1'), 12, ONLY, 'neighbours'))).toEqual([12, 18, 30]);
  });

  test('keeps a fixed sensor in place when the last part alone moves', () => {
    expect(gapsOf(setGap(fixed(row(10, 20, 30)), id('p2'), 25, ONLY, 'neighbours'))).toEqual([10, 25, 25]);
    expect(gapsOf(setGap(row(10, 20, 30), id('p2'), 25, ONLY, 'neighbours'))).toEqual([10, 25, 30]);
  });

  test('behind the last part fixes the sensor there', () => {
    const sketch = setGap(row(10, 20), id('p2'), 33, ONLY);
    expect(sketch.image).toBe('fixed');
    expect(gapsOf(sketch)).toEqual([10, 33]);
  });

  test('changes a split gap at its position alone and a common one at all', () => {
    const sketch = setGap(setGap(inspectionZoom(), id('p1'), 30, MIDDLE), id('p4'), 27, WIDE);
    expect(gapsOf(sketch)[0]).toEqual({ wide: 41.2187245423499, middle: 30, narrow: 15.9437475806799 });
    expect(gapsOf(sketch)[3]).toBe(27);
  });

  test('keeps the other parts and their values as they were', () => {
    const before = inspectionZoom();
    const after = setGap(before, id('p2'), 25, WIDE);
    expect(after.parts[0]).toBe(before.parts[0]);
    expect(after.parts[2]).toBe(before.parts[2]);
    expect(after.object).toBe(before.object);
  });

  test('changes nothing for a part that is not there or a length that is there', () => {
    const sketch = row(10, 20);
    expect(setGap(sketch, id('p9'), 5, ONLY)).toBe(sketch);
    expect(setGap(sketch, id('p1'), 10, ONLY, 'neighbours')).toBe(sketch);
  });

  test.prop([anySketch({ leastParts: 2 }), fc.nat(), anyNumber(-50, 500), fc.boolean()])(
    'stores exactly the number it was given',
    (sketch, pick, lengthMm, carry) => {
      const part = sketch.parts[pick % sketch.parts.length];
      const position = sketch.positions[pick % sketch.positions.length];
      if (part === undefined || position === undefined) return;
      const after = setGap(sketch, part.id, lengthMm, position.id, carry ? 'carry' : 'neighbours');
      const gap = after.parts.find(({ id }) => id === part.id)?.space.lengthMm;
      expect(typeof gap === 'object' ? gap[position.id] : gap).toBe(lengthMm);
    },
  );
});

describe('moving parts', () => {
  test('changes the two gaps beside a part', () => {
    expect(gapsOf(moveParts(row(10, 20, 30), [id('p2')], 3, ONLY))).toEqual([13, 17, 30]);
  });

  test('with the other rule changes the gap in front alone', () => {
    expect(gapsOf(moveParts(row(10, 20, 30), [id('p2')], 3, ONLY, 'carry'))).toEqual([13, 20, 30]);
  });

  test('keeps a finite object where it stands when the first part moves', () => {
    const sketch = moveParts(finite(row(10, 20)), [id('p1')], 4, ONLY);
    expect(sketch.object.distanceMm).toBe(104);
    expect(gapsOf(sketch)).toEqual([6, 20]);
    expect(gapsOf(moveParts(row(10, 20), [id('p1')], 4, ONLY))).toEqual([6, 20]);
  });

  test('keeps a fixed sensor where it stands when the last part moves, unless that moves along', () => {
    expect(gapsOf(moveParts(fixed(row(10, 20)), [id('p2')], 4, ONLY))).toEqual([14, 16]);
    expect(gapsOf(moveParts(fixed(row(10, 20)), [id('p2')], 4, ONLY, 'carry'))).toEqual([14, 20]);
    expect(gapsOf(moveParts(row(10, 20), [id('p2')], 4, ONLY))).toEqual([14, 20]);
  });

  test('moves several parts, near or far from each other, as one', () => {
    const sketch = row(10, 20, 30, 40, 50);
    expect(gapsOf(moveParts(sketch, [id('p2'), id('p3')], 2, ONLY))).toEqual([12, 20, 28, 40, 50]);
    expect(gapsOf(moveParts(sketch, [id('p4'), id('p2')], 2, ONLY))).toEqual([12, 18, 32, 38, 50]);
    expect(gapsOf(moveParts(sketch, [id('p4'), id('p2')], 2, ONLY, 'carry'))).toEqual([12, 20, 30, 40, 50]);
  });

  test('moves what is tied together', () => {
    const sketch = tieParts(row(10, 20, 30, 40), [id('p2'), id('p3')], 'relay');
    const ids = withGroups(sketch, [id('p3')]);
    expect(ids).toEqual(['p2', 'p3']);
    expect(gapsOf(moveParts(sketch, ids, 5, ONLY))).toEqual([15, 20, 25, 40]);
  });

  test('moves the whole layout away from the object, the sensor along or not', () => {
    const all = [id('p1'), id('p2')];
    expect(moveParts(fixed(finite(row(10, 20))), all, 7, ONLY, 'carry').object.distanceMm).toBe(107);
    expect(gapsOf(moveParts(fixed(finite(row(10, 20))), all, 7, ONLY, 'carry'))).toEqual([10, 20]);
    expect(gapsOf(moveParts(fixed(finite(row(10, 20))), all, 7, ONLY))).toEqual([10, 13]);
  });

  test('at a position moves split gaps there alone', () => {
    const sketch = moveParts(inspectionZoom(), [id('p2')], 1, NARROW);
    expect(gapsOf(sketch)[0]).toEqual({
      wide: 41.2187245423499,
      middle: 26.2723430337247,
      narrow: 15.9437475806799 + 1,
    });
    expect(gapsOf(sketch)[1]).toEqual({
      wide: 16.5123679494863,
      middle: 25.3145182543316,
      narrow: 41.9317551092688 - 1,
    });
  });

  test('changes nothing without parts or without a way', () => {
    const sketch = row(10, 20);
    expect(moveParts(sketch, [], 3, ONLY)).toBe(sketch);
    expect(moveParts(sketch, [id('p9')], 3, ONLY)).toBe(sketch);
    expect(moveParts(sketch, [id('p1')], 0, ONLY)).toBe(sketch);
    expect(moveParts(sketch, [id('p1'), id('p2')], 3, ONLY)).toBe(sketch);
  });

  test.prop([anySketch({ leastParts: 2 }), fc.nat(), fc.nat(), anyNumber(-20, 20)])(
    'moves the chosen parts by exactly what was asked against the others',
    (sketch, pickPart, pickPosition, deltaMm) => {
      const mover = sketch.parts[pickPart % sketch.parts.length];
      const rest = sketch.parts[(pickPart + 1) % sketch.parts.length];
      const position = sketch.positions[pickPosition % sketch.positions.length];
      if (mover === undefined || rest === undefined || position === undefined) return;
      const before = placesFrom(sketch, rest.id, position.id);
      const after = placesFrom(moveParts(sketch, [mover.id], deltaMm, position.id), rest.id, position.id);
      for (const [key, z] of before) {
        const follows = key === 'object' ? 0 : key === mover.id ? deltaMm : 0;
        // Sums of up to some thousand millimetres carry rounding of that size.
        expect(after.get(key)).toBeCloseTo(z + follows, 8);
      }
    },
  );
});

describe('a gap', () => {
  test('is split with its value at every position, and joined with that of one', () => {
    const split = splitGap(inspectionZoom(), id('p4'));
    expect(gapsOf(split)[3]).toEqual({ wide: 26, middle: 26, narrow: 26 });
    expect(gapsOf(joinGap(setGap(split, id('p4'), 20, NARROW), id('p4'), NARROW))[3]).toBe(20);
    expect(splitGap(split, id('p4'))).toBe(split);
    expect(joinGap(inspectionZoom(), id('p4'), at('wide'))).toEqual(inspectionZoom());
  });

  test('holds a medium of its own, and so does object space', () => {
    const water = { name: 'water', index: 1.333, abbeNumber: 55.8 };
    const sketch = setMedium(setMedium(row(10, 20), id('p1'), water), 'object', water);
    expect(sketch.parts[0]?.space).toEqual({ lengthMm: 10, medium: water });
    expect(sketch.object.medium).toEqual(water);
    expect(setMedium(sketch, id('p1'), { ...water })).toBe(sketch);
  });
});
