import { describe, expect, it } from 'vitest';
import { cellsOf } from '../../../app/ribbon/cells.ts';
import type { View } from '../../../app/store/viewStore.ts';
import type { PartId, Sketch } from '../../../engine/index.ts';
import { emptySketch, newThin } from '../../../engine/index.ts';
import { inspectionZoom } from '../../engine/demo.ts';
import { AT_MIDDLE, BETWEEN_MIDDLE_AND_NARROW, frontsOf, sightFor, withPlate } from '../drawing/seen.ts';

const demo = inspectionZoom();
const cells = (sketch: Sketch = demo, change: Partial<View> = {}) =>
  cellsOf(sightFor(sketch, { setting: AT_MIDDLE, ...change }));
const cell = (id: string, sketch: Sketch = demo, change: Partial<View> = {}) =>
  cells(sketch, change).find((one) => one.id === id);

/** The demo with the gap behind the second group changed. */
const withSecondGap = (lengthMm: number): Sketch => ({
  ...demo,
  parts: demo.parts.with(1, { ...demo.parts[1]!, space: { lengthMm, medium: 'air' } }),
});

describe('the ribbon’s dimensions', () => {
  it('run from the object to the sensor without a break', () => {
    expect(cells().map(({ id }) => id)).toEqual(['object', 'gap:p1', 'gap:p2', 'gap:p3', 'gap:p4']);
    for (const [i, one] of cells().slice(1).entries()) expect(one.fromMm).toBe(cells()[i]?.toMm);
    for (const one of cells()) expect(one.valueMm).toBeCloseTo(one.toMm - one.fromMm, 9);
    expect(cells()[0]).toMatchObject({ valueMm: 500, label: 'object distance', after: null });
    expect(cells().at(-1)).toMatchObject({ kind: 'image', label: 'sensor behind fourth group', after: 'p4' });
    expect(cells().at(-1)?.valueMm).toBeCloseTo(26, 9);
  });

  it('show the stored gaps on a position and what is interpolated between two', () => {
    expect(cell('gap:p2')?.valueMm).toBeCloseTo(25.3145182543316, 9);
    const fronts = frontsOf(demo, BETWEEN_MIDDLE_AND_NARROW);
    const between = cell('gap:p2', demo, { setting: BETWEEN_MIDDLE_AND_NARROW });
    expect(between?.valueMm).toBeCloseTo(fronts[2]! - fronts[1]!, 9);
    expect(between?.valueMm).not.toBeCloseTo(25.3145182543316, 1);
  });

  it('say which are common to all positions and which each position has for itself', () => {
    expect(cells().map(({ common, split }) => [common, split])).toEqual([
      [true, false],
      [false, true],
      [false, true],
      [false, true],
      [true, false],
    ]);
    const single: Sketch = { ...withSecondGap(20), positions: demo.positions.slice(1, 2) };
    expect(cell('gap:p2', single)).toMatchObject({ common: false, split: false });
  });

  it('let the last one follow the focus, neither common nor split, until the sensor is fixed', () => {
    const following: Sketch = { ...demo, image: 'focus' };
    const last = cell('gap:p4', following);
    expect(last).toMatchObject({ follows: true, common: false, split: false, kind: 'image' });
    expect(last?.label).toBe('image behind fourth group');
    expect(last?.valueMm).toBeCloseTo(26, 6);
    expect(cell('gap:p4')?.follows).toBe(false);
  });

  it('have none for an end at infinity, and none on an empty axis', () => {
    const far: Sketch = { ...demo, object: { distanceMm: 'infinity', medium: 'air' } };
    expect(cells(far).map(({ id }) => id)).not.toContain('object');
    const afocal: Sketch = {
      ...emptySketch(),
      parts: [
        { ...newThin(100, 'p1' as PartId), space: { lengthMm: 150, medium: 'air' } },
        newThin(50, 'p2' as PartId),
      ],
    };
    expect(cells(afocal).map(({ id }) => id)).toEqual(['gap:p1']);
    expect(cells(emptySketch())).toEqual([]);
  });

  it('count a plate’s thickness on its own, gaps from face to face', () => {
    expect(cells(withPlate()).slice(0, 3)).toMatchObject([
      { id: 'gap:p1', fromMm: 0, toMm: 10 },
      { id: 'thickness:p2', fromMm: 10, toMm: 16, valueMm: 6, label: 'thickness of plate 2' },
      { id: 'gap:p2', fromMm: 16, toMm: 21, valueMm: 5, label: 'gap behind plate 2' },
    ]);
  });
});

describe('a dimension that cannot be built', () => {
  const badIds = (sketch: Sketch) => cells(sketch).flatMap(({ id, bad }) => (bad ? [id] : []));

  it('is a negative gap', () => {
    expect(badIds(demo)).toEqual([]);
    expect(badIds(withSecondGap(-3))).toEqual(['gap:p2']);
    expect(cell('gap:p2', withSecondGap(-3))?.valueMm).toBeCloseTo(-3, 9);
  });

  it('is a gap smaller than the rooms of its neighbours', () => {
    const roomy = withSecondGap(5);
    const parts = roomy.parts.with(1, { ...roomy.parts[1]!, roomBehindMm: 6 } as never);
    expect(badIds({ ...roomy, parts })).toEqual(['gap:p2']);
  });

  it('is an object inside the room of the first part', () => {
    const parts = demo.parts.with(0, { ...demo.parts[0]!, roomFrontMm: 4 } as never);
    expect(badIds({ ...demo, parts, object: { distanceMm: 3, medium: 'air' } })).toEqual(['object']);
  });

  it('is a sensor fixed inside the last part, but not a virtual image, which nobody builds', () => {
    const inside = demo.parts.with(3, { ...demo.parts[3]!, space: { lengthMm: -2, medium: 'air' } });
    expect(badIds({ ...demo, parts: inside })).toEqual(['gap:p4']);
    const virtual: Sketch = { ...emptySketch(), parts: [newThin(-50)] };
    expect(cell('gap:p1', virtual)?.valueMm).toBeCloseTo(-50, 9);
    expect(badIds(virtual)).toEqual([]);
  });
});
