import type { Edit } from '../../engine/index.ts';
import { applyEdit, dismissNote, previewEdit, sketchStore } from '../store/sketchStore.ts';

/** Makes the edit as one step of history; answers with one sentence when it is refused, and changes nothing then. */
export function tryEdit(edit: Edit): string | null {
  applyEdit(edit);
  return takeRefusal();
}

/** Shows the edit while a number is stepped; answers like `tryEdit`. */
export function tryPreview(edit: Edit): string | null {
  previewEdit(edit);
  return takeRefusal();
}

/** The sentence stands under the field that caused it, so it is taken off the page's own line. */
function takeRefusal(): string | null {
  const { note } = sketchStore.getState();
  if (note?.kind !== 'refused') return null;
  dismissNote();
  return note.faults[0]?.sentence ?? 'This cannot be.';
}
