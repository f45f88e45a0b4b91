import { describe, expect, it } from 'vitest';
import { BETWEEN } from '../../../app/drawing/handle.ts';
import type { PartId, Sketch } from '../../../engine/index.ts';
import { emptySketch, newPlate, newThin } from '../../../engine/index.ts';
import { inspectionZoom, MIDDLE } from '../../engine/demo.ts';
import {
  AT_MIDDLE,
  BETWEEN_MIDDLE_AND_NARROW,
  demoPicture,
  edited,
  frontsOf,
  grip,
  moveOf,
  pictureFor,
  pull,
} from '../drawing/seen.ts';

const demo = inspectionZoom();
const picture = demoPicture();
const gapAt = (sketch: Sketch, index: number) => {
  const length = sketch.parts[index]?.space.lengthMm;
  return typeof length === 'object' ? length[MIDDLE] : length;
};
const [, , , FOURTH] = frontsOf(demo) as [number, number, number, number];

describe('a value on the ribbon', () => {
  it('scrubbed changes its own number only: everything behind moves along', () => {
    const move = moveOf(grip(picture, 'cell:gap:p2'), { dzMm: 2 });
    const after = edited(demo, move.edit);
    expect(gapAt(after, 1)).toBeCloseTo(27.3145182543316, 9);
    expect(gapAt(after, 2)).toBe(gapAt(demo, 2));
    expect(frontsOf(after)[3]).toBeCloseTo(FOURTH + 2, 9);
    expect(move.says).toBe('27.315 mm');
  });

  it('with Shift lets the next gap take up the difference', () => {
    const after = edited(demo, moveOf(grip(picture, 'cell:gap:p2'), { dzMm: 2, other: true }).edit);
    expect(gapAt(after, 1)).toBeCloseTo(27.3145182543316, 9);
    expect(frontsOf(after)[3]).toBeCloseTo(FOURTH, 9);
  });

  it('typed is kept to its last digit', () => {
    const { entry } = grip(picture, 'cell:gap:p2');
    expect(entry?.value).toBeCloseTo(25.3145182543316, 12);
    expect(gapAt(edited(demo, entry!.set(20.123456789)), 1)).toBe(20.123456789);
    const toggled = grip(demoPicture({ otherRule: true }), 'cell:gap:p2').entry;
    expect(frontsOf(edited(demo, toggled!.set(20)))[3]).toBeCloseTo(FOURTH, 9);
  });

  it('steps by keys, with Shift too', () => {
    const handle = grip(picture, 'cell:gap:p1');
    expect(gapAt(edited(demo, handle.step!(0.1, false)), 0)).toBeCloseTo(26.3723430337247, 9);
    expect(frontsOf(edited(demo, handle.step!(0.1, true)))[2]).toBeCloseTo(frontsOf(demo)[2]!, 9);
  });

  it('of the object folded away changes by 0.2 % for each px, and the frame stays', () => {
    expect(picture.view.fold).not.toBeNull();
    const move = moveOf(grip(picture, 'cell:object'), { dzMm: 9, dxPx: 50 });
    expect(edited(demo, move.edit).object.distanceMm).toBeCloseTo(550, 9);
    expect(move.frameMm).toBe(0);
  });

  it('of an object drawn to scale moves the parts, the object stays', () => {
    const near: Sketch = { ...demo, object: { distanceMm: 120, medium: 'air' } };
    const handle = grip(pictureFor(near, { setting: AT_MIDDLE }), 'cell:object');
    const move = moveOf(handle, { dzMm: 10 });
    expect(edited(near, move.edit).object.distanceMm).toBe(130);
    expect(move.frameMm).toBe(10);
    const least = moveOf(handle, { dzMm: -500 });
    const distanceMm = edited(near, least.edit).object.distanceMm as number;
    expect(distanceMm).toBeGreaterThan(0);
    expect(least.frameMm).toBeCloseTo(distanceMm - 120, 9);
  });

  it('of the object takes infinity when typed; no gap does', () => {
    const object = grip(picture, 'cell:object').entry;
    expect(object?.allowInfinity).toBe(true);
    expect(edited(demo, object!.set(Number.POSITIVE_INFINITY)).object.distanceMm).toBe('infinity');
    expect(grip(picture, 'cell:gap:p1').entry?.allowInfinity).toBe(false);
  });

  it('that follows the focus says so; dragging or typing it fixes the sensor', () => {
    const following: Sketch = { ...demo, image: 'focus' };
    const handle = grip(pictureFor(following, { setting: AT_MIDDLE }), 'cell:gap:p4');
    expect(handle.slider?.valueText).toBe('26.000 mm, follows the focus');
    for (const edit of [moveOf(handle, { dzMm: 1 }).edit, handle.entry!.set(27)]) {
      const after = edited(following, edit);
      expect(after.image).toBe('fixed');
      expect(after.parts[3]?.space.lengthMm).toBeCloseTo(27, 6);
    }
  });

  it('may become negative while it is dragged: that is drawn, marked and warned about', () => {
    const after = edited(demo, moveOf(grip(picture, 'cell:gap:p1'), { dzMm: -30 }).edit);
    expect(gapAt(after, 0)).toBeCloseTo(-3.7276569662753, 9);
    const drawn = pictureFor(after, { setting: AT_MIDDLE });
    expect(drawn.plan.cells.find(({ id }) => id === 'gap:p1')?.bad).toBe(true);
  });

  it('common to all positions says so', () => {
    expect(grip(picture, 'cell:gap:p4').slider?.valueText).toBe('26.000 mm, the same at all positions');
    expect(grip(picture, 'cell:gap:p3').slider?.valueText).toBe('32.413 mm');
  });

  it('of a plate is its thickness, never nothing', () => {
    const sketch: Sketch = {
      ...emptySketch(),
      parts: [
        { ...newPlate(6, 'p1' as PartId), space: { lengthMm: 5, medium: 'air' } },
        newThin(80, 'p2' as PartId),
      ],
    };
    const handle = grip(pictureFor(sketch), 'cell:thickness:p1');
    expect(edited(sketch, moveOf(handle, { dzMm: 2 }).edit).parts[0]).toMatchObject({ thicknessMm: 8 });
    const thin = edited(sketch, moveOf(handle, { dzMm: -50 }).edit).parts[0] as { thicknessMm: number };
    expect(thin.thicknessMm).toBeGreaterThan(0);
  });
});

describe('between positions', () => {
  const between = demoPicture({ setting: BETWEEN_MIDDLE_AND_NARROW });

  it('a value that each position has for itself cannot be changed, and says what to do', () => {
    expect(grip(between, 'cell:gap:p2')).toMatchObject({
      drag: null,
      step: null,
      entry: null,
      why: BETWEEN,
      cursor: 'default',
    });
  });

  it('a common value can', () => {
    expect(
      edited(demo, moveOf(grip(between, 'cell:gap:p4'), { dzMm: 1 }).edit).parts[3]?.space.lengthMm,
    ).toBeCloseTo(27, 9);
    expect(edited(demo, grip(between, 'cell:object').entry!.set(400)).object.distanceMm).toBe(400);
  });
});

describe('a tick on the ribbon', () => {
  it('is the part: dragging it comes to the same', () => {
    for (const other of [false, true]) {
      const drag = pull({ dzMm: 2, other });
      const byTick = grip(picture, 'tick:p2').drag!(drag);
      const byPart = grip(picture, 'part:p2').drag!(drag);
      expect(edited(demo, byTick.edit)).toEqual(edited(demo, byPart.edit));
      expect(byTick.says).toBe(byPart.says);
    }
    expect(grip(picture, 'tick:p2')).toMatchObject({ selects: 'p2', slider: null, tabStop: false });
  });

  it('comes after the values where both are near', () => {
    expect(grip(picture, 'tick:p2').order).toBeGreaterThan(grip(picture, 'cell:gap:p2').order);
  });

  it('stands on the dimension line below its part', () => {
    const { plan } = picture;
    for (const part of picture.scene.parts) {
      const tick = grip(picture, `tick:${part.part.id}`);
      expect(tick.yPx).toBe(plan.cells[0]?.linePx);
      expect(tick.xPx).toBeCloseTo(grip(picture, `part:${part.part.id}`).xPx, 9);
    }
  });
});
