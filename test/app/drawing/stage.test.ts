import { describe, expect, it } from 'vitest';
import { stageFold, stageOf } from '../../../app/drawing/stage.ts';
import { analysisOf } from '../../../app/live/analysis.ts';
import type { PartId, Sketch } from '../../../engine/index.ts';
import { emptySketch, newThin, settingAt } from '../../../engine/index.ts';
import { inspectionZoom, MIDDLE } from '../../engine/demo.ts';

const stageIn = (sketch: Sketch) =>
  stageOf(sketch, analysisOf(sketch, settingAt(sketch.positions[0]?.id ?? MIDDLE)));

/** Thin elements at the given distances behind each other, the object at infinity unless said. */
function elements(
  parts: readonly (readonly [focalLengthMm: number, gapMm: number])[],
  distanceMm: number | 'infinity' = 'infinity',
): Sketch {
  return {
    ...emptySketch(),
    object: { distanceMm, medium: 'air' },
    parts: parts.map(([focalLengthMm, lengthMm], index) => ({
      ...newThin(focalLengthMm, `p${index + 1}` as PartId),
      space: { lengthMm, medium: 'air' },
    })),
  };
}

describe('the stage', () => {
  it('of an empty sketch is 200 mm of axis with neither end', () => {
    expect(stageIn(emptySketch())).toEqual({
      startMm: 0,
      endMm: 200,
      parts: { fromMm: 0, toMm: 200 },
      everything: { fromMm: 0, toMm: 200 },
      objectMm: null,
      imageMm: null,
    });
  });

  it('runs from the object to the fixed sensor where both are near', () => {
    const stage = stageIn(inspectionZoom());
    expect(stage.startMm).toBe(-500);
    expect(stage.objectMm).toBe(-500);
    expect(stage.endMm).toBeCloseTo(110, 9);
    expect(stage.imageMm).toBeCloseTo(110, 9);
    expect(stage.parts.fromMm).toBe(0);
    expect(stage.parts.toMm).toBeCloseTo(110, 9);
  });

  it('lets light from infinity begin a little in front of the first part and end in the focus', () => {
    const stage = stageIn(elements([[50, 0]]));
    expect(stage.objectMm).toBeNull();
    expect(stage.imageMm).toBeCloseTo(50, 9);
    expect(stage.endMm).toBeCloseTo(50, 9);
    expect(stage.startMm).toBeLessThan(-10);
    expect(stage.startMm).toBeGreaterThanOrEqual(-50);
  });

  it('of an afocal layout has no image, and rays run on a little behind the last part', () => {
    const stage = stageIn(
      elements([
        [100, 150],
        [50, 0],
      ]),
    );
    expect(stage.imageMm).toBeNull();
    expect(stage.endMm).toBeGreaterThan(150);
    expect(stage.endMm).toBeLessThan(300);
    expect(stage.parts.toMm).toBe(stage.endMm);
  });

  it('keeps the focus of a single element, however weak', () => {
    expect(stageIn(elements([[300, 0]])).endMm).toBeCloseTo(300, 9);
    expect(stageIn(elements([[2500, 0]])).imageMm).toBeCloseTo(2500, 9);
  });

  it('leaves an image that falls very far behind off the sheet', () => {
    const stage = stageIn(
      elements([
        [100, 150.01],
        [50, 0],
      ]),
    );
    expect(stage.imageMm).toBeNull();
    expect(stage.endMm).toBeLessThan(300);
  });

  it('never loses a fixed sensor, however far away it is put', () => {
    const sketch: Sketch = { ...elements([[10, 4000]]), image: 'fixed' };
    expect(stageIn(sketch)).toMatchObject({ imageMm: 4000, endMm: 4000 });
  });

  it('keeps an image in front of the last part, where rays do not end', () => {
    const stage = stageIn(elements([[-50, 0]]));
    expect(stage.imageMm).toBeCloseTo(-50, 9);
    expect(stage.endMm).toBeGreaterThan(0);
  });

  it('spans all parts when a gap is negative', () => {
    const stage = stageIn(
      elements([
        [50, -20],
        [60, 5],
        [70, 0],
      ]),
    );
    expect(stage.parts.fromMm).toBe(-20);
    expect(stage.parts.toMm).toBeGreaterThanOrEqual(0);
  });
});

describe('the fold of object space', () => {
  it('cuts a space that is long against the parts, keeping the piece next to them to scale', () => {
    const fold = stageFold(stageIn(inspectionZoom()));
    expect(fold?.fromMm).toBe(-500);
    expect(fold?.toMm).toBeLessThan(-20);
    expect(fold?.toMm).toBeGreaterThan(-110);
  });

  it('is absent for an object that is near or at infinity', () => {
    expect(stageFold(stageIn(elements([[50, 0]], 60)))).toBeNull();
    expect(stageFold(stageIn(elements([[50, 0]])))).toBeNull();
  });
});
