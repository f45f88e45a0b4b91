import type { Fault } from '../outcome.ts';
import { countFault, numberFault, textFault, valueFaults } from './faults.ts';
import { keeps, LIMITS, type Limit, LONGEST_TEXT, MOST } from './limits.ts';
import { mediumFaults } from './mediumRules.ts';
import type { GlassPart, Part, Sketch, ThinPart } from './types.ts';
import { partLabel } from './words.ts';

/** The rules on one part and the space behind it: what is broken is added to `faults`. */
export function partFaults(faults: Fault[], sketch: Sketch, part: Part, index: number): void {
  const number: Check = (limit, value, key) => {
    if (!keeps(limit, value))
      numberFault(faults, limit, value, `parts[${index}].${key}`, partLabel(part, index));
  };
  if (part.name.length > LONGEST_TEXT.name)
    textFault(faults, `parts[${index}].name`, `The name of part ${index + 1}`, part.name, LONGEST_TEXT.name);
  if (part.note.length > LONGEST_TEXT.note)
    textFault(
      faults,
      `parts[${index}].note`,
      `The note of ${partLabel(part, index)}`,
      part.note,
      LONGEST_TEXT.note,
    );
  if (part.semiDiameterMm !== null) number(LIMITS.semiDiameterMm, part.semiDiameterMm, 'semiDiameterMm');
  if (part.kind === 'thin') thinFaults(part, number);
  if (part.kind === 'plate') number(LIMITS.thicknessMm, part.thicknessMm, 'thicknessMm');
  if (part.kind === 'glass') glassFaults(faults, sketch, part, index);
  else if (part.kind !== 'stop' && part.material !== null)
    mediumFaults(faults, sketch, part.material, `parts[${index}].material`, partLabel(part, index));
  const last = index === sketch.parts.length - 1;
  valueFaults(faults, sketch, LIMITS.lengthMm, part.space.lengthMm, () => ({
    path: `parts[${index}].space.lengthMm`,
    subject: last
      ? `The distance from ${partLabel(part, index)} to the sensor`
      : `The gap behind ${partLabel(part, index)}`,
  }));
  if (part.space.medium !== 'air')
    mediumFaults(
      faults,
      sketch,
      part.space.medium,
      `parts[${index}].space.medium`,
      `the space behind ${partLabel(part, index)}`,
    );
}

type Check = (limit: Limit, value: number, key: string) => void;

function thinFaults(part: ThinPart, number: Check): void {
  number(LIMITS.focalLengthMm, part.focalLengthMm, 'focalLengthMm');
  if (part.abbeNumber !== null) number(LIMITS.abbeNumber, part.abbeNumber, 'abbeNumber');
  if (part.index !== null) number(LIMITS.index, part.index, 'index');
  number(LIMITS.roomFrontMm, part.roomFrontMm, 'roomFrontMm');
  number(LIMITS.roomBehindMm, part.roomBehindMm, 'roomBehindMm');
  if (part.shapeFactor !== null) number(LIMITS.shapeFactor, part.shapeFactor, 'shapeFactor');
}

function glassFaults(faults: Fault[], sketch: Sketch, part: GlassPart, index: number): void {
  const { surfaces, fillings } = part;
  const label = partLabel(part, index);
  const path = `parts[${index}]`;
  countFault(faults, `${path}.surfaces`, `surfaces of ${label}`, surfaces.length, 2, MOST.surfaces);
  if (fillings.length !== surfaces.length - 1)
    faults.push({
      path: `${path}.fillings`,
      sentence: `The number of fillings of ${label} is ${fillings.length}; it must be one fewer than its ${surfaces.length} surfaces.`,
    });
  for (let at = 0; at < surfaces.length; at++) {
    const surface = surfaces[at];
    if (surface === undefined) continue;
    const check = (limit: Limit, value: number, key: string): void => {
      if (keeps(limit, value)) return;
      numberFault(faults, limit, value, `${path}.surfaces[${at}].${key}`, `surface ${at + 1} of ${label}`);
    };
    if (surface.radiusMm !== null) check(LIMITS.radiusMm, surface.radiusMm, 'radiusMm');
    check(LIMITS.conic, surface.conic, 'conic');
    if (surface.semiDiameterMm !== null)
      check(LIMITS.semiDiameterMm, surface.semiDiameterMm, 'semiDiameterMm');
    const where = `${path}.surfaces[${at}].asphere`;
    countFault(
      faults,
      where,
      `coefficients of surface ${at + 1} of ${label}`,
      surface.asphere.length,
      0,
      MOST.coefficients,
    );
    for (let term = 0; term < surface.asphere.length; term++)
      check(LIMITS.coefficient, surface.asphere[term] ?? 0, `asphere[${term}]`);
  }
  for (let at = 0; at < fillings.length; at++) {
    const filling = fillings[at];
    if (filling === undefined) continue;
    const owner = fillings.length === 1 ? label : `filling ${at + 1} of ${label}`;
    const here = `${path}.fillings[${at}]`;
    numberFault(faults, LIMITS.fillingMm, filling.thicknessMm, `${here}.thicknessMm`, owner);
    mediumFaults(faults, sketch, filling.material, `${here}.material`, owner);
  }
}
