import { ratioOf, type Timing } from './measure.ts';

/** One line of the result. */
export interface BenchRow {
  readonly name: string;
  readonly min: number;
  readonly median: number;
  readonly unit: 'µs' | 'M/s';
  /** How many times as long as what it is compared with, in the same run; 1 for the yardsticks themselves. */
  readonly ratio: number;
  /** What the ratio compares with. */
  readonly against: string;
}

/** The row of a task's time in µs, as a ratio to that of its yardstick. */
export const timeRow = (name: string, timing: Timing, yardstick: Timing, against: string): BenchRow => ({
  name,
  min: 1000 * timing.minMs,
  median: 1000 * timing.medianMs,
  unit: 'µs',
  ratio: ratioOf(timing, yardstick),
  against,
});
