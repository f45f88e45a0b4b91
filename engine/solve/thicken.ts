import { none, type Outcome, some } from '../outcome.ts';
import { isNegligible } from '../paraxial/scale.ts';
import { freshPartId, newStop } from '../sketch/create.ts';
import { indexOfPart } from '../sketch/edits/change.ts';
import type { GlassPart, Part, PartId, Sketch, ThinPart } from '../sketch/types.ts';
import { lengthText } from '../units.ts';
import type { Unsolvable } from './absence.ts';
import { type Made, make, type Recipe } from './recipe.ts';
import { change, changeGaps, mediumInFront, type Note, type Remade } from './remake.ts';
import type { ThinEquivalent } from './thinEquivalent.ts';

/**
 * Makes a thin part of glass with exactly its power, its principal planes where the thin part stood: the gap in front becomes
 * gap − V1H, the gap behind gap + V2H′, at every position; the object's distance and the sensor's likewise at the ends. In other
 * media than air the power 1/f is what is kept, and the planes are those of the glass in its own media. Rim, name, note and ties stay.
 *
 * A stop that rode on the part stays where it keeps the pupils exactly: a stop of its own in front when the front principal plane lies
 * outside the glass there, or behind when the rear one does. When both lie inside, it rides on the first surface and a note says how far off.
 */
export function thickenPart(sketch: Sketch, partId: PartId, recipe: Recipe): Outcome<Remade, Unsolvable> {
  const index = indexOfPart(sketch, partId);
  const thin = sketch.parts[index];
  if (thin?.kind !== 'thin') return none('no such part');
  const surroundings = { inFront: mediumInFront(sketch, index), behind: thin.space.medium };
  const made = make(sketch, recipe, thin.focalLengthMm, surroundings);
  if (!made.ok) return made;
  const { equivalent } = made.value;
  const stop = stopFor(equivalent, sketch.stop === thin.id);
  const glass = { ...sketch, parts: sketch.parts.with(index, glassPart(thin, made.value)) };
  const { principalFrontMm: front, principalRearMm: rear } = equivalent;
  // The gap that is divided by the stop keeps its length: the stop stands where the thin part stood.
  const moved = changeGaps(glass, index, stop === 'in front' ? 0 : -front, stop === 'behind' ? 0 : rear);
  return some({
    sketch: stop === 'in front' || stop === 'behind' ? freeStop(moved, index, stop, equivalent) : moved,
    equivalent,
    notes: [...gapNotes(sketch, index, equivalent, made.value), ...stopNotes(stop, equivalent)],
  });
}

const glassPart = (thin: ThinPart, { surfaces, fillings }: Made): GlassPart => ({
  kind: 'glass',
  id: thin.id,
  name: thin.name,
  note: thin.note,
  semiDiameterMm: thin.semiDiameterMm,
  space: thin.space,
  surfaces,
  fillings,
});

/** Where a stop that rode on the thin part goes; null when none did, or when it rides on without any change. */
type StopPlace = 'in front' | 'behind' | 'on the first surface' | null;

function stopFor(equivalent: ThinEquivalent, rode: boolean): StopPlace {
  const { focalLengthMm, principalFrontMm, principalRearMm } = equivalent;
  const isNone = (lengthMm: number) => isNegligible(lengthMm, Math.abs(focalLengthMm));
  if (!rode || isNone(principalFrontMm)) return null;
  if (principalFrontMm < 0) return 'in front';
  return principalRearMm > 0 || isNone(principalRearMm) ? 'behind' : 'on the first surface';
}

/** A stop of its own beside the glass at `index`, in a principal plane, tied to whatever the glass is tied to. */
function freeStop(
  sketch: Sketch,
  index: number,
  place: 'in front' | 'behind',
  { principalFrontMm, principalRearMm }: ThinEquivalent,
): Sketch {
  const glass = sketch.parts[index];
  if (glass === undefined) return sketch;
  const stop = newStop(freshPartId(sketch));
  const pair: readonly Part[] =
    place === 'in front'
      ? [{ ...stop, space: { lengthMm: -principalFrontMm, medium: mediumInFront(sketch, index) } }, glass]
      : [
          { ...glass, space: { ...glass.space, lengthMm: Math.max(principalRearMm, 0) } },
          { ...stop, space: glass.space },
        ];
  const groups = sketch.groups.map((group) => {
    const at = group.partIds.indexOf(glass.id);
    if (at < 0) return group;
    return { ...group, partIds: group.partIds.toSpliced(at, 1, ...pair.map(({ id }) => id)) };
  });
  return { ...sketch, parts: sketch.parts.toSpliced(index, 1, ...pair), stop: stop.id, groups };
}

function gapNotes(
  sketch: Sketch,
  index: number,
  { principalFrontMm, principalRearMm, principalSpacingMm }: ThinEquivalent,
  { fillings }: Made,
): readonly Note[] {
  const thicknessMm = fillings.reduce((sum, filling) => sum + filling.thicknessMm, 0);
  // The track begins at the first vertex, which stands V1H in front of where the thin part stood.
  const trackMm = index === 0 ? principalFrontMm + principalSpacingMm : principalSpacingMm;
  const behind = index === sketch.parts.length - 1 ? 'The back focus' : 'The gap behind';
  return [
    (unit) =>
      `The glass is ${lengthText(thicknessMm, unit)} thick; its principal planes, ${change(principalSpacingMm, unit)} from front to rear, stand for the thin part.`,
    (unit) => `${behind} changes by ${change(principalRearMm, unit)}, the track by ${change(trackMm, unit)}.`,
  ];
}

function stopNotes(place: StopPlace, { principalFrontMm, principalRearMm }: ThinEquivalent): readonly Note[] {
  switch (place) {
    case null:
      return [];
    case 'in front':
      return [
        (unit) =>
          `The stop stands by itself now, ${lengthText(-principalFrontMm, unit)} in front of the glass, so that the pupils stay.`,
      ];
    case 'behind':
      return [
        (unit) =>
          `The stop stands by itself now, ${lengthText(Math.max(principalRearMm, 0), unit)} behind the glass, so that the pupils stay.`,
      ];
    case 'on the first surface':
      return [
        (unit) =>
          `The stop rides on the first surface now, ${lengthText(principalFrontMm, unit)} in front of the principal plane where it stood, so the pupils move.`,
      ];
  }
}
