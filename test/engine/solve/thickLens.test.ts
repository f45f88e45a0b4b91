import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { firstOrder } from '../../../engine/paraxial/firstOrder.ts';
import { bendingOf } from '../../../engine/solve/bending.ts';
import { trainOfStack } from '../../../engine/solve/stack.ts';
import { type LensWish, thickLens } from '../../../engine/solve/thickLens.ts';
import { sagAt } from '../../../engine/train/profile.ts';
import { given } from '../quantity.ts';
import { uniform } from '../uniform.ts';

const centre = (thicknessMm: number) => ({ kind: 'centre', thicknessMm }) as const;
const radii = (wish: LensWish) => given(thickLens(wish)).curvaturesPerMm.map((c) => 1 / c);
const wishOf = (more: Partial<LensWish>): LensWish => ({
  focalLengthMm: 48,
  index: 1.5168,
  bending: { front: 1, rear: 0 },
  thickness: centre(4),
  ...more,
});

describe('a lens of focal length 48 and index 1.5168, 4 thick', () => {
  // By hand: one curved surface has all the power, R = f(n − 1); the principal plane of the curved side touches it, the other lies t/n inside.
  it('curved in front and flat behind has R = f(n − 1) and its planes at 0 and −t/n', () => {
    const lens = given(thickLens(wishOf({})));
    expect(1 / lens.curvaturesPerMm[0]).toBeCloseTo(48 * 0.5168, 12);
    expect(lens.curvaturesPerMm[1]).toBe(0);
    expect(lens.principalFrontMm).toBeCloseTo(0, 12);
    expect(lens.principalRearMm).toBeCloseTo(-4 / 1.5168, 12);
    expect(lens.principalSpacingMm).toBeCloseTo(4 - 4 / 1.5168, 12);
    expect(lens.focalLengthMm).toBeCloseTo(48, 12);
  });

  // By hand: 1/f = (n − 1)(2/R − (n − 1)t/(nR²)) is R² − 2(n − 1)f R + (n − 1)²f t/n = 0.
  it('equi-convex has R = (n − 1)(f + √(f² − f t/n)) and its planes evenly inside', () => {
    const lens = given(thickLens(wishOf({ bending: bendingOf(0) })));
    const R = 0.5168 * (48 + Math.sqrt(48 * 48 - (48 * 4) / 1.5168));
    const [front, rear] = lens.curvaturesPerMm;
    expect(1 / front).toBeCloseTo(R, 11);
    expect(rear).toBe(-front);
    // V1H = −f(n − 1)t/(n R2) and V2H′ = −f(n − 1)t/(n R1).
    const inside = (48 * 0.5168 * 4) / (1.5168 * R);
    expect(lens.principalFrontMm).toBeCloseTo(inside, 12);
    expect(lens.principalRearMm).toBeCloseTo(-inside, 12);
  });

  it('with equal radii is curved either way, as chosen: 1/f = (n − 1)²t/(nR²)', () => {
    const R = 0.5168 * Math.sqrt((48 * 4) / 1.5168);
    const equal = { bending: { front: 1, rear: 1 } };
    for (const curved of [1, -1] as const) {
      const [front = 0, rear = 0] = radii(wishOf({ ...equal, curved }));
      expect(front).toBeCloseTo(curved * R, 12);
      expect(rear).toBe(front);
    }
    expect(radii(wishOf(equal))[0]).toBeGreaterThan(0);
  });
});

/** Focal lengths, bendings and thicknesses of glass that can be made. */
const anyWish = (): fc.Arbitrary<LensWish> =>
  fc.record({
    focalLengthMm: fc.oneof(uniform(5, 2000), uniform(-2000, -5)),
    index: uniform(1.4, 4),
    bending: fc.oneof(
      fc.record({ front: uniform(-3, 3), rear: uniform(-3, 3) }),
      fc.constant({ front: 1, rear: 1 }),
      uniform(-4, 4).map(bendingOf),
    ),
    thickness: uniform(0, 20).map(centre),
    curved: fc.constantFrom(1 as const, -1 as const),
    indexInFront: fc.constantFrom(1, 1.33),
    indexBehind: fc.constantFrom(1, 1.33),
  });

describe('any lens that was solved for', () => {
  it('has exactly the focal length, its planes and its bending, whatever surrounds it', () => {
    fc.assert(
      fc.property(anyWish(), (wish) => {
        const lens = thickLens(wish);
        if (!lens.ok) return;
        const { curvaturesPerMm, thicknessMm, principalFrontMm, principalRearMm } = lens.value;
        const [c1, c2] = curvaturesPerMm;
        const { index, indexInFront = 1, indexBehind = 1, bending } = wish;
        // A second way: φ = φ1 + φ2 − φ1φ2t/n and the planes by the surfaces' own powers.
        const [front, rear] = [(index - indexInFront) * c1, (indexBehind - index) * c2];
        const power = front + rear - (front * rear * thicknessMm) / index;
        const scale = Math.abs(front) + Math.abs(rear) + Math.abs((front * rear * thicknessMm) / index);
        expect(Math.abs(power - 1 / wish.focalLengthMm)).toBeLessThanOrEqual(1e-14 * scale);
        expect(c1 * bending.rear - c2 * bending.front).toBeCloseTo(0, 12);
        const lost = (1e-13 * scale) / Math.abs(power);
        const reach = Math.abs(1 / power) + thicknessMm;
        const planes = [
          principalFrontMm - (indexInFront * rear * thicknessMm) / (index * power),
          principalRearMm + (indexBehind * front * thicknessMm) / (index * power),
        ];
        for (const off of planes)
          expect(Math.abs(off)).toBeLessThanOrEqual(lost * reach * (1 + scale * reach));
      }),
    );
  });

  it('is the thin lens when its thickness goes to zero', () => {
    fc.assert(
      fc.property(anyWish(), (wish) => {
        const { bending } = wish;
        fc.pre(Math.abs(bending.front - bending.rear) > 0.1);
        const air = { ...wish, indexInFront: 1, indexBehind: 1 };
        const thin = given(thickLens({ ...air, thickness: centre(0) }));
        const nearly = given(thickLens({ ...air, thickness: centre(1e-9) }));
        const k = 1 / (wish.focalLengthMm * (wish.index - 1) * (bending.front - bending.rear));
        expect(thin.curvaturesPerMm[0]).toBeCloseTo(k * bending.front, 12);
        for (const side of [0, 1] as const) {
          const off = nearly.curvaturesPerMm[side] - thin.curvaturesPerMm[side];
          expect(Math.abs(off)).toBeLessThanOrEqual(1e-6 * Math.abs(thin.curvaturesPerMm[side]));
        }
      }),
    );
  });

  it('given at its edge has that edge, at the same focal length', () => {
    fc.assert(
      fc.property(anyWish(), uniform(0.2, 8), uniform(0.5, 12), (wish, edgeMm, semiDiameterMm) => {
        const lens = thickLens({ ...wish, thickness: { kind: 'edge', thicknessMm: edgeMm, semiDiameterMm } });
        if (!lens.ok) return;
        const { curvaturesPerMm, thicknessMm } = lens.value;
        const [front = 0, rear = 0] = curvaturesPerMm.map(
          (curvaturePerMm) => sagAt({ curvaturePerMm, conic: 0, asphere: [] }, semiDiameterMm) ?? Number.NaN,
        );
        const scale = thicknessMm + Math.abs(front) + Math.abs(rear);
        expect(Math.abs(thicknessMm - front + rear - edgeMm)).toBeLessThanOrEqual(1e-14 * scale);
        const again = given(thickLens({ ...wish, thickness: centre(thicknessMm) }));
        expect(again).toEqual(lens.value);
      }),
    );
  });
});

describe('an edge thickness', () => {
  it('of 1.5 at a semi-diameter of 10 makes a lens of f = 48 thicker by its sags', () => {
    const lens = given(
      thickLens(wishOf({ thickness: { kind: 'edge', thicknessMm: 1.5, semiDiameterMm: 10 } })),
    );
    // By hand, flat behind: R = f(n − 1), t = 1.5 + R − √(R² − 10²).
    const R = 48 * 0.5168;
    expect(lens.thicknessMm).toBeCloseTo(1.5 + R - Math.sqrt(R * R - 100), 12);
  });
});

describe('what cannot be solved for', () => {
  const why = (more: Partial<LensWish>) => {
    const lens = thickLens(wishOf(more));
    return lens.ok ? 'solved' : lens.why;
  };

  it('says why', () => {
    expect(why({ bending: { front: 0, rear: 0 } })).toBe('no bending');
    expect(why({ index: 1 })).toBe('index of its surroundings');
    expect(why({ bending: { front: 1, rear: 1 }, thickness: centre(0) })).toBe(
      'equal radii without thickness',
    );
    // Power from thickness alone is positive.
    expect(why({ bending: { front: 1, rear: 1 }, focalLengthMm: -48 })).toBe('no such radii');
    // An equi-convex lens cannot be thicker than n·f.
    expect(why({ bending: bendingOf(0), thickness: centre(1.5168 * 48 + 1) })).toBe('no such radii');
    expect(why({ thickness: { kind: 'edge', thicknessMm: 1, semiDiameterMm: 25 } })).toBe(
      'rim beyond a surface',
    );
    const hollow = { kind: 'edge', thicknessMm: 1, semiDiameterMm: 10 } as const;
    expect(why({ focalLengthMm: -48, thickness: hollow })).toBe('no such edge');
    expect(why({ focalLengthMm: 0 })).toBe('out of range');
    expect(why({ focalLengthMm: Number.NaN })).toBe('out of range');
    expect(why({ bending: { front: 1e300, rear: 1 }, index: 1e300 })).toBe('out of range');
  });

  it('at the thickest equi-convex lens still gives it', () => {
    const lens = given(thickLens(wishOf({ bending: bendingOf(0), thickness: centre(1.5168 * 48) })));
    const stack = {
      curvaturesPerMm: lens.curvaturesPerMm,
      indices: [1, 1.5168, 1],
      thicknessesMm: [lens.thicknessMm],
    };
    expect(given(firstOrder(trainOfStack(stack)).focalLengthMm)).toBeCloseTo(48, 6);
  });
});
