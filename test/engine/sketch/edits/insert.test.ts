import { fc, test } from '@fast-check/vitest';
import { describe, expect } from 'vitest';
import { newPlate, newStop, newThin } from '../../../../engine/sketch/create.ts';
import { insertPart } from '../../../../engine/sketch/edits/insert.ts';
import { removeParts } from '../../../../engine/sketch/edits/remove.ts';
import { propose, unsettled } from '../../../../engine/sketch/propose.ts';
import type { PartId, Sketch } from '../../../../engine/sketch/types.ts';
import { anyNumber, anySketch } from '../arbitrary.ts';
import { at, gapsOf, id, idsOf, ONLY, placesFrom, row } from '../layout.ts';

const zoom = () => row({ [at('wide')]: 10, [at('narrow')]: 30 }, { [at('wide')]: 20, [at('narrow')]: 20 }, 5);
const withDistance = (sketch: Sketch, distanceMm: Sketch['object']['distanceMm']): Sketch => ({
  ...sketch,
  object: { ...sketch.object, distanceMm },
});
const NEW = id('p4');
const thin = newThin(50, NEW);

describe('a part put on the axis', () => {
  test('is the datum of an empty sketch wherever it is put', () => {
    const sketch = insertPart(row(), newThin(50), 37, ONLY);
    expect(idsOf(sketch)).toEqual(['p1']);
    expect(placesFrom(sketch, id('p1'), ONLY).get('p1')).toBe(0);
  });

  test('divides the gap it falls in', () => {
    const sketch = insertPart(row(10, 20, 5), thin, 14, ONLY);
    expect(idsOf(sketch)).toEqual(['p1', 'p2', 'p4', 'p3']);
    expect(gapsOf(sketch)).toEqual([10, 4, 16, 5]);
  });

  test('divides a split gap in the same share at the other positions', () => {
    const sketch = insertPart(zoom(), thin, 4, at('wide'));
    expect(gapsOf(sketch).slice(0, 2)).toEqual([
      { wide: 4, narrow: 12 },
      { wide: 6, narrow: 18 },
    ]);
  });

  test('stands at nothing behind a part it is put on', () => {
    expect(gapsOf(insertPart(row(10, 20, 5), thin, 10, ONLY))).toEqual([10, 0, 20, 5]);
  });

  test('behind the last part sets the gap in front of it, and keeps a fixed sensor in place', () => {
    const sketch = insertPart(row(10, 20, 50), thin, 42, ONLY);
    expect(gapsOf(sketch)).toEqual([10, 20, 12, 0]);
    const fixed = insertPart({ ...row(10, 20, 50), image: 'fixed' }, thin, 42, ONLY);
    expect(gapsOf(fixed)).toEqual([10, 20, 12, 38]);
    const beyond = insertPart({ ...row(10, 20, 50), image: 'fixed' }, thin, 90, ONLY);
    expect(gapsOf(beyond)).toEqual([10, 20, 60, -10]);
  });

  test('beyond a sensor at split distances stands as far beyond it at every position', () => {
    const sketch: Sketch = { ...row({ [at('wide')]: 1e-7, [at('narrow')]: 50 }), image: 'fixed' };
    const beyond = gapsOf(insertPart(sketch, newThin(50, NEW), 10, at('wide')));
    expect(beyond[0]).toEqual({ wide: 10, narrow: 50 + (10 - 1e-7) });
    expect(beyond[1]).toEqual({ wide: 1e-7 - 10, narrow: 50 - (50 + (10 - 1e-7)) });
  });

  test('in front of the first divides a finite object distance, common or split', () => {
    const near = insertPart(withDistance(row(10), 100), thin, -30, ONLY);
    expect([near.object.distanceMm, ...gapsOf(near)]).toEqual([70, 30, 10]);
    expect(idsOf(near)).toEqual(['p4', 'p1']);
    const distance = { [at('wide')]: 100, [at('narrow')]: 200 };
    const split = insertPart(withDistance(zoom(), distance), thin, -25, at('wide'));
    expect(split.object.distanceMm).toEqual({ wide: 75, narrow: 150 });
    expect(gapsOf(split)[0]).toEqual({ wide: 25, narrow: 50 });
  });

  test('in front of the first keeps an object at infinity there', () => {
    const far = insertPart(row(10), thin, -30, ONLY);
    expect([far.object.distanceMm, ...gapsOf(far)]).toEqual(['infinity', 30, 10]);
    const mixed = insertPart(
      withDistance(zoom(), { [at('wide')]: 'infinity', [at('narrow')]: 200 }),
      thin,
      -25,
      at('wide'),
    );
    expect(mixed.object.distanceMm).toEqual({ wide: 'infinity', narrow: 175 });
    expect(gapsOf(mixed)[0]).toEqual({ wide: 25, narrow: 25 });
  });

  test('in front of the object is refused', () => {
    const before = withDistance(row(10), 100);
    const proposal = propose(before, (sketch) => insertPart(sketch, thin, -100, ONLY), unsettled);
    expect(proposal.sketch).toBe(before);
    expect(proposal.note?.faults[0]?.path).toBe('object.distanceMm');
  });

  test('takes the medium of the gap it falls in', () => {
    const water = { name: 'water', index: 1.333, abbeNumber: null };
    const wet = row(10, 20);
    const parts = wet.parts.map((part) => ({ ...part, space: { ...part.space, medium: water } }));
    const media = insertPart({ ...wet, parts }, newStop(NEW), 3, ONLY).parts.map((part) => part.space.medium);
    expect(media).toEqual([water, water, water]);
  });

  test('if a plate, takes its thickness out of the gap; put into a plate it stands at the nearer face', () => {
    const glazed = insertPart(row(10, 20, 5), newPlate(3, NEW), 14, ONLY);
    expect(gapsOf(glazed)).toEqual([10, 4, 13, 5]);
    const again = (z: number) => insertPart(glazed, newThin(50, id('p5')), z, ONLY);
    expect(idsOf(again(15))).toEqual(['p1', 'p2', 'p5', 'p4', 'p3']);
    expect(gapsOf(again(15))).toEqual([10, 4, 0, 13, 5]);
    expect(idsOf(again(16))).toEqual(['p1', 'p2', 'p4', 'p5', 'p3']);
    expect(gapsOf(again(16))).toEqual([10, 4, 0, 13, 5]);
  });

  test('gets the first fresh id when its own is taken', () => {
    expect(idsOf(insertPart(row(10, 20), newThin(50), 5, ONLY))).toEqual(['p1', 'p3', 'p2']);
  });

  test.prop([anySketch({ leastParts: 1 }), fc.nat(), anyNumber(-60, 400), fc.boolean()])(
    'leaves the others where they were, and taken away again leaves no trace',
    (sketch, pick, z, glazed) => {
      const position = sketch.positions[pick % sketch.positions.length];
      const first = sketch.parts[0];
      const last = sketch.parts.at(-1);
      if (position === undefined || first === undefined || last === undefined) return;
      const fresh = 'fresh' as PartId;
      const added = insertPart(sketch, glazed ? newPlate(1, fresh) : newThin(50, fresh), z, position.id);
      for (const { id: where } of sketch.positions) {
        const before = placesFrom(sketch, first.id, where);
        for (const [key, place] of placesFrom(added, first.id, where))
          if (key !== fresh) expect(place).toBeCloseTo(before.get(key) ?? Number.NaN, 8);
      }
      if (added.parts.at(-1)?.id === fresh && sketch.image === 'focus') return;
      const removed = removeParts(added, [fresh]);
      expect(idsOf(removed)).toEqual(idsOf(sketch));
      for (const { id: where } of sketch.positions) {
        const before = placesFrom(sketch, first.id, where);
        for (const [key, place] of placesFrom(removed, first.id, where))
          expect(place).toBeCloseTo(before.get(key) ?? Number.NaN, 8);
      }
    },
  );
});
