import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { launchThrough, sourceOf } from '../../../engine/exact/launch.ts';
import { pupilMapOf } from '../../../engine/exact/pupilMap.ts';
import { shoot, sightOf } from '../../../engine/exact/sight.ts';
import type { ExactSetup } from '../../../engine/exact/types.ts';
import { between } from './anyRay.ts';
import { type Row, setupOfRows } from './systems.ts';

/** Of the stop's radius. */
const AIMED = 1e-10;
const LOOKS = 1500;

/** Two negative menisci in front of a positive group and a stop, seen at up to 88°: many have strange pupils, and some no chief ray at all. */
const anyWideAngle = () =>
  fc
    .record({
      radii: fc.tuple(between(25, 120), between(9, 30), between(25, 250), between(8, 22)),
      gaps: fc.tuple(between(6, 22), between(6, 22), between(4, 20)),
      indices: fc.tuple(between(1.5, 1.8), between(1.5, 1.7), between(1.6, 1.9)),
      positive: fc.tuple(between(20, 40), between(30, 200)),
      angleDeg: between(60, 88),
    })
    .map(({ radii, gaps, indices, positive, angleDeg }) => {
      const rows: Row[] = [
        [radii[0], 3, indices[0]],
        [radii[1], gaps[0], 1],
        [radii[2], 2.5, indices[1]],
        [radii[3], gaps[1], 1],
        [positive[0], 5, indices[2]],
        [-positive[1], gaps[2], 1],
        [0, 1, 1],
        [50, 4, 1.6],
        [-14, 0, 1],
      ];
      return setupOfRows(
        { rows, stop: 6 },
        { kind: 'stopDiameter', diameterMm: 3 },
        { kind: 'angle', angleDeg },
      );
    });

/** Whether a fine look over the first surface sees the ray pass from one side of the stop's centre to the other. */
function seesChief(setup: ExactSetup): boolean {
  const sight = sightOf(setup, 0);
  const source = sourceOf(setup, 0, 1);
  const radius = 1 / sight.train.curvature[0]!;
  let last = Number.NaN;
  for (let i = -LOOKS; i <= LOOKS; i++) {
    const y = (radius * i) / (LOOKS + 1);
    const [, b] = launchThrough(source, 0, y, radius - Math.sqrt(radius * radius - y * y));
    const here = shoot(sight, source, 0, b) ? sight.y : Number.NaN;
    if (last * here <= 0) return true;
    last = here;
  }
  return false;
}

describe('chief rays of wide-angle lenses', () => {
  it('are found whenever there is one', { timeout: 60_000 }, () => {
    const counts = { found: 0, none: 0 };
    for (const setup of fc.sample(anyWideAngle(), { seed: 20261201, numRuns: 80 })) {
      const map = pupilMapOf(setup, 0, 1);
      if (map.lost) {
        expect(seesChief(setup)).toBe(false);
        counts.none++;
        continue;
      }
      expect(shoot(map.sight, map.bundle.source, 0, map.bundle.chief.b)).toBe(true);
      expect(Math.abs(map.sight.y)).toBeLessThanOrEqual(AIMED);
      counts.found++;
    }
    expect(counts.found).toBeGreaterThan(40);
    expect(counts.none).toBeGreaterThan(0);
  });
});
