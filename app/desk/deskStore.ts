import { createStore } from 'zustand/vanilla';
import type { Fault } from '../../engine/index.ts';
import type { Kept, ShelfEntry } from './storage.ts';

/** What stands beside the title; `notSaved` is the sentence that says why. */
export type SaveState = 'saved' | 'saving' | { readonly notSaved: string };

/** A sketch that was not opened, and everything that is wrong with it. */
export interface RefusedSketch {
  readonly name: string;
  readonly faults: readonly Fault[];
}

export interface DeskState {
  readonly save: SaveState;
  /** The name of the open sketch on the shelf; null when it is not there. */
  readonly shelfName: string | null;
  /** Null until it was first looked at. */
  readonly shelf: Kept<readonly ShelfEntry[]> | null;
  readonly refused: RefusedSketch | null;
  /** What the sheet for pasted tables opens with. */
  readonly pasted: string;
}

export const deskStore = createStore<DeskState>(() => ({
  save: 'saved',
  shelfName: null,
  shelf: null,
  refused: null,
  pasted: '',
}));

/** Takes the list of faults off the screen. */
export const dismissRefused = (): void => deskStore.setState({ refused: null });
