import type { MeasureText } from '../board/measure.ts';
import type { ClipShape, Flat, Pen } from '../board/pen.ts';
import { PALETTES } from '../board/styles.ts';
import { svgPen } from '../board/svgPen.ts';
import type { PlotSet } from './csv.ts';
import { drawPlot } from './draw.ts';
import { drawLegend } from './drawLegend.ts';
import { GRID_GAP_PX, type Grid } from './grid.ts';
import { legendOf } from './legend.ts';
import { hasReference, referenceOf } from './references.ts';
import type { LengthAxis } from './room.ts';

const MARGIN = 16;
const TITLE = 26;

interface SheetOfPlots {
  readonly title: string;
  readonly sets: readonly PlotSet[];
  readonly grid: Grid;
  readonly axis: LengthAxis;
  readonly measure: MeasureText;
}

/** The plots as they stand, on paper, with their legend: an SVG file's text. */
export function plotsSvg({ title, sets, grid, axis, measure }: SheetOfPlots): string {
  const { columns, room } = grid;
  const widthPx = 2 * MARGIN + columns * room.widthPx + (columns - 1) * GRID_GAP_PX;
  const places: { readonly x: number; readonly y: number }[] = [];
  let y = MARGIN + TITLE + 48;
  const heads: number[] = [];
  for (const { position, plots } of sets) {
    heads.push(y);
    if (position !== '') y += TITLE;
    for (const [i] of plots.entries())
      places.push({
        x: MARGIN + (i % columns) * (room.widthPx + GRID_GAP_PX),
        y: y + Math.floor(i / columns) * room.heightPx,
      });
    y += Math.ceil(plots.length / columns) * room.heightPx;
  }
  const palette = PALETTES.paper;
  const pen = svgPen({ widthPx, heightPx: y + MARGIN, title, palette });
  pen.text(MARGIN, MARGIN, title, 'label strong', { baseline: 'top' });
  const entries = legendOf(
    sets.flatMap(({ plots }) => plots),
    hasReference(sets),
  );
  drawLegend(shifted(pen, MARGIN, MARGIN + TITLE), entries, widthPx - 2 * MARGIN, measure);
  let next = 0;
  for (const [index, { position, plots }] of sets.entries()) {
    if (position !== '') pen.text(MARGIN, heads[index] ?? 0, position, 'label strong', { baseline: 'top' });
    for (const plot of plots) {
      const place = places[next++] ?? { x: 0, y: 0 };
      const reference = referenceOf(position, plot);
      drawPlot(shifted(pen, place.x, place.y), plot, room, { measure, cursor: null, reference, axis });
    }
  }
  return pen.document();
}

/** A pen whose (0, 0) lies at (dx, dy) of `pen`. */
function shifted(pen: Pen, dx: number, dy: number): Pen {
  const moved = (points: Flat): Float64Array =>
    Float64Array.from(points, (value, i) => value + (i % 2 === 0 ? dx : dy));
  const movedShape = (shape: ClipShape): ClipShape => ({
    ...shape,
    xPx: shape.xPx + dx,
    yPx: shape.yPx + dy,
  });
  return {
    polyline: (points, style) => pen.polyline(moved(points), style),
    polylines: (points, starts, style) => pen.polylines(moved(points), starts, style),
    closed: (points, style) => pen.closed(moved(points), style),
    circle: (x, y, radius, style) => pen.circle(x + dx, y + dy, radius, style),
    text: (x, y, text, style, place) => pen.text(x + dx, y + dy, text, style, place),
    group: (name, draw) => pen.group(name, draw),
    clipped: (shape, draw) => pen.clipped(movedShape(shape), draw),
  };
}
