import type { MeasureText } from '../board/measure.ts';
import { type Pen, segment } from '../board/pen.ts';
import { drawSign } from './drawSpots.ts';
import type { LegendEntry } from './legend.ts';

const ROW = 20;
/** Width of the sign of a line, and of a stem or a dot. */
const SIGN = { line: 26, other: 12 } as const;

/** Draws the entries in rows no wider than `widthPx`, from (0, 0); returns the height they take, px. */
export function drawLegend(
  pen: Pen,
  entries: readonly LegendEntry[],
  widthPx: number,
  measure: MeasureText,
): number {
  let [x, row] = [0, 0];
  for (const { name, style, sign } of entries) {
    const wide = sign === 'line' ? SIGN.line : SIGN.other;
    const width = wide + 6 + measure(name, 'label quiet');
    if (x > 0 && x + width > widthPx) [x, row] = [0, row + 1];
    const y = ROW * row + ROW / 2;
    if (sign === 'line') segment(pen, x, y, x + wide, y, style);
    else if (sign === 'stem') {
      segment(pen, x + wide / 2, y + 6, x + wide / 2, y - 6, style);
      pen.circle(x + wide / 2, y - 6, 2, 'ink');
    } else drawSign(pen, sign, x + wide / 2, y);
    pen.text(x + wide + 6, y, name, 'label quiet', { baseline: 'middle', halo: false });
    x += width + 20;
  }
  return entries.length === 0 ? 0 : ROW * (row + 1);
}
