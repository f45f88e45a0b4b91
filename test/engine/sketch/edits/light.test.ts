import { describe, expect, test } from 'vitest';
import { LINES } from '../../../../engine/sketch/create.ts';
import {
  joinStopDiameter,
  setAperture,
  setAssumedIndex,
  setBlur,
  setField,
  setFractions,
  setLines,
  setStopDiameter,
  setVignetting,
  splitStopDiameter,
} from '../../../../engine/sketch/edits/light.ts';
import { setNotes, setTitle } from '../../../../engine/sketch/edits/text.ts';
import { propose, unsettled } from '../../../../engine/sketch/propose.ts';
import { inspectionZoom, NARROW, WIDE } from '../../demo.ts';

describe('the aperture', () => {
  test('changes its kind with its value', () => {
    const sketch = setAperture(inspectionZoom(), { kind: 'objectNA', na: 0.02 });
    expect(sketch.aperture).toEqual({ kind: 'objectNA', na: 0.02 });
    expect(setAperture(sketch, { kind: 'objectNA', na: 0.02 })).toBe(sketch);
  });

  test('as a stop diameter may be one for all positions or one for each', () => {
    const common = setStopDiameter(inspectionZoom(), 12, WIDE);
    expect(common.aperture).toEqual({ kind: 'stopDiameter', diameterMm: 12 });
    const split = setStopDiameter(splitStopDiameter(common), 16, NARROW);
    expect(split.aperture).toEqual({
      kind: 'stopDiameter',
      diameterMm: { wide: 12, middle: 12, narrow: 16 },
    });
    expect(joinStopDiameter(split, NARROW).aperture).toEqual({ kind: 'stopDiameter', diameterMm: 16 });
    const other = inspectionZoom();
    expect(splitStopDiameter(other)).toBe(other);
    expect(joinStopDiameter(other, WIDE)).toBe(other);
  });

  test('of a stop without diameter is refused', () => {
    const before = inspectionZoom();
    const proposal = propose(before, (sketch) => setStopDiameter(sketch, 0, WIDE), unsettled);
    expect(proposal.sketch).toBe(before);
    expect(proposal.note?.faults[0]?.sentence).toBe(
      'The stop diameter is 0 mm; it must be above 0 and at most 1,000,000 mm.',
    );
  });
});

describe('the field and the lines', () => {
  test('are set one by one', () => {
    const start = inspectionZoom();
    const sketch = setVignetting(setFractions(setField(start, { kind: 'angle', angleDeg: 20 }), [0, 1]), 0.2);
    expect(sketch.field).toEqual({
      size: { kind: 'angle', angleDeg: 20 },
      fractions: [0, 1],
      vignetting: 0.2,
    });
    expect(setLines(sketch, LINES.e).lines).toEqual({ ...sketch.lines, ...LINES.e });
    expect(setBlur(setAssumedIndex(sketch, 1.7), 0.01)).toMatchObject({ assumedIndex: 1.7, blurMm: 0.01 });
    expect(setNotes(setTitle(sketch, 'B'), 'n')).toMatchObject({ title: 'B', notes: 'n' });
  });

  test('keep the sketch when they are what they were', () => {
    const same = inspectionZoom();
    expect(setField(same, { kind: 'imageHeight', heightMm: 5.5 })).toBe(same);
    expect(setFractions(same, [0, 0.7, 1])).toBe(same);
    expect(setLines(same, { ...LINES.d })).toBe(same);
    expect(setTitle(same, 'Inspection zoom')).toBe(same);
  });

  test('of 90° or more are refused', () => {
    const before = inspectionZoom();
    const proposal = propose(
      before,
      (sketch) => setField(sketch, { kind: 'angle', angleDeg: 90 }),
      unsettled,
    );
    expect(proposal).toMatchObject({ sketch: before, note: { kind: 'refused' } });
  });
});
