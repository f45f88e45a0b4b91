import type { Effect } from './hand.ts';

interface Point {
  readonly xPx: number;
  readonly yPx: number;
}

interface Finger extends Point {
  readonly pointerId: number;
}

/** Two fingers on the sheet. Undecided until their distance has changed enough in one direction. */
export interface Pinching {
  readonly at: 'pinching';
  readonly fingers: readonly [Finger, Finger];
  /** Where the fingers were when the pinch began. */
  readonly start: readonly [Point, Point];
  readonly lock: 'length' | 'height' | null;
}

/** The change of distance (px) that decides between length and height. */
const LOCK_PX = 12;
/** Fingers nearer than this in the pinched direction count as this far apart, or the factor would run away. */
const LEAST_APART_PX = 24;

/** The pinch that two fingers begin. */
export function pinchFrom(first: Finger, second: Finger): Pinching {
  const fingers = [finger(first), finger(second)] as const;
  return { at: 'pinching', fingers, start: fingers, lock: null };
}

/**
 * The pinch after one finger moved: the midpoint pans; the distance sideways zooms, or the distance up and down
 * stretches the heights, whichever changed by 12 px first.
 */
export function pinchMoved(
  pinch: Pinching,
  pointerId: number,
  to: Point,
): readonly [Pinching, readonly Effect[]] {
  const [a, b] = pinch.fingers;
  if (pointerId !== a.pointerId && pointerId !== b.pointerId) return [pinch, []];
  const here = { pointerId, xPx: to.xPx, yPx: to.yPx };
  const fingers = pointerId === a.pointerId ? ([here, b] as const) : ([a, here] as const);
  const lock = pinch.lock ?? lockOf(pinch.start, fingers);
  const next: Pinching = { ...pinch, fingers, lock };
  const before = middle(pinch.fingers);
  const after = middle(fingers);
  const pan: Effect = { do: 'pan', dxPx: after.xPx - before.xPx, dyPx: after.yPx - before.yPx };
  if (lock === null) return [next, [pan]];
  // From the moment of the lock on, so that deciding does not make the sheet jump.
  const axis = lock === 'length' ? 'xPx' : 'yPx';
  const factor = pinch.lock === null ? 1 : apart(fingers, axis) / apart(pinch.fingers, axis);
  if (factor === 1) return [next, [pan]];
  return lock === 'length'
    ? [next, [pan, { do: 'zoom', ...after, factor, about: 'both' }]]
    : [next, [pan, { do: 'stretch', factor }]];
}

function lockOf(start: readonly [Point, Point], now: readonly [Point, Point]): 'length' | 'height' | null {
  const change = (axis: 'xPx' | 'yPx'): number =>
    Math.abs(Math.abs(now[0][axis] - now[1][axis]) - Math.abs(start[0][axis] - start[1][axis]));
  const sideways = change('xPx');
  const upright = change('yPx');
  if (Math.max(sideways, upright) < LOCK_PX) return null;
  return sideways >= upright ? 'length' : 'height';
}

function apart([a, b]: readonly [Point, Point], axis: 'xPx' | 'yPx'): number {
  return Math.max(LEAST_APART_PX, Math.abs(a[axis] - b[axis]));
}

function middle([a, b]: readonly [Point, Point]): Point {
  return { xPx: (a.xPx + b.xPx) / 2, yPx: (a.yPx + b.yPx) / 2 };
}

function finger({ pointerId, xPx, yPx }: Finger): Finger {
  return { pointerId, xPx, yPx };
}
