import { MOUSE_RADIUS_PX, TOUCH_RADIUS_PX } from './grips.ts';
import type { Effect, GripRef, Input, Modifiers, PointerKind, Spot, World } from './hand.ts';
import { type Pinching, pinchFrom, pinchMoved } from './pinch.ts';
import { wheelEffects } from './wheel.ts';

/** What every state of a gesture remembers. */
interface Memory {
  readonly hover: GripRef | null;
  readonly cursor: string;
  readonly spaceHeld: boolean;
  readonly lastClick: LastClick | null;
}

interface LastClick {
  readonly xPx: number;
  readonly yPx: number;
  readonly timeMs: number;
  readonly grip: GripRef | null;
}

interface Press {
  readonly pointerId: number;
  readonly kind: PointerKind;
  readonly pressXPx: number;
  readonly pressYPx: number;
  readonly xPx: number;
  readonly yPx: number;
  readonly modifiers: Modifiers;
}

interface Pointing extends Press {
  readonly at: 'pointing';
  /** What a drag from here moves. */
  readonly grip: GripRef | null;
  /** What a click here takes: the next grip when the same place is pressed again. */
  readonly next: GripRef | null;
  readonly among: readonly GripRef[];
  readonly again: boolean;
  readonly double: boolean;
  readonly timeMs: number;
}

interface Dragging extends Press {
  readonly at: 'dragging';
  readonly grip: GripRef;
  /** Movement counted up to the anchor; from there on the present speed counts. */
  readonly countedXPx: number;
  readonly countedYPx: number;
  readonly anchorXPx: number;
  readonly anchorYPx: number;
}

interface Panning extends Press {
  readonly at: 'panning';
}

type State = { readonly at: 'idle' } | Pointing | Dragging | Panning | Pinching;
export type Gesture = State & Memory;

type Step = readonly [Gesture, readonly Effect[]];

export const IDLE: Gesture = {
  at: 'idle',
  hover: null,
  cursor: 'default',
  spaceHeld: false,
  lastClick: null,
};

const MOUSE_SLACK_PX = 3;
const TOUCH_SLACK_PX = 8;
const DOUBLE_CLICK_MS = 400;
/** Alt divides the motion by this. */
const FINE = 10;
const FIRST_BUTTON = 0;
const MIDDLE_BUTTON = 1;

/** The gesture after an input, and what is to be done, in order. Pure: the same inputs give the same effects. */
export function step(gesture: Gesture, input: Input, world: World): Step {
  const [next, effects] = react(gesture, input, world);
  const cursor = cursorOf(next);
  const extra: Effect[] = [];
  if (next.hover?.id !== gesture.hover?.id) extra.push({ do: 'hover', grip: next.hover?.id ?? null });
  if (cursor !== gesture.cursor) extra.push({ do: 'cursor', cursor });
  return [cursor === next.cursor ? next : { ...next, cursor }, [...effects, ...extra]];
}

function react(gesture: Gesture, input: Input, world: World): Step {
  switch (input.on) {
    case 'down':
      return down(gesture, input, world);
    case 'move':
      return moved(gesture, input, world);
    case 'up':
      return up(gesture, input, world);
    case 'cancel':
    case 'lost capture':
      return holds(gesture, input.pointerId) ? cancelled(gesture) : [gesture, []];
    case 'escape':
      return escaped(gesture);
    case 'leave':
      return [gesture.at === 'idle' ? { ...gesture, hover: null } : gesture, []];
    case 'wheel':
      return [gesture, gesture.at === 'idle' ? wheelEffects(input) : []];
    case 'modifiers':
      return gesture.at === 'dragging'
        ? dragged(gesture, gesture.xPx, gesture.yPx, input.modifiers, world)
        : [gesture, []];
    case 'space':
      return [{ ...gesture, spaceHeld: input.held }, []];
  }
}

function down(gesture: Gesture, input: Extract<Input, { on: 'down' }>, world: World): Step {
  if (gesture.at !== 'idle') return secondDown(gesture, input, world);
  if (input.button === MIDDLE_BUTTON || (gesture.spaceHeld && input.button === FIRST_BUTTON))
    return [{ ...memoryOf(gesture), ...pressOf(input), at: 'panning', lastClick: null }, []];
  if (input.button !== FIRST_BUTTON) return [gesture, []];

  const among = world.gripsAt(input.xPx, input.yPx, radiusOf(input.kind));
  const last = gesture.lastClick;
  const again = last !== null && apart(last, input) < slackOf(input.kind);
  const taken = again ? among.findIndex((grip) => grip.id === last.grip?.id) : -1;
  const grip = among[Math.max(0, taken)] ?? null;
  const double = again && input.timeMs - last.timeMs <= DOUBLE_CLICK_MS;
  const next = taken >= 0 && !double ? (among[(taken + 1) % among.length] ?? null) : grip;
  const pointing: Pointing = {
    ...pressOf(input),
    at: 'pointing',
    grip,
    next,
    among,
    again,
    double,
    timeMs: input.timeMs,
  };
  return [
    { ...memoryOf(gesture), ...pointing, hover: grip },
    [{ do: 'press', grip: grip?.id ?? null, ...spotOf(pointing) }],
  ];
}

/** A second finger ends whatever the first one did and pinches with it. */
function secondDown(
  gesture: Exclude<Gesture, { at: 'idle' }>,
  input: Extract<Input, { on: 'down' }>,
  world: World,
): Step {
  if (gesture.at === 'pinching') return [gesture, []];
  const [rest, effects] = cancelled(gesture);
  if (input.pointerId === gesture.pointerId) {
    // Its release went unseen: this is a new press.
    const [next, more] = down(rest, input, world);
    return [next, [...effects, ...more]];
  }
  if (gesture.kind !== 'touch' || input.kind !== 'touch') return [rest, effects];
  return [{ ...memoryOf(rest), ...pinchFrom(gesture, input) }, effects];
}

function moved(gesture: Gesture, input: Extract<Input, { on: 'move' }>, world: World): Step {
  switch (gesture.at) {
    case 'idle': {
      if (input.kind === 'touch' || input.buttons !== 0) return [gesture, []];
      const hover = world.gripsAt(input.xPx, input.yPx, radiusOf(input.kind))[0] ?? null;
      return [hover?.id === gesture.hover?.id ? gesture : { ...gesture, hover }, []];
    }
    case 'pointing': {
      if (input.pointerId !== gesture.pointerId) return [gesture, []];
      if (apart({ xPx: gesture.pressXPx, yPx: gesture.pressYPx }, input) < slackOf(gesture.kind))
        return [{ ...gesture, xPx: input.xPx, yPx: input.yPx, modifiers: input.modifiers }, []];
      return leftThePress(gesture, input, world);
    }
    case 'dragging':
      return input.pointerId === gesture.pointerId
        ? dragged(gesture, input.xPx, input.yPx, input.modifiers, world)
        : [gesture, []];
    case 'panning':
      return input.pointerId === gesture.pointerId ? panned(gesture, input) : [gesture, []];
    case 'pinching': {
      const [pinch, effects] = pinchMoved(gesture, input.pointerId, input);
      return [{ ...memoryOf(gesture), ...pinch }, effects];
    }
  }
}

function leftThePress(gesture: Pointing & Memory, input: Extract<Input, { on: 'move' }>, world: World): Step {
  const { grip } = gesture;
  const press = pressOf({ ...gesture, xPx: gesture.pressXPx, yPx: gesture.pressYPx });
  const memory = { ...memoryOf(gesture), lastClick: null };
  if (grip === null || grip.fixed) {
    const [next, effects] = panned({ ...memory, ...press, at: 'panning' }, input);
    return [next, grip === null ? effects : [{ do: 'cancel', grip: grip.id }, ...effects]];
  }
  const start: Dragging & Memory = {
    ...memory,
    ...press,
    at: 'dragging',
    grip,
    modifiers: input.modifiers,
    countedXPx: 0,
    countedYPx: 0,
    anchorXPx: gesture.pressXPx,
    anchorYPx: gesture.pressYPx,
  };
  return dragged(start, input.xPx, input.yPx, input.modifiers, world);
}

function dragged(
  gesture: Dragging & Memory,
  xPx: number,
  yPx: number,
  modifiers: Modifiers,
  world: World,
): Step {
  const turned = modifiers.alt === gesture.modifiers.alt ? gesture : anchored(gesture);
  const next = { ...turned, xPx, yPx, modifiers };
  return [next, [previewOf(next, world)]];
}

/** The drag counted up to its present point, so that a change of speed does not make it jump. */
function anchored(gesture: Dragging & Memory): Dragging & Memory {
  const { dxPx, dyPx } = movementOf(gesture);
  return {
    ...gesture,
    countedXPx: dxPx,
    countedYPx: dyPx,
    anchorXPx: gesture.xPx,
    anchorYPx: gesture.yPx,
  };
}

function movementOf(drag: Dragging): { dxPx: number; dyPx: number } {
  const slow = drag.modifiers.alt ? FINE : 1;
  return {
    dxPx: drag.countedXPx + (drag.xPx - drag.anchorXPx) / slow,
    dyPx: drag.countedYPx + (drag.yPx - drag.anchorYPx) / slow,
  };
}

function previewOf(drag: Dragging, world: World): Effect {
  const snap = world.snapOn && !drag.modifiers.alt;
  return { do: 'preview', grip: drag.grip.id, ...movementOf(drag), ...spotOf(drag), snap };
}

function panned(gesture: Panning & Memory, to: { readonly xPx: number; readonly yPx: number }): Step {
  const [dxPx, dyPx] = [to.xPx - gesture.xPx, to.yPx - gesture.yPx];
  return [{ ...gesture, xPx: to.xPx, yPx: to.yPx }, [{ do: 'pan', dxPx, dyPx }]];
}

function up(gesture: Gesture, input: Extract<Input, { on: 'up' }>, world: World): Step {
  switch (gesture.at) {
    case 'idle':
      return [gesture, []];
    case 'pinching': {
      const left = gesture.fingers.find((finger) => finger.pointerId !== input.pointerId);
      if (left === undefined || !holds(gesture, input.pointerId)) return [gesture, []];
      const press = pressOf({ ...left, kind: 'touch', modifiers: input.modifiers });
      return [{ ...memoryOf(gesture), ...press, at: 'panning' }, []];
    }
    case 'panning':
      return holds(gesture, input.pointerId) ? [idle(gesture), []] : [gesture, []];
    case 'dragging': {
      if (!holds(gesture, input.pointerId)) return [gesture, []];
      const atRest = gesture.xPx === input.xPx && gesture.yPx === input.yPx;
      const last = atRest ? [] : dragged(gesture, input.xPx, input.yPx, input.modifiers, world)[1];
      return [idle(gesture), [...last, { do: 'commit', grip: gesture.grip.id }]];
    }
    case 'pointing':
      return holds(gesture, input.pointerId) ? clicked(gesture) : [gesture, []];
  }
}

function clicked(gesture: Pointing & Memory): Step {
  const { pressXPx: xPx, pressYPx: yPx, timeMs, next, among } = gesture;
  const spot = { ...spotOf(gesture), xPx, yPx };
  const rest: Gesture = { ...idle(gesture), lastClick: { xPx, yPx, timeMs, grip: next } };
  if (gesture.kind === 'touch' && gesture.again && !gesture.double && among.length > 1)
    return [rest, [{ do: 'choose', grips: among.map((grip) => grip.id), ...spot }]];
  return [rest, [{ do: gesture.double ? 'double click' : 'click', grip: next?.id ?? null, ...spot }]];
}

/** Puts back what the hand began; a pan goes back only when the hand asks for it. */
function escaped(gesture: Gesture): Step {
  if (gesture.at !== 'panning') return cancelled(gesture);
  const back = { xPx: gesture.pressXPx, yPx: gesture.pressYPx };
  return [idle(gesture), panned(gesture, back)[1]];
}

function cancelled(gesture: Gesture): Step {
  if (gesture.at === 'idle') return [gesture, []];
  const pressed = gesture.at === 'pointing' || gesture.at === 'dragging';
  return [idle(gesture), pressed ? [{ do: 'cancel', grip: gesture.grip?.id ?? null }] : []];
}

function holds(gesture: Gesture, pointerId: number): boolean {
  if (gesture.at === 'idle') return false;
  if (gesture.at === 'pinching') return gesture.fingers.some((finger) => finger.pointerId === pointerId);
  return gesture.pointerId === pointerId;
}

function idle(gesture: Gesture): Gesture {
  const finger = gesture.at === 'pinching' || (gesture.at !== 'idle' && gesture.kind === 'touch');
  return { ...memoryOf(gesture), ...(finger && { hover: null }), at: 'idle' };
}

function memoryOf({ hover, cursor, spaceHeld, lastClick }: Memory): Memory {
  return { hover, cursor, spaceHeld, lastClick };
}

function pressOf(input: Omit<Press, 'pressXPx' | 'pressYPx'>): Press {
  const { pointerId, kind, xPx, yPx, modifiers } = input;
  return { pointerId, kind, xPx, yPx, modifiers, pressXPx: xPx, pressYPx: yPx };
}

function spotOf({ xPx, yPx, modifiers, kind }: Spot): Spot {
  return { xPx, yPx, modifiers, kind };
}

function cursorOf(gesture: Gesture): string {
  if (gesture.at === 'panning') return 'grabbing';
  if (gesture.at === 'dragging') return gesture.grip.cursor;
  if (gesture.spaceHeld) return 'grab';
  return gesture.hover?.cursor ?? 'default';
}

function apart(a: { xPx: number; yPx: number }, b: { xPx: number; yPx: number }): number {
  return Math.hypot(a.xPx - b.xPx, a.yPx - b.yPx);
}

function radiusOf(kind: PointerKind): number {
  return kind === 'touch' ? TOUCH_RADIUS_PX : MOUSE_RADIUS_PX;
}

function slackOf(kind: PointerKind): number {
  return kind === 'touch' ? TOUCH_SLACK_PX : MOUSE_SLACK_PX;
}
