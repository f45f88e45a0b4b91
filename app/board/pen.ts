import type { MarkStyle, TextStyle } from './styles.ts';

/** Points as x, y, x, y … in screen px. */
export type Flat = ArrayLike<number>;

export interface TextPlace {
  readonly align?: 'left' | 'centre' | 'right';
  readonly baseline?: 'top' | 'middle' | 'alphabetic' | 'bottom';
  /** Whether the text wears a thin rim of the sheet's colour. Default true. */
  readonly halo?: boolean;
  /** Turn about the text's own point, radians, clockwise on screen. */
  readonly turnRad?: number;
}

export type ClipShape =
  | { readonly kind: 'disc'; readonly xPx: number; readonly yPx: number; readonly radiusPx: number }
  | {
      readonly kind: 'box';
      readonly xPx: number;
      readonly yPx: number;
      readonly widthPx: number;
      readonly heightPx: number;
    };

/**
 * What layers draw to, in screen px and by the name of a style. The canvas, the SVG file and the test recorder are
 * three pens, so what is exported is what was seen.
 */
export interface Pen {
  /** One open line through `points`. */
  polyline(points: Flat, style: MarkStyle): void;
  /** Many open lines of one style at once: line i runs from point `starts[i]` to before point `starts[i + 1]`. */
  polylines(points: Flat, starts: ArrayLike<number>, style: MarkStyle): void;
  /** A closed outline, filled where the style has a fill. */
  closed(points: Flat, style: MarkStyle): void;
  circle(xPx: number, yPx: number, radiusPx: number, style: MarkStyle): void;
  text(xPx: number, yPx: number, text: string, style: TextStyle, place?: TextPlace): void;
  /** Everything `draw` draws, kept together under a name. */
  group(name: string, draw: () => void): void;
  /** Everything `draw` draws, seen only inside `shape`. */
  clipped(shape: ClipShape, draw: () => void): void;
}

/** One straight line from (x1, y1) to (x2, y2). */
export function segment(pen: Pen, x1: number, y1: number, x2: number, y2: number, style: MarkStyle): void {
  pen.polyline([x1, y1, x2, y2], style);
}

/** An upright or level rectangle by its corner and size. */
export function box(
  pen: Pen,
  xPx: number,
  yPx: number,
  widthPx: number,
  heightPx: number,
  style: MarkStyle,
): void {
  pen.closed([xPx, yPx, xPx + widthPx, yPx, xPx + widthPx, yPx + heightPx, xPx, yPx + heightPx], style);
}
