import type { Edit } from '../../engine/index.ts';
import type { Grip } from '../board/grips.ts';
import type { Catch } from '../board/snap.ts';
import type { Selected, View } from '../store/viewStore.ts';
import type { EntryUnit } from '../ui/entry.ts';

/** A drag so far, in mm of the layout: total movement since the press, and where the pointer is now. */
export interface LayoutDrag {
  readonly dzMm: number;
  readonly dyMm: number;
  readonly dxPx: number;
  /** Shift: the other absorption rule. */
  readonly other: boolean;
  readonly snap: boolean;
  /** How near, in mm along the axis, a catch takes hold. */
  readonly toleranceMm: number;
}

/** What a drag comes to. */
export interface Move {
  readonly edit: Edit;
  /** The value at the pointer, in words. */
  readonly says: string;
  readonly caught: Catch | null;
  /**
   * How far the dragged thing moved on the sheet beyond what its place from the first part tells: dragging the first part moves
   * the frame that all places are measured in, and the view makes up for it.
   */
  readonly frameMm: number;
}

/** A number that can be typed at the grip. */
export interface HandleEntry {
  readonly label: string;
  readonly unit: EntryUnit;
  readonly value: number | null;
  readonly allowInfinity?: boolean;
  readonly set: (value: number) => Edit;
}

/** A grip of the layout: what it selects, and what dragging it, stepping it and typing at it do. */
export interface Handle extends Grip {
  readonly selects: Selected | null;
  /** Null when it cannot be dragged now; `why` then says so. */
  readonly drag: ((drag: LayoutDrag) => Move) | null;
  /** `amountMm` is the step times its count; the other rule with Shift. */
  readonly step: ((amountMm: number, other: boolean) => Edit) | null;
  readonly entry: HandleEntry | null;
  /** Why it cannot be dragged, or what it follows from. */
  readonly why: string | null;
  /** How the grip itself is drawn. */
  readonly look: 'square' | 'round' | 'none';
  /** Words at the grip while the pointer is over it. */
  readonly says?: string;
  /** A grip of the view: what dragging and stepping it change there, while the sketch stays as it is. */
  readonly viewing?: {
    readonly drag: (dxPx: number, dyPx: number, snap: boolean) => Viewed;
    readonly step: (amountMm: number) => Viewed;
  };
  /** What a click does where it neither selects nor types. */
  readonly press?: Edit;
}

/** A change of the view, and its value in words. */
export interface Viewed {
  readonly change: Partial<View>;
  readonly says: string;
}

/** A move that shifts no frame and was caught by nothing. */
export const plainMove = (edit: Edit, says: string): Move => ({ edit, says, caught: null, frameMm: 0 });

/** What the drawing says instead of dragging when the scrubber stands between positions. */
export const BETWEEN = 'Between positions nothing is stored here: add a position, or go to one.';

/** A grip that says what something follows from when it is clicked, and does nothing else. */
export const readOnly = (
  id: string,
  label: string,
  why: string,
  place: Pick<Handle, 'xPx' | 'yPx' | 'line'> & Pick<Grip, 'halfWidthPx'>,
): Handle => ({
  id,
  order: 9,
  fixed: true,
  cursor: 'default',
  label,
  slider: null,
  tabStop: false,
  selects: null,
  look: 'none',
  drag: null,
  step: null,
  entry: null,
  why,
  ...place,
});
