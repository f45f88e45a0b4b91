import fc from 'fast-check';
import type { SurfaceSpec, TrainSpec } from '../../engine/train/build.ts';
import { uniform } from './uniform.ts';

/** A number between two limits; no length smaller than an atom, so that nothing underflows. */
export const between = (min: number, max: number): fc.Arbitrary<number> =>
  fc.oneof(
    { weight: 3, arbitrary: uniform(min, max) },
    {
      weight: 1,
      arbitrary: fc.double({ min, max, noNaN: true }).map((value) => (Math.abs(value) < 1e-9 ? 0 : value)),
    },
  );
const signed = (size: fc.Arbitrary<number>) =>
  fc.tuple(size, fc.constantFrom(-1, 1)).map(([value, sign]) => value * sign);

/** Powers of thin parts in 1/mm, of either sign, from strong to hardly any. */
const anyPower = () =>
  signed(fc.oneof(between(8, 200), between(200, 1e5)).map((focalLength) => 1 / focalLength));
const anyGap = () =>
  fc.oneof({ weight: 1, arbitrary: fc.constant(0) }, { weight: 6, arbitrary: between(0, 120) });
const anySemi = () =>
  fc.oneof(
    { weight: 2, arbitrary: fc.constant(Number.POSITIVE_INFINITY) },
    { weight: 1, arbitrary: between(0.5, 40) },
  );

/** A thin part, a diaphragm, a flat or curved surface; the part number is given later. */
const anySurface = (): fc.Arbitrary<Omit<SurfaceSpec, 'part'>> =>
  fc.oneof(
    {
      weight: 6,
      arbitrary: fc.record({
        thinPowerPerMm: anyPower(),
        semiDiameterMm: anySemi(),
        indexAfter: fc.constant(1),
        gapMm: anyGap(),
      }),
    },
    {
      weight: 1,
      arbitrary: fc.record({ semiDiameterMm: anySemi(), indexAfter: fc.constant(1), gapMm: anyGap() }),
    },
    // Flat faces: plates, and other media between.
    {
      weight: 2,
      arbitrary: fc.record({ indexAfter: between(1, 2), semiDiameterMm: anySemi(), gapMm: anyGap() }),
    },
    {
      weight: 2,
      arbitrary: fc.record({
        curvaturePerMm: signed(between(1e-4, 0.1)),
        indexAfter: between(1, 2),
        semiDiameterMm: anySemi(),
        gapMm: anyGap(),
      }),
    },
  );

/** Two thin parts that share a focus, Keplerian or Galilean, so that the pair is afocal. */
const afocalPair = () =>
  fc
    .tuple(between(10, 200), fc.oneof(between(10, 200), between(-9, -2)), anyGap())
    .map(([front, rear, gapMm]): Omit<SurfaceSpec, 'part'>[] => [
      { thinPowerPerMm: 1 / front, indexAfter: 1, gapMm: front + rear },
      { thinPowerPerMm: 1 / rear, indexAfter: 1, gapMm },
    ]);

/** An object at infinity, at any distance, or in the front focus of the first thin part. */
const anyObjectZ = (surfaces: readonly SurfaceSpec[]): fc.Arbitrary<number | null> => {
  const first = surfaces[0]?.thinPowerPerMm ?? 0;
  return fc.oneof(
    { weight: 2, arbitrary: fc.constant(null) },
    { weight: 4, arbitrary: between(1, 3000).map((distance) => -distance) },
    { weight: first > 0 ? 1 : 0, arbitrary: fc.constant(-1 / first) },
  );
};

/**
 * Any sound train of up to `mostSurfaces`, as what `buildTrain` takes, so that a law can change it. Flat faces, equal places, afocal pairs and
 * objects at a focus have weight.
 */
export const anyTrain = (mostSurfaces = 12): fc.Arbitrary<TrainSpec> =>
  fc
    .oneof(
      { weight: 5, arbitrary: fc.array(anySurface(), { minLength: 1, maxLength: mostSurfaces }) },
      {
        weight: 2,
        arbitrary: fc
          .array(afocalPair(), { minLength: 1, maxLength: mostSurfaces / 2 })
          .map((pairs) => pairs.flat()),
      },
    )
    .map((surfaces) => surfaces.map((surface, part): SurfaceSpec => ({ ...surface, part })))
    .chain((surfaces) =>
      fc.record({
        objectIndex: fc.oneof(
          { weight: 4, arbitrary: fc.constant(1) },
          { weight: 1, arbitrary: between(1, 1.6) },
        ),
        surfaces: fc.constant(surfaces),
        stopSurface: fc.integer({ min: 0, max: surfaces.length - 1 }),
        objectZ: anyObjectZ(surfaces),
        imageDistanceMm: fc.oneof(
          { weight: 3, arbitrary: fc.constant(null) },
          { weight: 1, arbitrary: between(0, 200) },
        ),
      }),
    );

/** The train seen from its image side: surfaces, gaps and media in reverse order, curvatures negated. */
export function reversed(spec: TrainSpec): TrainSpec {
  const { surfaces, objectIndex, stopSurface } = spec;
  const count = surfaces.length;
  return {
    ...spec,
    objectIndex: surfaces.at(-1)?.indexAfter ?? objectIndex,
    stopSurface: stopSurface === undefined ? -1 : count - 1 - stopSurface,
    objectZ: null,
    imageDistanceMm: null,
    surfaces: surfaces.toReversed().map((surface, k) => ({
      ...surface,
      curvaturePerMm: -(surface.curvaturePerMm ?? 0),
      indexAfter: surfaces[count - 2 - k]?.indexAfter ?? objectIndex,
      gapMm: surfaces[count - 2 - k]?.gapMm ?? 0,
    })),
  };
}

/** The train with every length `factor` times as long. */
export function scaledBy(spec: TrainSpec, factor: number): TrainSpec {
  return {
    ...spec,
    objectZ: spec.objectZ === null ? null : spec.objectZ * factor,
    imageDistanceMm: spec.imageDistanceMm === null ? null : spec.imageDistanceMm * factor,
    surfaces: spec.surfaces.map((surface) => ({
      ...surface,
      curvaturePerMm: (surface.curvaturePerMm ?? 0) / factor,
      thinPowerPerMm: (surface.thinPowerPerMm ?? 0) / factor,
      semiDiameterMm: (surface.semiDiameterMm ?? Number.POSITIVE_INFINITY) * factor,
      gapMm: surface.gapMm * factor,
    })),
  };
}
