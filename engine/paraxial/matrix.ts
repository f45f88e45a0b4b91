import type { Train } from '../train/types.ts';
import { isNegligible, rayScale } from './scale.ts';
import { rayThrough } from './trace.ts';

/**
 * A 2×2 matrix on (y, nu) with determinant 1, and what was added up to get each entry (see `rayScale`).
 * c is minus the power (1/mm), b a reduced length (mm).
 */
export interface Matrix {
  readonly a: number;
  readonly b: number;
  readonly c: number;
  readonly d: number;
  readonly aScale: number;
  readonly bScale: number;
  readonly cScale: number;
  readonly dScale: number;
}

/**
 * The matrix from just in front of surface `from` to just in front of surface `to`; with `to` = count, the default, to just behind
 * the last surface. The whole train runs from first vertex to last vertex.
 */
export function systemMatrix(train: Train, from = 0, to = train.count): Matrix {
  if (from === to) return { a: 1, b: 0, c: 0, d: 1, aScale: 1, bScale: 0, cScale: 0, dScale: 1 };
  const height = Math.min(to, train.count - 1);
  const parallel = rayThrough(train, from, 1, 0);
  const central = rayThrough(train, from, 0, 1);
  const parallelScale = rayScale(train, from, 1, 0);
  const centralScale = rayScale(train, from, 0, 1);
  return {
    a: parallel.y[height]!,
    b: central.y[height]!,
    c: parallel.nu[to]!,
    d: central.nu[to]!,
    aScale: parallelScale.y[height]!,
    bScale: centralScale.y[height]!,
    cScale: parallelScale.nu[to]!,
    dScale: centralScale.nu[to]!,
  };
}

/** True when the matrix has no power: the one test for afocal layouts. */
export const isZeroPower = (matrix: Matrix): boolean => isNegligible(matrix.c, matrix.cScale);
