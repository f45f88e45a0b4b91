import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import { analysisOf } from '../../../app/live/analysis.ts';
import { currentReading, onReading } from '../../../app/live/reading.ts';
import { applyEdit, openSketch } from '../../../app/store/sketchStore.ts';
import { setView } from '../../../app/store/viewStore.ts';
import type { PartId, PositionId, Sketch } from '../../../engine/index.ts';
import { emptySketch, newThin, setFocalLength, settingAt } from '../../../engine/index.ts';

const PART = 'p1' as PartId;
const only = settingAt('only' as PositionId);
const lens: Sketch = { ...emptySketch('one lens'), parts: [newThin(50, PART)] };

describe('what is read from a sketch', () => {
  const frames: (() => void)[] = [];
  beforeEach(() => {
    vi.stubGlobal('requestAnimationFrame', (run: () => void) => frames.push(run));
    frames.length = 0;
  });
  afterEach(() => {
    for (const run of frames.splice(0)) run();
    vi.unstubAllGlobals();
  });
  const nextFrame = () => {
    for (const run of frames.splice(0)) run();
  };

  test('the same sketch at the same setting is worked out once', () => {
    expect(analysisOf(lens, only)).toBe(analysisOf(lens, { ...only }));
  });

  test('another setting of the same sketch is worked out by itself', () => {
    const twoPositions: Sketch = {
      ...lens,
      positions: [...lens.positions, { id: 'pos1' as PositionId, name: 'near' }],
    };
    expect(analysisOf(twoPositions, only)).not.toBe(analysisOf(twoPositions, { ...only, toNext: 0.5 }));
  });

  test('a changed sketch has its own analysis, the old one keeps its', () => {
    const stronger = setFocalLength(lens, PART, 25);
    const focal = (sketch: Sketch) => analysisOf(sketch, only).firstOrder.focalLengthMm;
    expect(focal(stronger)).toEqual({ ok: true, value: 25 });
    expect(focal(lens)).toEqual({ ok: true, value: 50 });
  });

  test('the reading is the same object until sketch or view change', () => {
    openSketch(lens);
    const before = currentReading();
    expect(currentReading()).toBe(before);
    setView({ digits: 4 });
    const viewed = currentReading();
    expect(viewed).not.toBe(before);
    expect(viewed.analysis).toBe(before.analysis);
    applyEdit((sketch) => setFocalLength(sketch, PART, 20));
    expect(currentReading().analysis).not.toBe(before.analysis);
  });

  test('readers are woken once in a frame, however much changed in it', () => {
    openSketch(lens);
    nextFrame();
    let woken = 0;
    const stop = onReading(() => {
      woken += 1;
    });
    for (let mm = 10; mm < 30; mm += 1) applyEdit((sketch) => setFocalLength(sketch, PART, mm));
    setView({ digits: 2 });
    expect(woken).toBe(0);
    nextFrame();
    expect(woken).toBe(1);
    stop();
    setView({ digits: 3 });
    nextFrame();
    expect(woken).toBe(1);
  });
});
