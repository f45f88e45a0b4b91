import { none, some } from '../../../engine/index.ts';
import type { Readout } from './readout.ts';

/** Where object and image stand, and how large the image is. */
export const CONJUGATE_READOUTS: readonly Readout[] = [
  {
    id: 'magnification',
    isMain: true,
    label: 'Magnification',
    kind: 'ratio',
    digits: 4,
    read: ({ conjugates }) => conjugates.magnification,
    formula: 'image height over object height: nu at the object over nu at the image, of the marginal ray',
  },
  {
    id: 'imageDistance',
    label: 'Image behind last',
    kind: 'length',
    digits: 3,
    read: ({ conjugates }) => conjugates.imageDistanceMm,
    formula:
      'from the last vertex to the paraxial image: −n′y / nu of the marginal ray behind the last surface',
  },
  {
    id: 'defocus',
    isMain: true,
    label: 'Defocus',
    kind: 'length',
    digits: 3,
    read: ({ conjugates }) => conjugates.defocusMm,
    formula: 'paraxial image minus image plane, positive when the image falls behind the sensor',
  },
  {
    id: 'track',
    isMain: true,
    label: 'Track',
    kind: 'length',
    digits: 3,
    read: ({ conjugates }) => conjugates.trackMm,
    formula: 'from the first vertex to the image plane',
  },
  {
    id: 'objectToImage',
    label: 'Object to image',
    kind: 'length',
    digits: 3,
    read: ({ conjugates }) => conjugates.objectToImageMm,
    formula: 'object distance plus track',
  },
  {
    id: 'vertexLength',
    label: 'First to last vertex',
    kind: 'length',
    digits: 3,
    read: ({ firstOrder, train }) => (train.count === 0 ? none('no parts') : some(firstOrder.vertexLengthMm)),
    formula: 'the sum of the gaps and thicknesses',
  },
  {
    id: 'longitudinalMagnification',
    label: 'Along the axis',
    kind: 'ratio',
    digits: 5,
    read: ({ conjugates }) => conjugates.longitudinalMagnification,
    formula: 'longitudinal magnification, n′/n times the magnification squared',
  },
  {
    id: 'angularMagnification',
    label: 'Angular',
    kind: 'ratio',
    digits: 4,
    read: ({ conjugates }) => conjugates.angularMagnification,
    formula: 'angular magnification, slope of the marginal ray at the image over its slope at the object',
  },
];
