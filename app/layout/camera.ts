import { fitted, type Margins, stretchFor } from '../board/fit.ts';
import type { Fold, LengthRange, Viewport } from '../board/viewport.ts';
import { refolded, resized, visibleRange, withLengthAt, xOf } from '../board/viewport.ts';
import { partIn, type Scene, tallestAt } from '../drawing/scene.ts';
import { stageFold } from '../drawing/stage.ts';
import { RIBBON_PX } from '../ribbon/layout.ts';
import type { Camera } from '../store/viewStore.ts';

/** The board's size, px. */
export interface Size {
  readonly widthPx: number;
  readonly heightPx: number;
}

/** Where the drawing looks, and how the space it is too long for is cut. */
export interface Look {
  readonly camera: Camera;
  readonly fold: Fold | null;
}

type Shown = NonNullable<Camera['follow']>;

const WIDE: Margins = { left: 84, right: 56, top: 56, bottom: 58 };
const NARROW: Margins = { left: 34, right: 26, top: 40, bottom: 40 };
const NARROW_PX = 560;
/** Heights are never drawn more than this much taller or flatter by a fit. */
const FIT_STRETCH = { least: 0.5, most: 3 };
/** What is followed may shrink to this share of the width before it is fitted anew: a sheet that jumps is worse than a small drawing. */
const LEAST_FILL = 0.12;
/** Least height of the drawing above the axis, and its least distance from the edge, px. */
const LEAST_TALL_PX = 24;
const EDGE_PX = 12;
/** The piece in front of the parts that stays to scale may take these shares of what is drawn before a fold is cut anew. */
const KEPT_SHARES = { least: 0.1, most: 1 };
/** Places that differ by less than this share of the object's distance differ by rounding. */
const SAME_PLACE = 1e-9;

/** The view of the drawing that a camera gives on a board of this size: the ribbon lies below it. */
export function viewportOf(camera: Camera, size: Size, fold: Fold | null): Viewport {
  const { originMm, pxPerMm, stretch, axisYPx } = camera;
  const heightPx = Math.max(0, size.heightPx - RIBBON_PX);
  return { widthPx: size.widthPx, heightPx, originMm, pxPerMm, stretch, axisYPx, fold };
}

/** The camera at a view; it follows no longer unless `follow` says so. */
export function cameraAt(view: Viewport, follow: Camera['follow'] = null): Camera {
  const { originMm, pxPerMm, stretch, axisYPx } = view;
  return { follow, originMm, pxPerMm, stretch, axisYPx };
}

/** The fold of the scene, which only the fit to the parts has. */
export const foldIn = (scene: Scene, camera: Camera): Fold | null =>
  camera.follow === 'everything' ? null : stageFold(scene.stage);

/** The camera that shows the parts (a long object space folded) or everything from object to image. */
export function fitCamera(scene: Scene, size: Size, what: Shown): Camera {
  const start: Camera = { follow: what, originMm: 0, pxPerMm: 1, stretch: 1, axisYPx: size.heightPx / 2 };
  const fold = foldIn(scene, start);
  const range = shownRange(scene, fold, what);
  const maxHeightMm = tallestAt(scene, fold?.toMm ?? range.fromMm);
  const margins = marginsOf(size);
  const view = fitted(viewportOf(start, size, fold), { ...range, maxHeightMm }, margins);
  return cameraAt(
    { ...view, stretch: moderate(view.stretch, maxHeightMm * view.pxPerMm, tallRoom(view, margins)) },
    what,
  );
}

/** The look that a fit gives, with a fold of its own. */
export function fitLook(scene: Scene, size: Size, what: Shown): Look {
  const camera = fitCamera(scene, size, what);
  return { camera, fold: foldIn(scene, camera) };
}

/**
 * The look to go on with between gestures; its camera is the very same while it shows what it follows. A sketch just opened, and a
 * board of another width, are fitted; another height only changes the heights; and so does a layout that has become too tall or too
 * flat, so that nothing moves along the axis. `sizeBefore` is null for the first look.
 */
export function settled(
  scene: Scene,
  { camera, fold }: Look,
  size: Size,
  opened: boolean,
  sizeBefore: Size | null,
): Look {
  const { follow } = camera;
  const widthStays = sizeBefore?.widthPx === size.widthPx;
  if (follow && (opened || !widthStays)) return fitLook(scene, size, follow);
  const cut = keptFold(scene, camera, fold);
  let view = viewportOf(camera, sizeBefore ?? size, fold);
  if (!sameFold(fold, cut)) view = refolded(view, cut, xOf(view, 0));
  const { heightPx } = viewportOf(camera, size, cut);
  const tallerOrLower = view.heightPx !== heightPx;
  view = resized(view, size.widthPx, heightPx);
  if (follow && tallerOrLower) view = withHeights(scene, view, size);
  const next = cameraAt(view, follow);
  return followed(scene, { camera: sameCamera(next, camera) ? camera : next, fold: cut }, size);
}

/**
 * The look while it shows well what it follows, else fitted anew, in heights alone where that is enough. A fit that cannot show it any
 * better is the very same again, so that following comes to rest.
 */
export function followed(scene: Scene, look: Look, size: Size): Look {
  const { camera, fold } = look;
  const { follow } = camera;
  if (!follow) return look;
  const view = viewportOf(camera, size, fold);
  const lengthsShown = showsLengths(scene, view, follow);
  if (lengthsShown && showsHeights(scene, view)) return look;
  if (lengthsShown) {
    const upright = withHeights(scene, view, size);
    const better = cameraAt(upright, follow);
    if (isInHeight(scene, upright)) return sameCamera(better, camera) ? look : { camera: better, fold };
  }
  const fit = fitLook(scene, size, follow);
  return sameCamera(fit.camera, camera) ? { camera, fold: fit.fold } : fit;
}

/**
 * The fold at the press while a drag has moved the frame that lengths are counted in by `frameMm` and the object to `objectMm`: all
 * that the hand does not move keeps its place. It gives way to the first part, and is gone when the object comes close.
 */
export function heldFold(fold: Fold | null, objectMm: number | null, frameMm: number): Fold | null {
  if (fold === null || objectMm === null) return null;
  const toMm = Math.min(0, fold.toMm - frameMm);
  return objectMm < toMm ? { ...fold, fromMm: objectMm, toMm } : null;
}

/**
 * The look at a scene after an edit, with everything that stayed where it was on the sheet. Lengths count from the first part: when
 * another part has become the first, or the first has moved away from all the others, they count from elsewhere.
 */
export function inPlace(before: { scene: Scene; view: Viewport }, scene: Scene, look: Look): Look {
  const shiftMm = frameShift(before.scene, scene);
  if (shiftMm === 0) return look;
  const { view } = before;
  const knownMm = before.scene.stage.parts.toMm;
  const fold = heldFold(look.fold, scene.stage.objectMm, -shiftMm);
  const placed = withLengthAt({ ...view, fold }, knownMm + shiftMm, xOf(view, knownMm));
  return { camera: { ...look.camera, originMm: placed.originMm }, fold };
}

/** How much further from the first part what stayed now is, mm; 0 when that cannot be told. */
function frameShift(before: Scene, scene: Scene): number {
  const stayed = before.parts.flatMap((was) => {
    const is = partIn(scene, was.part.id);
    return is ? [{ id: was.part.id, byMm: is.frontMm - was.frontMm }] : [];
  });
  const first = scene.parts[0]?.part.id;
  if (stayed[0] && before.parts[0]?.part.id !== first) return stayed[0].byMm;
  const objectBefore = before.stage.objectMm;
  const objectNow = scene.stage.objectMm;
  if (objectBefore === null || objectNow === null) return 0;
  const byMm = objectNow - objectBefore;
  const others = stayed.filter(({ id }) => id !== first);
  const together = others.every((other) => Math.abs(other.byMm - byMm) <= SAME_PLACE * Math.abs(objectNow));
  return others.length > 0 && together ? byMm : 0;
}

/** The fold cut where it was, as long as the piece that stays to scale has a fair length; else where a fit would cut it. */
function keptFold(scene: Scene, camera: Camera, before: Fold | null): Fold | null {
  const fresh = foldIn(scene, camera);
  if (fresh === null || before === null) return fresh;
  const { fromMm, toMm } = scene.stage.parts;
  const share = (fromMm - before.toMm) / (toMm - fromMm);
  const fair = share >= KEPT_SHARES.least && share <= KEPT_SHARES.most && fresh.fromMm < before.toMm;
  return fair ? { ...before, fromMm: fresh.fromMm } : fresh;
}

const marginsOf = (size: Size): Margins => (size.widthPx < NARROW_PX ? NARROW : WIDE);

const tallRoom = (view: Viewport, { top, bottom }: Margins): number => view.heightPx - top - bottom;

/** A stretch within what a fit allows, unless heights up to `maxPx` would then be taller than half of `tallPx`. */
function moderate(stretch: number, maxPx: number, tallPx: number): number {
  const within = Math.min(FIT_STRETCH.most, Math.max(FIT_STRETCH.least, stretch));
  return maxPx * within > tallPx / 2 ? stretch : within;
}

/** The view with heights and axis as a fit would draw them, lengths as they are. */
function withHeights(scene: Scene, view: Viewport, size: Size): Viewport {
  const margins = marginsOf(size);
  const tallPx = tallRoom(view, margins);
  const axisYPx = tallPx > 0 ? margins.top + tallPx / 2 : view.heightPx / 2;
  const fromMm = view.fold?.toMm ?? Math.max(visibleRange(view).fromMm, scene.stage.startMm);
  const maxHeightMm = tallestAt(scene, fromMm);
  const stretch = stretchFor(maxHeightMm, view.pxPerMm, tallPx);
  return { ...view, axisYPx, stretch: moderate(stretch, maxHeightMm * view.pxPerMm, tallPx) };
}

const sameCamera = (a: Camera, b: Camera): boolean =>
  a.follow === b.follow &&
  a.originMm === b.originMm &&
  a.pxPerMm === b.pxPerMm &&
  a.stretch === b.stretch &&
  a.axisYPx === b.axisYPx;

/** Whether the parts and ends that are followed are on the sheet and have not shrunk to a speck on it. */
function showsLengths(scene: Scene, view: Viewport, what: Shown): boolean {
  const { fromMm, toMm } = neededRange(scene, view.fold, what);
  const visible = visibleRange(view);
  if (fromMm < visible.fromMm || toMm > visible.toMm) return false;
  const whole = shownRange(scene, view.fold, what);
  return xOf(view, whole.toMm) - xOf(view, whole.fromMm) >= LEAST_FILL * view.widthPx;
}

function showsHeights(scene: Scene, view: Viewport): boolean {
  const tallPx = scene.tallestMm * view.pxPerMm * view.stretch;
  return isInHeight(scene, view) && (scene.tallestMm === 0 || tallPx >= LEAST_TALL_PX);
}

function isInHeight({ tallestMm }: Scene, view: Viewport): boolean {
  const roomPx = Math.min(view.axisYPx, view.heightPx - view.axisYPx) - EDGE_PX;
  return tallestMm * view.pxPerMm * view.stretch <= roomPx;
}

/** What a fit shows: parts and ends, and the lead of rays that come from infinity or go there. */
function shownRange({ stage }: Scene, fold: Fold | null, what: Shown): LengthRange {
  if (what === 'everything') return stage.everything;
  const { fromMm, toMm } = stage.parts;
  if (fold) return { fromMm: fold.fromMm, toMm };
  if (stage.objectMm !== null) return { fromMm: Math.min(fromMm, stage.objectMm), toMm };
  return { fromMm: Math.min(fromMm, Math.max(stage.startMm, 2 * fromMm - toMm)), toMm };
}

/** What has to be on the sheet: as a fit shows it, without the lead of rays. */
function neededRange(scene: Scene, fold: Fold | null, what: Shown): LengthRange {
  const { stage, parts } = scene;
  const shown = shownRange(scene, fold, what);
  const lastMm = Math.max(...parts.map(({ rearMm }) => rearMm));
  const fromMm = stage.objectMm === null ? stage.parts.fromMm : shown.fromMm;
  return { fromMm, toMm: parts.length === 0 ? shown.toMm : Math.max(lastMm, stage.imageMm ?? lastMm) };
}

/** Whether two folds cut the same piece. */
const sameFold = (a: Fold | null, b: Fold | null): boolean =>
  a === b || (a !== null && b !== null && a.fromMm === b.fromMm && a.toMm === b.toMm);
