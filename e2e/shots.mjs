import { mkdirSync, rmSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { parseArgs } from 'node:util';
import { chromium } from '@playwright/test';
import { serve } from '../app/serve.mjs';
import { launchOptions } from './chromium.mjs';

/**
 * @typedef {import('@playwright/test').Page} Page
 * @typedef {'desk' | 'phone'} SizeName
 * @typedef {{
 *   readonly name: string,
 *   readonly on?: SizeName,
 *   readonly steps: (page: Page, size: SizeName) => Promise<void>,
 * }} Screen a name for the file, the size it exists on when it is but one, and what a hand does to get there from the
 *   opened page with the demo
 */

const PLOTS = ['Fans', 'Wavefront', 'Spots', 'Field', 'Contrast', 'Colour', 'Sums'];
const IN_GLASS = 'Chute relay in glass';

/** @type {readonly Screen[]} */
const SCREENS = [
  { name: 'first', steps: async () => {} },
  { name: 'middle', steps: goToMiddle },
  { name: 'part', steps: selectSecond },
  { name: 'ledger', on: 'desk', steps: (page) => openDrawer(page, 'Ledger') },
  { name: 'trace', on: 'desk', steps: (page) => openDrawer(page, 'Trace sheet') },
  { name: 'table', on: 'desk', steps: (page) => openDrawer(page, 'Spacing table') },
  { name: 'hand-over', steps: (page) => pressButton(page, 'Hand over') },
  { name: 'shelf', steps: openShelf },
  { name: 'help', steps: (page) => pressButton(page, 'Help') },
  { name: 'empty', steps: (page) => beginWith(page, 'New empty sketch') },
  { name: 'afocal', steps: (page) => beginWith(page, 'Chute scanner expander') },
  { name: 'warnings', steps: makeImpossible },
  { name: 'glass', steps: selectGlass },
  { name: 'glass-map', on: 'desk', steps: openGlassMap },
  { name: 'loupe', on: 'desk', steps: openLoupe },
  { name: 'thicken', on: 'desk', steps: openThicken },
  ...PLOTS.map((plot) => ({
    name: `plot-${plot.toLowerCase()}`,
    on: /** @type {const} */ ('desk'),
    steps: (/** @type {Page} */ page) => openPlot(page, plot),
  })),
  { name: 'readouts-sheet', on: 'phone', steps: (page) => openPanel(page, 'Readouts') },
  { name: 'part-sheet', on: 'phone', steps: openPart },
  { name: 'sketch-sheet', on: 'phone', steps: (page) => openPanel(page, 'Sketch') },
];

/** The picture in the README, kept in the repository. */
const README_PICTURE = { screen: 'middle', theme: 'paper', size: 'desk', file: 'pictures/readme.png' };

/** @type {readonly { readonly name: string, readonly colorScheme: 'light' | 'dark' }[]} */
const THEMES = [
  { name: 'paper', colorScheme: 'light' },
  { name: 'night', colorScheme: 'dark' },
];

/** @type {readonly { readonly name: SizeName, readonly viewport: { width: number, height: number }, hasTouch?: true, isMobile?: true }[]} */
const SIZES = [
  { name: 'desk', viewport: { width: 1440, height: 900 } },
  { name: 'phone', viewport: { width: 390, height: 844 }, hasTouch: true, isMobile: true },
];

const { positionals: only, values } = parseArgs({
  allowPositionals: true,
  options: {
    scale: { type: 'string', default: '1' },
    readme: { type: 'boolean', default: false },
    url: { type: 'string' },
  },
});
const unknown = only.filter((name) => SCREENS.every((screen) => screen.name !== name));
if (unknown.length > 0) throw new Error(`shots: there is no screen ${unknown.join(', ')}`);

const folder = new URL('../shots/', import.meta.url);
if (!values.readme) {
  rmSync(folder, { recursive: true, force: true });
  mkdirSync(folder);
}
const served = values.url === undefined ? await serve() : { url: values.url, close: async () => {} };
const browser = await chromium.launch(launchOptions());
for (const screen of SCREENS) {
  for (const theme of THEMES) {
    for (const size of SIZES) {
      const file = fileOf(screen, theme.name, size.name);
      if (file !== null) await shoot(screen, theme, size, file);
    }
  }
}
await browser.close();
await served.close();

/**
 * @param {Screen} screen
 * @param {string} theme
 * @param {SizeName} size
 * @returns {URL | null} where the picture goes, or null when it is not wanted
 */
function fileOf(screen, theme, size) {
  if (values.readme) {
    const wanted = README_PICTURE;
    const isIt = screen.name === wanted.screen && theme === wanted.theme && size === wanted.size;
    return isIt ? new URL(wanted.file, import.meta.url) : null;
  }
  if (screen.on !== undefined && screen.on !== size) return null;
  if (only.length > 0 && !only.includes(screen.name)) return null;
  return new URL(`${screen.name}-${theme}-${size}.png`, folder);
}

/**
 * @param {Screen} screen
 * @param {typeof THEMES[number]} theme
 * @param {typeof SIZES[number]} size
 * @param {URL} file
 */
async function shoot(screen, { colorScheme }, { name: size, ...device }, file) {
  const context = await browser.newContext({
    ...device,
    colorScheme,
    deviceScaleFactor: Number(values.scale),
  });
  const page = await context.newPage();
  await page.goto(served.url);
  await page.evaluate(() => document.fonts.ready);
  await grip(page, 'part:p2').waitFor({ state: 'attached' });
  await screen.steps(page, size);
  await page.screenshot({ path: fileURLToPath(file), animations: 'disabled' });
  process.stdout.write(`${fileURLToPath(file)}\n`);
  await context.close();
}

/**
 * @param {Page} page
 * @param {string} id
 */
function grip(page, id) {
  return page.locator(`[role=slider][data-grip="${id}"]`);
}

/**
 * Clicks a grip where it stands, `besideY` px above (−) or below its middle.
 * @param {Page} page
 * @param {string} id
 * @param {number} [besideY]
 */
async function clickGrip(page, id, besideY = 0) {
  const box = await grip(page, id).boundingBox();
  if (box === null) throw new Error(`shots: the grip ${id} is not on the page`);
  await page.mouse.click(box.x + box.width / 2, box.y + box.height / 2 + besideY);
}

/**
 * @param {Page} page
 * @param {string} name
 */
async function pressButton(page, name) {
  await page.getByRole('button', { name, exact: true }).click();
}

/** @param {Page} page */
async function dismissHints(page) {
  const hints = page.getByRole('button', { name: /^Dismiss the hint/ });
  while ((await hints.count()) > 0) {
    const hint = page.getByLabel((await hints.first().getAttribute('aria-label')) ?? '', { exact: true });
    await hint.click();
    await hint.waitFor({ state: 'detached' });
  }
}

/** @param {Page} page */
async function goToMiddle(page) {
  await dismissHints(page);
  await page.getByRole('button', { name: /^Go to middle/ }).click();
  await page.mouse.move(0, 0);
}

/** @param {Page} page */
async function selectSecond(page) {
  await dismissHints(page);
  await clickGrip(page, 'part:p2', 40);
  await page.mouse.move(0, 0);
}

/**
 * @param {Page} page
 * @param {string} name
 */
async function openDrawer(page, name) {
  await dismissHints(page);
  await page.getByRole('tab', { name }).click();
}

/** @param {Page} page */
async function openShelf(page) {
  await page.getByTitle(/sketches on the shelf$/).click();
  await page.getByRole('button', { name: 'Chute scanner expander' }).waitFor();
}

/**
 * @param {Page} page
 * @param {string} name of the sketch, or of the button for an empty one
 */
async function beginWith(page, name) {
  await dismissHints(page);
  await openShelf(page);
  await pressButton(page, name);
  await page.getByRole('dialog').waitFor({ state: 'detached' });
}

/**
 * The second group 5 mm in front of the first.
 * @param {Page} page
 * @param {SizeName} size
 */
async function makeImpossible(page, size) {
  await dismissHints(page);
  await clickGrip(page, 'cell:gap:p1');
  const entry = page.locator('.type-box input');
  await entry.fill('−5');
  await entry.press('Enter');
  await entry.waitFor({ state: 'detached' });
  if (size === 'phone') await openPanel(page, 'Warnings');
  else await page.getByRole('button', { name: /^\d+ warnings?$/ }).click();
}

/** @param {Page} page */
async function selectGlass(page) {
  await beginWith(page, IN_GLASS);
  await clickGrip(page, 'part:p1', 60);
  await page.mouse.move(0, 0);
}

/** @param {Page} page */
async function openGlassMap(page) {
  await selectGlass(page);
  await page.getByRole('button', { name: /^Behind surface 1/ }).click();
  await page.getByRole('dialog').waitFor();
}

/** @param {Page} page */
async function openThicken(page) {
  await selectSecond(page);
  await page.getByRole('button', { name: /^Thicken/ }).click();
}

/** @param {Page} page */
async function openLoupe(page) {
  await beginWith(page, IN_GLASS);
  await page.getByRole('button', { name: /^Loupe/ }).click();
  await page.getByRole('checkbox', { name: 'Loupe on the drawing' }).check();
}

/**
 * @param {Page} page
 * @param {string} plot
 */
async function openPlot(page, plot) {
  await beginWith(page, IN_GLASS);
  await page.getByRole('tab', { name: plot, exact: true }).click();
  await page.locator('.plots').waitFor();
}

/** @param {Page} page */
async function openPart(page) {
  await selectSecond(page);
  await openPanel(page, 'Part');
}

/**
 * @param {Page} page
 * @param {string} name
 */
async function openPanel(page, name) {
  await dismissHints(page);
  await page.getByRole('navigation', { name: 'Panels' }).getByRole('button', { name, exact: true }).click();
}
