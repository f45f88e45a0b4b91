import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { thinElementSums } from '../../../engine/aberration/thinElement.ts';
import {
  bendingOf,
  leastSphericalShape,
  positionFactor,
  shapeFactorOf,
  zeroComaShape,
} from '../../../engine/solve/bending.ts';
import { bestShapes } from '../../../engine/solve/bestShapes.ts';
import { buildTrain } from '../../../engine/train/build.ts';
import { given } from '../quantity.ts';
import { uniform } from '../uniform.ts';

const lens = { powerPerMm: 0.01, mediumIndex: 1 };

/** Sums of a bent lens of f = 100 with a ray 10 high that comes from slope `u`, the stop at it. */
const sumsAt = (glassIndex: number, shapeFactor: number, u: number) => {
  const sums = thinElementSums(
    { ...lens, glassIndex, shapeFactor },
    { y: 10, nu: u, yChief: 0, nuChief: 0.1 },
  );
  if (!sums) throw new Error('glass bends light');
  return sums;
};

describe('the best bendings of a thin lens', () => {
  // Jenkins and White, Fundamentals of Optics, 4th ed., ch. 9: n = 1.50, object at infinity: 0.714 and 0.800.
  it('for a far object and n = 1.5 are 5/7 and 4/5', () => {
    const far = given(positionFactor(0, -0.1));
    expect(far).toBe(-1);
    expect(leastSphericalShape(1.5, far)).toBeCloseTo(5 / 7, 15);
    expect(zeroComaShape(1.5, far)).toBeCloseTo(4 / 5, 15);
  });

  it('have the least spherical aberration, and no coma, of all bendings', () => {
    fc.assert(
      fc.property(uniform(1.3, 4), uniform(-0.3, 0.3), uniform(-2, 2), (index, u, off) => {
        const position = given(positionFactor(u, u - 10 * lens.powerPerMm));
        const best = leastSphericalShape(index, position);
        const least = sumsAt(index, best, u).spherical;
        const other = sumsAt(index, best + off, u).spherical;
        expect(other - least).toBeGreaterThanOrEqual(-1e-13 * (Math.abs(other) + Math.abs(least)));
        const { coma, astigmatism } = sumsAt(index, zeroComaShape(index, position), u);
        expect(Math.abs(coma)).toBeLessThanOrEqual(1e-12 * (1 + Math.abs(astigmatism)));
      }),
    );
  });

  it('take conjugates through infinity, and say when the lens does nothing', () => {
    expect(positionFactor(0.1, 0)).toEqual({ ok: true, value: 1 });
    expect(positionFactor(0.1, -0.1)).toEqual({ ok: true, value: 0 });
    expect(positionFactor(0.1, 0.1)).toEqual({ ok: false, why: 'no power' });
    expect(positionFactor(1.7e308, 1.6e308).ok).toBe(false);
  });
});

describe('a bending as a ratio of curvatures', () => {
  it('gives its shape factor back', () => {
    fc.assert(
      fc.property(uniform(-20, 20), (q) => {
        expect(shapeFactorOf(bendingOf(q))).toBeCloseTo(q, 12);
      }),
    );
  });

  it('has no shape factor for equal radii', () => {
    expect(shapeFactorOf({ front: 1, rear: 1 })).toBeNull();
    expect(bendingOf(0)).toEqual({ front: 1, rear: -1 });
  });
});

describe('the best shapes of a part in its layout', () => {
  const layout = (indexAfter: number, surfaces: Parameters<typeof buildTrain>[0]['surfaces']) =>
    buildTrain({ objectIndex: indexAfter, surfaces, objectZ: -200, imageDistanceMm: null });
  const thin = (part: number, focalLengthMm: number, gapMm = 0, indexAfter = 1) => ({
    part,
    thinPowerPerMm: 1 / focalLengthMm,
    indexAfter,
    gapMm,
  });

  it('go by its own conjugates', () => {
    // The first part makes the light parallel, the second works at infinity.
    const train = layout(1, [thin(0, 200, 50), thin(1, 100)]);
    const first = given(bestShapes(train, 0, 1.5));
    const second = given(bestShapes(train, 1, 1.5));
    expect(first.positionFactor).toBeCloseTo(1, 14);
    expect(second.positionFactor).toBeCloseTo(-1, 14);
    expect(second.leastSpherical).toBeCloseTo(5 / 7, 14);
    expect(first.zeroComa).toBeCloseTo(-4 / 5, 14);
  });

  it('take the glass relative to the medium', () => {
    const { leastSpherical } = given(bestShapes(layout(4 / 3, [thin(0, 200, 50, 4 / 3)]), 0, 2));
    const relative = given(bestShapes(layout(1, [thin(0, 200, 50)]), 0, 1.5));
    const p = given(bestShapes(layout(4 / 3, [thin(0, 200, 50, 4 / 3)]), 0, 2)).positionFactor;
    expect(leastSpherical / p).toBeCloseTo(relative.leastSpherical / relative.positionFactor, 13);
  });

  it('are none for a part that is not there or does not bend light', () => {
    const train = layout(1, [thin(0, 200, 50), { part: 1, indexAfter: 1, gapMm: 0 }]);
    expect(bestShapes(train, 2, 1.5)).toEqual({ ok: false, why: 'no such part' });
    expect(bestShapes(train, 1, 1.5)).toEqual({ ok: false, why: 'no power' });
  });
});
