import { existsSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { chromium } from '@playwright/test';
import { build } from 'vite';
import { chromiumPath, launchOptions } from '../../e2e/chromium.mjs';

/** A page isolated from all others, to which the browser gives its fine clock. */
const PAGE = 'http://localhost/bench';
const ISOLATED = {
  'Cross-Origin-Opener-Policy': 'same-origin',
  'Cross-Origin-Embedder-Policy': 'require-corp',
};

/** Whether there is a Chromium to measure in. */
export const hasChromium = () => existsSync(chromiumPath() ?? chromium.executablePath());

/**
 * The bench run in a page of its own, bundled and minified as the app is.
 * @returns {Promise<{ version: string, rows: ReturnType<typeof import('./inPage.ts').benchInPage> }>}
 */
export async function benchInChromium() {
  const code = await bundled();
  const browser = await chromium.launch(launchOptions());
  try {
    const page = await browser.newPage();
    await page.route(PAGE, (route) =>
      route.fulfill({ contentType: 'text/html', body: '', headers: ISOLATED }),
    );
    await page.goto(PAGE);
    const rows = await page.evaluate(`${code}; bench.benchInPage()`);
    return { version: browser.version(), rows };
  } finally {
    await browser.close();
  }
}

/** The bench as one script that leaves its exports in `bench`. */
async function bundled() {
  const built = await build({
    configFile: false,
    logLevel: 'error',
    define: { 'process.env.NODE_ENV': '"production"' },
    build: {
      write: false,
      target: 'es2023',
      // Constants stay constants, as in the build of the app.
      rolldownOptions: { output: { topLevelVar: false } },
      lib: {
        entry: fileURLToPath(new URL('inPage.ts', import.meta.url)),
        formats: ['iife'],
        name: 'bench',
      },
    },
  });
  const [result] = Array.isArray(built) ? built : [built];
  const script = 'output' in result ? result.output.find((file) => file.type === 'chunk') : undefined;
  if (script?.type !== 'chunk') throw new Error('bundled: Vite gave no script');
  return script.code;
}
