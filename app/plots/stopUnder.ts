import { areaOf } from './drawAxes.ts';
import { spotPlaces } from './drawSpots.ts';
import type { Plot } from './plot.ts';
import { nearestStop } from './read.ts';
import type { LengthAxis, Room } from './room.ts';
import { pxScale } from './scale.ts';

/** The stop of a plot under a point of its room, px from its upper left corner; null where nothing can be read. */
export function stopUnder(plot: Plot, room: Room, xPx: number, yPx: number, axis: LengthAxis): number | null {
  if (plot.kind === 'curves') {
    const { left, right } = areaOf(room);
    return nearestStop(plot, pxScale(plot.x, left, right).invert(xPx));
  }
  if (plot.kind === 'spots') {
    const { area, middle, perUnit, x } = spotPlaces(plot, room);
    if (plot.x !== null) return nearestStop(plot, x.invert(xPx));
    const radius = Math.hypot(xPx - (area.left + area.right) / 2, yPx - middle) / perUnit;
    return radius > plot.reach * 1.5 ? null : nearestStop(plot, radius);
  }
  if (plot.kind === 'empty') return null;
  let best: number | null = null;
  let bestPx = Number.POSITIVE_INFINITY;
  for (const { surface, zMm } of plot.stems) {
    const asidePx = Math.abs(axis(zMm) - xPx);
    if (asidePx < bestPx) [best, bestPx] = [surface, asidePx];
  }
  return best;
}
