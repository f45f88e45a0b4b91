import { useSyncExternalStore } from 'react';
import type { Analysis, Setting, Sketch, Warning } from '../../engine/index.ts';
import { sketchStore } from '../store/sketchStore.ts';
import type { View } from '../store/viewStore.ts';
import { settingIn, viewStore } from '../store/viewStore.ts';
import { analysisOf, warningsAt } from './analysis.ts';
import { type Exact, exactOf } from './exact.ts';
import { frameLoop } from './frame.ts';

/** What everything on screen is read from. The analysis is worked out when first asked for. */
export interface Reading {
  readonly sketch: Sketch;
  readonly view: View;
  readonly setting: Setting;
  readonly analysis: Analysis;
  readonly exact: Exact;
  readonly warnings: readonly Warning[];
}

let last: Reading | null = null;

/** The sketch, the view and their analysis as they stand now; the same object until one of them changes. */
export function currentReading(): Reading {
  const { sketch } = sketchStore.getState();
  const view = viewStore.getState();
  if (last?.sketch === sketch && last.view === view) return last;
  const setting = settingIn(sketch, view);
  last = {
    sketch,
    view,
    setting,
    get analysis() {
      return analysisOf(sketch, setting);
    },
    get exact() {
      return exactOf(sketch, setting);
    },
    get warnings() {
      return warningsAt(sketch, setting);
    },
  };
  return last;
}

const readers = new Set<() => void>();
const wake = () =>
  frameLoop.ask('draw', 'readers', () => {
    for (const reader of [...readers]) reader();
  });
sketchStore.subscribe(wake);
viewStore.subscribe(wake);

/** Calls `reader` once in every frame in which the sketch or the view has changed; returns the way to stop. */
export function onReading(reader: () => void): () => void {
  readers.add(reader);
  return () => readers.delete(reader);
}

/**
 * What `select` reads from the present state. The component renders only when the result changes, so select a formatted
 * text or an object that is kept by identity, never a fresh one.
 */
export function useReading<T>(select: (reading: Reading) => T): T {
  return useSnapshot(onReading, select);
}

/**
 * As `useReading`, but in the very moment of the change. It is for what a control shows: React puts a changed control back to
 * what was last rendered, so by the next frame it would be seen to go back and forth.
 */
export function useReadingNow<T>(select: (reading: Reading) => T): T {
  return useSnapshot(onChange, select);
}

function useSnapshot<T>(subscribe: (reader: () => void) => () => void, select: (reading: Reading) => T): T {
  const read = () => select(currentReading());
  return useSyncExternalStore(subscribe, read, read);
}

/** Calls `reader` at every change of the sketch or the view; returns the way to stop. */
function onChange(reader: () => void): () => void {
  const stops = [sketchStore.subscribe(reader), viewStore.subscribe(reader)];
  return () => {
    for (const stop of stops) stop();
  };
}
