import type { MeasureText } from '../board/measure.ts';
import { type Pen, segment } from '../board/pen.ts';
import { formatNumber } from '../ui/format.ts';
import { type Axis, axisText } from './plot.ts';
import type { PlotReading } from './read.ts';
import type { Room } from './room.ts';
import { pxScale, ticksOf } from './scale.ts';

/** The area of a plot inside its labels, px. */
export interface Area {
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly bottom: number;
}

const LEFT = 48;
const RIGHT = 12;
const TOP = 46;
const BOTTOM = 36;

/** The area of a plot with a title, the name of its upright axis below it, and a level axis. */
export const areaOf = ({ widthPx, heightPx }: Room): Area => ({
  left: LEFT,
  right: widthPx - RIGHT,
  top: TOP,
  bottom: heightPx - BOTTOM,
});

/** The title of a plot, what its upright axis shows, and quiet words beside them. */
export function drawHead(
  pen: Pen,
  title: string,
  below: string,
  notes: readonly string[],
  measure: MeasureText,
): void {
  pen.text(0, 4, title, 'label strong', { baseline: 'top' });
  pen.text(0, 22, below, 'label quiet', { baseline: 'top' });
  if (notes.length > 0)
    pen.text(measure(below, 'label quiet') + 12, 22, notes.join(', '), 'label quiet', { baseline: 'top' });
}

/** Hairlines at round values with their numbers left of them, and a firmer line at zero. */
export function drawUpright(pen: Pen, axis: Axis, area: Area): void {
  const y = pxScale(axis, area.bottom, area.top);
  const { values, digits } = ticksOf(axis, area.bottom - area.top, 30);
  for (const value of values) {
    segment(pen, area.left, y(value), area.right, y(value), value === 0 ? 'curve quiet' : 'grid');
    pen.text(area.left - 6, y(value), formatNumber(value, digits), 'label quiet', {
      align: 'right',
      baseline: 'middle',
      halo: false,
    });
  }
}

/** Short ticks with their numbers below the area, and the name of the axis. */
export function drawLevel(pen: Pen, axis: Axis, area: Area): void {
  const x = pxScale(axis, area.left, area.right);
  const lengthPx = area.right - area.left;
  // A narrow plot still has both ends and the middle.
  const { values, digits } = ticksOf(axis, lengthPx, Math.max(30, Math.min(60, lengthPx / 2)));
  for (const value of values) {
    segment(pen, x(value), area.bottom, x(value), area.bottom + 4, 'leader');
    pen.text(x(value), area.bottom + 5, formatNumber(value, digits), 'label quiet', {
      align: 'centre',
      baseline: 'top',
      halo: false,
    });
  }
  if (axis.from < 0 && axis.to > 0) segment(pen, x(0), area.top, x(0), area.bottom, 'grid');
  pen.text(area.right, area.bottom + 20, axisText(axis), 'label quiet', {
    align: 'right',
    baseline: 'top',
    halo: false,
  });
}

/** The values that are read, in lines beside `xPx`, on the side with more room. */
export function drawReading(
  pen: Pen,
  { shortPlace, values }: PlotReading,
  xPx: number,
  area: Area,
  measure: MeasureText,
): void {
  const lines = [shortPlace, ...values.map(({ name, word = name, text }) => `${word}  ${text}`)];
  const widest = Math.max(...lines.map((line) => measure(line, 'label')));
  const leftwards = xPx + 8 + widest > area.right && xPx - area.left > area.right - xPx;
  const at = leftwards ? Math.max(widest, xPx - 8) : Math.min(xPx + 8, area.right + RIGHT - widest);
  for (const [line, text] of lines.entries())
    pen.text(at, area.top + 2 + 16 * line, text, line === 0 ? 'label quiet' : 'label', {
      align: leftwards ? 'right' : 'left',
      baseline: 'top',
    });
}
