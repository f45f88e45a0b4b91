import type { Analysis } from '../../../engine/index.ts';
import { focalLengths } from './particulars.ts';
import type { Readout } from './readout.ts';

const mediaDiffer = ({ train }: Analysis): boolean => train.index[0] !== train.index[train.count];

/** What the layout does to light from infinity. */
export const POWER_READOUTS: readonly Readout[] = [
  {
    id: 'focalLength',
    isMain: true,
    label: 'Focal length',
    kind: 'length',
    digits: 3,
    read: ({ firstOrder }) => firstOrder.focalLengthMm,
    formula:
      '1 / power, the power being −nu behind the last surface over y at the first, of a ray that enters parallel',
    particulars: focalLengths,
  },
  {
    id: 'afocalMagnification',
    isMain: true,
    label: 'Angular magnification',
    kind: 'ratio',
    digits: 4,
    read: ({ firstOrder }) => firstOrder.angularMagnification,
    formula: 'slope of a ray behind the layout over its slope in front, for light from infinity',
    applies: ({ firstOrder }) => firstOrder.afocal || firstOrder.nearlyAfocal,
  },
  {
    id: 'power',
    label: 'Power',
    kind: 'power',
    digits: 4,
    read: ({ firstOrder }) => firstOrder.powerPerMm,
    formula: '−nu behind the last surface over y at the first, of a ray that enters parallel',
    particulars: focalLengths,
  },
  {
    id: 'backFocus',
    isMain: true,
    label: 'Back focus',
    kind: 'length',
    digits: 3,
    read: ({ firstOrder }) => firstOrder.backFocusMm,
    formula: 'from the last vertex to the rear focal point: −n′y / nu of a ray that enters parallel',
  },
  {
    id: 'frontFocus',
    label: 'Front focus',
    kind: 'length',
    digits: 3,
    read: ({ firstOrder }) => firstOrder.frontFocusMm,
    formula:
      'from the first vertex to the front focal point: where a ray that leaves parallel crosses the axis',
  },
  {
    id: 'principalFront',
    label: 'Front principal plane',
    kind: 'length',
    digits: 3,
    read: ({ firstOrder }) => firstOrder.principalFrontMm,
    formula: 'from the first vertex: front focus minus front focal length',
  },
  {
    id: 'principalRear',
    label: 'Rear principal plane',
    kind: 'length',
    digits: 3,
    read: ({ firstOrder }) => firstOrder.principalRearMm,
    formula: 'from the last vertex: back focus minus rear focal length',
  },
  {
    id: 'nodalFront',
    label: 'Front nodal point',
    kind: 'length',
    digits: 3,
    read: ({ firstOrder }) => firstOrder.nodalFrontMm,
    formula: 'from the first vertex: front focus plus rear focal length',
    applies: mediaDiffer,
  },
  {
    id: 'nodalRear',
    label: 'Rear nodal point',
    kind: 'length',
    digits: 3,
    read: ({ firstOrder }) => firstOrder.nodalRearMm,
    formula: 'from the last vertex: back focus plus front focal length',
    applies: mediaDiffer,
  },
];
