import { buildTrain } from '../train/build.ts';
import type { Train } from '../train/types.ts';

/** Surfaces in a row, and what lies in front of, between and behind them. */
export interface Stack {
  /** 1/mm, positive when the centre lies to the right. */
  readonly curvaturesPerMm: readonly number[];
  /** One more than there are surfaces. */
  readonly indices: readonly number[];
  /** One fewer than there are surfaces. */
  readonly thicknessesMm: readonly number[];
}

/** The train of a stack by itself. */
export const trainOfStack = ({ curvaturesPerMm, indices, thicknessesMm }: Stack): Train =>
  buildTrain({
    objectIndex: indices[0] ?? 1,
    surfaces: curvaturesPerMm.map((curvaturePerMm, k) => ({
      part: 0,
      curvaturePerMm,
      indexAfter: indices[k + 1] ?? 1,
      gapMm: thicknessesMm[k] ?? 0,
    })),
    objectZ: null,
    imageDistanceMm: null,
  });
