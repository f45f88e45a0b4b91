import type { PartId, Setting, Sketch } from '../../engine/index.ts';
import { nameAt } from '../drawing/words.ts';

/** What the setting is called: "Middle position", "Between middle and narrow"; a single position has no name to tell. */
export function settingName(sketch: Sketch, setting: Setting): string {
  const index = sketch.positions.findIndex(({ id }) => id === setting.at);
  const name = sketch.positions[index]?.name ?? '';
  const next = sketch.positions[index + 1]?.name;
  if (setting.toNext > 0 && next !== undefined) return `Between ${name} and ${next}`;
  if (sketch.positions.length === 1) return 'First order';
  return /\bposition/i.test(name) ? asHeading(name) : `${asHeading(name)} position`;
}

/** With a capital where it begins with a word; a symbol such as the f of f/4 keeps its case. */
const asHeading = (name: string): string =>
  name.replace(/^\p{Ll}(?=\p{Ll})/u, (first) => first.toUpperCase());

/** What the part of that id is called, empty when there is none. */
export const partName = (sketch: Sketch, id: PartId): string =>
  nameAt(
    sketch,
    sketch.parts.findIndex((part) => part.id === id),
  );
