import type { Grip } from '../board/grips.ts';
import type { Pen } from '../board/pen.ts';
import { box, segment } from '../board/pen.ts';
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
    readonly fromPx: number;
  } | null;
  /** Where the thing taken from the tray would be set down. */
  readonly dropXPx: number | null;
}

const GRIP_PX = 4;
const RING_PX = 11;

/** Grips of what is selected, the hovered grip, the focus ring, and while dragging the old place, the value and what caught it. */
export function overlayLayer(
  pen: Pen,
  handles: readonly Handle[],
  view: Viewport,
  bottomPx: number,
  hand: HandState,
): void {
  for (const handle of handles)
    drawGrip(pen, handle, handle.id === hand.hover || handle.id === hand.dragging?.id);
  const focused = hand.ring ? handles.find(({ id }) => id === hand.focus) : undefined;
  if (focused) drawFocus(pen, focused);
  if (hand.dropXPx !== null) segment(pen, hand.dropXPx, 16, hand.dropXPx, bottomPx, 'drop place');
  const { dragging } = hand;
  if (!dragging) return;
  const { move, xPx, yPx, fromPx } = dragging;
  const moved = handles.find(({ id }) => id === dragging.id);
  if (moved?.cursor === 'ew-resize' && Math.abs(moved.xPx - fromPx) > 2)
    segment(pen, fromPx, 16, fromPx, bottomPx, 'former place');
  if (move.caught) {
    const x = xOf(view, move.caught.at - move.frameMm);
    segment(pen, x, view.axisYPx, x, bottomPx, 'snap');
  }
  const right = xPx > view.widthPx - 170;
  const textPx = xPx + (right ? -16 : 16);
  const place = { align: right ? 'right' : 'left', baseline: 'middle' } as const;
  pen.text(textPx, Math.max(20, yPx - 18), move.says, 'label strong', place);
  if (move.caught) pen.text(textPx, Math.max(36, yPx - 2), move.caught.name, 'label snap', place);
}

function drawGrip(pen: Pen, { look, xPx, yPx, drag }: Handle, strong: boolean): void {
  if (look === 'none') return;
  const style = strong ? 'grip hover' : drag ? 'grip' : 'grip hollow';
  if (look === 'round') pen.circle(xPx, yPx, GRIP_PX, style);
  else box(pen, xPx - GRIP_PX, yPx - GRIP_PX, 2 * GRIP_PX, 2 * GRIP_PX, style);
}

function drawFocus(pen: Pen, grip: Grip): void {
  const half = grip.halfWidthPx;
  if (half === undefined) pen.circle(grip.xPx, grip.yPx, RING_PX, 'grip focus');
  else box(pen, grip.xPx - half - 6, grip.yPx - 12, 2 * half + 12, 24, 'grip focus');
}
