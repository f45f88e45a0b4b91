import type { Analysis, Aperture, FieldSize, PerPosition, Quantity, Sketch } from '../../../engine/index.ts';
import { settingAt } from '../../../engine/index.ts';
import { analysisOf } from '../../live/analysis.ts';
import type { Reading } from '../../live/reading.ts';
import type { Choice } from '../../ui/choices.tsx';
import type { EntryUnit } from '../../ui/entry.ts';

export const APERTURE_CHOICES: readonly Choice<Aperture['kind']>[] = [
  { value: 'stopDiameter', label: 'stop diameter' },
  { value: 'workingFNumber', label: 'working f-number' },
  { value: 'infinityFNumber', label: 'f-number at infinity' },
  { value: 'objectNA', label: 'NA at the object' },
  { value: 'entrancePupilDiameter', label: 'entrance-pupil diameter' },
];

export const FIELD_CHOICES: readonly Choice<FieldSize['kind']>[] = [
  { value: 'angle', label: 'half angle' },
  { value: 'objectHeight', label: 'object height' },
  { value: 'imageHeight', label: 'image height' },
];

/** Starts a kind of aperture that the layout has no value for yet. */
const START = { fNumber: 4, na: 0.1, diameterMm: 10, angleDeg: 10, heightMm: 5 } as const;
/** A value taken over drops the dust of its computation. */
const TAKEN_DIGITS = 10;

/**
 * The aperture of another kind that lets as much light through as the present one, as far as the layout can say. A stop
 * diameter becomes one for each position where they differ.
 */
export function apertureOfKind(kind: Aperture['kind'], { analysis, sketch }: Reading): Aperture {
  const { light } = analysis;
  switch (kind) {
    case 'stopDiameter':
      return { kind, diameterMm: stopDiameters(sketch) };
    case 'entrancePupilDiameter':
      return { kind, diameterMm: taken(light.entrancePupilDiameterMm, START.diameterMm) };
    case 'objectNA':
      return { kind, na: taken(light.objectNA, START.na) };
    default:
      return { kind, fNumber: taken(light[kind], START.fNumber) };
  }
}

function stopDiameters(sketch: Sketch): PerPosition {
  const each = sketch.positions.map(({ id }) => {
    const { stopDiameterMm } = analysisOf(sketch, settingAt(id)).pupils;
    return [id, taken(stopDiameterMm, START.diameterMm)] as const;
  });
  const first = each[0]?.[1] ?? START.diameterMm;
  return each.every(([, diameterMm]) => diameterMm === first) ? first : Object.fromEntries(each);
}

/** The field of another kind that is as large as the present one, as far as the layout can say. */
export function fieldOfKind(kind: FieldSize['kind'], { light }: Analysis): FieldSize {
  switch (kind) {
    case 'angle': {
      const angleRad = light.fieldAngleRad;
      return {
        kind,
        angleDeg: angleRad.ok ? rounded((angleRad.value * 180) / Math.PI) : START.angleDeg,
      };
    }
    case 'objectHeight':
      return { kind, heightMm: taken(light.objectHeightMm, START.heightMm) };
    case 'imageHeight':
      return { kind, heightMm: taken(light.imageHeightMm, START.heightMm) };
  }
}

function taken(quantity: Quantity, start: number): number {
  return quantity.ok && quantity.value !== 0 ? rounded(Math.abs(quantity.value)) : start;
}

const rounded = (value: number): number => Number(value.toPrecision(TAKEN_DIGITS));

interface ValueField {
  readonly label: string;
  readonly unit: EntryUnit | 'length';
  readonly digits: number;
}

/** How the number of each kind of field is labelled. */
export const FIELD_VALUE: Readonly<Record<FieldSize['kind'], ValueField>> = {
  angle: { label: 'Half angle', unit: '°', digits: 3 },
  objectHeight: { label: 'Object height', unit: 'length', digits: 3 },
  imageHeight: { label: 'Image height', unit: 'length', digits: 3 },
};

/** The number of a field, in its unit. */
export const fieldValue = (size: FieldSize): number =>
  size.kind === 'angle' ? size.angleDeg : size.heightMm;

/** The field with another number. */
export const withFieldValue = (size: FieldSize, value: number): FieldSize =>
  size.kind === 'angle' ? { ...size, angleDeg: value } : { ...size, heightMm: value };
