import type { Sketch } from '../../engine/index.ts';
import { mmPer } from '../../engine/index.ts';
import { canvasPen } from '../board/canvasPen.ts';
import { keyStepMm } from '../board/fit.ts';
import { createHost } from '../board/host.ts';
import type { LabelPlace } from '../board/labels.ts';
import { canvasMeasure, roughMeasure } from '../board/measure.ts';
import type { Pen } from '../board/pen.ts';
import { type Mark, recorderPen } from '../board/recorderPen.ts';
import { createSliderMirror } from '../board/sliderMirror.ts';
import { PALETTES, type ThemeName } from '../board/styles.ts';
import { createSurface } from '../board/surface.ts';
import type { Fold, Viewport } from '../board/viewport.ts';
import { panBy, stretchBy, xOf, zOf, zoomAbout } from '../board/viewport.ts';
import type { Handle } from '../drawing/handle.ts';
import { labelHandles } from '../drawing/handles/labels.ts';
import { loupeBoxes } from '../drawing/loupe/loupe.ts';
import type { Scene } from '../drawing/scene.ts';
import { plainLength } from '../drawing/words.ts';
import { frameLoop } from '../live/frame.ts';
import { currentReading, onReading } from '../live/reading.ts';
import type { Document } from '../store/document.ts';
import { sketchStore } from '../store/sketchStore.ts';
import { type Selected, setView, viewStore } from '../store/viewStore.ts';
import { cameraAt, fitLook, inPlace, type Look, type Size, settled, viewportOf } from './camera.ts';
import { frozenLabels } from './frozen.ts';
import { createHand, type Hand } from './hand.ts';
import { type HandState, IDLE_HAND, overlayLayer } from './overlay.ts';
import { paintLoupe, paintParts, paintRays } from './paint.ts';
import { type Picture, pictureOf, sceneOfReading } from './picture.ts';
import type { Spot } from './tray.ts';
import { viewToolsBox } from './viewToolsBox.ts';

/** What the board asks of the app around it. */
export interface BoardClient {
  readonly theme: () => ThemeName;
  /** One plain sentence for the person: why something cannot be dragged. */
  readonly say: (sentence: string) => void;
  /** Several grips lie under a finger: let the person choose one by name. */
  readonly choose: (handles: readonly Handle[], xPx: number, yPx: number) => void;
  /** Something waits in the tray and the axis was clicked here. */
  readonly setDown: (spot: Spot) => void;
  /** The grip with the focus and its value, in words, whenever either changes; null when none has it. */
  readonly speak: (text: string | null) => void;
  /** A frame has been drawn. */
  readonly onFrame: () => void;
}

/** The drawing and its ribbon as one board. */
export interface Board extends Pick<Hand, 'jog' | 'endJog' | 'type'> {
  readonly fit: (what: 'parts' | 'everything') => void;
  /** The picture of the last frame; null before the first. */
  readonly picture: () => Picture | null;
  readonly stretchBy: (factor: number) => void;
  readonly zoomBy: (factor: number) => void;
  /** The spot on the axis under a point of the window; null when the point is not over the board. */
  readonly spotUnder: (clientX: number, clientY: number) => Spot | null;
  /** Shows where the thing from the tray would be set down. */
  readonly showDrop: (zMm: number | null) => void;
  readonly focusGrip: (handleId: string) => boolean;
  readonly repaint: () => void;
  readonly destroy: () => void;
}

type Layer = 'rays' | 'parts' | 'loupe' | 'overlay';

/** How near a part something is set down on it, px. */
const ONTO_PX = 9;
const PAN_PX = 40;
const zoomBy = (factor: number) => (view: Viewport) => zoomAbout(view, view.widthPx / 2, factor);

/** What the keys do to the view while no grip has the focus. */
const KEYS: Readonly<Record<string, (view: Viewport) => Viewport>> = {
  ArrowLeft: (view) => panBy(view, PAN_PX, 0),
  ArrowRight: (view) => panBy(view, -PAN_PX, 0),
  ArrowUp: (view) => stretchBy(view, 1.1),
  ArrowDown: (view) => stretchBy(view, 1 / 1.1),
  '+': zoomBy(1.2),
  '=': zoomBy(1.2),
  '-': zoomBy(1 / 1.2),
};

/** Mounts the board in `element`: it draws a frame whenever the reading changes and gives the hand its grips. */
export function createBoard(element: HTMLElement, client: BoardClient): Board {
  let picture: Picture | null = null;
  let labelPlaces: readonly LabelPlace[] = [];
  let labelGrips: readonly Handle[] = [];
  let fold: Fold | null = null;
  let loupeDrawn = false;
  let drawn: Sketch | null = null;
  /** The sketch and the board's size when the camera last came to rest. */
  let rested: { readonly sketch: Sketch; readonly size: Size } | null = null;
  let selected: readonly Selected[] = viewStore.getState().selection;
  let words: readonly LabelPlace[] = [];
  let state: HandState = IDLE_HAND;

  const grips = (): readonly Handle[] => [...(picture?.handles ?? []), ...labelGrips];
  const handleOf = (id: string | null): Handle | null => grips().find((handle) => handle.id === id) ?? null;
  const stepMm = (now: Viewport): number => keyStepMm(now, mmPer(viewStore.getState().unit));
  const view = (): Viewport => viewportOf(viewStore.getState().camera, surface.size(), fold);
  const lookAt = (look: Look) => {
    fold = look.fold;
    if (look.camera !== viewStore.getState().camera) setView({ camera: look.camera });
  };
  const show = (change: Partial<HandState>) => {
    state = { ...state, ...change };
    frameLoop.ask('draw', 'hand', drawParts);
  };
  const spotAt = (xPx: number): Spot => {
    const parts = (picture?.scene.parts ?? []).map(({ part, frontMm }) => ({
      id: part.id,
      asidePx: Math.abs(xOf(view(), frontMm) - xPx),
    }));
    const near = parts.filter(({ asidePx }) => asidePx < ONTO_PX).sort((a, b) => a.asidePx - b.asidePx)[0];
    return { zMm: zOf(view(), xPx), onto: near?.id ?? null };
  };
  const speak = () => {
    const handle = handleOf(state.focus);
    client.speak(handle?.slider ? `${handle.label}: ${handle.slider.valueText}` : null);
  };
  const hand = createHand({
    handleOf,
    view,
    refold: (next) => {
      fold = next;
    },
    show,
    focus: ({ id }) => mirror.focus(id),
    say: client.say,
    choose: client.choose,
    setDown: (xPx) => client.setDown(spotAt(xPx)),
  });

  const surface = createSurface<Layer>(element, ['rays', 'parts', 'loupe', 'overlay'], () => draw());
  const { measure, forget } = canvasMeasure(
    surface.canvas('parts').getContext('2d') as CanvasRenderingContext2D,
  );
  document.fonts.ready.then(() => {
    forget();
    frameLoop.ask('draw', 'board', draw);
  });

  const paint = (layer: Layer, drawOn: (pen: Pen) => void) => {
    const ctx = surface.begin(layer);
    if (ctx) drawOn(canvasPen(ctx, PALETTES[client.theme()], surface.size().pixelRatio));
  };

  const draw = () => {
    const size = surface.size();
    if (size.widthPx === 0 || size.heightPx === 0) return;
    const scene = sceneOfReading(currentReading());
    if (!hand.busy() && !sketchStore.getState().running) settleCamera(scene, picture);
    const now = pictureOf(currentReading(), view(), measure, scene);
    picture = now;
    paint('rays', (pen) => paintRays(pen, now));
    if (now.loupe || loupeDrawn) paint('loupe', (pen) => paintLoupe(pen, now));
    loupeDrawn = now.loupe !== null;
    drawParts();
    mirror.update(now.handles);
    if (drawn !== now.reading.sketch) speak();
    drawn = now.reading.sketch;
    followSelection(now.reading.view.selection);
    client.onFrame();
  };

  /** Between gestures: what stays keeps its place, or the sheet is fitted when that is called for. */
  const settleCamera = (scene: Scene, before: Picture | null) => {
    const size = surface.size();
    const doc = sketchStore.getState();
    const look = { camera: viewStore.getState().camera, fold };
    const opened = rested !== null && !isInHistory(doc, rested.sketch);
    const moved = before && before.view.originMm === look.camera.originMm;
    const placed = moved && !opened ? inPlace(before, scene, look) : look;
    lookAt(settled(scene, placed, size, opened, rested?.size ?? null));
    rested = { sketch: doc.sketch, size };
  };

  /**
   * While the drawing has the focus, the newly selected part's grip takes it, so that the arrow keys move it; unless another grip of
   * that part has it already.
   */
  const followSelection = (selection: readonly Selected[]) => {
    const changed = selection !== selected;
    selected = selection;
    const [only] = selection;
    if (!changed || only === undefined || !element.contains(document.activeElement)) return;
    if (handleOf(mirror.focusedId())?.selects === only) return;
    mirror.focus(only === 'object' ? 'object:foot' : only === 'image' ? 'image' : `part:${only}`);
  };

  const drawParts = () => {
    const now = picture;
    if (!now) return;
    paint('parts', (pen) => {
      labelPlaces = paintParts(pen, now, state.hover, {
        former: labelPlaces,
        frozen: frozenLabels(state, labelPlaces),
        covered: [viewToolsBox(now.view.widthPx), ...(now.loupe ? loupeBoxes(now.loupe) : [])],
      });
    });
    labelGrips = labelHandles(now.sight, labelPlaces);
    const step = plainLength(stepMm(now.view), now.reading.view.unit);
    if (step !== state.step) state = { ...state, step };
    const room = { measure, labels: labelPlaces, former: words };
    paint('overlay', (pen) => {
      words = overlayLayer(pen, now.handles, now.view, now.plan.topPx, state, room);
    });
  };

  const host = createHost(element, {
    grips,
    snapOn: () => viewStore.getState().snap,
    onEffect: hand.onEffect,
  });
  const mirror = createSliderMirror(element, {
    onStep: (id, steps, { shift }) => hand.step(id, steps * stepMm(view()), shift),
    onFocus: (focus) => {
      show({ focus, ring: document.activeElement?.matches(':focus-visible') ?? false });
      speak();
    },
    onEnter: hand.type,
  });
  const stopReading = onReading(draw);
  const onKeyDown = (event: KeyboardEvent) => {
    const change = event.target === element && !event.ctrlKey && !event.metaKey ? KEYS[event.key] : undefined;
    if (!change) return;
    event.preventDefault();
    changeView(change);
  };
  element.addEventListener('keydown', onKeyDown);
  Object.assign(element, { record: () => recorded(picture, state) });

  const changeView = (change: (view: Viewport) => Viewport) => setView({ camera: cameraAt(change(view())) });

  return {
    jog: hand.jog,
    endJog: hand.endJog,
    type: hand.type,
    fit: (what) => lookAt(fitLook(sceneOfReading(currentReading()), surface.size(), what)),
    picture: () => picture,
    stretchBy: (factor) => changeView((now) => stretchBy(now, factor)),
    zoomBy: (factor) => changeView(zoomBy(factor)),
    spotUnder(clientX, clientY) {
      const box = element.getBoundingClientRect();
      const xPx = clientX - box.left;
      const yPx = clientY - box.top;
      const inside = xPx >= 0 && xPx <= box.width && yPx >= 0 && yPx <= box.height;
      return inside ? spotAt(xPx) : null;
    },
    showDrop: (zMm) => show({ dropXPx: zMm === null ? null : xOf(view(), zMm) }),
    focusGrip: (id) => mirror.focus(id),
    repaint: draw,
    destroy() {
      stopReading();
      element.removeEventListener('keydown', onKeyDown);
      host.destroy();
      mirror.destroy();
      surface.destroy();
    },
  };
}

/** Whether a sketch is one that undo and redo lead to, so that the present one came of it by edits. */
const isInHistory = ({ sketch, past, future }: Document, known: Sketch): boolean =>
  sketch === known || past.includes(known) || future.includes(known);

/** What is drawn, as plain data: browser tests read the drawing from `element.record()`. */
function recorded(picture: Picture | null, state: HandState): readonly Mark[] {
  if (!picture) return [];
  const pen = recorderPen(3);
  pen.group('rays', () => paintRays(pen, picture));
  pen.group('parts', () => paintParts(pen, picture));
  pen.group('loupe', () => paintLoupe(pen, picture));
  const { handles, view, plan } = picture;
  const room = { measure: roughMeasure, labels: [], former: [] };
  pen.group('overlay', () => overlayLayer(pen, handles, view, plan.topPx, state, room));
  return pen.marks;
}
