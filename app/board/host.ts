import { IDLE, step } from './gesture.ts';
import { type Grip, gripsAt } from './grips.ts';
import type { Effect, Input, Modifiers, PointerAt, PointerKind } from './hand.ts';
import { wheelPx } from './wheel.ts';

/** What a host asks of the sheet that is drawn in it. */
export interface HostClient {
  readonly grips: () => readonly Grip[];
  readonly snapOn: () => boolean;
  readonly onEffect: (effect: Effect) => void;
}

export interface Host {
  /** Something beside the pointer, such as a key or a new sketch, ends the gesture. */
  readonly cancel: () => void;
  readonly busy: () => boolean;
  readonly destroy: () => void;
}

/**
 * Turns the DOM's pointer, wheel and modifier events on `element` into inputs of the gesture reducer and hands its effects to the
 * client. Holds the gesture and nothing else.
 */
export function createHost(element: HTMLElement, client: HostClient): Host {
  let gesture = IDLE;
  const events = new AbortController();
  const { signal } = events;

  const world = {
    gripsAt: (xPx: number, yPx: number, radiusPx: number) => gripsAt(client.grips(), xPx, yPx, radiusPx),
    get snapOn() {
      return client.snapOn();
    },
  };

  const feed = (input: Input) => {
    const [next, effects] = step(gesture, input, world);
    gesture = next;
    for (const effect of effects) {
      if (effect.do === 'cursor') element.style.cursor = effect.cursor;
      else client.onEffect(effect);
    }
  };

  const onPointer = (on: 'down' | 'move' | 'up') => (event: PointerEvent) => {
    const at = pointerAt(element, event);
    if (on === 'down') {
      // A tap's belated mouse events would take the focus from what the tap opened; the focus is taken here instead.
      event.preventDefault();
      element.focus({ preventScroll: true });
      element.setPointerCapture(event.pointerId);
      feed({ on, ...at, button: event.button, timeMs: event.timeStamp });
    } else feed({ on, ...at });
  };
  element.addEventListener('pointerdown', onPointer('down'), { signal });
  element.addEventListener('pointermove', onPointer('move'), { signal });
  element.addEventListener('pointerup', onPointer('up'), { signal });
  element.addEventListener('pointercancel', ({ pointerId }) => feed({ on: 'cancel', pointerId }), { signal });
  element.addEventListener('lostpointercapture', ({ pointerId }) => feed({ on: 'lost capture', pointerId }), {
    signal,
  });
  element.addEventListener('pointerleave', () => feed({ on: 'leave' }), { signal });
  element.addEventListener(
    'wheel',
    (event) => {
      event.preventDefault();
      const { xPx, yPx } = placeIn(element, event);
      const dxPx = wheelPx(event.deltaX, event.deltaMode);
      const dyPx = wheelPx(event.deltaY, event.deltaMode);
      feed({ on: 'wheel', xPx, yPx, dxPx, dyPx, modifiers: modifiersOf(event) });
    },
    { signal, passive: false },
  );

  /** Space is the sheet's while the focus is on the sheet, on a grip of it, or nowhere. */
  const isOurs = (target: EventTarget | null): boolean =>
    target === element.ownerDocument.body || element.contains(target as Node | null);

  const onKey = (event: KeyboardEvent) => {
    if (givesUp(event) && gesture.at !== 'idle') {
      event.preventDefault();
      event.stopPropagation();
      feed({ on: 'escape' });
    } else if (event.key === ' ' && (event.type === 'keyup' || isOurs(event.target))) {
      if (isOurs(event.target)) event.preventDefault();
      feed({ on: 'space', held: event.type === 'keydown' });
    } else feed({ on: 'modifiers', modifiers: modifiersOf(event) });
  };
  const { ownerDocument } = element;
  // A key released in another window is never heard of here.
  ownerDocument.defaultView?.addEventListener('blur', () => feed({ on: 'space', held: false }), { signal });
  ownerDocument.addEventListener('keydown', onKey, { signal, capture: true });
  ownerDocument.addEventListener('keyup', onKey, { signal, capture: true });

  return {
    cancel: () => feed({ on: 'escape' }),
    busy: () => gesture.at !== 'idle',
    destroy: () => events.abort(),
  };
}

function pointerAt(element: HTMLElement, event: PointerEvent): PointerAt {
  return {
    pointerId: event.pointerId,
    kind: event.pointerType as PointerKind,
    ...placeIn(element, event),
    buttons: event.buttons,
    modifiers: modifiersOf(event),
  };
}

function placeIn(element: HTMLElement, event: MouseEvent): { readonly xPx: number; readonly yPx: number } {
  const box = element.getBoundingClientRect();
  return { xPx: event.clientX - box.left, yPx: event.clientY - box.top };
}

/** Escape, or undo, which during a gesture takes back the gesture alone. */
function givesUp({ key, ctrlKey, metaKey }: KeyboardEvent): boolean {
  return key === 'Escape' || ((ctrlKey || metaKey) && key.toLowerCase() === 'z');
}

function modifiersOf(event: MouseEvent | KeyboardEvent): Modifiers {
  return { shift: event.shiftKey, alt: event.altKey, ctrl: event.ctrlKey, meta: event.metaKey };
}
