import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { chromium } from '@playwright/test';
import { launchOptions } from './chromium.mjs';

/** Draws the PNG icons of `public/` from its one SVG, on paper. */
const ICONS = [
  { name: 'icon-180.png', sizePx: 180, marginShare: 0.08, bleeds: true },
  { name: 'icon-192.png', sizePx: 192, marginShare: 0, bleeds: false },
  { name: 'icon-512.png', sizePx: 512, marginShare: 0, bleeds: false },
  { name: 'icon-maskable-512.png', sizePx: 512, marginShare: 0.14, bleeds: true },
];
const PAPER = '#fbfaf6';

const publicFolder = fileURLToPath(new URL('../public/', import.meta.url));
const picture = Buffer.from(readFileSync(`${publicFolder}favicon.svg`)).toString('base64');

const browser = await chromium.launch(launchOptions());
const page = await browser.newPage({ colorScheme: 'light' });
for (const { name, sizePx, marginShare, bleeds } of ICONS) {
  await page.setViewportSize({ width: sizePx, height: sizePx });
  await page.setContent(
    `<body style="margin: 0; background: ${bleeds ? PAPER : 'transparent'}">
      <img alt="" src="data:image/svg+xml;base64,${picture}"
        style="display: block; box-sizing: border-box; width: 100vw; padding: ${100 * marginShare}vw">
    </body>`,
    { waitUntil: 'load' },
  );
  await page.screenshot({ path: `${publicFolder}${name}`, omitBackground: !bleeds });
  process.stdout.write(`public/${name}\n`);
}
await browser.close();
