import { describe, expect, it } from 'vitest';
import { analyse } from '../../../engine/paraxial/analyse.ts';
import { diffractionContrast } from '../../../engine/paraxial/sensor.ts';
import type { Part, Sketch } from '../../../engine/sketch/types.ts';
import { given } from '../quantity.ts';
import { onFirst, plate, sketchOf, thin } from '../sketchOf.ts';

const sensor = { size: { widthMm: 8, heightMm: 6 }, pixelPitchMm: 0.004 };
const analysed = (parts: readonly Part[], more: Partial<Sketch> = {}) => {
  const sketch = sketchOf(parts, 'p1', {
    sensor,
    object: { distanceMm: 150, medium: 'air' },
    aperture: { kind: 'workingFNumber', fNumber: 8 },
    ...more,
  });
  return analyse(sketch, onFirst(sketch));
};

describe('the sensor', () => {
  it('covers its size over |m| at the object', () => {
    const view = analysed([thin('p1', 50)]).sensor;
    expect(given(view.halfDiagonalMm)).toBe(5);
    expect(given(view.objectWidthMm)).toBeCloseTo(16, 12);
    expect(given(view.objectHeightMm)).toBeCloseTo(12, 12);
    expect(given(view.objectDiagonalMm)).toBeCloseTo(20, 12);
    expect(given(view.pixelAtObjectMm)).toBeCloseTo(0.008, 14);
    expect(view.diagonalAngleRad).toEqual({ ok: false, why: 'object not at infinity' });
  });

  it('covers an angle of an object at infinity', () => {
    const view = analysed([thin('p1', 50)], { object: { distanceMm: 'infinity', medium: 'air' } }).sensor;
    expect(given(view.diagonalAngleRad)).toBeCloseTo(2 * Math.atan(0.1), 14);
    expect(view.objectWidthMm).toEqual({ ok: false, why: 'object at infinity' });
  });

  it('compares its pixels with the Airy disc', () => {
    const view = analysed([thin('p1', 50)]).sensor;
    // 2.44 · 587.5618 nm · 8
    expect(given(view.airyDiameterMm)).toBeCloseTo(0.011469206, 9);
    expect(given(view.airyPixels)).toBeCloseTo(0.011469206 / 0.004, 6);
    const perMm = 1 / 0.008;
    expect(given(view.nyquistContrast)).toBe(diffractionContrast(perMm, 587.5618, 8));
  });

  it('knows what it was not told', () => {
    const { sensor: bare } = analysed([thin('p1', 50)], { sensor: null });
    expect(bare.halfDiagonalMm).toEqual({ ok: false, why: 'no sensor' });
    expect(bare.pixelAtObjectMm).toEqual({ ok: false, why: 'no sensor' });
    expect(bare.mountClearanceMm).toEqual({ ok: false, why: 'no mount' });
    const { sensor: plain } = analysed([thin('p1', 50)], {
      sensor: { size: { diagonalMm: 10 }, pixelPitchMm: null },
    });
    expect(plain.airyPixels).toEqual({ ok: false, why: 'no pixel pitch' });
    expect(plain.objectWidthMm).toEqual({ ok: false, why: 'only a diagonal' });
    expect(given(plain.objectDiagonalMm)).toBeCloseTo(20, 12);
  });
});

describe('the contrast that diffraction leaves', () => {
  it('falls from 1 through 0.391 at half the limit to 0', () => {
    // λN = 1 µm · 10 = 0.01 mm: the limit is 100 line pairs per mm. (2/π)(π/3 − √3/4) at half of it.
    expect(diffractionContrast(0, 1000, 10)).toBe(1);
    expect(diffractionContrast(50, 1000, 10)).toBeCloseTo(
      (2 / Math.PI) * (Math.PI / 3 - Math.sqrt(3) / 4),
      14,
    );
    expect(diffractionContrast(100, 1000, 10)).toBeCloseTo(0, 15);
    expect(diffractionContrast(250, 1000, 10)).toBe(0);
  });
});

describe('the housing', () => {
  it('leaves the working distance in front of the first room and the clearance to the mount plane', () => {
    const parts = [thin('p1', 50, 30, { roomFrontMm: 4 }), thin('p2', 60, 20, { roomBehindMm: 3 })];
    const { sensor: view, conjugates } = analysed(parts, { registerMm: 17.526 });
    expect(given(view.workingDistanceMm)).toBe(146);
    const plane = given(conjugates.imagePlaneMm);
    expect(given(view.mountClearanceMm)).toBeCloseTo(plane - 17.526 - 3, 12);
  });

  it('counts from the rear face of a plate that stands last', () => {
    const parts = [thin('p1', 50, 20), plate('p2', 2, 25)];
    const { sensor: view } = analysed(parts, { registerMm: 10, image: 'fixed' });
    expect(given(view.mountClearanceMm)).toBeCloseTo(15, 12);
  });
});

describe('the size and the work of the parts', () => {
  const parts = [thin('p1', 50, 40), thin('p2', 60, 0, { semiDiameterMm: 7 })];
  const more = {
    object: { distanceMm: 'infinity', medium: 'air' },
    aperture: { kind: 'entrancePupilDiameter', diameterMm: 10 },
    field: { size: { kind: 'angle', angleDeg: 10 }, fractions: [1], vignetting: 0.25 },
  } as const;

  it('need |y| + |ȳ| for no vignetting and less for a chosen one', () => {
    const { clear } = analysed(parts, more);
    // At the second lens the axial bundle is 5 · (1 − 40/50) = 1 high, the chief ray 40 tan 10°.
    const chief = 40 * Math.tan(Math.PI / 18);
    expect(given(clear[0]?.unvignettedMm)).toBeCloseTo(5, 13);
    expect(given(clear[1]?.axialMm)).toBeCloseTo(1, 13);
    expect(given(clear[1]?.unvignettedMm)).toBeCloseTo(chief + 1, 12);
    expect(given(clear[1]?.neededMm)).toBeCloseTo(chief + 0.75, 12);
    // On the stop the axial bundle must pass whatever the vignetting.
    expect(given(clear[0]?.neededMm)).toBeCloseTo(5, 13);
  });

  it('work by |f| over the clear diameter and by how they bend the rays', () => {
    const { work } = analysed(parts, more);
    expect(work.map((row) => row.partIndex)).toEqual([0, 1]);
    expect(given(work[0]?.fOverDiameter)).toBeCloseTo(5, 13);
    expect(given(work[1]?.fOverDiameter)).toBeCloseTo(60 / 14, 13);
    expect(given(work[0]?.bendMarginal)).toBeCloseTo(-0.1, 14);
    expect(given(work[1]?.bendChief)).toBeCloseTo((-40 * Math.tan(Math.PI / 18)) / 60, 13);
    expect(given(work[0]?.bendChief)).toBe(0);
  });

  it('keep the axial size without a stop, the rest being absent', () => {
    const sketch = sketchOf([thin('p1', 50)], null, { aperture: { kind: 'workingFNumber', fNumber: 5 } });
    const { clear, work } = analyse(sketch, onFirst(sketch));
    expect(given(clear[0]?.axialMm)).toBeCloseTo(5, 13);
    expect(clear[0]?.unvignettedMm).toEqual({ ok: false, why: 'no stop' });
    expect(work[0]?.fOverDiameter).toEqual({ ok: false, why: 'no stop' });
  });
});

describe('the light', () => {
  it('states f-number and NA both from the slope, neither from the other', () => {
    const { light } = analysed([thin('p1', 50)], { aperture: { kind: 'workingFNumber', fNumber: 0.8 } });
    const slope = 1 / 1.6;
    expect(given(light.workingFNumber)).toBeCloseTo(0.8, 13);
    expect(given(light.imageNA)).toBeCloseTo(slope / Math.hypot(1, slope), 13);
    expect(given(light.objectNA)).toBeCloseTo(Math.sin(Math.atan(slope / 2)), 13);
    // f over the entrance pupil: half the diameter is 75 · u′.
    expect(given(light.infinityFNumber)).toBeCloseTo(50 / (150 * slope), 13);
  });

  it('counts the medium behind', () => {
    const water = { name: 'water', index: 1.333, abbeNumber: null };
    const parts = [thin('p1', 50, 0, { space: { lengthMm: 0, medium: water } })];
    const { light } = analysed(parts, { aperture: { kind: 'entrancePupilDiameter', diameterMm: 10 } });
    const reduced = 1 / 50 - 1 / 150;
    expect(given(light.workingFNumber)).toBeCloseTo(1 / (2 * 5 * reduced), 12);
    expect(given(light.imageNA)).toBeCloseTo(1.333 * Math.sin(Math.atan((5 * reduced) / 1.333)), 13);
  });
});
