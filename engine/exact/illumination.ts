import { none, type Outcome, some } from '../outcome.ts';
import type { Absence } from '../paraxial/absence.ts';
import { type Curve, curveOf } from './curve.ts';
import { aimRays, mapRays, type PupilMap, pupilMapOf } from './pupilMap.ts';
import { pupilOutline } from './pupilOutline.ts';
import { CODE, L, M, STRIDE } from './rayBuffer.ts';
import { traceThrough } from './through.ts';
import type { ExactSetup } from './types.ts';

/**
 * How finely the pupil's edge is followed: sides of half the polygon (the axis and an open field lose the same share to it; where a rim cuts through
 * the middle it may lose 1/steps), and halvings in the search for an edge that a rim cuts.
 */
interface Fineness {
  readonly steps: number;
  readonly halvings: number;
  readonly wholeStop: Float64Array;
}

/** Half the edge of the whole stop, from the top over positive x to the bottom. */
const edgeOf = (steps: number): Float64Array =>
  Float64Array.from({ length: 2 * (steps + 1) }, (_, i) => {
    const angle = (Math.PI * Math.floor(i / 2)) / steps;
    return i % 2 === 0 ? Math.sin(angle) : Math.cos(angle);
  });
const COARSE: Fineness = { steps: 32, halvings: 10, wholeStop: edgeOf(32) };
const FINE: Fineness = { steps: 96, halvings: 24, wholeStop: edgeOf(96) };

/**
 * Relative illumination over the share of the field, in the main line: the projected solid angle ∬ dL dM of the light that arrives at the image, over that
 * on the axis (of an object that is evenly bright from all sides). Vignetting counts, losses too; a field that no light passes has 0. 'image at infinity', 'ray lost'
 * when the axis is dark.
 */
export function illumination(
  setup: ExactSetup,
  fractions: Float64Array,
  { clip = true, fine = false }: { readonly clip?: boolean; readonly fine?: boolean } = {},
): Outcome<Curve, Absence> {
  if (!setup.imagePlaneMm.ok) return setup.imagePlaneMm;
  const axis = solidAngle(pupilMapOf(setup, 0, 0), clip, fine);
  if (!(axis > 0)) return none('ray lost');
  const values = fractions.map((fraction) => solidAngle(pupilMapOf(setup, 0, fraction), clip, fine) / axis);
  return some(curveOf(0, fractions.slice(), values));
}

/** Area that the directions of the pupil's edge enclose in (L, M) behind the last surface. */
function solidAngle(map: PupilMap, clip: boolean, fine: boolean): number {
  if (map.lost) return 0;
  const { steps, halvings, wholeStop } = fine ? FINE : COARSE;
  const rays = new Float64Array((steps + 1) * STRIDE);
  const start = fine ? aimRays : mapRays;
  start(map, wholeStop, steps + 1, rays);
  traceThrough(map.sight.train, rays, steps + 1, clip);
  if (!allThrough(rays)) {
    if (!clip) return Number.NaN;
    const outline = pupilOutline(map, fine, steps, halvings);
    if (!outline.ok) return 0;
    start(map, outline.value.points, steps + 1, rays);
    traceThrough(map.sight.train, rays, steps + 1, false);
    if (!allThrough(rays)) return Number.NaN;
  }
  let area = 0;
  for (let at = 0; at < steps * STRIDE; at += STRIDE) {
    const next = at + STRIDE;
    area += rays[at + L]! * rays[next + M]! - rays[next + L]! * rays[at + M]!;
  }
  return Math.abs(area);
}

function allThrough(rays: Float64Array): boolean {
  for (let at = 0; at < rays.length; at += STRIDE) if (rays[at + CODE] !== 0) return false;
  return true;
}
