import { emptySketch, newThin } from '../../../engine/sketch/create.ts';
import type { PartId, PerPosition, PositionId, Sketch } from '../../../engine/sketch/types.ts';
import { valueOn } from '../../../engine/sketch/values.ts';

export const id = (text: string): PartId => text as PartId;
export const at = (text: string): PositionId => text as PositionId;
export const ONLY = at('only');

/** Thin parts p1, p2, … of 50 mm focal length with the given gaps behind them, and the positions named in the gaps. */
export function row(...gapsMm: readonly PerPosition[]): Sketch {
  const named = gapsMm.find((gap) => typeof gap === 'object');
  const positions = Object.keys(named ?? { only: 0 }).map((name) => ({ id: at(name), name }));
  const parts = gapsMm.map((lengthMm, index) => ({
    ...newThin(50, id(`p${index + 1}`)),
    space: { lengthMm, medium: 'air' as const },
  }));
  return { ...emptySketch(), positions, parts };
}

export const gapsOf = (sketch: Sketch): readonly PerPosition[] =>
  sketch.parts.map((part) => part.space.lengthMm);

export const idsOf = (sketch: Sketch): readonly string[] => sketch.parts.map((part) => part.id);

/** Where every front vertex stands at a position, and the sensor behind the last part, measured from the part `from`. */
export function placesFrom(sketch: Sketch, from: PartId, position: PositionId): Map<string, number> {
  const places = new Map<string, number>();
  let z = 0;
  const object = valueOn(sketch.object.distanceMm, position);
  if (object !== 'infinity') places.set('object', -object);
  for (const part of sketch.parts) {
    places.set(part.id, z);
    if (part.kind === 'plate') z += part.thicknessMm;
    if (part.kind === 'glass') for (const { thicknessMm } of part.fillings) z += thicknessMm;
    z += valueOn(part.space.lengthMm, position);
  }
  if (sketch.image === 'fixed') places.set('sensor', z);
  const datum = places.get(from) ?? 0;
  for (const [key, value] of places) places.set(key, value - datum);
  return places;
}
