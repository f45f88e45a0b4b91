import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { analyse } from '../../../engine/paraxial/analyse.ts';
import { referenceRays } from '../../../engine/paraxial/rays.ts';
import type { ParaxialRay } from '../../../engine/paraxial/trace.ts';
import { type Vignetting, vignettingAt } from '../../../engine/paraxial/vignetting.ts';
import { buildTrain } from '../../../engine/train/build.ts';
import type { Train } from '../../../engine/train/types.ts';
import { anyTrain, between } from '../anyTrain.ts';
import { given } from '../quantity.ts';
import { onFirst, sketchOf, thin } from '../sketchOf.ts';

/** What the integration promises. */
const AREA_ACCURACY = 1e-6;

/** Stop on the first lens, a rim of semi-diameter `rimMm` 40 mm behind it; entrance pupil of diameter 10, field angle `angleDeg`. */
function behindStop(rimMm: number, angleDeg: number): Vignetting {
  const sketch = sketchOf([thin('p1', 1e6, 40), thin('p2', 1e6, 0, { semiDiameterMm: rimMm })], 'p1', {
    aperture: { kind: 'entrancePupilDiameter', diameterMm: 10 },
    field: { size: { kind: 'angle', angleDeg }, fractions: [1], vignetting: 0 },
  });
  const [edge] = given(analyse(sketch, onFirst(sketch)).vignetting);
  if (!edge) throw new Error('one field was asked for');
  return edge;
}

/** Area common to two circles, radii 1 and r, centres d apart, over π: the lens formula. */
function lensShare(r: number, d: number): number {
  if (d >= 1 + r) return 0;
  const one = Math.acos((d * d + 1 - r * r) / (2 * d));
  const other = Math.acos((d * d + r * r - 1) / (2 * d * r));
  return (one - Math.sin(2 * one) / 2 + r * r * (other - Math.sin(2 * other) / 2)) / Math.PI;
}

describe('the vignetting of one rim behind the stop', () => {
  it('passes everything while the rim holds the whole bundle', () => {
    expect(behindStop(20, 10)).toEqual({
      fraction: 1,
      areaShare: 1,
      meridian: { lower: -1, upper: 1, lowerSurface: null, upperSurface: null },
    });
  });

  it('leaves the lens between two circles', () => {
    for (const [rim, angle] of [
      [5, 3],
      [6, 8],
      [3, 6],
      [12, 15],
    ] as const) {
      const { rays } = analyse(...exampleOf(rim, angle));
      const y = given(rays.marginal).y[1] ?? 0;
      const yBar = given(rays.chief).y[1] ?? 0;
      const wanted = lensShare(rim / y, yBar / y);
      expect(Math.abs(behindStop(rim, angle).areaShare - wanted)).toBeLessThan(AREA_ACCURACY);
    }
  });

  it('cuts the upper side of the pupil of a field that rises, and says which surface does', () => {
    const { meridian } = behindStop(6, 8);
    // ȳ + p·y = 6 with y = 5·(1 − 40/1e6), ȳ = 40 tan 8°: nearly p = (6 − 5.622)/5.
    expect(meridian?.upper).toBeCloseTo((6 - 40 * Math.tan((8 * Math.PI) / 180)) / (5 * (1 - 40e-6)), 12);
    expect(meridian).toMatchObject({ lower: -1, lowerSurface: null, upperSurface: 1 });
  });

  it('passes nothing once the bundle misses the rim', () => {
    expect(behindStop(2, 30)).toEqual({ fraction: 1, areaShare: 0, meridian: null });
  });

  it('is all or nothing for a rim that stands on an image', () => {
    // The image is 2 mm high at full field and the rim 1.5.
    const parts = [thin('p1', 50, 75), thin('p2', 40, 20, { semiDiameterMm: 1.5 }), thin('p3', 30)];
    const sketch = sketchOf(parts, 'p1', {
      object: { distanceMm: 150, medium: 'air' },
      aperture: { kind: 'objectNA', na: 0.05 },
      field: { size: { kind: 'objectHeight', heightMm: 4 }, fractions: [0.7, 1], vignetting: 0 },
    });
    const [inner, edge] = given(analyse(sketch, onFirst(sketch)).vignetting);
    expect(inner?.areaShare).toBe(1);
    expect(edge).toEqual({ fraction: 1, areaShare: 0, meridian: null });
  });

  it('passes a share of (rim/bundle)² on the axis', () => {
    const { areaShare } = behindStop(2.5, 0);
    expect(areaShare).toBeCloseTo((2.5 / (5 * (1 - 40e-6))) ** 2, 9);
  });

  function exampleOf(rimMm: number, angleDeg: number) {
    const sketch = sketchOf([thin('p1', 1e6, 40), thin('p2', 1e6, 0, { semiDiameterMm: rimMm })], 'p1', {
      aperture: { kind: 'entrancePupilDiameter', diameterMm: 10 },
      field: { size: { kind: 'angle', angleDeg }, fractions: [1], vignetting: 0 },
    });
    return [sketch, onFirst(sketch)] as const;
  }
});

describe('the vignetting of any train', () => {
  /** Share of the pupil by a fine midpoint grid. */
  function gridShare(train: Train, marginal: ParaxialRay, chief: ParaxialRay, fraction: number): number {
    const steps = 400;
    let inside = 0;
    let through = 0;
    for (let i = 0; i < steps; i++) {
      for (let j = 0; j < steps / 2; j++) {
        const [px, py] = [(2 * j + 1) / steps, (2 * i + 1) / steps - 1];
        if (px * px + py * py > 1) continue;
        inside++;
        if (passes(train, marginal, chief, fraction, px, py)) through++;
      }
    }
    return through / inside;
  }

  function passes(
    train: Train,
    m: ParaxialRay,
    chief: ParaxialRay,
    fraction: number,
    px: number,
    py: number,
  ) {
    for (let k = 0; k < train.count; k++) {
      const [y, yBar] = [m.y[k] ?? 0, fraction * (chief.y[k] ?? 0)];
      if ((px * y) ** 2 + (yBar + py * y) ** 2 > (train.semiDiameter[k] ?? 0) ** 2) return false;
    }
    return true;
  }

  it('is what a fine grid over the pupil counts', () => {
    const GRID = 0.01;
    let cut = 0;
    fc.assert(
      fc.property(anyTrain(8), between(-1, 1), (spec, fraction) => {
        const train = buildTrain(spec);
        const rays = referenceRays(
          train,
          { kind: 'stopDiameter', diameterMm: 12 },
          train.objectZ === null ? { kind: 'angle', angleDeg: 12 } : { kind: 'objectHeight', heightMm: 15 },
        );
        fc.pre(rays.marginal.ok && rays.chief.ok);
        const [found] = given(vignettingAt(train, rays, [fraction]));
        const counted = gridShare(train, given(rays.marginal), given(rays.chief), fraction);
        if (counted > 0 && counted < 1) cut++;
        expect(Math.abs((found?.areaShare ?? -1) - counted)).toBeLessThan(GRID);
        if (found?.meridian) {
          const { lower, upper } = found.meridian;
          for (const [py, open] of [
            [lower + 1e-9, true],
            [upper - 1e-9, true],
            [lower - 1e-6, false],
            [upper + 1e-6, false],
          ] as const) {
            if (upper - lower < 1e-6) continue;
            const through =
              py >= -1 && py <= 1 && passes(train, given(rays.marginal), given(rays.chief), fraction, 0, py);
            expect(through).toBe(open);
          }
        }
      }),
      { numRuns: 100 },
    );
    expect(cut).toBeGreaterThan(8);
  });
});
