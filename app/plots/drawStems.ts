import { type Pen, segment } from '../board/pen.ts';
import { drawHead, drawReading, drawUpright } from './drawAxes.ts';
import { axisText, type StemPlot, valueText } from './plot.ts';
import { readAt } from './read.ts';
import type { DrawnWith, LengthAxis, Room } from './room.ts';
import { pxScale } from './scale.ts';

const TOP = 44;
const BOTTOM = 10;
const LEFT = 48;

/** Stems under their surfaces as the drawing above has them, and the line of the sum so far. */
export function drawStems(
  pen: Pen,
  plot: StemPlot,
  { widthPx, heightPx }: Room,
  { measure, cursor, reference, axis }: DrawnWith,
): void {
  const area = { left: LEFT, right: widthPx, top: TOP, bottom: heightPx - BOTTOM };
  const y = pxScale(plot.y, area.bottom, area.top);
  const total = plot.stems.at(-1)?.sum ?? 0;
  drawHead(pen, plot.title, `${axisText(plot.y)}; in all ${valueText(total, plot.y)}`, plot.notes, measure);
  drawUpright(pen, plot.y, area);
  const shape = {
    kind: 'box',
    xPx: area.left,
    yPx: 0,
    widthPx: area.right - area.left,
    heightPx,
  } as const;
  pen.clipped(shape, () => {
    if (reference?.kind === 'stems')
      pen.polyline(runningSum(reference, axis, y, area.right), 'curve reference');
    pen.polyline(runningSum(plot, axis, y, area.right), 'curve quiet main');
    for (const { surface, zMm, value } of plot.stems) {
      const x = axis(zMm);
      const style = surface === cursor ? 'part selected' : 'curve ink main';
      segment(pen, x, y(0), x, y(value), style);
      pen.circle(x, y(value), 2, 'ink');
    }
  });
  const read = plot.stems.find(({ surface }) => surface === cursor);
  if (cursor === null || !read) return;
  const x = axis(read.zMm);
  segment(pen, x, area.top, x, area.bottom, 'leader');
  drawReading(pen, readAt(plot, cursor), x, area, measure);
}

/** The sum so far as steps, level from each surface to the next. */
function runningSum(
  { stems }: StemPlot,
  axis: LengthAxis,
  y: (sum: number) => number,
  endPx: number,
): number[] {
  const points: number[] = [];
  let before = 0;
  for (const { zMm, sum } of stems) {
    points.push(axis(zMm), y(before), axis(zMm), y(sum));
    before = sum;
  }
  return [...points, endPx, y(before)];
}
