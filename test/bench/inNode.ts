import { roughMeasure } from '../../app/board/measure.ts';
import { runBench } from './bench.ts';
import { nativeRows } from './kernelNative.ts';
import type { BenchRow } from './row.ts';

export { rowsJson, rowsTable } from './bench.ts';

/** Every row, measured in this process; there is no canvas, so labels are measured by their characters. The native rows come first, while nothing else runs. */
export const benchInNode = (): readonly BenchRow[] => [...nativeRows(), ...runBench(roughMeasure)];
