import type { Analysis } from '../../../engine/index.ts';
import type { Readout } from './readout.ts';

const near = ({ sensor, train }: Analysis): boolean => sensor.halfDiagonalMm.ok && train.objectZ !== null;
const far = ({ sensor, train }: Analysis): boolean => sensor.halfDiagonalMm.ok && train.objectZ === null;
const nearWithSides = (analysis: Analysis): boolean => near(analysis) && analysis.sensor.objectWidthMm.ok;
const farWithSides = (analysis: Analysis): boolean => far(analysis) && analysis.sensor.widthAngleRad.ok;

/** What the sensor sees, its pixels against diffraction, and the clearances at both ends. */
export const SENSOR_READOUTS: readonly Readout[] = [
  {
    id: 'objectWidth',
    label: 'Width at the object',
    kind: 'length',
    digits: 2,
    read: ({ sensor }) => sensor.objectWidthMm,
    formula: 'sensor width over magnification',
    applies: nearWithSides,
  },
  {
    id: 'objectHeightSeen',
    label: 'Height at the object',
    kind: 'length',
    digits: 2,
    read: ({ sensor }) => sensor.objectHeightMm,
    formula: 'sensor height over magnification',
    applies: nearWithSides,
  },
  {
    id: 'objectDiagonal',
    isMain: true,
    label: 'Diagonal at object',
    kind: 'length',
    digits: 2,
    read: ({ sensor }) => sensor.objectDiagonalMm,
    formula: 'sensor diagonal over magnification',
    applies: near,
  },
  {
    id: 'widthAngle',
    label: 'Width, full angle',
    kind: 'angle',
    digits: 2,
    read: ({ sensor }) => sensor.widthAngleRad,
    formula: 'twice the arctangent of half the sensor width over the focal length',
    applies: farWithSides,
  },
  {
    id: 'heightAngle',
    label: 'Height, full angle',
    kind: 'angle',
    digits: 2,
    read: ({ sensor }) => sensor.heightAngleRad,
    formula: 'twice the arctangent of half the sensor height over the focal length',
    applies: farWithSides,
  },
  {
    id: 'diagonalAngle',
    isMain: true,
    label: 'Diagonal, full angle',
    kind: 'angle',
    digits: 2,
    read: ({ sensor }) => sensor.diagonalAngleRad,
    formula: 'twice the arctangent of half the sensor diagonal over the focal length',
    applies: far,
  },
  {
    id: 'pixelAtObject',
    isMain: true,
    label: 'Pixel at the object',
    kind: 'micro',
    digits: 2,
    read: ({ sensor }) => sensor.pixelAtObjectMm,
    formula: 'pixel pitch over magnification',
    applies: near,
  },
  {
    id: 'airyDiameter',
    isMain: true,
    label: 'Airy disc',
    kind: 'micro',
    digits: 2,
    read: ({ sensor }) => sensor.airyDiameterMm,
    formula: 'diameter of the first dark ring: 2.44 times wavelength times working f-number',
  },
  {
    id: 'airyPixels',
    isMain: true,
    label: 'Airy disc in pixels',
    kind: 'number',
    digits: 2,
    read: ({ sensor }) => sensor.airyPixels,
    formula: 'Airy disc over pixel pitch',
    applies: ({ sensor }) => sensor.halfDiagonalMm.ok,
  },
  {
    id: 'nyquistContrast',
    label: 'Contrast at Nyquist',
    kind: 'share',
    digits: 1,
    read: ({ sensor }) => sensor.nyquistContrast,
    formula:
      'what diffraction alone leaves of the contrast at one line pair per two pixels, incoherent light, round pupil',
    applies: ({ sensor }) => sensor.halfDiagonalMm.ok,
  },
  {
    id: 'workingDistance',
    label: 'Working distance',
    kind: 'length',
    digits: 3,
    read: ({ sensor }) => sensor.workingDistanceMm,
    formula: 'object distance minus the room reserved in front of the first part',
  },
  {
    id: 'mountClearance',
    label: 'Last part to mount',
    kind: 'length',
    digits: 3,
    read: ({ sensor }) => sensor.mountClearanceMm,
    formula: 'image plane minus register distance minus the room reserved behind the last part',
  },
];
