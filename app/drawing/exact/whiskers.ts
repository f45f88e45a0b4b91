import type { DrawnRay, Train } from '../../../engine/index.ts';
import type { Pen } from '../../board/pen.ts';
import { segment } from '../../board/pen.ts';
import type { Viewport } from '../../board/viewport.ts';
import { xOf, yOf } from '../../board/viewport.ts';
import type { ExactView } from '../../store/viewStore.ts';
import type { ExactRays } from './rays.ts';

/** The drift of one ray at one surface. */
export interface Whisker {
  readonly ray: DrawnRay;
  readonly surface: number;
  readonly zMm: number;
  /** Where the paraxial ray is. */
  readonly fromMm: number;
  /** Exact height minus paraxial height. */
  readonly driftMm: number;
}

/** Shorter whiskers are only dots, px. */
const LEAST_PX = 0.75;
const END_PX = 3;
const BEYOND_PX = 5;
const RING_PX = 7;

/** The whiskers that are drawn: of the marginal ray above the axis, the chief ray and the edge rays of every bundle off the axis. */
export function whiskersOf({ pencils, train }: ExactRays): readonly Whisker[] {
  return pencils.flatMap(({ name, rays }) => {
    if (name === 'axial bundle') return [];
    const ends = name === 'off-axis bundle' && rays.length > 1 ? [rays[0], rays.at(-1)] : [rays[0]];
    return ends.flatMap((ray) => (ray ? alongRay(ray, train) : []));
  });
}

function alongRay(ray: DrawnRay, train: Train): readonly Whisker[] {
  return Array.from(ray.heightDriftMm, (driftMm, surface) => ({
    ray,
    surface,
    zMm: train.z[surface] ?? 0,
    fromMm: ray.paraxial[2 * surface + 3] ?? 0,
    driftMm,
  }));
}

/** The whisker of the largest drift, at its surface or on the image plane, wherever that stands. */
export function largestWhisker({ train, setup, largest }: ExactRays): Whisker | null {
  if (!largest) return null;
  const { ray, surface, driftMm } = largest;
  if (surface < train.count) return alongRay(ray, train)[surface] ?? null;
  if (!setup.imagePlaneMm.ok) return null;
  const zMm = (train.z[train.count - 1] ?? 0) + setup.imagePlaneMm.value;
  const [z1 = 0, y1 = 0, z2 = 0, y2 = 0] = ray.paraxial.slice(-4);
  const fromMm = z1 === z2 ? y2 : y1 + ((y2 - y1) * (zMm - z1)) / (z2 - z1);
  return { ray, surface, zMm, fromMm, driftMm };
}

/** How many of the whiskers are longer than the limit. */
export const beyondLimit = (whiskers: readonly Whisker[], limitMm: number): number =>
  whiskers.filter(({ driftMm }) => Math.abs(driftMm) > limitMm).length;

/**
 * A whisker from the paraxial ray towards the exact one at every surface, so many times as long as the drift is; one beyond the limit in
 * the colour of what is bad, with a wider end. The largest drift has a ring when it is asked for.
 */
export function whiskersLayer(pen: Pen, rays: ExactRays, shown: ExactView, view: Viewport): void {
  for (const whisker of shown.whiskers ? whiskersOf(rays) : []) drawWhisker(pen, whisker, shown, view);
  const largest = shown.largest ? largestWhisker(rays) : null;
  if (!largest) return;
  drawWhisker(pen, largest, shown, view);
  pen.circle(xOf(view, largest.zMm), yOf(view, largest.fromMm), RING_PX, 'snap');
}

function drawWhisker(pen: Pen, { zMm, fromMm, driftMm }: Whisker, shown: ExactView, view: Viewport): void {
  const x = xOf(view, zMm);
  const from = yOf(view, fromMm);
  const to = yOf(view, fromMm + shown.stretch * driftMm);
  const isBeyond = Math.abs(driftMm) > shown.driftLimitMm;
  if (!isBeyond && Math.abs(to - from) < LEAST_PX) return;
  const style = isBeyond ? 'drift beyond' : 'drift';
  const half = isBeyond ? BEYOND_PX : END_PX;
  segment(pen, x, from, x, to, style);
  segment(pen, x - half, to, x + half, to, style);
}
