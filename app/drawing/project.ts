import type { Viewport } from '../board/viewport.ts';
import { xOf, yOf } from '../board/viewport.ts';

/**
 * A line of z, y in mm as x, y on screen. Its first stretch begins behind the fold when there is one there: beyond a fold lengths are
 * not to scale and a ray would seem to kink.
 */
export function onScreen(view: Viewport, line: Float64Array): Float64Array {
  const points = new Float64Array(line.length);
  for (let i = 0; i < line.length; i += 2) {
    points[i] = xOf(view, line[i] ?? 0);
    points[i + 1] = yOf(view, line[i + 1] ?? 0);
  }
  const from = view.fold?.toMm;
  const [z0 = 0, y0 = 0, z1 = 0, y1 = 0] = line;
  if (from !== undefined && z0 < from && z1 > from) {
    points[0] = xOf(view, from);
    points[1] = yOf(view, y0 + ((y1 - y0) * (from - z0)) / (z1 - z0));
  }
  return points;
}

/** Several lines as one flat array with the place where each begins, as the pen's `polylines` takes them. */
export function manyOnScreen(
  view: Viewport,
  lines: readonly Float64Array[],
): { readonly points: Float64Array; readonly starts: readonly number[] } {
  const screen = lines.map((line) => onScreen(view, line));
  const points = new Float64Array(screen.reduce((sum, line) => sum + line.length, 0));
  const starts: number[] = [];
  let at = 0;
  for (const line of screen) {
    starts.push(at / 2);
    points.set(line, at);
    at += line.length;
  }
  return { points, starts };
}
