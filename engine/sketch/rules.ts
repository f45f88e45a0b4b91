import type { Fault } from '../outcome.ts';
import { keeps, LIMITS, type Limit, LONGEST_TEXT, MOST, SHORTEST_FOCAL_LENGTH_MM } from './limits.ts';
import type { FixedMedium, Medium, ObjectDistance, Part, PerPosition, Sketch } from './types.ts';
import { partLabel, quantityText, quoted, valueText } from './words.ts';

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
    mediumFaults(faults, sketch.object.medium, 'object.medium', 'the object space');
}

function partFaults(faults: Fault[], sketch: Sketch, part: Part, index: number): void {
  const number = (limit: Limit, value: number, key: string): void => {
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
  if (part.kind === 'thin') {
    const limit = LIMITS.focalLengthMm;
    if (!(keeps(limit, part.focalLengthMm) && Math.abs(part.focalLengthMm) >= SHORTEST_FOCAL_LENGTH_MM))
      numberFault(
        faults,
        limit,
        part.focalLengthMm,
        `parts[${index}].focalLengthMm`,
        partLabel(part, index),
        true,
      );
    if (part.abbeNumber !== null) number(LIMITS.abbeNumber, part.abbeNumber, 'abbeNumber');
    if (part.index !== null) number(LIMITS.index, part.index, 'index');
    number(LIMITS.roomFrontMm, part.roomFrontMm, 'roomFrontMm');
    number(LIMITS.roomBehindMm, part.roomBehindMm, 'roomBehindMm');
  } else if (part.kind === 'plate') {
    number(LIMITS.thicknessMm, part.thicknessMm, 'thicknessMm');
    mediumFaults(faults, part.material, `parts[${index}].material`, partLabel(part, index));
  }
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
      part.space.medium,
      `parts[${index}].space.medium`,
      `the space behind ${partLabel(part, index)}`,
    );
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
    const index = indexIn(sketch.object.medium);
    if (keeps(LIMITS.na, aperture.na) && aperture.na < index) return;
    const medium = index === 1 ? 'air' : 'the object space';
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

function mediumFaults(faults: Fault[], medium: FixedMedium, path: string, owner: string): void {
  if (!keeps(LIMITS.index, medium.index))
    numberFault(faults, LIMITS.index, medium.index, `${path}.index`, owner);
  if (medium.abbeNumber !== null && !keeps(LIMITS.abbeNumber, medium.abbeNumber))
    numberFault(faults, LIMITS.abbeNumber, medium.abbeNumber, `${path}.abbeNumber`, owner);
  if (medium.name.length > LONGEST_TEXT.name)
    textFault(faults, `${path}.name`, `The name of the medium of ${owner}`, medium.name, LONGEST_TEXT.name);
}

type Owner = () => { readonly path: string; readonly subject: string };

/** A value for all positions or one for each: every one within its limit, none missing, none for an unknown position. */
function valueFaults(
  faults: Fault[],
  { positions }: Sketch,
  limit: Limit,
  value: PerPosition<ObjectDistance>,
  owner: Owner,
): void {
  if (typeof value !== 'object') {
    if (soundAt(limit, value)) return;
    const { path, subject } = owner();
    faults.push({ path, sentence: outside(subject, limit, value) });
    return;
  }
  for (let index = 0; index < positions.length; index++) {
    const position = positions[index];
    if (position === undefined || soundAt(limit, value[position.id])) continue;
    const own = value[position.id];
    const { path, subject } = owner();
    const at = `${subject} at position ${quoted(position.name || position.id)}`;
    const missing = `${at} is missing; it must be ${limit.allowed}.`;
    faults.push({
      path: `${path}.${position.id}`,
      sentence: own === undefined ? missing : outside(at, limit, own),
    });
  }
  const keys = Object.keys(value);
  if (keys.length <= positions.length && faults.length === 0) return;
  for (const key of keys) {
    if (positions.some((position) => position.id === key)) continue;
    const { path, subject } = owner();
    faults.push({
      path: `${path}.${key}`,
      sentence: `${subject} has a value for ${quoted(key)}; it must have one for each position of the sketch and no other.`,
    });
  }
}

function soundAt(limit: Limit, value: ObjectDistance | undefined): boolean {
  return typeof value === 'number'
    ? keeps(limit, value)
    : value === 'infinity' && limit === LIMITS.distanceMm;
}

function outside(subject: string, limit: Limit, value: ObjectDistance): string {
  const text = typeof value === 'number' ? quantityText(value, limit.unit) : valueText(value);
  return `${subject} is ${text}; it must be ${limit.allowed}.`;
}

function numberFault(
  faults: Fault[],
  limit: Limit,
  value: number,
  path: string,
  owner?: string,
  broken = false,
): void {
  if (!broken && keeps(limit, value)) return;
  const subject = owner === undefined ? `The ${limit.words}` : `The ${limit.words} of ${owner}`;
  faults.push({ path, sentence: outside(subject, limit, value) });
}

function textFault(faults: Fault[], path: string, subject: string, text: string, longest: number): void {
  if (text.length <= longest) return;
  faults.push({
    path,
    sentence: `${subject} has ${quantityText(text.length, '')} characters; it must have at most ${quantityText(longest, '')}.`,
  });
}

function countFault(
  faults: Fault[],
  path: string,
  what: string,
  count: number,
  least: number,
  most: number,
): void {
  if (count >= least && count <= most) return;
  const allowed = least === 0 ? `at most ${most}` : `between ${least} and ${most}`;
  faults.push({
    path,
    sentence: `The number of ${what} is ${quantityText(count, '')}; it must be ${allowed}.`,
  });
}

const ID = /^[A-Za-z][A-Za-z0-9_-]*$/;

function idFaults(
  faults: Fault[],
  path: string,
  what: string,
  items: readonly { readonly id: string }[],
): void {
  const seen = new Set<string>();
  for (let index = 0; index < items.length; index++) {
    const id = items[index]?.id ?? '';
    if (seen.has(id))
      faults.push({
        path: `${path}[${index}].id`,
        sentence: `The id ${quoted(id)} of ${what} ${index + 1} is taken; each ${what} must have an id of its own.`,
      });
    seen.add(id);
    // Names that every object has would be found where no value was given.
    if (ID.test(id) && id.length <= LONGEST_TEXT.id && !(id in {})) continue;
    faults.push({
      path: `${path}[${index}].id`,
      sentence: `The id ${quoted(id)} of ${what} ${index + 1} is not usable; it must be a letter followed by letters, digits, “-” or “_”, at most ${LONGEST_TEXT.id} in all.`,
    });
  }
}

const indexIn = (medium: Medium): number => (medium === 'air' ? 1 : medium.index);
