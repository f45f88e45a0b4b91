import { givenSemiDiameter } from '../sketch/part.ts';
import type { Part, PartId, Setting, Sketch } from '../sketch/types.ts';
import { settingAt, valueAt } from '../sketch/values.ts';
import { capitalised, partName } from '../sketch/words.ts';
import { roomBeside } from '../train/body.ts';
import { sentenceOf } from './absence.ts';
import { type Analysis, analyse } from './analyse.ts';
import { bodyWarnings, neededOn, neighbourWarning } from './glassWarnings.ts';
import { type Found, saying, TOUCHING_MM, type Warning, type WarningKind } from './warning.ts';

export type { Warning, WarningKind } from './warning.ts';

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

function mechanics(sketch: Sketch, setting: Setting, analysis: Analysis): readonly Found[] {
  const { conjugates, sensor } = analysis;
  const nameOf = namesIn(sketch);
  const found: Found[] = [];
  const cannot = (kind: WarningKind, partId: PartId | null, sentence: Warning['sentence']) =>
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
    found.push(...bodyWarnings(part, i, analysis, nameOf));
    const next = parts[i + 1];
    if (!next) break;
    const gapMm = valueAt(part.space.lengthMm, sketch.positions, setting);
    const hasBody = [part, next].some(({ kind }) => kind === 'glass' || kind === 'plate');
    const clearMm = hasBody ? gapMm : gapMm - roomBeside(part, 'behind') - roomBeside(next, 'front');
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
    } else {
      const warning = hasBody ? neighbourWarning(sketch, i, gapMm, analysis, nameOf) : null;
      if (warning) found.push(warning);
    }
  }
  const last = parts.at(-1);
  const roomMm = last ? roomBeside(last, 'behind', neededOn(analysis, parts.length - 1)) : 0;
  if (last && conjugates.imagePlaneMm.ok && conjugates.imagePlaneMm.value - roomMm < -TOUCHING_MM) {
    const inside = roomMm - conjugates.imagePlaneMm.value;
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
  const look = (kind: WarningKind, partId: PartId | null, sentence: Warning['sentence']) =>
    found.push({ kind, severity: 'look at this', partId, sentence });
  if (!rays.marginal.ok) look('no marginal ray', null, saying`No aperture: ${sentenceOf(rays.marginal.why)}`);
  if (!rays.chief.ok) look('no chief ray', null, saying`No field: ${sentenceOf(rays.chief.why)}`);
  for (const [part, y] of axialCuts(analysis)) {
    const drawn = sketch.parts[part];
    if (!drawn) continue;
    look(
      'axial bundle cut',
      drawn.id,
      saying`The rim of ${nameOf(drawn)} cuts the axial bundle: it is ${2 * (givenSemiDiameter(drawn) ?? 0)} wide, the aperture asks for ${2 * y}.`,
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
