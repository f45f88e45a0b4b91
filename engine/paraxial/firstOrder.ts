import { none, type Outcome, some } from '../outcome.ts';
import type { Train } from '../train/types.ts';
import { type Absence, finite, type Quantity } from './absence.ts';
import { isZeroPower, type Matrix, systemMatrix } from './matrix.ts';

/**
 * The cardinal points. All in mm and signed, positive to the right: `front…` from the first vertex, `rear…` and the back focus from the
 * last. With the matrix a b c d on (y, nu), power φ = −c, outer indices n and n′. Absent: 'afocal', 'no parts', 'out of range'.
 */
export interface FirstOrder {
  /** First vertex to last vertex. */
  readonly matrix: Outcome<Matrix, Absence>;
  readonly powerPerMm: Quantity;
  readonly afocal: boolean;
  /** The power is so small a rest of what the parts contribute that the angular magnification says more than the focal length. */
  readonly nearlyAfocal: boolean;
  /** 1/φ. */
  readonly focalLengthMm: Quantity;
  /** −n/φ, from the front principal point to the front focus. */
  readonly frontFocalLengthMm: Quantity;
  /** n′/φ, from the rear principal point to the rear focus. */
  readonly rearFocalLengthMm: Quantity;
  /** V2F′ = n′a/φ. */
  readonly backFocusMm: Quantity;
  /** V1F = −nd/φ. */
  readonly frontFocusMm: Quantity;
  /** V1H = n(1 − d)/φ. */
  readonly principalFrontMm: Quantity;
  /** V2H′ = n′(a − 1)/φ. */
  readonly principalRearMm: Quantity;
  /** V1N = (n′ − nd)/φ. */
  readonly nodalFrontMm: Quantity;
  /** V2N′ = (n′a − n)/φ. */
  readonly nodalRearMm: Quantity;
  /** u′/u of light from infinity = d·n/n′; 'not afocal' unless afocal or nearly so. */
  readonly angularMagnification: Quantity;
  /** First to last vertex. */
  readonly vertexLengthMm: number;
}

/** Share of the parts' own contributions below which the power counts as nearly none: a readout's choice, no numerical one. */
const NEARLY_AFOCAL = 1e-3;

/** Power, focal lengths and cardinal points of the whole train. */
export function firstOrder(train: Train): FirstOrder {
  const matrix = systemMatrix(train);
  const { a, c, d, cScale } = matrix;
  const n = train.index[0]!;
  const nRear = train.index[train.count]!;
  const absent = absenceOf(train, matrix);
  const perPower = (numerator: number): Quantity => (absent ? none(absent) : finite(numerator / -c));
  const nearlyAfocal = Math.abs(c) <= NEARLY_AFOCAL * cScale;
  return {
    matrix: isFiniteMatrix(matrix) ? some(matrix) : none('out of range'),
    powerPerMm: train.count === 0 ? none('no parts') : finite(c === 0 ? 0 : -c),
    afocal: absent === 'afocal',
    nearlyAfocal,
    focalLengthMm: perPower(1),
    frontFocalLengthMm: perPower(-n),
    rearFocalLengthMm: perPower(nRear),
    backFocusMm: perPower(nRear * a),
    frontFocusMm: perPower(-n * d),
    principalFrontMm: perPower(n * (1 - d)),
    principalRearMm: perPower(nRear * (a - 1)),
    nodalFrontMm: perPower(nRear - n * d),
    nodalRearMm: perPower(nRear * a - n),
    angularMagnification: nearlyAfocal ? finite((d * n) / nRear) : none('not afocal'),
    vertexLengthMm: train.count === 0 ? 0 : train.z[train.count - 1]!,
  };
}

function absenceOf(train: Train, matrix: Matrix): Absence | null {
  if (train.count === 0) return 'no parts';
  if (!isFiniteMatrix(matrix)) return 'out of range';
  return isZeroPower(matrix) ? 'afocal' : null;
}

const isFiniteMatrix = (matrix: Matrix): boolean => Object.values(matrix).every(Number.isFinite);
