/** Where a label may stand against its own point. */
export type Side =
  | 'above'
  | 'below'
  | 'left'
  | 'right'
  | 'above left'
  | 'above right'
  | 'below left'
  | 'below right';

export interface Box {
  readonly xPx: number;
  readonly yPx: number;
  readonly widthPx: number;
  readonly heightPx: number;
}

export interface LabelWish {
  readonly id: string;
  /** The point that the label names. */
  readonly xPx: number;
  readonly yPx: number;
  readonly widthPx: number;
  readonly heightPx: number;
  /** Greater is placed first. */
  readonly priority: number;
  /** Sides in the order they are liked; at least one. */
  readonly sides: readonly Side[];
  /** Px between the point and the label. Default 4. */
  readonly distancePx?: number;
}

export interface LabelPlace extends Box {
  readonly id: string;
  readonly side: Side;
  /** How many label heights further out than wished: 0 beside the point, more needs a leader. */
  readonly step: number;
  /** No free place was found; the label stands where it covers least. */
  readonly crowded: boolean;
}

export interface LabelRoom {
  /** Labels stay inside this box. */
  readonly bounds: Box;
  /** Boxes that labels keep clear of. */
  readonly obstacles?: readonly Box[];
  /** Places of the last time, needed for `frozen`. */
  readonly former?: readonly LabelPlace[];
  /** Ids that keep their side and step of the last time: hovered, pressed or focused. */
  readonly frozen?: ReadonlySet<string>;
  /** Least distance between two labels, px. Default 2. */
  readonly apartPx?: number;
}

/** How far out a label may be moved, in label heights. */
const STEPS = [0, 1, 2];

/**
 * A place for every wish, in the order of the wishes: by falling priority each label takes the first of its sides,
 * then of its further steps, that is free. Frozen labels keep their side and are placed before all others.
 */
export function placeLabels(wishes: readonly LabelWish[], room: LabelRoom): readonly LabelPlace[] {
  const former = new Map((room.former ?? []).map((place) => [place.id, place]));
  const frozen = (wish: LabelWish): LabelPlace | undefined =>
    room.frozen?.has(wish.id) ? former.get(wish.id) : undefined;
  const order = [...wishes].sort(
    (a, b) => Number(frozen(b) !== undefined) - Number(frozen(a) !== undefined) || b.priority - a.priority,
  );
  const taken: Box[] = [...(room.obstacles ?? [])];
  const placed = new Map<string, LabelPlace>();
  for (const wish of order) {
    const kept = frozen(wish);
    const place = kept ? placeAt(wish, kept.side, kept.step) : freePlace(wish, taken, room);
    placed.set(wish.id, place);
    taken.push(place);
  }
  return wishes.map((wish) => placed.get(wish.id) as LabelPlace);
}

/** Whether two boxes, each grown by half of `apartPx`, share any area. */
export function overlaps(a: Box, b: Box, apartPx = 0): boolean {
  return sharedArea(a, b, apartPx) > 0;
}

function freePlace(wish: LabelWish, taken: readonly Box[], room: LabelRoom): LabelPlace {
  const apart = room.apartPx ?? 2;
  let best: LabelPlace | null = null;
  let least = Number.POSITIVE_INFINITY;
  for (const step of STEPS) {
    for (const side of wish.sides) {
      const place = placeAt(wish, side, step);
      let cost = outsideArea(place, room.bounds);
      for (const box of taken) cost += sharedArea(place, box, apart);
      if (cost <= DUST) return place;
      if (cost < least) {
        best = place;
        least = cost;
      }
    }
  }
  return { ...(best ?? placeAt(wish, 'above', 0)), crowded: true };
}

/** Area (px²) below which rounding, not a label, is what overlaps. */
const DUST = 1e-6;

function placeAt(wish: LabelWish, side: Side, step: number): LabelPlace {
  const { widthPx, heightPx } = wish;
  const out = (wish.distancePx ?? 4) + step * heightPx;
  const level = side === 'left' || side === 'right';
  const xPx = side.endsWith('left')
    ? wish.xPx - widthPx - (level ? out : 0)
    : side.endsWith('right')
      ? wish.xPx + (level ? out : 0)
      : wish.xPx - widthPx / 2;
  const yPx = level
    ? wish.yPx - heightPx / 2
    : side.startsWith('above')
      ? wish.yPx - out - heightPx
      : wish.yPx + out;
  return { id: wish.id, xPx, yPx, widthPx, heightPx, side, step, crowded: false };
}

function sharedArea(a: Box, b: Box, apartPx: number): number {
  const width = Math.min(a.xPx + a.widthPx, b.xPx + b.widthPx) - Math.max(a.xPx, b.xPx) + apartPx;
  const height = Math.min(a.yPx + a.heightPx, b.yPx + b.heightPx) - Math.max(a.yPx, b.yPx) + apartPx;
  return width > 0 && height > 0 ? width * height : 0;
}

function outsideArea(a: Box, bounds: Box): number {
  return Math.max(0, a.widthPx * a.heightPx - sharedArea(a, bounds, 0));
}
