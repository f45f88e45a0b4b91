import type { MeasureText } from '../board/measure.ts';
import type { Pen } from '../board/pen.ts';
import { drawCurves } from './drawCurves.ts';
import { drawSpots } from './drawSpots.ts';
import { drawStems } from './drawStems.ts';
import type { Plot } from './plot.ts';
import type { DrawnWith, Room } from './room.ts';

/** Draws a plot from its upper left corner at (0, 0). */
export function drawPlot(pen: Pen, plot: Plot, room: Room, how: DrawnWith): void {
  if (plot.kind === 'curves') drawCurves(pen, plot, room, how);
  else if (plot.kind === 'spots') drawSpots(pen, plot, room, how);
  else if (plot.kind === 'stems') drawStems(pen, plot, room, how);
  else drawWords(pen, plot.title, plot.sentence, room, how.measure);
}

/** A plot that has nothing to show: its title and why. */
function drawWords(pen: Pen, title: string, sentence: string, { widthPx }: Room, measure: MeasureText): void {
  pen.text(0, 4, title, 'label strong', { baseline: 'top', halo: false });
  for (const [line, text] of wrapped(sentence, widthPx - 12, measure).entries())
    pen.text(0, 28 + 17 * line, text, 'label quiet', { baseline: 'top', halo: false });
}

/** The words in lines that are no wider than `widthPx`, as far as single words allow. */
export function wrapped(text: string, widthPx: number, measure: MeasureText): readonly string[] {
  const lines: string[] = [];
  for (const word of text.split(' ')) {
    const last = lines.at(-1);
    const longer = `${last} ${word}`;
    if (last !== undefined && measure(longer, 'label quiet') <= widthPx) lines[lines.length - 1] = longer;
    else lines.push(word);
  }
  return lines;
}
