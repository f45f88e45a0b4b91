import type { Edit, Note } from '../../engine/index.ts';
import { propose, unsettled } from '../../engine/index.ts';
import { applyEdit, cancelEdit, sketchStore } from '../store/sketchStore.ts';

/** The sentence on why an edit was refused, or null when it was not. */
export const refusalOf = (note: Note | null): string | null =>
  note?.kind === 'refused' ? (note.faults[0]?.sentence ?? 'This cannot be.') : null;

/** Makes the edit as one step of history; answers with one sentence when it is refused, and changes nothing then. */
export function tryEdit(edit: Edit): string | null {
  cancelEdit();
  const refusal = refusalOf(propose(sketchStore.getState().sketch, edit, unsettled).note);
  applyEdit(edit);
  return refusal;
}
