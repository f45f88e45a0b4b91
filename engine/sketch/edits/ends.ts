import type { ImagePlane, ObjectDistance, PositionId, Sensor, Sketch } from '../types.ts';
import { joinValue, splitValue, withValue } from '../values.ts';
import { changeSpaceAt, withField } from './change.ts';

/** Sets the object distance in mm (positive, in front of the first part) or `'infinity'`, at the position or at all when common. */
export function setObjectDistance(
  sketch: Sketch,
  distanceMm: ObjectDistance,
  positionId: PositionId,
): Sketch {
  return withDistance(sketch, withValue(sketch.object.distanceMm, positionId, distanceMm));
}

/** Puts the object at infinity, at the position or at all when the distance is common. */
export const setObjectAtInfinity = (sketch: Sketch, positionId: PositionId): Sketch =>
  setObjectDistance(sketch, 'infinity', positionId);

/** Gives each position its own object distance, at first the same. */
export const splitObjectDistance = (sketch: Sketch): Sketch =>
  withDistance(sketch, splitValue(sketch.object.distanceMm, sketch.positions));

/** Makes the object distance of one position that of all. */
export const joinObjectDistance = (sketch: Sketch, positionId: PositionId): Sketch =>
  withDistance(sketch, joinValue(sketch.object.distanceMm, positionId));

/** Lets the image plane follow the paraxial focus, or fixes it at the length kept behind the last part. */
export function setImagePlane(sketch: Sketch, image: ImagePlane): Sketch {
  return sketch.parts.length === 0 ? sketch : withField(sketch, 'image', image);
}

/**
 * Fixes the sensor at a distance in mm behind the last part's rear vertex. A plane that followed the focus until now, or a
 * call without position, sets the distance for all positions; else it is set as any gap is. Without parts nothing changes.
 */
export function fixSensor(sketch: Sketch, distanceMm: number, positionId?: PositionId): Sketch {
  if (sketch.parts.length === 0) return sketch;
  const all = sketch.image === 'focus' || positionId === undefined;
  const fixed = changeSpaceAt(sketch, sketch.parts.length - 1, (space) =>
    withField(space, 'lengthMm', all ? distanceMm : withValue(space.lengthMm, positionId, distanceMm)),
  );
  return withField(fixed, 'image', 'fixed');
}

/** Sets size and pixel pitch of the sensor, or takes the sensor away. */
export const setSensor = (sketch: Sketch, sensor: Sensor | null): Sketch =>
  withField(sketch, 'sensor', sensor);

/** Sets the distance in mm from the mount plane to the sensor; null: there is no mount. */
export const setRegister = (sketch: Sketch, registerMm: number | null): Sketch =>
  withField(sketch, 'registerMm', registerMm);

const withDistance = (sketch: Sketch, distanceMm: Sketch['object']['distanceMm']): Sketch =>
  withField(sketch, 'object', withField(sketch.object, 'distanceMm', distanceMm));
