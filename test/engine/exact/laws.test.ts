import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { traceRay } from '../../../engine/exact/ray.ts';
import type { RayPath, Vector } from '../../../engine/exact/types.ts';
import { heightInSpace, paraxialRay } from '../../../engine/paraxial/trace.ts';
import { buildTrain, type SurfaceSpec, type TrainSpec } from '../../../engine/train/build.ts';
import { anyTrain, scaledBy } from '../anyTrain.ts';
import { anyExactTrain, anyStart, between } from './anyRay.ts';

/** Of direction cosines: what a few refractions leave of a double. */
const COSINE = 1e-13;
/** Of the lengths involved; grazing rays multiply it by one over their cosine, so those are left out. */
const LENGTH = 1e-11;
const LEAST_COSINE = 0.1;

const cross = ([a, b, c]: Vector, [d, e, f]: Vector): Vector => [b * f - c * e, c * d - a * f, a * e - b * d];
const largest = (vector: readonly number[]): number => Math.max(...vector.map(Math.abs));

const steep = ({ hits }: RayPath): boolean =>
  hits.some(({ cosIncidence, cosRefraction }) => Math.min(cosIncidence, cosRefraction ?? 1) < LEAST_COSINE);

/** The train seen from its image side. */
function turned(spec: TrainSpec): TrainSpec {
  const { surfaces, objectIndex } = spec;
  const before = (k: number) => surfaces[k - 1]?.indexAfter ?? objectIndex;
  return {
    ...spec,
    objectIndex: surfaces.at(-1)?.indexAfter ?? objectIndex,
    surfaces: surfaces
      .map(
        (surface, k): SurfaceSpec => ({
          ...surface,
          curvaturePerMm: -(surface.curvaturePerMm ?? 0),
          asphere: (surface.asphere ?? []).map((a) => -a),
          indexAfter: before(k),
          gapMm: surfaces[k - 1]?.gapMm ?? 0,
        }),
      )
      .toReversed(),
  };
}

const refracting = (spec: TrainSpec): boolean => spec.surfaces.every(({ indexAfter }) => indexAfter > 0);

describe('exact rays', () => {
  it('keep Snell’s law and the plane of incidence at every surface', () => {
    let seen = 0;
    fc.assert(
      fc.property(anyExactTrain(), anyStart(), (spec, { start, direction }) => {
        const path = traceRay(buildTrain(spec), start, direction);
        let before = path.direction;
        let index = spec.objectIndex;
        for (const [k, { direction: after, normal, cosIncidence, cosRefraction }] of path.hits.entries()) {
          const behind = spec.surfaces[k]?.indexAfter ?? Number.NaN;
          if (!after) break;
          // n (N × r) = n′ (N × r′): both laws in one; behind a mirror the sides of the sketch change sign alike.
          const [inFront, backward] = [cross(normal, before), cross(normal, after)];
          const off = inFront.map((v, i) => Math.abs(index) * v - Math.abs(behind) * (backward[i] ?? 0));
          expect(largest(off)).toBeLessThanOrEqual(4 * COSINE);
          expect(Math.abs(Math.hypot(...after) - 1)).toBeLessThanOrEqual(COSINE);
          expect(cosIncidence >= 0 && (cosRefraction ?? -1) >= 0).toBe(true);
          [before, index] = [after, behind];
          seen++;
        }
      }),
      { numRuns: 300 },
    );
    expect(seen).toBeGreaterThan(300);
  });

  it('run back the way they came', () => {
    let seen = 0;
    fc.assert(
      fc.property(anyExactTrain().filter(refracting), anyStart(), (spec, { start, direction }) => {
        const there = traceRay(buildTrain(spec), start, direction);
        const last = there.hits.at(-1);
        if (there.lost || !last?.direction || steep(there)) return;
        const mirrored = ([x, y, z]: Vector): Vector => [x, y, -z];
        const along = ([x, y, z]: Vector, [l, m, n]: Vector, t: number): Vector => [
          x + t * l,
          y + t * m,
          z + t * n,
        ];
        const from = mirrored(along(last.point, last.direction, 5));
        const [l, m, n] = last.direction;
        const back = traceRay(buildTrain(turned(spec)), from, [-l, -m, n]);
        expect(back.lost).toBeNull();
        const scale = there.hits.reduce((size, { point }) => Math.max(size, largest(point)), 10);
        for (const [k, { point }] of there.hits.entries()) {
          const met = back.hits[there.hits.length - 1 - k]?.point ?? [0, 0, 0];
          expect(largest(mirrored(met).map((v, i) => v - (point[i] ?? 0)))).toBeLessThanOrEqual(
            LENGTH * scale,
          );
        }
        expect(
          largest(
            (back.hits.at(-1)?.direction ?? []).map((v, i) => (i < 2 ? -v : v) - (there.direction[i] ?? 0)),
          ),
        ).toBeLessThanOrEqual(LENGTH * scale);
        seen++;
      }),
      { numRuns: 300 },
    );
    expect(seen).toBeGreaterThan(100);
  });

  it('differ from the paraxial ones by the cube of aperture and field', () => {
    let seen = 0;
    fc.assert(
      fc.property(anyExactTrain(6).filter(refracting), between(-1, 1), between(-0.2, 0.2), (spec, y, u) => {
        const train = buildTrain(spec);
        const plane = train.z[train.count - 1]! + 10;
        const difference = (share: number): number => {
          const path = traceRay(train, [0, share * y, 0], [0, share * u, 1]);
          const last = path.hits.at(-1);
          if (path.lost || !last?.direction) return Number.NaN;
          const exact = last.point[1] + ((10 - last.point[2]) * last.direction[1]) / last.direction[2];
          const paraxial = paraxialRay(train, share * y, share * u * train.index[0]!);
          return exact - heightInSpace(train, paraxial, train.count, plane);
        };
        const [whole, half] = [difference(0.02), difference(0.01)];
        // Differences next to nothing are rounding, or cancel down to the fifth power.
        if (!(Math.abs(half) > 1e-11)) return;
        expect(whole / half).toBeGreaterThan(7.5);
        expect(whole / half).toBeLessThan(8.5);
        seen++;
      }),
      { numRuns: 400 },
    );
    expect(seen).toBeGreaterThan(100);
  });

  it('scale with the layout', () => {
    fc.assert(
      fc.property(
        anyExactTrain(),
        anyStart(),
        fc.constantFrom(1e-3, 0.37, 25.4, 1e4),
        (spec, ray, factor) => {
          const large = scaledBy(spec, factor);
          const grown: TrainSpec = {
            ...large,
            surfaces: large.surfaces.map((surface) => ({
              ...surface,
              asphere: (surface.asphere ?? []).map((a, j) => a / factor ** (3 + 2 * j)),
            })),
          };
          const [x, y, z] = ray.start;
          const one = traceRay(buildTrain(spec), ray.start, ray.direction);
          const other = traceRay(buildTrain(grown), [x * factor, y * factor, z * factor], ray.direction);
          if (steep(one)) return;
          expect(other.lost).toEqual(one.lost);
          const scale = one.hits.reduce((size, { point }) => Math.max(size, largest(point)), 30);
          for (const [k, hit] of one.hits.entries()) {
            const same = other.hits[k];
            expect(largest(hit.point.map((v, i) => v - (same?.point[i] ?? 0) / factor))).toBeLessThanOrEqual(
              LENGTH * scale,
            );
            expect(Math.abs(hit.opticalPathMm - (same?.opticalPathMm ?? 0) / factor)).toBeLessThanOrEqual(
              LENGTH * scale,
            );
          }
        },
      ),
      { numRuns: 200 },
    );
  });

  it('through thin parts in air stay on the paraxial ones, in both directions across the axis', () => {
    fc.assert(
      fc.property(
        anyTrain(8),
        between(-3, 3),
        between(-3, 3),
        between(-0.2, 0.2),
        between(-0.2, 0.2),
        (spec, x, y, p, q) => {
          const thin = {
            ...spec,
            objectIndex: 1,
            surfaces: spec.surfaces.map((s) => ({ ...s, curvaturePerMm: 0, indexAfter: 1 })),
          };
          const train = buildTrain(thin);
          const { hits } = traceRay(train, [x, y, 0], [p, q, 1]);
          const [acrossX, acrossY] = [paraxialRay(train, x, p), paraxialRay(train, y, q)];
          let scale = 1;
          for (const [k, { point, direction }] of hits.entries()) {
            scale = Math.max(scale, largest(point), ...(direction ? [Math.abs(1 / direction[2])] : []));
            expect(Math.abs(point[0] - acrossX.y[k]!)).toBeLessThanOrEqual(1e-9 * scale);
            expect(Math.abs(point[1] - acrossY.y[k]!)).toBeLessThanOrEqual(1e-9 * scale);
          }
          expect(hits).toHaveLength(train.count);
        },
      ),
      { numRuns: 200 },
    );
  });
});
