import { none, type Outcome, some } from '../outcome.ts';
import { petzval } from '../paraxial/colour.ts';
import { systemMatrix } from '../paraxial/matrix.ts';
import { newThin } from '../sketch/create.ts';
import { indexOfPart } from '../sketch/edits/change.ts';
import { keeps, LIMITS } from '../sketch/limits.ts';
import { givenSemiDiameter } from '../sketch/part.ts';
import type { GlassPart, Line, PartId, Sketch, ThinPart } from '../sketch/types.ts';
import { settingAt } from '../sketch/values.ts';
import { partTrain } from '../train/slice.ts';
import { trainOf } from '../train/train.ts';
import type { Train } from '../train/types.ts';
import { lengthText } from '../units.ts';
import type { Unsolvable } from './absence.ts';
import { shapeOfGlass } from './bend.ts';
import { change, changeGaps, type Note, type Remade } from './remake.ts';
import { thinEquivalent } from './thinEquivalent.ts';

/**
 * Makes glass thin again: a thin part of the same power in the principal planes of the glass, the gap in front longer by V1H and the one
 * behind shorter by V2H′ at every position, so that what `thickenPart` did is undone. A singlet leaves its glass and bending to the thin part, a
 * cemented part the Abbe number and index that its colour and Petzval sum amount to. Shapes beyond the sphere are lost, and a note says so.
 * 'no such part', and 'no power' for glass that has none.
 */
export function thinPart(sketch: Sketch, partId: PartId): Outcome<Remade, Unsolvable> {
  const index = indexOfPart(sketch, partId);
  const glass = sketch.parts[index];
  if (glass?.kind !== 'glass') return none('no such part');
  const trainIn = (line: Line) => trainOfPart(sketch, index, line);
  const train = trainIn('main');
  if (train === null) return none('no such part');
  const equivalent = thinEquivalent(train);
  if (!equivalent.ok) return none(equivalent.why === 'afocal' ? 'no power' : 'out of range');
  const { focalLengthMm, principalFrontMm, principalRearMm } = equivalent.value;
  const thin: ThinPart = {
    ...newThin(focalLengthMm, glass.id),
    name: glass.name,
    note: glass.note,
    semiDiameterMm: givenSemiDiameter(glass),
    space: glass.space,
    ...(glass.fillings.length === 1
      ? ofSinglet(glass)
      : ofCemented(train, trainIn('short'), trainIn('long'))),
  };
  const parts = sketch.parts.with(index, thin);
  return some({
    sketch: changeGaps({ ...sketch, parts }, index, principalFrontMm, -principalRearMm),
    equivalent: equivalent.value,
    notes: notesOf(sketch, index, glass, principalFrontMm, principalRearMm),
  });
}

/** The part by itself, between the media that surround it. */
function trainOfPart(sketch: Sketch, index: number, line: Line): Train | null {
  const [position] = sketch.positions;
  return position === undefined ? null : partTrain(trainOf(sketch, settingAt(position.id), line), index);
}

type Kept = Partial<Pick<ThinPart, 'material' | 'shapeFactor' | 'index' | 'abbeNumber'>>;

function ofSinglet(glass: GlassPart): Kept {
  const shape = shapeOfGlass(glass);
  return {
    material: glass.fillings[0]?.material ?? null,
    shapeFactor: shape !== null && keeps(LIMITS.shapeFactor, shape) ? shape : null,
  };
}

/** V = φ/(φ short − φ long) and n = φ/Petzval sum, null where they are no numbers that a thin part can have. */
function ofCemented(train: Train, short: Train | null, long: Train | null): Kept {
  const power = powerOf(train);
  const abbeNumber = short && long ? power / (powerOf(short) - powerOf(long)) : Number.NaN;
  const { sumPerMm } = petzval(train, new Float64Array(train.count).fill(1));
  const index = sumPerMm.ok ? power / sumPerMm.value : Number.NaN;
  return {
    abbeNumber: keeps(LIMITS.abbeNumber, abbeNumber) ? abbeNumber : null,
    index: keeps(LIMITS.index, index) ? index : null,
  };
}

const powerOf = (train: Train): number => -systemMatrix(train).c;

function notesOf(
  sketch: Sketch,
  index: number,
  glass: GlassPart,
  principalFrontMm: number,
  principalRearMm: number,
): readonly Note[] {
  const behind = index === sketch.parts.length - 1 ? 'The back focus' : 'The gap behind';
  const gaps: Note = (unit) =>
    `The thin part stands for both principal planes of the glass. ${behind} changes by ${change(-principalRearMm, unit)}.`;
  const stop: Note = (unit) =>
    `The stop rides on the thin part now, ${lengthText(Math.abs(principalFrontMm), unit)} ${principalFrontMm < 0 ? 'in front of' : 'behind'} the first surface where it rode, so the pupils move.`;
  const shapes: Note = () => 'Conics and higher powers of its surfaces are lost.';
  const curved = glass.surfaces.some(({ conic, asphere }) => conic !== 0 || asphere.some((a) => a !== 0));
  return [gaps, ...(sketch.stop === glass.id ? [stop] : []), ...(curved ? [shapes] : [])];
}
