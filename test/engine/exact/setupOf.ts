import { exactSetup } from '../../../engine/exact/setup.ts';
import type { ExactSetup, SetupOutcome } from '../../../engine/exact/types.ts';
import { axialOf } from '../../../engine/paraxial/axial.ts';
import { referenceRays } from '../../../engine/paraxial/rays.ts';
import type { FieldSize, Line } from '../../../engine/sketch/types.ts';
import { buildTrain, type SurfaceSpec, type TrainSpec } from '../../../engine/train/build.ts';
import type { ApertureAt } from '../../../engine/train/places.ts';
import { given } from '../quantity.ts';

/** A train to be looked at with exact rays, in one line or several. */
export interface Drawn {
  readonly surfaces: readonly Omit<SurfaceSpec, 'part'>[];
  readonly objectZ?: number | null;
  readonly objectIndex?: number;
  /** 0 by default. */
  readonly stopSurface?: number;
  readonly imageDistanceMm?: number | null;
  readonly aperture: ApertureAt;
  readonly field?: FieldSize;
  readonly wavelengthNm?: number;
  /** Indices behind the surfaces in further lines. */
  readonly more?: readonly { readonly wavelengthNm: number; readonly indices: readonly number[] }[];
}

export const specOf = (drawn: Drawn): TrainSpec => ({
  objectIndex: drawn.objectIndex ?? 1,
  surfaces: drawn.surfaces.map((surface, part) => ({ ...surface, part })),
  stopSurface: drawn.stopSurface ?? 0,
  objectZ: drawn.objectZ ?? null,
  imageDistanceMm: drawn.imageDistanceMm ?? null,
});

const LINES: readonly Line[] = ['short', 'long', 'fourth', 'fifth'];

/** The exact setup of a train, or why there is none. */
export function setupOutcome(drawn: Drawn): SetupOutcome {
  const spec = specOf(drawn);
  const train = buildTrain(spec);
  const axial = axialOf(train);
  const rays = referenceRays(train, drawn.aperture, drawn.field ?? { kind: 'angle', angleDeg: 5 }, axial);
  const more = (drawn.more ?? []).map(({ wavelengthNm, indices }, i) => ({
    line: LINES[i] ?? 'fifth',
    wavelengthNm,
    weight: 1,
    train: buildTrain({
      ...spec,
      surfaces: spec.surfaces.map((surface, k) => ({ ...surface, indexAfter: indices[k] ?? 1 })),
    }),
  }));
  const main = { line: 'main' as const, wavelengthNm: drawn.wavelengthNm ?? 500, weight: 1, train };
  return exactSetup([main, ...more], rays, axial.imagePlaneMm);
}

/** The exact setup of a train that has one. */
export const setupOf = (drawn: Drawn): ExactSetup => given(setupOutcome(drawn));
