import { addTallies, NOTHING } from './tally.mjs';

/**
 * @typedef {import('./tally.mjs').Tally} Tally
 * @typedef {{
 *   readonly heading: string,
 *   readonly command: string,
 *   readonly tally?: () => Tally,
 * }} Step one check: its command, and for tests the reader of its report
 */

/**
 * Runs `steps` in order and stops at the first that fails.
 * @param {readonly Step[]} steps
 * @param {(command: string) => boolean} run whether the command succeeded
 * @param {(line: string) => void} say
 * @returns {{ failedStep: Step | null, tally: Tally }} the tests counted so far; a failed step that reports no failed
 *   test counts as one, so that a failed run never closes on "0 failed"
 */
export function runSteps(steps, run, say) {
  let tally = NOTHING;
  for (const step of steps) {
    say(`── ${step.heading}: ${step.command}`);
    const succeeded = run(step.command);
    const counted = step.tally?.() ?? NOTHING;
    tally = addTallies(tally, counted);
    if (succeeded) continue;
    if (counted.failed === 0) tally = addTallies(tally, { ...NOTHING, failed: 1 });
    return { failedStep: step, tally };
  }
  return { failedStep: null, tally };
}
