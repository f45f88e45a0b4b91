import { fitted, type Margins } from '../board/fit.ts';
import type { Fold, LengthRange, Viewport } from '../board/viewport.ts';
import { visibleRange, xOf } from '../board/viewport.ts';
import { type Scene, tallestAt } from '../drawing/scene.ts';
import { stageFold } from '../drawing/stage.ts';
import { RIBBON_PX } from '../ribbon/layout.ts';
import type { Camera } from '../store/viewStore.ts';

/** The board's size, px. */
export interface Size {
  readonly widthPx: number;
  readonly heightPx: number;
}

const WIDE: Margins = { left: 84, right: 56, top: 56, bottom: 58 };
const NARROW: Margins = { left: 34, right: 26, top: 40, bottom: 40 };
const NARROW_PX = 560;
/** Heights are never drawn more than this much taller or flatter by a fit. */
const FIT_STRETCH = { least: 0.5, most: 3 };
/** A fit counts as still good while what it shows fills this share of the width. */
const GOOD_FILL = 0.45;

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
export function fitCamera(scene: Scene, size: Size, what: 'parts' | 'everything'): Camera {
  const start: Camera = { follow: what, originMm: 0, pxPerMm: 1, stretch: 1, axisYPx: size.heightPx / 2 };
  const fold = foldIn(scene, start);
  const range = shownRange(scene, fold, what);
  const maxHeightMm = tallestAt(scene, fold?.toMm ?? range.fromMm);
  const margins = size.widthPx < NARROW_PX ? NARROW : WIDE;
  const view = fitted(viewportOf(start, size, fold), { ...range, maxHeightMm }, margins);
  const stretch = Math.min(FIT_STRETCH.most, Math.max(FIT_STRETCH.least, view.stretch));
  const tall = maxHeightMm * view.pxPerMm * stretch;
  const room = (view.heightPx - margins.top - margins.bottom) / 2;
  return cameraAt({ ...view, stretch: tall > room ? view.stretch : stretch }, what);
}

/**
 * The camera to go on with: the very same while it shows well what it follows, else fitted anew. A fit that cannot show it any better
 * is the very same again, so that following comes to rest.
 */
export function followed(scene: Scene, camera: Camera, size: Size, fold: Fold | null): Camera {
  const { follow } = camera;
  if (!follow || !needsFit(scene, viewportOf(camera, size, fold), follow)) return camera;
  const fit = fitCamera(scene, size, follow);
  return sameCamera(fit, camera) ? camera : fit;
}

const sameCamera = (a: Camera, b: Camera): boolean =>
  a.follow === b.follow &&
  a.originMm === b.originMm &&
  a.pxPerMm === b.pxPerMm &&
  a.stretch === b.stretch &&
  a.axisYPx === b.axisYPx;

/** Whether what the camera follows has left the sheet or shrunk on it, so that it is time to fit again. */
function needsFit(scene: Scene, view: Viewport, what: 'parts' | 'everything'): boolean {
  const range = shownRange(scene, view.fold, what);
  const visible = visibleRange(view);
  if (range.fromMm < visible.fromMm || range.toMm > visible.toMm) return true;
  if (xOf(view, range.toMm) - xOf(view, range.fromMm) < GOOD_FILL * view.widthPx) return true;
  const tallPx = scene.tallestMm * view.pxPerMm * view.stretch;
  return tallPx > view.axisYPx - 12 || (scene.tallestMm > 0 && tallPx < 24);
}

function shownRange({ stage }: Scene, fold: Fold | null, what: 'parts' | 'everything'): LengthRange {
  if (what === 'everything') return stage.everything;
  if (fold) return { fromMm: fold.fromMm, toMm: stage.parts.toMm };
  const { fromMm, toMm } = stage.parts;
  return { fromMm: Math.min(fromMm, Math.max(stage.startMm, 2 * fromMm - toMm)), toMm };
}

/** Whether two folds cut the same piece. */
export const sameFold = (a: Fold | null, b: Fold | null): boolean =>
  a === b || (a !== null && b !== null && a.fromMm === b.fromMm && a.toMm === b.toMm);
