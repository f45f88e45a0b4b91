import { fileURLToPath } from 'node:url';
import { cruise } from 'dependency-cruiser';
import config from '../../.dependency-cruiser.mjs';

const HOUSES = ['engine', 'app'];

/**
 * Checks the import rule in `repository`.
 * @param {string} repository
 * @returns {Promise<{ seen: number, faults: string[] }>} how many modules of engine and app were seen, and one line per
 *   breach; a house in which none was seen is a breach, since then nothing was checked
 */
export async function checkImports(repository) {
  const { output } = await cruise(HOUSES, {
    ...config.options,
    baseDir: repository,
    validate: true,
    ruleSet: { forbidden: config.forbidden },
  });
  if (typeof output === 'string') throw new Error('checkImports: the cruise gave a text instead of data');
  const sources = output.modules.map((module) => module.source);
  const unseen = HOUSES.filter((house) => !sources.some((source) => source.startsWith(`${house}/`)));
  return {
    seen: sources.filter((source) => HOUSES.some((house) => source.startsWith(`${house}/`))).length,
    faults: [
      ...unseen.map((house) => `${house}: no module was seen`),
      ...output.summary.violations.map(({ from, to, rule, cycle }) => {
        const way = cycle ? [from, ...cycle.map((step) => step.name)].join(' → ') : `${from} → ${to}`;
        return `${way}: ${rule.name}`;
      }),
    ],
  };
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  const { seen, faults } = await checkImports(fileURLToPath(new URL('../..', import.meta.url)));
  for (const fault of faults) process.stdout.write(`${fault}\n`);
  process.stdout.write(`${seen} modules, ${faults.length} breaches of the import rule\n`);
  if (faults.length > 0) process.exitCode = 1;
}
