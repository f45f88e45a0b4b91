import type { GlassSurface, Part, PartId, Sketch } from '../types.ts';
import { indexOfPart, withFields, withSpace } from './change.ts';

/** Moves a part to another place in the order; the spaces stay where they are, only the parts change places. */
export function reorderPart(sketch: Sketch, partId: PartId, toIndex: number): Sketch {
  const from = indexOfPart(sketch, partId);
  const to = Math.min(Math.max(Math.round(toIndex), 0), sketch.parts.length - 1);
  const part = sketch.parts[from];
  if (part === undefined || from === to || Number.isNaN(to)) return sketch;
  const order = sketch.parts.filter((other) => other !== part);
  order.splice(to, 0, part);
  const parts = order.map((other, index) => withSpace(other, sketch.parts[index]?.space ?? other.space));
  return { ...sketch, parts };
}

/**
 * Turns the run of parts from the first to the last of `ids` round, in place: their order and the spaces between them are
 * reversed, glass and bending turn round, the room in front of each becomes the room behind it. A stop riding on one of them stays on it, in front of
 * its refraction as always. What is outside the run does not move.
 */
export function flipParts(sketch: Sketch, ids: readonly PartId[]): Sketch {
  const first = sketch.parts.findIndex((part) => ids.includes(part.id));
  const last = sketch.parts.findLastIndex((part) => ids.includes(part.id));
  if (first < 0) return sketch;
  const parts = sketch.parts.map((part, index) => {
    if (index < first || index > last) return part;
    const turned = turnedRound(sketch.parts[first + last - index] ?? part);
    const space = index === last ? part.space : sketch.parts[first + last - 1 - index]?.space;
    return withSpace(turned, space ?? part.space);
  });
  return parts.every((part, index) => part === sketch.parts[index]) ? sketch : { ...sketch, parts };
}

function turnedRound(part: Part): Part {
  if (part.kind === 'thin')
    return withFields(part, {
      roomFrontMm: part.roomBehindMm,
      roomBehindMm: part.roomFrontMm,
      shapeFactor: part.shapeFactor === null ? null : -part.shapeFactor,
    });
  if (part.kind !== 'glass') return part;
  return withFields(part, {
    surfaces: part.surfaces.map(turnedSurface).reverse(),
    fillings: part.fillings.toReversed(),
  });
}

const turnedSurface = (surface: GlassSurface): GlassSurface => ({
  ...surface,
  radiusMm: surface.radiusMm === null ? null : -surface.radiusMm,
  asphere: surface.asphere.map((coefficient) => (coefficient === 0 ? 0 : -coefficient)),
});
