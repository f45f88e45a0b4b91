import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { type Seidel, seidel, type ThinGlass } from '../../../engine/aberration/seidel.ts';
import { SUM_NAMES } from '../../../engine/aberration/sums.ts';
import { some } from '../../../engine/outcome.ts';
import { stopOf } from '../../../engine/paraxial/stop.ts';
import { paraxialRay } from '../../../engine/paraxial/trace.ts';
import { buildTrain, type SurfaceSpec } from '../../../engine/train/build.ts';
import { given } from '../quantity.ts';
import { uniform } from '../uniform.ts';

/** Both ways add terms of either sign that nearly cancel for some bendings: a few hundred roundings of the largest. */
const ROUNDING = 1e-12;

interface Lens {
  readonly c1: number;
  readonly c2: number;
  readonly glassIndex: number;
  readonly gapMm: number;
}

/** Two faces at one place, or the thin part that stands for them, in a medium of `mediumIndex`. */
const faces = ({ c1, c2, glassIndex, gapMm }: Lens, part: number, mediumIndex: number): SurfaceSpec[] => {
  const side = Math.sign(mediumIndex);
  return [
    { part, curvaturePerMm: c1, indexAfter: side * glassIndex, gapMm: 0 },
    { part, curvaturePerMm: c2, indexAfter: mediumIndex, gapMm },
  ];
};
const thinPart = ({ c1, c2, glassIndex, gapMm }: Lens, part: number, mediumIndex: number): SurfaceSpec => ({
  part,
  thinPowerPerMm: Math.sign(mediumIndex) * (glassIndex - Math.abs(mediumIndex)) * (c1 - c2),
  indexAfter: mediumIndex,
  gapMm,
});
const shape = ({ c1, c2 }: Lens): number => (c1 + c2) / (c1 - c2);

interface Rays {
  readonly y: number;
  readonly nu: number;
  readonly yChief: number;
  readonly nuChief: number;
}

function sumsOf(
  surfaces: readonly SurfaceSpec[],
  objectIndex: number,
  rays: Rays,
  glass?: ThinGlass,
): Seidel {
  const train = buildTrain({ objectIndex, surfaces, objectZ: null, imageDistanceMm: null });
  const marginal = some(paraxialRay(train, rays.y, rays.nu));
  const chief = some(paraxialRay(train, rays.yChief, rays.nuChief));
  return given(seidel(train, { stop: stopOf(train), marginal, chief }, glass));
}

const anyLens = (): fc.Arbitrary<Lens> =>
  fc
    .record({
      c1: uniform(-0.05, 0.05),
      c2: uniform(-0.05, 0.05),
      glassIndex: uniform(1.4, 4),
      gapMm: uniform(-10, 40),
    })
    .filter(({ c1, c2 }) => Math.abs(c1 - c2) > 1e-3);

const anyRays = (): fc.Arbitrary<Rays> =>
  fc.record({
    y: fc.oneof({ weight: 3, arbitrary: uniform(-8, 8) }, { weight: 1, arbitrary: fc.constant(0) }),
    nu: uniform(-0.2, 0.2),
    yChief: fc.oneof({ weight: 3, arbitrary: uniform(-8, 8) }, { weight: 1, arbitrary: fc.constant(0) }),
    nuChief: uniform(-0.3, 0.3),
  });

describe('a thin element', () => {
  it('adds what its two faces at zero thickness add, at any conjugates and with any stop', () => {
    const anyMedium = fc.constantFrom(1, 1.33, -1);
    fc.assert(
      fc.property(
        fc.array(anyLens(), { minLength: 1, maxLength: 4 }),
        anyRays(),
        anyMedium,
        (lenses, rays, medium) => {
          const solid = sumsOf(
            lenses.flatMap((lens, part) => faces(lens, part, medium)),
            medium,
            rays,
          );
          const thin = sumsOf(
            lenses.map((lens, part) => thinPart(lens, part, medium)),
            medium,
            rays,
            { index: lenses.map(({ glassIndex }) => glassIndex), shapeFactor: lenses.map(shape) },
          );
          expect(thin.partsLeftOut).toEqual([]);
          const scale = Math.max(...SUM_NAMES.map((name) => solid.absolute[name]));
          for (const name of SUM_NAMES.slice(0, 5)) {
            for (const part of lenses.keys()) {
              const [front = 0, rear = 0] = solid.perSurface[name].subarray(2 * part);
              const difference = Math.abs((thin.perSurface[name][part] ?? Number.NaN) - front - rear);
              expect(difference).toBeLessThanOrEqual(ROUNDING * scale);
            }
          }
        },
      ),
    );
  });

  // Welford, Aberrations of Optical Systems (1986): thin lens with the stop at it.
  it('with the stop at it has astigmatism H²φ, Petzval H²φ/n and no distortion, whatever its bending', () => {
    const power = 1 / 80;
    for (const shapeFactor of [-2, 0, 0.7]) {
      const { totals } = sumsOf(
        [{ part: 0, thinPowerPerMm: power, indexAfter: 1, gapMm: 0 }],
        1,
        { y: 10, nu: 0, yChief: 0, nuChief: 0.1 },
        { index: [1.6], shapeFactor: [shapeFactor] },
      );
      expect(totals.astigmatism).toBeCloseTo(power, 16);
      expect(totals.petzval).toBeCloseTo(power / 1.6, 16);
      expect(Math.abs(totals.distortion)).toBe(0);
    }
  });

  it('of unknown glass or bending, or between two media, is left out and listed', () => {
    const power = (part: number, indexAfter = 1): SurfaceSpec => ({
      part,
      thinPowerPerMm: 0.01,
      powerSpreadPerMm: 0.0002,
      indexAfter,
      gapMm: 5,
    });
    const rays = { y: 5, nu: 0, yChief: 1, nuChief: 0.1 };
    const { partsLeftOut, perSurface } = sumsOf(
      [power(3), power(4), power(5), power(6), power(7, 1.3)],
      1,
      rays,
      {
        index: [1.5, null, 1.5, 1, 1.5],
        shapeFactor: [1, 1, null, 1, 1],
      },
    );
    expect(partsLeftOut).toEqual([4, 5, 6, 7]);
    expect(Array.from(perSurface.spherical, (term) => term !== 0)).toEqual([
      true,
      false,
      false,
      false,
      false,
    ]);
    expect(perSurface.axialColour.every((term) => term !== 0)).toBe(true);
    expect(sumsOf([power(0)], 1, rays).partsLeftOut).toEqual([0]);
  });

  it('adds y²φ/V to axial and yȳφ/V to lateral colour', () => {
    const { totals } = sumsOf(
      [{ part: 0, thinPowerPerMm: 0.02, powerSpreadPerMm: 0.02 / 50, indexAfter: 1, gapMm: 0 }],
      1,
      { y: 6, nu: 0.1, yChief: -2, nuChief: 0.2 },
    );
    expect(totals.axialColour).toBeCloseTo((36 * 0.02) / 50, 16);
    expect(totals.lateralColour).toBeCloseTo((-12 * 0.02) / 50, 16);
  });
});
