import { canvasPen } from '../board/canvasPen.ts';
import { canvasMeasure } from '../board/measure.ts';
import type { Pen } from '../board/pen.ts';
import { PALETTES, type ThemeName } from '../board/styles.ts';
import type { PlotSet } from './csv.ts';
import { drawPlot } from './draw.ts';
import { drawLegend } from './drawLegend.ts';
import { GRID_GAP_PX, type Grid, gridOf } from './grid.ts';
import { legendOf } from './legend.ts';
import type { Plot } from './plot.ts';
import { createPlotCell, fitCanvas, type PlotCell } from './plotCell.ts';
import { hasReference, referenceOf } from './references.ts';
import type { LengthAxis } from './room.ts';

/** What the grid asks of the app around it. */
export interface GridClient {
  readonly theme: () => ThemeName;
  /** Screen x in the window of a length on the drawing. */
  readonly lengthX: (zMm: number) => number;
  /** A surface is pointed at, or none any more. */
  readonly onSurface: (surface: number | null) => void;
  /** A surface is chosen. */
  readonly onChoose: (surface: number) => void;
}

export interface PlotGrid {
  readonly show: (sets: readonly PlotSet[]) => void;
  readonly repaint: () => void;
  readonly sets: () => readonly PlotSet[];
  /** What an export needs to draw the same. */
  readonly layout: () => {
    readonly grid: Grid;
    readonly axis: LengthAxis;
    readonly measure: ReturnType<typeof canvasMeasure>['measure'];
  };
  readonly destroy: () => void;
}

/** Bounds of the height of a row of plots, px; between them a row fills what is in view. */
const ROW = { least: 186, most: 248 } as const;

/** Shows plots in `host`, each on its own canvas that can be read by pointer and keys, and their legend on `legend`. */
export function createPlotGrid(host: HTMLElement, legend: HTMLCanvasElement, client: GridClient): PlotGrid {
  let sets: readonly PlotSet[] = [];
  let grid: Grid = { columns: 1, room: { widthPx: 0, heightPx: ROW.least } };
  let shape = '';
  const cells: PlotCell[] = [];
  const context = legend.getContext('2d') as CanvasRenderingContext2D;
  const { measure, forget } = canvasMeasure(context);
  const axis: LengthAxis = (zMm) => client.lengthX(zMm) - host.getBoundingClientRect().left;

  const gridNow = (): Grid => {
    const body = host.closest('[data-plots-room]');
    const headPx = legend.closest('.plots-head')?.getBoundingClientRect().height ?? 0;
    const heightPx = Math.floor((body?.clientHeight ?? 0) - headPx - 18);
    return gridOf(sets[0]?.plots ?? [], host.clientWidth, Math.min(ROW.most, Math.max(ROW.least, heightPx)));
  };

  const show = (next: readonly PlotSet[]) => {
    sets = next;
    grid = gridNow();
    const nextShape = shapeOf(next);
    if (nextShape !== shape) {
      shape = nextShape;
      build();
    }
    repaint();
  };

  /** The elements, in the order of the plots; made anew only when other plots are shown. */
  const build = () => {
    const focused = cells.find(({ element }) => element === document.activeElement)?.id;
    for (const cell of cells) cell.destroy();
    cells.length = 0;
    host.replaceChildren();
    for (const { position, plots } of sets) {
      if (position !== '') host.append(headOf(position));
      for (const plot of plots) {
        const id = `${position}\n${plot.key}`;
        const cell = createPlotCell(id, {
          onCursor: (stop) => plot.kind === 'stems' && client.onSurface(stop),
          onChoose: (stop) => plot.kind === 'stems' && client.onChoose(stop),
          repaint: () => paintCell(cell),
        });
        cells.push(cell);
        host.append(cell.element);
        if (id === focused) cell.element.focus();
      }
    }
  };

  const plotAt = (index: number): { readonly position: string; readonly plot: Plot } | null => {
    let left = index;
    for (const { position, plots } of sets) {
      const plot = plots[left];
      if (plot) return { position, plot };
      left -= plots.length;
    }
    return null;
  };

  const paintCell = (cell: PlotCell) => {
    const found = plotAt(cells.indexOf(cell));
    if (!found) return;
    const { plot, position } = found;
    const reference = referenceOf(position, plot);
    const leftPx = cell.element.getBoundingClientRect().left;
    const own: LengthAxis = (zMm) => client.lengthX(zMm) - leftPx;
    cell.show(plot, grid.room, own, (ctx, cursor) => {
      const pen = canvasPen(ctx, PALETTES[client.theme()], devicePixelRatio);
      drawPlot(pen, plot, grid.room, { measure, cursor, reference, axis: own });
    });
  };

  const repaint = () => {
    host.style.gridTemplateColumns = `repeat(${grid.columns}, ${grid.room.widthPx}px)`;
    host.style.columnGap = `${GRID_GAP_PX}px`;
    for (const cell of cells) paintCell(cell);
    paintLegend();
  };

  const paintLegend = () => {
    const entries = legendOf(
      sets.flatMap(({ plots }) => plots),
      hasReference(sets),
    );
    const widthPx = legend.parentElement?.clientWidth ?? 0;
    const heightPx = drawLegend(NOTHING, entries, widthPx, measure);
    fitCanvas(legend, { widthPx, heightPx });
    context.setTransform(devicePixelRatio, 0, 0, devicePixelRatio, 0, 0);
    context.clearRect(0, 0, widthPx, heightPx);
    const pen = canvasPen(context, PALETTES[client.theme()], devicePixelRatio);
    drawLegend(pen, entries, widthPx, measure);
    legend.setAttribute('aria-label', `Legend: ${entries.map(({ name }) => name).join(', ')}`);
    legend.hidden = entries.length === 0;
  };

  const observer = new ResizeObserver(() => {
    grid = gridNow();
    repaint();
  });
  observer.observe(host);
  document.fonts.ready.then(() => {
    forget();
    repaint();
  });

  return {
    show,
    repaint,
    sets: () => sets,
    layout: () => ({ grid, axis, measure }),
    destroy() {
      observer.disconnect();
      for (const cell of cells) cell.destroy();
      host.replaceChildren();
    },
  };
}

/** What decides which elements there are. */
const shapeOf = (sets: readonly PlotSet[]): string =>
  sets
    .map(({ position, plots }) => [position, ...plots.map(({ key, kind }) => `${key} ${kind}`)].join('\n'))
    .join('\n\n');

function headOf(position: string): HTMLElement {
  const head = document.createElement('h3');
  head.className = 'plots-position';
  head.textContent = position;
  return head;
}

const nothing = () => {};
const NOTHING: Pen = {
  polyline: nothing,
  polylines: nothing,
  closed: nothing,
  circle: nothing,
  text: nothing,
  group: nothing,
  clipped: nothing,
};
