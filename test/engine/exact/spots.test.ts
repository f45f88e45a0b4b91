import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { contrastOf, type DiffractionLimit } from '../../../engine/exact/contrast.ts';
import { bestFocus, spotMoments, throughFocus } from '../../../engine/exact/focus.ts';
import { hexapolarGrid } from '../../../engine/exact/grids.ts';
import { alone, emptyLanding, type Landing } from '../../../engine/exact/landing.ts';
import { spotSize } from '../../../engine/exact/spots.ts';
import { diffractionContrast } from '../../../engine/paraxial/sensor.ts';
import { given } from '../quantity.ts';
import { between } from './anyRay.ts';

/** A few hundred roundings of the size of what was added. */
const ROUNDING = 1e-12;

interface Ray {
  readonly x: number;
  readonly y: number;
  readonly slopeX?: number;
  readonly slopeY?: number;
  readonly weight?: number;
}

function landingOf(rays: readonly Ray[], lost = 0): Landing {
  const landing = emptyLanding(rays.length + lost);
  for (const [i, { x, y, slopeX = 0, slopeY = 0, weight = 1 }] of rays.entries()) {
    landing.x[i] = x;
    landing.y[i] = y;
    landing.slopeX[i] = slopeX;
    landing.slopeY[i] = slopeY;
    landing.weight[i] = weight;
  }
  landing.count = rays.length;
  landing.lost = lost;
  return landing;
}

/** A cone of rays from the pupil's grid that meets in a point `focusMm` behind the plane. */
function cone(focusMm: number, slope: number, heightMm = 0): Landing {
  const { x, y, weight } = hexapolarGrid(8);
  return landingOf(
    [...x].flatMap((px, i) => {
      const ray = (x1: number): Ray => ({
        x: slope * x1 * focusMm,
        y: slope * y[i]! * focusMm + heightMm,
        slopeX: -slope * x1,
        slopeY: -slope * y[i]!,
        weight: weight[i]!,
      });
      return px === 0 ? [ray(0)] : [ray(px), ray(-px)];
    }),
  );
}

const anyRay = fc.record({
  x: between(-3, 3),
  y: between(-3, 3),
  slopeX: between(-0.5, 0.5),
  slopeY: between(-0.5, 0.5),
  weight: between(0.1, 2),
});
const anySpot = fc.array(anyRay, { minLength: 2, maxLength: 60 }).map((rays) => landingOf(rays));

describe('the size of a spot', () => {
  it('of four points on the corners of a rectangle is half its diagonal', () => {
    const spot = landingOf([
      { x: -3, y: 6 },
      { x: 3, y: 6 },
      { x: -3, y: 14 },
      { x: 3, y: 14 },
    ]);
    expect(given(spotSize(alone(spot)))).toEqual({
      centroidXMm: 0,
      centroidYMm: 10,
      rmsMm: 5,
      rmsXMm: 3,
      rmsYMm: 4,
      largestMm: 5,
      through: 4,
      lost: 0,
    });
  });

  it('of an evenly lit disc of radius a is a/√2', () => {
    const { rmsMm, largestMm } = given(spotSize(alone(cone(10, 0.1))));
    // The rings integrate r² to four digits.
    expect(rmsMm).toBeCloseTo(Math.SQRT1_2, 4);
    expect(largestMm).toBeCloseTo(1, 12);
  });

  it('counts points by their weight, and lines by theirs', () => {
    const heavy = landingOf([
      { x: 0, y: 0, weight: 3 },
      { x: 0, y: 4, weight: 1 },
    ]);
    expect(given(spotSize(alone(heavy)))).toMatchObject({
      centroidYMm: 1,
      rmsMm: Math.sqrt(3),
      largestMm: 3,
    });
    const [one, other] = [landingOf([{ x: 0, y: 0 }]), landingOf([{ x: 0, y: 4 }])];
    const both = [
      { landing: one, weight: 3 },
      { landing: other, weight: 1 },
    ];
    expect(given(spotSize(both))).toMatchObject({ centroidYMm: 1, rmsMm: Math.sqrt(3) });
  });

  it('keeps its digits far off the axis', () => {
    const near = [-1e-6, 0, 1e-6].map((y) => ({ x: 0, y }));
    const far = near.map(({ y }) => ({ x: 0, y: y + 1000 }));
    const [rmsNear, rmsFar] = [near, far].map((rays) => given(spotSize(alone(landingOf(rays)))).rmsMm);
    // Places of 1000 mm hold 1e-13 mm, a ten-millionth of this spot.
    expect(Math.abs(rmsFar! / rmsNear! - 1)).toBeLessThan(1e-6);
  });

  it('does not exist where every ray is lost, and counts those that are', () => {
    expect(spotSize(alone(landingOf([], 200)))).toEqual({ ok: false, why: 'no ray through' });
    expect(spotMoments(alone(landingOf([], 200)))).toEqual({ ok: false, why: 'no ray through' });
    expect(spotSize([])).toEqual({ ok: false, why: 'no ray through' });
    expect(bestFocus([])).toEqual({ ok: false, why: 'no ray through' });
    expect(given(spotSize(alone(landingOf([{ x: 1, y: 2 }], 5))))).toMatchObject({
      rmsMm: 0,
      through: 1,
      lost: 5,
    });
  });

  it('is the same when the spot is turned or moved', () => {
    fc.assert(
      fc.property(anySpot, between(-Math.PI, Math.PI), between(-50, 50), (spot, angle, shift) => {
        const [cos, sin] = [Math.cos(angle), Math.sin(angle)];
        const turned = landingOf(
          Array.from({ length: spot.count }, (_, i) => ({
            x: cos * spot.x[i]! - sin * spot.y[i]! + shift,
            y: sin * spot.x[i]! + cos * spot.y[i]!,
            weight: spot.weight[i]!,
          })),
        );
        const [before, after] = [given(spotSize(alone(spot))), given(spotSize(alone(turned)))];
        expect(Math.abs(after.rmsMm - before.rmsMm)).toBeLessThanOrEqual(ROUNDING * 60);
        expect(Math.abs(after.largestMm - before.largestMm)).toBeLessThanOrEqual(ROUNDING * 60);
      }),
    );
  });
});

describe('best focus', () => {
  it('of a cone is where it meets', () => {
    const moments = given(spotMoments(alone(cone(3, 0.1, 7))));
    expect(given(bestFocus([{ moments, weight: 1 }]))).toBeCloseTo(3, 12);
  });

  it('of two equal cones lies between them, nearer to the one that counts more', () => {
    const [near, far] = [cone(-1, 0.1), cone(2, 0.1)].map((landing) => given(spotMoments(alone(landing))));
    const between = (weight: number) =>
      given(
        bestFocus([
          { moments: near!, weight },
          { moments: far!, weight: 1 },
        ]),
      );
    expect(between(1)).toBeCloseTo(0.5, 12);
    expect(between(3)).toBeCloseTo(-0.25, 12);
  });

  it('does not exist when the rays are parallel', () => {
    const parallel = landingOf([
      { x: 0, y: 1, slopeY: 0.1 },
      { x: 0, y: -1, slopeY: 0.1 },
    ]);
    const moments = given(spotMoments(alone(parallel)));
    expect(bestFocus([{ moments, weight: 1 }])).toEqual({ ok: false, why: 'image at infinity' });
  });

  it('has the least rms among its neighbours, and the rms of every plane is that of the rays carried there', () => {
    fc.assert(
      fc.property(anySpot, (spot) => {
        const moments = given(spotMoments(alone(spot)));
        const best = bestFocus([{ moments, weight: 2 }]);
        // Slopes that differ by rounding alone have their focus anywhere.
        fc.pre(best.ok && moments.slopeSquare > 1e-6);
        const focus = given(best);
        const planes = Float64Array.from([-1, -0.1, -0.01, 0, 0.01, 0.1, 1], (step) => focus + step);
        const rms = throughFocus(moments, planes);
        const direct = [...planes].map((d) => given(spotSize(alone(spot), d)).rmsMm);
        const size = Math.max(...direct) + Math.sqrt(moments.square);
        for (const [i, value] of direct.entries()) {
          // The parabola is a difference of squares, so small spots between large ones hold half the digits.
          expect(Math.abs(rms[i]! ** 2 - value ** 2)).toBeLessThanOrEqual(ROUNDING * size * size);
          expect(value).toBeGreaterThanOrEqual(direct[3]! - ROUNDING * size);
        }
      }),
    );
  });
});

describe('contrast from the spot', () => {
  const limit: DiffractionLimit = { wavelengthNm: 500, tangentialFNumber: 4, sagittalFNumber: 5 };

  it('of one point is full, and diffraction stands beside it for each direction', () => {
    const { atNyquist, atHalfNyquist } = given(contrastOf(alone(landingOf([{ x: 1, y: 2 }])), 100, limit));
    expect(atNyquist).toMatchObject({ perMm: 100, tangential: 1, sagittal: 1 });
    expect(atNyquist.tangentialLimit).toBe(diffractionContrast(100, 500, 4));
    expect(atNyquist.sagittalLimit).toBe(diffractionContrast(100, 500, 5));
    expect(atHalfNyquist).toMatchObject({ perMm: 50, tangential: 1, sagittal: 1 });
  });

  it('of two points half a period apart vanishes across them and stays along them', () => {
    const pair = landingOf([
      { x: 0, y: 4 },
      { x: 0, y: 4.005 },
    ]);
    const { atNyquist, atHalfNyquist } = given(contrastOf(alone(pair), 100, limit));
    expect(atNyquist.tangential).toBeCloseTo(0, 9);
    expect(atNyquist.sagittal).toBe(1);
    expect(atHalfNyquist.tangential).toBeCloseTo(Math.SQRT1_2, 9);
  });

  it('of an evenly lit disc is 2 J1(z)/z, as for a defocused perfect lens', () => {
    // Radius 5 µm, 50 and 100 per mm: z = 2π·ν·a; J1 from Abramowitz and Stegun, table 9.1.
    const { atNyquist, atHalfNyquist } = given(contrastOf(alone(cone(0.05, 0.1)), 100, limit));
    const besselJ1 = (z: number): number => {
      let [term, sum] = [z / 2, z / 2];
      for (let k = 1; k < 30; k++) {
        term *= (-z * z) / (4 * k * (k + 1));
        sum += term;
      }
      return sum;
    };
    for (const { perMm, tangential, sagittal } of [atNyquist, atHalfNyquist]) {
      const z = 2 * Math.PI * perMm * 0.005;
      const closed = Math.abs((2 * besselJ1(z)) / z);
      // The rings integrate to about four digits at this many waves across the disc.
      expect(tangential).toBeCloseTo(closed, 3);
      expect(sagittal).toBeCloseTo(closed, 3);
    }
  });

  it('is never above one, is one for frequency nought, and is the same wherever the spot lies', () => {
    fc.assert(
      fc.property(anySpot, between(1, 500), between(-40, 40), (spot, perMm, shift) => {
        const moved = landingOf(
          Array.from({ length: spot.count }, (_, i) => ({
            x: spot.x[i]! + shift,
            y: spot.y[i]! - shift,
            weight: spot.weight[i]!,
          })),
        );
        const [here, there] = [spot, moved].map((landing) => given(contrastOf(alone(landing), perMm, limit)));
        for (const key of ['tangential', 'sagittal'] as const) {
          expect(here!.atNyquist[key]).toBeLessThanOrEqual(1 + ROUNDING);
          // Phases of some thousand periods hold nine digits.
          expect(Math.abs(here!.atNyquist[key] - there!.atNyquist[key])).toBeLessThan(1e-9);
        }
        expect(given(contrastOf(alone(spot), 0, limit)).atNyquist).toMatchObject({ tangentialLimit: 1 });
      }),
    );
  });

  it('does not exist where every ray is lost', () => {
    expect(contrastOf(alone(landingOf([], 3)), 100, limit)).toEqual({ ok: false, why: 'no ray through' });
  });
});
