import { describe, expect, it } from 'vitest';
import { gripsAt, MOUSE_RADIUS_PX } from '../../../../app/board/grips.ts';
import { xOf, yOf } from '../../../../app/board/viewport.ts';
import { BETWEEN } from '../../../../app/drawing/handle.ts';
import { analysisOf } from '../../../../app/live/analysis.ts';
import type { Aperture, FieldSize, PartId, Sketch } from '../../../../engine/index.ts';
import { emptySketch, newThin, splitObjectDistance, splitStopDiameter } from '../../../../engine/index.ts';
import { inspectionZoom, MIDDLE, NARROW, WIDE } from '../../../engine/demo.ts';
import {
  AT_MIDDLE,
  BETWEEN_MIDDLE_AND_NARROW,
  demoPicture,
  edited,
  grip,
  moveOf,
  pictureFor,
  sceneFor,
} from '../seen.ts';

const demo = inspectionZoom();
const picture = demoPicture();

/** Everything here is linear in the edit: a few roundings of numbers up to a thousand. */
const DIGITS = 9;

const stopDiameter = (sketch: Sketch) => {
  const { stopDiameterMm } = analysisOf(sketch, AT_MIDDLE).pupils;
  return stopDiameterMm.ok ? stopDiameterMm.value : Number.NaN;
};

const APERTURES: readonly Aperture[] = [
  { kind: 'stopDiameter', diameterMm: 12 },
  { kind: 'workingFNumber', fNumber: 5.6 },
  { kind: 'infinityFNumber', fNumber: 4 },
  { kind: 'objectNA', na: 0.01 },
  { kind: 'entrancePupilDiameter', diameterMm: 8 },
];

describe.each(APERTURES)('an edge of the stop with the aperture given as $kind', (aperture) => {
  const sketch: Sketch = { ...demo, aperture };
  const drawn = pictureFor(sketch, { setting: AT_MIDDLE });

  it('opens the stop as far as it is dragged, and keeps the kind', () => {
    const before = stopDiameter(sketch);
    for (const [id, dyMm] of [
      ['stop:upper', 1],
      ['stop:lower', -1],
    ] as const) {
      const move = moveOf(grip(drawn, id), { dyMm });
      const after = edited(sketch, move.edit);
      expect(after.aperture.kind).toBe(aperture.kind);
      expect(stopDiameter(after)).toBeCloseTo(before + 2, DIGITS);
      expect(move.says).toBe(`stop ⌀ ${(before + 2).toFixed(3)} mm`);
    }
  });

  it('takes the stop diameter when it is typed', () => {
    const { entry } = grip(drawn, 'stop:upper');
    expect(entry).toMatchObject({ label: 'stop diameter', value: stopDiameter(sketch) });
    expect(stopDiameter(edited(sketch, entry!.set(7)))).toBeCloseTo(7, DIGITS);
  });

  it('never closes it', () => {
    expect(
      stopDiameter(edited(sketch, moveOf(grip(drawn, 'stop:upper'), { dyMm: -999 }).edit)),
    ).toBeGreaterThan(0);
  });
});

describe('an edge of the stop', () => {
  it('stands on its carrier at the height of the marginal ray', () => {
    const { scene, view } = picture;
    const handle = grip(picture, 'stop:lower');
    expect(handle.xPx).toBe(xOf(view, scene.parts[1]!.frontMm));
    expect(handle.yPx).toBe(yOf(view, -scene.stop!.semiMm));
    expect(handle.selects).toBe('p2');
  });

  it('comes before the rim of the part it rides on', () => {
    const drawn = demoPicture({ selection: ['p2' as PartId] });
    expect(grip(drawn, 'stop:upper').order).toBeLessThan(grip(drawn, 'rim:p2:upper').order);
  });

  it('changes a diameter that each position has for itself at this one only', () => {
    const split = splitStopDiameter({ ...demo, aperture: { kind: 'stopDiameter', diameterMm: 12 } });
    const drawn = pictureFor(split, { setting: AT_MIDDLE });
    const { aperture } = edited(split, moveOf(grip(drawn, 'stop:upper'), { dyMm: 1 }).edit);
    if (aperture.kind !== 'stopDiameter') throw new Error('the kind stays');
    expect(aperture.diameterMm).toEqual({ wide: 12, [MIDDLE]: expect.closeTo(14, 9), [NARROW]: 12 });
    const between = pictureFor(split, { setting: BETWEEN_MIDDLE_AND_NARROW });
    expect(grip(between, 'stop:upper')).toMatchObject({ drag: null, step: null, entry: null, why: BETWEEN });
  });

  it('is not there when nothing stops the light', () => {
    const open: Sketch = { ...demo, stop: null };
    expect(pictureFor(open).handles.some(({ id }) => id.startsWith('stop:'))).toBe(false);
  });
});

describe('the object’s foot', () => {
  const near: Sketch = { ...demo, object: { distanceMm: 120, medium: 'air' } };
  const toScale = pictureFor(near, { setting: AT_MIDDLE });

  it('is taken anywhere on the object’s line, except at its tip', () => {
    const foot = grip(picture, 'object:foot');
    const tip = grip(picture, 'object:tip');
    const takenAt = (yPx: number) => gripsAt(picture.handles, foot.xPx, yPx, MOUSE_RADIUS_PX)[0]?.id;
    expect(takenAt((foot.yPx + tip.yPx) / 2)).toBe('object:foot');
    expect(takenAt(tip.yPx)).toBe('object:tip');
  });

  it('drawn to scale follows the pointer', () => {
    expect(toScale.view.fold).toBeNull();
    const move = moveOf(grip(toScale, 'object:foot'), { dzMm: -10 });
    expect(edited(near, move.edit).object.distanceMm).toBe(130);
    expect(move).toMatchObject({ says: 'object 130.000 mm away', frameMm: 0 });
  });

  it('beyond a fold changes by 0.2 % for each px', () => {
    expect(picture.view.fold).not.toBeNull();
    const after = edited(demo, moveOf(grip(picture, 'object:foot'), { dzMm: -10, dxPx: -50 }).edit);
    expect(after.object.distanceMm).toBeCloseTo(500 * 1.1, DIGITS);
  });

  it('never comes to the first part', () => {
    for (const [sketch, drawn] of [
      [near, toScale],
      [demo, picture],
    ] as const) {
      const after = edited(sketch, moveOf(grip(drawn, 'object:foot'), { dzMm: 9999, dxPx: 9999 }).edit);
      expect(after.object.distanceMm).toBeGreaterThan(0);
    }
  });

  it('goes where the arrow key points', () => {
    expect(edited(demo, grip(picture, 'object:foot').step!(1, false)).object.distanceMm).toBe(499);
  });

  it('can be typed, infinity included', () => {
    const { entry } = grip(picture, 'object:foot');
    expect(entry).toMatchObject({ label: 'object distance', value: 500, allowInfinity: true });
    expect(edited(demo, entry!.set(750)).object.distanceMm).toBe(750);
    expect(edited(demo, entry!.set(Number.POSITIVE_INFINITY)).object.distanceMm).toBe('infinity');
  });

  it('of each position’s own changes here only, and not at all between positions', () => {
    const split = splitObjectDistance(demo);
    const drawn = pictureFor(split, { setting: AT_MIDDLE });
    expect(edited(split, grip(drawn, 'object:foot').entry!.set(450)).object.distanceMm).toEqual({
      wide: 500,
      middle: 450,
      narrow: 500,
    });
    const between = pictureFor(split, { setting: BETWEEN_MIDDLE_AND_NARROW });
    expect(grip(between, 'object:foot')).toMatchObject({ drag: null, step: null, why: BETWEEN });
  });

  it('is not there with the object at infinity', () => {
    const far: Sketch = { ...emptySketch(), parts: [newThin(50)], stop: 'p1' as PartId };
    expect(pictureFor(far).handles.some(({ id }) => id.startsWith('object:'))).toBe(false);
  });
});

const FIELDS: readonly FieldSize[] = [
  { kind: 'imageHeight', heightMm: 5.5 },
  { kind: 'objectHeight', heightMm: 60 },
  { kind: 'angle', angleDeg: 7 },
];

describe.each(FIELDS)('the ends of the field given as $kind', (size) => {
  const sketch: Sketch = {
    ...demo,
    object: { distanceMm: 120, medium: 'air' },
    field: { ...demo.field, size },
  };
  const drawn = pictureFor(sketch, { setting: AT_MIDDLE });
  const dragged = (id: string, dyMm: number) => edited(sketch, moveOf(grip(drawn, id), { dyMm }).edit);

  it('at the image follow the hand, and keep the kind', () => {
    const before = drawn.scene.imageHeightMm!;
    const next = dragged('field:end', 0.5);
    expect(next.field.size.kind).toBe(size.kind);
    expect(sceneFor(next, { setting: AT_MIDDLE }).imageHeightMm).toBeCloseTo(before + 0.5, DIGITS);
  });

  it('at the object follow the hand', () => {
    const before = drawn.scene.objectHeightMm!;
    expect(sceneFor(dragged('object:tip', -2), { setting: AT_MIDDLE }).objectHeightMm).toBeCloseTo(
      before - 2,
      DIGITS,
    );
  });

  it('never cross the axis', () => {
    const before = drawn.scene.imageHeightMm!;
    const crossed = sceneFor(dragged('field:end', -3 * before), { setting: AT_MIDDLE }).imageHeightMm!;
    expect(Math.sign(crossed)).toBe(Math.sign(before));
    expect(Math.abs(crossed)).toBeLessThan(0.1);
  });

  it('take a height when it is typed, on either side', () => {
    const { entry } = grip(drawn, 'field:end');
    for (const typed of [3, -3]) {
      const height = sceneFor(edited(sketch, entry!.set(typed)), { setting: AT_MIDDLE }).imageHeightMm!;
      expect(Math.abs(height)).toBeCloseTo(3, DIGITS);
    }
  });
});

describe('the object’s tip beyond a fold', () => {
  it('grows by 0.2 % for each px outwards', () => {
    const { view, scene } = picture;
    const pxPerMm = view.pxPerMm * view.stretch;
    const down = edited(demo, moveOf(grip(picture, 'object:tip'), { dyMm: -50 / pxPerMm }).edit);
    expect(scene.objectHeightMm).toBeLessThan(0);
    expect(down.field.size).toEqual({ kind: 'imageHeight', heightMm: expect.closeTo(5.5 * 1.1, 9) });
  });
});

describe('a wide field from infinity', () => {
  it('stays below 90° however far its end is dragged', () => {
    const far: Sketch = { ...emptySketch(), parts: [newThin(50)], stop: 'p1' as PartId };
    const drawn = pictureFor(far);
    const { size } = edited(far, moveOf(grip(drawn, 'field:end'), { dyMm: 4000 }).edit).field;
    if (size.kind !== 'angle') throw new Error('the kind stays');
    expect(size.angleDeg).toBeGreaterThan(89);
    expect(size.angleDeg).toBeLessThan(90);
  });
});

describe('the sensor', () => {
  it('is fixed at the place it is dragged to', () => {
    const following: Sketch = { ...demo, image: 'focus' };
    const drawn = pictureFor(following, { setting: AT_MIDDLE });
    const handle = grip(drawn, 'image');
    expect(handle.label).toBe('image, follows the focus');
    const move = moveOf(handle, { dzMm: 2 });
    const after = edited(following, move.edit);
    expect(after.image).toBe('fixed');
    expect(after.parts[3]?.space.lengthMm).toBeCloseTo(28, DIGITS);
    expect(move.says).toBe('28.000 mm');
  });

  it('that is fixed moves by the hand, the keys and the number typed', () => {
    const handle = grip(picture, 'image');
    expect(handle.label).toBe('sensor, position');
    const behind = (sketch: Sketch) => sketch.parts[3]?.space.lengthMm;
    expect(behind(edited(demo, moveOf(handle, { dzMm: -3 }).edit))).toBeCloseTo(23, DIGITS);
    expect(behind(edited(demo, handle.step!(0.1, false)))).toBeCloseTo(26.1, DIGITS);
    expect(behind(edited(demo, handle.entry!.set(25)))).toBe(25);
  });

  it('is caught by the paraxial image, which it is then in focus with', () => {
    const off: Sketch = {
      ...demo,
      parts: demo.parts.with(3, { ...demo.parts[3]!, space: { lengthMm: 24, medium: 'air' } }),
    };
    const drawn = pictureFor(off, { setting: AT_MIDDLE });
    const move = moveOf(grip(drawn, 'image'), { dzMm: 1.9, snap: true, toleranceMm: 0.3 });
    expect(move.caught?.name).toBe('paraxial image');
    const { defocusMm } = analysisOf(edited(off, move.edit), AT_MIDDLE).conjugates;
    expect(defocusMm.ok && Math.abs(defocusMm.value)).toBeLessThan(1e-9);
  });

  it('of each position’s own does not move between positions', () => {
    const split: Sketch = {
      ...demo,
      parts: demo.parts.with(3, {
        ...demo.parts[3]!,
        space: { lengthMm: { [WIDE]: 26, [MIDDLE]: 26, [NARROW]: 27 }, medium: 'air' },
      }),
    };
    const between = pictureFor(split, { setting: BETWEEN_MIDDLE_AND_NARROW });
    expect(grip(between, 'image')).toMatchObject({ drag: null, step: null, entry: null, why: BETWEEN });
  });
});
