import { lengthOf } from '../part.ts';
import type { ObjectDistance, Part, PartId, PerPosition, Sketch } from '../types.ts';
import { combineValues, isCommon } from '../values.ts';
import { withField, withGap, withoutTies, withSpace } from './change.ts';

/**
 * Takes parts away; the others stay where they are. Their gaps merge, plate thickness included, into the gap in front (whose
 * medium stays) or into a finite object distance; behind the last part left a fixed sensor stays where it is and the medium
 * is that of image space. The stop goes with its part, and ties with theirs. With no part left the image follows the focus.
 */
export function removeParts(sketch: Sketch, ids: readonly PartId[]): Sketch {
  const gone = new Set(ids);
  const kept = sketch.parts.filter((part) => !gone.has(part.id));
  if (kept.length === sketch.parts.length) return sketch;
  const loose = withField(
    withoutTies(sketch, gone),
    'stop',
    gone.has(sketch.stop as PartId) ? null : sketch.stop,
  );
  if (kept.length === 0) return { ...loose, parts: kept, image: 'focus' };
  const parts: Part[] = [];
  let object = sketch.object;
  for (const [index, part] of sketch.parts.entries()) {
    const before = parts.at(-1);
    if (!gone.has(part.id)) parts.push(part);
    else if (before === undefined)
      object = withField(object, 'distanceMm', longer(sketch, object.distanceMm, passed(sketch, part)));
    else parts[parts.length - 1] = merged(sketch, before, part, trails(sketch, gone, index));
  }
  return { ...loose, object, parts };
}

/** Whether this part and all behind it go. */
const trails = (sketch: Sketch, gone: ReadonlySet<PartId>, index: number): boolean =>
  sketch.parts.slice(index).every((part) => gone.has(part.id));

function merged(sketch: Sketch, front: Part, part: Part, trailing: boolean): Part {
  const used = !trailing || sketch.image === 'fixed';
  const sum = (a: number, b: number): number => a + b;
  const gap = used
    ? combineValues(front.space.lengthMm, passed(sketch, part), sketch.positions, sum)
    : front.space.lengthMm;
  const medium = trailing ? part.space.medium : front.space.medium;
  return medium === front.space.medium ? withGap(front, gap) : withSpace(front, { lengthMm: gap, medium });
}

/** From the front vertex of a part to that of the next. */
const passed = (sketch: Sketch, part: Part): PerPosition =>
  combineValues(part.space.lengthMm, lengthOf(part), sketch.positions, (gap, length) => gap + length);

function longer(
  sketch: Sketch,
  distanceMm: PerPosition<ObjectDistance>,
  byMm: PerPosition,
): PerPosition<ObjectDistance> {
  if (isCommon(distanceMm) && distanceMm === 'infinity') return distanceMm;
  return combineValues<ObjectDistance, number, ObjectDistance>(
    distanceMm,
    byMm,
    sketch.positions,
    (distance, by) => (distance === 'infinity' ? distance : distance + by),
  );
}
