import type { Plot } from './plot.ts';
import type { Room } from './room.ts';

/** Where plots stand: how many in a row, and the room of each. */
export interface Grid {
  readonly columns: number;
  readonly room: Room;
}

const GAP = 18;
/** Least and greatest width of a plot with its axes, px. */
const LEAST = 156;
const MOST = 512;

/**
 * As many in a row as have room, spread so that rows are alike; `heightPx` is what one row has where all fit into one. Stems and strung
 * spots have a row of their own.
 */
export function gridOf(plots: readonly Plot[], widthPx: number, heightPx: number): Grid {
  const wide = plots.some((plot) => plot.kind === 'stems' || (plot.kind === 'spots' && plot.x !== null));
  if (wide) {
    const strung = plots.some((plot) => plot.kind === 'spots');
    return {
      columns: 1,
      room: { widthPx, heightPx: strung ? Math.round(Math.max(128, heightPx * 0.64)) : heightPx },
    };
  }
  const count = Math.max(1, plots.length);
  const fitting = Math.max(1, Math.floor((widthPx + GAP) / (LEAST + GAP)));
  const rows = Math.ceil(count / Math.min(fitting, count));
  const columns = Math.ceil(count / rows);
  const share = (widthPx - GAP * (columns - 1)) / columns;
  return { columns, room: { widthPx: Math.min(MOST, Math.floor(share)), heightPx } };
}

export const GRID_GAP_PX = GAP;
