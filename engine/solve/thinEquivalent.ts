import { mapOutcome, type Outcome } from '../outcome.ts';
import type { Absence } from '../paraxial/absence.ts';
import { firstOrder } from '../paraxial/firstOrder.ts';
import type { Train } from '../train/types.ts';

/** What glass is to the first order, in its own media: one power between two principal planes. mm, positive to the right. */
export interface ThinEquivalent {
  /** 1/power. */
  readonly focalLengthMm: number;
  /** V1H, from the first vertex. */
  readonly principalFrontMm: number;
  /** V2H′, from the last vertex. */
  readonly principalRearMm: number;
  /** HH′, from the front to the rear principal plane. */
  readonly principalSpacingMm: number;
}

/** The thin part that a train by itself amounts to. 'afocal', 'no parts', 'out of range'. */
export function thinEquivalent(train: Train): Outcome<ThinEquivalent, Absence> {
  const { focalLengthMm, principalFrontMm, principalRearMm, vertexLengthMm } = firstOrder(train);
  if (!focalLengthMm.ok) return focalLengthMm;
  if (!principalFrontMm.ok) return principalFrontMm;
  return mapOutcome(principalRearMm, (rear) => ({
    focalLengthMm: focalLengthMm.value,
    principalFrontMm: principalFrontMm.value,
    principalRearMm: rear,
    principalSpacingMm: vertexLengthMm + rear - principalFrontMm.value,
  }));
}
