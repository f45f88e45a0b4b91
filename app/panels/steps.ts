import type { PositionId, Setting, Sketch } from '../../engine/index.ts';
import { addPosition, settingAt } from '../../engine/index.ts';
import { currentReading } from '../live/reading.ts';
import { sketchStore } from '../store/sketchStore.ts';
import { setView } from '../store/viewStore.ts';
import { tryEdit } from './edit.ts';

/** Where the scrubber stands on a line from 0 (the first position) to count − 1 (the last). */
export function standOf({ positions }: Sketch, { at, toNext }: Setting): number {
  const index = Math.max(
    0,
    positions.findIndex(({ id }) => id === at),
  );
  return Math.min(index + toNext, positions.length - 1);
}

/** The setting at a stand; beyond the ends it is the end. */
export function settingOf({ positions }: Sketch, stand: number): Setting {
  const last = positions.length - 1;
  const kept = Math.min(Math.max(stand, 0), last);
  const index = Math.min(Math.floor(kept), last);
  const position = positions[index];
  if (position === undefined) throw new Error(`settingOf: no position number ${index}`);
  return { at: position.id, toNext: index === last ? 0 : kept - index };
}

/** Goes to a position. */
export const goToPosition = (id: PositionId): void => setView({ setting: settingAt(id) });

/** Adds a position with the values of the present setting, and goes there. */
export function addPositionHere(): void {
  const { sketch, setting } = currentReading();
  const known = new Set(sketch.positions.map(({ id }) => id));
  tryEdit((before) => addPosition(before, freshName(before), setting));
  const added = sketchStore.getState().sketch.positions.find(({ id }) => !known.has(id));
  if (added) goToPosition(added.id);
}

function freshName({ positions }: Sketch): string {
  const names = new Set(positions.map(({ name }) => name));
  let number = positions.length + 1;
  while (names.has(`position ${number}`)) number++;
  return `position ${number}`;
}
