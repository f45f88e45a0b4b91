/** How long one run of a task takes, in ms. */
export interface Timing {
  readonly minMs: number;
  readonly medianMs: number;
  /** In the order they were taken: those of other tasks in the same place were taken next to them. */
  readonly samplesMs: readonly number[];
}

const WARM_UP_MS = 150;
const SAMPLES = 41;
/** Long against a clock's tick and long enough to hold its share of collecting garbage, short against a busy machine's slices. */
const SAMPLE_MS = 8;

let sink = 0;

/** What all tasks have returned, added up: keeps their work from being optimised away. */
export const sunk = (): number => sink;

/**
 * The time of one run of each task, which returns a number that depends on all its work. All are warmed up first; every
 * sample is as many runs as fill 8 ms. Samples of the tasks take turns, so that a busy machine slows all of them alike.
 */
export function measure<Name extends string>(
  tasks: Readonly<Record<Name, () => number>>,
): Record<Name, Timing> {
  const names = Object.keys(tasks) as Name[];
  const plans = names.map((name) => {
    const task = tasks[name];
    warmUp(task);
    return { name, task, runs: runsFilling(task), samples: [] as number[] };
  });
  for (let sample = 0; sample < SAMPLES; sample++) {
    for (const { task, runs, samples } of plans) {
      samples.push(timed(task, runs) / runs);
    }
  }
  return Object.fromEntries(plans.map(({ name, samples }) => [name, timingOf(samples)])) as Record<
    Name,
    Timing
  >;
}

/** How many times as long one task takes as another: the median over pairs of samples that were taken next to each other. */
export const ratioOf = (one: Timing, other: Timing): number =>
  median(one.samplesMs.map((ms, sample) => ms / (other.samplesMs[sample] ?? Number.NaN)));

const timingOf = (samplesMs: readonly number[]): Timing => ({
  minMs: Math.min(...samplesMs),
  medianMs: median(samplesMs),
  samplesMs,
});

function median(values: readonly number[]): number {
  return values.toSorted((a, b) => a - b)[values.length >> 1] ?? Number.NaN;
}

function warmUp(task: () => number): void {
  const end = performance.now() + WARM_UP_MS;
  while (performance.now() < end) sink += task();
}

/** How many runs take as long as a sample: the best of three counts, so that one interruption does not cut it short. */
function runsFilling(task: () => number): number {
  for (let runs = 1; ; runs *= 2) {
    const bestMs = Math.min(timed(task, runs), timed(task, runs), timed(task, runs));
    if (bestMs >= SAMPLE_MS) return runs;
  }
}

function timed(task: () => number, runs: number): number {
  const start = performance.now();
  for (let run = 0; run < runs; run++) sink += task();
  return performance.now() - start;
}
