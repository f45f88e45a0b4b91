import { describe, expect, test } from 'vitest';
import { dropStop, releaseStop, rideStop, setStop } from '../../../../engine/sketch/edits/stop.ts';
import type { Sketch } from '../../../../engine/sketch/types.ts';
import { gapsOf, id, idsOf, ONLY, row } from '../layout.ts';

const riding = (): Sketch => ({ ...row(10, 20), stop: id('p2') });

describe('the stop', () => {
  test('dropped on the axis is a part of its own', () => {
    const sketch = dropStop(row(10, 20), 4, ONLY);
    expect([sketch.stop, ...idsOf(sketch)]).toEqual(['p3', 'p1', 'p3', 'p2']);
    expect(gapsOf(sketch)).toEqual([4, 6, 20]);
  });

  test('dropped on a part rides on it and loses its own', () => {
    const sketch = rideStop(dropStop(row(10, 20), 4, ONLY), id('p2'));
    expect(sketch).toEqual(riding());
  });

  test('moves from one carrier to another', () => {
    expect(rideStop(riding(), id('p1'))).toEqual({ ...row(10, 20), stop: id('p1') });
    const sketch = riding();
    expect(rideStop(sketch, id('p2'))).toBe(sketch);
    expect(rideStop(sketch, id('p9'))).toBe(sketch);
  });

  test('released stands at nothing in front of its carrier', () => {
    const sketch = releaseStop(riding());
    expect(idsOf(sketch)).toEqual(['p1', 'p3', 'p2']);
    expect(gapsOf(sketch)).toEqual([10, 0, 20]);
    expect(sketch.parts[1]?.kind).toBe('stop');
    expect(sketch.stop).toBe('p3');
  });

  test('released from the first part becomes the first itself', () => {
    const sketch = releaseStop({ ...riding(), stop: id('p1'), object: { distanceMm: 100, medium: 'air' } });
    expect(idsOf(sketch)).toEqual(['p3', 'p1', 'p2']);
    expect([sketch.object.distanceMm, ...gapsOf(sketch)]).toEqual([100, 0, 10, 20]);
  });

  test('that stands free, or is not there, has nothing to be released from', () => {
    const none = row(10, 20);
    expect(releaseStop(none)).toBe(none);
    const free = dropStop(none, 4, ONLY);
    expect(releaseStop(free)).toBe(free);
  });

  test('can be any part, or none', () => {
    expect(setStop(riding(), null).stop).toBeNull();
    expect(setStop(riding(), id('p1')).stop).toBe('p1');
    const sketch = riding();
    expect(setStop(sketch, id('p9'))).toBe(sketch);
  });
});
