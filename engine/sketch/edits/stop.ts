import { freshPartId, newStop } from '../create.ts';
import type { PartId, PositionId, Sketch } from '../types.ts';
import { indexOfPart, withField } from './change.ts';
import { insertPart } from './insert.ts';
import { removeParts } from './remove.ts';

/** Makes a part carry the aperture stop; null: the rims decide. A part that does not exist changes nothing. */
export const setStop = (sketch: Sketch, partId: PartId | null): Sketch =>
  partId === null || indexOfPart(sketch, partId) >= 0 ? withField(sketch, 'stop', partId) : sketch;

/** Lets the stop ride on a part, in front of its refraction. A free stop part that was the stop until now goes away. */
export function rideStop(sketch: Sketch, partId: PartId): Sketch {
  const carrier = sketch.parts[indexOfPart(sketch, partId)];
  const present = sketch.parts[indexOfPart(sketch, sketch.stop)];
  if (carrier === undefined || carrier === present) return sketch;
  const replaces = present?.kind === 'stop' && carrier.kind !== 'stop';
  return setStop(replaces ? removeParts(sketch, [present.id]) : sketch, partId);
}

/** Frees a riding stop: a stop part of its own stands at zero distance in front of the part that carried it. */
export function releaseStop(sketch: Sketch): Sketch {
  const index = indexOfPart(sketch, sketch.stop);
  const carrier = sketch.parts[index];
  if (carrier === undefined || carrier.kind === 'stop') return sketch;
  const medium = sketch.parts[index - 1]?.space.medium ?? sketch.object.medium;
  const stop = { ...newStop(freshPartId(sketch)), space: { lengthMm: 0, medium } };
  return { ...sketch, parts: sketch.parts.toSpliced(index, 0, stop), stop: stop.id };
}

/** Puts a new stop part on the axis, as `insertPart` does, and makes it the aperture stop. */
export function dropStop(sketch: Sketch, atMm: number, positionId: PositionId): Sketch {
  const stop = newStop(freshPartId(sketch));
  return { ...insertPart(sketch, stop, atMm, positionId), stop: stop.id };
}
