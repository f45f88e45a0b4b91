import type { Flat } from './pen.ts';

/** The half width (px) of the square that lines are cut to: far beyond any screen, exact in single precision. */
const REACH_PX = 30000;

/** Whether every coordinate is near enough to be painted exactly as it is. */
export function isNear(points: Flat, from = 0, to = points.length / 2): boolean {
  for (let i = 2 * from; i < 2 * to; i++) {
    const v = points[i] as number;
    if (!(v > -REACH_PX && v < REACH_PX)) return false;
  }
  return true;
}

/**
 * The piece of the straight line (x1, y1) – (x2, y2) inside the reach, as [x1, y1, x2, y2], or null when no piece is.
 * Screens paint in single precision: without the cut a line with a far end trembles under deep zoom.
 * Parametric clipping against the four sides, each side narrowing the span of the parameter.
 */
function trimmed(
  x1: number,
  y1: number,
  x2: number,
  y2: number,
): readonly [number, number, number, number] | null {
  const dx = x2 - x1;
  const dy = y2 - y1;
  let enter = 0;
  let leave = 1;
  const sides = [
    [-dx, x1 + REACH_PX],
    [dx, REACH_PX - x1],
    [-dy, y1 + REACH_PX],
    [dy, REACH_PX - y1],
  ] as const;
  for (const [towards, room] of sides) {
    if (towards === 0) {
      if (room < 0) return null;
    } else if (towards < 0) enter = Math.max(enter, room / towards);
    else leave = Math.min(leave, room / towards);
  }
  if (!(enter <= leave)) return null;
  return [x1 + enter * dx, y1 + enter * dy, x1 + leave * dx, y1 + leave * dy];
}

/** What a line is traced on: a canvas context, or text in the making. */
export interface Path {
  moveTo(xPx: number, yPx: number): void;
  lineTo(xPx: number, yPx: number): void;
}

/** Traces the open line through points `from` … `to − 1`, cut to the reach; nothing for fewer than two points. */
export function tracePath(path: Path, points: Flat, from: number, to: number): void {
  if (to - from < 2) return;
  if (isNear(points, from, to)) {
    path.moveTo(points[2 * from] as number, points[2 * from + 1] as number);
    for (let i = from + 1; i < to; i++) path.lineTo(points[2 * i] as number, points[2 * i + 1] as number);
    return;
  }
  for (let i = 2 * from; i + 3 < 2 * to; i += 2) {
    const piece = trimmed(
      points[i] as number,
      points[i + 1] as number,
      points[i + 2] as number,
      points[i + 3] as number,
    );
    if (piece === null) continue;
    path.moveTo(piece[0], piece[1]);
    path.lineTo(piece[2], piece[3]);
  }
}
