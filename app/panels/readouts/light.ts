import { none, some } from '../../../engine/index.ts';
import { assumedIndex, leftOutOfColour, meridian } from './particulars.ts';
import type { Readout } from './readout.ts';

/** How fast the light is, how wide the field, and what blurs it. */
export const LIGHT_READOUTS: readonly Readout[] = [
  {
    id: 'workingFNumber',
    isMain: true,
    label: 'Working f-number',
    kind: 'number',
    digits: 3,
    read: ({ light }) => light.workingFNumber,
    formula: 'paraxial: 1 over twice nu of the marginal ray at the image',
  },
  {
    id: 'infinityFNumber',
    label: 'f-number at infinity',
    kind: 'number',
    digits: 3,
    read: ({ light }) => light.infinityFNumber,
    formula: 'focal length over entrance-pupil diameter',
  },
  {
    id: 'imageNA',
    label: 'NA at the image',
    kind: 'number',
    digits: 5,
    read: ({ light }) => light.imageNA,
    formula:
      'index times the sine of the marginal ray’s angle at the image, the angle being the arctangent of its slope',
  },
  {
    id: 'objectNA',
    label: 'NA at the object',
    kind: 'number',
    digits: 5,
    read: ({ light }) => light.objectNA,
    formula:
      'index times the sine of the marginal ray’s angle at the object, the angle being the arctangent of its slope',
  },
  {
    id: 'fieldAngle',
    label: 'Half field angle',
    kind: 'angle',
    digits: 2,
    read: ({ light }) => light.fieldAngleRad,
    formula: 'angle of the chief ray in front of the first surface',
  },
  {
    id: 'objectHeight',
    label: 'Object height',
    kind: 'length',
    digits: 3,
    read: ({ light }) => light.objectHeightMm,
    formula: 'height of the chief ray in the object plane',
    applies: ({ train }) => train.objectZ !== null,
  },
  {
    id: 'imageHeight',
    isMain: true,
    label: 'Image height',
    kind: 'length',
    digits: 3,
    read: ({ light }) => light.imageHeightMm,
    formula: 'height of the chief ray in the image plane',
  },
  {
    id: 'chiefAngleObject',
    label: 'Chief ray at object',
    kind: 'angle',
    digits: 2,
    read: ({ light }) => light.chiefAngleObjectRad,
    formula: 'arctangent of the chief ray’s slope at the object',
  },
  {
    id: 'chiefAngleImage',
    isMain: true,
    label: 'Chief ray at sensor',
    kind: 'angle',
    digits: 2,
    read: ({ light }) => light.chiefAngleImageRad,
    formula: 'arctangent of the chief ray’s slope at the image plane',
  },
  {
    id: 'lagrange',
    label: 'Lagrange invariant',
    kind: 'length',
    digits: 4,
    read: ({ light }) => light.lagrange,
    formula: 'nu·ȳ − nū·y, the same in every space',
  },
  {
    id: 'focusBlur',
    label: 'Depth of focus ±',
    kind: 'length',
    digits: 3,
    read: ({ depth }) => depth.focusBlurMm,
    formula: 'for the allowed blur: index times working f-number times blur diameter, to either side',
  },
  {
    id: 'focusQuarterWave',
    label: 'Quarter wave ±',
    kind: 'length',
    digits: 3,
    read: ({ depth }) => depth.focusQuarterWaveMm,
    formula:
      'depth of focus for a quarter wave: index times wavelength over twice the squared NA at the image, to either side',
  },
  {
    id: 'near',
    label: 'Sharp from',
    kind: 'length',
    digits: 2,
    read: ({ depth }) => depth.nearMm,
    formula: 'nearest object, in front of the first vertex, whose blur on the image plane is the allowed one',
  },
  {
    id: 'far',
    label: 'Sharp to',
    kind: 'length',
    digits: 2,
    read: ({ depth }) => depth.farMm,
    formula:
      'farthest object, in front of the first vertex, whose blur on the image plane is the allowed one',
  },
  {
    id: 'petzval',
    isMain: true,
    label: 'Petzval radius',
    kind: 'length',
    digits: 2,
    read: ({ petzval }) => petzval.radiusMm,
    formula: '−1 over the Petzval sum, negative for a field that curves towards the lens',
    particulars: assumedIndex,
  },
  {
    id: 'petzvalSum',
    label: 'Petzval sum',
    kind: 'power',
    digits: 4,
    read: ({ petzval }) => petzval.sumPerMm,
    formula: 'sum of power / index over the thin parts, and of power / (n n′) over the surfaces',
    particulars: assumedIndex,
  },
  {
    id: 'axialColour',
    label: 'Axial colour',
    kind: 'length',
    digits: 4,
    read: ({ colour }) => colour.axialMm,
    formula: 'image distance in the short line minus that in the long line, first-order sum over the parts',
    particulars: leftOutOfColour,
  },
  {
    id: 'lateralColour',
    label: 'Lateral colour',
    kind: 'length',
    digits: 4,
    read: ({ colour }) => colour.lateralMm,
    formula:
      'chief ray height in the image plane in the short line minus that in the long line, first-order sum',
    particulars: leftOutOfColour,
  },
];

/** The share of the pupil that passes at each field drawn. */
export const passingReadouts = (fractions: readonly number[]): readonly Readout[] =>
  fractions.map((fraction, index) => ({
    id: `passing${index}`,
    label: passingLabel(fraction),
    kind: 'share',
    digits: 1,
    read: ({ vignetting }) => {
      if (!vignetting.ok) return vignetting;
      const field = vignetting.value[index];
      return field ? some(field.areaShare) : none('no bundle');
    },
    formula:
      'area common to the stop and all clear diameters as seen from this field, over the area of the stop',
    particulars: (reading) => meridian(reading, index),
  }));

function passingLabel(fraction: number): string {
  if (fraction === 0) return 'Passes on the axis';
  const share = Math.abs(fraction) === 1 ? 'full' : String(Math.abs(fraction));
  return `Passes at ${fraction < 0 ? '\u2212' : ''}${share} field`;
}
