import { describe, expect, it } from 'vitest';
import { type Drawn, drawnField } from '../../../engine/exact/drift.ts';
import { pupilMapOf } from '../../../engine/exact/pupilMap.ts';
import { type Layout, PHOTO, setupOfRows } from './systems.ts';

const FAN = [0, -1, 0, -0.5, 0, 0, 0, 0.5, 0, 1];
const DRAWN: Drawn = { fromMm: -20, toMm: 70, clip: true, aimed: true };

/** mm: rounding on the way through a lens. */
const ROUNDING = 1e-11;

const SINGLET: Layout = {
  rows: [
    [40, 5, 1.5],
    [-60, 0, 1],
  ],
  stop: 0,
};
const singlet = (diameterMm: number) =>
  setupOfRows(SINGLET, { kind: 'stopDiameter', diameterMm }, { kind: 'angle', angleDeg: 5 });

/** Through z and y of each point in turn. */
const pointsOf = (line: Float64Array) =>
  Array.from({ length: line.length / 2 }, (_, i) => [line[2 * i]!, line[2 * i + 1]!] as const);

describe('drawn rays', () => {
  it('run from where the drawing begins over the real surfaces to where it ends', () => {
    const setup = setupOfRows(
      PHOTO,
      { kind: 'infinityFNumber', fNumber: 4 },
      { kind: 'angle', angleDeg: 20 },
    );
    const { train } = setup.lines[0];
    for (const { exact, paraxial, lost } of drawnField(pupilMapOf(setup, 0, 0.7), FAN, DRAWN).rays) {
      expect(lost).toBeNull();
      const [points, straight] = [pointsOf(exact), pointsOf(paraxial)];
      expect([points.length, straight.length]).toEqual([train.count + 2, train.count + 2]);
      expect([points[0]?.[0], points.at(-1)?.[0], straight[0]?.[0], straight.at(-1)?.[0]]).toEqual([
        -20, 70, -20, 70,
      ]);
      for (let k = 0; k < train.count; k++) {
        const [z = 0, y = 0] = points[k + 1] ?? [];
        const c = train.curvature[k]!;
        expect(
          Math.abs(z - train.z[k]! - (c * y * y) / (1 + Math.sqrt(1 - c * c * y * y))),
        ).toBeLessThanOrEqual(ROUNDING);
        expect(straight[k + 1]?.[0]).toBe(train.z[k]);
      }
    }
  });

  it('start at a finite object, and reach the same object point exactly and paraxially', () => {
    const setup = setupOfRows(
      { ...SINGLET, objectZ: -90 },
      { kind: 'objectNA', na: 0.05 },
      { kind: 'objectHeight', heightMm: 6 },
    );
    for (const { exact, paraxial } of drawnField(pupilMapOf(setup, 0, 1), FAN, DRAWN).rays) {
      for (const line of [exact, paraxial]) {
        expect(line[0]).toBe(-90);
        expect(Math.abs(line[1]! + 6)).toBeLessThanOrEqual(ROUNDING);
      }
    }
  });

  it('drift, exact minus paraxial, by eight times as much at twice the aperture on the axis', () => {
    const driftAt = (diameterMm: number) => {
      const [ray] = drawnField(pupilMapOf(singlet(diameterMm), 0, 0), [0, 1], DRAWN).rays;
      return ray ?? { imageDriftMm: null, heightDriftMm: [], slopeDrift: [] };
    };
    const [small, large] = [driftAt(0.8), driftAt(1.6)];
    expect((large.imageDriftMm ?? 0) / (small.imageDriftMm ?? 1)).toBeCloseTo(8, 1);
    expect((large.slopeDrift[1] ?? 0) / (small.slopeDrift[1] ?? 1)).toBeCloseTo(8, 1);
    // A positive lens bends the edge too strongly: the exact ray falls below the paraxial one.
    expect(large.imageDriftMm).toBeLessThan(0);
    expect(large.heightDriftMm).toHaveLength(2);
  });

  it('name the largest drift by ray and surface, the image plane counted behind the last', () => {
    const { rays, largest } = drawnField(pupilMapOf(singlet(16), 0, 1), FAN, DRAWN);
    if (!largest) throw new Error('no drift');
    const ray = rays[largest.ray];
    expect(largest.driftMm).toBe(
      largest.surface === 2 ? ray?.imageDriftMm : ray?.heightDriftMm[largest.surface],
    );
    for (const { heightDriftMm, imageDriftMm } of rays) {
      for (const drift of [...heightDriftMm, imageDriftMm ?? 0]) {
        expect(Math.abs(drift)).toBeLessThanOrEqual(Math.abs(largest.driftMm));
      }
    }
  });

  it('of an all-thin layout in air do not drift', () => {
    const thin: Layout = {
      rows: [
        [0, 20, 1, { thinPowerPerMm: 1 / 50 }],
        [0, 15, 1],
        [0, 0, 1, { thinPowerPerMm: -1 / 80 }],
      ],
      stop: 1,
    };
    const setup = setupOfRows(
      thin,
      { kind: 'stopDiameter', diameterMm: 14 },
      { kind: 'angle', angleDeg: 20 },
    );
    const { largest } = drawnField(pupilMapOf(setup, 0, 1), FAN, DRAWN);
    expect(Math.abs(largest?.driftMm ?? 1)).toBeLessThanOrEqual(1e-9);
  });

  it('end where they are lost, with the surface and the reason', () => {
    const ends = (rows: Layout['rows'], diameterMm: number) =>
      drawnField(
        pupilMapOf(
          setupOfRows(
            { rows, stop: 0 },
            { kind: 'stopDiameter', diameterMm },
            { kind: 'angle', angleDeg: 1 },
          ),
          0,
          0,
        ),
        [0, 1],
        DRAWN,
      ).rays[0];
    const cut = ends(
      [
        [0, 10, 1],
        [0, 5, 1, { semiDiameterMm: 3 }],
        [0, 0, 1],
      ],
      8,
    );
    expect(cut?.lost).toEqual({ why: 'clipped', surface: 1 });
    expect(pointsOf(cut?.exact ?? new Float64Array()).at(-1)).toEqual([10, 4]);
    const past = ends(
      [
        [0, 10, 1],
        [3, 5, 1.5],
        [0, 0, 1],
      ],
      8,
    );
    expect(past?.lost).toEqual({ why: 'missed', surface: 1 });
    expect(pointsOf(past?.exact ?? new Float64Array()).at(-1)).toEqual([10, 4]);
    const turned = ends(
      [
        [0, 10, 1.7],
        [-6, 5, 1],
        [0, 0, 1],
      ],
      11,
    );
    expect(turned?.lost).toEqual({ why: 'totally reflected', surface: 1 });
    expect(turned?.exact.at(-1)).toBe(5.5);
    expect([turned?.imageDriftMm, turned?.heightDriftMm.length, turned?.slopeDrift.length]).toEqual([
      null,
      2,
      1,
    ]);
    // What is paraxial goes on.
    expect(turned?.paraxial).toHaveLength(10);
  });

  it('that no aiming brings to the stop are drawn as far as the last one tried', () => {
    const glass: Layout = {
      objectIndex: 1.5168,
      rows: [
        [0, 10, 1],
        [0, 5, 1],
      ],
      stop: 1,
    };
    const setup = setupOfRows(
      glass,
      { kind: 'stopDiameter', diameterMm: 1 },
      { kind: 'angle', angleDeg: 60 },
    );
    const { rays } = drawnField(pupilMapOf(setup, 0, 1), FAN, DRAWN);
    for (const { lost, exact, heightDriftMm } of rays) {
      expect(lost).toEqual({ why: 'totally reflected', surface: 0 });
      expect(exact.every(Number.isFinite)).toBe(true);
      expect(heightDriftMm).toHaveLength(1);
    }
  });
});
