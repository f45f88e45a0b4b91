import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join, resolve } from 'node:path';
import { pathToFileURL } from 'node:url';
import { build } from 'vite';

/**
 * Loads a TypeScript module from a script that Node runs as it is. The module is bundled first, so that what is measured
 * is plain code without a loader in between.
 * @template {object} Module
 * @param {string} path from the working directory, or absolute
 * @returns {Promise<Module>} the exports of the module
 */
export async function loadTs(path) {
  const folder = mkdtempSync(join(tmpdir(), 'gapwright-'));
  try {
    await build({
      configFile: false,
      logLevel: 'error',
      build: {
        outDir: folder,
        ssr: resolve(path),
        target: 'node20',
        minify: false,
        // Constants stay constants, as in the build of the app.
        rolldownOptions: { output: { entryFileNames: 'module.mjs', topLevelVar: false } },
      },
      ssr: { noExternal: true },
    });
    return await import(pathToFileURL(join(folder, 'module.mjs')).href);
  } finally {
    rmSync(folder, { recursive: true });
  }
}
