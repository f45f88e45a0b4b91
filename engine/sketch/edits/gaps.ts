import type { Medium, Part, PartId, PositionId, Sketch } from '../types.ts';
import { joinValue, splitValue, valueOn, withValue } from '../values.ts';
import { changeSpaceAt, indexOfPart, withField, withGap } from './change.ts';
import { fixSensor } from './ends.ts';

/** What takes up a change: everything behind moves along, or the neighbours stay where they are. */
export type Absorption = 'carry' | 'neighbours';

/**
 * Sets the gap behind a part to exactly `lengthMm`. With `carry` only this number changes and everything behind moves
 * along; with `neighbours` the next gap takes up the difference, so that only the next part moves. A gap common to all
 * positions changes at all of them. Behind the last part it is the distance to the sensor, which is fixed by it.
 */
export function setGap(
  sketch: Sketch,
  partId: PartId,
  lengthMm: number,
  positionId: PositionId,
  rule: Absorption = 'carry',
): Sketch {
  const index = indexOfPart(sketch, partId);
  const part = sketch.parts[index];
  if (part === undefined) return sketch;
  if (index === sketch.parts.length - 1) return fixSensor(sketch, lengthMm, positionId);
  const parts = [...sketch.parts];
  parts[index] = withGap(part, withValue(part.space.lengthMm, positionId, lengthMm));
  if (parts[index] === part) return sketch;
  if (rule === 'neighbours')
    shiftGap(
      parts,
      index + 1,
      valueOn(part.space.lengthMm, positionId) - lengthMm,
      positionId,
      sketch.image === 'fixed',
    );
  return { ...sketch, parts };
}

/** Gives each position its own gap behind the part, at first the same. */
export const splitGap = (sketch: Sketch, partId: PartId): Sketch =>
  changeSpaceAt(sketch, indexOfPart(sketch, partId), (space) =>
    withField(space, 'lengthMm', splitValue(space.lengthMm, sketch.positions)),
  );

/** Makes the gap of one position that of all. */
export const joinGap = (sketch: Sketch, partId: PartId, positionId: PositionId): Sketch =>
  changeSpaceAt(sketch, indexOfPart(sketch, partId), (space) =>
    withField(space, 'lengthMm', joinValue(space.lengthMm, positionId)),
  );

/** Sets the medium behind a part, or in object space. */
export function setMedium(sketch: Sketch, where: PartId | 'object', medium: Medium): Sketch {
  if (where === 'object') return withField(sketch, 'object', withField(sketch.object, 'medium', medium));
  return changeSpaceAt(sketch, indexOfPart(sketch, where), (space) => withField(space, 'medium', medium));
}

/**
 * Moves parts by `deltaMm` to the right, each group once. With `neighbours` the other parts stay: only the gaps at the
 * borders of what moves change, a finite object stays where it is, and so does a fixed sensor. With `carry` everything
 * behind the first moved part moves along, a fixed sensor too; only the gap in front of it changes. A common gap changes at
 * all positions, one of its own for each only at `positionId`. Callers extend `ids` by `withGroups` first.
 */
export function moveParts(
  sketch: Sketch,
  ids: readonly PartId[],
  deltaMm: number,
  positionId: PositionId,
  rule: Absorption = 'neighbours',
): Sketch {
  const moved = sketch.parts.map((part) => ids.includes(part.id));
  const first = moved.indexOf(true);
  if (first < 0 || deltaMm === 0) return sketch;
  if (rule === 'carry') moved.fill(true, first);
  const parts = [...sketch.parts];
  const last = parts.length - 1;
  for (let index = 0; index < last; index++)
    if (moved[index] !== moved[index + 1])
      shiftGap(parts, index, moved[index + 1] ? deltaMm : -deltaMm, positionId, true);
  if (rule === 'neighbours' && moved[last])
    shiftGap(parts, last, -deltaMm, positionId, sketch.image === 'fixed');
  const changed = parts.some((part, index) => part !== sketch.parts[index]);
  const next = changed ? { ...sketch, parts } : sketch;
  return moved[0] ? moveFirst(next, deltaMm, positionId) : next;
}

function moveFirst(sketch: Sketch, deltaMm: number, positionId: PositionId): Sketch {
  const before = sketch.object.distanceMm;
  const distance = valueOn(before, positionId);
  if (distance === 'infinity') return sketch;
  const distanceMm = withValue(before, positionId, distance + deltaMm);
  return withField(sketch, 'object', withField(sketch.object, 'distanceMm', distanceMm));
}

/** Lengthens a gap in the list; the unused length behind the last part stays as it is. */
function shiftGap(
  parts: Part[],
  index: number,
  byMm: number,
  positionId: PositionId,
  lastInUse: boolean,
): void {
  const part = parts[index];
  if (part === undefined || (index === parts.length - 1 && !lastInUse)) return;
  const gap = part.space.lengthMm;
  parts[index] = withGap(part, withValue(gap, positionId, valueOn(gap, positionId) + byMm));
}
