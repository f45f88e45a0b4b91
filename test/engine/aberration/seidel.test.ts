import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { seidel, type ThinGlass } from '../../../engine/aberration/seidel.ts';
import { eachSum, SUM_NAMES, SUM_WORDS, type Sums, shiftStop } from '../../../engine/aberration/sums.ts';
import { some } from '../../../engine/outcome.ts';
import { stopOf } from '../../../engine/paraxial/stop.ts';
import { paraxialRay } from '../../../engine/paraxial/trace.ts';
import type { TrainSpec } from '../../../engine/train/build.ts';
import { buildTrain } from '../../../engine/train/build.ts';
import { runSeidel } from '../../reference/seidelSums.ts';
import { scaledBy } from '../anyTrain.ts';
import { given } from '../quantity.ts';
import { uniform } from '../uniform.ts';

/** A few hundred roundings of the size of what was added. */
const ROUNDING = 1e-13;

const REFERENCE = fileURLToPath(new URL('../../reference/seidel.json', import.meta.url));

/** The sums of a marginal and a chief ray given at the first surface. */
function sumsOf(spec: TrainSpec, light: Light, glass?: ThinGlass) {
  const train = buildTrain(spec);
  const marginal = some(paraxialRay(train, light.y, light.nu));
  const chief = some(paraxialRay(train, light.yChief, light.nuChief));
  return given(seidel(train, { stop: stopOf(train), marginal, chief }, glass));
}

interface Light {
  readonly y: number;
  readonly nu: number;
  readonly yChief: number;
  readonly nuChief: number;
}

const anyLight = (): fc.Arbitrary<Light> =>
  fc.record({
    y: fc.oneof({ weight: 4, arbitrary: uniform(-8, 8) }, { weight: 1, arbitrary: fc.constant(0) }),
    nu: uniform(-0.2, 0.2),
    yChief: uniform(-8, 8),
    nuChief: uniform(-0.3, 0.3),
  });

/** Glass of a few conic and aspheric surfaces. */
const anyGlass = (): fc.Arbitrary<TrainSpec> =>
  fc
    .array(
      fc.record({
        curvaturePerMm: uniform(-0.05, 0.05),
        conic: uniform(-3, 2),
        asphere: fc.array(
          uniform(-1e-6, 1e-6).map((value) => value / 10),
          { maxLength: 2 },
        ),
        indexAfter: uniform(1, 2),
        spreadAfter: uniform(0, 0.03),
        gapMm: uniform(0, 20),
      }),
      { minLength: 1, maxLength: 8 },
    )
    .map((surfaces) => ({
      objectIndex: 1,
      surfaces: surfaces.map((surface, part) => ({ ...surface, part })),
      stopSurface: 0,
      objectZ: null,
      imageDistanceMm: null,
    }));

const near = (got: number, wanted: number, scale: number) =>
  expect(Math.abs(got - wanted)).toBeLessThanOrEqual(ROUNDING * scale);

describe('the Seidel sums', () => {
  it('agree with the reference sums, surface by surface, to 1e-14 of the sum of absolute terms', () => {
    const reports = runSeidel(JSON.parse(readFileSync(REFERENCE, 'utf8')));
    expect(reports.flatMap(({ id, misses }) => misses.map((miss) => ({ id, ...miss })))).toEqual([]);
    expect(reports.flatMap(({ left }) => left)).toEqual([]);
    expect(reports.map(({ id }) => id)).toEqual(['doublet', 'triplet', 'aspheric-singlet', 'two-mirror']);
    expect(reports.flatMap(({ covered }) => covered)).toHaveLength(258);
  });

  it('obey the stop-shift equations', () => {
    fc.assert(
      fc.property(anyGlass(), anyLight(), uniform(-3, 3), (spec, light, shift) => {
        const before = sumsOf(spec, light);
        const moved = {
          ...light,
          yChief: light.yChief + shift * light.y,
          nuChief: light.nuChief + shift * light.nu,
        };
        const after = sumsOf(spec, moved);
        const claimed = shiftStop(before.totals, shift);
        const reach = shiftStop(widest(before.absolute), Math.abs(shift));
        for (const name of SUM_NAMES)
          near(after.totals[name], claimed[name], reach[name] + widest(after.absolute)[name]);
      }),
    );
  });

  it('of a layout scaled in length are scaled by the same factor when angles stay', () => {
    fc.assert(
      fc.property(anyGlass(), anyLight(), uniform(0.1, 10), (spec, light, factor) => {
        const before = sumsOf(spec, light);
        const grown = scaledBy(spec, factor);
        const scaled = {
          ...grown,
          surfaces: grown.surfaces.map((surface) => ({
            ...surface,
            asphere: (surface.asphere ?? []).map((value, i) => value * factor ** -(3 + 2 * i)),
          })),
        };
        const after = sumsOf(scaled, { ...light, y: light.y * factor, yChief: light.yChief * factor });
        for (const name of SUM_NAMES)
          near(after.totals[name], factor * before.totals[name], factor * widest(before.absolute)[name]);
      }),
    );
  });

  it('grow with aperture and field as their powers say', () => {
    const spec: TrainSpec = {
      objectIndex: 1,
      surfaces: [
        { part: 0, curvaturePerMm: 0.02, conic: -0.4, indexAfter: 1.6, spreadAfter: 0.01, gapMm: 6 },
        { part: 0, curvaturePerMm: -0.01, indexAfter: 1, gapMm: 0 },
      ],
      objectZ: null,
      imageDistanceMm: null,
    };
    const one = sumsOf(spec, { y: 5, nu: 0, yChief: -1, nuChief: 0.1 }).totals;
    const two = sumsOf(spec, { y: 10, nu: 0, yChief: -3, nuChief: 0.3 }).totals;
    const growth: Record<string, number> = {
      spherical: 2 ** 4,
      coma: 2 ** 3 * 3,
      astigmatism: 2 ** 2 * 3 ** 2,
      petzval: 2 ** 2 * 3 ** 2,
      distortion: 2 * 3 ** 3,
      axialColour: 2 ** 2,
      lateralColour: 2 * 3,
    };
    for (const name of SUM_NAMES) expect(two[name] / one[name]).toBeCloseTo(growth[name] ?? 0, 9);
  });

  it('are absent with a reason where a reference ray is, and for an empty axis', () => {
    const empty = buildTrain({ objectIndex: 1, surfaces: [], objectZ: null, imageDistanceMm: null });
    const none = { ok: false, why: 'no stop' } as const;
    expect(seidel(empty, { stop: none, marginal: none, chief: none })).toEqual({
      ok: false,
      why: 'no parts',
    });
    const lens = buildTrain({
      objectIndex: 1,
      surfaces: [{ part: 0, curvaturePerMm: 0.1, indexAfter: 1.5, gapMm: 0 }],
      objectZ: null,
      imageDistanceMm: null,
    });
    const marginal = some(paraxialRay(lens, 1, 0));
    expect(seidel(lens, { stop: none, marginal, chief: none })).toEqual(none);
    expect(seidel(lens, { stop: none, marginal: none, chief: none })).toEqual(none);
    const huge = some(paraxialRay(lens, 1e120, 0));
    expect(seidel(lens, { stop: none, marginal: huge, chief: huge })).toEqual({
      ok: false,
      why: 'out of range',
    });
  });

  it('have words of their own', () => {
    expect(SUM_NAMES.map((name) => SUM_WORDS[name])).toEqual([
      'spherical aberration',
      'coma',
      'astigmatism',
      'field curvature (Petzval)',
      'distortion',
      'axial colour',
      'lateral colour',
    ]);
  });
});

/** The largest of all sums for each: every sum is made of the same rays, and any one may cancel. */
const widest = (sums: Sums): Sums => {
  const most = Math.max(...SUM_NAMES.map((name) => sums[name]));
  return eachSum(() => most);
};
