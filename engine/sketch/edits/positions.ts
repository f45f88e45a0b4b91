import { freshPositionId } from '../create.ts';
import { LONGEST_MM } from '../limits.ts';
import type { ObjectDistance, PerPosition, Position, PositionId, Setting, Sketch } from '../types.ts';
import { indexOfPosition, isCommon, joinValue, objectDistanceAt, settingAt, valueAt } from '../values.ts';
import { withField, withGap } from './change.ts';

/**
 * Adds a position behind `from.at`. What has a value of its own at each position gets the one of the setting; between
 * positions that is the interpolated one.
 */
export function addPosition(sketch: Sketch, name: string, from: Setting): Sketch {
  const { positions } = sketch;
  const id = freshPositionId(sketch);
  const grown: Sketch = {
    ...sketch,
    positions: positions.toSpliced(indexOfPosition(positions, from.at) + 1, 0, { id, name }),
  };
  return changeValues(
    grown,
    (value) => (isCommon(value) ? value : { ...value, [id]: valueAt(value, positions, from) }),
    (value) =>
      isCommon(value) ? value : { ...value, [id]: inRange(objectDistanceAt(value, positions, from)) },
  );
}

/** Adds a position with the values of another, behind it, named "… copy" unless a name is given. */
export function copyPosition(sketch: Sketch, positionId: PositionId, name?: string): Sketch {
  const position = sketch.positions.find(({ id }) => id === positionId);
  if (position === undefined) return sketch;
  return addPosition(sketch, name ?? `${position.name} copy`.trimStart(), settingAt(positionId));
}

/** Sets the name of a position. */
export const renamePosition = (sketch: Sketch, positionId: PositionId, name: string): Sketch =>
  withField(
    sketch,
    'positions',
    sketch.positions.map((position) =>
      position.id === positionId ? withField(position, 'name', name) : position,
    ),
  );

/** Takes a position and its values away; the last one stays. When one is left its values become common. */
export function removePosition(sketch: Sketch, positionId: PositionId): Sketch {
  const positions = sketch.positions.filter(({ id }) => id !== positionId);
  const only = positions.length === 1 ? positions[0] : undefined;
  if (positions.length === 0 || positions.length === sketch.positions.length) return sketch;
  const left = <T extends number | ObjectDistance>(value: PerPosition<T>): PerPosition<T> =>
    only === undefined ? withoutEntry(value, positionId) : joinValue(value, only.id);
  return changeValues({ ...sketch, positions }, left, left);
}

/** Moves a position to another place in the list; its values move with it. */
export function movePosition(sketch: Sketch, positionId: PositionId, toIndex: number): Sketch {
  const position = sketch.positions.find(({ id }) => id === positionId);
  if (position === undefined) return sketch;
  const others: readonly Position[] = sketch.positions.filter((other) => other !== position);
  return withField(
    sketch,
    'positions',
    others.toSpliced(Math.min(Math.max(toIndex, 0), others.length), 0, position),
  );
}

function changeValues(
  sketch: Sketch,
  change: (value: PerPosition) => PerPosition,
  changeDistance: (value: PerPosition<ObjectDistance>) => PerPosition<ObjectDistance>,
): Sketch {
  const { object, aperture } = sketch;
  return {
    ...sketch,
    object: withField(object, 'distanceMm', changeDistance(object.distanceMm)),
    parts: sketch.parts.map((part) => withGap(part, change(part.space.lengthMm))),
    aperture:
      aperture.kind === 'stopDiameter'
        ? withField(aperture, 'diameterMm', change(aperture.diameterMm))
        : aperture,
  };
}

/** Close to an object at infinity the interpolated distance grows beyond what a sketch may hold. */
const inRange = (distance: ObjectDistance): ObjectDistance =>
  distance === 'infinity' || distance > LONGEST_MM ? 'infinity' : distance;

function withoutEntry<T extends number | ObjectDistance>(
  value: PerPosition<T>,
  id: PositionId,
): PerPosition<T> {
  if (isCommon(value)) return value;
  const { [id]: _dropped, ...rest } = value as { readonly [position: PositionId]: T };
  return rest;
}
