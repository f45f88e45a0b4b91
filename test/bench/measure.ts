/** How long one run of a task takes, in ms. */
export interface Timing {
  readonly minMs: number;
  readonly medianMs: number;
}

const WARM_UP_MS = 150;
const SAMPLES = 41;
/** Long enough for the coarse clock of a browser. */
const SAMPLE_MS = 4;

let sink = 0;

/** What all tasks have returned, added up: keeps their work from being optimised away. */
export const sunk = (): number => sink;

/**
 * The time of one run of each task, which returns a number that depends on all its work. All are warmed up first; every
 * sample is as many runs as fill 4 ms. Samples of the tasks take turns, so that a busy machine slows all of them alike.
 */
export function measure<Name extends string>(
  tasks: Readonly<Record<Name, () => number>>,
): Record<Name, Timing> {
  const names = Object.keys(tasks) as Name[];
  const plans = names.map((name) => {
    const task = tasks[name];
    const runs = Math.max(1, Math.ceil((runsWithin(task, WARM_UP_MS) * SAMPLE_MS) / WARM_UP_MS));
    return { name, task, runs, samples: [] as number[] };
  });
  for (let sample = 0; sample < SAMPLES; sample++) {
    for (const { task, runs, samples } of plans) {
      const start = performance.now();
      for (let run = 0; run < runs; run++) sink += task();
      samples.push((performance.now() - start) / runs);
    }
  }
  return Object.fromEntries(plans.map(({ name, samples }) => [name, timingOf(samples)])) as Record<
    Name,
    Timing
  >;
}

function timingOf(samples: number[]): Timing {
  samples.sort((a, b) => a - b);
  return { minMs: samples[0] ?? 0, medianMs: samples[samples.length >> 1] ?? 0 };
}

function runsWithin(task: () => number, spanMs: number): number {
  const end = performance.now() + spanMs;
  let runs = 0;
  while (performance.now() < end) {
    sink += task();
    runs++;
  }
  return runs;
}
