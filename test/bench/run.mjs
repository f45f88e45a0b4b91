import { fileURLToPath } from 'node:url';
import { loadTs } from '../tools/load-ts.mjs';
import { benchInChromium, hasChromium } from './inChromium.mjs';

/** @type {typeof import('./inNode.ts')} */
const bench = await loadTs(fileURLToPath(new URL('inNode.ts', import.meta.url)));
const here = bench.benchInNode();
const chromium = hasChromium() ? await benchInChromium() : null;

if (process.argv.includes('--json')) {
  const there = chromium?.rows.map((row) => ({ ...row, name: `Chromium, ${row.name}` })) ?? [];
  process.stdout.write(bench.rowsJson([...here, ...there]));
} else {
  process.stdout.write(`Node ${process.version}\n\n${bench.rowsTable(here)}\n`);
  process.stdout.write(
    chromium
      ? `Chromium ${chromium.version}\n\n${bench.rowsTable(chromium.rows)}`
      : 'No Chromium found: nothing was measured in a browser.\n',
  );
}
