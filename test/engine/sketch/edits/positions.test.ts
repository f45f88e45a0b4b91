import { fc, test } from '@fast-check/vitest';
import { describe, expect } from 'vitest';
import {
  addPosition,
  copyPosition,
  movePosition,
  removePosition,
  renamePosition,
} from '../../../../engine/sketch/edits/positions.ts';
import { faultsOf } from '../../../../engine/sketch/rules.ts';
import type { PositionId, Sketch } from '../../../../engine/sketch/types.ts';
import { objectDistanceAt, settingAt, valueAt } from '../../../../engine/sketch/values.ts';
import { inspectionZoom, MIDDLE, NARROW, WIDE } from '../../demo.ts';
import { anySetting, anySketch } from '../arbitrary.ts';
import { at, gapsOf, row } from '../layout.ts';

const namesOf = (sketch: Sketch) => sketch.positions.map((position) => position.name);

describe('adding a position', () => {
  test('puts it behind the one it starts from, with the values there', () => {
    const sketch = addPosition(inspectionZoom(), 'new', { at: WIDE, toNext: 0.5 });
    expect(namesOf(sketch)).toEqual(['wide', 'new', 'middle', 'narrow']);
    const gap = gapsOf(inspectionZoom())[0] ?? 0;
    expect(gapsOf(sketch)[0]).toMatchObject({
      pos1: valueAt(gap, inspectionZoom().positions, { at: WIDE, toNext: 0.5 }),
      wide: 41.2187245423499,
    });
    expect(gapsOf(sketch)[3]).toBe(26);
  });

  test('by copying takes over the numbers to the last digit', () => {
    const sketch = copyPosition(inspectionZoom(), MIDDLE);
    expect(namesOf(sketch)).toEqual(['wide', 'middle', 'middle copy', 'narrow']);
    expect(gapsOf(sketch)[1]).toMatchObject({ pos1: 25.3145182543316 });
    const same = inspectionZoom();
    expect(copyPosition(same, at('gone'))).toBe(same);
  });

  test('close to an object at infinity puts its object there, as no sketch holds a longer distance', () => {
    const distanceMm = { [at('a')]: 'infinity', [at('b')]: 900_000 } as const;
    const sketch: Sketch = { ...row({ [at('a')]: 1, [at('b')]: 2 }), object: { distanceMm, medium: 'air' } };
    const added = addPosition(sketch, 'new', { at: at('a'), toNext: 0.25 });
    expect(added.object.distanceMm).toEqual({ ...distanceMm, pos1: 'infinity' });
  });

  test.prop([
    anySketch({ leastParts: 1 }).chain((sketch) =>
      fc.tuple(fc.constant(sketch), anySetting(sketch.positions)),
    ),
  ])(
    'leaves every value of the other positions untouched and has the values of its setting',
    ([sketch, setting]) => {
      const added = addPosition(sketch, 'new', setting);
      const fresh = added.positions.find(({ id }) => !sketch.positions.some((old) => old.id === id))
        ?.id as PositionId;
      expect(faultsOf(added)).toEqual([]);
      expect(removePosition(added, fresh)).toEqual(sketch.positions.length > 1 ? sketch : joined(sketch));
      for (const [index, part] of added.parts.entries()) {
        const before = valueAt(sketch.parts[index]?.space.lengthMm ?? 0, sketch.positions, setting);
        expect(valueAt(part.space.lengthMm, added.positions, settingAt(fresh))).toBe(before);
      }
      const distance = objectDistanceAt(sketch.object.distanceMm, sketch.positions, setting);
      const kept = distance === 'infinity' || distance > 1e6 ? 'infinity' : distance;
      expect(objectDistanceAt(added.object.distanceMm, added.positions, settingAt(fresh))).toBe(kept);
    },
  );
});

/** What is split over a single position comes back common. */
function joined(sketch: Sketch): Sketch {
  const text = JSON.stringify(sketch, (_key, value) =>
    typeof value === 'object' && value !== null && Object.keys(value).join() === sketch.positions[0]?.id
      ? Object.values(value)[0]
      : value,
  );
  return JSON.parse(text);
}

describe('the list of positions', () => {
  test('can be renamed and reordered without touching a value', () => {
    const before = inspectionZoom();
    const after = movePosition(renamePosition(before, NARROW, 'close'), NARROW, 0);
    expect(after.positions).toEqual([
      { id: NARROW, name: 'close' },
      { id: WIDE, name: 'wide' },
      { id: MIDDLE, name: 'middle' },
    ]);
    expect(after.parts).toBe(before.parts);
    expect(after.object).toBe(before.object);
    expect(movePosition(before, MIDDLE, 1)).toBe(before);
    expect(renamePosition(before, MIDDLE, 'middle')).toBe(before);
  });

  test('drops the values of a position that goes, and makes those of the last one common', () => {
    const two = removePosition(inspectionZoom(), WIDE);
    expect(gapsOf(two)[0]).toEqual({ middle: 26.2723430337247, narrow: 15.9437475806799 });
    const one = removePosition(two, NARROW);
    expect(gapsOf(one)).toEqual([26.2723430337247, 25.3145182543316, 32.4131387119437, 26]);
    expect(removePosition(one, MIDDLE)).toBe(one);
    expect(removePosition(one, at('gone'))).toBe(one);
  });
});
