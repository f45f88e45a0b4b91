import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { normalAt, runAt } from '../../../engine/exact/surface.ts';
import { buildTrain } from '../../../engine/train/build.ts';
import { sagAt } from '../../../engine/train/profile.ts';
import { anyExactTrain, between } from './anyRay.ts';
import { trainOfRows } from './systems.ts';

/** Central differences over a thousandth of a millimetre keep that much. */
const DIFFERENCES = 1e-5;
const STEP_MM = 1e-3;

describe('slope and bend of a profile', () => {
  it('of a sphere are tan and 1/(R cos³) of the angle at its centre', () => {
    const train = trainOfRows({ rows: [[25, 0, 1.5]] });
    for (const angle of [0, 0.2, 0.9, 1.4]) {
      const { slope, bend, slopeOverRadius } = runAt(train, 0, 25 * Math.sin(angle));
      expect(slope).toBeCloseTo(Math.tan(angle), 12);
      expect(bend).toBeCloseTo(1 / (25 * Math.cos(angle) ** 3), 12);
      expect(slopeOverRadius).toBeCloseTo(1 / (25 * Math.cos(angle)), 12);
    }
  });

  it('are the differences of the sag, for conics and aspheres', () => {
    fc.assert(
      fc.property(anyExactTrain(3), between(0.1, 7), (spec, radius) => {
        const train = buildTrain(spec);
        for (let k = 0; k < train.count; k++) {
          const profile = {
            curvaturePerMm: train.curvature[k]!,
            conic: train.conic[k]!,
            asphere: train.asphere.subarray(train.asphereFrom[k]!, train.asphereFrom[k + 1]!),
          };
          const [before, here, after] = [-1, 0, 1].map((j) => sagAt(profile, radius + j * STEP_MM));
          if (before == null || here == null || after == null) continue;
          const { slope, bend, slopeOverRadius } = runAt(train, k, radius);
          expect(Math.abs(slope - (after - before) / (2 * STEP_MM))).toBeLessThan(
            DIFFERENCES * (1 + Math.abs(slope) ** 3),
          );
          expect(Math.abs(bend - (after - 2 * here + before) / STEP_MM ** 2)).toBeLessThan(
            10 * DIFFERENCES * (1 + Math.abs(slope) ** 5),
          );
          expect(slopeOverRadius * radius).toBeCloseTo(slope, 12);
        }
      }),
      { numRuns: 200 },
    );
  });

  it('give the unit normal, which of an ideal thin part is the axis', () => {
    const train = trainOfRows({
      rows: [
        [-30, 4, 1.5, { conic: 0.5 }],
        [0, 0, 1, { thinPowerPerMm: 0.01 }],
      ],
    });
    const normal = normalAt(train, 0, 3, -4);
    expect(Math.hypot(...normal)).toBeCloseTo(1, 14);
    // At right angles to the run along the radius.
    const { slope } = runAt(train, 0, 5);
    expect(normal[0] * 0.6 - normal[1] * 0.8 + normal[2] * slope).toBeCloseTo(0, 14);
    expect(normalAt(train, 1, 3, -4)).toEqual([0, 0, 1]);
  });
});
