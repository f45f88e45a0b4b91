import type { Measured } from './measure.ts';

/** One quantity that came out wrong. `wanted` is 'none' when it should not exist. */
export interface Miss {
  readonly quantity: string;
  readonly got: string;
  readonly wanted: string;
  readonly tolerance: number;
}

/** What became of one case: a case of the list, a ray, or a system with sums. */
export interface CaseReport {
  readonly id: string;
  readonly outcome: 'passed' | 'failed' | 'skipped';
  /** Quantities that were compared, against the printed figure or the independent computation or both. */
  readonly covered: readonly string[];
  /** Quantities that nothing here can express. */
  readonly left: readonly string[];
  readonly misses: readonly Miss[];
}

/** Relative agreement with the independent computation: a trace of thirty surfaces in double precision keeps it. */
export const COMPUTED_RELATIVE = 1e-12;

/** The report of a case by what was compared in it; skipped when nothing was. */
export function reportOf(
  id: string,
  covered: readonly string[],
  left: readonly string[],
  misses: readonly Miss[],
): CaseReport {
  const outcome = covered.length === 0 ? 'skipped' : misses.length > 0 ? 'failed' : 'passed';
  return { id, outcome, covered, left, misses };
}

/** No miss when `value` is within `tolerance` of `wanted`, or absent when `wanted` is null. */
export function compare(
  quantity: string,
  value: Measured['value'],
  wanted: number | null,
  tolerance: number,
): readonly Miss[] {
  const got = value.ok ? value.value : value.why;
  const agrees = wanted === null ? !value.ok : value.ok && Math.abs(value.value - wanted) <= tolerance;
  return agrees ? [] : [{ quantity, got: String(got), wanted: String(wanted ?? 'none'), tolerance }];
}

/** The line that tells of a miss. */
export const missLine = (id: string, { quantity, got, wanted, tolerance }: Miss): string =>
  `miss: ${id}, ${quantity}: got ${got}, wanted ${wanted}, tolerance ${tolerance}`;
