import { spawnSync } from 'node:child_process';
import { existsSync, readFileSync, rmSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { runSteps } from './steps.mjs';
import { browserTally, closingLine, NOTHING, unitTally } from './tally.mjs';

const repository = fileURLToPath(new URL('../..', import.meta.url));
const UNIT_REPORT = 'test-results/unit.json';
const BROWSER_REPORT = 'test-results/browser.json';

/**
 * @template Report
 * @param {string} path of a report; a run that broke off has written none
 * @param {(report: Report) => import('./tally.mjs').Tally} tallyOf
 */
const tallyIn = (path, tallyOf) => () =>
  existsSync(`${repository}/${path}`)
    ? tallyOf(JSON.parse(readFileSync(`${repository}/${path}`, 'utf8')))
    : NOTHING;

/** @type {import('./steps.mjs').Step[]} */
const STEPS = [
  { heading: 'format and lint', command: 'npm run --silent lint' },
  { heading: 'types', command: 'npm run --silent types' },
  { heading: 'import rule', command: 'npm run --silent imports' },
  { heading: 'unused code', command: 'npm run --silent unused' },
  {
    heading: 'unit and property tests',
    command: `npm run --silent test:unit -- --reporter=default --reporter=json --outputFile.json=${UNIT_REPORT}`,
    tally: tallyIn(UNIT_REPORT, unitTally),
  },
  { heading: 'docs links', command: 'npm run --silent docs' },
  { heading: 'build', command: 'npm run --silent build' },
  { heading: 'bundle size', command: 'npm run --silent size' },
  {
    heading: 'browser tests',
    command: 'npm run --silent test:e2e -- --reporter=list,json',
    tally: tallyIn(BROWSER_REPORT, browserTally),
  },
];

/** @param {string} line */
const say = (line) => process.stdout.write(`${line}\n`);

/** @param {string} command */
const run = (command) =>
  spawnSync(command, {
    cwd: repository,
    shell: true,
    stdio: 'inherit',
    env: { ...process.env, PLAYWRIGHT_JSON_OUTPUT_FILE: `${repository}/${BROWSER_REPORT}` },
  }).status === 0;

for (const report of [UNIT_REPORT, BROWSER_REPORT]) rmSync(`${repository}/${report}`, { force: true });
const { failedStep, tally } = runSteps(STEPS, run, say);
if (failedStep !== null) {
  say(`── stopped: ${failedStep.heading} failed`);
  process.exitCode = 1;
}
say(closingLine(tally));
