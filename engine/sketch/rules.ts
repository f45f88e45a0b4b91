import { indexOf } from '../media/medium.ts';
import type { Fault } from '../outcome.ts';
import { countFault, idFaults, numberFault, textFault, valueFaults } from './faults.ts';
import { keeps, LIMITS, LONGEST_TEXT, MOST } from './limits.ts';
import { mediumFaults, rangeFaults } from './mediumRules.ts';
import { partFaults } from './partRules.ts';
import type { Part, Sketch } from './types.ts';
import { quantityText, quoted } from './words.ts';

/**
 * Every rule on the values of a sketch, in one place: all that are broken, each with its path and a sentence; an empty
 * list when it is sound. Shape (which fields there are) is the schema's matter. Cheap enough for every pointer move:
 * nothing is built unless a rule is broken.
 */
export function faultsOf(sketch: Sketch): readonly Fault[] {
  const faults: Fault[] = [];
  const parts = sketch.parts;
  textFault(faults, 'title', 'The title', sketch.title, LONGEST_TEXT.title);
  textFault(faults, 'notes', 'The notes', sketch.notes, LONGEST_TEXT.notes);
  positionFaults(faults, sketch);
  objectFaults(faults, sketch);
  countFault(faults, 'parts', 'parts', parts.length, 0, MOST.parts);
  idFaults(faults, 'parts', 'part', parts);
  for (let index = 0; index < parts.length; index++) partFaults(faults, sketch, parts[index] as Part, index);
  if (sketch.image === 'fixed' && parts.length === 0)
    faults.push({
      path: 'image',
      sentence:
        'The image plane is fixed, but there is no part to measure it from; it must follow the focus.',
    });
  sensorFaults(faults, sketch);
  if (sketch.stop !== null && !parts.some((part) => part.id === sketch.stop))
    faults.push({
      path: 'stop',
      sentence: `The stop names ${quoted(sketch.stop)}; it must name one of the parts, or none.`,
    });
  apertureFaults(faults, sketch);
  fieldFaults(faults, sketch);
  lineFaults(faults, sketch);
  if (sketch.air === 'standard') rangeFaults(faults, sketch, 'air', 'the sketch');
  groupFaults(faults, sketch);
  numberFault(faults, LIMITS.assumedIndex, sketch.assumedIndex, 'assumedIndex');
  if (sketch.blurMm !== null) numberFault(faults, LIMITS.blurMm, sketch.blurMm, 'blurMm');
  return faults;
}

function positionFaults(faults: Fault[], { positions }: Sketch): void {
  countFault(faults, 'positions', 'positions', positions.length, 1, MOST.positions);
  idFaults(faults, 'positions', 'position', positions);
  for (let index = 0; index < positions.length; index++) {
    const name = positions[index]?.name ?? '';
    if (name.length > LONGEST_TEXT.name)
      textFault(
        faults,
        `positions[${index}].name`,
        `The name of position ${index + 1}`,
        name,
        LONGEST_TEXT.name,
      );
  }
}

function objectFaults(faults: Fault[], sketch: Sketch): void {
  valueFaults(faults, sketch, LIMITS.distanceMm, sketch.object.distanceMm, () => ({
    path: 'object.distanceMm',
    subject: 'The object distance',
  }));
  if (sketch.object.medium !== 'air')
    mediumFaults(faults, sketch, sketch.object.medium, 'object.medium', 'the object space');
}

function sensorFaults(faults: Fault[], { sensor, registerMm }: Sketch): void {
  if (registerMm !== null) numberFault(faults, LIMITS.registerMm, registerMm, 'registerMm');
  if (sensor === null) return;
  if ('diagonalMm' in sensor.size) {
    numberFault(faults, LIMITS.diagonalMm, sensor.size.diagonalMm, 'sensor.size.diagonalMm', 'the sensor');
  } else {
    numberFault(faults, LIMITS.widthMm, sensor.size.widthMm, 'sensor.size.widthMm', 'the sensor');
    numberFault(faults, LIMITS.heightMm, sensor.size.heightMm, 'sensor.size.heightMm', 'the sensor');
  }
  if (sensor.pixelPitchMm !== null)
    numberFault(faults, LIMITS.pixelPitchMm, sensor.pixelPitchMm, 'sensor.pixelPitchMm', 'the sensor');
}

function apertureFaults(faults: Fault[], sketch: Sketch): void {
  const aperture = sketch.aperture;
  if (aperture.kind === 'stopDiameter') {
    valueFaults(faults, sketch, LIMITS.stopDiameterMm, aperture.diameterMm, () => ({
      path: 'aperture.diameterMm',
      subject: 'The stop diameter',
    }));
  } else if (aperture.kind === 'entrancePupilDiameter') {
    numberFault(faults, LIMITS.pupilDiameterMm, aperture.diameterMm, 'aperture.diameterMm');
  } else if (aperture.kind === 'objectNA') {
    const { object, lines, air } = sketch;
    const known = indexOf(object.medium, lines.mainNm, lines, air);
    // Without an index the medium's own rule speaks.
    if (!known.ok) return;
    const index = known.value;
    if (keeps(LIMITS.na, aperture.na) && aperture.na < index) return;
    const medium = object.medium === 'air' ? 'air' : 'the object space';
    faults.push({
      path: 'aperture.na',
      sentence: `The numerical aperture at the object is ${quantityText(aperture.na, '')}; it must be above 0 and below ${quantityText(index, '')}, the index of ${medium}.`,
    });
  } else {
    numberFault(faults, LIMITS[aperture.kind], aperture.fNumber, 'aperture.fNumber');
  }
}

function fieldFaults(faults: Fault[], { field }: Sketch): void {
  if (field.size.kind === 'angle')
    numberFault(faults, LIMITS.angleDeg, field.size.angleDeg, 'field.size.angleDeg');
  else {
    const limit = field.size.kind === 'objectHeight' ? LIMITS.objectHeightMm : LIMITS.imageHeightMm;
    numberFault(faults, limit, field.size.heightMm, 'field.size.heightMm');
  }
  countFault(faults, 'field.fractions', 'field fractions', field.fractions.length, 1, MOST.fractions);
  for (let index = 0; index < field.fractions.length; index++) {
    const fraction = field.fractions[index] as number;
    if (!keeps(LIMITS.fraction, fraction))
      numberFault(faults, LIMITS.fraction, fraction, `field.fractions[${index}]`);
  }
  numberFault(faults, LIMITS.vignetting, field.vignetting, 'field.vignetting');
}

function lineFaults(faults: Fault[], { lines }: Sketch): void {
  const before = faults.length;
  numberFault(faults, LIMITS.wavelengthNm, lines.mainNm, 'lines.mainNm', 'the main line');
  numberFault(faults, LIMITS.wavelengthNm, lines.shortNm, 'lines.shortNm', 'the short line');
  numberFault(faults, LIMITS.wavelengthNm, lines.longNm, 'lines.longNm', 'the long line');
  numberFault(faults, LIMITS.weight, lines.weights.main, 'lines.weights.main', 'the main line');
  numberFault(faults, LIMITS.weight, lines.weights.short, 'lines.weights.short', 'the short line');
  numberFault(faults, LIMITS.weight, lines.weights.long, 'lines.weights.long', 'the long line');
  countFault(faults, 'lines.more', 'further lines', lines.more.length, 0, MOST.moreLines);
  for (let index = 0; index < lines.more.length; index++) {
    const extra = lines.more[index];
    if (extra === undefined) continue;
    const path = `lines.more[${index}]`;
    const owner = `further line ${index + 1}`;
    numberFault(faults, LIMITS.wavelengthNm, extra.wavelengthNm, `${path}.wavelengthNm`, owner);
    numberFault(faults, LIMITS.weight, extra.weight, `${path}.weight`, owner);
  }
  if (faults.length === before && lines.weights.main === 0)
    faults.push({
      path: 'lines.weights.main',
      sentence: 'The weight of the main line is 0; it must be above 0, as the main line always counts.',
    });
  if (faults.length > before || (lines.shortNm < lines.mainNm && lines.mainNm < lines.longNm)) return;
  const nm = (value: number): string => quantityText(value, 'nm');
  faults.push({
    path: 'lines',
    sentence: `The short, main and long wavelengths are ${nm(lines.shortNm)}, ${nm(lines.mainNm)} and ${nm(lines.longNm)}; each must be longer than the one before.`,
  });
}

function groupFaults(faults: Fault[], { groups, parts }: Sketch): void {
  if (groups.length === 0) return;
  countFault(faults, 'groups', 'groups', groups.length, 0, MOST.groups);
  idFaults(faults, 'groups', 'group', groups);
  const known = new Set<string>(parts.map((part) => part.id));
  const tied = new Set<string>();
  for (const [index, group] of groups.entries()) {
    const label = group.name === '' ? `group ${index + 1}` : `group ${quoted(group.name)}`;
    const path = `groups[${index}]`;
    textFault(faults, `${path}.name`, `The name of group ${index + 1}`, group.name, LONGEST_TEXT.name);
    countFault(faults, `${path}.partIds`, `parts in ${label}`, group.partIds.length, 2, MOST.parts);
    for (const [at, id] of group.partIds.entries()) {
      const which = `${path}.partIds[${at}]`;
      if (!known.has(id))
        faults.push({
          path: which,
          sentence: `The ${label} names ${quoted(id)}; it must name one of the parts.`,
        });
      else if (tied.has(id))
        faults.push({
          path: which,
          sentence: `The ${label} names ${quoted(id)} again; a part must be in one group at most, once.`,
        });
      tied.add(id);
    }
  }
}
