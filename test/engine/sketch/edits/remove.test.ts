import { fc, test } from '@fast-check/vitest';
import { describe, expect } from 'vitest';
import { newPlate } from '../../../../engine/sketch/create.ts';
import { tieParts } from '../../../../engine/sketch/edits/groups.ts';
import { removeParts } from '../../../../engine/sketch/edits/remove.ts';
import type { Part, Sketch } from '../../../../engine/sketch/types.ts';
import { anySketch } from '../arbitrary.ts';
import { at, gapsOf, id, idsOf, placesFrom, row } from '../layout.ts';

describe('taking parts away', () => {
  test('merges the gaps beside them, common with split', () => {
    const sketch = removeParts(row(10, { [at('a')]: 1, [at('b')]: 2 }, 30), [id('p2')]);
    expect(gapsOf(sketch)).toEqual([{ a: 11, b: 12 }, 30]);
  });

  test('counts the thickness of a plate', () => {
    const sketch = row(10, 20, 30);
    const plate: Part = { ...newPlate(4, id('p2')), space: { lengthMm: 20, medium: 'air' } };
    expect(gapsOf(removeParts({ ...sketch, parts: sketch.parts.with(1, plate) }, [id('p2')]))).toEqual([
      34, 30,
    ]);
  });

  test('adds what stood first to a finite object distance', () => {
    const sketch: Sketch = { ...row(10, 20, 30), object: { distanceMm: 100, medium: 'air' } };
    expect(removeParts(sketch, [id('p1'), id('p2')]).object.distanceMm).toBe(130);
    expect(removeParts(row(10, 20), [id('p1')]).object.distanceMm).toBe('infinity');
  });

  test('keeps a fixed sensor in place and the medium in front of it', () => {
    const water = { name: 'water', index: 1.333, abbeNumber: null };
    const sketch = row(10, 20, 30);
    const last = sketch.parts[2] as Part;
    const wet = {
      ...sketch,
      parts: sketch.parts.with(2, { ...last, space: { lengthMm: 30, medium: water } }),
    };
    const fixed = removeParts({ ...wet, image: 'fixed' }, [id('p2'), id('p3')]);
    expect(fixed.parts[0]?.space).toEqual({ lengthMm: 60, medium: water });
    expect(removeParts(wet, [id('p2'), id('p3')]).parts[0]?.space).toEqual({ lengthMm: 10, medium: water });
  });

  test('takes the stop and the ties along', () => {
    const tied = tieParts({ ...row(1, 1, 1, 1), stop: id('p2') }, [id('p1'), id('p2'), id('p3')], 'front');
    const two = removeParts(tied, [id('p2')]);
    expect(two.stop).toBeNull();
    expect(two.groups.map((group) => group.partIds)).toEqual([['p1', 'p3']]);
    expect(removeParts(two, [id('p1')]).groups).toEqual([]);
    expect(removeParts(tied, [id('p4')]).groups).toBe(tied.groups);
  });

  test('leaves an image at the focus when nothing is left', () => {
    const empty = removeParts({ ...row(1, 1), image: 'fixed', stop: id('p1') }, [id('p1'), id('p2')]);
    expect(empty).toEqual({ ...row(1, 1), parts: [] });
  });

  test('of parts that are not there changes nothing', () => {
    const sketch = row(1, 1);
    expect(removeParts(sketch, [id('p9')])).toBe(sketch);
    expect(removeParts(sketch, [])).toBe(sketch);
  });

  test.prop([anySketch({ leastParts: 2 }), fc.array(fc.nat(), { minLength: 1, maxLength: 4 })])(
    'leaves the others where they were at every position',
    (sketch, picks) => {
      const ids = picks.map((pick) => sketch.parts[pick % sketch.parts.length]?.id ?? id('p1'));
      const left = removeParts(sketch, ids);
      const datum = left.parts[0];
      if (datum === undefined) return;
      expect(idsOf(left)).toEqual(idsOf(sketch).filter((part) => !ids.includes(id(part))));
      for (const { id: where } of sketch.positions) {
        const before = placesFrom(sketch, datum.id, where);
        for (const [key, place] of placesFrom(left, datum.id, where))
          expect(place).toBeCloseTo(before.get(key) ?? Number.NaN, 8);
      }
    },
  );
});
