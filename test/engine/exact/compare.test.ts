import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { bufferSize, sampleOf, traceFields } from '../../../engine/exact/bundles.ts';
import { type Comparison, compare } from '../../../engine/exact/compare.ts';
import { contrastOf, diffractionLimit } from '../../../engine/exact/contrast.ts';
import { bestFocus, spotMoments } from '../../../engine/exact/focus.ts';
import { hexapolarGrid, squareGrid } from '../../../engine/exact/grids.ts';
import { traceBatch } from '../../../engine/exact/kernel.ts';
import { alone, emptyLanding, landingsOf } from '../../../engine/exact/landing.ts';
import { aimRays, pupilMapOf } from '../../../engine/exact/pupilMap.ts';
import { CODE, L, M, N, STRIDE, X, Y, Z } from '../../../engine/exact/rayBuffer.ts';
import { airyRadius, spotSize } from '../../../engine/exact/spots.ts';
import { trust } from '../../../engine/exact/trust.ts';
import type { ExactSetup } from '../../../engine/exact/types.ts';
import { given } from '../quantity.ts';
import { between } from './anyRay.ts';
import { type Drawn, setupOf } from './setupOf.ts';

/** Of lengths: aiming stops at 1e-11 of the stop's radius. */
const ROUNDING = 1e-10;

const thin = (more: Partial<Drawn> = {}): Drawn => ({
  surfaces: [{ thinPowerPerMm: 1 / 100, indexAfter: 1, gapMm: 0 }],
  aperture: { kind: 'entrancePupilDiameter', diameterMm: 20 },
  ...more,
});
/** The plano-convex lens of f = 100 mm, n = 1.5, flat side to the image. */
const PLANO: Drawn = {
  surfaces: [
    { curvaturePerMm: 1 / 50, indexAfter: 1.5, gapMm: 4 },
    { indexAfter: 1, gapMm: 0 },
  ],
  aperture: { kind: 'entrancePupilDiameter', diameterMm: 20 },
  field: { kind: 'angle', angleDeg: 10 },
};
const AFOCAL = thin({
  surfaces: [
    { thinPowerPerMm: 1 / 100, indexAfter: 1, gapMm: 150 },
    { thinPowerPerMm: 1 / 50, indexAfter: 1, gapMm: 0 },
  ],
});

describe('first order and exact rays side by side', () => {
  it('are the same for ideal thin parts, but where sines are taken: ideal parts keep tangents', () => {
    const setup = setupOf(thin({ objectZ: -250 }));
    const report = compare(setup);
    for (const name of Object.keys(report) as (keyof Comparison)[]) {
      const { paraxial, exact, difference } = report[name];
      if (name === 'workingFNumber' || name === 'focalLengthMm') continue;
      expect(Math.abs(given(difference)), name).toBeLessThan(ROUNDING * (1 + Math.abs(given(paraxial))));
      expect(given(exact) - given(paraxial)).toBeCloseTo(given(difference), 11);
    }
    expect(given(report.magnification.exact)).toBeCloseTo(-100 / 150, 12);
    expect(given(report.focalLengthMm.exact)).toBeCloseTo(10 / Math.sin(Math.atan(0.1)), 9);
    const slope = 10 / (500 / 3);
    expect(given(report.workingFNumber.paraxial)).toBeCloseTo(1 / (2 * slope), 11);
    expect(given(report.workingFNumber.exact)).toBeCloseTo(1 / (2 * Math.sin(Math.atan(slope))), 9);
  });

  it('of a plano-convex lens are those of its one bending surface, by hand', () => {
    // First surface: sin I = 10/50, then the flat passes the angle on with n sin U.
    const [incidence, refraction] = [Math.asin(0.2), Math.asin(0.2 / 1.5)];
    const inside = incidence - refraction;
    const outside = Math.asin(1.5 * Math.sin(inside));
    const sag = 50 - Math.sqrt(50 * 50 - 100);
    const onFlat = 10 - (4 - sag) * Math.tan(inside);
    const report = compare(setupOf(PLANO));
    expect(given(report.focalLengthMm.paraxial)).toBeCloseTo(100, 11);
    expect(given(report.focalLengthMm.exact)).toBeCloseTo(10 / Math.sin(outside), 10);
    expect(given(report.backFocusMm.exact)).toBeCloseTo(onFlat / Math.tan(outside), 10);
    expect(given(report.imageDistanceMm.difference)).toBeCloseTo(
      onFlat / Math.tan(outside) - given(report.backFocusMm.paraxial),
      10,
    );
    expect(given(report.workingFNumber.exact)).toBeCloseTo(1 / (2 * Math.sin(outside)), 10);
    expect(given(report.marginalHeightMm.paraxial)).toBeCloseTo(0, 11);
    expect(given(report.marginalHeightMm.exact)).toBeLessThan(0);
    expect(given(report.distortion.paraxial)).toBe(0);
    expect(report.magnification.exact).toEqual({ ok: false, why: 'object at infinity' });
  });

  it('say why there is none: afocal, no image height, rays that are lost', () => {
    const afocal = compare(setupOf(AFOCAL));
    expect(afocal.focalLengthMm.exact).toEqual({ ok: false, why: 'afocal' });
    expect(afocal.imageDistanceMm.difference).toEqual({ ok: false, why: 'image at infinity' });
    expect(afocal.distortion.exact).toEqual({ ok: false, why: 'image at infinity' });
    const atLens = compare(setupOf(thin({ imageDistanceMm: 0 })));
    expect(atLens.distortion.exact).toEqual({ ok: false, why: 'no image height' });
    const steep = setupOf({ ...PLANO, aperture: { kind: 'entrancePupilDiameter', diameterMm: 101 } });
    const lost = compare(steep);
    expect(lost.marginalHeightMm.exact).toEqual({ ok: false, why: 'ray lost' });
    expect(lost.focalLengthMm.difference).toEqual({ ok: false, why: 'ray lost' });
    expect(lost.focalLengthMm.paraxial.ok).toBe(true);
  });
});

describe('how far the first order can be trusted', () => {
  const heightError = (setup: ExactSetup, share: number): number => {
    const ray = new Float64Array(STRIDE);
    aimRays(pupilMapOf(setup, 0, 0), [0, share], 1, ray);
    traceBatch(setup.lines[0].train, ray, 1);
    return ray[Y]! + ((given(setup.imagePlaneMm) - ray[Z]!) * ray[M]!) / ray[N]!;
  };

  it('is everywhere for ideal thin parts', () => {
    expect(given(trust(setupOf(thin()), 1e-6))).toEqual({ apertureShare: 1, fieldShare: 1 });
  });

  it('is up to where the error of the axial ray meets the limit', () => {
    const setup = setupOf(PLANO);
    for (const limit of [0.001, 0.01, 0.05]) {
      const { apertureShare } = given(trust(setup, limit));
      expect(apertureShare).toBeLessThan(1);
      // A hundred-thousandth of the aperture to either side.
      expect(Math.abs(heightError(setup, apertureShare - 1e-5))).toBeLessThan(limit);
      expect(Math.abs(heightError(setup, apertureShare + 1e-5))).toBeGreaterThan(limit);
    }
  });

  it('ends at the first share that is beyond, though the error comes back below the limit further out', () => {
    // Spherical aberration of two orders against each other: largest at 0.6 of the stop, nought between 0.7 and 0.8.
    const corrected = setupOf({
      surfaces: [
        { curvaturePerMm: 1 / 50, asphere: [-8e-7, 1e-9], indexAfter: 1.5, gapMm: 4 },
        { indexAfter: 1, gapMm: 0 },
      ],
      aperture: { kind: 'entrancePupilDiameter', diameterMm: 30 },
    });
    expect(heightError(corrected, 0.6)).toBeGreaterThan(0.008);
    expect(Math.abs(heightError(corrected, 0.72))).toBeLessThan(0.008);
    const { apertureShare } = given(trust(corrected, 0.008));
    expect(apertureShare).toBeGreaterThan(0.4);
    expect(apertureShare).toBeLessThan(0.5);
  });

  it('is nowhere for a limit of nought, and is absent without an image', () => {
    expect(given(trust(setupOf(PLANO), 0)).apertureShare).toBeLessThan(0.01);
    expect(trust(setupOf(AFOCAL), 0.01)).toEqual({ ok: false, why: 'image at infinity' });
  });

  it('grows with the limit', () => {
    const setup = setupOf(PLANO);
    fc.assert(
      fc.property(between(0, 0.2), between(0, 0.2), (one, other) => {
        const [small, large] = [Math.min(one, other), Math.max(one, other)].map((limit) =>
          given(trust(setup, limit)),
        );
        expect(large!.apertureShare).toBeGreaterThanOrEqual(small!.apertureShare);
        expect(large!.fieldShare).toBeGreaterThanOrEqual(small!.fieldShare);
      }),
      { numRuns: 30 },
    );
  });
});

describe('spots of a layout', () => {
  const spot = (setup: ExactSetup, fraction: number, grid = hexapolarGrid(6)) =>
    given(landingsOf(traceFields(setup, [fraction], sampleOf(0, grid, { fine: true }))[0]!));

  it('are points for a perfect lens, and of the rim ray’s radius for spherical aberration', () => {
    expect(given(spotSize(spot(setupOf(thin()), 1))).largestMm).toBeLessThan(1e-11);
    const setup = setupOf(PLANO);
    const { largestMm, rmsMm, centroidYMm, through, lost } = given(spotSize(spot(setup, 0)));
    expect(largestMm).toBeCloseTo(Math.abs(given(compare(setup).marginalHeightMm.exact)), 11);
    // Blur as the cube of the height: its mean square is a quarter of the square at the rim.
    expect(rmsMm / (largestMm / 2)).toBeCloseTo(1, 1);
    expect(Math.abs(centroidYMm)).toBeLessThan(1e-12);
    expect([through, lost]).toEqual([127, 0]);
  });

  it('are nearly the same on square and hexapolar grids', () => {
    const setup = setupOf(PLANO);
    for (const fraction of [0, 1]) {
      const [hexapolar, square] = [hexapolarGrid(10), squareGrid(64)].map(
        (grid) => given(spotSize(spot(setup, fraction, grid))).rmsMm,
      );
      // The lattice has a staircase for an edge.
      expect(Math.abs(hexapolar! / square! - 1)).toBeLessThan(0.02);
    }
  });

  it('keep their rms when field and grid turn together', () => {
    const setup = setupOf(PLANO);
    const { train } = setup.lines[0];
    const plane = given(setup.imagePlaneMm);
    const sample = sampleOf(0, hexapolarGrid(4), { fine: true });
    const starts = new Float64Array(sample.count * STRIDE);
    aimRays(pupilMapOf(setup, 0, 1), sample.points, sample.count, starts);
    const sizeTurned = (angle: number): number => {
      const [cos, sin] = [Math.cos(angle), Math.sin(angle)];
      const rays = starts.slice();
      for (let at = 0; at < rays.length; at += STRIDE) {
        for (const place of [X, L]) {
          const [x, y] = [rays[at + place]!, rays[at + place + 1]!];
          rays[at + place] = cos * x - sin * y;
          rays[at + place + 1] = sin * x + cos * y;
        }
      }
      traceBatch(train, rays, sample.count);
      const landing = emptyLanding(sample.count);
      for (let i = 0; i < sample.count; i++) {
        const at = i * STRIDE;
        expect(rays[at + CODE]).toBe(0);
        const reach = (plane - rays[at + Z]!) / rays[at + N]!;
        landing.x[i] = rays[at + X]! + reach * rays[at + L]!;
        landing.y[i] = rays[at + Y]! + reach * rays[at + M]!;
        landing.weight[i] = 1;
      }
      landing.count = sample.count;
      return given(spotSize(alone(landing))).rmsMm;
    };
    const still = sizeTurned(0);
    fc.assert(
      fc.property(between(-Math.PI, Math.PI), (angle) => {
        expect(Math.abs(sizeTurned(angle) - still)).toBeLessThan(ROUNDING);
      }),
    );
  });

  it('have their best focus in front of the paraxial one, where their rms is least', () => {
    const setup = setupOf(PLANO);
    const parts = spot(setup, 0);
    const focus = given(bestFocus([{ moments: given(spotMoments(parts)), weight: 1 }]));
    const rim = given(compare(setup).imageDistanceMm.difference);
    // Third order: two thirds of the way to where the rim ray crosses.
    expect(focus / rim).toBeCloseTo(2 / 3, 1);
    const rms = (shift: number) => given(spotSize(parts, shift)).rmsMm;
    for (const step of [-0.1, -0.01, 0.01, 0.1]) expect(rms(focus + step)).toBeGreaterThan(rms(focus));
  });

  it('stand beside the Airy radius, 1.22 λ N', () => {
    expect(given(airyRadius(setupOf(thin())))).toBeCloseTo(1.22 * 500e-6 * 5, 12);
    expect(airyRadius(setupOf(AFOCAL))).toEqual({ ok: false, why: 'image at infinity' });
    expect(landingsOf(traceFields(setupOf(AFOCAL), [0], sampleOf(0, hexapolarGrid(2)))[0]!)).toEqual({
      ok: false,
      why: 'image at infinity',
    });
  });

  it('leave diffraction the f-number of the bundle, in each direction', () => {
    const setup = setupOf(thin({ field: { kind: 'angle', angleDeg: 30 } }));
    const landing = spot(setup, 1)[0]!.landing;
    const { tangentialFNumber, sagittalFNumber } = diffractionLimit(landing, 1, 500);
    // 100 mm/cos θ away, and foreshortened by cos² more in the meridian: one for the stop, one for the plane.
    const cos = Math.cos(Math.PI / 6);
    expect(tangentialFNumber / (5 / cos ** 3)).toBeCloseTo(1, 1);
    expect(sagittalFNumber / (5 / cos)).toBeCloseTo(1, 1);
    const pair = given(contrastOf(alone(landing), 100, diffractionLimit(landing, 1, 500)));
    expect(pair.atNyquist.tangential).toBeCloseTo(1, 9);
    expect(pair.atNyquist.tangentialLimit).toBeLessThan(pair.atNyquist.sagittalLimit);
  });

  it('are counted out where every ray is lost', () => {
    const dark = setupOf({
      surfaces: [
        { thinPowerPerMm: 1 / 100, indexAfter: 1, gapMm: 40 },
        { indexAfter: 1, gapMm: 0, semiDiameterMm: 0.1 },
      ],
      aperture: { kind: 'entrancePupilDiameter', diameterMm: 2 },
      field: { kind: 'angle', angleDeg: 30 },
    });
    const [field] = traceFields(dark, [1], sampleOf(5, hexapolarGrid(3)));
    const parts = given(landingsOf(field!));
    expect(parts[0]!.landing).toMatchObject({ count: 0, lost: 37 });
    expect(spotSize(parts)).toEqual({ ok: false, why: 'no ray through' });
    expect(diffractionLimit(parts[0]!.landing, 1, 500).tangentialFNumber).toBe(Number.POSITIVE_INFINITY);
  });

  it('do not count rays that leave against the light, which never meet the image plane', () => {
    const setup = setupOf({
      surfaces: [{ curvaturePerMm: -1 / 20, indexAfter: -1, gapMm: 0 }],
      aperture: { kind: 'entrancePupilDiameter', diameterMm: 36 },
    });
    const [field] = traceFields(setup, [0], sampleOf(0, hexapolarGrid(9)));
    const { landing } = given(landingsOf(field!))[0]!;
    // Met at more than 45°, beyond 14.1 mm of the 18, the mirror sends the ray on to the right.
    expect(landing.lost).toBe(6 * (8 + 9));
    expect(landing.x.subarray(0, landing.count).every(Number.isFinite)).toBe(true);
  });

  it('come out the same from a buffer that is used again', () => {
    const setup = setupOf(PLANO);
    const sample = sampleOf(5, hexapolarGrid(3));
    const buffer = new Float64Array(bufferSize(setup, 2, sample)).fill(7);
    const sizes = (fields: ReturnType<typeof traceFields>) =>
      fields.map((field) => given(spotSize(given(landingsOf(field)))));
    expect(sizes(traceFields(setup, [0, 1], sample, buffer))).toEqual(
      sizes(traceFields(setup, [0, 1], sample)),
    );
  });

  it('differ little whether rays are placed between aimed ones or aimed each', () => {
    const setup = setupOf({ ...PLANO, objectZ: -400, stopSurface: 1 });
    const rms = (fine: boolean) =>
      given(spotSize(given(landingsOf(traceFields(setup, [1], sampleOf(0, hexapolarGrid(6), { fine }))[0]!))))
        .rmsMm;
    expect(Math.abs(rms(false) / rms(true) - 1)).toBeLessThan(1e-3);
  });
});
