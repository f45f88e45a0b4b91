import { freshPartId } from '../create.ts';
import { lengthOf } from '../part.ts';
import type { Medium, Part, PerPosition, PositionId, Sketch } from '../types.ts';
import { combineValues, everyPosition, isCommon, valueOn, withValue } from '../values.ts';
import { withGap } from './change.ts';

/**
 * Puts a part on the axis with its front vertex at `atMm` from the front vertex of the first part, as the layout stands at
 * `positionId`; negative is in front of it. The other parts stay where they are: the gap the part falls in is divided, at
 * other positions in the same share, and so is a finite object distance; the medium is that of the gap. Behind the last part
 * a fixed sensor stays where it is. In an empty sketch the part becomes the datum wherever it is put. A place inside a plate
 * means its nearer face. The part keeps its id unless that is taken; then it gets the first fresh one.
 */
export function insertPart(sketch: Sketch, part: Part, atMm: number, positionId: PositionId): Sketch {
  const taken = sketch.parts.some((other) => other.id === part.id);
  const fresh: Part = taken ? { ...part, id: freshPartId(sketch) } : part;
  if (sketch.parts.length === 0) return { ...sketch, parts: [fresh] };
  const { slot, rearMm } = slotAt(sketch, atMm, positionId);
  return slot === 0
    ? insertFirst(sketch, fresh, Math.min(atMm, 0), positionId)
    : insertBehind(sketch, fresh, slot, atMm - rearMm, positionId);
}

/** How many parts stand in front of a place, and where the last of them ends. */
function slotAt(sketch: Sketch, atMm: number, positionId: PositionId): { slot: number; rearMm: number } {
  let frontMm = 0;
  let rearMm = 0;
  for (const [slot, part] of sketch.parts.entries()) {
    if (atMm < frontMm + lengthOf(part) / 2) return { slot, rearMm };
    rearMm = frontMm + lengthOf(part);
    frontMm = rearMm + valueOn(part.space.lengthMm, positionId);
  }
  return { slot: sketch.parts.length, rearMm };
}

function insertFirst(sketch: Sketch, part: Part, atMm: number, positionId: PositionId): Sketch {
  const { distanceMm, medium } = sketch.object;
  const own = valueOn(distanceMm, positionId);
  const share = own === 'infinity' ? null : atMm / own;
  const nearer = everyPosition(distanceMm, (distance) => {
    if (distance === 'infinity') return distance;
    return isCommon(distanceMm) || share === null ? distance + atMm : distance * (1 + share);
  });
  const exact = own === 'infinity' ? nearer : withValue(nearer, positionId, own + atMm);
  const gapMm = combineValues(distanceMm, exact, sketch.positions, (before, after) =>
    before === 'infinity' || after === 'infinity' ? -atMm - lengthOf(part) : before - after - lengthOf(part),
  );
  const first = withGapAndMedium(part, withValue(gapMm, positionId, -atMm - lengthOf(part)), medium);
  return { ...sketch, object: { ...sketch.object, distanceMm: exact }, parts: [first, ...sketch.parts] };
}

function insertBehind(
  sketch: Sketch,
  part: Part,
  slot: number,
  leadMm: number,
  positionId: PositionId,
): Sketch {
  const front = sketch.parts[slot - 1];
  if (front === undefined) return sketch;
  const gap = front.space.lengthMm;
  const last = slot === sketch.parts.length;
  const within = last ? Math.max(leadMm, 0) : Math.min(Math.max(leadMm, 0), valueOn(gap, positionId));
  const unused = last && sketch.image === 'focus';
  const lead = unused ? within : shareOf(gap, within, positionId);
  const rest = unused
    ? part.space.lengthMm
    : combineValues(gap, lead, sketch.positions, (whole, taken) => whole - taken - lengthOf(part));
  const parts = sketch.parts.with(slot - 1, withGap(front, lead));
  parts.splice(slot, 0, withGapAndMedium(part, rest, front.space.medium));
  return { ...sketch, parts };
}

/** A length as the same share of the gap at every position, or as much beyond its end; exact at `positionId`. */
function shareOf(gap: PerPosition, lengthMm: number, positionId: PositionId): PerPosition {
  const own = valueOn(gap, positionId);
  const share = own === 0 ? 0 : lengthMm / own;
  const lead = everyPosition(gap, (whole) => (lengthMm > own ? whole + (lengthMm - own) : whole * share));
  return withValue(lead, positionId, lengthMm);
}

const withGapAndMedium = (part: Part, lengthMm: PerPosition, medium: Medium): Part => ({
  ...part,
  space: { lengthMm, medium },
});
