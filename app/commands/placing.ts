import type { Analysis, Sketch } from '../../engine/index.ts';
import type { Selected } from '../store/viewStore.ts';

/** How far in front of the first part or behind the last one a new part is placed at most. */
const REACH_MM = 20;
/** Gaps longer than this are split at whole millimetres. */
const ROUND_FROM_MM = 4;

/**
 * Where a part goes "behind the selection": mm from the first part's front vertex. In the middle of the gap behind the last
 * selected part; behind the last part when nothing is selected, in front of the first when the object is.
 */
export function placeBehind(sketch: Sketch, selection: readonly Selected[], analysis: Analysis): number {
  const { places, conjugates } = analysis;
  const last = sketch.parts.length - 1;
  if (last < 0) return 0;
  const chosen = new Set<Selected>(selection);
  const selected = sketch.parts.findLastIndex((part) => chosen.has(part.id));
  if (selected < 0 && chosen.has('object'))
    return -stepInto(places.objectMm === null ? null : -places.objectMm);

  const anchor = selected < 0 ? last : selected;
  const rearMm = places.parts[anchor]?.rearMm ?? 0;
  const next = places.parts[anchor + 1];
  if (next) return rearMm + rounded((next.frontMm - rearMm) / 2, next.frontMm - rearMm);
  const { imagePlaneMm } = conjugates;
  return rearMm + stepInto(imagePlaneMm.ok ? imagePlaneMm.value : null);
}

/** A step into the space in front of the object's side or behind the last part: half of it, never far. */
function stepInto(spaceMm: number | null): number {
  if (spaceMm === null || spaceMm <= 0) return REACH_MM;
  return rounded(Math.min(REACH_MM, spaceMm / 2), spaceMm);
}

const rounded = (lengthMm: number, gapMm: number): number => {
  const stepsPerMm = Math.abs(gapMm) > ROUND_FROM_MM ? 1 : 100;
  return Math.round(lengthMm * stepsPerMm) / stepsPerMm;
};
