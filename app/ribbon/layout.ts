import type { MeasureText } from '../board/measure.ts';
import type { Viewport } from '../board/viewport.ts';
import { xOf } from '../board/viewport.ts';
import type { Sight } from '../drawing/sight.ts';
import { formatLength } from '../ui/format.ts';
import type { Cell } from './cells.ts';

/** Height of the ribbon below the drawing, px. */
export const RIBBON_PX = 112;
/** Px from the ribbon's top to the dimension line, and to the overall dimension's line. */
const LINE_PX = 34;
const OVERALL_PX = 92;
const VALUE_ABOVE_PX = 7;
/** Where values that are wider than their cell stand, below the line and staggered. */
const LEADER_ROWS_PX = [22, 40];
const ASIDE_PX = 10;
/** Said of a dimension that parts cannot have. */
export const CANNOT_BE_BUILT = 'cannot be built';

/** A cell with its place on screen. */
export interface PlacedCell extends Cell {
  readonly fromPx: number;
  readonly toPx: number;
  readonly linePx: number;
  readonly text: string;
  /** Middle of the value's text. */
  readonly textXPx: number;
  readonly textYPx: number;
  readonly halfTextPx: number;
  /** The value stands below the line on a leader. */
  readonly onLeader: boolean;
}

export interface RibbonPlan {
  readonly topPx: number;
  readonly cells: readonly PlacedCell[];
  readonly overall: {
    readonly fromPx: number;
    readonly toPx: number;
    readonly linePx: number;
    readonly text: string;
  } | null;
}

/**
 * The ribbon's places on screen: values above their line, those too wide below it on leaders, in the first row that is free or else
 * pushed aside in the one that ends first.
 */
export function ribbonPlan(cells: readonly Cell[], sight: Sight, measure: MeasureText): RibbonPlan {
  const { view, reading, scene } = sight;
  const topPx = view.heightPx;
  const linePx = topPx + LINE_PX;
  const { unit, digits } = reading.view;
  const rowEnds = LEADER_ROWS_PX.map(() => Number.NEGATIVE_INFINITY);
  const placed = cells.map((cell): PlacedCell => {
    const value = formatLength(cell.valueMm, unit, digits);
    const [fromPx, toPx] = ends(cell, view);
    const middle = (fromPx + toPx) / 2;
    const onLeader = Math.abs(toPx - fromPx) < measure(value, 'value') + ASIDE_PX;
    const text = onLeader && cell.bad ? `${value} ${CANNOT_BE_BUILT}` : value;
    const halfTextPx = measure(text, 'value') / 2;
    const base = { ...cell, fromPx, toPx, linePx, text, halfTextPx, onLeader };
    if (!onLeader) return { ...base, textXPx: middle, textYPx: linePx - VALUE_ABOVE_PX - 7 };
    const leftPx = middle - halfTextPx;
    const free = rowEnds.findIndex((end) => end <= leftPx);
    const row = free < 0 ? rowEnds.indexOf(Math.min(...rowEnds)) : free;
    const textXPx = Math.max(leftPx, rowEnds[row] ?? leftPx) + halfTextPx;
    rowEnds[row] = textXPx + halfTextPx + ASIDE_PX;
    return { ...base, textXPx, textYPx: linePx + (LEADER_ROWS_PX[row] ?? 0) };
  });
  const { imageMm } = scene.stage;
  const first = scene.parts[0];
  const overall =
    first && imageMm !== null && scene.parts.length > 1
      ? {
          fromPx: xOf(view, 0),
          toPx: xOf(view, imageMm),
          linePx: topPx + OVERALL_PX,
          text: formatLength(imageMm, unit, digits),
        }
      : null;
  return { topPx, cells: placed, overall };
}

/** A folded space is dimensioned from where its object is drawn. */
function ends(cell: Cell, view: Viewport): readonly [number, number] {
  return [xOf(view, cell.fromMm), xOf(view, cell.toMm)];
}

/** Least width of a cell that has room for its mark, px. */
const MARKED_PX = 60;

/** What stands under a cell's line: that its value holds at all positions, or follows the focus; null for nothing. */
export function markText(cell: PlacedCell): string | null {
  if (cell.onLeader || cell.bad || Math.abs(cell.toPx - cell.fromPx) < MARKED_PX) return null;
  return cell.follows ? 'follows focus' : cell.common ? '= all' : null;
}

/** Where the mark's middle stands. */
export const markPlace = (cell: PlacedCell): { readonly xPx: number; readonly yPx: number } => ({
  xPx: (cell.fromPx + cell.toPx) / 2,
  yPx: cell.linePx + 14,
});
