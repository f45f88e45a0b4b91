import { none, type Outcome, some } from '../outcome.ts';
import { isNegligible } from '../paraxial/scale.ts';
import { indexOfPart } from '../sketch/edits/change.ts';
import type { GlassPart, PartId, Sketch } from '../sketch/types.ts';
import { settingAt } from '../sketch/values.ts';
import { partTrain } from '../train/slice.ts';
import { trainOf } from '../train/train.ts';
import type { Train } from '../train/types.ts';
import type { Unsolvable } from './absence.ts';
import { shapeFactorOf } from './bending.ts';
import { changeGaps } from './remake.ts';
import { thinEquivalent } from './thinEquivalent.ts';

/** A sketch with a part bent, and by how much the gap in front of it became longer so that its principal planes stayed (mm). */
export interface Bent {
  readonly sketch: Sketch;
  readonly frontByMm: number;
}

/**
 * Bends glass at constant power: its first surface takes the given curvature (1/mm), cemented surfaces are bent along by as much, and the
 * last is solved for at the real thickness so that 1/power stays exactly. The gaps beside it give by what its principal planes move, at
 * every position, so that they stay where they were and the paraxial layout with them.
 */
export function bendGlass(
  sketch: Sketch,
  partId: PartId,
  frontCurvaturePerMm: number,
): Outcome<Bent, Unsolvable> {
  const found = glassIn(sketch, partId);
  if (!found) return none('no such part');
  const { index, glass, train } = found;
  const before = thinEquivalent(train);
  if (!before.ok) return none('no power');
  const curvatures = bentTo(train, frontCurvaturePerMm, 1 / before.value.focalLengthMm);
  if (!curvatures) return none('no such radii');
  if (frontCurvaturePerMm === train.curvature[0]) return some({ sketch, frontByMm: 0 });
  const after = thinEquivalent({ ...train, curvature: curvatures });
  if (!after.ok) return none('out of range');
  const parts = sketch.parts.with(index, withCurvatures(glass, curvatures));
  const frontByMm = before.value.principalFrontMm - after.value.principalFrontMm;
  const behindByMm = after.value.principalRearMm - before.value.principalRearMm;
  return some({ sketch: changeGaps({ ...sketch, parts }, index, frontByMm, behindByMm), frontByMm });
}

/**
 * As `bendGlass`, to a shape factor q = (c1 + cn)/(c1 − cn) of its outer surfaces: of the bendings that have it, the one that is reached
 * from the present one by Newton's method.
 */
export function bendGlassToShape(
  sketch: Sketch,
  partId: PartId,
  shapeFactor: number,
): Outcome<Bent, Unsolvable> {
  const found = glassIn(sketch, partId);
  if (!found) return none('no such part');
  const before = thinEquivalent(found.train);
  if (!before.ok) return none('no power');
  const power = 1 / before.value.focalLengthMm;
  /** c1 + cn − q (c1 − cn), and what it is the rest of. */
  const rest = (front: number): readonly [number, number] => {
    const rear = bentTo(found.train, front, power)?.at(-1) ?? Number.NaN;
    const size = (1 + Math.abs(shapeFactor)) * (Math.abs(front) + Math.abs(rear));
    return [front * (1 - shapeFactor) + rear * (1 + shapeFactor), size];
  };
  let front = found.train.curvature[0] ?? 0;
  const probe = Math.abs(power) * PROBE;
  for (let i = 0; i < MOST_STEPS; i++) {
    const [left, size] = rest(front);
    if (Math.abs(left) <= MET * size) return bendGlass(sketch, partId, front);
    const slope = (rest(front + probe)[0] - rest(front - probe)[0]) / (2 * probe);
    const step = -left / slope;
    if (!Number.isFinite(step)) return none('no such radii');
    if (front + step === front) return bendGlass(sketch, partId, front);
    front += step;
  }
  return none('no such radii');
}

/** Newton's method ends when this share of what was added up is left. */
const MET = 1e-15;
const MOST_STEPS = 60;
/** Half the step of the difference quotient, as a share of the power. */
const PROBE = 1e-4;

/** The shape factor (c1 + cn)/(c1 − cn) of the outer surfaces of glass; null for equal radii. */
export function shapeOfGlass({ surfaces }: Pick<GlassPart, 'surfaces'>): number | null {
  const [first, last] = [surfaces[0], surfaces.at(-1)];
  const curvature = (radiusMm: number | null | undefined) => (radiusMm == null ? 0 : 1 / radiusMm);
  return shapeFactorOf({ front: curvature(first?.radiusMm), rear: curvature(last?.radiusMm) });
}

function glassIn(sketch: Sketch, partId: PartId) {
  const index = indexOfPart(sketch, partId);
  const glass = sketch.parts[index];
  const [position] = sketch.positions;
  if (glass?.kind !== 'glass' || position === undefined) return null;
  const train = partTrain(trainOf(sketch, settingAt(position.id)), index);
  return train && { index, glass, train };
}

/**
 * The curvatures when the first is `front`: a ray that comes in at height 1 must leave with n′u′ = −φ, which the last surface alone
 * decides, n′u′ = nu − y (n′ − n) c. Null when it cannot, because the ray meets it on the axis or its index does not change.
 */
function bentTo(train: Train, front: number, powerPerMm: number): Float64Array | null {
  const curvatures = train.curvature.slice();
  const last = train.count - 1;
  const by = front - (curvatures[0] ?? 0);
  for (let k = 0; k < last; k++) curvatures[k] = k === 0 ? front : curvatures[k]! + by;
  let [y, nu] = [1, 0];
  let scale = 1;
  for (let k = 0; k < last; k++) {
    nu -= y * (train.index[k + 1]! - train.index[k]!) * curvatures[k]!;
    const step = (train.gap[k]! * nu) / train.index[k + 1]!;
    y += step;
    scale += Math.abs(step);
  }
  const lever = y * (train.index[last + 1]! - train.index[last]!);
  const rear = (nu + powerPerMm) / lever;
  if (lever === 0 || isNegligible(y, scale) || !Number.isFinite(rear)) return null;
  curvatures[last] = rear;
  return curvatures;
}

/** A curvature below this (1/mm) is flat: no radius is longer than 1e12 mm. */
const FLAT = 1e-12;

const withCurvatures = (glass: GlassPart, curvatures: Float64Array): GlassPart => ({
  ...glass,
  surfaces: glass.surfaces.map((surface, k) => {
    const curvature = curvatures[k]!;
    return { ...surface, radiusMm: Math.abs(curvature) < FLAT ? null : 1 / curvature };
  }),
});
