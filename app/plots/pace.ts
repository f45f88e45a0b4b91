/** What a computation of the open plots took at last, ms; null when it was not made yet. */
export interface Costs {
  readonly coarse: number | null;
  readonly fine: number | null;
}

/** What to do now for plots that are behind. */
export type Step =
  | { readonly kind: 'compute'; readonly quality: 'coarse' | 'fine' }
  /** Ask again so many ms later: the drawing goes first. */
  | { readonly kind: 'wait'; readonly ms: number };

/** After so many ms without a change the hand is taken to rest. */
export const REST_MS = 200;
/** Plots may take this much of a frame without the drawing falling behind, ms. */
const SHARE_MS = 6;
/** A coarse computation longer than this would be felt by the hand, ms. */
const FELT_MS = 40;
/** Of the time while a hand moves, plots that are slow may take one part in three. */
const REST_SHARE = 2;

/**
 * The next step for plots that do not show the present sketch, `sinceChangeMs` after its last change and `sinceDoneMs` after the last
 * computation. Quick plots are made fine at every frame; others coarse; slow ones leave frames out; those that would be felt wait for
 * the hand to rest.
 */
export function whenBehind({ coarse, fine }: Costs, sinceChangeMs: number, sinceDoneMs: number): Step {
  if (fine !== null && fine <= SHARE_MS) return { kind: 'compute', quality: 'fine' };
  if (coarse === null) return { kind: 'compute', quality: 'coarse' };
  if (coarse > FELT_MS)
    return sinceChangeMs >= REST_MS
      ? { kind: 'compute', quality: 'coarse' }
      : { kind: 'wait', ms: REST_MS - sinceChangeMs };
  const dueMs = coarse > SHARE_MS ? REST_SHARE * coarse : 0;
  return sinceDoneMs >= dueMs
    ? { kind: 'compute', quality: 'coarse' }
    : { kind: 'wait', ms: dueMs - sinceDoneMs };
}

/** The next step for plots that show the present sketch, but coarsely. */
export const whenCoarse = (sinceChangeMs: number): Step =>
  sinceChangeMs >= REST_MS
    ? { kind: 'compute', quality: 'fine' }
    : { kind: 'wait', ms: REST_MS - sinceChangeMs };
