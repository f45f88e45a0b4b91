import { describe, expect, test } from 'vitest';
import { runSteps } from './steps.mjs';
import { browserTally, closingLine, unitTally } from './tally.mjs';

const tests = (passed: number, failed: number) => () => ({ passed, failed, skipped: 0 });

/** Runs `steps` where the commands named in `failing` fail; gives what was run as well. */
function runWith(failing: readonly string[], steps: Parameters<typeof runSteps>[0]) {
  const ran: string[] = [];
  const said: string[] = [];
  const run = (command: string) => {
    ran.push(command);
    return !failing.includes(command);
  };
  return { ...runSteps(steps, run, (line) => said.push(line)), ran, said };
}

describe('the steps of the whole test', () => {
  const steps = [
    { heading: 'lint', command: 'a' },
    { heading: 'unit', command: 'b', tally: tests(7, 0) },
    { heading: 'browser', command: 'c', tally: tests(3, 0) },
  ];

  test('run in order, each under one heading, and their tests are summed', () => {
    const { failedStep, tally, ran, said } = runWith([], steps);
    expect(failedStep).toBeNull();
    expect(tally).toEqual({ passed: 10, failed: 0, skipped: 0 });
    expect(ran).toEqual(['a', 'b', 'c']);
    expect(said).toEqual(['── lint: a', '── unit: b', '── browser: c']);
  });

  test('stop at the first that fails', () => {
    const { failedStep, ran } = runWith(['a'], steps);
    expect(failedStep?.heading).toBe('lint');
    expect(ran).toEqual(['a']);
  });

  test('never close on "0 failed" when one failed', () => {
    expect(runWith(['a'], steps).tally).toEqual({ passed: 0, failed: 1, skipped: 0 });
    expect(runWith(['c'], steps).tally).toEqual({ passed: 10, failed: 1, skipped: 0 });
  });

  test('count the failed tests that a report names, and no more', () => {
    const { tally } = runWith(['b'], [{ heading: 'unit', command: 'b', tally: tests(5, 2) }]);
    expect(closingLine(tally)).toBe('5 passed, 2 failed, 0 skipped');
  });
});

describe('the tally of a report', () => {
  test('of unit tests counts pending and planned ones as skipped', () => {
    const report = { numPassedTests: 4, numFailedTests: 1, numPendingTests: 2, numTodoTests: 3 };
    expect(unitTally(report)).toEqual({ passed: 4, failed: 1, skipped: 5 });
  });

  test('of browser tests counts one that needed a second try as passed', () => {
    const stats = { expected: 6, unexpected: 2, flaky: 1, skipped: 4 };
    expect(browserTally({ stats })).toEqual({ passed: 7, failed: 2, skipped: 4 });
  });
});
