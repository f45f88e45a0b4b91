import type { PartId, PositionId } from '../sketch/types.ts';
import { type LengthUnit, lengthText } from '../units.ts';

export type WarningKind =
  | 'negative gap'
  | 'rooms overlap'
  | 'rims clash'
  | 'surfaces cross'
  | 'surface ends'
  | 'object inside'
  | 'image inside'
  | 'behind the mount'
  | 'axial bundle cut'
  | 'field edge dark'
  | 'sensor not covered'
  | 'out of focus'
  | 'no marginal ray'
  | 'no chief ray'
  | 'field lost';

/** Something about the layout that a person should know. */
export interface Warning {
  readonly kind: WarningKind;
  readonly severity: 'cannot be built' | 'look at this';
  /** The part to select; null when it is about an end or the whole. */
  readonly partId: PartId | null;
  readonly positionId: PositionId;
  /** Plain, with its lengths in `unit`. */
  readonly sentence: (unit: LengthUnit) => string;
}

/** A warning before its position is known. */
export type Found = Omit<Warning, 'positionId'>;

/** A sentence that waits for its unit: the numbers in it are lengths in mm. */
export const saying =
  (texts: TemplateStringsArray, ...values: readonly (string | number)[]): Warning['sentence'] =>
  (unit) =>
    String.raw(
      { raw: texts },
      ...values.map((value) => (typeof value === 'number' ? lengthText(value, unit) : value)),
    );

/** Rounding of gaps that were solved to touch must not count as an overlap (mm). */
export const TOUCHING_MM = 1e-9;
