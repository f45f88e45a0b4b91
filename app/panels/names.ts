import type { PartId, Setting, Sketch } from '../../engine/index.ts';
import { nameAt } from '../drawing/words.ts';

/** What the setting is called: "middle position", "between middle and narrow"; a single position has no name to tell. */
export function settingName(sketch: Sketch, setting: Setting): string {
  const index = sketch.positions.findIndex(({ id }) => id === setting.at);
  const name = sketch.positions[index]?.name ?? '';
  const next = sketch.positions[index + 1]?.name;
  if (setting.toNext > 0 && next !== undefined) return `Between ${name} and ${next}`;
  if (sketch.positions.length === 1) return 'First order';
  return `${name.charAt(0).toUpperCase()}${name.slice(1)} position`;
}

/** What the part of that id is called, empty when there is none. */
export const partName = (sketch: Sketch, id: PartId): string =>
  nameAt(
    sketch,
    sketch.parts.findIndex((part) => part.id === id),
  );
