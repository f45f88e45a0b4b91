export interface Modifiers {
  readonly shift: boolean;
  readonly alt: boolean;
  readonly ctrl: boolean;
  readonly meta: boolean;
}

export const NO_MODIFIERS: Modifiers = { shift: false, alt: false, ctrl: false, meta: false };

export type PointerKind = 'mouse' | 'touch' | 'pen';

/** What a hand did, in px of the sheet. `timeMs` is the event's own time stamp. */
export type Input =
  | ({ readonly on: 'down'; readonly button: number; readonly timeMs: number } & PointerAt)
  | ({ readonly on: 'move' } & PointerAt)
  | ({ readonly on: 'up' } & PointerAt)
  | { readonly on: 'cancel' | 'lost capture'; readonly pointerId: number }
  | { readonly on: 'leave' }
  | ({ readonly on: 'wheel' } & Wheel)
  | { readonly on: 'modifiers'; readonly modifiers: Modifiers }
  | { readonly on: 'space'; readonly held: boolean }
  | { readonly on: 'escape' };

export interface PointerAt {
  readonly pointerId: number;
  readonly kind: PointerKind;
  readonly xPx: number;
  readonly yPx: number;
  /** Buttons held, as in the DOM: 1 first, 2 second, 4 middle. */
  readonly buttons: number;
  readonly modifiers: Modifiers;
}

/** A turn of the wheel in px, positive to the right and downwards; a trackpad's pinch arrives with Ctrl held. */
export interface Wheel {
  readonly xPx: number;
  readonly yPx: number;
  readonly dxPx: number;
  readonly dyPx: number;
  readonly modifiers: Modifiers;
}

/** What the reducer needs to know of a grip. */
export interface GripRef {
  readonly id: string;
  readonly cursor: string;
  /** A drag from it pans. */
  readonly fixed?: true;
}

/** What the hand acts on, at this moment. */
export interface World {
  /** The grips within the radius, the one to be taken first in front. */
  readonly gripsAt: (xPx: number, yPx: number, radiusPx: number) => readonly GripRef[];
  /** Whether drags snap when Alt is not held. */
  readonly snapOn: boolean;
}

/** What is to be done about it. Every press ends in exactly one of commit, cancel, click, double click, choose. */
export type Effect =
  | { readonly do: 'hover'; readonly grip: string | null }
  | { readonly do: 'cursor'; readonly cursor: string }
  | ({ readonly do: 'press'; readonly grip: string | null } & Spot)
  | ({ readonly do: 'preview' } & Drag)
  | { readonly do: 'commit'; readonly grip: string }
  | { readonly do: 'cancel'; readonly grip: string | null }
  | ({ readonly do: 'click'; readonly grip: string | null } & Spot)
  | ({ readonly do: 'double click'; readonly grip: string | null } & Spot)
  /** Touch pressed again where several grips lie: offer them by name. */
  | ({ readonly do: 'choose'; readonly grips: readonly string[] } & Spot)
  | { readonly do: 'pan'; readonly dxPx: number; readonly dyPx: number }
  /** About the pointer in length only (the axis keeps its place), or in length and height. */
  | {
      readonly do: 'zoom';
      readonly xPx: number;
      readonly yPx: number;
      readonly factor: number;
      readonly about: 'length' | 'both';
    }
  | { readonly do: 'stretch'; readonly factor: number };

export interface Spot {
  readonly xPx: number;
  readonly yPx: number;
  readonly modifiers: Modifiers;
  readonly kind: PointerKind;
}

/** A drag so far: total movement since the press, Alt's slow stretches counted a tenth. */
export interface Drag extends Spot {
  readonly grip: string;
  readonly dxPx: number;
  readonly dyPx: number;
  readonly snap: boolean;
}
