import { beforeEach, describe, expect, it, vi } from 'vitest';
import { setDown, TRAY } from '../../../app/layout/tray.ts';
import { openSketch, sketchStore, undo } from '../../../app/store/sketchStore.ts';
import { setView, viewStore } from '../../../app/store/viewStore.ts';
import type { PartId } from '../../../engine/index.ts';
import { emptySketch } from '../../../engine/index.ts';
import { inspectionZoom } from '../../engine/demo.ts';
import { AT_MIDDLE, frontsOf } from '../drawing/seen.ts';

vi.stubGlobal('requestAnimationFrame', () => 0);

const sketch = () => sketchStore.getState().sketch;
const view = () => viewStore.getState();
const onAxis = (zMm: number) => ({ zMm, onto: null });

describe('setting a part down', () => {
  beforeEach(() => {
    viewStore.setState({ ...viewStore.getInitialState(), setting: AT_MIDDLE, placing: 'positive' }, true);
    openSketch(emptySketch());
  });

  it('makes the first one the datum, wherever it is dropped, and the stop', () => {
    setDown('positive', onAxis(130));
    expect(sketch().parts).toMatchObject([{ kind: 'thin', focalLengthMm: 50 }]);
    expect(sketch().stop).toBe(sketch().parts[0]?.id);
  });

  it('leaves the first one under the pointer, and the sheet where it is for the next', () => {
    const { originMm } = view().camera;
    setDown('positive', onAxis(130));
    expect(0 - view().camera.originMm).toBe(130 - originMm);
    const { camera } = view();
    setDown('positive', onAxis(40));
    expect(view().camera).toBe(camera);
  });

  it('selects it, opens its focal length and empties the hand, as one step', () => {
    setDown('negative', onAxis(0));
    const id = sketch().parts[0]?.id;
    expect(view()).toMatchObject({ selection: [id], typing: `focal:${id}:rear`, placing: null });
    expect(sketch().parts).toMatchObject([{ focalLengthMm: -50 }]);
    undo();
    expect(sketch().parts).toEqual([]);
  });

  it('puts the next where it is dropped, behind or in front', () => {
    setDown('positive', onAxis(0));
    setDown('plate', onAxis(30));
    expect(frontsOf(sketch())).toEqual([0, 30]);
    expect(view().typing).toBeNull();
    setDown('positive', onAxis(-20));
    expect(frontsOf(sketch())).toEqual([0, 20, 50]);
  });

  it('splits the gap that it falls in, so that nothing else moves', () => {
    openSketch(inspectionZoom());
    const before = frontsOf(sketch());
    setDown('positive', onAxis(60));
    const after = frontsOf(sketch());
    expect(after.toSpliced(3, 1)).toEqual(before.map((front) => expect.closeTo(front, 9)));
    expect(after[3]).toBeCloseTo(60, 9);
  });

  it('lets a stop stand free on the axis, or ride on the part it is dropped on', () => {
    openSketch({ ...inspectionZoom(), stop: null });
    setDown('stop', onAxis(60));
    const free = sketch().parts[3];
    expect(free?.kind).toBe('stop');
    expect(sketch().stop).toBe(free?.id);
    setDown('stop', { zMm: 84, onto: 'p4' as PartId });
    expect(sketch().stop).toBe('p4');
    expect(view().selection).toEqual(['p4']);
    expect(sketch().parts.map(({ kind }) => kind)).toEqual(['thin', 'thin', 'thin', 'thin']);
  });

  it('offers every kind by a name of its own', () => {
    expect(new Set(TRAY.map(({ label }) => label)).size).toBe(TRAY.length);
    for (const { kind } of TRAY) {
      openSketch(emptySketch());
      setView({ placing: kind });
      setDown(kind, onAxis(10));
      expect(sketch().parts).toHaveLength(1);
    }
  });
});
