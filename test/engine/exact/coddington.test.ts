import { readFileSync } from 'node:fs';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { coddington, focusDepths } from '../../../engine/exact/coddington.ts';
import { traceRay } from '../../../engine/exact/ray.ts';
import type { RayPath, Vector } from '../../../engine/exact/types.ts';
import { buildTrain, type SurfaceSpec } from '../../../engine/train/build.ts';
import type { Train } from '../../../engine/train/types.ts';
import { layOut } from '../../reference/prescription.ts';
import { given } from '../quantity.ts';
import { between } from './anyRay.ts';

interface ListedRay {
  readonly id: string;
  readonly start: Vector;
  readonly direction: Vector;
  readonly parallelBundleFoci?: { readonly tangential: number | null; readonly sagittal: number | null };
}
interface Listed {
  readonly systems: readonly { readonly prescription: unknown; readonly rays: readonly ListedRay[] }[];
}
interface ListedCase {
  readonly id: string;
  readonly expected: Readonly<Record<string, { readonly value: number; readonly tolerance: number }>>;
}
const read = (name: string): unknown =>
  JSON.parse(readFileSync(new URL(`../../reference/${name}`, import.meta.url), 'utf8'));

/** Some thirty surfaces' rounding, relative; and in mm what a focus in the middle of a lens takes from the lengths around it. */
const RELATIVE = 1e-12;
const FLOOR_MM = 1e-12;
/** Rays that leave nearly at right angles to the axis or near the critical angle; see the test of the rays themselves. */
const WIDER: Readonly<Record<string, number>> = { 'ball-03': 1e-11 };

describe('the reference rays', () => {
  const { systems } = read('exact-rays.json') as Listed;
  const listed = systems.flatMap(({ prescription, rays }) =>
    rays.flatMap((ray) =>
      ray.parallelBundleFoci ? [{ prescription, ray, foci: ray.parallelBundleFoci }] : [],
    ),
  );

  it('are as many as the file has with foci', () => {
    expect(listed).toHaveLength(29);
  });

  it.each(listed)('give the foci of $ray.id', ({ prescription, ray, foci }) => {
    const laid = layOut(prescription);
    if (!laid) throw new Error('cannot be expressed');
    const got = coddington(laid.train, ray, null);
    for (const which of ['tangential', 'sagittal'] as const) {
      const wanted = foci[which];
      if (wanted === null) {
        expect(got[which]).toEqual({ ok: false, why: 'image at infinity' });
      } else {
        const tolerance = FLOOR_MM + (WIDER[ray.id] ?? RELATIVE) * Math.abs(wanted);
        expect(Math.abs(given(got[which]) - wanted)).toBeLessThanOrEqual(tolerance);
      }
    }
  });

  it('give the closed form of the spherical mirror, |R|cos I/2 and |R|/(2cos I)', () => {
    const entry = (read('cases.json') as ListedCase[]).find(({ id }) => id === 'coddington-mirror');
    const train = trainOf([{ curvaturePerMm: -1 / 200, indexAfter: -1, gapMm: 0 }], null);
    for (const degrees of [10, 30, 60]) {
      const height = 200 * Math.sin((degrees * Math.PI) / 180);
      const foci = coddington(train, { start: [0, height, -300], direction: [0, 0, 1] }, null);
      for (const which of ['tangential', 'sagittal'] as const) {
        const wanted = entry?.expected[`${which}[${degrees}]`];
        if (!wanted) throw new Error('not in the case');
        expect(Math.abs(given(foci[which]) - wanted.value)).toBeLessThanOrEqual(wanted.tolerance);
      }
    }
  });
});

const trainOf = (surfaces: readonly Omit<SurfaceSpec, 'part'>[], objectZ: number | null): Train =>
  buildTrain({
    objectIndex: 1,
    surfaces: surfaces.map((surface, part) => ({ ...surface, part })),
    objectZ,
    imageDistanceMm: null,
  });

/** Lenses, aspheric ones among them, thin parts and plates, no steeper than a ray within 20° gets through. */
const anyGlass = fc
  .array(
    fc.oneof(
      { weight: 4, arbitrary: fc.constant('surface' as const) },
      { weight: 1, arbitrary: fc.constant('thin' as const) },
    ),
    { minLength: 1, maxLength: 8 },
  )
  .chain((kinds) =>
    fc.tuple(
      ...kinds.map((kind) =>
        fc
          .record({
            curvature: between(-0.02, 0.02),
            conic: between(-2, 1),
            fourth: between(-1e-6, 1e-6),
            sixth: between(-1e-9, 1e-9),
            index: between(1, 2),
            gap: between(0.5, 12),
          })
          .map(
            ({ curvature, conic, fourth, sixth, index, gap }): Omit<SurfaceSpec, 'part'> =>
              kind === 'thin'
                ? { thinPowerPerMm: curvature, indexAfter: index, gapMm: gap }
                : {
                    curvaturePerMm: curvature,
                    conic,
                    asphere: [fourth, sixth],
                    indexAfter: index,
                    gapMm: gap,
                  },
          ),
      ),
    ),
  );

describe('the foci of a narrow pencil', () => {
  it('are those of the thin lens law, n′/z′ = n/z + φ in depths along the axis, on an ideal thin part', () => {
    const train = trainOf([{ thinPowerPerMm: 1 / 50, indexAfter: 1, gapMm: 0 }], -100);
    const [start, direction] = [
      [0, -20, -100],
      [0, 25, 100],
    ] as const;
    const foci = coddington(train, { start, direction }, -100);
    const [, slope, cosZ] = traceRay(train, start, direction).hits[0]!.direction!;
    expect(slope).not.toBe(0);
    // The image of a plane 2f in front of the lens stands 2f behind it, for every ray.
    expect(given(foci.tangential) * cosZ).toBeCloseTo(100, 11);
    expect(given(foci.sagittal) * cosZ).toBeCloseTo(100, 11);
    const length = Math.hypot(25, 100);
    const starts = Float64Array.of(0, 5, 0, 0, 25 / length, 100 / length, 0, 0);
    const depths = focusDepths(train, starts, 1, -100);
    expect(depths.tangential[0]).toBeCloseTo(100, 11);
    expect(depths.sagittal[0]).toBeCloseTo(100, 11);
  });

  it('stay where the object is at a bare diaphragm', () => {
    const none = trainOf([{ indexAfter: 1, gapMm: 0 }], -100);
    const foci = coddington(none, { start: [0, -10, -100], direction: [0, 30, 100] }, -100);
    expect(given(foci.tangential)).toBeCloseTo(-Math.hypot(30, 100), 11);
    expect(given(foci.sagittal)).toBeCloseTo(-Math.hypot(30, 100), 11);
  });

  it('do not exist for a ray that is lost, and lie at infinity when the pencil leaves parallel', () => {
    const train = trainOf([{ curvaturePerMm: 0.1, indexAfter: 1.5, gapMm: 0 }], null);
    const lost = coddington(train, { start: [0, 11, -1], direction: [0, 0, 1] }, null);
    expect(lost).toEqual({
      tangential: { ok: false, why: 'ray lost' },
      sagittal: { ok: false, why: 'ray lost' },
    });
    const pane = trainOf(
      [
        { indexAfter: 1.5, gapMm: 5 },
        { indexAfter: 1, gapMm: 0 },
      ],
      null,
    );
    const parallel = coddington(pane, { start: [0, 1, -1], direction: [0, 0.3, 1] }, null);
    expect(parallel.tangential).toEqual({ ok: false, why: 'image at infinity' });
    expect(parallel.sagittal).toEqual({ ok: false, why: 'image at infinity' });
    // One ray through, one that passes the ball by.
    const starts = Float64Array.of(0, 1, 0, 0, 0, 1, 0, 0, 0, 11, 0, 0, 0, 1, 0, 0);
    expect([...focusDepths(pane, starts, 2, null).tangential]).toEqual([Number.NaN, Number.NaN]);
    const depths = focusDepths(train, starts, 2, null);
    expect(depths.sagittal[0]).toBeCloseTo(30, 0);
    expect(depths.sagittal[1]).toBeNaN();
  });

  it('scale with the layout', () => {
    fc.assert(
      fc.property(anyGlass, between(-8, 8), between(0.1, 10), (surfaces, height, factor) => {
        const scaled = surfaces.map((surface) => ({
          ...surface,
          curvaturePerMm: (surface.curvaturePerMm ?? 0) / factor,
          thinPowerPerMm: (surface.thinPowerPerMm ?? 0) / factor,
          asphere: (surface.asphere ?? []).map((a, i) => a / factor ** (3 + 2 * i)),
          gapMm: surface.gapMm * factor,
        }));
        const [train, large] = [trainOf(surfaces, null), trainOf(scaled, null)];
        const one = coddington(train, { start: [0, height, 0], direction: [0, 0.1, 1] }, null);
        const other = coddington(large, { start: [0, height * factor, 0], direction: [0, 0.1, 1] }, null);
        for (const which of ['tangential', 'sagittal'] as const) {
          expect(other[which].ok).toBe(one[which].ok);
          if (!one[which].ok || Math.abs(one[which].value) > FAR_MM) continue;
          const value = one[which].value * factor;
          expect(Math.abs(given(other[which]) - value)).toBeLessThanOrEqual(1e-9 * (1 + Math.abs(value)));
        }
      }),
    );
  });

  it('are the limit of where close exact rays meet the ray', () => {
    fc.assert(
      fc.property(
        anyGlass,
        between(-8, 8),
        between(-0.25, 0.25),
        between(20, 500),
        (surfaces, y, u, distance) => {
          const finite = distance < 300;
          const train = trainOf(surfaces, finite ? -distance : null);
          const start: Vector = finite ? [0, y - u * distance, -distance] : [0, y, 0];
          const path = traceRay(train, start, [0, u, 1]);
          fc.pre(path.lost === null);
          const foci = coddington(train, path, finite ? -distance : null);
          for (const which of ['tangential', 'sagittal'] as const) {
            const close = meetingPlace(train, path, start, u, finite, which);
            const focus = foci[which];
            // What lies far away turns on small differences of slope and is judged by them.
            if (close === null || !focus.ok || Math.abs(focus.value) > FAR_MM) continue;
            expect(Math.abs(focus.value - close)).toBeLessThanOrEqual(LIMIT * (1 + Math.abs(focus.value)));
          }
        },
      ),
    );
  });
});

/** Foci farther away are left to the slopes. */
const FAR_MM = 2000;
/** Of rays 1e-4 to either side: the cubic term of the aberration is some 1e-8 of the linear one, the rounding 1e-12/1e-4. */
const LIMIT = 2e-5;
const STEP = 1e-4;

/**
 * Where rays a little to either side meet the ray: in the meridian from their heights and slopes across it, sagittally where they come back
 * to the plane of the ray. Null when one of them is lost.
 */
function meetingPlace(
  train: Train,
  path: RayPath,
  start: Vector,
  u: number,
  finite: boolean,
  which: 'tangential' | 'sagittal',
): number | null {
  const neighbour = (step: number): RayPath => {
    const [dx, dy] = which === 'tangential' ? [0, step] : [step, 0];
    return finite
      ? traceRay(train, start, [dx / 10, u + dy / 10, 1])
      : traceRay(train, [dx, start[1] + dy, 0], [0, u, 1]);
  };
  const [up, down] = [neighbour(STEP), neighbour(-STEP)];
  const last = path.hits.at(-1);
  if (up.lost || down.lost || !last?.direction) return null;
  const [, m, n] = last.direction;
  // Places in the plane at right angles to the ray through its last point: across in the meridian, and x.
  const across = (other: RayPath): readonly [number, number] | null => {
    const hit = other.hits.at(-1);
    if (!hit?.direction) return null;
    const [x, y, z] = [hit.point[0], hit.point[1] - last.point[1], hit.point[2] - last.point[2]];
    const [l2, m2, n2] = hit.direction;
    const along = -(y * m + z * n) / (m2 * m + n2 * n);
    const forward = m2 * m + n2 * n;
    return which === 'tangential'
      ? [(y + along * m2) * n - (z + along * n2) * m, (m2 * n - n2 * m) / forward]
      : [x + along * l2, l2 / forward];
  };
  const [above, below] = [across(up), across(down)];
  return above && below ? -(above[0] - below[0]) / (above[1] - below[1]) : null;
}
