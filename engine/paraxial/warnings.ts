import type { Part, PartId, PositionId, Setting, Sketch } from '../sketch/types.ts';
import { settingAt, valueAt } from '../sketch/values.ts';
import { capitalised, partName } from '../sketch/words.ts';
import { type LengthUnit, lengthText } from '../units.ts';
import { sentenceOf } from './absence.ts';
import { type Analysis, analyse } from './analyse.ts';

export type WarningKind =
  | 'negative gap'
  | 'rooms overlap'
  | 'object inside'
  | 'image inside'
  | 'behind the mount'
  | 'axial bundle cut'
  | 'field edge dark'
  | 'sensor not covered'
  | 'out of focus'
  | 'no marginal ray'
  | 'no chief ray';

/** Something about the layout that a person should know. */
export interface Warning {
  readonly kind: WarningKind;
  readonly severity: 'cannot be built' | 'look at this';
  /** The part to select; null when it is about an end or the whole. */
  readonly partId: PartId | null;
  readonly positionId: PositionId;
  /** Plain, with its lengths in `unit`. */
  readonly sentence: (unit: LengthUnit) => string;
}

/** What is wrong at `setting`, what cannot be built first. Pass the analysis when it is at hand. */
export function warningsOf(
  sketch: Sketch,
  setting: Setting,
  analysis: Analysis = analyse(sketch, setting),
): readonly Warning[] {
  if (sketch.parts.length === 0) return [];
  const found = [...mechanics(sketch, setting, analysis), ...optics(sketch, analysis)];
  return found.map((warning) => ({ ...warning, positionId: setting.at }));
}

/** Everything that cannot be built, over all positions. */
export const unbuildable = (sketch: Sketch): readonly Warning[] =>
  sketch.positions.flatMap(({ id }) =>
    warningsOf(sketch, settingAt(id)).filter(({ severity }) => severity === 'cannot be built'),
  );

type Found = Omit<Warning, 'positionId'>;

type Sentence = Warning['sentence'];

/** A sentence that waits for its unit: the numbers in it are lengths in mm. */
const saying =
  (texts: TemplateStringsArray, ...values: readonly (string | number)[]): Sentence =>
  (unit) =>
    String.raw(
      { raw: texts },
      ...values.map((value) => (typeof value === 'number' ? lengthText(value, unit) : value)),
    );

/** Rounding of gaps that were solved to touch must not count as an overlap (mm). */
const TOUCHING_MM = 1e-9;

function mechanics(sketch: Sketch, setting: Setting, { conjugates, sensor }: Analysis): readonly Found[] {
  const nameOf = namesIn(sketch);
  const found: Found[] = [];
  const cannot = (kind: WarningKind, partId: PartId | null, sentence: Sentence) =>
    found.push({ kind, severity: 'cannot be built', partId, sentence });
  const { parts } = sketch;
  const first = parts[0];
  if (first && sensor.workingDistanceMm.ok && sensor.workingDistanceMm.value < -TOUCHING_MM) {
    cannot(
      'object inside',
      first.id,
      saying`The object stands ${-sensor.workingDistanceMm.value} inside the room of ${nameOf(first)}.`,
    );
  }
  for (const [i, part] of parts.entries()) {
    const next = parts[i + 1];
    if (!next) break;
    const gapMm = valueAt(part.space.lengthMm, sketch.positions, setting);
    const clearMm = gapMm - roomBehind(part) - roomFront(next);
    if (gapMm < -TOUCHING_MM) {
      cannot(
        'negative gap',
        part.id,
        saying`${capitalised(nameOf(next))} stands ${-gapMm} in front of ${nameOf(part)}: the gap must be 0 or more.`,
      );
    } else if (clearMm < -TOUCHING_MM) {
      cannot(
        'rooms overlap',
        part.id,
        saying`${capitalised(nameOf(part))} and ${nameOf(next)} overlap by ${-clearMm}: the gap of ${gapMm} is smaller than their rooms.`,
      );
    }
  }
  const last = parts.at(-1);
  if (last && conjugates.imagePlaneMm.ok && conjugates.imagePlaneMm.value - roomBehind(last) < -TOUCHING_MM) {
    const inside = roomBehind(last) - conjugates.imagePlaneMm.value;
    const what = sketch.image === 'fixed' ? 'The sensor' : 'The image';
    found.push({
      kind: 'image inside',
      severity: sketch.image === 'fixed' ? 'cannot be built' : 'look at this',
      partId: last.id,
      sentence: saying`${what} stands ${inside} in front of where ${nameOf(last)} ends: no sensor can stand there.`,
    });
  }
  return found;
}

function optics(sketch: Sketch, analysis: Analysis): readonly Found[] {
  const nameOf = namesIn(sketch);
  const { rays, light, sensor, conjugates, vignetting, depth } = analysis;
  const found: Found[] = [];
  const look = (kind: WarningKind, partId: PartId | null, sentence: Sentence) =>
    found.push({ kind, severity: 'look at this', partId, sentence });
  if (!rays.marginal.ok) look('no marginal ray', null, saying`No aperture: ${sentenceOf(rays.marginal.why)}`);
  if (!rays.chief.ok) look('no chief ray', null, saying`No field: ${sentenceOf(rays.chief.why)}`);
  for (const [part, y] of axialCuts(analysis)) {
    const drawn = sketch.parts[part];
    if (!drawn) continue;
    look(
      'axial bundle cut',
      drawn.id,
      saying`The rim of ${nameOf(drawn)} cuts the axial bundle: it is ${2 * (drawn.semiDiameterMm ?? 0)} wide, the aperture asks for ${2 * y}.`,
    );
  }
  const edge = vignetting.ok ? vignetting.value.find(({ fraction }) => Math.abs(fraction) === 1) : undefined;
  if (edge && edge.meridian === null)
    look('field edge dark', null, saying`No light reaches the edge of the field.`);
  if (sensor.halfDiagonalMm.ok && light.imageHeightMm.ok) {
    const reached = Math.abs(light.imageHeightMm.value);
    const wanted = sensor.halfDiagonalMm.value;
    if (reached < wanted * (1 - UNCOVERED)) {
      look(
        'sensor not covered',
        null,
        saying`The field reaches ${reached} from the axis, the sensor’s corner stands at ${wanted}.`,
      );
    }
  }
  const allowed = depth.focusBlurMm.ok ? depth.focusBlurMm : depth.focusQuarterWaveMm;
  if (conjugates.defocusMm.ok && allowed.ok && Math.abs(conjugates.defocusMm.value) > allowed.value) {
    const side = conjugates.defocusMm.value > 0 ? 'behind' : 'in front of';
    look(
      'out of focus',
      null,
      saying`The image falls ${Math.abs(conjugates.defocusMm.value)} ${side} the sensor; ${allowed.value} is allowed.`,
    );
  }
  const last = sketch.parts.at(-1);
  if (last && sensor.mountClearanceMm.ok && sensor.mountClearanceMm.value < -TOUCHING_MM) {
    look(
      'behind the mount',
      last.id,
      saying`${capitalised(nameOf(last))} reaches ${-sensor.mountClearanceMm.value} behind the mount plane.`,
    );
  }
  return found;
}

/** By part, the height of the marginal ray where it passes beyond the rim. */
function axialCuts({ rays, train }: Analysis): ReadonlyMap<number, number> {
  const cuts = new Map<number, number>();
  if (!rays.marginal.ok) return cuts;
  for (let k = 0; k < train.count; k++) {
    const y = Math.abs(rays.marginal.value.y[k]!);
    const part = train.partOf[k]!;
    if (y > train.semiDiameter[k]! * (1 + CUT)) cuts.set(part, Math.max(y, cuts.get(part) ?? 0));
  }
  return cuts;
}

/** Shares of a diameter and of the sensor that nobody could see or make; they keep rounding from warning. */
const CUT = 1e-9;
const UNCOVERED = 1e-6;

const namesIn =
  ({ parts }: Sketch) =>
  (part: Part): string =>
    partName(part, parts.indexOf(part));
const roomFront = (part: Part): number => (part.kind === 'thin' ? part.roomFrontMm : 0);
const roomBehind = (part: Part): number => (part.kind === 'thin' ? part.roomBehindMm : 0);
