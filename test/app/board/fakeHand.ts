import { expect } from 'vitest';
import { type Gesture, IDLE, step } from '../../../app/board/gesture.ts';
import { gripsAt } from '../../../app/board/grips.ts';
import type { Effect, Input, Modifiers, PointerKind } from '../../../app/board/hand.ts';
import { NO_MODIFIERS } from '../../../app/board/hand.ts';

/** Grips on an otherwise empty sheet: two parts 8 px apart, one well away, and a mark to be clicked only. */
const GRIPS = [
  { id: 'first', order: 6, xPx: 100, yPx: 100, line: { topPx: 50, bottomPx: 150 }, cursor: 'ew-resize' },
  { id: 'second', order: 6, xPx: 108, yPx: 100, line: { topPx: 50, bottomPx: 150 }, cursor: 'ew-resize' },
  { id: 'field', order: 5, xPx: 300, yPx: 60, line: null, cursor: 'ns-resize' },
  { id: 'mark', order: 9, xPx: 400, yPx: 100, line: null, cursor: 'default', fixed: true as const },
];

type Finger = 1 | 2 | 3;

/** A hand over the sheet: it moves a pointer, and what it causes is written down. */
export class FakeHand {
  gesture: Gesture = IDLE;
  /** Every effect so far. */
  readonly effects: Effect[] = [];
  private latest: readonly Effect[] = [];
  private modifiers: Modifiers = NO_MODIFIERS;
  private xPx = 0;
  private yPx = 0;
  private timeMs = 0;

  constructor(
    private readonly kind: PointerKind = 'mouse',
    private readonly snapOn = true,
  ) {}

  hover(xPx: number, yPx: number): this {
    return this.do({ on: 'move', ...this.pointer(1, xPx, yPx, 0) });
  }

  press(xPx: number, yPx: number, { finger = 1 as Finger, button = 0 } = {}): this {
    const buttons = [1, 4, 2][button] ?? 1;
    return this.do({ on: 'down', button, timeMs: this.timeMs, ...this.pointer(finger, xPx, yPx, buttons) });
  }

  moveTo(xPx: number, yPx: number, finger: Finger = 1): this {
    return this.do({ on: 'move', ...this.pointer(finger, xPx, yPx, 1) });
  }

  release(finger: Finger = 1): this {
    return this.do({ on: 'up', ...this.pointer(finger, this.xPx, this.yPx, 0) });
  }

  releaseAt(xPx: number, yPx: number, finger: Finger = 1): this {
    return this.do({ on: 'up', ...this.pointer(finger, xPx, yPx, 0) });
  }

  click(xPx: number, yPx: number): this {
    return this.press(xPx, yPx).release();
  }

  hold(change: Partial<Modifiers>): this {
    this.modifiers = { ...this.modifiers, ...change };
    return this.do({ on: 'modifiers', modifiers: this.modifiers });
  }

  space(held: boolean): this {
    return this.do({ on: 'space', held });
  }

  escape(): this {
    return this.do({ on: 'escape' });
  }

  loseCapture(finger: Finger = 1): this {
    return this.do({ on: 'lost capture', pointerId: finger });
  }

  leave(): this {
    return this.do({ on: 'leave' });
  }

  wheel(dxPx: number, dyPx: number): this {
    const { xPx, yPx, modifiers } = this;
    return this.do({ on: 'wheel', xPx, yPx, dxPx, dyPx, modifiers });
  }

  wait(ms: number): this {
    this.timeMs += ms;
    return this;
  }

  expectAt(at: Gesture['at']): this {
    expect(this.gesture.at).toBe(at);
    return this;
  }

  /** The effects of the last input, cursor and hover left out, match these in number and order. */
  expectDone(...wanted: readonly Partial<Effect>[]): this {
    const done = this.latest.filter((effect) => effect.do !== 'cursor' && effect.do !== 'hover');
    expect(done).toEqual(wanted.map((effect) => expect.objectContaining(effect)));
    return this;
  }

  expectNothing(): this {
    expect(this.latest).toEqual([]);
    return this;
  }

  /** The last value of an effect that is a state: the cursor, or the hovered grip. */
  last<D extends Effect['do']>(what: D): Extract<Effect, { do: D }> | undefined {
    return this.effects.findLast((effect): effect is Extract<Effect, { do: D }> => effect.do === what);
  }

  private do(input: Input): this {
    const world = {
      gripsAt: (xPx: number, yPx: number, radiusPx: number) => gripsAt(GRIPS, xPx, yPx, radiusPx),
      snapOn: this.snapOn,
    };
    const [next, effects] = step(this.gesture, input, world);
    this.gesture = next;
    this.latest = effects;
    this.effects.push(...effects);
    return this;
  }

  private pointer(finger: Finger, xPx: number, yPx: number, buttons: number) {
    this.xPx = xPx;
    this.yPx = yPx;
    return { pointerId: finger, kind: this.kind, xPx, yPx, buttons, modifiers: this.modifiers };
  }
}
