import { describe, expect, it } from 'vitest';
import { traceRay } from '../../../engine/exact/ray.ts';
import type { Hit, Vector } from '../../../engine/exact/types.ts';
import { type Row, trainOfRows } from './systems.ts';

/** mm, on paths of some tens of mm: a few roundings. */
const EQUAL_MM = 1e-12;

/** Where a ray ends that has not been lost. */
function lastHit(
  rows: readonly Row[],
  objectIndex: number,
  start: Vector,
  direction: Vector,
): Hit & { direction: Vector } {
  const path = traceRay(trainOfRows({ rows, objectIndex }), start, direction);
  const last = path.hits.at(-1);
  if (path.lost || !last?.direction) throw new Error(`a ray is lost: ${path.lost?.why}`);
  return { ...last, direction: last.direction };
}

/** From the hit to an axial point at z, along the ray: negative for a virtual one. */
const lengthTo = ({ point: [x, y, z], direction }: Hit & { direction: Vector }, atZ: number): number =>
  Math.sign((atZ - z) * direction[2]) * Math.hypot(x, y, atZ - z);

/** How far the ray, or its extension, passes by the axial point at z. */
const missOf = (
  { point: [x, y, z], direction: [l, m, n] }: Hit & { direction: Vector },
  atZ: number,
): number => Math.hypot(x + ((atZ - z) * l) / n, y + ((atZ - z) * m) / n);

/** Largest minus smallest. */
const spread = (values: readonly number[]): number => Math.max(...values) - Math.min(...values);

const HEIGHTS = [0, 1, 3, 5.5, 8, 9.5];
const STARTS = HEIGHTS.map((h, i): Vector => [h * Math.sin(i), h * Math.cos(i), -5]);

/** Descartes, La géométrie (1637): the surfaces that take a point to a point by one refraction or reflection. */
describe('paths between the conjugates of a stigmatic surface are equal', () => {
  it('for an ellipsoid with K = −1/n² that takes parallel light into glass', () => {
    const n = 1.6;
    const [radius, focus] = [12, (12 * n) / (n - 1)];
    const ends = STARTS.map((start) =>
      lastHit([[radius, 0, n, { conic: -1 / n ** 2 }]], 1, start, [0, 0, 1]),
    );
    expect(spread(ends.map((end) => end.opticalPathMm + n * lengthTo(end, focus)))).toBeLessThanOrEqual(
      EQUAL_MM,
    );
    expect(Math.max(...ends.map((end) => missOf(end, focus)))).toBeLessThanOrEqual(EQUAL_MM * 10);
  });

  it('for a hyperboloid with K = −n² that takes parallel light out of glass', () => {
    const n = 1.6;
    const rows: Row[] = [
      [0, 6, n],
      [-12, 0, 1, { conic: -(n ** 2) }],
    ];
    const ends = STARTS.map((start) => lastHit(rows, 1, start, [0, 0, 1]));
    expect(spread(ends.map((end) => end.opticalPathMm + lengthTo(end, 20)))).toBeLessThanOrEqual(EQUAL_MM);
  });

  it('for the aplanatic points of a sphere, one of them virtual', () => {
    const [n, radius] = [1.7, -10];
    // From a point at R(1 + 1/n) in glass to its image at R(1 + n) in air, both measured from the vertex.
    const [object, image] = [radius * (1 + 1 / n), radius * (1 + n)];
    const slopes = [0, 0.1, 0.3, 0.6, 1];
    const ends = slopes.map((slope, i) =>
      lastHit([[radius, 0, 1]], n, [0, 0, object], [slope * Math.sin(i), slope * Math.cos(i), 1]),
    );
    expect(spread(ends.map((end) => end.opticalPathMm + lengthTo(end, image)))).toBeLessThanOrEqual(
      2 * EQUAL_MM,
    );
    expect(Math.max(...ends.map((end) => missOf(end, image)))).toBeLessThanOrEqual(EQUAL_MM * 30);
  });

  it('for a paraboloid mirror, and an ellipsoid mirror from focus to focus; paths stay positive', () => {
    const starts = STARTS.map(([x, y]): Vector => [x, y, -40]);
    const dish = starts.map((start) => lastHit([[-60, 0, -1, { conic: -1 }]], 1, start, [0, 0, 1]));
    expect(dish.every(({ direction, opticalPathMm }) => direction[2] < 0 && opticalPathMm > 0)).toBe(true);
    expect(spread(dish.map((end) => end.opticalPathMm + lengthTo(end, -30)))).toBeLessThanOrEqual(EQUAL_MM);
    // Half axes a and b: R = −b²/a, K = −(1 − b²/a²); foci at distances a ± e from the vertex.
    const [a, e] = [50, 30];
    const row: Row = [-(a * a - e * e) / a, 0, -1, { conic: -((e / a) ** 2) }];
    const mirror = [0, 0.1, 0.3, 0.5].map((slope) =>
      lastHit([row], 1, [0, 0, -(a + e)], [0.6 * slope, 0.8 * slope, 1]),
    );
    const paths = mirror.map((end) => end.opticalPathMm + lengthTo(end, -(a - e)));
    for (const path of paths) expect(Math.abs(path - 2 * a)).toBeLessThanOrEqual(2 * a * EQUAL_MM);
  });
});
