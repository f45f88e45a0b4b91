import { canvasMeasure } from '../../app/board/measure.ts';
import { runBench } from './bench.ts';
import type { BenchRow } from './row.ts';

/** Every row, measured in the page that this runs in, labels by its canvas. */
export function benchInPage(): readonly BenchRow[] {
  const ctx = document.createElement('canvas').getContext('2d');
  if (!ctx) throw new Error('benchInPage: no canvas');
  return runBench(canvasMeasure(ctx).measure);
}
