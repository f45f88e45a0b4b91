import { Decimal } from 'decimal.js';
import type { Train } from '../../../engine/train/types.ts';

/**
 * The first order once more, in forty digits and by other means than the engine's traces: products of 2×2 matrices, and the vergences
 * n/s that the lens equation adds powers to.
 */
export const D = Decimal.clone({ precision: 40, toExpNeg: -9e15, toExpPos: 9e15 });

/** On (y, nu), row by row. */
export interface DecimalMatrix {
  readonly a: Decimal;
  readonly b: Decimal;
  readonly c: Decimal;
  readonly d: Decimal;
}

/** `left` after `right`. */
export const times = (left: DecimalMatrix, right: DecimalMatrix): DecimalMatrix => ({
  a: left.a.times(right.a).plus(left.b.times(right.c)),
  b: left.a.times(right.b).plus(left.b.times(right.d)),
  c: left.c.times(right.a).plus(left.d.times(right.c)),
  d: left.c.times(right.b).plus(left.d.times(right.d)),
});

const ONE: DecimalMatrix = { a: new D(1), b: new D(0), c: new D(0), d: new D(1) };

/** Power of one surface. */
const powerOf = (train: Train, k: number): Decimal =>
  new D(train.index[k + 1]!).minus(train.index[k]!).times(train.curvature[k]!).plus(train.thinPower[k]!);

const refraction = (train: Train, k: number): DecimalMatrix => ({ ...ONE, c: powerOf(train, k).neg() });

/** Through the space behind surface k. */
const transfer = (train: Train, k: number): DecimalMatrix => ({
  ...ONE,
  b: new D(train.gap[k]!).div(train.index[k + 1]!),
});

/** From just in front of surface `from` to just in front of surface `to`, or behind the last one for `to` = count. */
export function matrixBetween(train: Train, from: number, to: number): DecimalMatrix {
  let matrix = ONE;
  for (let k = from; k < to; k++) {
    matrix = times(refraction(train, k), matrix);
    if (k < train.count - 1) matrix = times(transfer(train, k), matrix);
  }
  return matrix;
}

/** Object and image vergence at each surface, n/s in front and n′/s′ behind, for the axial object point. */
export interface Vergences {
  readonly inFront: readonly Decimal[];
  readonly behind: readonly Decimal[];
}

/** The chain of images by n′/s′ = n/s + φ, and s of the next surface = s′ − gap. */
export function vergences(train: Train): Vergences {
  const inFront: Decimal[] = [];
  const behind: Decimal[] = [];
  let vergence = train.objectZ === null ? new D(0) : new D(train.index[0]!).div(train.objectZ);
  for (let k = 0; k < train.count; k++) {
    inFront.push(vergence);
    vergence = vergence.plus(powerOf(train, k));
    behind.push(vergence);
    vergence = vergence.div(new D(1).minus(vergence.times(train.gap[k]!).div(train.index[k + 1]!)));
  }
  return { inFront, behind };
}

/** Heights of the axial ray at the surfaces when it is 1 at the first: each space shrinks it by 1 − gap/s′. */
export function axialHeights(train: Train, { behind }: Vergences): readonly Decimal[] {
  const heights = [new D(1)];
  for (let k = 0; k + 1 < train.count; k++) {
    const share = new D(1).minus((behind[k] ?? new D(0)).times(train.gap[k]!).div(train.index[k + 1]!));
    heights.push((heights[k] ?? new D(0)).times(share));
  }
  return heights;
}
