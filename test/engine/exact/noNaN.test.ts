import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { sampleOf, traceFields } from '../../../engine/exact/bundles.ts';
import { chiefSweep, fieldShares } from '../../../engine/exact/chiefSweep.ts';
import { compare } from '../../../engine/exact/compare.ts';
import { contrastOf, diffractionLimit } from '../../../engine/exact/contrast.ts';
import { rayFans, wavefrontFans } from '../../../engine/exact/fans.ts';
import { distortion, fieldCurves, lateralColour } from '../../../engine/exact/fieldCurves.ts';
import { bestFocus, spotMoments, throughFocus } from '../../../engine/exact/focus.ts';
import { hexapolarGrid } from '../../../engine/exact/grids.ts';
import { illumination } from '../../../engine/exact/illumination.ts';
import { landingsOf } from '../../../engine/exact/landing.ts';
import { axialColour, longitudinal } from '../../../engine/exact/longitudinal.ts';
import { exactSetup } from '../../../engine/exact/setup.ts';
import { airyRadius, spotSize } from '../../../engine/exact/spots.ts';
import { trust } from '../../../engine/exact/trust.ts';
import type { ExactSetup } from '../../../engine/exact/types.ts';
import { none } from '../../../engine/outcome.ts';
import { axialOf } from '../../../engine/paraxial/axial.ts';
import { referenceRays } from '../../../engine/paraxial/rays.ts';
import { buildTrain, type TrainSpec } from '../../../engine/train/build.ts';
import { anyTrain } from '../anyTrain.ts';
import { anyExactTrain, between } from './anyRay.ts';

/** Everything that the plots and the side panel show of a setup. */
function everything(setup: ExactSetup): Readonly<Record<string, unknown>> {
  const fields = traceFields(setup, [0, 0.7, 1], sampleOf(7, hexapolarGrid(3)));
  const sweep = chiefSweep(setup, 0, fieldShares(5));
  const other = chiefSweep(setup, setup.lines.length - 1, fieldShares(5));
  const spots = fields.map((field) => {
    const landings = landingsOf(field);
    if (!landings.ok) return landings;
    const main = landings.value[0]!.landing;
    const moments = spotMoments(landings.value);
    const limit = diffractionLimit(main, field.bundles[0]!.index, 500);
    return {
      places: landings.value.map(({ landing }) => [
        landing.x.subarray(0, landing.count),
        landing.y.subarray(0, landing.count),
      ]),
      size: spotSize(landings.value),
      contrast: contrastOf(landings.value, 100, limit),
      through: moments.ok ? throughFocus(moments.value, Float64Array.of(-1, 0, 1)) : null,
      focus: bestFocus(moments.ok ? [{ moments: moments.value, weight: 1 }] : []),
    };
  });
  return {
    spots,
    fans: fields.map(rayFans),
    waves: fields.map((field) => wavefrontFans(field, 0.1)),
    longitudinal: longitudinal(fields[0]!),
    curves: fieldCurves(sweep),
    distortion: distortion(sweep, 'paraxial'),
    fTheta: distortion(sweep, 'fTheta'),
    lateral: lateralColour(sweep, [other]),
    axial: axialColour(setup, setup.lines, 0.7),
    illumination: illumination(setup, fieldShares(3)),
    comparison: compare(setup),
    trust: trust(setup, 0.01),
    airy: airyRadius(setup),
  };
}

/** Paths to numbers that are none. */
function faultsIn(value: unknown, path: string): string[] {
  if (typeof value === 'number') return Number.isFinite(value) ? [] : [`${path}: ${value}`];
  if (value instanceof Float64Array) return faultsIn([...value], path);
  if (Array.isArray(value)) return value.flatMap((item, i) => faultsIn(item, `${path}[${i}]`));
  if (typeof value !== 'object' || value === null) return [];
  return Object.entries(value).flatMap(([key, item]) => faultsIn(item, `${path}.${key}`));
}

function setupFrom(spec: TrainSpec, diameterMm: number, angleDeg: number): ReturnType<typeof exactSetup> {
  const train = buildTrain(spec);
  const axial = axialOf(train);
  const field =
    spec.objectZ === null
      ? ({ kind: 'angle', angleDeg } as const)
      : ({
          kind: 'objectHeight',
          heightMm: Math.abs(spec.objectZ) * Math.tan((angleDeg * Math.PI) / 180),
        } as const);
  const rays = referenceRays(train, { kind: 'entrancePupilDiameter', diameterMm }, field, axial);
  if (train.count === 0) return none('no parts');
  const line = { line: 'main' as const, wavelengthNm: 550, weight: 1, train };
  const short = { ...line, line: 'short' as const, wavelengthNm: 450 };
  return exactSetup([line, short], rays, axial.imagePlaneMm);
}

describe('whatever is drawn', () => {
  const anySpec = fc.oneof(
    anyExactTrain(8).chain((spec) =>
      fc
        .record({
          objectZ: fc.oneof(fc.constant(null), between(-500, -5)),
          stop: fc.nat(spec.surfaces.length - 1),
          rim: between(2, 30),
          imageDistanceMm: fc.oneof(fc.constant(null), between(0, 100)),
        })
        .map(
          ({ objectZ, stop, rim, imageDistanceMm }): TrainSpec => ({
            ...spec,
            objectZ,
            imageDistanceMm,
            stopSurface: stop,
            surfaces: spec.surfaces.map((surface) => ({ ...surface, semiDiameterMm: rim })),
          }),
        ),
    ),
    anyTrain(6),
  );

  it('every number of every analysis is one, and what there is none of has a reason', {
    timeout: 60_000,
  }, () => {
    let seen = 0;
    fc.assert(
      fc.property(anySpec, between(0.5, 40), between(0.5, 85), (spec, diameterMm, angleDeg) => {
        const setup = setupFrom(spec, diameterMm, angleDeg);
        if (!setup.ok) return;
        seen++;
        expect(faultsIn(everything(setup.value), '')).toEqual([]);
      }),
      { numRuns: 80 },
    );
    expect(seen).toBeGreaterThan(40);
  });
});
