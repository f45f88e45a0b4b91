import type { MeasureText } from '../board/measure.ts';
import type { Plot } from './plot.ts';

/** Screen x (px of the plot) of a length on the drawing, z in mm from the first surface. */
export type LengthAxis = (zMm: number) => number;

/** The room of one plot, px. */
export interface Room {
  readonly widthPx: number;
  readonly heightPx: number;
}

/** What a plot is drawn with besides itself. */
export interface DrawnWith {
  readonly measure: MeasureText;
  /** The stop that is read; null when nothing is. */
  readonly cursor: number | null;
  /** The same plot as it was kept, drawn faintly under it. */
  readonly reference: Plot | null;
  /** Where the drawing shows a length. */
  readonly axis: LengthAxis;
}
