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

interface Point {
  readonly xPx: number;
  readonly yPx: number;
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
  /** Further points that name the same thing as well, in the order they are liked, with sides of their own where they differ. */
  readonly otherwise?: readonly (Point & { readonly sides?: readonly Side[] })[];
  /** How many rows further out it may go; for a label that has no leader to tell what it names. Default 3. */
  readonly mostSteps?: number;
  /** Px between the point and the label. Default 4. */
  readonly distancePx?: number;
}

export interface LabelPlace extends Box {
  readonly id: string;
  readonly side: Side;
  /** How many rows of labels further out than wished: 0 beside the point, more needs a leader. */
  readonly step: number;
  /** Which of the wish's points it stands at: 0 its own, then the others. */
  readonly point: number;
  /** No free place was found: it would cover another label, so it is better left out. */
  readonly crowded: boolean;
}

export interface LabelRoom {
  /** Labels stay inside this box. */
  readonly bounds: Box;
  /** Boxes that labels keep clear of. */
  readonly obstacles?: readonly Box[];
  /** Boxes that labels would rather not cover. */
  readonly lines?: readonly Box[];
  /** Places of the last time, needed for `frozen`. */
  readonly former?: readonly LabelPlace[];
  /** Ids that keep their side and step of the last time: hovered, pressed or focused. */
  readonly frozen?: ReadonlySet<string>;
  /** Least distance between two labels one above the other, px. Default 2. */
  readonly apartPx?: number;
  /** Least distance between two labels side by side, px, so that they do not read as one; `apartPx` when left out. */
  readonly asidePx?: number;
}

/** How far out a label may be moved, in rows of labels. */
const STEPS = [0, 1, 2, 3];
/** What a place costs: each side and point down the list, each step out, and each line covered. */
const COST = { side: 1, point: 5, line: 8, step: 20 };

/**
 * A place for every wish, in the order of the wishes: by falling priority each label takes the place that it likes best among those
 * that are free. Frozen labels come before all others and keep their side while it is free; labels without a free place take none.
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
    const before = frozen(wish);
    const kept = before && placeAt(wish, before, apartOf(room));
    const place = kept && isFree(kept, taken, room) ? kept : freePlace(wish, taken, room);
    placed.set(wish.id, place);
    if (!place.crowded) taken.push(place);
  }
  return wishes.map((wish) => placed.get(wish.id) as LabelPlace);
}

/** Whether two boxes, each grown by half of `apartPx`, share any area. */
export function overlaps(a: Box, b: Box, apartPx = 0): boolean {
  return sharedArea(a, b, apartPx) > 0;
}

function freePlace(wish: LabelWish, taken: readonly Box[], room: LabelRoom): LabelPlace {
  let best: LabelPlace | null = null;
  let least = Number.POSITIVE_INFINITY;
  for (const step of STEPS.slice(0, 1 + (wish.mostSteps ?? STEPS.length))) {
    for (let point = 0; point <= (wish.otherwise?.length ?? 0); point++) {
      for (const [rank, side] of sidesAt(wish, point).entries()) {
        const base = step * COST.step + point * COST.point + rank * COST.side;
        if (base >= least) continue;
        const place = placeAt(wish, { side, step, point }, apartOf(room));
        const lines = (room.lines ?? []).filter((line) => overlaps(place, line, LINE_APART_PX)).length;
        const cost = base + lines * COST.line;
        if (cost >= least || !isFree(place, taken, room)) continue;
        best = place;
        least = cost;
      }
    }
  }
  return (
    best ?? { ...placeAt(wish, { side: wish.sides[0] ?? 'above', step: 0, point: 0 }, 0), crowded: true }
  );
}

const apartOf = (room: LabelRoom): number => room.apartPx ?? 2;

const sidesAt = ({ sides, otherwise }: LabelWish, point: number): readonly Side[] =>
  (point > 0 ? otherwise?.[point - 1]?.sides : undefined) ?? sides;

function isFree(place: Box, taken: readonly Box[], room: LabelRoom): boolean {
  const apartPx = apartOf(room);
  const asidePx = room.asidePx ?? apartPx;
  const isClear = taken.every((box) => sharedArea(place, box, apartPx, asidePx) <= DUST);
  return isClear && outsideArea(place, room.bounds) <= DUST;
}

/** Area (px²) below which rounding, not a label, is what overlaps. */
const DUST = 1e-6;
const LINE_APART_PX = 4;

type Stand = Pick<LabelPlace, 'side' | 'step' | 'point'>;

function placeAt(wish: LabelWish, { side, step, point }: Stand, apartPx: number): LabelPlace {
  const { widthPx, heightPx } = wish;
  const from = (point > 0 ? wish.otherwise?.[point - 1] : undefined) ?? wish;
  const out = (wish.distancePx ?? 4) + step * (heightPx + apartPx);
  const level = side === 'left' || side === 'right';
  const xPx = side.endsWith('left')
    ? from.xPx - widthPx - (level ? out : 0)
    : side.endsWith('right')
      ? from.xPx + (level ? out : 0)
      : from.xPx - widthPx / 2;
  const yPx = level
    ? from.yPx - heightPx / 2
    : side.startsWith('above')
      ? from.yPx - out - heightPx
      : from.yPx + out;
  return { id: wish.id, xPx, yPx, widthPx, heightPx, side, step, point, crowded: false };
}

function sharedArea(a: Box, b: Box, apartPx: number, asidePx = apartPx): number {
  const width = Math.min(a.xPx + a.widthPx, b.xPx + b.widthPx) - Math.max(a.xPx, b.xPx) + asidePx;
  const height = Math.min(a.yPx + a.heightPx, b.yPx + b.heightPx) - Math.max(a.yPx, b.yPx) + apartPx;
  return width > 0 && height > 0 ? width * height : 0;
}

function outsideArea(a: Box, bounds: Box): number {
  return Math.max(0, a.widthPx * a.heightPx - sharedArea(a, bounds, 0));
}
