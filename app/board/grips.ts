/** What a grip's slider element says and does. Values are in display units; the texts are for people. */
export interface SliderFacts {
  readonly valueNow: number;
  readonly valueText: string;
  readonly valueMin?: number;
  readonly valueMax?: number;
  readonly orientation: 'horizontal' | 'vertical';
}

/** A place on a drawn sheet that can be taken and dragged. */
export interface Grip {
  readonly id: string;
  /** Decides between grips that are as near: smaller is taken first. */
  readonly order: number;
  /** The grip's own point, screen px; for a line grip the point its focus ring stands at. */
  readonly xPx: number;
  readonly yPx: number;
  /** The grip can be taken anywhere on this upright line through `xPx`; null for a point. */
  readonly line: { readonly topPx: number; readonly bottomPx: number } | null;
  /** Half the width over which it can be taken, for a grip that is a text. Default 0. */
  readonly halfWidthPx?: number;
  /** The grip can be taken anywhere in this circle about its point. Default 0. */
  readonly radiusPx?: number;
  /** It can be pointed at and clicked, but a drag from it pans. */
  readonly fixed?: true;
  /** CSS cursor over the grip. */
  readonly cursor: string;
  /** The grip's name for people, "second group, position". */
  readonly label: string;
  /** Null for a read-only mark, which can be pointed at but has no slider. */
  readonly slider: SliderFacts | null;
  /** Whether Tab stops at the grip's slider. */
  readonly tabStop: boolean;
}

export const MOUSE_RADIUS_PX = 12;
export const TOUCH_RADIUS_PX = 22;
/** Distances that differ by less than this share of the radius count as equal: a hand does not aim finer. */
const TIE_SHARE = 0.5;

type Reach = Pick<Grip, 'xPx' | 'yPx' | 'line' | 'halfWidthPx' | 'radiusPx'>;

/** Distance (px) from a point to a grip: to its line, its text, its circle or its point. */
export function distanceTo(grip: Reach, xPx: number, yPx: number): number {
  const nearestY =
    grip.line === null ? grip.yPx : Math.min(grip.line.bottomPx, Math.max(grip.line.topPx, yPx));
  const aside = Math.max(0, Math.abs(xPx - grip.xPx) - (grip.halfWidthPx ?? 0));
  return Math.max(0, Math.hypot(aside, yPx - nearestY) - (grip.radiusPx ?? 0));
}

/**
 * The grips within `radiusPx` of a point, the one to be taken first in front: the nearest, where those about as near
 * as the nearest are ranked by their order. The rest follow by distance.
 */
export function gripsAt<G extends Reach & Pick<Grip, 'order'>>(
  grips: readonly G[],
  xPx: number,
  yPx: number,
  radiusPx: number,
): readonly G[] {
  const near = grips
    .map((grip) => ({ grip, distance: distanceTo(grip, xPx, yPx) }))
    .filter(({ distance }) => distance <= radiusPx)
    .sort((a, b) => a.distance - b.distance);
  const tieUpTo = (near[0]?.distance ?? 0) + TIE_SHARE * radiusPx;
  const tied = near.filter(({ distance }) => distance <= tieUpTo);
  const rest = near.slice(tied.length);
  tied.sort((a, b) => a.grip.order - b.grip.order || a.distance - b.distance);
  return [...tied, ...rest].map(({ grip }) => grip);
}
