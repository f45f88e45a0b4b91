import type { Pen } from '../../board/pen.ts';
import { fieldBundle, type RayName, type RayStyle } from '../../board/styles.ts';
import type { Viewport } from '../../board/viewport.ts';
import { xOf, yOf } from '../../board/viewport.ts';
import { exactRaysLayer } from '../exact/layer.ts';
import { whiskersLayer } from '../exact/whiskers.ts';
import { manyOnScreen, onScreen } from '../project.ts';
import type { Scene } from '../scene.ts';

const STOP_RING_PX = 5.5;

/** Off-axis bundles, the axial bundle, the marginal ray and, on top, the chief ray with its ring at the stop. */
export function raysLayer(pen: Pen, scene: Scene, view: Viewport): void {
  const { exact } = scene;
  if (exact?.rays) exactRaysLayer(pen, exact.rays, exact.shown, view);
  else if (!exact || exact.shown.paraxial) paraxialRays(pen, scene, view, exact !== null);
  if (exact?.rays) whiskersLayer(pen, exact.rays, exact.shown, view);
  const chiefShown = !exact || exact.shown.paraxial || exact.shown.exact;
  if (scene.chief && scene.stop && chiefShown)
    pen.circle(xOf(view, scene.stop.zMm), yOf(view, 0), STOP_RING_PX, 'chief ray');
}

/** The rays of first order by themselves: dashed where exact ones would run elsewhere. */
function paraxialRays(pen: Pen, scene: Scene, view: Viewport, dashed: boolean): void {
  const styleOf = (name: RayName): RayStyle => (dashed ? `${name} paraxial` : name);
  for (const [index, bundle] of scene.bundles.entries()) {
    const { points, starts } = manyOnScreen(view, bundle.rays);
    pen.polylines(points, starts, styleOf(fieldBundle(index, scene.bundles.length)));
  }
  const axial = manyOnScreen(view, scene.axial);
  pen.polylines(axial.points, axial.starts, styleOf('axial bundle'));
  for (const line of scene.marginal) pen.polyline(onScreen(view, line), styleOf('marginal ray'));
  if (scene.chief) pen.polyline(onScreen(view, scene.chief), styleOf('chief ray'));
}
