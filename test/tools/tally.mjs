/**
 * How many tests passed, failed and were skipped.
 * @typedef {{ readonly passed: number, readonly failed: number, readonly skipped: number }} Tally
 */

/** @type {Tally} */
export const NOTHING = { passed: 0, failed: 0, skipped: 0 };

/**
 * The tally in the JSON report of the unit tests.
 * @param {{ numPassedTests: number, numFailedTests: number, numPendingTests: number, numTodoTests: number }} report
 * @returns {Tally}
 */
export const unitTally = (report) => ({
  passed: report.numPassedTests,
  failed: report.numFailedTests,
  skipped: report.numPendingTests + report.numTodoTests,
});

/**
 * The tally in the JSON report of the browser tests; one that passed only when tried again has passed.
 * @param {{ stats: { expected: number, unexpected: number, flaky: number, skipped: number } }} report
 * @returns {Tally}
 */
export const browserTally = ({ stats }) => ({
  passed: stats.expected + stats.flaky,
  failed: stats.unexpected,
  skipped: stats.skipped,
});

/**
 * @param {Tally} a
 * @param {Tally} b
 * @returns {Tally}
 */
export const addTallies = (a, b) => ({
  passed: a.passed + b.passed,
  failed: a.failed + b.failed,
  skipped: a.skipped + b.skipped,
});

/**
 * The closing line of a run, `N passed, N failed, N skipped`.
 * @param {Tally} tally
 */
export const closingLine = ({ passed, failed, skipped }) =>
  `${passed} passed, ${failed} failed, ${skipped} skipped`;
