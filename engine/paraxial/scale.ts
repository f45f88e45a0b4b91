import { none } from '../outcome.ts';
import type { Train } from '../train/types.ts';
import { type Absence, finite, type Quantity } from './absence.ts';
import { emptyRay, type ParaxialRay, powerAt } from './trace.ts';

/** Share of its scale below which a number counts as 0: rounding stays a thousand times smaller, drawn layouts far larger. */
const NEGLIGIBLE = 1e-12;

/**
 * THE test for "afocal", "at infinity", "at a focus": true when `value` is no more than rounding makes of numbers as large as `scale`,
 * which comes from `rayScale`. It depends on no unit and no length of the layout.
 */
export const isNegligible = (value: number, scale: number): boolean => Math.abs(value) <= NEGLIGIBLE * scale;

/**
 * Where a ray with height `y` at a vertex and index times slope `nu` crosses the axis, in mm from that vertex: −n·y/nu. Without `nu`, judged
 * against its scale, it does so at infinity, which `absence` says.
 */
export function axisCrossing(n: number, y: number, nu: number, nuScale: number, absence: Absence): Quantity {
  if (!(Number.isFinite(y) && Number.isFinite(nuScale))) return none('out of range');
  return isNegligible(nu, nuScale) ? none(absence) : finite((-n * y) / nu);
}

/**
 * What each number of `rayThrough` was made from: how far it would move if every term added on the way were changed by its own size, the
 * changes carried on by the same y–nu recurrence and summed as squares. In a short train this is about the recurrence with absolute
 * values; that one, however, grows 3.7 times with every lens of a relay and would call a chain of thirty afocal.
 */
export function rayScale(train: Train, surface: number, yMm: number, nu: number): ParaxialRay {
  const scale = emptyRay(train.count);
  spreadBehind(train, scale, surface, yMm, nu);
  spreadInFront(train, scale, surface, yMm, nu);
  return scale;
}

/** `yy`, `yn` and `nn` are the sums of squares and products of the changes of height and nu. */
function spreadBehind(train: Train, scale: ParaxialRay, surface: number, yMm: number, nu: number): void {
  const { count, gap, index } = train;
  let height = yMm;
  let slope = nu;
  let yy = height * height;
  let yn = 0;
  let nn = slope * slope;
  scale.nu[surface] = Math.abs(slope);
  for (let k = surface; k < count; k++) {
    scale.y[k] = Math.sqrt(yy);
    const power = powerAt(train, k);
    const bend = power * height;
    slope -= bend;
    nn = Math.max(0, nn + power * (power * yy - 2 * yn)) + bend * bend;
    yn -= power * yy;
    scale.nu[k + 1] = Math.sqrt(nn);
    const reach = gap[k]! / index[k + 1]!;
    const rise = reach * slope;
    height += rise;
    yy = Math.max(0, yy + reach * (reach * nn + 2 * yn)) + rise * rise;
    yn += reach * nn;
  }
}

function spreadInFront(train: Train, scale: ParaxialRay, surface: number, yMm: number, nu: number): void {
  const { gap, index } = train;
  let height = yMm;
  let slope = nu;
  let yy = height * height;
  let yn = 0;
  let nn = slope * slope;
  for (let k = surface - 1; k >= 0; k--) {
    const reach = gap[k]! / index[k + 1]!;
    const rise = reach * slope;
    height -= rise;
    yy = Math.max(0, yy + reach * (reach * nn - 2 * yn)) + rise * rise;
    yn -= reach * nn;
    scale.y[k] = Math.sqrt(yy);
    const power = powerAt(train, k);
    const bend = power * height;
    slope += bend;
    nn = Math.max(0, nn + power * (power * yy + 2 * yn)) + bend * bend;
    yn += power * yy;
    scale.nu[k] = Math.sqrt(nn);
  }
}
