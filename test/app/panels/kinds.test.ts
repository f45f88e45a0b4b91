import { describe, expect, it } from 'vitest';
import type { Reading } from '../../../app/live/reading.ts';
import {
  APERTURE_CHOICES,
  apertureOfKind,
  FIELD_CHOICES,
  fieldOfKind,
} from '../../../app/panels/sketch/apertureKinds.ts';
import type { Sketch } from '../../../engine/index.ts';
import { analyse, faultsOf, setAperture, setField, settingAt } from '../../../engine/index.ts';
import { inspectionZoom, MIDDLE, NARROW, WIDE } from '../../engine/demo.ts';
import { readingOf as reading } from '../reading.ts';
import { empty } from './sketches.ts';

const readingOf = (sketch: Sketch, at = sketch.positions[0]?.id ?? WIDE): Reading =>
  reading(sketch, { setting: settingAt(at) });

describe('another kind of aperture', () => {
  const sketch = inspectionZoom();

  it.each(APERTURE_CHOICES)('keeps the light: $label', ({ value: kind }) => {
    const changed = setAperture(sketch, apertureOfKind(kind, readingOf(sketch, MIDDLE)));
    const { workingFNumber } = analyse(changed, settingAt(MIDDLE)).light;
    expect(workingFNumber.ok && workingFNumber.value).toBeCloseTo(5.6, 7);
    expect(faultsOf(changed)).toEqual([]);
  });

  it('gives every position its own stop diameter where they differ', () => {
    const changed = setAperture(sketch, apertureOfKind('stopDiameter', readingOf(sketch, MIDDLE)));
    for (const id of [WIDE, MIDDLE, NARROW]) {
      const { workingFNumber } = analyse(changed, settingAt(id)).light;
      expect(workingFNumber.ok && workingFNumber.value).toBeCloseTo(5.6, 7);
    }
  });

  it.each(APERTURE_CHOICES)('is a sound one on an empty sketch: $label', ({ value: kind }) => {
    expect(faultsOf(setAperture(empty(), apertureOfKind(kind, readingOf(empty()))))).toEqual([]);
  });
});

describe('another kind of field', () => {
  const sketch = inspectionZoom();

  it.each(FIELD_CHOICES)('keeps the image height: $label', ({ value: kind }) => {
    const { analysis } = readingOf(sketch, MIDDLE);
    const changed = setField(sketch, fieldOfKind(kind, analysis));
    const { imageHeightMm } = analyse(changed, settingAt(MIDDLE)).light;
    expect(imageHeightMm.ok && imageHeightMm.value).toBeCloseTo(5.5, 7);
    expect(faultsOf(changed)).toEqual([]);
  });

  it.each(FIELD_CHOICES)('is a sound one on an empty sketch: $label', ({ value: kind }) => {
    expect(faultsOf(setField(empty(), fieldOfKind(kind, readingOf(empty()).analysis)))).toEqual([]);
  });
});
