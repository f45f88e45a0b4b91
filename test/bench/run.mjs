import { fileURLToPath } from 'node:url';
import { runnerImport } from 'vite';

/** @type {{ module: typeof import('./bench.ts') }} */
const { module: bench } = await runnerImport(fileURLToPath(new URL('bench.ts', import.meta.url)), {
  configFile: false,
  logLevel: 'error',
});
const rows = bench.runBench();
process.stdout.write(process.argv.includes('--json') ? bench.rowsJson(rows) : bench.rowsTable(rows));
