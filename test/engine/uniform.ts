import fc from 'fast-check';

/** Steps that a range is divided into. */
const STEPS = 2 ** 24;

/**
 * A number spread evenly between two limits, the limits themselves and the low end more often. (A double drawn by its bits lies next to zero nearly
 * always when zero is in the range.)
 */
export const uniform = (min: number, max: number): fc.Arbitrary<number> =>
  fc.integer({ min: 0, max: STEPS }).map((step) => min + ((max - min) * step) / STEPS);
