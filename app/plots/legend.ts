import type { MarkStyle } from '../board/styles.ts';
import type { Dots, Plot } from './plot.ts';

/** One sign that plots use, and what it stands for. */
export interface LegendEntry {
  readonly name: string;
  readonly style: MarkStyle;
  readonly sign: Dots['line'] | 'line' | 'stem';
}

/** The signs of these plots, each once: the dash or dot by its word. Fields keep their colour to themselves, as their plots bear their names. */
export function legendOf(plots: readonly Plot[], hasReference: boolean): readonly LegendEntry[] {
  const entries = new Map<string, LegendEntry>();
  const add = (entry: LegendEntry) => {
    if (!entries.has(entry.name)) entries.set(entry.name, entry);
  };
  for (const plot of plots) {
    if (plot.kind === 'curves' && plot.curves.length > 1)
      for (const { name, style } of plot.curves) add({ name, style: neutral(style), sign: 'line' });
    if (plot.kind === 'spots') {
      for (const { dots } of plot.spots)
        for (const { name, line } of dots) add({ name, style: 'dots ink', sign: line });
      if (plot.airy !== null) add({ name: 'Airy circle', style: 'Airy disc', sign: 'line' });
    }
    if (plot.kind === 'stems') {
      add({ name: 'what a surface adds', style: 'curve ink main', sign: 'stem' });
      add({ name: 'sum so far', style: 'curve quiet main', sign: 'line' });
    }
  }
  if (hasReference) add({ name: 'reference', style: 'curve reference', sign: 'line' });
  return [...entries.values()];
}

/** The look of a line whichever field it belongs to. */
const neutral = (style: MarkStyle): MarkStyle =>
  style.replace(/^curve (axial|field inner|field middle|field outer) /, 'curve ink ') as MarkStyle;
