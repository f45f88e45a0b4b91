import { type Pen, segment } from '../board/pen.ts';
import type { MarkStyle } from '../board/styles.ts';
import { areaOf, drawHead, drawLevel, drawReading, drawUpright } from './drawAxes.ts';
import { axisText, type CurvePlot, type PlotCurve } from './plot.ts';
import { readAt, sampleNear } from './read.ts';
import type { DrawnWith, Room } from './room.ts';
import { pxScale } from './scale.ts';

/** Curves over their axes, a kept one faintly under them, and what is read at the cursor. */
export function drawCurves(
  pen: Pen,
  plot: CurvePlot,
  room: Room,
  { measure, cursor, reference }: DrawnWith,
): void {
  const area = areaOf(room);
  const x = pxScale(plot.x, area.left, area.right);
  const y = pxScale(plot.y, area.bottom, area.top);
  drawHead(pen, plot.title, axisText(plot.y), plot.notes, measure);
  drawUpright(pen, plot.y, area);
  drawLevel(pen, plot.x, area);
  const draw = (curve: PlotCurve, style: MarkStyle) => {
    const points = new Float64Array(2 * curve.x.length);
    for (let i = 0; i < curve.x.length; i++) {
      points[2 * i] = x(curve.x[i] ?? 0);
      points[2 * i + 1] = y(curve.y[i] ?? 0);
    }
    if (curve.x.length > 0) pen.polyline(points, style);
  };
  const { left, right, top, bottom } = area;
  const shape = {
    kind: 'box',
    xPx: left,
    yPx: top - 1,
    widthPx: right - left,
    heightPx: bottom - top + 2,
  } as const;
  pen.clipped(shape, () => {
    if (reference?.kind === 'curves' && reference.y.unit === plot.y.unit)
      for (const curve of reference.curves) draw(curve, 'curve reference');
    for (const curve of plot.curves) draw(curve, curve.style);
  });
  if (cursor === null) return;
  segment(pen, x(cursor), top, x(cursor), bottom, 'leader');
  for (const curve of plot.curves) {
    const i = sampleNear(curve, cursor);
    const [at, value] = [curve.x[i], curve.y[i]];
    if (at !== undefined && value !== undefined) pen.circle(x(at), y(value), 2.5, curve.style);
  }
  drawReading(pen, readAt(plot, cursor), x(cursor), area, measure);
}
