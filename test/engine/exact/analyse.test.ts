import { describe, expect, it } from 'vitest';
import { exactSetupOf, leastSpotShift } from '../../../engine/exact/analyse.ts';
import { sampleOf, traceFields } from '../../../engine/exact/bundles.ts';
import { compare } from '../../../engine/exact/compare.ts';
import { hexapolarGrid } from '../../../engine/exact/grids.ts';
import { landingsOf } from '../../../engine/exact/landing.ts';
import { spotSize } from '../../../engine/exact/spots.ts';
import type { ExactSetup } from '../../../engine/exact/types.ts';
import { analyse } from '../../../engine/paraxial/analyse.ts';
import type { Sketch } from '../../../engine/sketch/types.ts';
import { trainOf } from '../../../engine/train/train.ts';
import { given } from '../quantity.ts';
import { realZoom } from '../realZoom.ts';
import { onFirst, sketchOf, thin } from '../sketchOf.ts';

const setupOf = (sketch: Sketch) => {
  const setting = onFirst(sketch);
  return exactSetupOf(sketch, setting, analyse(sketch, setting));
};

describe('the exact setup of a sketch', () => {
  const zoom = realZoom();
  const setup = given(setupOf(zoom));

  it('has the train of every line, the main one first, with the weights of the sketch', () => {
    const weighted: Sketch = {
      ...zoom,
      lines: {
        ...zoom.lines,
        weights: { main: 3, short: 1, long: 2 },
        more: [{ wavelengthNm: 600, weight: 0.5 }],
      },
    };
    const { lines } = given(setupOf(weighted));
    expect(lines.map(({ line, weight }) => [line, weight])).toEqual([
      ['main', 3],
      ['short', 1],
      ['long', 2],
      ['fourth', 0.5],
    ]);
    for (const { line, train } of lines) expect(train).toEqual(trainOf(weighted, onFirst(weighted), line));
    expect(lines[1]?.train, 'made once').toBe(lines[1]?.train);
  });

  it('stands on the same plane and stop as the first order', () => {
    const analysis = analyse(zoom, onFirst(zoom));
    expect(setup.imagePlaneMm).toEqual(analysis.conjugates.imagePlaneMm);
    expect(setup.stopSurface).toBe(given(analysis.rays.stop).surface);
    expect(given(compare(setup).focalLengthMm.paraxial)).toBe(given(analysis.firstOrder.focalLengthMm));
  });

  it('is absent for the reason that the paraxial rays are', () => {
    expect(setupOf(sketchOf([thin('p1', 50)]))).toEqual({ ok: false, why: 'no stop' });
  });
});

describe('the least spot', () => {
  const fractions = [0, 0.7, 1];
  /** Sum of the mean squares of all fields, by the spots themselves. */
  const squares = (setup: ExactSetup, shiftMm: number): number =>
    traceFields(setup, fractions, sampleOf(0, hexapolarGrid(6), { fine: true })).reduce(
      (sum, field) => sum + given(spotSize(given(landingsOf(field)), shiftMm)).rmsMm ** 2,
      0,
    );

  it('is smaller where the shift says than a little in front and behind', () => {
    const setup = given(setupOf(realZoom()));
    const shiftMm = given(leastSpotShift(setup, fractions));
    expect(Math.abs(shiftMm)).toBeGreaterThan(0.1);
    const there = squares(setup, shiftMm);
    expect(there).toBeLessThan(squares(setup, 0));
    for (const beside of [-0.05, 0.05]) expect(there).toBeLessThan(squares(setup, shiftMm + beside));
  });

  it('of an ideal lens lies at the paraxial image', () => {
    const sketch = sketchOf([thin('p1', 50)], 'p1', { aperture: { kind: 'infinityFNumber', fNumber: 2 } });
    // All rays of an ideal part meet in one point, so only rounding is left.
    expect(given(leastSpotShift(given(setupOf(sketch)), fractions))).toBeCloseTo(0, 9);
  });
});
