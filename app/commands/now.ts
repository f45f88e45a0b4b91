import type { PartId, Sketch } from '../../engine/index.ts';
import type { Command } from '../store/command.ts';
import { sketchStore } from '../store/sketchStore.ts';
import { selectedParts, settingIn, viewStore } from '../store/viewStore.ts';

/** The sketch as it is now. */
export const sketchNow = (): Sketch => sketchStore.getState().sketch;

/** The selected parts as they are now, in the sketch's order. */
export const selectedNow = (): readonly PartId[] => selectedParts(sketchNow(), viewStore.getState());

/** The setting in use now. */
export const settingNow = () => settingIn(sketchNow(), viewStore.getState());

const always = () => true;

/** A command; available at any time unless said otherwise. */
export const command = (
  id: string,
  label: string,
  keys: readonly string[],
  run: () => void,
  available: () => boolean = always,
): Command => ({ id, label, keys, run, available });
