import type { Pen } from '../../board/pen.ts';
import { fieldBundle } from '../../board/styles.ts';
import type { Viewport } from '../../board/viewport.ts';
import { xOf, yOf } from '../../board/viewport.ts';
import { manyOnScreen, onScreen } from '../project.ts';
import type { Scene } from '../scene.ts';

const STOP_RING_PX = 5.5;

/** Off-axis bundles, the axial bundle, the marginal ray and, on top, the chief ray with its ring at the stop. */
export function raysLayer(pen: Pen, scene: Scene, view: Viewport): void {
  for (const [index, bundle] of scene.bundles.entries()) {
    const { points, starts } = manyOnScreen(view, bundle.rays);
    pen.polylines(points, starts, fieldBundle(index, scene.bundles.length));
  }
  const axial = manyOnScreen(view, scene.axial);
  pen.polylines(axial.points, axial.starts, 'axial bundle');
  for (const line of scene.marginal) pen.polyline(onScreen(view, line), 'marginal ray');
  if (!scene.chief) return;
  pen.polyline(onScreen(view, scene.chief), 'chief ray');
  if (scene.stop) pen.circle(xOf(view, scene.stop.zMm), yOf(view, 0), STOP_RING_PX, 'chief ray');
}
