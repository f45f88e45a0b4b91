/** The order of work within one frame: what the hand did, then what is drawn and read, then the slower plots. */
const PHASES = ['settle', 'draw', 'plots'] as const;
type Phase = (typeof PHASES)[number];

export interface FrameLoop {
  /** Asks for `job` in the next frame. Asked again under the same key before that, only the newest job runs. */
  readonly ask: (phase: Phase, key: string, job: () => void) => void;
  /** Runs what was asked for now, without waiting for the frame. */
  readonly flush: () => void;
}

/** One loop for the whole app: however many moves arrive, each job runs once a frame, in the order of the phases. */
export function createFrameLoop(requestFrame: (run: () => void) => void): FrameLoop {
  const jobs: Record<Phase, Map<string, () => void>> = {
    settle: new Map(),
    draw: new Map(),
    plots: new Map(),
  };
  let waiting = false;

  const flush = () => {
    waiting = false;
    for (const phase of PHASES) {
      const due = [...jobs[phase].values()];
      jobs[phase].clear();
      for (const job of due) job();
    }
  };

  const ask = (phase: Phase, key: string, job: () => void) => {
    jobs[phase].set(key, job);
    if (waiting) return;
    waiting = true;
    requestFrame(() => {
      if (waiting) flush();
    });
  };

  return { ask, flush };
}

/** The app's own loop, on the browser's frames. */
export const frameLoop = createFrameLoop((run) => requestAnimationFrame(run));
