import { mkdirSync, rmSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { parseArgs } from 'node:util';
import { chromium } from '@playwright/test';
import { serve } from '../app/serve.mjs';
import { launchOptions } from './chromium.mjs';

/**
 * The main screens: a name for the file, and what a hand does from the opened page to get there.
 * @type {readonly { readonly name: string, readonly steps: (page: import('@playwright/test').Page) => Promise<void> }[]}
 */
const SCREENS = [{ name: 'first', steps: async () => {} }];

/** @type {readonly { readonly name: string, readonly colorScheme: 'light' | 'dark' }[]} */
const THEMES = [
  { name: 'paper', colorScheme: 'light' },
  { name: 'night', colorScheme: 'dark' },
];

const SIZES = [
  { name: 'desk', viewport: { width: 1440, height: 900 } },
  { name: 'phone', viewport: { width: 390, height: 844 }, hasTouch: true, isMobile: true },
];

const folder = fileURLToPath(new URL('../shots/', import.meta.url));
const { positionals: only, values } = parseArgs({
  allowPositionals: true,
  options: { scale: { type: 'string', default: '1' } },
});
const screens = SCREENS.filter(({ name }) => only.length === 0 || only.includes(name));

rmSync(folder, { recursive: true, force: true });
mkdirSync(folder);
const { url, close } = await serve();
const browser = await chromium.launch(launchOptions());
for (const screen of screens) {
  for (const { name: theme, colorScheme } of THEMES) {
    for (const { name: size, ...device } of SIZES) {
      const context = await browser.newContext({
        ...device,
        colorScheme,
        deviceScaleFactor: Number(values.scale),
      });
      const page = await context.newPage();
      await page.goto(url);
      await page.evaluate(() => document.fonts.ready);
      await screen.steps(page);
      const file = `${screen.name}-${theme}-${size}.png`;
      await page.screenshot({ path: `${folder}${file}`, animations: 'disabled' });
      process.stdout.write(`shots/${file}\n`);
      await context.close();
    }
  }
}
await browser.close();
await close();
