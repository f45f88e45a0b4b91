import { describe, expect, test } from 'vitest';
import {
  fixSensor,
  joinObjectDistance,
  setImagePlane,
  setObjectAtInfinity,
  setObjectDistance,
  setRegister,
  setSensor,
  splitObjectDistance,
} from '../../../../engine/sketch/edits/ends.ts';
import { propose, unsettled } from '../../../../engine/sketch/propose.ts';
import { inspectionZoom, MIDDLE, NARROW, WIDE } from '../../demo.ts';
import { at, gapsOf, ONLY, row } from '../layout.ts';

describe('the object', () => {
  test('is at a distance common to all positions, or at one of its own for each', () => {
    const common = setObjectDistance(inspectionZoom(), 400, MIDDLE);
    expect(common.object.distanceMm).toBe(400);
    const split = setObjectDistance(splitObjectDistance(common), 300, NARROW);
    expect(split.object.distanceMm).toEqual({ wide: 400, middle: 400, narrow: 300 });
    expect(setObjectAtInfinity(split, WIDE).object.distanceMm).toEqual({
      wide: 'infinity',
      middle: 400,
      narrow: 300,
    });
    expect(joinObjectDistance(split, NARROW).object.distanceMm).toBe(300);
  });

  test('stays where it is when it is put there', () => {
    const sketch = inspectionZoom();
    expect(setObjectDistance(sketch, 500, WIDE)).toBe(sketch);
    expect(setObjectAtInfinity(row(1), ONLY)).toEqual(row(1));
  });

  test.each([0, -10, Number.NaN, 1e300])('at %d mm is refused', (distanceMm) => {
    const before = inspectionZoom();
    const proposal = propose(before, (sketch) => setObjectDistance(sketch, distanceMm, WIDE), unsettled);
    expect(proposal.sketch).toBe(before);
    expect(proposal.note?.faults.map((fault) => fault.path)).toEqual(['object.distanceMm']);
  });
});

describe('the sensor', () => {
  test('is fixed at a distance for all positions when the image followed the focus', () => {
    const sketch = fixSensor(row(1, { [at('a')]: 5, [at('b')]: 6 }), 30, at('b'));
    expect(sketch.image).toBe('fixed');
    expect(gapsOf(sketch)[1]).toBe(30);
  });

  test('once fixed is moved at one position when its distance is split, else at all', () => {
    const fixed = { ...row(1, { [at('a')]: 5, [at('b')]: 6 }), image: 'fixed' as const };
    expect(gapsOf(fixSensor(fixed, 30, at('b')))[1]).toEqual({ a: 5, b: 30 });
    expect(gapsOf(fixSensor(fixed, 30))[1]).toBe(30);
  });

  test('lets go and follows the focus, keeping its last distance', () => {
    const free = setImagePlane(inspectionZoom(), 'focus');
    expect(free.image).toBe('focus');
    expect(setImagePlane(free, 'fixed')).toEqual(inspectionZoom());
  });

  test('cannot be fixed behind no part', () => {
    const empty = row();
    expect(fixSensor(empty, 30)).toBe(empty);
    expect(setImagePlane(empty, 'fixed')).toBe(empty);
  });

  test('has a size, a pixel pitch and a mount, or none', () => {
    const sensor = { size: { diagonalMm: 11 }, pixelPitchMm: null };
    const sketch = setRegister(setSensor(row(1), sensor), 17.526);
    expect([sketch.sensor, sketch.registerMm]).toEqual([sensor, 17.526]);
    expect(setSensor(sketch, { ...sensor })).toBe(sketch);
    expect(setRegister(setSensor(sketch, null), null)).toEqual(row(1));
  });
});
