import type { Train } from '../train/types.ts';
import { finite, type Quantity } from './absence.ts';
import type { ReferenceRays } from './rays.ts';

/** How wide one surface must be: semi-diameters in mm, at the largest field. */
export interface ClearNeed {
  /** For the axial bundle alone: |y|. */
  readonly axialMm: Quantity;
  /** For no vignetting: |y| + |ȳ|. */
  readonly unvignettedMm: Quantity;
  /** For the chosen vignetting v: max(|y|, |ȳ| + (1 − v)|y|). */
  readonly neededMm: Quantity;
}

/** The clear semi-diameter that every surface needs; `vignetting` is the share of the pupil's height that may be lost, 0 to 1. */
export function clearDiameters(train: Train, rays: ReferenceRays, vignetting: number): readonly ClearNeed[] {
  const { marginal, chief } = rays;
  const needs: ClearNeed[] = [];
  for (let k = 0; k < train.count; k++) {
    if (!marginal.ok) {
      needs.push({ axialMm: marginal, unvignettedMm: marginal, neededMm: marginal });
      continue;
    }
    const y = Math.abs(marginal.value.y[k]!);
    if (!chief.ok) {
      needs.push({ axialMm: finite(y), unvignettedMm: chief, neededMm: chief });
      continue;
    }
    const yBar = Math.abs(chief.value.y[k]!);
    needs.push({
      axialMm: finite(y),
      unvignettedMm: finite(y + yBar),
      neededMm: finite(Math.max(y, yBar + (1 - vignetting) * y)),
    });
  }
  return needs;
}
