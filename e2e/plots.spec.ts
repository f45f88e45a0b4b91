import { AxeBuilder } from '@axe-core/playwright';
import type { Page } from '@playwright/test';
import type { App } from './support/app.ts';
import { expect, test } from './support/app.ts';
import { linesIn, recorded } from './support/board.ts';
import { withoutPickers } from './support/files.ts';
import { glassPairText } from './support/glassSketch.ts';
import { drawn } from './support/hand.ts';

test.use({ permissions: ['clipboard-read', 'clipboard-write'] });

/** Opens two glass lenses at two positions as a file. */
async function openGlass(app: App, page: Page): Promise<void> {
  await withoutPickers(page);
  await app.open();
  const shelf = await app.openShelf();
  const [chooser] = await Promise.all([
    page.waitForEvent('filechooser'),
    shelf.getByRole('button', { name: 'Open a file…' }).click(),
  ]);
  await chooser.setFiles({
    name: 'pair.json',
    mimeType: 'application/json',
    buffer: Buffer.from(glassPairText()),
  });
  await expect(page.getByTitle(/sketches on the shelf$/)).toContainText('Glass pair');
}

const openTab = async (page: Page, name: string) => {
  await page.getByRole('tab', { name, exact: true }).click();
  await expect(page.getByRole('region', { name, exact: true })).toBeVisible();
};
const plot = (page: Page, name: string) => page.getByRole('slider', { name, exact: true });
const reading = (page: Page, name: string) => plot(page, name).getAttribute('aria-valuetext');
const copied = (page: Page) => page.evaluate(() => navigator.clipboard.readText());

/** The number behind a name in a reading, as in "main 587.6 nm −1.23 µm". */
const valueIn = (text: string | null, name: string): number =>
  Number((new RegExp(`${name} (−?[0-9.]+)`).exec(text ?? '')?.[1] ?? 'x').replace('−', '-'));

/** The table that was copied: rows of cells. */
const rowsOf = (csv: string): readonly (readonly string[])[] =>
  csv
    .trimEnd()
    .split('\r\n')
    .map((line) => line.split(/,(?=(?:[^"]*"[^"]*")*[^"]*$)/));

const TABS: Readonly<Record<string, readonly string[]>> = {
  Fans: ['Tangential, axis', 'Sagittal, full field'],
  Wavefront: ['Tangential, axis', 'Sagittal, full field'],
  Spots: ['Spot, axis', 'Spot, full field'],
  Field: ['Field curves', 'Distortion', 'Relative illumination'],
  Contrast: ['At Nyquist, 100.0 line pairs per mm', 'At half Nyquist, 50.0 line pairs per mm'],
  Colour: ['Longitudinal error', 'Axial colour', 'Lateral colour'],
  Sums: ['Spherical aberration'],
};

test('every tab shows its plots with what they say in words, and axe finds nothing', async ({
  app,
  page,
}) => {
  await openGlass(app, page);
  for (const [tab, names] of Object.entries(TABS)) {
    await openTab(page, tab);
    for (const name of names) {
      await expect(plot(page, name)).toBeVisible();
      expect(await reading(page, name), name).toMatch(/[0-9]/);
      expect(await reading(page, name), name).not.toMatch(/NaN|undefined|–/);
    }
    const axe = new AxeBuilder({ page }).setLegacyMode().include('[role=tabpanel]');
    const { violations } = await axe.analyze();
    expect(violations.map(({ id, help }) => `${tab}: ${id}, ${help}`)).toEqual([]);
  }
});

test('a fan is read by pointer and by keys, and what is read is what is copied', async ({ app, page }) => {
  await openGlass(app, page);
  await openTab(page, 'Fans');
  const name = 'Tangential, full field';
  const box = await plot(page, name).boundingBox();
  if (!box) throw new Error('no plot');
  await page.mouse.move(box.x + box.width - 12, box.y + box.height / 2);
  await expect.poll(() => reading(page, name)).toMatch(/^1\.00 share of the stop, main 587\.6 nm .* µm/);
  const atRim = valueIn(await reading(page, name), 'main 587.6 nm');
  expect(Math.abs(atRim)).toBeGreaterThan(0.5);
  await page.mouse.move(10, 10);
  await expect.poll(() => reading(page, name)).toContain(' from ');

  await plot(page, name).focus();
  await page.keyboard.press('End');
  await page.keyboard.press('End');
  expect(valueIn(await reading(page, name), 'main 587.6 nm')).toBe(atRim);
  await page.keyboard.press('ArrowLeft');
  expect(await reading(page, name)).not.toMatch(/^1\.00/);
  await page.keyboard.press('Home');
  expect(await reading(page, name)).toMatch(/^−1\.00/);
  await page.keyboard.press('Escape');
  expect(await reading(page, name)).toContain(' from ');

  await page.getByRole('button', { name: 'Copy CSV' }).click();
  await expect(app.messages).toContainText('copied');
  const rows = rowsOf(await copied(page));
  expect(rows[0]).toEqual(['position', 'plot', 'curve', 'across', 'value', 'across is', 'value is']);
  const last = rows.filter(([, one, curve]) => one === `"${name}"` && curve?.startsWith('main')).at(-1);
  expect(last?.[3]).toBe('1');
  expect(Number(last?.[4])).toBeCloseTo(atRim, 2);

  await page.getByRole('button', { name: 'Copy SVG' }).click();
  await expect.poll(() => copied(page)).toMatch(/^<\?xml/);
  expect(await copied(page)).toContain(name);
});

test('plots follow a drag while it lasts, and a kept reference stays behind', async ({ app, page }) => {
  await openGlass(app, page);
  await openTab(page, 'Fans');
  const name = 'Tangential, axis';
  const before = await reading(page, name);
  await page.getByRole('button', { name: 'Keep as reference' }).click();
  const drop = page.getByRole('button', { name: 'Drop the reference' });
  await expect(drop).toBeVisible();
  await expect(page.getByRole('img', { name: /^Legend: .*reference$/ })).toBeVisible();

  await app.hand.pressGrip('part:p2');
  const seen = new Set<string | null>();
  await app.hand.move({ dx: 40, steps: 6 }, async () => {
    seen.add(await reading(page, name));
  });
  expect(seen.size).toBeGreaterThan(3);
  await app.hand.release();
  await expect.poll(() => reading(page, name)).not.toBe(before);
  await page.keyboard.press('Control+z');
  await expect.poll(() => reading(page, name)).toBe(before);
  await drop.click();
  await expect(drop).toBeHidden();
});

test('spots say how large they are, alone and strung along the axis', async ({ app, page }) => {
  await openGlass(app, page);
  await openTab(page, 'Spots');
  expect(await reading(page, 'Spot, axis')).toMatch(/^rms [0-9.]+ µm; largest [0-9.]+ µm; Airy [0-9.]+ µm/);
  const rms = valueIn(await reading(page, 'Spot, axis'), 'rms');
  await page.getByRole('radio', { name: 'through focus' }).check({ force: true });
  await expect.poll(() => reading(page, 'Spot, axis')).toMatch(/^least rms [0-9.]+ µm at −?[0-9.]+ mm/);
  expect(valueIn(await reading(page, 'Spot, axis'), 'least rms')).toBeLessThanOrEqual(rms);
  await plot(page, 'Spot, axis').focus();
  await page.keyboard.press('ArrowRight');
  expect(await reading(page, 'Spot, axis')).toMatch(/^0\.000 mm behind the image plane, rms/);
  // Coarse and fine samples of one spot differ in the last digits.
  await expect
    .poll(async () => Math.abs(valueIn(await reading(page, 'Spot, axis'), 'rms') / rms - 1))
    .toBeLessThan(0.02);
});

test('a stem lights up its surface on the drawing, and Enter selects its part', async ({ app, page }) => {
  await openGlass(app, page);
  await openTab(page, 'Sums');
  const glow = async () => linesIn(await recorded(page), 'glow');
  expect(await glow()).toHaveLength(0);
  const name = 'Spherical aberration';
  await plot(page, name).focus();
  await page.keyboard.press('ArrowRight');
  await page.keyboard.press('End');
  expect(await reading(page, name)).toMatch(/^glass 2, surface 2, adds −?[0-9.]+ µm, sum so far/);
  await drawn(page);
  expect(await glow()).toHaveLength(1);
  await page.keyboard.press('Enter');
  await expect(app.panel.getByRole('heading', { name: 'glass 2' })).toBeVisible();

  await page.getByRole('combobox', { name: 'Sum' }).selectOption('axial colour');
  await expect.poll(() => reading(page, 'Axial colour')).toMatch(/^in all −?[0-9.]+ µm; most from glass/);
  await openTab(page, 'Fans');
  await drawn(page);
  expect(await glow()).toHaveLength(0);
});

test('all positions stand one under the other, and thin parts say what they lack', async ({ app, page }) => {
  await openGlass(app, page);
  await openTab(page, 'Field');
  await page.getByRole('checkbox', { name: 'All positions' }).check();
  await expect(plot(page, 'Distortion')).toHaveCount(2);
  for (const position of ['near', 'far'])
    await expect(page.getByRole('heading', { name: position, exact: true, level: 3 })).toBeAttached();
  await page.getByRole('checkbox', { name: 'All positions' }).uncheck();
  await expect(plot(page, 'Distortion')).toHaveCount(1);

  await app.openShelf();
  await page.getByRole('button', { name: 'Seed line camera' }).first().click();
  await openTab(page, 'Wavefront');
  await expect(page.getByRole('note', { name: /^Sagittal: Thin parts have no optical path/ })).toBeVisible();
  await expect(plot(page, 'Tangential, axis')).toBeVisible();
});

test.describe('on a phone', () => {
  test.use({ viewport: { width: 390, height: 844 }, hasTouch: true, isMobile: true });

  test('plots rise from below, are read by touch, and the drawing stays in view', async ({ app, page }) => {
    await openGlass(app, page);
    await page.getByRole('navigation', { name: 'Panels' }).getByRole('button', { name: 'Plots' }).click();
    const sheet = page.getByRole('dialog', { name: 'Plots and tables' });
    await expect(sheet.getByRole('tab', { name: 'Fans' })).toHaveAttribute('aria-selected', 'true');
    const name = 'Tangential, axis';
    const box = await plot(page, name).boundingBox();
    if (!box) throw new Error('no plot');
    await page.touchscreen.tap(box.x + box.width - 14, box.y + box.height / 3);
    await expect.poll(() => reading(page, name)).toMatch(/^(1\.00|0\.9[05]) share of the stop/);
    await expect(app.board).toBeInViewport({ ratio: 0.3 });
    await sheet.getByRole('tab', { name: 'Sums' }).click();
    await expect(plot(page, 'Spherical aberration')).toBeVisible();
  });
});
