import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { firstOrder } from '../../../engine/paraxial/firstOrder.ts';
import { isZeroPower, systemMatrix } from '../../../engine/paraxial/matrix.ts';
import { rayScale } from '../../../engine/paraxial/scale.ts';
import { rayThrough } from '../../../engine/paraxial/trace.ts';
import { buildTrain, type SurfaceSpec } from '../../../engine/train/build.ts';
import { absoluteMatrix, absoluteRay } from '../absolute.ts';
import { anyTrain, between } from '../anyTrain.ts';
import { given } from '../quantity.ts';
import { matrixBetween } from './decimal.ts';

const lens = (focalLengthMm: number, gapMm: number): SurfaceSpec => ({
  part: 0,
  thinPowerPerMm: 1 / focalLengthMm,
  indexAfter: 1,
  gapMm,
});
const inAir = (surfaces: readonly SurfaceSpec[]) =>
  buildTrain({ objectIndex: 1, surfaces, objectZ: null, imageDistanceMm: null });

describe('the scale of a ray', () => {
  it('is far above the rounding of every matrix entry', () => {
    // The test for zero power leaves a factor 1e-12, so rounding has to stay well below.
    const MARGIN = 1e-14;
    fc.assert(
      fc.property(anyTrain(12), (spec) => {
        const train = buildTrain(spec);
        const m = systemMatrix(train);
        const exact = matrixBetween(train, 0, train.count);
        for (const entry of ['a', 'b', 'c', 'd'] as const) {
          const rounding = exact[entry].minus(m[entry]).abs().toNumber();
          expect(rounding).toBeLessThanOrEqual(MARGIN * m[`${entry}Scale`]);
        }
      }),
    );
  });

  it('is no larger than the terms by absolute values, but for their number', () => {
    fc.assert(
      fc.property(anyTrain(12), (spec) => {
        const train = buildTrain(spec);
        const m = systemMatrix(train);
        const abs = absoluteMatrix(train);
        for (const entry of ['a', 'b', 'c', 'd'] as const) {
          expect(m[`${entry}Scale`]).toBeLessThanOrEqual(
            Math.sqrt(2 * train.count + 2) * abs[entry] * (1 + 1e-9),
          );
        }
      }),
    );
  });

  it('is as large as the number itself but for √2, in both directions', () => {
    fc.assert(
      fc.property(anyTrain(12), fc.nat(), between(-9, 9), between(-1, 1), (spec, place, y, nu) => {
        const train = buildTrain(spec);
        const surface = place % train.count;
        const ray = rayThrough(train, surface, y, nu);
        const scale = rayScale(train, surface, y, nu);
        const abs = absoluteRay(train, surface, y, nu);
        for (let k = 0; k < train.count; k++) {
          expect(Math.abs(ray.y[k]!)).toBeLessThanOrEqual(Math.SQRT2 * scale.y[k]! + 1e-9 * (abs.y[k] ?? 0));
        }
      }),
    );
  });
});

describe('zero power', () => {
  it('is found in pairs that share a focus, wherever rounding puts their power', () => {
    fc.assert(
      fc.property(between(1, 1000), fc.oneof(between(1, 1000), between(-0.9, -0.1)), (front, rear) => {
        const train = inAir([lens(front, front + rear), lens(rear, 0)]);
        expect(isZeroPower(systemMatrix(train))).toBe(true);
        expect(given(firstOrder(train).angularMagnification)).toBeCloseTo(-front / rear, 6);
      }),
    );
  });

  it('is not found where the focal length is only long', () => {
    const weak = firstOrder(inAir([lens(1e6, 0)]));
    expect(weak.afocal).toBe(false);
    expect(weak.nearlyAfocal).toBe(false);
    // A micrometre off in 150 mm leaves 10 km of focal length.
    const expander = firstOrder(inAir([lens(-50, 150.001), lens(200, 0)]));
    expect(expander.afocal).toBe(false);
    expect(expander.nearlyAfocal).toBe(true);
    expect(given(expander.focalLengthMm)).toBeCloseTo(1e7, -1);
    expect(given(expander.angularMagnification)).toBeCloseTo(-(-50 / 200) * 1, 4);
  });

  it('is found by scale, not by unit', () => {
    for (const unit of [1e-3, 1, 1e3]) {
      const train = inAir([lens(60 * unit, 40 * unit), lens(-20 * unit, 0)]);
      expect(firstOrder(train).afocal).toBe(true);
    }
  });

  it('is not read into a long relay, whose absolute terms grow with every lens', () => {
    // Forty lenses of 50 mm, 100 mm apart, then one more: the chain repeats itself every two lenses.
    const chain = [...Array.from({ length: 40 }, () => lens(50, 100)), lens(80, 0)];
    const train = inAir(chain);
    const exact = matrixBetween(train, 0, train.count).c.toNumber();
    expect(1e-12 * absoluteMatrix(train).c).toBeGreaterThan(Math.abs(exact));
    const { powerPerMm, afocal } = firstOrder(train);
    expect(afocal).toBe(false);
    expect(given(powerPerMm)).toBeCloseTo(-exact, 12);
  });
});
