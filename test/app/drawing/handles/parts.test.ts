import { describe, expect, it } from 'vitest';
import { recorderPen } from '../../../../app/board/recorderPen.ts';
import { xOf, yOf } from '../../../../app/board/viewport.ts';
import { BETWEEN } from '../../../../app/drawing/handle.ts';
import { paintParts } from '../../../../app/layout/paint.ts';
import type { PartId, Sketch } from '../../../../engine/index.ts';
import { settingAt, tieParts } from '../../../../engine/index.ts';
import { inspectionZoom, MIDDLE, NARROW, WIDE } from '../../../engine/demo.ts';
import {
  AT_MIDDLE,
  BETWEEN_MIDDLE_AND_NARROW,
  demoPicture,
  edited,
  frontsOf,
  grip,
  moveOf,
  partOf,
  pictureFor,
  withPlate,
} from '../seen.ts';

const demo = inspectionZoom();
const [, SECOND, THIRD, FOURTH] = frontsOf(demo) as [number, number, number, number];
const picture = demoPicture();

/** Lengths are added and taken away once each. */
const DIGITS = 9;

const gapsAt = (sketch: Sketch, position = MIDDLE) =>
  sketch.parts.map(({ space }) =>
    typeof space.lengthMm === 'number' ? space.lengthMm : (space.lengthMm[position] ?? Number.NaN),
  );
const changes = (sketch: Sketch, position = MIDDLE) =>
  gapsAt(sketch, position).map((gap, i) => gap - (gapsAt(demo, position)[i] ?? Number.NaN));
const expectChanges = (sketch: Sketch, wanted: readonly number[], position = MIDDLE) => {
  for (const [i, change] of changes(sketch, position).entries())
    expect(change).toBeCloseTo(wanted[i]!, DIGITS);
};
const selecting = (...ids: readonly string[]) => demoPicture({ selection: ids as readonly PartId[] });

describe('dragging a part', () => {
  it('changes the gaps on both sides of it and nothing else', () => {
    const move = moveOf(grip(picture, 'part:p2'), { dzMm: 3 });
    const after = edited(demo, move.edit);
    expectChanges(after, [3, -3, 0, 0]);
    expectChanges(after, [0, 0, 0, 0], WIDE);
    expectChanges(after, [0, 0, 0, 0], NARROW);
    expect(after.object).toBe(demo.object);
    expect(move).toMatchObject({ says: '29.272 mm', caught: null, frameMm: 0 });
  });

  it('with Shift moves everything behind along, the sensor too', () => {
    const after = edited(demo, moveOf(grip(picture, 'part:p2'), { dzMm: 3, other: true }).edit);
    expectChanges(after, [3, 0, 0, 0]);
  });

  it('that is the last leaves a fixed sensor where it is', () => {
    const after = edited(demo, moveOf(grip(picture, 'part:p4'), { dzMm: -2 }).edit);
    expectChanges(after, [0, 0, -2, 2]);
  });

  it('that is the last leaves an image that follows the focus to follow it', () => {
    const following: Sketch = { ...demo, image: 'focus' };
    const drawn = pictureFor(following, { setting: AT_MIDDLE });
    const after = edited(following, moveOf(grip(drawn, 'part:p4'), { dzMm: -2 }).edit);
    expect(after.image).toBe('focus');
    expectChanges(after, [0, 0, -2, 0]);
  });

  it('that is the first keeps the object and all other parts in place, and tells how far the frame moves', () => {
    const move = moveOf(grip(picture, 'part:p1'), { dzMm: 4 });
    const after = edited(demo, move.edit);
    expect(after.object.distanceMm).toBe(504);
    expectChanges(after, [-4, 0, 0, 0]);
    expect(move).toMatchObject({ says: '+4.000 mm', frameMm: 4 });
    const before = frontsOf(demo);
    for (const [i, front] of frontsOf(after).slice(1).entries())
      expect(front + 4).toBeCloseTo(before[i + 1]!, DIGITS);
  });

  it('moves all selected parts when it is one of them, else itself alone', () => {
    const both = selecting('p2', 'p3');
    expectChanges(edited(demo, moveOf(grip(both, 'part:p3'), { dzMm: 1 }).edit), [1, 0, -1, 0]);
    expectChanges(edited(demo, moveOf(grip(both, 'part:p4'), { dzMm: 1 }).edit), [0, 0, 1, -1]);
  });

  it('takes the parts tied to it along', () => {
    const tied = tieParts(demo, ['p2', 'p3'] as PartId[], 'pair');
    const drawn = pictureFor(tied, { setting: AT_MIDDLE });
    expectChanges(edited(tied, moveOf(grip(drawn, 'part:p2'), { dzMm: 1 }).edit), [1, 0, -1, 0]);
  });

  it('may pass its neighbour: such a gap can be drawn, and is warned about', () => {
    const after = edited(demo, moveOf(grip(picture, 'part:p2'), { dzMm: -30 }).edit);
    expect(gapsAt(after)[0]).toBeCloseTo(SECOND - 30, DIGITS);
    const warnings = pictureFor(after, { setting: AT_MIDDLE }).reading.warnings;
    expect(warnings[0]).toMatchObject({ kind: 'negative gap', partId: 'p1' });
  });

  it('by the keyboard comes to the same as by the pointer', () => {
    const handle = grip(picture, 'part:p3');
    for (const other of [false, true])
      expect(edited(demo, handle.step!(0.1, other))).toEqual(
        edited(demo, moveOf(handle, { dzMm: 0.1, other }).edit),
      );
  });

  it('by typing puts it at that place behind the first part, which itself has none', () => {
    const { entry } = grip(picture, 'part:p3');
    expect(entry).toMatchObject({ label: 'third group, behind the first part', unit: 'mm', value: THIRD });
    const after = edited(demo, entry!.set(50));
    expect(frontsOf(after)[2]).toBeCloseTo(50, DIGITS);
    expect(frontsOf(after)[3]).toBeCloseTo(FOURTH, DIGITS);
    expect(grip(picture, 'part:p1').entry).toBeNull();
  });

  it('by typing is not offered where the first part, which places count from, moves along', () => {
    const tied = tieParts(demo, ['p1', 'p2'] as PartId[], 'front');
    expect(grip(pictureFor(tied, { setting: AT_MIDDLE }), 'part:p2').entry).toBeNull();
    expect(grip(selecting('p1', 'p2'), 'part:p2').entry).toBeNull();
  });

  it('by typing follows the toggle that stands for Shift', () => {
    const toggled = demoPicture({ otherRule: true });
    const after = edited(demo, grip(toggled, 'part:p3').entry!.set(THIRD + 2));
    expectChanges(after, [0, 2, 0, 0]);
  });

  it('says its name and place to a screen reader', () => {
    expect(grip(picture, 'part:p2')).toMatchObject({
      label: 'second group, position',
      slider: { valueText: 'second group, 26.272 mm behind the first part', orientation: 'horizontal' },
      cursor: 'ew-resize',
      selects: 'p2',
    });
    expect(grip(picture, 'part:p1').slider?.valueText).toBe('first group, first part');
    expect(grip(demoPicture({ unit: 'in' }), 'part:p2').slider?.valueText).toContain('1.03434 in');
  });

  it('can be taken on its whole line', () => {
    const { view, scene } = picture;
    const handle = grip(picture, 'part:p4');
    expect(handle.xPx).toBeCloseTo(xOf(view, 84), 6);
    expect(handle.line?.topPx).toBeCloseTo(yOf(view, scene.parts[3]!.semiMm), 9);
    expect(handle.line?.bottomPx).toBeCloseTo(yOf(view, -scene.parts[3]!.semiMm), 9);
  });
});

describe('between positions', () => {
  const between = demoPicture({ setting: BETWEEN_MIDDLE_AND_NARROW, selection: ['p2' as PartId] });

  it('a part beside a gap of its own for each position refuses to move, and says what to do', () => {
    for (const id of ['part:p2', 'tick:p2', 'part:p4'])
      expect(grip(between, id)).toMatchObject({ drag: null, step: null, entry: null, why: BETWEEN });
  });

  it('what is common to all positions can still be changed', () => {
    const after = edited(demo, moveOf(grip(between, 'focal:p2:rear'), { dzMm: 2 }).edit);
    expect(partOf(after, 'p2')).toMatchObject({ focalLengthMm: 30 });
    const plain: Sketch = {
      ...demo,
      parts: demo.parts.map((part) => ({ ...part, space: { ...part.space, lengthMm: 20 } })),
    };
    const drawn = pictureFor(plain, { setting: BETWEEN_MIDDLE_AND_NARROW });
    const moved = edited(plain, moveOf(grip(drawn, 'part:p2'), { dzMm: 2 }).edit);
    expect(moved.parts.map(({ space }) => space.lengthMm)).toEqual([22, 18, 20, 20]);
  });
});

describe('dragging a focal point', () => {
  const second = selecting('p2');
  const first = selecting('p1');
  const focalOf = (drawn: typeof second, id: string, dzMm: number) =>
    edited(demo, moveOf(grip(drawn, id), { dzMm }).edit).parts.map((part) =>
      part.kind === 'thin' ? part.focalLengthMm : null,
    );

  it('belongs to the selected part only', () => {
    const ids = second.handles.map(({ id }) => id).filter((id) => id.startsWith('focal:'));
    expect(ids).toEqual(['focal:p2:front', 'focal:p2:rear']);
    expect(picture.handles.some(({ id }) => id.startsWith('focal:'))).toBe(false);
  });

  it('sets the focal length to the distance from the part; both points mirror', () => {
    expect(focalOf(second, 'focal:p2:rear', 5)).toEqual([-32, 33, -46, 48]);
    expect(focalOf(second, 'focal:p2:front', 5)).toEqual([-32, 23, -46, 48]);
  });

  it('of a negative element stands on the other side and works alike', () => {
    const { view } = first;
    expect(grip(first, 'focal:p1:rear').xPx).toBeCloseTo(xOf(view, -32), 6);
    expect(focalOf(first, 'focal:p1:rear', -5)).toEqual([-37, 28, -46, 48]);
    expect(focalOf(first, 'focal:p1:front', -5)).toEqual([-27, 28, -46, 48]);
  });

  it.each(['focal:p2:rear', 'focal:p2:front'])('never changes the sign: %s across the part', (id) => {
    for (const dzMm of [-28, 28, -100, 100]) expect(focalOf(second, id, dzMm)[1]).toBeGreaterThan(0);
    for (const dzMm of [-32, 32, -100, 100])
      expect(focalOf(first, id.replace('p2', 'p1'), dzMm)[0]).toBeLessThan(0);
  });

  it('by the arrow keys goes where the arrow points', () => {
    const f = (id: string, step: number) =>
      partOf(edited(demo, grip(second, id).step!(step, false)), 'p2') as { focalLengthMm: number };
    expect(f('focal:p2:rear', 1).focalLengthMm).toBe(29);
    expect(f('focal:p2:front', 1).focalLengthMm).toBe(27);
  });

  it('can be typed with either sign', () => {
    const { entry } = grip(second, 'focal:p2:rear');
    expect(entry).toMatchObject({ label: 'focal length', value: 28 });
    expect(partOf(edited(demo, entry!.set(-28)), 'p2')).toMatchObject({ focalLengthMm: -28 });
  });

  it('off the view keeps its grip at the edge', () => {
    const weak: Sketch = {
      ...demo,
      parts: demo.parts.with(1, { ...demo.parts[1]!, kind: 'thin', focalLengthMm: 4000 } as never),
    };
    const drawn = pictureFor(weak, { setting: AT_MIDDLE, selection: ['p2' as PartId] });
    expect(grip(drawn, 'focal:p2:rear').xPx).toBe(drawn.view.widthPx - 12);
    expect(grip(drawn, 'focal:p2:front').xPx).toBe(12);
    const told = drawn.labels.filter(({ id }) => id.startsWith('focal:p2'));
    expect(told.map(({ text }) => text)).toEqual(['f 4000 mm', 'f 4000 mm']);
    const seen = paintParts(recorderPen(), drawn).map(({ id }) => id);
    expect(seen).toEqual(expect.arrayContaining(['focal:p2:front', 'focal:p2:rear']));
  });
});

describe('dragging a rim', () => {
  const second = selecting('p2');

  it('outwards widens the part, on either side of the axis', () => {
    const { semiMm } = second.scene.parts[1]!;
    for (const [id, dyMm] of [
      ['rim:p2:upper', 2],
      ['rim:p2:lower', -2],
    ] as const) {
      const move = moveOf(grip(second, id), { dyMm });
      expect(partOf(edited(demo, move.edit), 'p2')?.semiDiameterMm).toBeCloseTo(semiMm + 2, DIGITS);
      expect(move.says).toBe(`clear ⌀ ${(2 * semiMm + 4).toFixed(3)} mm`);
    }
  });

  it('across the axis stops short of nothing', () => {
    const after = edited(demo, moveOf(grip(second, 'rim:p2:upper'), { dyMm: -500 }).edit);
    expect(partOf(after, 'p2')?.semiDiameterMm).toBeGreaterThan(0);
  });

  it('by the arrow keys goes where the arrow points', () => {
    const { semiMm } = second.scene.parts[1]!;
    const semi = (id: string) =>
      partOf(edited(demo, grip(second, id).step!(0.5, false)), 'p2')?.semiDiameterMm;
    expect(semi('rim:p2:upper')).toBeCloseTo(semiMm + 0.5, DIGITS);
    expect(semi('rim:p2:lower')).toBeCloseTo(semiMm - 0.5, DIGITS);
  });

  it('typed is the clear diameter', () => {
    expect(partOf(edited(demo, grip(second, 'rim:p2:upper').entry!.set(25)), 'p2')?.semiDiameterMm).toBe(
      12.5,
    );
  });

  it('that is open says so', () => {
    expect(grip(second, 'rim:p2:upper').slider?.valueText).toMatch(/^clear diameter .* mm, open$/);
  });
});

describe('dragging the rear face of a plate', () => {
  const sketch = withPlate();
  const drawn = pictureFor(sketch, { selection: ['p2' as PartId] });

  it('changes its thickness; what is behind moves along', () => {
    const after = edited(sketch, moveOf(grip(drawn, 'thickness:p2'), { dzMm: 2 }).edit);
    expect(partOf(after, 'p2')).toMatchObject({ thicknessMm: 8, space: { lengthMm: 5 } });
    expect(frontsOf(after, settingAt(sketch.positions[0]!.id))).toEqual([0, 10, 23]);
  });

  it('never turns it inside out', () => {
    const after = edited(sketch, moveOf(grip(drawn, 'thickness:p2'), { dzMm: -20 }).edit);
    expect((partOf(after, 'p2') as { thicknessMm: number }).thicknessMm).toBeGreaterThan(0);
  });

  it('shows no grip on parts that have no thickness, and no focal point on the plate', () => {
    const ids = drawn.handles.map(({ id }) => id);
    expect(ids.filter((id) => id.startsWith('thickness:'))).toEqual(['thickness:p2']);
    expect(ids.filter((id) => id.startsWith('focal:'))).toEqual([]);
  });
});
