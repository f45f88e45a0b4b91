import fc from 'fast-check';
import type { SurfaceSpec, TrainSpec } from '../../../engine/train/build.ts';

/** A number between two limits, evenly spread: most doubles between −1 and 1 are next to nothing. */
export const between = (min: number, max: number): fc.Arbitrary<number> =>
  fc.nat(2 ** 30).map((share) => min + ((max - min) * share) / 2 ** 30);
const signed = (size: fc.Arbitrary<number>) =>
  fc.tuple(size, fc.constantFrom(-1, 1)).map(([value, sign]) => value * sign);

/** Height up to which the surfaces drawn here are meant to work, mm. */
export const HEIGHT_MM = 8;

/** Even powers that move the edge by up to the given sag, mm. */
const anyPowers = (sagMm: number) =>
  fc
    .array(between(-sagMm, sagMm), { minLength: 1, maxLength: 4 })
    .map((sags) => sags.map((sag, j) => sag / HEIGHT_MM ** (4 + 2 * j)));

const anyIndex = () =>
  fc.oneof(
    { weight: 3, arbitrary: fc.constant(1) },
    { weight: 5, arbitrary: between(1.3, 2) },
    { weight: 1, arbitrary: between(3, 4) },
  );

/** A plane, sphere, conic or asphere of refracting kind. */
const anyExactSurface = (): fc.Arbitrary<Omit<SurfaceSpec, 'part'>> =>
  fc.record({
    curvaturePerMm: fc.oneof(
      { weight: 1, arbitrary: fc.constant(0) },
      { weight: 6, arbitrary: signed(between(12, 400)).map((radius) => 1 / radius) },
    ),
    conic: fc.oneof({ weight: 2, arbitrary: fc.constant(0) }, { weight: 3, arbitrary: between(-3, 1) }),
    asphere: fc.oneof({ weight: 2, arbitrary: fc.constant([]) }, { weight: 2, arbitrary: anyPowers(0.3) }),
    indexAfter: anyIndex(),
    gapMm: fc.oneof({ weight: 1, arbitrary: fc.constant(0) }, { weight: 6, arbitrary: between(0, 20) }),
  });

/** A train of such surfaces, sometimes with a mirror at its end. */
export const anyExactTrain = (mostSurfaces = 10): fc.Arbitrary<TrainSpec> =>
  fc
    .record({
      surfaces: fc.array(anyExactSurface(), { minLength: 1, maxLength: mostSurfaces }),
      mirror: fc.oneof({ weight: 4, arbitrary: fc.constant(false) }, fc.constant(true)),
    })
    .map(({ surfaces, mirror }) => {
      const last = surfaces.at(-1);
      const front = surfaces.at(-2)?.indexAfter ?? 1;
      const listed = mirror && last ? [...surfaces.slice(0, -1), { ...last, indexAfter: -front }] : surfaces;
      return {
        objectIndex: 1,
        surfaces: listed.map((surface, part): SurfaceSpec => ({ ...surface, part })),
        objectZ: null,
        imageDistanceMm: null,
      };
    });

/** A ray that starts in front of the train and heads for its first surface; z from the first vertex. */
export const anyStart = (): fc.Arbitrary<{
  start: [number, number, number];
  direction: [number, number, number];
}> =>
  fc
    .record({
      x: between(-HEIGHT_MM / 2, HEIGHT_MM / 2),
      y: between(-HEIGHT_MM / 2, HEIGHT_MM / 2),
      p: between(-0.3, 0.3),
      q: between(-0.3, 0.3),
      back: between(6, 30),
    })
    .map(({ x, y, p, q, back }) => ({ start: [x - p * back, y - q * back, -back], direction: [p, q, 1] }));
