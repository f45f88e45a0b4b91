import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import source from './c_kernel.c?raw';
import { batchTask } from './kernel.ts';
import { RAYS, SURFACES } from './kernelPrescription.ts';
import prescription from './prescription.txt?raw';
import type { BenchRow } from './row.ts';

const COMPILERS = ['gcc', 'clang', 'cc'];
const FLAGS = ['-O3', '-march=native', '-fno-math-errno', '-fno-trapping-math'];
const TURNS = 9;
const TURN_MS = 200;
/** How many times the rate of C ray by ray the kernel has to reach. */
const LEAST_GAIN = 1.5;
/** Between sums of a thousand rays that two programs traced in different order. */
const CHECKSUM = 1e-10;

/** The kernel's time and that of the program in C on the same rays, in turns; none where there is no compiler. */
export function nativeRows(): BenchRow[] {
  const folder = mkdtempSync(join(tmpdir(), 'kernel-'));
  try {
    // This module may run from a bundle, so the program's files are not beside it.
    const [program, code, table] = ['c_kernel', 'c_kernel.c', 'prescription.txt'].map((name) =>
      join(folder, name),
    );
    if (!(program && code && table)) return [];
    writeFileSync(code, source);
    writeFileSync(table, prescription);
    const compiled = COMPILERS.some(
      (compiler) => spawnSync(compiler, [...FLAGS, '-o', program, code, '-lm']).status === 0,
    );
    return compiled ? rowsAgainst(program, table) : [];
  } finally {
    rmSync(folder, { recursive: true });
  }
}

function rowsAgainst(program: string, table: string): BenchRow[] {
  const batch = batchTask(false);
  const turns = Array.from({ length: TURNS }, () => ({
    kernelUs: timeOf(batch),
    native: runNative(program, table),
  }));
  return ['c_ray_by_ray', 'c_surface_by_surface'].map((variant): BenchRow => {
    const times = turns.map(({ native }) => native.get(variant)?.us ?? Number.NaN);
    const sum = turns[0]?.native.get(variant)?.checksum ?? Number.NaN;
    if (!(Math.abs(sum - batch()) <= CHECKSUM * RAYS)) throw new Error(`nativeRows: ${variant} gives ${sum}`);
    return {
      name: `exact rays, ${variant.replaceAll('_', ' ').replace('c ', 'C, ')}: ${RAYS} rays, ${SURFACES.length} surfaces`,
      min: Math.min(...times),
      median: median(times),
      unit: 'µs',
      ratio: median(turns.map(({ kernelUs }, i) => (times[i] ?? Number.NaN) / kernelUs)),
      against: variant === 'c_ray_by_ray' ? `batch kernel; at least ${LEAST_GAIN}` : 'batch kernel',
    };
  });
}

/** The time of one run in µs, over one turn. */
function timeOf(task: () => number): number {
  const start = performance.now();
  let runs = 0;
  let sink = 0;
  while (performance.now() - start < TURN_MS) {
    for (let i = 0; i < 20; i++) sink += task();
    runs += 20;
  }
  return Number.isFinite(sink) ? (1000 * (performance.now() - start)) / runs : Number.NaN;
}

/** Time in µs of all rays through all surfaces and checksum of each variant of the program. */
function runNative(
  program: string,
  table: string,
): ReadonlyMap<string, { readonly us: number; readonly checksum: number }> {
  const { stdout } = spawnSync(program, [table, String(TURN_MS / 1000)], { encoding: 'utf8' });
  return new Map(
    stdout
      .trim()
      .split('\n')
      .map((line) => {
        const [variant = '', rate = '', checksum = ''] = line.split(' ');
        return [variant, { us: (1e6 * RAYS * SURFACES.length) / Number(rate), checksum: Number(checksum) }];
      }),
  );
}

const median = (values: readonly number[]): number =>
  values.toSorted((a, b) => a - b)[values.length >> 1] ?? Number.NaN;
