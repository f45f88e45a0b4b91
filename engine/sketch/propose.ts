import type { Fault } from '../outcome.ts';
import { faultsOf } from './rules.ts';
import type { Sketch } from './types.ts';

/** A change of a sketch; it gives the very sketch it was given when nothing changes. */
export type Edit = (sketch: Sketch) => Sketch;

/** Why a proposal is not what was asked for. */
export interface Note {
  readonly kind: 'refused';
  readonly faults: readonly Fault[];
}

/** What became of an edit: the sketch to keep, the settling to go on with, and a note when there is something to say. */
export interface Proposal {
  readonly sketch: Sketch;
  readonly settling: Settling;
  readonly note: Note | null;
}

/** What happens to a sound edited sketch before it is kept. */
export interface Settling {
  readonly settle: (before: Sketch, edited: Sketch) => Proposal;
}

/** The settling that keeps every edit as it is. */
export const unsettled: Settling = {
  settle: (_before, edited) => ({ sketch: edited, settling: unsettled, note: null }),
};

/**
 * The one door for edits. An edit that breaks a rule is refused: the proposal holds `before` itself and a note with the
 * faults. One that changes nothing gives `before` without a note. Any other goes through `settling`.
 */
export function propose(before: Sketch, edit: Edit, settling: Settling): Proposal {
  const edited = edit(before);
  if (edited === before) return { sketch: before, settling, note: null };
  const faults = faultsOf(edited);
  if (faults.length > 0) return { sketch: before, settling, note: { kind: 'refused', faults } };
  return settling.settle(before, edited);
}
