/** One curve of a plot in one line. What has no value, as its ray is lost, is left out and counted. */
export interface Curve {
  /** Place in the lines of the setup. */
  readonly line: number;
  /** Share of the stop's radius or of the field, as the plot says. */
  readonly at: Float64Array;
  readonly value: Float64Array;
  readonly lost: number;
}

/** The curve through the values that are numbers; `at` and `value` are shortened in place. */
export function curveOf(line: number, at: Float64Array, value: Float64Array): Curve {
  let count = 0;
  for (let i = 0; i < value.length; i++) {
    if (!Number.isFinite(value[i])) continue;
    at[count] = at[i]!;
    // Never −0.
    value[count] = value[i]! + 0;
    count++;
  }
  return { line, at: at.subarray(0, count), value: value.subarray(0, count), lost: value.length - count };
}
