import type { Sketch } from '../../engine/index.ts';
import type { Effect, PointerKind } from '../board/hand.ts';
import type { Fold, Viewport } from '../board/viewport.ts';
import { panBy, stretchBy, withLengthAt, xOf, zoomAbout } from '../board/viewport.ts';
import { type Handle, type Move, plainMove } from '../drawing/handle.ts';
import { typedByLabel } from '../drawing/handles/labels.ts';
import { frameLoop } from '../live/frame.ts';
import { currentReading } from '../live/reading.ts';
import { applyEdit, cancelEdit, commitEdit, previewEdit, sketchStore } from '../store/sketchStore.ts';
import { type Selected, setView, type View, viewStore } from '../store/viewStore.ts';
import { cameraAt, heldFold } from './camera.ts';
import type { HandState } from './overlay.ts';

/** What a hand needs of the board it works on. */
export interface HandBoard {
  readonly handleOf: (id: string | null) => Handle | null;
  readonly view: () => Viewport;
  /** Cuts the sheet by another fold from now on. */
  readonly refold: (fold: Fold | null) => void;
  readonly show: (change: Partial<HandState>) => void;
  readonly focus: (handle: Handle) => void;
  readonly say: (sentence: string) => void;
  readonly choose: (handles: readonly Handle[], xPx: number, yPx: number) => void;
  readonly setDown: (xPx: number) => void;
}

export interface Hand {
  readonly onEffect: (effect: Effect) => void;
  /** Steps a grip by a length, as one step of history. */
  readonly step: (handleId: string, amountMm: number, other: boolean) => void;
  /** Opens the number of a grip for typing. */
  readonly type: (handleId: string) => void;
  /** Drags a grip from elsewhere: total movement in px, as of a pointer. */
  readonly jog: (handleId: string, dxPx: number, dyPx: number, snap: boolean) => void;
  readonly endJog: (keep: boolean) => void;
  readonly busy: () => boolean;
}

/** How near, in px along the axis, something catches a drag. */
const SNAP_PX: Readonly<Record<PointerKind, number>> = { mouse: 7, pen: 7, touch: 12 };

/** How the ids of the ribbon's values begin. */
const CELL = 'cell:';

interface Pressed {
  readonly handle: Handle;
  readonly view: Viewport;
  /** Of the view, what a grip of the view may change. */
  readonly loupe: View['loupe'];
}

/** Total movement of a drag in px, and what is held beside it. */
interface Pull {
  readonly dxPx: number;
  readonly dyPx: number;
  readonly other: boolean;
  readonly snapPx: number;
}

/**
 * Turns what a hand does into edits of the sketch store and changes of the view store. A drag is always the handle as it was at
 * the press plus the total movement.
 */
export function createHand(board: HandBoard): Hand {
  let pressed: Pressed | null = null;

  const press = (handle: Handle | null) => {
    pressed = handle ? { handle, view: board.view(), loupe: viewStore.getState().loupe } : null;
  };

  const drag = ({ handle, view }: Pressed, pull: Pull, xPx: number, yPx: number, byFinger: boolean) => {
    const { viewing } = handle;
    if (viewing) {
      frameLoop.ask('settle', 'drag', () => {
        const { change, says } = viewing.drag(pull.dxPx, pull.dyPx, pull.snapPx > 0);
        setView(change);
        const from = { xPx: handle.xPx, yPx: handle.yPx };
        board.show({
          dragging: { id: handle.id, xPx, yPx, move: plainMove(unchanged, says), from, byFinger },
        });
      });
      return;
    }
    const move = moveOf(handle, view, pull);
    if (!move) {
      if (handle.why) board.say(handle.why);
      return;
    }
    frameLoop.ask('settle', 'drag', () => {
      previewMove(board, move, view);
      const from = { xPx: handle.xPx, yPx: handle.yPx };
      board.show({ dragging: { id: handle.id, xPx, yPx, move, from, byFinger } });
    });
  };

  const release = () => {
    frameLoop.flush();
    pressed = null;
    board.show({ dragging: null });
  };

  const giveUp = () => {
    frameLoop.flush();
    if (pressed?.handle.viewing) setView({ loupe: pressed.loupe });
    if (pressed && sketchStore.getState().running) {
      cancelEdit();
      board.refold(pressed.view.fold);
      setView({ camera: cameraAt(pressed.view, viewStore.getState().camera.follow) });
    }
    release();
  };

  const click = (effect: Extract<Effect, { do: 'click' | 'double click' }>) => {
    if (viewStore.getState().placing) return board.setDown(effect.xPx);
    const handle = board.handleOf(effect.grip);
    if (!handle) return setView({ selection: [] });
    const { shift, ctrl, meta } = effect.modifiers;
    const labelled = typedByLabel(handle.id);
    if (handle.press) applyEdit(handle.press);
    else if (labelled) setView({ typing: labelled });
    else if (handle.id.startsWith(CELL) || effect.do === 'double click') type(handle.id);
    else if (handle.selects && (shift || ctrl || meta)) toggle(handle.selects);
    else if (handle.selects) setView({ selection: [handle.selects] });
    else if (handle.why) board.say(handle.why);
    if (handle.slider) board.focus(handle);
  };

  /** Double click or Enter types a thin part's focal length before its place. */
  const type = (id: string) => {
    const handle = board.handleOf(id);
    const focal = id.startsWith('part:') ? board.handleOf(`${id.replace('part:', 'focal:')}:rear`) : null;
    const typed = focal ?? handle;
    if (typed?.entry) setView({ typing: typed.id });
    else if (handle?.why) board.say(handle.why);
  };

  const changeView = (change: (view: Viewport) => Viewport) =>
    setView({ camera: cameraAt(change(board.view())) });

  const onEffect = (effect: Effect) => {
    switch (effect.do) {
      case 'hover':
        return board.show({ hover: effect.grip });
      case 'press': {
        const handle = board.handleOf(effect.grip);
        press(handle);
        const { shift, ctrl, meta } = effect.modifiers;
        const alone = handle?.selects && !shift && !ctrl && !meta && !isSelected(handle.selects);
        return setView(alone ? { typing: null, selection: [handle.selects] } : { typing: null });
      }
      case 'preview': {
        if (pressed?.handle.id !== effect.grip) return;
        const { dxPx, dyPx, modifiers, snap, kind, xPx, yPx } = effect;
        const snapPx = snap ? SNAP_PX[kind] : 0;
        const pull = { dxPx, dyPx, other: otherRule(modifiers.shift), snapPx };
        return drag(pressed, pull, xPx, yPx, kind === 'touch');
      }
      case 'commit':
        release();
        return commitEdit();
      case 'cancel':
        return giveUp();
      case 'click':
      case 'double click':
        release();
        return click(effect);
      case 'choose':
        release();
        return board.choose(
          effect.grips.map(board.handleOf).filter((handle) => handle !== null),
          effect.xPx,
          effect.yPx,
        );
      case 'pan':
        return changeView((view) => panBy(view, effect.dxPx, effect.dyPx));
      case 'zoom': {
        const yPx = effect.about === 'both' ? effect.yPx : undefined;
        return changeView((view) => zoomAbout(view, effect.xPx, effect.factor, yPx));
      }
      case 'stretch':
        return changeView((view) => stretchBy(view, effect.factor));
      case 'cursor':
        return;
    }
  };

  return {
    onEffect,
    step(id, amountMm, other) {
      const handle = board.handleOf(id);
      if (handle?.viewing) setView(handle.viewing.step(amountMm).change);
      else if (handle?.step) applyEdit(handle.step(amountMm, otherRule(other)));
      else if (handle?.why) board.say(handle.why);
    },
    type,
    jog(id, dxPx, dyPx, snap) {
      if (pressed?.handle.id !== id) press(board.handleOf(id));
      if (!pressed) return;
      const { xPx, yPx } = pressed.handle;
      const pull = { dxPx, dyPx, other: otherRule(false), snapPx: snap ? SNAP_PX.touch : 0 };
      drag(pressed, pull, xPx + dxPx, yPx + dyPx, false);
    },
    endJog(keep) {
      if (!keep) return giveUp();
      release();
      commitEdit();
    },
    busy: () => pressed !== null,
  };
}

function moveOf(handle: Handle, view: Viewport, { dxPx, dyPx, other, snapPx }: Pull): Move | null {
  if (!handle.drag) return null;
  return handle.drag({
    dzMm: dxPx / view.pxPerMm,
    dyMm: -dyPx / (view.pxPerMm * view.stretch),
    dxPx,
    other,
    snap: snapPx > 0,
    toleranceMm: snapPx / view.pxPerMm,
  });
}

/**
 * Makes the move on the sketch at the press, and lets the view and its fold at the press make up for a frame of reference that moved
 * with it, so that only what the hand moves moves.
 */
function previewMove(board: HandBoard, move: Move, view: Viewport): void {
  previewEdit(move.edit);
  if (sketchStore.getState().note?.kind === 'refused') return;
  const { follow } = viewStore.getState().camera;
  const fold = heldFold(view.fold, currentReading().analysis.places.objectMm, move.frameMm);
  const firstPx = xOf(view, 0) + move.frameMm * view.pxPerMm;
  board.refold(fold);
  setView({ camera: cameraAt(withLengthAt({ ...view, fold }, 0, firstPx), follow) });
}

const unchanged = (sketch: Sketch): Sketch => sketch;

const otherRule = (shift: boolean): boolean => shift !== viewStore.getState().otherRule;

const isSelected = (selected: Selected): boolean => viewStore.getState().selection.includes(selected);

function toggle(selected: Selected): void {
  const { selection } = viewStore.getState();
  const others = selection.filter((other) => other !== selected);
  setView({ selection: others.length < selection.length ? others : [...selection, selected] });
}
