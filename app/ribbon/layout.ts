import type { MeasureText } from '../board/measure.ts';
import type { Viewport } from '../board/viewport.ts';
import { xOf } from '../board/viewport.ts';
import type { Sight } from '../drawing/sight.ts';
import { formatLength } from '../ui/format.ts';
import type { Cell } from './cells.ts';
import { spread } from './spread.ts';

/** Height of the ribbon below the drawing, px. */
export const RIBBON_PX = 112;
/** Px from the ribbon's top to the dimension line. */
const LINE_PX = 34;
/** Px from the ribbon's top to the overall dimension's line, by how many rows of values hang above it. */
const OVERALL_PX = [92, 92, 106];
const VALUE_ABOVE_PX = 14;
/** Where values that are wider than their cell stand, below the line and staggered. */
const LEADER_ROWS_PX = [22, 40];
const MARK_PX = 14;
const ASIDE_PX = 10;
/** Least distance of texts from the sheet's edge. */
const EDGE_PX = 4;
/** Said of a dimension that parts cannot have. */
const CANNOT_BE_BUILT = 'cannot be built';

/** A text by its middle. */
export interface PlacedText {
  readonly text: string;
  readonly xPx: number;
  readonly yPx: number;
  readonly halfPx: number;
}

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
  /** Below the line: that the value holds at all positions or follows the focus; null without, or without room for it. */
  readonly mark: PlacedText | null;
  /** Below the line: that it cannot be built, where the value above the line does not say so itself. */
  readonly words: PlacedText | null;
}

export interface RibbonPlan {
  readonly topPx: number;
  readonly cells: readonly PlacedCell[];
  readonly overall: {
    readonly fromPx: number;
    readonly toPx: number;
    readonly linePx: number;
    readonly text: string;
    readonly textXPx: number;
  } | null;
}

/** A value before it has its place. */
interface Draft {
  readonly cell: Cell;
  readonly fromPx: number;
  readonly toPx: number;
  /** Middle of the piece that is on the sheet. */
  readonly middlePx: number;
  readonly text: string;
  readonly halfPx: number;
  readonly onLeader: boolean;
}

/** Something that hangs below the line. */
interface Hanging {
  readonly cell: Cell;
  readonly atPx: number;
  readonly halfPx: number;
}

interface Hung extends Hanging {
  readonly xPx: number;
  readonly row: number;
}

/**
 * The ribbon's places on screen: values above their line, those too wide for it on leaders below, in two rows in which none covers
 * another. The overall dimension gives way to the second row.
 */
export function ribbonPlan(cells: readonly Cell[], sight: Sight, measure: MeasureText): RibbonPlan {
  const { view, reading, scene } = sight;
  const { unit, digits } = reading.view;
  const topPx = view.heightPx;
  const linePx = topPx + LINE_PX;
  const drafts = draftsOf(cells, sight, measure);
  const wordsHalfPx = measure(CANNOT_BE_BUILT, 'label bad') / 2;
  const hung = hang(
    drafts.flatMap(({ cell, middlePx, halfPx, onLeader }): Hanging[] => {
      if (onLeader) return [{ cell, atPx: middlePx, halfPx }];
      return cell.bad ? [{ cell, atPx: middlePx, halfPx: wordsHalfPx }] : [];
    }),
    view.widthPx,
  );
  const placed = drafts.map((draft): PlacedCell => {
    const { cell, fromPx, toPx, text, halfPx, onLeader } = draft;
    const below = hung.find((one) => one.cell === cell);
    const belowPx = linePx + (LEADER_ROWS_PX[below?.row ?? 0] ?? 0);
    const isSaidBelow = !onLeader && below !== undefined;
    return {
      ...cell,
      fromPx,
      toPx,
      linePx,
      text,
      halfTextPx: halfPx,
      onLeader,
      textXPx: onLeader ? (below?.xPx ?? 0) : insideOf(draft, halfPx),
      textYPx: onLeader ? belowPx : linePx - VALUE_ABOVE_PX,
      mark: onLeader || isSaidBelow ? null : markOf(draft, hung, linePx, measure),
      words: isSaidBelow
        ? { text: CANNOT_BE_BUILT, xPx: below.xPx, yPx: belowPx, halfPx: wordsHalfPx }
        : null,
    };
  });
  const { imageMm } = scene.stage;
  if (imageMm === null || scene.parts.length < 2) return { topPx, cells: placed, overall: null };
  const rows = Math.max(0, ...hung.map(({ row }) => row + 1));
  const text = formatLength(imageMm, unit, digits);
  const track = { ...spanOf(0, imageMm, view), linePx: topPx + (OVERALL_PX[rows] ?? 0), text };
  const textXPx = insideOf(track, measure(text, 'value quiet') / 2);
  return { topPx, cells: placed, overall: { ...track, textXPx } };
}

/** A folded space is dimensioned from where its object is drawn. */
function spanOf(fromMm: number, toMm: number, view: Viewport) {
  const fromPx = xOf(view, fromMm);
  const toPx = xOf(view, toMm);
  const left = Math.min(fromPx, toPx);
  const right = Math.max(fromPx, toPx);
  const isSeen = right > 0 && left < view.widthPx;
  const middlePx = isSeen ? (Math.max(left, 0) + Math.min(right, view.widthPx)) / 2 : (left + right) / 2;
  return { fromPx, toPx, middlePx };
}

/** Where a text of this half width stands within its dimension: in the middle of what is on the sheet, but inside. */
function insideOf({ fromPx, toPx, middlePx }: Pick<Draft, 'fromPx' | 'toPx' | 'middlePx'>, halfPx: number) {
  const least = Math.min(fromPx, toPx) + halfPx + ASIDE_PX / 2;
  const most = Math.max(fromPx, toPx) - halfPx - ASIDE_PX / 2;
  return least > most ? (fromPx + toPx) / 2 : Math.min(most, Math.max(least, middlePx));
}

/** The values, on leaders where there is no room for them: the dimension is too short, or a reversed one lies there already. */
function draftsOf(cells: readonly Cell[], { view, reading }: Sight, measure: MeasureText): readonly Draft[] {
  const { unit, digits } = reading.view;
  const above: { readonly xPx: number; readonly halfPx: number }[] = [];
  return cells.map((cell): Draft => {
    const value = formatLength(cell.valueMm, unit, digits);
    const span = spanOf(cell.fromMm, cell.toMm, view);
    const halfPx = measure(value, 'value') / 2;
    const xPx = insideOf(span, halfPx);
    const isTaken = above.some((other) => Math.abs(other.xPx - xPx) < other.halfPx + halfPx + ASIDE_PX);
    if (!isTaken && Math.abs(span.toPx - span.fromPx) >= 2 * halfPx + ASIDE_PX) {
      above.push({ xPx, halfPx });
      return { cell, ...span, text: value, halfPx, onLeader: false };
    }
    const named = cell.kind === 'planes' ? `HH′ ${value}` : value;
    const text = cell.bad ? `${named} ${CANNOT_BE_BUILT}` : named;
    return { cell, ...span, text, halfPx: measure(text, 'value') / 2, onLeader: true };
  });
}

/** Places below the line, in the first row that is free or else in the one that ends first; what is off the sheet stays off it. */
function hang(hanging: readonly Hanging[], widthPx: number): readonly Hung[] {
  const isSeen = ({ atPx }: Hanging) => atPx >= 0 && atPx <= widthPx;
  const rowEnds = LEADER_ROWS_PX.map(() => Number.NEGATIVE_INFINITY);
  const rows = LEADER_ROWS_PX.map((): Hanging[] => []);
  for (const one of hanging.filter(isSeen).sort((a, b) => a.atPx - b.atPx)) {
    const leftPx = one.atPx - one.halfPx;
    const free = rowEnds.findIndex((end) => end <= leftPx);
    const row = free < 0 ? rowEnds.indexOf(Math.min(...rowEnds)) : free;
    rowEnds[row] = Math.max(leftPx, rowEnds[row] ?? leftPx) + 2 * one.halfPx + ASIDE_PX;
    rows[row]?.push(one);
  }
  const seen = rows.flatMap((inRow, row) => {
    const places = spread(inRow, ASIDE_PX, EDGE_PX, widthPx - EDGE_PX);
    return inRow.map((one, i) => ({ ...one, row, xPx: places[i] ?? one.atPx }));
  });
  const beside = hanging
    .filter((one) => !isSeen(one))
    .map((one) => {
      const { atPx, halfPx } = one;
      return { ...one, row: 0, xPx: atPx < 0 ? Math.min(atPx, -halfPx) : Math.max(atPx, widthPx + halfPx) };
    });
  return [...seen, ...beside];
}

/** The mark below the line: in the middle, or aside within the dimension where a value hangs in the middle. */
function markOf(
  draft: Draft,
  hung: readonly Hung[],
  linePx: number,
  measure: MeasureText,
): PlacedText | null {
  const { cell } = draft;
  const text = cell.kind === 'planes' ? 'HH′' : cell.follows ? 'follows focus' : cell.common ? '= all' : null;
  if (text === null) return null;
  const halfPx = measure(text, 'label quiet') / 2;
  const least = Math.min(draft.fromPx, draft.toPx) + halfPx + ASIDE_PX / 2;
  const most = Math.max(draft.fromPx, draft.toPx) - halfPx - ASIDE_PX / 2;
  const near = hung.filter(({ row }) => row === 0);
  const reach = (other: Hung) => other.halfPx + halfPx + ASIDE_PX;
  const middle = insideOf(draft, halfPx);
  const places = [middle, ...near.flatMap((other) => [other.xPx - reach(other), other.xPx + reach(other)])]
    .filter((xPx) => xPx >= least && xPx <= most)
    .filter((xPx) => near.every((other) => Math.abs(other.xPx - xPx) >= reach(other) - ROUNDING_PX))
    .sort((a, b) => Math.abs(a - middle) - Math.abs(b - middle));
  return places[0] === undefined ? null : { text, xPx: places[0], yPx: linePx + MARK_PX, halfPx };
}

/** Places that touch to within this do not overlap. */
const ROUNDING_PX = 1e-6;
