import type { GlassPart, Part, Sketch } from '../sketch/types.ts';
import { capitalised } from '../sketch/words.ts';
import {
  type Body,
  bodyOf,
  type Face,
  faceAt,
  leastOver,
  roomBeside,
  roomOf,
  thinnest,
} from '../train/body.ts';
import type { Analysis } from './analyse.ts';
import { type Found, saying, TOUCHING_MM } from './warning.ts';

type NameOf = (part: Part) => string;

/** Half the diameter that the rays need of each face of a part where its rim is open; 0 when it is not known. */
export function neededOn({ train, clear }: Analysis, partIndex: number): (face: number) => number {
  const first = train.partOf.indexOf(partIndex);
  return (face) => {
    const need = first < 0 ? undefined : clear[first + face]?.neededMm;
    return need?.ok ? need.value : 0;
  };
}

/** What is wrong inside the glass of one part: surfaces that end within their rims, and surfaces that cross. */
export function bodyWarnings(
  part: Part,
  index: number,
  analysis: Analysis,
  nameOf: NameOf,
): readonly Found[] {
  const body = part.kind === 'glass' ? bodyOf(part, neededOn(analysis, index)) : null;
  if (part.kind !== 'glass' || !body) return [];
  const found: Found[] = [];
  for (const [k, face] of body.faces.entries()) {
    const sentence = endSentence(part, k, face, nameOf(part));
    if (sentence) found.push({ kind: 'surface ends', ...about(part, [k]), sentence });
  }
  for (const k of part.fillings.keys()) {
    const { clearMm, heightMm } = thinnest(body, k);
    if (clearMm >= -TOUCHING_MM) continue;
    const which = part.fillings.length === 1 ? 'The surfaces' : `Surfaces ${k + 1} and ${k + 2}`;
    found.push({
      kind: 'surfaces cross',
      ...about(part, [k, k + 1]),
      sentence: saying`${which} of ${nameOf(part)} cross within the clear diameter: ${heightMm} from the axis the glass is ${-clearMm} too thin.`,
    });
  }
  return found;
}

/** Rims that were given cannot be built so; those drawn as wide as the rays need may still change. */
function about(part: GlassPart, faces: readonly number[]): Pick<Found, 'severity' | 'partId'> {
  const given = faces.every((k) => (part.surfaces[k]?.semiDiameterMm ?? part.semiDiameterMm) !== null);
  return { severity: given ? 'cannot be built' : 'look at this', partId: part.id };
}

function endSentence(part: GlassPart, k: number, face: Face, name: string): Found['sentence'] | null {
  const which = `surface ${k + 1} of ${name}`;
  if (face.ends === null) return null;
  if (face.ends === 'powers run away')
    return saying`The powers of ${which} run away ${face.reachMm} from the axis, inside its rim of ${face.semiMm}: make them smaller.`;
  const { radiusMm = null, conic = 0 } = part.surfaces[k] ?? {};
  return conic === 0
    ? saying`The radius of ${which} is ${Math.abs(radiusMm ?? 0)}, smaller than its rim of ${face.semiMm}.`
    : saying`The conic of ${which} ends ${face.reachMm} from the axis, inside its rim of ${face.semiMm}.`;
}

/**
 * What is wrong between two neighbours `gapMm` apart of which one at least has a body: glass against glass, the rim of glass in the
 * room of a thin part, and a rim that reaches beyond the plane of a diaphragm narrower than it.
 */
export function neighbourWarning(
  sketch: Sketch,
  index: number,
  gapMm: number,
  analysis: Analysis,
  nameOf: NameOf,
): Found | null {
  const [part, next] = [sketch.parts[index], sketch.parts[index + 1]];
  if (!part || !next) return null;
  const bodies = [
    bodyOf(part, neededOn(analysis, index)),
    bodyOf(next, neededOn(analysis, index + 1)),
  ] as const;
  const [body, nextBody] = bodies;
  if (body && nextBody) return clash(part, next, body, nextBody, gapMm, nameOf);
  const only = body ?? nextBody;
  if (!only) return null;
  const other = body ? next : part;
  const side = body ? 'behind' : 'front';
  if (other.kind === 'stop')
    return besideStop(sketch, other, only, side, gapMm, analysis, nameOf, body ? part : next);
  const withinMm = other.semiDiameterMm ?? Number.POSITIVE_INFINITY;
  const reserved = roomBeside(other, body ? 'front' : 'behind');
  const clearMm = gapMm - roomOf(only, side, withinMm) - reserved;
  if (clearMm >= -TOUCHING_MM) return null;
  return {
    kind: 'rooms overlap',
    // A thin part that reserves no room stands for glass that is not known yet.
    severity: reserved > 0 ? 'cannot be built' : 'look at this',
    partId: part.id,
    sentence: saying`${capitalised(nameOf(part))} and ${nameOf(next)} overlap by ${-clearMm}: the gap of ${gapMm} is smaller than the room they take.`,
  };
}

function clash(
  part: Part,
  next: Part,
  body: Body,
  nextBody: Body,
  gapMm: number,
  nameOf: NameOf,
): Found | null {
  const [rear, front] = [body.faces.at(-1), nextBody.faces[0]];
  if (!rear || !front) return null;
  const upToMm = Math.min(body.semiMm, nextBody.semiMm);
  const { clearMm, heightMm } = leastOver(
    upToMm,
    (height) => gapMm + faceAt(front, height) - (faceAt(rear, height) - rear.vertexMm),
    [rear.reachMm, front.reachMm],
  );
  if (clearMm >= -TOUCHING_MM) return null;
  const given = [part, next].every(({ semiDiameterMm }) => semiDiameterMm !== null);
  return {
    kind: 'rims clash',
    severity: given ? 'cannot be built' : 'look at this',
    partId: part.id,
    sentence: saying`${capitalised(nameOf(part))} and ${nameOf(next)} clash: ${heightMm} from the axis they overlap by ${-clearMm}.`,
  };
}

function besideStop(
  sketch: Sketch,
  stop: Part,
  body: Body,
  side: 'front' | 'behind',
  gapMm: number,
  { pupils }: Analysis,
  nameOf: NameOf,
  glass: Part,
): Found | null {
  const { stopDiameterMm } = pupils;
  const asStop = stopDiameterMm.ok ? stopDiameterMm.value / 2 : null;
  const holeMm = sketch.stop === stop.id ? asStop : stop.semiDiameterMm;
  const clearMm = gapMm - roomOf(body, side);
  if (holeMm === null || body.semiMm <= holeMm || clearMm >= -TOUCHING_MM) return null;
  return {
    kind: 'rims clash',
    severity: 'look at this',
    partId: glass.id,
    sentence: saying`The rim of ${nameOf(glass)} reaches ${-clearMm} beyond ${nameOf(stop)}, which is narrower than it.`,
  };
}
