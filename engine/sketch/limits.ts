/** What a number in a sketch is called and what it may be. */
export interface Limit {
  /** The field's name in a sentence, `focal length`. */
  readonly words: string;
  readonly unit: 'mm' | 'nm' | '°' | '';
  readonly low: number;
  readonly high: number;
  /** Whether `low` itself is excluded. */
  readonly above: boolean;
  /** What is smaller in size counts as zero, which is not allowed. */
  readonly leastSize?: number;
  /** What is allowed, to follow "it must be". */
  readonly allowed: string;
}

/** No length in a sketch is larger, in mm: one kilometre. */
export const LONGEST_MM = 1e6;
/** No focal length and no radius is shorter in size, in mm. */
const SHORTEST_MM = 1e-3;

/** How many entries a list may hold, and how many characters a text. */
export const MOST = {
  parts: 200,
  positions: 60,
  groups: 100,
  fractions: 9,
  surfaces: 20,
  coefficients: 14,
  moreLines: 2,
} as const;
export const LONGEST_TEXT = { title: 200, name: 100, note: 5000, notes: 50_000, id: 40 } as const;

const above = (words: string, low: number, high: number, unit: Limit['unit']): Limit => ({
  words,
  unit,
  low,
  high,
  above: true,
  allowed: `above ${shown(low)} and at most ${shown(high)}${spaced(unit)}`,
});

const from = (words: string, low: number, high: number, unit: Limit['unit']): Limit => ({
  words,
  unit,
  low,
  high,
  above: false,
  allowed: `between ${shown(low)} and ${shown(high)}${spaced(unit)}`,
});

const shown = (value: number): string => value.toLocaleString('en').replace('-', '−');
const spaced = (unit: Limit['unit']): string => (unit === '' || unit === '°' ? unit : ` ${unit}`);

/** The numbers of a sketch by their names in the file. Numbers that may be absent say so where they are read. */
export const LIMITS = {
  focalLengthMm: {
    words: 'focal length',
    unit: 'mm',
    low: -LONGEST_MM,
    high: LONGEST_MM,
    above: false,
    leastSize: SHORTEST_MM,
    allowed: 'a number other than zero, between 0.001 and 1,000,000 mm in size',
  },
  lengthMm: from('gap', -LONGEST_MM, LONGEST_MM, 'mm'),
  distanceMm: {
    ...above('object distance', 0, LONGEST_MM, 'mm'),
    allowed: 'above 0 and at most 1,000,000 mm, in front of the first part, or infinity',
  },
  semiDiameterMm: above('semi-diameter', 0, LONGEST_MM, 'mm'),
  thicknessMm: above('thickness', 0, LONGEST_MM, 'mm'),
  roomFrontMm: from('room in front', 0, LONGEST_MM, 'mm'),
  roomBehindMm: from('room behind', 0, LONGEST_MM, 'mm'),
  radiusMm: {
    words: 'radius',
    unit: 'mm',
    low: -1e12,
    high: 1e12,
    above: false,
    leastSize: SHORTEST_MM,
    allowed: 'a number other than zero, between 0.001 and 1,000,000,000,000 mm in size, or flat',
  },
  conic: from('conic constant', -1e6, 1e6, ''),
  coefficient: {
    ...from('coefficient', -1e30, 1e30, ''),
    allowed: 'a finite number, at most 1e30 in size',
  },
  fillingMm: from('thickness', 0, LONGEST_MM, 'mm'),
  shapeFactor: from('shape factor', -1e6, 1e6, ''),
  weight: from('weight', 0, 1e6, ''),
  abbeNumber: above('Abbe number', 0, 1000, ''),
  index: from('index', 1, 5, ''),
  assumedIndex: from('assumed index', 1, 5, ''),
  registerMm: above('register distance', 0, LONGEST_MM, 'mm'),
  widthMm: above('width', 0, LONGEST_MM, 'mm'),
  heightMm: above('height', 0, LONGEST_MM, 'mm'),
  diagonalMm: above('diagonal', 0, LONGEST_MM, 'mm'),
  pixelPitchMm: above('pixel pitch', 0, LONGEST_MM, 'mm'),
  blurMm: above('blur diameter', 0, LONGEST_MM, 'mm'),
  stopDiameterMm: above('stop diameter', 0, LONGEST_MM, 'mm'),
  pupilDiameterMm: above('entrance-pupil diameter', 0, LONGEST_MM, 'mm'),
  workingFNumber: above('working f-number', 0, LONGEST_MM, ''),
  infinityFNumber: above('f-number at infinity', 0, LONGEST_MM, ''),
  na: above('numerical aperture at the object', 0, 5, ''),
  angleDeg: {
    words: 'field angle',
    unit: '°',
    low: 0,
    high: 90 * (1 - Number.EPSILON),
    above: false,
    allowed: 'from 0° up to, but not including, 90°',
  },
  objectHeightMm: from('object height', 0, LONGEST_MM, 'mm'),
  imageHeightMm: from('image height', 0, LONGEST_MM, 'mm'),
  fraction: from('field fraction', -1, 1, ''),
  vignetting: from('vignetting', 0, 1, ''),
  wavelengthNm: from('wavelength', 100, 20_000, 'nm'),
} as const satisfies Record<string, Limit>;

/** Whether the number keeps to its limit; what is not a number, or not finite, does not. */
export const keeps = (limit: Limit, value: number): boolean =>
  value <= limit.high &&
  (limit.above ? value > limit.low : value >= limit.low) &&
  (limit.leastSize === undefined || Math.abs(value) >= limit.leastSize);
