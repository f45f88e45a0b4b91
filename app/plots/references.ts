import { createStore } from 'zustand/vanilla';
import type { PlotSet } from './csv.ts';
import type { Plot } from './plot.ts';

/** Plots kept to compare with, by position and key, until they are dropped or the page is left. */
const store = createStore<{ readonly kept: ReadonlyMap<string, Plot> }>(() => ({ kept: new Map() }));

export const referenceStore = store;

const nameOf = (position: string, key: string): string => `${position}\n${key}`;

/** Keeps what these plots show now. */
export function keepReference(sets: readonly PlotSet[]): void {
  const kept = new Map(store.getState().kept);
  for (const { position, plots } of sets)
    for (const plot of plots) if (plot.kind !== 'empty') kept.set(nameOf(position, plot.key), plot);
  store.setState({ kept });
}

/** Drops what is kept of these plots. */
export function dropReference(sets: readonly PlotSet[]): void {
  const kept = new Map(store.getState().kept);
  for (const { position, plots } of sets) for (const { key } of plots) kept.delete(nameOf(position, key));
  store.setState({ kept });
}

/** What was kept of a plot. */
export const referenceOf = (position: string, { key }: Plot): Plot | null =>
  store.getState().kept.get(nameOf(position, key)) ?? null;

/** Whether anything is kept of these plots. */
export const hasReference = (sets: readonly PlotSet[]): boolean =>
  sets.some(({ position, plots }) => plots.some((plot) => referenceOf(position, plot) !== null));
