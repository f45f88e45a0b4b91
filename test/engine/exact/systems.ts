import { exactSetup } from '../../../engine/exact/setup.ts';
import type { ExactSetup } from '../../../engine/exact/types.ts';
import { conjugates } from '../../../engine/paraxial/conjugates.ts';
import { referenceRays } from '../../../engine/paraxial/rays.ts';
import type { FieldSize } from '../../../engine/sketch/types.ts';
import { buildTrain, type SurfaceSpec } from '../../../engine/train/build.ts';
import type { ApertureAt } from '../../../engine/train/places.ts';
import type { Train } from '../../../engine/train/types.ts';

/** A surface as one line of a table: radius (0 is a plane), gap behind it, index behind it, and what else is special. */
export type Row = readonly [
  radiusMm: number,
  gapMm: number,
  index: number,
  special?: Omit<Partial<SurfaceSpec>, 'part' | 'gapMm' | 'indexAfter'>,
];

export interface Layout {
  readonly rows: readonly Row[];
  readonly objectIndex?: number;
  /** z of the object; null or absent at infinity. */
  readonly objectZ?: number | null;
  readonly stop?: number;
  readonly imageDistanceMm?: number;
}

/** The train of a table of surfaces. */
export const trainOfRows = ({
  rows,
  objectIndex = 1,
  objectZ = null,
  stop = -1,
  imageDistanceMm,
}: Layout): Train =>
  buildTrain({
    objectIndex,
    objectZ,
    imageDistanceMm: imageDistanceMm ?? null,
    stopSurface: stop,
    surfaces: rows.map(
      ([radiusMm, gapMm, indexAfter, special], part): SurfaceSpec => ({
        part,
        curvaturePerMm: radiusMm === 0 ? 0 : 1 / radiusMm,
        gapMm,
        indexAfter,
        ...special,
      }),
    ),
  });

/** The setup of a table of surfaces in one line. Throws when there is none, as a test would not have meant that. */
export function setupOfRows(layout: Layout, aperture: ApertureAt, field: FieldSize): ExactSetup {
  const train = trainOfRows(layout);
  const rays = referenceRays(train, aperture, field);
  const setup = exactSetup(
    [{ line: 'main', wavelengthNm: 587.5618, weight: 1, train }],
    rays,
    conjugates(train).imagePlaneMm,
  );
  if (!setup.ok) throw new Error(`setupOfRows: ${setup.why}`);
  return setup.value;
}

/** Four-element lens of the Tessar kind with a stop in front of the cemented pair, made up. */
export const PHOTO: Layout = {
  rows: [
    [16.28, 3.57, 1.6116],
    [-275.7, 1.89, 1],
    [-34.57, 0.81, 1.6053],
    [15.82, 1.6, 1],
    [0, 1.65, 1],
    [0, 2.17, 1.5123],
    [19.2, 3.96, 1.6116],
    [-24, 0, 1],
  ],
  stop: 4,
};

/** Two strong negative menisci far in front of the stop: its pupil moves forward and tilts as the field grows, made up. */
export const FISHEYE: Layout = {
  rows: [
    [60, 3, 1.6],
    [18, 14, 1],
    [40, 2.5, 1.6],
    [12, 16, 1],
    [30, 5, 1.7],
    [-60, 8, 1],
    [0, 1, 1],
    [40, 4, 1.6],
    [-12, 2, 1.75],
    [-30, 0, 1],
  ],
  stop: 6,
};
