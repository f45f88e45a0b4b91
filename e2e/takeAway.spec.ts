import { readFile } from 'node:fs/promises';
import { App, expect, test } from './support/app.ts';
import { sketchIn } from './support/engine.ts';
import { withoutPickers } from './support/files.ts';

test.use({ permissions: ['clipboard-read', 'clipboard-write'] });

test('a sketch is saved as a file and opened again, and a link carries it to another browser', async ({
  app,
  browser,
  page,
}) => {
  await withoutPickers(page);
  await app.open();
  await app.hand.clickGrip('cell:gap:p1');
  await app.typeOnDrawing('40.125');
  const f = (await app.readout('Focal length').textContent()) ?? '';

  const [download] = await Promise.all([
    page.waitForEvent('download'),
    page.getByRole('button', { name: 'Save', exact: true }).click(),
  ]);
  expect(download.suggestedFilename()).toBe('seed-line-camera.json');
  const path = await download.path();
  const kept = sketchIn(await readFile(path, 'utf8'));
  expect(kept.parts[0]?.space.lengthMm).toMatchObject({ wide: 40.125 });

  await page.getByRole('button', { name: 'Share', exact: true }).click();
  await expect(app.messages).toContainText('A link that carries the sketch is copied.');
  const link = await page.evaluate(() => navigator.clipboard.readText());

  await app.openEmpty();
  const [chooser] = await Promise.all([
    page.waitForEvent('filechooser'),
    page.getByRole('button', { name: 'Open', exact: true }).click(),
  ]);
  await chooser.setFiles(path);
  await expect(app.readout('Focal length')).toHaveText(f);

  const elsewhere = await browser.newContext();
  const other = await elsewhere.newPage();
  await other.goto(link);
  await expect(new App(other).readout('Focal length')).toHaveText(f);
  await elsewhere.close();
});

test('parts are copied from one sketch into another', async ({ app, page }) => {
  await app.open();
  await app.hand.clickGrip('part:p2');
  await page.keyboard.down('Shift');
  await app.hand.clickGrip('part:p3');
  await page.keyboard.up('Shift');
  await page.keyboard.press('ControlOrMeta+c');
  await expect(app.messages).toContainText('The 2 selected parts are copied.');
  await app.openEmpty();
  await app.board.focus();
  await page.keyboard.press('ControlOrMeta+v');
  await expect(page.locator('[data-grip^="part:"]')).toHaveCount(2);
  const [first] = await page.locator('[data-grip^="cell:gap"]').all();
  expect(Number(await first?.getAttribute('aria-valuenow'))).toBeCloseTo(16.5123679494863, 9);

  await page.keyboard.press('v');
  await expect(app.readout('Focal length')).toHaveText(
    `${((28 * -46) / (28 - 46 - 16.5123679494863)).toFixed(3)}mm`,
  );
});

test('the printed page holds title block, drawing and table, and nothing of the screen', async ({
  app,
  page,
}) => {
  await app.open();
  await page.getByRole('button', { name: 'Hand over', exact: true }).click();
  const sheet = page.getByRole('dialog', { name: 'Hand over' });
  await expect(sheet.getByRole('article')).toBeVisible();
  await page.emulateMedia({ media: 'print' });
  await expect(sheet.getByRole('img', { name: 'Drawing of Seed line camera' })).toBeVisible();
  await expect(sheet.getByText('What the numbers assume')).toBeVisible();
  await expect(sheet.getByRole('cell', { name: '41.219' }).first()).toBeVisible();
  await expect(sheet.getByRole('button', { name: 'Print' })).toBeHidden();
  await expect(app.panel).toBeHidden();
  await expect(page.getByRole('banner')).toBeHidden();
  const pdf = await page.pdf();
  expect(pdf.subarray(0, 4).toString()).toBe('%PDF');
});
