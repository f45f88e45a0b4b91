import { CLIP_FORMAT, type Clip } from '../clip.ts';
import { freshPartId } from '../create.ts';
import type { Part, PartId, PositionId, Sketch } from '../types.ts';
import { valueOn } from '../values.ts';
import { indexOfPart, withGap, withSpace } from './change.ts';
import { removeParts } from './remove.ts';

/** In mm: the gap in front of copies of what stood last, where no gap can be copied. */
const NOMINAL_GAP_MM = 10;

/** The parts of `ids` along the axis with the distances between them, as they stand at a position (the first unless said). */
export function copyParts(sketch: Sketch, ids: readonly PartId[], positionId?: PositionId): Clip {
  const position = positionId ?? sketch.positions[0]?.id;
  const parts = runOf(sketch, ids).map((part) =>
    position === undefined ? part : withGap(part, valueOn(part.space.lengthMm, position)),
  );
  return { format: CLIP_FORMAT, parts };
}

/**
 * Puts copied parts behind a part, or in front of all with null. What stands behind moves along; the gap that was behind the
 * part is behind the last copy, so that the sensor keeps its distance. The copies have fresh ids.
 */
export function pasteParts(sketch: Sketch, clip: Clip, behind: PartId | null): Sketch {
  return behind === null || indexOfPart(sketch, behind) >= 0 ? put(sketch, clip.parts, behind) : sketch;
}

/** Puts copies of parts, with their gaps at every position, behind the last of them; what stands behind moves along. */
export function duplicateParts(sketch: Sketch, ids: readonly PartId[]): Sketch {
  const run = runOf(sketch, ids);
  const last = run.at(-1);
  return last === undefined ? sketch : put(sketch, run, last.id);
}

/** The chosen parts with the distances between them; the last keeps the gap behind it, if there is a part behind it. */
function runOf(sketch: Sketch, ids: readonly PartId[]): readonly Part[] {
  const others = sketch.parts.filter((part) => !ids.includes(part.id)).map((part) => part.id);
  const run = removeParts(sketch, others).parts;
  const lastId = run.at(-1)?.id ?? null;
  const last = sketch.parts[indexOfPart(sketch, lastId)];
  if (last === undefined) return run;
  return run.with(-1, last === sketch.parts.at(-1) ? withGap(last, NOMINAL_GAP_MM) : last);
}

function put(sketch: Sketch, run: readonly Part[], behind: PartId | null): Sketch {
  const copies = withFreshIds(sketch, run);
  const last = copies.at(-1);
  if (last === undefined) return sketch;
  const at = indexOfPart(sketch, behind);
  const front = sketch.parts[at];
  if (front === undefined) return { ...sketch, parts: [...copies, ...sketch.parts] };
  const parts = [
    ...sketch.parts.slice(0, at),
    withGap(front, last.space.lengthMm),
    ...copies.with(-1, withSpace(last, front.space)),
    ...sketch.parts.slice(at + 1),
  ];
  return { ...sketch, parts };
}

function withFreshIds(sketch: Sketch, run: readonly Part[]): readonly Part[] {
  let all = sketch;
  for (const part of run) all = { ...all, parts: [...all.parts, { ...part, id: freshPartId(all) }] };
  return all.parts.slice(sketch.parts.length);
}
