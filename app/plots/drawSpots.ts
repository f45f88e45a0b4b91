import { tickIncrement } from 'd3';
import type { MeasureText } from '../board/measure.ts';
import { type Pen, segment } from '../board/pen.ts';
import type { MarkStyle } from '../board/styles.ts';
import { plain } from '../drawing/words.ts';
import { drawHead, drawLevel, drawReading } from './drawAxes.ts';
import type { Dots, Spot, SpotPlot } from './plot.ts';
import { readAt } from './read.ts';
import type { DrawnWith, Room } from './room.ts';
import { pxScale } from './scale.ts';

const TOP = 42;
/** Room below for the scale bar, or for the axis along which spots are strung. */
const BOTTOM = { single: 24, strung: 36 } as const;
const SIDE = 14;
/** Half the size of a dot, px. */
const DOT = 1.7;

/** The strokes of a dot by its line, from its middle. */
const SIGNS: Readonly<Record<Dots['line'], readonly (readonly number[])[]>> = {
  main: [
    [-1, 0, 1, 0],
    [0, -1, 0, 1],
  ],
  short: [
    [-0.8, -0.8, 0.8, 0.8],
    [-0.8, 0.8, 0.8, -0.8],
  ],
  long: [[-1.3, 0, 1.3, 0]],
  fourth: [[0, -1.3, 0, 1.3]],
  fifth: [[-0.9, 0.7, 0, -0.9, 0.9, 0.7, -0.9, 0.7]],
};

/** Where spots stand in their room: the area, the level of their middles, px to the unit, and the x of each plane. */
export function spotPlaces(plot: SpotPlot, room: Room) {
  const bottom = room.heightPx - (plot.x === null ? BOTTOM.single : BOTTOM.strung);
  const area = { left: SIDE, right: room.widthPx - SIDE, top: TOP, bottom };
  const besidePx = (area.right - area.left) / plot.spots.length;
  const half = Math.max(4, Math.min(area.bottom - area.top, besidePx * (plot.x === null ? 1 : 0.94)) / 2);
  const planes = { ...area, left: area.left + besidePx / 2, right: area.right - besidePx / 2 };
  return {
    area,
    planes,
    half,
    middle: (area.top + area.bottom) / 2,
    perUnit: half / plot.reach,
    x: pxScale(plot.x ?? { from: -1, to: 1 }, planes.left, planes.right),
  };
}

/** Spots to one scale, with the circle of the first dark ring; several are strung along the axis at their planes. */
export function drawSpots(
  pen: Pen,
  plot: SpotPlot,
  room: Room,
  { measure, cursor, reference }: DrawnWith,
): void {
  drawHead(pen, plot.title, fitting(plot.figures, room.widthPx, measure), plot.notes, measure);
  const { area, planes, half, middle, perUnit, x } = spotPlaces(plot, room);
  const centre = (area.left + area.right) / 2;
  const across = (at: number) => (plot.x === null ? centre : x(at));
  if (plot.x) {
    segment(pen, area.left, middle, area.right, middle, 'axis');
    drawLevel(pen, plot.x, planes);
  }
  const kept = reference?.kind === 'spots' ? reference : null;
  for (const [index, spot] of plot.spots.entries()) {
    const place = { x: across(spot.at), y: middle, half, perUnit };
    const former = kept?.spots[index];
    square(pen, place, plot.airy);
    if (former) pen.circle(place.x, place.y, former.rms * perUnit, 'curve reference');
    drawDots(pen, spot, place);
  }
  if (plot.x === null) scaleBar(pen, plot, half, room);
  if (cursor === null) return;
  if (plot.x === null) pen.circle(centre, middle, cursor * perUnit, 'curve ink main');
  else segment(pen, x(cursor), area.top, x(cursor), area.bottom, 'leader');
  drawReading(pen, readAt(plot, cursor), plot.x === null ? area.left - 8 : x(cursor), area, measure);
}

/** As many figures as fit into the width; at least the first. */
function fitting(figures: readonly string[], widthPx: number, measure: MeasureText): string {
  let text = figures[0] ?? '';
  for (const figure of figures.slice(1)) {
    const longer = `${text}  ${figure}`;
    if (measure(longer, 'label quiet') > widthPx) break;
    text = longer;
  }
  return text;
}

interface Place {
  readonly x: number;
  readonly y: number;
  readonly half: number;
  readonly perUnit: number;
}

/** Cross hairs and the Airy circle. */
function square(pen: Pen, { x, y, half, perUnit }: Place, airy: number | null): void {
  segment(pen, x - half, y, x + half, y, 'grid');
  segment(pen, x, y - half, x, y + half, 'grid');
  if (airy !== null && airy * perUnit > 0.5 && airy * perUnit < 4 * half)
    pen.clipped({ kind: 'box', xPx: x - half, yPx: y - half, widthPx: 2 * half, heightPx: 2 * half }, () =>
      pen.circle(x, y, airy * perUnit, 'Airy disc'),
    );
}

/** All dots of a line as one path. */
function drawDots(pen: Pen, { dots }: Spot, { x, y, perUnit }: Place): void {
  for (const { points, line, style } of dots) strokes(pen, points, SIGNS[line], x, y, perUnit, style);
}

function strokes(
  pen: Pen,
  points: Float64Array,
  sign: readonly (readonly number[])[],
  x: number,
  y: number,
  perUnit: number,
  style: MarkStyle,
): void {
  const flat: number[] = [];
  const starts: number[] = [];
  for (let i = 0; i + 1 < points.length; i += 2) {
    const px = x + (points[i] ?? 0) * perUnit;
    const py = y - (points[i + 1] ?? 0) * perUnit;
    for (const stroke of sign) {
      starts.push(flat.length / 2);
      for (let k = 0; k < stroke.length; k += 2)
        flat.push(px + DOT * (stroke[k] ?? 0), py + DOT * (stroke[k + 1] ?? 0));
    }
  }
  pen.polylines(flat, starts, style);
}

/** The sign of a dot alone, for the legend. */
export const drawSign = (pen: Pen, line: Dots['line'], x: number, y: number): void =>
  strokes(pen, new Float64Array(2), SIGNS[line], x, y, 1, 'dots ink');

/** A round length to the scale of the spots. */
function scaleBar(pen: Pen, { reach, unit }: SpotPlot, half: number, { widthPx, heightPx }: Room): void {
  const increment = tickIncrement(0, reach, 2);
  const length = increment > 0 ? increment : -1 / increment;
  const px = (length * half) / reach;
  const y = heightPx - 8;
  const left = widthPx / 2 - px / 2 - 20;
  pen.polyline([left, y - 3, left, y, left + px, y, left + px, y - 3], 'scale bar');
  pen.text(left + px + 6, y, `${plain(length, 4)} ${unit}`, 'label quiet', { baseline: 'middle' });
}
