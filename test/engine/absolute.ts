import { powerAt } from '../../engine/paraxial/trace.ts';
import type { Train } from '../../engine/train/types.ts';

/** A ray by the y–nu recurrence with absolute values: what was added up, at worst, to get each number. */
export interface AbsoluteRay {
  readonly y: readonly number[];
  readonly nu: readonly number[];
}

/** The recurrence from in front of surface `from` to both ends of the train. */
export function absoluteRay(train: Train, from: number, yMm: number, nu: number): AbsoluteRay {
  const ray = { y: new Array<number>(train.count).fill(0), nu: new Array<number>(train.count + 1).fill(0) };
  let [height, slope] = [Math.abs(yMm), Math.abs(nu)];
  ray.nu[from] = slope;
  for (let k = from; k < train.count; k++) {
    ray.y[k] = height;
    slope += Math.abs(powerAt(train, k)) * height;
    ray.nu[k + 1] = slope;
    height += Math.abs(train.gap[k]! / train.index[k + 1]!) * slope;
  }
  [height, slope] = [Math.abs(yMm), Math.abs(nu)];
  for (let k = from - 1; k >= 0; k--) {
    height += Math.abs(train.gap[k]! / train.index[k + 1]!) * slope;
    ray.y[k] = height;
    slope += Math.abs(powerAt(train, k)) * height;
    ray.nu[k] = slope;
  }
  return ray;
}

/** The matrix of absolute values from in front of surface `from` to in front of `to` (behind the last surface for count). */
export function absoluteMatrix(train: Train, from = 0, to = train.count) {
  if (from === to) return { a: 1, b: 0, c: 0, d: 1 };
  const parallel = absoluteRay(train, from, 1, 0);
  const central = absoluteRay(train, from, 0, 1);
  const at = Math.min(to, train.count - 1);
  return {
    a: parallel.y[at] ?? 1,
    b: central.y[at] ?? 0,
    c: parallel.nu[to] ?? 0,
    d: central.nu[to] ?? 1,
  };
}
