import { describe, expect, it } from 'vitest';
import { analyse } from '../../../engine/paraxial/analyse.ts';
import { heightInSpace, paraxialRay } from '../../../engine/paraxial/trace.ts';
import type { Part, Sketch } from '../../../engine/sketch/types.ts';
import { given } from '../quantity.ts';
import { diaphragm, onFirst, sketchOf, thin } from '../sketchOf.ts';

const analysed = (parts: readonly Part[], stop: string | null, more: Partial<Sketch> = {}) => {
  const sketch = sketchOf(parts, stop, {
    blurMm: 0.02,
    aperture: { kind: 'stopDiameter', diameterMm: 10 },
    ...more,
  });
  return analyse(sketch, onFirst(sketch));
};
const at = (distanceMm: number) => ({ object: { distanceMm, medium: 'air' } }) as const;

describe('the depth of focus', () => {
  it('is the working f-number times the blur, and a quarter wave by the NA', () => {
    const { depth, light } = analysed([thin('p1', 50)], 'p1', at(150));
    expect(given(light.workingFNumber)).toBeCloseTo(7.5, 12);
    expect(given(depth.focusBlurMm)).toBeCloseTo(0.15, 13);
    const sine = Math.sin(Math.atan(5 / 75));
    expect(given(depth.focusQuarterWaveMm)).toBeCloseTo(587.5618e-6 / (2 * sine * sine), 13);
  });

  it('takes a pixel for the blur when none is given, and needs one of them', () => {
    const sensor = { size: { diagonalMm: 8 }, pixelPitchMm: 0.004 };
    const pixel = analysed([thin('p1', 50)], 'p1', { blurMm: null, sensor }).depth;
    expect(given(pixel.blurMm)).toBe(0.004);
    const nothing = analysed([thin('p1', 50)], 'p1', { blurMm: null }).depth;
    for (const quantity of [nothing.blurMm, nothing.focusBlurMm, nothing.nearMm, nothing.farMm]) {
      expect(quantity).toEqual({ ok: false, why: 'no blur' });
    }
    expect(nothing.focusQuarterWaveMm.ok).toBe(true);
  });
});

describe('the depth of field', () => {
  // The photographer's rule for a lens with its stop: hyperfocal distance H = f²/(N c) + f, near s(H − f)/(H + s − 2f), far s(H − f)/(H − s).
  const [f, N, c] = [50, 5, 0.02];
  const H = (f * f) / (N * c) + f;

  it.each([400, 1500, 20000])('of a lens focused on %d mm follows the hyperfocal distance', (s) => {
    const { depth } = analysed([thin('p1', f)], 'p1', at(s));
    expect(given(depth.nearMm)).toBeCloseTo((s * (H - f)) / (H + s - 2 * f), 8);
    expect(given(depth.farMm)).toBeCloseTo((s * (H - f)) / (H - s), 7);
  });

  it('reaches infinity from half the hyperfocal distance on', () => {
    const { depth } = analysed([thin('p1', f)], 'p1', at(H + 1));
    expect(given(depth.nearMm)).toBeCloseTo(H / 2, 0);
    expect(depth.farMm).toEqual({ ok: false, why: 'reaches infinity' });
    const infinity = analysed([thin('p1', f)], 'p1', {}).depth;
    expect(given(infinity.nearMm)).toBeCloseTo(H - f, 8);
    expect(infinity.farMm).toEqual({ ok: false, why: 'reaches infinity' });
  });

  it('stands where the fixed sensor is in focus, not where the object is', () => {
    const sharp = analysed([thin('p1', 50, 75)], 'p1', { ...at(150), image: 'fixed' }).depth;
    const defocused = analysed([thin('p1', 50, 75)], 'p1', { ...at(170), image: 'fixed' }).depth;
    // The stop keeps its diameter, so the same objects are sharp.
    expect(given(defocused.nearMm)).toBeCloseTo(given(sharp.nearMm), 10);
    expect(given(defocused.farMm)).toBeCloseTo(given(sharp.farMm), 10);
  });

  it('is symmetric and does not depend on the lens with a telecentric object side', () => {
    const telecentric = [thin('p1', 60, 60), diaphragm('p2', 40), thin('p3', 40)];
    const { depth, light } = analysed(telecentric, 'p2', {
      ...at(60),
      field: { size: { kind: 'objectHeight', heightMm: 2 }, fractions: [1], vignetting: 0 },
    });
    const reach = 0.01 / (40 / 60) / Math.tan(Math.asin(given(light.objectNA)));
    expect(given(depth.nearMm)).toBeCloseTo(60 - reach, 10);
    expect(given(depth.farMm)).toBeCloseTo(60 + reach, 10);
  });

  it('ends where a traced ray makes exactly the blur', () => {
    const parts = [thin('p1', 80, 22), diaphragm('p2', 9), thin('p3', -60, 12), thin('p4', 45)];
    const { depth, rays, train, conjugates } = analysed(parts, 'p2', at(700));
    const plane = given(conjugates.trackMm);
    for (const [distance, side] of [
      [given(depth.nearMm), 1],
      [given(depth.farMm), -1],
    ] as const) {
      // Scale the axial ray from the limit to the edge of the stop and see where it lands.
      const ray = paraxialRay(train, distance, 1);
      const landed = heightInSpace(train, ray, train.count, plane) / (ray.y[1] ?? 0);
      const edge = given(rays.marginal).y[1] ?? 0;
      expect(Math.abs(2 * landed * edge)).toBeCloseTo(0.02, 12);
      expect(Math.sign(distance - 700)).toBe(-side);
    }
  });

  it('reaches the first part when the blur is coarse', () => {
    const { depth } = analysed([thin('p1', 50)], 'p1', { ...at(150), blurMm: 9 });
    expect(depth.farMm).toEqual({ ok: false, why: 'reaches infinity' });
    // With its entrance pupil inside, even an object that touches the first lens is sharp enough.
    const behind = analysed([thin('p1', 50, 20), diaphragm('p2', 5)], 'p2', { ...at(60), blurMm: 300 });
    expect(behind.depth.nearMm).toEqual({ ok: false, why: 'reaches the first part' });
  });

  it('has no real object with the sensor far inside the focus', () => {
    const { depth } = analysed([thin('p1', 50, 30)], 'p1', { ...at(150), image: 'fixed' });
    expect(depth.nearMm).toEqual({ ok: false, why: 'no real object' });
    expect(depth.farMm).toEqual({ ok: false, why: 'no real object' });
  });

  it('needs a stop', () => {
    const { depth } = analysed([thin('p1', 50)], null, { aperture: { kind: 'workingFNumber', fNumber: 4 } });
    expect(depth.nearMm).toEqual({ ok: false, why: 'no stop' });
  });
});
