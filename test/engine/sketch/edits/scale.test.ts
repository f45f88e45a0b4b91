import { fc, test } from '@fast-check/vitest';
import { describe, expect } from 'vitest';
import { scaleParts, scaleSketch, scaleToFocalLength } from '../../../../engine/sketch/edits/scale.ts';
import type { Sketch } from '../../../../engine/sketch/types.ts';
import { inspectionZoom } from '../../demo.ts';
import { anySketch } from '../arbitrary.ts';
import { gapsOf, id, row } from '../layout.ts';

describe('scaling the whole layout', () => {
  test('scales every length of it, but not the sensor or the mount', () => {
    const sketch = scaleSketch({ ...inspectionZoom(), registerMm: 17.526 }, 2);
    expect(sketch.parts.map((part) => part.kind === 'thin' && part.focalLengthMm)).toEqual([
      -64, 56, -92, 96,
    ]);
    expect(gapsOf(sketch)[3]).toBe(52);
    expect(sketch.object.distanceMm).toBe(1000);
    expect(sketch.field.size).toEqual({ kind: 'imageHeight', heightMm: 11 });
    expect(sketch.aperture).toEqual({ kind: 'workingFNumber', fNumber: 5.6 });
    expect([sketch.sensor, sketch.registerMm]).toEqual([inspectionZoom().sensor, 17.526]);
  });

  test('scales stop and pupil diameters, and leaves an object at infinity there', () => {
    const stop: Sketch = { ...row(10), aperture: { kind: 'stopDiameter', diameterMm: 8 } };
    expect(scaleSketch(stop, 0.5).aperture).toEqual({ kind: 'stopDiameter', diameterMm: 4 });
    expect(scaleSketch(stop, 0.5).object.distanceMm).toBe('infinity');
    const pupil: Sketch = { ...row(10), aperture: { kind: 'entrancePupilDiameter', diameterMm: 8 } };
    expect(scaleSketch(pupil, 0.5).aperture).toEqual({ kind: 'entrancePupilDiameter', diameterMm: 4 });
  });

  test('brings a focal length to another', () => {
    expect(scaleToFocalLength(row(10), 50, 75).parts[0]).toMatchObject({ focalLengthMm: 75 });
    expect(scaleToFocalLength(row(10), -50, -75).parts[0]).toMatchObject({ focalLengthMm: 75 });
  });

  test.each([0, -2, 1, Number.NaN, Infinity])('by %d changes nothing', (factor) => {
    const sketch = inspectionZoom();
    expect(scaleSketch(sketch, factor)).toBe(sketch);
    expect(scaleParts(sketch, [id('p1')], factor)).toBe(sketch);
    expect(scaleToFocalLength(sketch, 50, 50 * factor)).toBe(sketch);
  });

  test.prop([anySketch(), fc.constantFrom(2, 4, 0.5, 0.125)])(
    'there and back by a power of two gives it back',
    (sketch, factor) => {
      expect(scaleSketch(scaleSketch(sketch, factor), 1 / factor)).toEqual(sketch);
    },
  );
});

describe('scaling some parts', () => {
  test('scales them and the gaps between two neighbours among them', () => {
    const sketch = scaleParts(row(10, 20, 30, 40), [id('p2'), id('p3')], 3);
    expect(gapsOf(sketch)).toEqual([10, 60, 30, 40]);
    expect(sketch.parts.map((part) => part.kind === 'thin' && part.focalLengthMm)).toEqual([
      50, 150, 150, 50,
    ]);
  });

  test('that are not there changes nothing', () => {
    const sketch = row(10, 20);
    expect(scaleParts(sketch, [id('p9')], 2)).toBe(sketch);
  });
});
