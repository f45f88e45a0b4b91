import type { Pen } from '../board/pen.ts';
import { segment } from '../board/pen.ts';
import type { MarkStyle, TextStyle } from '../board/styles.ts';
import type { Viewport } from '../board/viewport.ts';
import { yOf } from '../board/viewport.ts';
import type { PlacedCell, PlacedText, RibbonPlan } from './layout.ts';

const TICK_PX = 5;
const HATCH_PX = 6;

/**
 * The dimension lines after ISO 129-1: oblique ticks, values above the line, the overall dimension below. A gap that cannot be built
 * is drawn reversed and hatched.
 */
export function ribbonLayer(pen: Pen, plan: RibbonPlan, view: Viewport, hovered: string | null): void {
  const { cells, overall } = plan;
  const strong = dimensionsOf(hovered, cells);
  const isHovered = ({ id }: PlacedCell) => strong.includes(id);
  for (const cell of cells) drawLine(pen, cell, view, isHovered(cell));
  for (const cell of cells) drawTexts(pen, cell, isHovered(cell));
  if (!overall) return;
  const { fromPx, toPx, linePx, textXPx } = overall;
  segment(pen, fromPx, linePx, toPx, linePx, 'dimension quiet');
  for (const x of [fromPx, toPx]) tick(pen, x, linePx, 'dimension quiet');
  pen.text(textXPx, linePx - 4, overall.text, 'value quiet', { align: 'centre', baseline: 'bottom' });
}

/** The dimensions that a grip has to do with: its own value, or the two beside what it moves. */
function dimensionsOf(grip: string | null, cells: readonly PlacedCell[]): readonly string[] {
  const [kind = '', of = ''] = grip?.split(':') ?? [];
  if (kind === 'cell') return [(grip ?? '').slice('cell:'.length)];
  if (kind === 'thickness') return [grip ?? ''];
  if (kind === 'object') return ['object'];
  if (kind === 'image') return cells.slice(-1).map(({ id }) => id);
  if (!MOVES_PART.has(kind)) return [];
  const behind = cells.findIndex(({ id }) => id === `gap:${of}`);
  const first = cells.findIndex(({ after }) => after === of);
  return [cells[first - 1], cells[behind]].flatMap((cell) => cell?.id ?? []);
}

const MOVES_PART: ReadonlySet<string> = new Set(['part', 'tick', 'label']);

function drawLine(pen: Pen, cell: PlacedCell, view: Viewport, hovered: boolean): void {
  const { fromPx, toPx, linePx } = cell;
  const style: MarkStyle = cell.bad ? 'dimension bad' : hovered ? 'dimension hover' : 'dimension';
  for (const x of [fromPx, toPx]) {
    segment(pen, x, Math.min(linePx - 26, view.heightPx), x, linePx + TICK_PX, 'dimension quiet');
    tick(pen, x, linePx, 'dimension tick');
  }
  segment(pen, fromPx, linePx, toPx, linePx, style);
  if (cell.bad) hatch(pen, cell, view);
  if (cell.onLeader) segment(pen, (fromPx + toPx) / 2, linePx, cell.textXPx, cell.textYPx - 8, 'leader');
}

/** Texts come after all lines, so that a leader passes behind the values above it. */
function drawTexts(pen: Pen, cell: PlacedCell, hovered: boolean): void {
  const value: TextStyle = cell.bad
    ? 'value bad'
    : cell.follows || cell.kind === 'planes'
      ? 'value quiet'
      : hovered
        ? 'value strong'
        : 'value';
  pen.text(cell.textXPx, cell.textYPx, cell.text, value, { align: 'centre', baseline: 'middle' });
  if (cell.words) drawText(pen, cell.words, 'label bad');
  if (cell.mark) drawText(pen, cell.mark, 'label quiet');
}

function drawText(pen: Pen, { text, xPx, yPx }: PlacedText, style: TextStyle): void {
  pen.text(xPx, yPx, text, style, { align: 'centre', baseline: 'middle' });
}

function tick(pen: Pen, x: number, y: number, style: MarkStyle): void {
  segment(pen, x - TICK_PX, y + TICK_PX, x + TICK_PX, y - TICK_PX, style);
}

/** Strokes along the piece of the dimension that is on the sheet: under deep zoom the whole would be millions. */
function hatch(pen: Pen, { fromPx, toPx, linePx }: PlacedCell, view: Viewport): void {
  const left = Math.max(-HATCH_PX, Math.min(fromPx, toPx));
  const right = Math.min(view.widthPx + HATCH_PX, Math.max(fromPx, toPx));
  for (let x = left; x < right; x += HATCH_PX)
    segment(pen, x, linePx + 8, Math.min(x + HATCH_PX, right), linePx + 2, 'hatch');
}

/** Hairlines from the parts down to the ribbon. */
export function extensionLines(pen: Pen, plan: RibbonPlan, view: Viewport): void {
  const top = yOf(view, 0) + 20;
  const seen = new Set<number>();
  for (const cell of plan.cells) {
    for (const x of [cell.fromPx, cell.toPx]) {
      if (seen.has(x)) continue;
      seen.add(x);
      segment(pen, x, Math.max(top, plan.topPx - 26), x, plan.topPx + 8, 'grid');
    }
  }
}
