import { describe, expect, it } from 'vitest';
import { traceBatch } from '../../../engine/exact/kernel.ts';
import { aimedRay, aimRays, mapRays, type PupilMap, pupilMapOf } from '../../../engine/exact/pupilMap.ts';
import { traceRay } from '../../../engine/exact/ray.ts';
import { CODE, lostOf, PATH, STRIDE, X, Y } from '../../../engine/exact/rayBuffer.ts';
import type { ExactSetup, Vector } from '../../../engine/exact/types.ts';
import { FISHEYE, PHOTO, setupOfRows } from './systems.ts';

/** Of the stop's radius: ten times what the search is content with. */
const AIMED = 1e-10;

/** Points spread evenly over the whole stop, rim included. */
const PUPIL = Float64Array.from({ length: 120 }, (_, i) => {
  const [ring, turn] = [Math.sqrt((i >> 1) / 59), 2.399963 * (i >> 1)];
  return ring * (i % 2 === 0 ? Math.cos(turn) : Math.sin(turn));
});
const COUNT = PUPIL.length / 2;

const photo = () =>
  setupOfRows(PHOTO, { kind: 'infinityFNumber', fNumber: 4 }, { kind: 'angle', angleDeg: 22 });
const fisheye = () =>
  setupOfRows(FISHEYE, { kind: 'stopDiameter', diameterMm: 3 }, { kind: 'angle', angleDeg: 80 });

/** How far the rays pass by their points of the stop, and how many do not get there. */
function offTarget(map: PupilMap, start: typeof aimRays): { worst: number; lost: number } {
  const { train, stopSurface, stopRadiusMm } = map.sight;
  const rays = new Float64Array(COUNT * STRIDE);
  start(map, PUPIL, COUNT, rays);
  traceBatch(train, rays, COUNT, false, 0, stopSurface + 1);
  let [worst, lost] = [0, 0];
  for (let i = 0; i < COUNT; i++) {
    const at = i * STRIDE;
    if (rays[at + CODE] !== 0) lost++;
    else {
      const off = Math.hypot(
        rays[at + X]! / stopRadiusMm - PUPIL[2 * i]!,
        rays[at + Y]! / stopRadiusMm - PUPIL[2 * i + 1]!,
      );
      worst = Math.max(worst, off);
    }
  }
  return { worst, lost };
}

const SYSTEMS: readonly [name: string, setup: () => ExactSetup, mapped: number][] = [
  ['a photographic lens at 22°', photo, 1e-3],
  ['a lens of 160° field with its stop far behind', fisheye, 1e-4],
  [
    'a relay with a near object',
    () =>
      setupOfRows(
        { ...PHOTO, objectZ: -60 },
        { kind: 'objectNA', na: 0.06 },
        { kind: 'objectHeight', heightMm: 9 },
      ),
    1e-3,
  ],
  [
    'a lens telecentric in object space',
    () =>
      setupOfRows(
        {
          rows: [
            [60, 6, 1.6],
            [-60, 45.6, 1],
            [0, 30, 1],
          ],
          stop: 2,
          objectZ: -40,
        },
        { kind: 'objectNA', na: 0.08 },
        { kind: 'objectHeight', heightMm: 8 },
      ),
    1e-3,
  ],
  [
    'a virtual object',
    () =>
      setupOfRows(
        {
          rows: [
            [40, 3, 1.5],
            [0, 4, 1],
            [0, 5, 1],
            [-70, 2, 1.6],
            [80, 0, 1],
          ],
          stop: 2,
          objectZ: 70,
        },
        { kind: 'stopDiameter', diameterMm: 8 },
        { kind: 'objectHeight', heightMm: 12 },
      ),
    1e-3,
  ],
  [
    'a stop in front of everything',
    () =>
      setupOfRows(
        {
          rows: [
            [0, 12, 1],
            [-30, 4, 1.7],
            [-18, 0, 1],
          ],
          stop: 0,
        },
        { kind: 'stopDiameter', diameterMm: 5 },
        { kind: 'angle', angleDeg: 35 },
      ),
    1e-9,
  ],
  [
    'a mirror with its stop at the centre of curvature',
    () =>
      setupOfRows(
        {
          rows: [
            [0, 100, 1],
            [-100, 0, -1],
          ],
          stop: 0,
        },
        { kind: 'stopDiameter', diameterMm: 30 },
        { kind: 'angle', angleDeg: 20 },
      ),
    1e-9,
  ],
];

describe('aiming at the real stop', () => {
  for (const [name, setupOf, mapped] of SYSTEMS) {
    it(`reaches every point of it: ${name}`, () => {
      const setup = setupOf();
      for (const fraction of [0, 0.3, 0.7, 1, -1]) {
        const map = pupilMapOf(setup, 0, fraction);
        expect([map.lost, map.shape?.ring]).toEqual([null, 1]);
        const aimed = offTarget(map, aimRays);
        expect(aimed.worst).toBeLessThanOrEqual(AIMED);
        expect(aimed.lost).toBe(0);
        const placed = offTarget(map, mapRays);
        expect(placed.worst).toBeLessThanOrEqual(mapped);
        expect(placed.lost).toBe(0);
      }
    });
  }

  it('finds the ray of the field: from the object point, or in its direction', () => {
    const far = aimedRay(pupilMapOf(photo(), 0, 0.7), 0.3, -0.8);
    const { object } = photo();
    if (!far.ok || object.kind !== 'infinite') throw new Error('no ray');
    expect(far.value.direction[1] / far.value.direction[2]).toBeCloseTo(0.7 * object.slope, 14);
    expect(Math.abs(object.slope)).toBeCloseTo(Math.tan((22 * Math.PI) / 180), 12);
    const near = setupOfRows(
      { ...PHOTO, objectZ: -60 },
      { kind: 'objectNA', na: 0.06 },
      { kind: 'objectHeight', heightMm: 9 },
    );
    const ray = aimedRay(pupilMapOf(near, 0, 1), 0.5, 0.5);
    if (!ray.ok) throw new Error('no ray');
    const { start, direction, pathMm } = ray.value;
    const along = (-60 - start[2]) / direction[2];
    expect(start[0] + along * direction[0]).toBeCloseTo(0, 11);
    expect(start[1] + along * direction[1]).toBeCloseTo(-9, 11);
    expect(pathMm).toBeCloseTo(-along, 11);
  });

  it('counts paths from infinity in the phase of one plane wave', () => {
    const map = pupilMapOf(photo(), 0, 1);
    const rays = new Float64Array(COUNT * STRIDE);
    aimRays(map, PUPIL, COUNT, rays);
    const direction = [rays[3]!, rays[4]!, rays[5]!] as const;
    for (let at = 0; at < rays.length; at += STRIDE) {
      const phase = direction[0] * rays[at]! + direction[1] * rays[at + 1]! + direction[2] * rays[at + 2]!;
      expect(Math.abs(rays[at + PATH]! - phase)).toBeLessThanOrEqual(1e-14);
    }
  });

  it('follows the pupil that wanders forward: the chief ray of 80° is far from where the paraxial one would go', () => {
    const setup = fisheye();
    const shift = [0.5, 1].map((fraction) => {
      const map = pupilMapOf(setup, 0, fraction);
      const slope = setup.object.kind === 'infinite' ? fraction * setup.object.slope : 1;
      // Where the chief ray in object space crosses the axis.
      return -map.bundle.chief.b / slope;
    });
    const paraxial = -setup.chief.y[0]! / (setup.chief.nu[0]! || 1);
    expect(paraxial - shift[1]!).toBeGreaterThan(3);
    expect(paraxial - shift[0]!).toBeGreaterThan(0.5);
    expect(shift[1]!).toBeLessThan(shift[0]!);
  });

  it('goes where the paraxial rays go as field and aperture shrink', () => {
    const setup = photo();
    const map = pupilMapOf(setup, 0, 1e-3);
    const chief = setup.chief.y[0]! * 1e-3;
    expect(Math.abs(map.bundle.chief.b / chief - 1)).toBeLessThan(1e-5);
    // From another line the same field is aimed through its own train.
    const coloured = {
      ...setup,
      lines: [
        ...setup.lines,
        {
          ...setup.lines[0],
          train: {
            ...setup.lines[0].train,
            index: setup.lines[0].train.index.map((n) => (n === 1 ? 1 : n + 0.01)),
          },
        },
      ],
    } as ExactSetup;
    const other = pupilMapOf(coloured, 1, 1);
    expect(offTarget(other, aimRays).worst).toBeLessThanOrEqual(AIMED);
    expect(other.bundle.chief.b).not.toBe(pupilMapOf(coloured, 0, 1).bundle.chief.b);
  });

  it('gives exact chief and marginal rays for the one-ray trace', () => {
    const setup = photo();
    const { train } = setup.lines[0];
    for (const [x, y] of [
      [0, 0],
      [0, 1],
      [0, -1],
      [1, 0],
    ] as const) {
      const ray = aimedRay(pupilMapOf(setup, 0, 1), x, y);
      if (!ray.ok) throw new Error('no ray');
      const [atX = 1, atY = 1]: readonly number[] =
        traceRay(train, ray.value.start, ray.value.direction).hits[setup.stopSurface]?.point ?? [];
      expect(Math.abs(atX / setup.stopRadiusMm - x)).toBeLessThanOrEqual(AIMED);
      expect(Math.abs(atY / setup.stopRadiusMm - y)).toBeLessThanOrEqual(AIMED);
    }
  });

  it('says which surface is in the way when no ray gets there', () => {
    // From within glass into air: at 41.2° the plane face reflects everything.
    const setup = setupOfRows(
      {
        objectIndex: 1.5168,
        rows: [
          [0, 10, 1],
          [0, 5, 1],
        ],
        stop: 1,
      },
      { kind: 'stopDiameter', diameterMm: 1 },
      { kind: 'angle', angleDeg: 60 },
    );
    expect(pupilMapOf(setup, 0, 0.45).lost).toBeNull();
    const edge = pupilMapOf(setup, 0, 1);
    expect(edge.lost).toEqual({ why: 'totally reflected', surface: 0 });
    expect(aimedRay(edge, 0, 0).ok).toBe(false);
    const rays = new Float64Array(COUNT * STRIDE);
    mapRays(edge, PUPIL, COUNT, rays);
    for (let i = 0; i < COUNT; i++) expect(lostOf(rays[i * STRIDE + CODE]!)).toEqual(edge.lost);
  });

  it('aims part of a bundle when the rest is reflected totally, and names the surface for the rest', () => {
    const hot = setupOfRows(
      {
        rows: [
          [0, 1, 1.5],
          [-3, 0.2, 1],
          [-20, 3, 1.6],
          [-7, 1, 1],
          [40, 3, 1.6],
          [-15, 5, 1],
          [0, 0, 1],
        ],
        stop: 6,
        objectZ: -1.2,
      },
      { kind: 'objectNA', na: 0.65 },
      { kind: 'objectHeight', heightMm: 0.15 },
    );
    const map = pupilMapOf(hot, 0, 1);
    expect(map.lost).toBeNull();
    expect(map.shape?.ring).toBeLessThan(1);
    const { worst, lost } = offTarget(map, aimRays);
    expect(worst).toBeLessThanOrEqual(AIMED);
    expect(lost).toBeGreaterThan(0);
    expect(lost).toBeLessThan(COUNT / 3);
    // Mapped rays are carried on beyond the ring, near enough to drag by.
    expect(offTarget(map, mapRays).worst).toBeLessThan(0.1);
    const rays = new Float64Array(STRIDE);
    aimRays(map, [0, 1], 1, rays);
    const told = lostOf(rays[CODE]!);
    expect(told).not.toBeNull();
    // The ray that was tried last does get lost there.
    const start: Vector = [rays[0]!, rays[1]!, rays[2]!];
    const path = traceRay(hot.lines[0].train, start, [rays[3]!, rays[4]!, rays[5]!]);
    expect(path.lost).toEqual(told);
  });
});
