import { fileURLToPath } from 'node:url';
import { runnerImport } from 'vite';

// Node runs no TypeScript by itself, so the runner is loaded through the build tool.
const path = fileURLToPath(new URL('./cases.ts', import.meta.url));
/** @type {{ module: typeof import('./cases.ts') }} */
const { module } = await runnerImport(path, { configFile: false, logLevel: 'error' });
process.exitCode = module.main(process.argv.slice(2), (line) => process.stdout.write(`${line}\n`));
