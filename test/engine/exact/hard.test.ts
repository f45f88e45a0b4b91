import { describe, expect, it } from 'vitest';
import { traceBatch } from '../../../engine/exact/kernel.ts';
import { traceRay } from '../../../engine/exact/ray.ts';
import { CODE, lostOf, M, N, STRIDE, Y } from '../../../engine/exact/rayBuffer.ts';
import type { RayPath } from '../../../engine/exact/types.ts';
import type { Train } from '../../../engine/train/types.ts';
import { type Row, trainOfRows } from './systems.ts';

/** mm, or of a cosine: rounding of a few operations. */
const ROUNDING = 1e-12;

const parallel = (rows: readonly Row[], height: number): RayPath =>
  traceRay(trainOfRows({ rows }), [0, height, -10], [0, 0, 1]);

/** Where the axis is crossed behind the last vertex. */
function crossing({ hits }: RayPath): number {
  const last = hits.at(-1);
  if (!last?.direction) throw new Error('the ray is lost');
  return last.point[2] - (last.point[1] * last.direction[2]) / last.direction[1];
}

const finiteIn = (rays: Float64Array): boolean => rays.every(Number.isFinite);

/** Rays over the whole pupil and from all sides, some of them hopeless. */
function rakedRays(count: number): Float64Array {
  const rays = new Float64Array(count * STRIDE);
  for (let i = 0; i < count; i++) {
    const [height, angle] = [(30 * ((i * 7) % count)) / count, ((i * 29) % count) / count - 0.5];
    rays.set(
      [height * Math.sin(i), height * Math.cos(i), -3, 0, Math.sin(3 * angle), Math.cos(3 * angle), 0, 0],
      i * STRIDE,
    );
  }
  return rays;
}

describe('hard prescriptions', () => {
  it('a ball lens: its second face is met on the far side of its own sphere', () => {
    const n = 1.5;
    const path = parallel(
      [
        [5, 10, n],
        [-5, 0, 1],
      ],
      1e-4,
    );
    // f = n r / (2(n − 1)) from the centre (Hecht, Optics, problem on the ball lens): 2.5 behind the vertex.
    expect(crossing(path)).toBeCloseTo(2.5, 7);
    expect(path.hits[1]?.point[2]).toBeCloseTo(0, 7);
  });

  it('plane-parallel glass: the direction comes back, displaced by t sin(I − I′)/cos I′', () => {
    const [t, n, angle] = [8, 1.7, 0.9];
    const path = traceRay(
      trainOfRows({
        rows: [
          [0, t, n],
          [0, 0, 1],
        ],
      }),
      [0, 0, 0],
      [0, Math.sin(angle), Math.cos(angle)],
    );
    const behind = Math.asin(Math.sin(angle) / n);
    const last = path.hits[1];
    expect(Math.abs((last?.direction?.[1] ?? 0) - Math.sin(angle))).toBeLessThanOrEqual(ROUNDING);
    const shift = (t * Math.tan(angle) - (last?.point[1] ?? 0)) * Math.cos(angle);
    expect(Math.abs(shift - (t * Math.sin(angle - behind)) / Math.cos(behind))).toBeLessThanOrEqual(ROUNDING);
  });

  it('an afocal pair of confocal paraboloid mirrors: parallel light leaves parallel', () => {
    const rows: Row[] = [
      [-200, -70, -1, { conic: -1 }],
      [-60, 0, 1, { conic: -1 }],
    ];
    for (const height of [1, 20, 45]) {
      const direction = traceRay(trainOfRows({ rows }), [0, height, -150], [0, 0, 1]).hits[1]?.direction;
      expect(Math.abs(direction?.[1] ?? 1)).toBeLessThanOrEqual(ROUNDING);
      expect(direction?.[2]).toBeCloseTo(1, 12);
    }
  });

  it('total reflection sets in at the critical angle over a sweep of angles', () => {
    const n = 1.5168;
    const train = trainOfRows({ objectIndex: n, rows: [[0, 0, 1]] });
    const critical = Math.asin(1 / n);
    for (let i = -900; i <= 900; i++) {
      const angle = (i / 900) * 1.55;
      const { hits, lost } = traceRay(train, [0, 0, -1], [0, Math.sin(angle), Math.cos(angle)]);
      if (Math.abs(angle) < critical) {
        expect(lost).toBeNull();
        expect(Math.abs((hits[0]?.direction?.[1] ?? 2) - n * Math.sin(angle))).toBeLessThanOrEqual(ROUNDING);
      } else {
        expect(lost).toEqual({ why: 'totally reflected', surface: 0 });
        expect(hits[0]?.direction).toBeNull();
      }
    }
  });

  it('an asphere whose sag turns: rays meet it on either side of the turn, or it is missed, but never forever', () => {
    // z = r²/40 − 5e-5 r⁴ turns at r = √(1/(40 · 2 · 5e-5)) = 15.8.
    const train = trainOfRows({ rows: [[20, 0, 1.5, { conic: -1, asphere: [-5e-5] }]] });
    const sag = (r: number) => (r * r) / 40 - 5e-5 * r ** 4;
    for (const height of [0.1, 10, 15.8, 17, 25, 40]) {
      const { hits } = traceRay(train, [0, height, -10], [0, 0, 1]);
      expect(Math.abs((hits[0]?.point[2] ?? Number.NaN) - sag(height))).toBeLessThanOrEqual(
        ROUNDING * (1 + Math.abs(sag(height))),
      );
    }
    for (let i = -60; i <= 60; i++) {
      const slope = i / 8;
      const path = traceRay(train, [0, 14, -4], [0.3, slope, 1]);
      const [x = 0, y = 0, z = 0] = path.hits[0]?.point ?? [];
      if (path.hits.length > 0) {
        expect(Math.abs(z - sag(Math.hypot(x, y)))).toBeLessThanOrEqual(1e-11 * (1 + Math.abs(z)));
        expect(path.hits[0]?.cosIncidence).toBeGreaterThan(0);
      } else {
        expect(path.lost).toEqual({ why: 'missed', surface: 0 });
      }
    }
  });

  it('an asphere whose sag turns is met wherever a close look sees it', () => {
    const sag = (r: number) => (r * r) / 40 - 5e-5 * r ** 4;
    const train = trainOfRows({ rows: [[20, 0, 1.5, { conic: -1, asphere: [-5e-5] }]] });
    let seen = 0;
    for (let i = -40; i <= 40; i++) {
      for (const height of [4, 12, 18]) {
        const slope = i / 10;
        const inFront = (z: number) => z - sag(Math.abs(height + slope * z)) < 0;
        // Only rays that pass from one side to the other once: others have several answers.
        const changes = Array.from({ length: 4000 }, (_, j) => (j - 2000) / 100).filter(
          (z) => inFront(z) !== inFront(z + 0.01),
        );
        const [only = 0] = changes;
        if (changes.length !== 1 || !inFront(only)) continue;
        seen++;
        const { hits } = traceRay(train, [0, height, 0], [0, slope, 1]);
        expect(Math.abs((hits[0]?.point[2] ?? Number.NaN) - only), `${height} ${slope}`).toBeLessThan(0.011);
      }
    }
    expect(seen).toBeGreaterThan(20);
  });

  it('beyond the equator of sphere, ellipsoid or asphere is a miss', () => {
    const shapes: Row[] = [
      [10, 0, 1.5],
      [10, 0, 1.5, { conic: 0.05 }],
      [10, 0, 1.5, { asphere: [0] }],
    ];
    for (const row of shapes) {
      const train = trainOfRows({ rows: [row] });
      // Past the edge and into the far half from the side; the second one meets the near half.
      expect(traceRay(train, [0, -30, 0], [0, 1, 0.55]).lost).toEqual({ why: 'missed', surface: 0 });
      expect(traceRay(train, [0, -30, 0], [0, 1, 0.35]).lost).toBeNull();
    }
  });

  it('a surface of wild coefficients gives points or misses, and no numbers that are none', () => {
    for (const powers of [[1e300], [-1e300], [1, -1, 1, -1], [1e5, 1e10], [0, 0, 1e-300]]) {
      const rays = rakedRays(200);
      traceBatch(
        trainOfRows({
          rows: [
            [15, 3, 1.6, { conic: 2, asphere: powers }],
            [-40, 0, 1],
          ],
        }),
        rays,
        200,
        true,
      );
      expect(finiteIn(rays)).toBe(true);
    }
  });

  it('n = 4 in the infrared: a thin germanium lens at full angle obeys Snell’s law', () => {
    const path = parallel(
      [
        [40, 4, 4],
        [60, 0, 1],
      ],
      12,
    );
    for (const [k, { cosIncidence, cosRefraction }] of path.hits.entries()) {
      const [front, behind] = k === 0 ? [1, 4] : [4, 1];
      const [i, j] = [Math.acos(cosIncidence), Math.acos(cosRefraction ?? 0)];
      expect(Math.abs(front * Math.sin(i) - behind * Math.sin(j))).toBeLessThanOrEqual(ROUNDING);
    }
    expect(path.lost).toBeNull();
  });

  it('air gaps of no thickness change nothing but what total reflection in them takes away', () => {
    const cemented: Row[] = [
      [30, 6, 1.5],
      [-20, 2, 1.7],
      [-60, 0, 1],
    ];
    const spaced: Row[] = [
      [30, 6, 1.5],
      [-20, 0, 1],
      [-20, 2, 1.7],
      [-60, 0, 1],
    ];
    for (const height of [0, 2, 5, 8]) {
      const [one, other] = [parallel(cemented, height).hits.at(-1), parallel(spaced, height).hits.at(-1)];
      for (let i = 0; i < 3; i++) {
        expect(Math.abs((one?.point[i] ?? 0) - (other?.point[i] ?? 1))).toBeLessThanOrEqual(ROUNDING);
        expect(Math.abs((one?.direction?.[i] ?? 0) - (other?.direction?.[i] ?? 1))).toBeLessThanOrEqual(
          ROUNDING,
        );
      }
    }
    expect(parallel(cemented, 13).lost).toBeNull();
    expect(parallel(spaced, 13).lost).toEqual({ why: 'totally reflected', surface: 1 });
  });

  it('a radius of 1e12 mm is as good as a plane', () => {
    const [flat, round] = [
      parallel(
        [
          [50, 5, 1.5],
          [0, 0, 1],
        ],
        9,
      ),
      parallel(
        [
          [50, 5, 1.5],
          [1e12, 0, 1],
        ],
        9,
      ),
    ];
    for (let i = 0; i < 3; i++) {
      expect(Math.abs((flat.hits[1]?.point[i] ?? 0) - (round.hits[1]?.point[i] ?? 1))).toBeLessThanOrEqual(
        1e-10,
      );
    }
  });

  it('64 surfaces: a row of cemented meniscus shells about one centre lets the ray through that centre straight on', () => {
    // Shell k has radius 200 − k about z = 200; all normals through the centre meet it, so such a ray is not bent.
    const rows = Array.from({ length: 64 }, (_, k): Row => [200 - k, 1, 1 + 0.5 * ((k % 5) / 5)]);
    const direction = Math.hypot(0.1, 0.2, 1);
    const start = [-0.1 * 220, -0.2 * 220, 200 - 220] as const;
    const { hits, lost } = traceRay(trainOfRows({ rows }), start, [0.1, 0.2, 1]);
    expect(lost).toBeNull();
    expect(hits).toHaveLength(64);
    expect(Math.abs((hits[63]?.direction?.[1] ?? 0) - 0.2 / direction)).toBeLessThanOrEqual(ROUNDING);
    expect(Math.hypot(...(hits[63]?.direction ?? []))).toBeCloseTo(1, 13);
  });

  it('every ray lost is told surface by surface, with the rays left where they ended', () => {
    const train = trainOfRows({
      rows: [
        [10, 2, 1.5, { semiDiameterMm: 4 }],
        [-10, 3, 1],
        [1, 0, 1.5],
      ],
    });
    const rays = new Float64Array(3 * STRIDE);
    for (const [i, y] of [5, 3.9, 60].entries()) rays.set([0, y, -20, 0, 0, 1, 0, 0], i * STRIDE);
    traceBatch(train, rays, 3, true);
    expect([0, 1, 2].map((i) => lostOf(rays[i * STRIDE + CODE]!))).toEqual([
      { why: 'clipped', surface: 0 },
      { why: 'missed', surface: 2 },
      { why: 'missed', surface: 0 },
    ]);
    expect(rays[Y]).toBe(5);
    expect(finiteIn(rays)).toBe(true);
    const before = Float64Array.from(rays);
    traceBatch(train, rays, 3, true);
    expect(rays).toEqual(before);
  });

  it('a rim cuts only rays outside of it, and only when asked to', () => {
    const train = trainOfRows({ rows: [[0, 0, 1, { semiDiameterMm: 4 }]] });
    const lost = (height: number, clip: boolean) => traceRay(train, [0, height, -1], [0, 0, 1], clip).lost;
    expect(lost(4, true)).toBeNull();
    expect(lost(4.0001, true)).toEqual({ why: 'clipped', surface: 0 });
    expect(lost(4.0001, false)).toBeNull();
  });

  it('a ray that refraction turns back cannot meet the next surface', () => {
    const train: Train = trainOfRows({
      rows: [
        [5, 10, 1.9],
        [-5, 3, 1],
        [0, 0, 1],
      ],
    });
    const { hits, lost } = traceRay(train, [0, 4.99, -4], [0, 0, 1]);
    expect(hits[1]?.direction?.[2]).toBeLessThan(0);
    expect(lost).toEqual({ why: 'missed', surface: 2 });
  });

  it('blocks of rays come out as single rays do, however many there are', () => {
    const train = trainOfRows({
      rows: [
        [20, 4, 1.6],
        [-30, 3, 1, { conic: -2 }],
        [15, 2, 1.5, { asphere: [1e-5] }],
        [0, 0, 1],
      ],
    });
    for (const count of [1, 127, 128, 129, 300]) {
      const [all, alone] = [rakedRays(count), rakedRays(count)];
      traceBatch(train, all, count);
      for (let i = 0; i < count; i++) traceBatch(train, alone.subarray(i * STRIDE), 1);
      expect(all).toEqual(alone);
    }
    const some = rakedRays(10);
    traceBatch(train, some, 4);
    expect(some.subarray(4 * STRIDE)).toEqual(rakedRays(10).subarray(4 * STRIDE));
    expect(Math.hypot(some[M]!, some[N]!)).toBeLessThanOrEqual(1 + ROUNDING);
  });
});
