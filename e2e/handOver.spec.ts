import { readFile } from 'node:fs/promises';
import type { SheetForm, SheetOptions } from '../engine/index.ts';
import { sheetText, spacingTable } from '../engine/index.ts';
import { expect, test } from './support/app.ts';
import { linesIn, recorded } from './support/board.ts';
import { DEMO } from './support/engine.ts';
import { numberAt } from './support/hand.ts';

const IN_MM: SheetOptions = { datum: 'first part', digits: 3, unit: 'mm' };

/** The demo's spacing table as the engine writes it. */
function expected(form: SheetForm, options: SheetOptions = IN_MM): string {
  const table = spacingTable(DEMO, options);
  if (!table.ok) throw new Error('the demo cannot be built');
  return sheetText(table.value, form);
}

test.use({ permissions: ['clipboard-read', 'clipboard-write'] });

test('the spacing table is copied and downloaded as the engine computes it', async ({ app, page }) => {
  await app.open();
  await page.getByRole('button', { name: 'Hand over', exact: true }).click();
  const sheet = page.getByRole('dialog', { name: 'Hand over' });
  const copied = () => page.evaluate(() => navigator.clipboard.readText());

  const what = sheet.getByRole('region', { name: 'What comes of it' });
  for (const [name, f] of [
    ['wide', '25.748'],
    ['middle', '41.198'],
    ['narrow', '61.289'],
  ] as const) {
    const row = what.getByRole('row').filter({ has: page.getByRole('rowheader', { name, exact: true }) });
    await expect(row).toContainText(f);
  }
  const gaps = sheet.getByRole('region', { name: 'Gaps' });
  await expect(gaps.getByRole('row').filter({ hasText: 'middle' })).toContainText('26.272');

  await sheet.getByRole('button', { name: 'Copy as TSV, for pasting' }).click();
  await expect(sheet.getByText('The spacing table is copied.')).toBeVisible();
  expect(await copied()).toBe(expected('tsv'));
  await sheet.getByRole('button', { name: 'Copy as Markdown' }).click();
  await expect.poll(copied).toBe(expected('markdown'));

  await sheet.getByLabel('Distances from').selectOption('sensor');
  await sheet.getByLabel('Rounded to').selectOption('0.01 mm');
  await sheet.getByRole('radio', { name: 'in', exact: true }).click();
  await sheet.getByRole('button', { name: 'Copy as JSON' }).click();
  await expect.poll(copied).toBe(expected('json', { datum: 'sensor', digits: 2, unit: 'in' }));
  await sheet.getByLabel('Distances from').selectOption('first part');
  await sheet.getByLabel('Rounded to').selectOption('0.00001 in');
  await sheet.getByRole('radio', { name: 'mm', exact: true }).click();

  const [download] = await Promise.all([
    page.waitForEvent('download'),
    sheet.getByRole('button', { name: 'Download as CSV', exact: true }).click(),
  ]);
  expect(download.suggestedFilename()).toBe('seed-line-camera-spacing.csv');
  expect(await readFile(await download.path(), 'utf8')).toBe(`\uFEFF${expected('csv')}`);

  const [drawing] = await Promise.all([
    page.waitForEvent('download'),
    sheet.getByRole('button', { name: 'Download the drawing as SVG' }).click(),
  ]);
  const svg = await readFile(await drawing.path(), 'utf8');
  expect(svg).toContain('<title>Seed line camera</title>');
  expect(svg).toContain('41.219');

  const [picture] = await Promise.all([
    page.waitForEvent('download'),
    sheet.getByRole('button', { name: 'Download the drawing as PNG' }).click(),
  ]);
  expect((await readFile(await picture.path())).subarray(1, 4).toString()).toBe('PNG');
});

test('a gap that cannot be built is marked, listed and refused by the hand-over', async ({ app, page }) => {
  const sentence = /third group stands 3\.000 mm in front of second group: the gap must be 0 or more\./i;
  await app.open();
  expect(linesIn(await recorded(page), 'dimension bad')).toEqual([]);
  await app.hand.clickGrip('cell:gap:p2');
  await app.typeOnDrawing('-3');
  expect(await numberAt(page, 'cell:gap:p2')).toBeCloseTo(-3, 12);

  expect(linesIn(await recorded(page), 'dimension bad').length).toBeGreaterThan(0);
  await expect(app.panel.getByRole('button', { name: /^\d+ warnings?$/ })).toBeVisible();
  const warning = app.panel.getByRole('button', { name: sentence });
  await expect(warning).toContainText('cannot be built');
  await expect(warning).toContainText('at wide');
  await page.getByRole('button', { name: 'Go to narrow' }).click();
  await warning.click();
  await expect(page.getByRole('heading', { name: 'Wide position' })).toBeVisible();
  await expect(app.panel.getByRole('heading', { name: 'second group' })).toBeVisible();

  await page.getByRole('button', { name: 'Hand over', exact: true }).click();
  const sheet = page.getByRole('dialog', { name: 'Hand over' });
  await expect(sheet.getByRole('region', { name: 'Why nothing can be handed over' })).toContainText(sentence);
  await expect(sheet.getByRole('button', { name: 'Copy as TSV, for pasting' })).toBeDisabled();
  await expect(sheet.getByRole('button', { name: 'Download as CSV', exact: true })).toBeDisabled();
  await expect(sheet.getByRole('button', { name: 'Print' })).toBeDisabled();
  await sheet.getByRole('button', { name: 'Show it' }).first().click();
  await expect(sheet).toBeHidden();

  await page.getByRole('button', { name: 'Undo' }).click();
  await expect(app.panel.getByRole('button', { name: 'no warnings' })).toBeVisible();
  await page.getByRole('button', { name: 'Hand over', exact: true }).click();
  await expect(sheet.getByRole('button', { name: 'Copy as TSV, for pasting' })).toBeEnabled();
});
