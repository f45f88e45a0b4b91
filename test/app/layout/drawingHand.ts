import { vi } from 'vitest';
import { type Gesture, IDLE, step } from '../../../app/board/gesture.ts';
import { gripsAt } from '../../../app/board/grips.ts';
import { type Input, type Modifiers, NO_MODIFIERS, type PointerKind } from '../../../app/board/hand.ts';
import { roughMeasure } from '../../../app/board/measure.ts';
import type { Fold, Viewport } from '../../../app/board/viewport.ts';
import type { Handle } from '../../../app/drawing/handle.ts';
import { fitCamera, foldIn, viewportOf } from '../../../app/layout/camera.ts';
import { createHand } from '../../../app/layout/hand.ts';
import type { HandState } from '../../../app/layout/overlay.ts';
import { type Picture, pictureOf, sceneOfReading } from '../../../app/layout/picture.ts';
import { frameLoop } from '../../../app/live/frame.ts';
import { currentReading } from '../../../app/live/reading.ts';
import { openSketch } from '../../../app/store/sketchStore.ts';
import { setView, type View, viewStore } from '../../../app/store/viewStore.ts';
import type { Sketch } from '../../../engine/index.ts';
import { DESKTOP, grip } from '../drawing/seen.ts';

/** Frames come when a test lets the loop run, or when the hand lets go. */
vi.stubGlobal('requestAnimationFrame', () => 0);

/**
 * A hand over a drawing without a browser: pointer inputs go through the gesture reducer and the hand into the stores; grips are
 * those of the picture as it stands.
 */
export class DrawingHand {
  readonly said: string[] = [];
  readonly chosen: string[][] = [];
  readonly focused: string[] = [];
  readonly setDownAt: number[] = [];
  state: Partial<HandState> = {};
  private gesture: Gesture = IDLE;
  private modifiers: Modifiers = NO_MODIFIERS;
  private fold: Fold | null;
  private xPx = 0;
  private yPx = 0;
  private timeMs = 0;

  constructor(
    sketch: Sketch,
    view: Partial<View> = {},
    private readonly kind: PointerKind = 'mouse',
  ) {
    frameLoop.flush();
    openSketch(sketch);
    viewStore.setState({ ...viewStore.getInitialState(), ...view }, true);
    const scene = sceneOfReading(currentReading());
    const camera = fitCamera(scene, DESKTOP, 'parts');
    this.fold = foldIn(scene, camera);
    setView({ camera });
  }

  readonly hand = createHand({
    handleOf: (id) => this.picture.handles.find((handle) => handle.id === id) ?? null,
    view: () => this.view,
    refold: (fold) => {
      this.fold = fold;
    },
    show: (change) => {
      this.state = { ...this.state, ...change };
    },
    focus: ({ id }) => this.focused.push(id),
    say: (sentence) => this.said.push(sentence),
    choose: (handles) => this.chosen.push(handles.map(({ id }) => id)),
    setDown: (xPx) => this.setDownAt.push(xPx),
  });

  get view(): Viewport {
    return viewportOf(viewStore.getState().camera, DESKTOP, this.fold);
  }

  get picture(): Picture {
    return pictureOf(currentReading(), this.view, roughMeasure);
  }

  grip(id: string): Handle {
    return grip(this.picture, id);
  }

  /** Presses where a grip can be taken: a line grip `fromAxisPx` off the axis, clear of what stands there. */
  pressGrip(id: string, fromAxisPx = 0): this {
    const { xPx, yPx } = this.grip(id);
    return this.press(xPx, yPx - fromAxisPx);
  }

  press(xPx: number, yPx: number): this {
    return this.do({ on: 'down', button: 0, timeMs: this.timeMs, ...this.pointer(xPx, yPx, 1) });
  }

  /** Moves on by this many px and lets a frame pass. */
  moveBy(dxPx: number, dyPx = 0): this {
    this.do({ on: 'move', ...this.pointer(this.xPx + dxPx, this.yPx + dyPx, 1) });
    frameLoop.flush();
    return this;
  }

  release(): this {
    return this.do({ on: 'up', ...this.pointer(this.xPx, this.yPx, 0) });
  }

  click(xPx: number, yPx: number): this {
    return this.press(xPx, yPx).release();
  }

  clickGrip(id: string, fromAxisPx = 0): this {
    return this.pressGrip(id, fromAxisPx).release();
  }

  hold(change: Partial<Modifiers>): this {
    this.modifiers = { ...this.modifiers, ...change };
    this.do({ on: 'modifiers', modifiers: this.modifiers });
    frameLoop.flush();
    return this;
  }

  escape(): this {
    return this.do({ on: 'escape' });
  }

  wait(ms: number): this {
    this.timeMs += ms;
    return this;
  }

  wheel(dxPx: number, dyPx: number): this {
    const { xPx, yPx, modifiers } = this;
    return this.do({ on: 'wheel', xPx, yPx, dxPx, dyPx, modifiers });
  }

  get pointerXPx(): number {
    return this.xPx;
  }

  private do(input: Input): this {
    const { handles } = this.picture;
    const world = {
      gripsAt: (xPx: number, yPx: number, radiusPx: number) => gripsAt(handles, xPx, yPx, radiusPx),
      snapOn: viewStore.getState().snap,
    };
    const [next, effects] = step(this.gesture, input, world);
    this.gesture = next;
    for (const effect of effects) this.hand.onEffect(effect);
    return this;
  }

  private pointer(xPx: number, yPx: number, buttons: number) {
    this.xPx = xPx;
    this.yPx = yPx;
    return { pointerId: 1, kind: this.kind, xPx, yPx, buttons, modifiers: this.modifiers };
  }
}
