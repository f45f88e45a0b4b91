import type { Edit, Note, Settling, Sketch } from '../../engine/index.ts';
import { propose, unsettled } from '../../engine/index.ts';

/** A drag or a scrub in progress: where it began, and the last edit that was accepted. */
interface Running {
  readonly before: Sketch;
  readonly edit: Edit;
  readonly settling: Settling;
}

/** The sketch with its history. A gesture previews many times and commits once. */
export interface Document {
  readonly sketch: Sketch;
  readonly past: readonly Sketch[];
  readonly future: readonly Sketch[];
  readonly running: Running | null;
  /** What the last edit was answered with; null when there is nothing to say. */
  readonly note: Note | null;
}

const identity: Edit = (sketch) => sketch;

/** A document that holds `sketch` and no history. */
export function documentOf(sketch: Sketch): Document {
  return { sketch, past: [], future: [], running: null, note: null };
}

/**
 * Shows `edit` without writing history. It is always made on the sketch at the start of the gesture, so no error gathers;
 * when it is refused the last good preview stays and the note says why.
 */
export function preview(doc: Document, edit: Edit): Document {
  const running = doc.running ?? { before: doc.sketch, edit: identity, settling: unsettled };
  const proposal = propose(running.before, edit, running.settling);
  if (proposal.note?.kind === 'refused') return { ...doc, running, note: proposal.note };
  return {
    ...doc,
    sketch: proposal.sketch,
    running: { ...running, edit, settling: proposal.settling },
    note: proposal.note,
  };
}

/**
 * Ends a gesture: its last accepted edit is made once more from the start, without the warm start, and becomes one
 * step of history, or none when it changed nothing. Why the hand's last move was refused stays on the screen.
 */
export function commit(doc: Document): Document {
  if (!doc.running) return doc;
  const { before, edit } = doc.running;
  const proposal = propose(before, edit, unsettled);
  const settled = { ...doc, sketch: proposal.sketch, running: null, note: proposal.note ?? doc.note };
  return proposal.sketch === before ? settled : { ...settled, past: [...doc.past, before], future: [] };
}

/** Ends a gesture and puts back what was there before it. */
export function cancel(doc: Document): Document {
  return doc.running ? { ...doc, sketch: doc.running.before, running: null, note: null } : doc;
}

/** Makes `edit` as one step of history. A gesture in progress is cancelled first. */
export function apply(doc: Document, edit: Edit): Document {
  return commit(preview(cancel(doc), edit));
}

/** One step back; during a gesture it only cancels the gesture. */
export function undo(doc: Document): Document {
  if (doc.running) return cancel(doc);
  const sketch = doc.past.at(-1);
  if (!sketch) return doc;
  return { ...documentOf(sketch), past: doc.past.slice(0, -1), future: [doc.sketch, ...doc.future] };
}

/** One step forward again; during a gesture it only cancels the gesture. */
export function redo(doc: Document): Document {
  if (doc.running) return cancel(doc);
  const [sketch, ...future] = doc.future;
  if (!sketch) return doc;
  return { ...documentOf(sketch), past: [...doc.past, doc.sketch], future };
}
