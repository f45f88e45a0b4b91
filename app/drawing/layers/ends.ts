import type { LengthUnit } from '../../../engine/index.ts';
import { mmPer } from '../../../engine/index.ts';
import { scaleBar } from '../../board/fit.ts';
import type { Box } from '../../board/labels.ts';
import type { Pen } from '../../board/pen.ts';
import { segment } from '../../board/pen.ts';
import type { Viewport } from '../../board/viewport.ts';
import { xOf, yOf } from '../../board/viewport.ts';
import type { Scene } from '../scene.ts';
import { plain } from '../words.ts';

const ARROW_PX = 5;
const FOLD_ZIGZAG_PX = 9;
/** Height of a sensor whose size is not given. */
const BARE_SENSOR_PX = 40;

/** The axis with its break, the object, the image plane and the mount plane. */
export function endsLayer(pen: Pen, scene: Scene, view: Viewport): void {
  axis(pen, view);
  object(pen, scene, view);
  image(pen, scene, view);
  if (scene.mountMm !== null) {
    const x = xOf(view, scene.mountMm);
    const reach = 1.25 * Math.max(scene.tallestMm, scene.sensorSemiMm ?? 0);
    segment(pen, x, yOf(view, reach), x, yOf(view, -reach), 'mount');
  }
}

function axis(pen: Pen, view: Viewport): void {
  const y = yOf(view, 0);
  const { fold } = view;
  if (!fold) {
    segment(pen, 0, y, view.widthPx, y, 'axis');
    return;
  }
  const middle = (xOf(view, fold.fromMm) + xOf(view, fold.toMm)) / 2;
  segment(pen, 0, y, middle - 6, y, 'axis');
  segment(pen, middle + 6, y, view.widthPx, y, 'axis');
  for (const x of [middle - 3, middle + 3]) {
    pen.polyline([x + 3, y - FOLD_ZIGZAG_PX, x - 3, y - 3, x + 3, y + 3, x - 3, y + FOLD_ZIGZAG_PX], 'fold');
  }
}

function object(pen: Pen, { stage, objectHeightMm }: Scene, view: Viewport): void {
  if (stage.objectMm === null) return;
  const x = xOf(view, stage.objectMm);
  const y = yOf(view, 0);
  const tip = objectTipPx(view, objectHeightMm ?? 0);
  if (Math.abs(tip - y) > 1) arrow(pen, x, y, tip);
  segment(pen, x - 4, y, x + 4, y, 'object');
}

/**
 * Screen y of the object's tip. An object beyond a fold is not to scale: its arrow is cut to what the sheet can hold, and its label
 * says the height.
 */
export function objectTipPx(view: Viewport, heightMm: number): number {
  const y = yOf(view, heightMm);
  return Math.min(view.heightPx - 24, Math.max(24, y));
}

function arrow(pen: Pen, x: number, from: number, to: number): void {
  const back = to < from ? ARROW_PX : -ARROW_PX;
  segment(pen, x, from, x, to, 'object');
  pen.polyline([x - ARROW_PX, to + back, x, to, x + ARROW_PX, to + back], 'object');
}

function image(pen: Pen, scene: Scene, view: Viewport): void {
  const { stage, sensorFixed, sensorSemiMm, imageHeightMm } = scene;
  if (stage.imageMm === null) return;
  const x = xOf(view, stage.imageMm);
  if (sensorFixed || sensorSemiMm !== null) {
    const semiPx = sensorSemiMm === null ? BARE_SENSOR_PX : yOf(view, 0) - yOf(view, sensorSemiMm);
    segment(pen, x, yOf(view, 0) - semiPx, x, yOf(view, 0) + semiPx, 'sensor');
    return;
  }
  const tip = yOf(view, imageHeightMm ?? 0);
  if (Math.abs(tip - yOf(view, 0)) > 1) arrow(pen, x, yOf(view, 0), tip);
  segment(pen, x, yOf(view, 0) - 6, x, yOf(view, 0) + 6, 'object');
}

/** Room for the words about the heights, and for the bar's length above it, px. */
const HEIGHTS_PX = 118;
const BAR_LABEL_PX = 28;
const SCALE_RIGHT_PX = 24;

const barOf = (view: Viewport, unit: LengthUnit) => scaleBar(view, 110, mmPer(unit));

/** What the scale bar and the words beside it cover. */
export function scaleBox(view: Viewport, unit: LengthUnit, bottomPx: number): Box {
  const widthPx = barOf(view, unit).widthPx + HEIGHTS_PX + 8;
  return {
    xPx: view.widthPx - SCALE_RIGHT_PX - widthPx,
    yPx: bottomPx - BAR_LABEL_PX,
    widthPx: widthPx + SCALE_RIGHT_PX,
    heightPx: BAR_LABEL_PX,
  };
}

/** The scale bar with its unit, and how much taller heights are drawn, at the lower right. */
export function scaleLayer(pen: Pen, view: Viewport, unit: LengthUnit, bottomPx: number): void {
  const bar = barOf(view, unit);
  const right = view.widthPx - SCALE_RIGHT_PX;
  const heights = Math.abs(view.stretch - 1) > 1e-9 ? `heights ×${plain(view.stretch)}` : 'heights to scale';
  pen.text(right, bottomPx, heights, 'label quiet', { align: 'right', baseline: 'bottom' });
  const barRight = right - HEIGHTS_PX;
  segment(pen, barRight - bar.widthPx, bottomPx - 4, barRight, bottomPx - 4, 'scale bar');
  for (const x of [barRight - bar.widthPx, barRight]) segment(pen, x, bottomPx - 8, x, bottomPx, 'scale bar');
  pen.text(barRight - bar.widthPx / 2, bottomPx - 10, `${plain(bar.length)} ${unit}`, 'label quiet', {
    align: 'centre',
    baseline: 'bottom',
  });
}
