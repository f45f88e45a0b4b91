import { fontOf, type TextStyle, textLook } from './styles.ts';

/** Width of a text in a style, px. */
export type MeasureText = (text: string, style: TextStyle) => number;

/** Widths of texts kept at most, before the memory is emptied. */
const KEPT = 4000;

/** Measures with a canvas and remembers; call `forget` when the type face has arrived. */
export function canvasMeasure(ctx: Pick<CanvasRenderingContext2D, 'font' | 'measureText'>): {
  readonly measure: MeasureText;
  readonly forget: () => void;
} {
  const known = new Map<string, number>();
  return {
    measure(text, style) {
      const key = `${style}\n${text}`;
      const before = known.get(key);
      if (before !== undefined) return before;
      ctx.font = fontOf(style);
      const width = ctx.measureText(text).width;
      if (known.size >= KEPT) known.clear();
      known.set(key, width);
      return width;
    },
    forget: () => known.clear(),
  };
}

/** A width from the number of characters, for where there is no canvas. */
export const roughMeasure: MeasureText = (text, style) =>
  Array.from(text).length * textLook(style).sizePx * 0.5;
