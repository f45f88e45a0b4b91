import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { seidel } from '../../../engine/aberration/seidel.ts';
import { some } from '../../../engine/outcome.ts';
import { firstOrder } from '../../../engine/paraxial/firstOrder.ts';
import { stopOf } from '../../../engine/paraxial/stop.ts';
import { paraxialRay } from '../../../engine/paraxial/trace.ts';
import { type AchromatWish, achromat, achromaticPair } from '../../../engine/solve/achromat.ts';
import { bendingOf } from '../../../engine/solve/bending.ts';
import { trainOfStack } from '../../../engine/solve/stack.ts';
import { buildTrain } from '../../../engine/train/build.ts';
import { given } from '../quantity.ts';
import { uniform } from '../uniform.ts';

const CROWN = { index: 1.5168, abbeNumber: 64.17 };
const FLINT = { index: 1.62004, abbeNumber: 36.37 };

const wishOf = (more: Partial<AchromatWish>): AchromatWish => ({
  focalLengthMm: 100,
  glasses: [CROWN, FLINT],
  thicknessesMm: [6, 2.5],
  bending: bendingOf(0.1),
  ...more,
});

const stackOf = ({ glasses, thicknessesMm }: AchromatWish, curvaturesPerMm: readonly number[]) => ({
  curvaturesPerMm,
  indices: [1, glasses[0].index, glasses[1].index, 1],
  thicknessesMm,
});

/** Axial colour sum of a ray 10 high through the pair at zero thickness, and the sum of its absolute terms. */
function thinColourOf(wish: AchromatWish, curvatures: readonly number[]) {
  const spread = wish.glasses.map(({ index, abbeNumber }) => (index - 1) / abbeNumber);
  const train = buildTrain({
    objectIndex: 1,
    surfaces: curvatures.map((curvaturePerMm, k) => ({
      part: 0,
      curvaturePerMm,
      indexAfter: wish.glasses[k]?.index ?? 1,
      spreadAfter: spread[k] ?? 0,
      gapMm: 0,
    })),
    objectZ: null,
    imageDistanceMm: null,
  });
  const ray = some(paraxialRay(train, 10, 0));
  const { totals, absolute } = given(seidel(train, { stop: stopOf(train), marginal: ray, chief: ray }));
  return { colour: totals.axialColour, scale: absolute.axialColour };
}

describe('a cemented pair', () => {
  // Thin powers in air: φ1 = φV1/(V1 − V2), φ2 = −φV2/(V1 − V2).
  it('at zero thickness has the textbook powers', () => {
    const { curvaturesPerMm } = given(achromat(wishOf({ thicknessesMm: [0, 0] })));
    const [c1, c2, c3] = curvaturesPerMm;
    const pair = given(achromaticPair(100, 64.17, 36.37));
    expect(1 / ((c1 - c2) * 0.5168)).toBeCloseTo(pair.firstFocalLengthMm, 11);
    expect(1 / ((c2 - c3) * 0.62004)).toBeCloseTo(pair.secondFocalLengthMm, 11);
    expect(pair.firstFocalLengthMm).toBeCloseTo(43.32242480910082, 12);
    expect((c1 + c2) / (c1 - c2)).toBeCloseTo(0.1, 12);
  });

  it('has the wished focal length at its full thickness and no thin-element colour', () => {
    const anyGlass = fc.record({ index: uniform(1.45, 1.9), abbeNumber: uniform(20, 90) });
    fc.assert(
      fc.property(
        fc.tuple(anyGlass, anyGlass).filter(([a, b]) => Math.abs(a.abbeNumber - b.abbeNumber) > 8),
        fc.oneof(uniform(20, 1000), uniform(-1000, -20)),
        fc.tuple(uniform(0, 8), uniform(0, 4)),
        uniform(-2, 2),
        (glasses, focalLengthMm, thicknessesMm, q) => {
          const wish = wishOf({ glasses, focalLengthMm, thicknessesMm, bending: bendingOf(q) });
          const pair = achromat(wish);
          if (!pair.ok) return;
          const { curvaturesPerMm, principalFrontMm } = pair.value;
          const first = firstOrder(trainOfStack(stackOf(wish, curvaturesPerMm)));
          const strongest = Math.max(...curvaturesPerMm.map(Math.abs));
          const lost = 1e-14 * strongest * Math.abs(focalLengthMm);
          expect(Math.abs(given(first.focalLengthMm) / focalLengthMm - 1)).toBeLessThanOrEqual(lost);
          expect(given(first.principalFrontMm)).toBe(principalFrontMm);
          const { colour, scale } = thinColourOf(wish, curvaturesPerMm);
          expect(Math.abs(colour)).toBeLessThanOrEqual(1e-13 * scale);
        },
      ),
    );
  });

  it('cannot be made of one glass, of glasses without dispersion, of equal radii, or too thick', () => {
    const why = (more: Partial<AchromatWish>) => {
      const pair = achromat(wishOf(more));
      return pair.ok ? 'solved' : pair.why;
    };
    expect(why({})).toBe('solved');
    expect(why({ glasses: [CROWN, { ...FLINT, abbeNumber: 64.17 }] })).toBe('equal Abbe numbers');
    expect(why({ glasses: [CROWN, { ...FLINT, abbeNumber: Number.POSITIVE_INFINITY }] })).toBe(
      'no dispersion',
    );
    expect(why({ bending: { front: 1, rear: 1 } })).toBe('no bending');
    expect(why({ focalLengthMm: -100, thicknessesMm: [400, 400], bending: bendingOf(2) })).toBe(
      'no such radii',
    );
    expect(achromaticPair(100, 50, 50)).toEqual({ ok: false, why: 'equal Abbe numbers' });
  });
});
