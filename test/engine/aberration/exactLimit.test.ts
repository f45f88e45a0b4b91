import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { type Seidel, seidel } from '../../../engine/aberration/seidel.ts';
import { SUM_NAMES, type SumName } from '../../../engine/aberration/sums.ts';
import { traceRay } from '../../../engine/exact/ray.ts';
import { some } from '../../../engine/outcome.ts';
import { stopOf } from '../../../engine/paraxial/stop.ts';
import { paraxialRay } from '../../../engine/paraxial/trace.ts';
import { buildTrain, type SurfaceSpec } from '../../../engine/train/build.ts';
import type { Train } from '../../../engine/train/types.ts';
import { given } from '../quantity.ts';
import { uniform } from '../uniform.ts';

/** Apertures and fields are shrunk together by these; two halvings take the fifth and the seventh order out of the third. */
const SHRINK = [0.06, 0.03, 0.015] as const;
/** What the ninth order leaves of the largest sum. */
const LEFT = 1e-6;
/** Rounding of points and slopes times y′ and u′, over the cube of the smallest shrink, mm. */
const ROUNDED = 3e-8;

interface Light {
  readonly y: number;
  readonly u: number;
  readonly yChief: number;
  readonly uChief: number;
}

/** Glass and mirrors, with conics and r⁴ terms; behind an odd number of mirrors light runs to the left. */
const anySystem = (): fc.Arbitrary<readonly SurfaceSpec[]> =>
  fc
    .array(
      fc.record({
        curvaturePerMm: uniform(-0.02, 0.02),
        conic: fc.oneof(fc.constant(0), uniform(-3, 1)),
        fourth: fc.oneof(fc.constant(0), uniform(-1, 1)),
        mirror: fc.boolean().chain((one) => (one ? fc.boolean() : fc.constant(false))),
        size: uniform(1.3, 1.9),
        lengthMm: uniform(0.5, 12),
      }),
      { minLength: 1, maxLength: 6 },
    )
    .map((list) => {
      let before = 1;
      return list.map(({ curvaturePerMm, conic, fourth, mirror, size, lengthMm }, part) => {
        const indexAfter = mirror ? -before : Math.sign(before) * size;
        before = indexAfter;
        const gapMm = Math.sign(indexAfter) * lengthMm;
        return { part, curvaturePerMm, conic, asphere: [fourth * 2e-6], indexAfter, gapMm };
      });
    });

const anyLight = (): fc.Arbitrary<Light> =>
  fc.record({
    y: uniform(2, 5),
    u: fc.oneof(fc.constant(0), uniform(-0.1, 0.1)),
    yChief: uniform(-4, 4),
    uChief: uniform(-0.25, 0.25),
  });

function sumsOf(train: Train, light: Light): Seidel {
  const marginal = some(paraxialRay(train, light.y, light.u));
  const chief = some(paraxialRay(train, light.yChief, light.uChief));
  return given(seidel(train, { stop: stopOf(train), marginal, chief }));
}

/**
 * 2n′u′ times the transverse error in the paraxial image plane over the cube of the shrink, at pupil (px, py) and field share f, in the limit of no shrink. The
 * rays of one f leave one object point exactly.
 */
function thirdOrder(train: Train, light: Light, px: number, py: number, f: number): { x: number; y: number } {
  const { count } = train;
  const marginal = paraxialRay(train, light.y, light.u);
  const chief = paraxialRay(train, light.yChief, light.uChief);
  const factor = 2 * marginal.nu[count]!;
  const imageMm = (-train.index[count]! * marginal.y[count - 1]!) / marginal.nu[count]!;
  const gaussian = chief.y[count - 1]! + (imageMm / train.index[count]!) * chief.nu[count]!;
  const errors = SHRINK.map((shrink) => {
    const [x, y] = [px * light.y * shrink, (py * light.y + f * light.yChief) * shrink];
    const slopes = [px * light.u * shrink, (py * light.u + f * light.uChief) * shrink, 1] as const;
    const hit = traceRay(train, [x, y, 0], slopes).hits.at(-1);
    if (hit?.direction == null) throw new Error('a ray near the axis gets through');
    const reach = (imageMm - hit.point[2]) / hit.direction[2];
    const over = factor / shrink ** 3;
    return {
      x: over * (hit.point[0] + reach * hit.direction[0]),
      y: over * (hit.point[1] + reach * hit.direction[1] - f * gaussian * shrink),
    };
  });
  return { x: limitOf(errors.map(({ x }) => x)), y: limitOf(errors.map(({ y }) => y)) };
}

/** Richardson's extrapolation of three values at steps that halve, their errors going as the square and the fourth power. */
function limitOf([first = 0, second = 0, third = 0]: readonly number[]): number {
  const [one, two] = [(4 * second - first) / 3, (4 * third - second) / 3];
  return (16 * two - one) / 15;
}

/** The five sums from transverse errors: derivatives of W = S_I ρ⁴/8 + S_II ρ²(ρ·τ)/2 + S_III (ρ·τ)²/2 + (S_III + S_IV)ρ²τ²/4 + S_V (ρ·τ)τ²/2. */
function sumsFromRays(train: Train, light: Light): Partial<Record<SumName, number>> {
  const at = (px: number, py: number, f: number) => thirdOrder(train, light, px, py, f);
  const spherical = at(0, 1, 0).y;
  const distortion = at(0, 0, 1).y;
  const [upper, lower] = [at(0, 1, 1).y, at(0, -1, 1).y];
  const tangential = (upper - lower) / 2 - spherical;
  const sagittal = at(1, 0, 1).x - spherical;
  return {
    spherical,
    coma: ((upper + lower) / 2 - distortion) / 3,
    astigmatism: (tangential - sagittal) / 2,
    petzval: (3 * sagittal - tangential) / 2,
    distortion,
  };
}

describe('the Seidel sums', () => {
  it('are the limit of exact rays as aperture and field shrink, on any system of glass and mirrors', () => {
    fc.assert(
      fc.property(anySystem(), anyLight(), (surfaces, light) => {
        const train = buildTrain({ objectIndex: 1, surfaces, objectZ: null, imageDistanceMm: null });
        const nuRear = paraxialRay(train, light.y, light.u).nu[train.count] ?? 0;
        // Far images take the rounding of points with them.
        fc.pre(Math.abs(nuRear) > 0.01);
        const { totals, absolute } = sumsOf(train, light);
        const scale = Math.max(...SUM_NAMES.map((name) => absolute[name]));
        const limits = sumsFromRays(train, light);
        for (const [name, limit] of Object.entries(limits) as [SumName, number][])
          expect(Math.abs(totals[name] - limit), name).toBeLessThanOrEqual(LEFT * scale + ROUNDED);
      }),
    );
  });
});
