import { none, some } from '../outcome.ts';
import type { Train } from '../train/types.ts';
import { finite, type Quantity } from './absence.ts';
import type { ClearNeed } from './clear.ts';
import type { RayOutcome, ReferenceRays } from './rays.ts';

/** How hard one thin part works. */
export interface PartWork {
  readonly partIndex: number;
  /** |f| over the clear diameter: the given one, else what an unvignetted bundle needs. */
  readonly fOverDiameter: Quantity;
  /** Change of index times slope, −φy, of the marginal and of the chief ray (rad in air). */
  readonly bendMarginal: Quantity;
  readonly bendChief: Quantity;
}

/** The work of every thin part. */
export function work(train: Train, rays: ReferenceRays, clear: readonly ClearNeed[]): readonly PartWork[] {
  const rows: PartWork[] = [];
  for (let k = 0; k < train.count; k++) {
    const power = train.thinPower[k]!;
    if (power === 0) continue;
    const rim = train.semiDiameter[k]!;
    const semi = Number.isFinite(rim) ? some(rim) : (clear[k]?.unvignettedMm ?? none('no bundle' as const));
    rows.push({
      partIndex: train.partOf[k]!,
      fOverDiameter: !semi.ok
        ? semi
        : semi.value === 0
          ? none('no bundle')
          : finite(1 / Math.abs(power * 2 * semi.value)),
      bendMarginal: bend(rays.marginal, k),
      bendChief: bend(rays.chief, k),
    });
  }
  return rows;
}

const bend = (ray: RayOutcome, surface: number): Quantity =>
  ray.ok ? finite(ray.value.nu[surface + 1]! - ray.value.nu[surface]!) : ray;
