import type { LabelPlace } from '../board/labels.ts';
import { labelOf } from '../drawing/handles/labels.ts';
import type { HandState } from './overlay.ts';

const NONE: ReadonlySet<string> = new Set();

/** The labels that keep their side: under a drag all of them, else the one pointed at and the one whose grip has the focus. */
export function frozenLabels(
  { dragging, hover, focus }: Pick<HandState, 'dragging' | 'hover' | 'focus'>,
  places: readonly LabelPlace[],
): ReadonlySet<string> {
  if (dragging) return new Set(places.map(({ id }) => id));
  const held = [hover, focus].flatMap((id) => (id === null ? [] : (labelOf(id) ?? [])));
  return held.length === 0 ? NONE : new Set(held);
}
