import type { Analysis } from '../paraxial/analyse.ts';
import type { Position } from '../sketch/types.ts';
import type { PrintedLayout } from './printed.ts';
import type { Cell, Column } from './table.ts';

/** One position of the sketch, worked out: what the cells of its row are read from. */
export interface PositionSheet {
  readonly position: Position;
  readonly analysis: Analysis;
  readonly printed: PrintedLayout;
}

/** A column of the block of positions with the way to read its cells. */
export interface ColumnSpec {
  readonly column: Column;
  readonly cellOf: (sheet: PositionSheet) => Cell;
}
