import type { Grip } from '../board/grips.ts';
import { type Box, type LabelPlace, type LabelWish, placeLabels } from '../board/labels.ts';
import type { MeasureText } from '../board/measure.ts';
import type { Pen } from '../board/pen.ts';
import { box, segment } from '../board/pen.ts';
import type { TextStyle } from '../board/styles.ts';
import { type Viewport, xOf } from '../board/viewport.ts';
import type { Handle, Move } from '../drawing/handle.ts';

/** What the hand is doing, for the topmost layer. */
export interface HandState {
  readonly hover: string | null;
  readonly focus: string | null;
  /** Whether the focus came by the keyboard and shows its ring. */
  readonly ring: boolean;
  readonly dragging: {
    readonly id: string;
    readonly xPx: number;
    readonly yPx: number;
    readonly move: Move;
    /** Where the grip stood at the press. */
    readonly from: { readonly xPx: number; readonly yPx: number };
    /** A finger hides what is near it. */
    readonly byFinger: boolean;
  } | null;
  /** The step of an arrow key, in words. */
  readonly step: string;
  /** Where the thing taken from the tray would be set down. */
  readonly dropXPx: number | null;
}

/** A hand that does nothing. */
export const IDLE_HAND: HandState = {
  hover: null,
  focus: null,
  ring: false,
  dragging: null,
  step: '',
  dropXPx: null,
};

const GRIP_PX = 4;
const RING_PX = 11;
/** Half the line at the old height of what is dragged up or down. */
const FORMER_PX = 22;

/** What the words at the pointer and at the focus must know to find a place. */
export interface OverlayRoom {
  readonly measure: MeasureText;
  /** The labels of the drawing, which they keep clear of. */
  readonly labels: readonly Box[];
  /** Where they stood in the last frame, so that they do not jump from side to side. */
  readonly former: readonly LabelPlace[];
}

/**
 * Grips of what is selected, the hovered grip, the focus ring with the step of its keys, and while dragging the old place, the value and
 * what caught it. Returns where words stand.
 */
export function overlayLayer(
  pen: Pen,
  handles: readonly Handle[],
  view: Viewport,
  bottomPx: number,
  hand: HandState,
  room: OverlayRoom,
): readonly LabelPlace[] {
  const { dragging } = hand;
  for (const handle of handles) drawGrip(pen, handle, handle.id === hand.hover || handle.id === dragging?.id);
  if (hand.dropXPx !== null) segment(pen, hand.dropXPx, 16, hand.dropXPx, bottomPx, 'drop place');
  const focused = hand.ring ? handles.find(({ id }) => id === hand.focus) : undefined;
  if (focused) drawFocus(pen, focused);
  if (dragging) {
    const { move } = dragging;
    const moved = handles.find(({ id }) => id === dragging.id);
    if (moved) drawFormerPlace(pen, moved, dragging.from, bottomPx);
    if (move.caught) {
      const x = xOf(view, move.caught.at - move.frameMm);
      segment(pen, x, view.axisYPx, x, bottomPx, 'snap');
    }
    const lines: readonly Line[] = [
      { text: move.says, style: 'label strong' },
      ...(move.caught ? [{ text: move.caught.name, style: 'label snap' } as const] : []),
    ];
    return [
      drawWords(pen, lines, dragging, dragging.byFinger ? FINGER_PX : POINTER_PX, view, bottomPx, room),
    ];
  }
  const hovered = handles.find(({ id, says }) => id === hand.hover && says !== undefined);
  if (hovered) {
    const lines: readonly Line[] = [{ text: hovered.says ?? '', style: 'label strong' }];
    return [drawWords(pen, lines, hovered, POINTER_PX, view, bottomPx, room)];
  }
  if (!focused?.step) return [];
  const { xPx, yPx } = focused;
  const lines: readonly Line[] = [{ text: `step ${hand.step}`, style: 'label quiet' }];
  return [drawWords(pen, lines, { xPx, yPx }, RING_PX + 5, view, bottomPx, room)];
}

interface Line {
  readonly text: string;
  readonly style: TextStyle;
}

const LINE_PX = 16;
/** How far from the pointer, or from a finger, words stand. */
const POINTER_PX = 12;
const FINGER_PX = 40;

/** Words beside a point, above it if there is room, where they cover no label. */
function drawWords(
  pen: Pen,
  lines: readonly Line[],
  { xPx, yPx }: { readonly xPx: number; readonly yPx: number },
  distancePx: number,
  view: Viewport,
  bottomPx: number,
  { measure, labels, former }: OverlayRoom,
): LabelPlace {
  const besides = (asidePx: number) => ({ xPx: xPx + asidePx, yPx });
  const wish: LabelWish = {
    id: WORDS,
    ...besides(distancePx),
    widthPx: Math.max(...lines.map(({ text, style }) => measure(text, style))),
    heightPx: LINE_PX * lines.length,
    priority: 1,
    sides: ['above right', 'below right'],
    otherwise: [{ ...besides(-distancePx), sides: ['above left', 'below left'] }],
    distancePx: distancePx / 2,
  };
  const bounds = { xPx: 4, yPx: 4, widthPx: view.widthPx - 8, heightPx: bottomPx - 8 };
  const places = placeLabels([wish], { bounds, obstacles: labels, former, frozen: new Set([WORDS]) });
  const place = places[0] as LabelPlace;
  for (const [i, { text, style }] of lines.entries())
    pen.text(place.xPx, place.yPx + (i + 0.5) * LINE_PX, text, style, { align: 'left', baseline: 'middle' });
  return place;
}

const WORDS = 'words';

/** A quiet line where the grip stood at the press. */
function drawFormerPlace(
  pen: Pen,
  { cursor, xPx, yPx }: Handle,
  from: { readonly xPx: number; readonly yPx: number },
  bottomPx: number,
): void {
  if (cursor === 'ew-resize' && Math.abs(xPx - from.xPx) > 2)
    segment(pen, from.xPx, 16, from.xPx, bottomPx, 'former place');
  if (cursor === 'ns-resize' && Math.abs(yPx - from.yPx) > 2)
    segment(pen, xPx - FORMER_PX, from.yPx, xPx + FORMER_PX, from.yPx, 'former place');
}

function drawGrip(pen: Pen, { look, xPx, yPx, drag, viewing }: Handle, strong: boolean): void {
  if (look === 'none') return;
  const style = strong ? 'grip hover' : drag || viewing ? 'grip' : 'grip hollow';
  if (look === 'round') pen.circle(xPx, yPx, GRIP_PX, style);
  else box(pen, xPx - GRIP_PX, yPx - GRIP_PX, 2 * GRIP_PX, 2 * GRIP_PX, style);
}

function drawFocus(pen: Pen, grip: Grip): void {
  const half = grip.halfWidthPx;
  if (grip.radiusPx !== undefined) pen.circle(grip.xPx, grip.yPx, grip.radiusPx + 4, 'grip focus');
  else if (half === undefined) pen.circle(grip.xPx, grip.yPx, RING_PX, 'grip focus');
  else box(pen, grip.xPx - half - 6, grip.yPx - 12, 2 * half + 12, 24, 'grip focus');
}
