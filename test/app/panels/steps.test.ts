import { fc, test } from '@fast-check/vitest';
import { describe, expect, it } from 'vitest';
import { settingName } from '../../../app/panels/names.ts';
import { keyTarget } from '../../../app/panels/Scrubber.tsx';
import { settingOf, standOf } from '../../../app/panels/steps.ts';
import { renamePosition, settingAt } from '../../../engine/index.ts';
import { inspectionZoom, MIDDLE, NARROW, WIDE } from '../../engine/demo.ts';
import { single } from './sketches.ts';

const sketch = inspectionZoom();
const press = (key: string, stand: number, shiftKey = false) => keyTarget({ key, shiftKey }, stand, 2);

describe('the scrubber', () => {
  it('stands on the positions at whole numbers', () => {
    expect([WIDE, MIDDLE, NARROW].map((id) => standOf(sketch, settingAt(id)))).toEqual([0, 1, 2]);
    expect(settingOf(sketch, 2)).toEqual({ at: NARROW, toNext: 0 });
  });

  it('stays at the ends beyond the ends', () => {
    expect(settingOf(sketch, -3)).toEqual(settingAt(WIDE));
    expect(settingOf(sketch, 7.5)).toEqual(settingAt(NARROW));
    expect(settingOf(single(), 0.5).toNext).toBe(0);
  });

  it('takes a position that is gone as the first', () => {
    expect(standOf(sketch, settingAt('gone' as typeof WIDE))).toBe(0);
  });

  it('goes finely by arrows, to the next stop with Shift or Page, and to the ends', () => {
    expect(press('ArrowRight', 1)).toBeCloseTo(1.05, 12);
    expect(press('ArrowLeft', 1)).toBeCloseTo(0.95, 12);
    expect(press('ArrowRight', 0.3, true)).toBe(1);
    expect(press('ArrowLeft', 1, true)).toBe(0);
    expect(press('PageUp', 1)).toBe(2);
    expect(press('PageDown', 1.4)).toBe(1);
    expect(press('Home', 1.4)).toBe(0);
    expect(press('End', 1.4)).toBe(2);
  });

  it('goes to a position by its number, and leaves other keys alone', () => {
    expect(press('3', 0)).toBe(2);
    expect(press('4', 0)).toBeNull();
    expect(press('x', 0)).toBeNull();
  });

  it('comes back onto a stop after whole steps', () => {
    let stand = 0;
    for (let step = 0; step < 20; step++) stand = press('ArrowRight', stand) ?? Number.NaN;
    expect(settingOf(sketch, stand)).toEqual(settingAt(MIDDLE));
  });

  it('names where it stands', () => {
    expect(settingName(sketch, settingAt(MIDDLE))).toBe('Middle position');
    expect(settingName(sketch, { at: WIDE, toNext: 0.4 })).toBe('Between wide and middle');
    expect(settingName(single(), settingAt('only' as typeof WIDE))).toBe('First order');
  });

  it('names a position by a name that already says so, and leaves a symbol as it is', () => {
    const named = (name: string) => settingName(renamePosition(sketch, WIDE, name), settingAt(WIDE));
    expect(named('position 4')).toBe('Position 4');
    expect(named('Parking position')).toBe('Parking position');
    expect(named('f/4')).toBe('f/4 position');
    expect(named('2×')).toBe('2× position');
    expect(named('élevée')).toBe('Élevée position');
  });

  test.prop([fc.double({ min: 0, max: 2, noNaN: true })])('stands where it was put', (stand) => {
    expect(standOf(sketch, settingOf(sketch, stand))).toBeCloseTo(stand, 12);
  });
});
