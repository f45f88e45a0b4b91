import AxeBuilder from '@axe-core/playwright';
import type { Locator, Page } from '@playwright/test';
import cases from '../test/reference/cases.json' with { type: 'json' };
import { type App, expect, test } from './support/app.ts';
import { drawn } from './support/hand.ts';

/** The chooser of a material field, opened by its button. */
async function openChooser(app: App, label: string): Promise<Locator> {
  await materialButton(app, label).click();
  const chooser = app.page.getByRole('dialog', { name: label });
  await expect(chooser.getByRole('listbox')).toBeFocused();
  return chooser;
}

const materialButton = (app: App, label: string): Locator =>
  app.panel.getByRole('button', { name: new RegExp(`^${label} `) });

/** Where a glass stands on the map. */
async function placeOf(chooser: Locator, name: string) {
  const box = await chooser.getByRole('option', { name: new RegExp(`^${name},`) }).boundingBox();
  if (!box) throw new Error(`no ${name} on the map`);
  return { x: box.x + box.width / 2, y: box.y + box.height / 2 };
}

/** A lone singlet in an empty sketch, selected. */
async function openSinglet(app: App): Promise<void> {
  await app.openEmpty();
  await app.page.getByRole('region', { name: 'Drawing and ribbon' }).focus();
  await app.page.keyboard.press('g');
  await app.page.locator('[data-grip^="part:"]').first().waitFor({ state: 'attached' });
}

/** The step of history back. */
const undo = (page: Page) => page.getByRole('banner').getByRole('button', { name: /^Undo/ });

test('glass is changed on the map: the drawing follows the pointer, Escape gives back, a click takes', async ({
  app,
  page,
}) => {
  await openSinglet(app);
  const before = await app.readout('Focal length').textContent();
  const chooser = await openChooser(app, 'Material');

  const flint = await placeOf(chooser, 'N-SF11');
  await page.mouse.move(flint.x - 2, flint.y + 2, { steps: 4 });
  await drawn(page);
  await expect(chooser).toContainText('nd 1.78472, Vd 25.68');
  await expect(chooser).toContainText('flint, 370 to 2500 nm');
  const during = await app.readout('Focal length').textContent();
  expect(during).not.toBe(before);

  await page.keyboard.press('Escape');
  await expect(chooser).toBeHidden();
  await expect(app.readout('Focal length')).toHaveText(before ?? '');
  await expect(materialButton(app, 'Material')).toBeFocused();

  await openChooser(app, 'Material');
  await page.mouse.click(flint.x, flint.y);
  await expect(chooser).toBeHidden();
  await expect(app.readout('Focal length')).toHaveText(during ?? '');
  await expect(materialButton(app, 'Material')).toContainText('N-SF11');

  await undo(page).click();
  await expect(materialButton(app, 'Material')).toContainText('N-BK7');
  await expect(app.readout('Focal length')).toHaveText(before ?? '');
});

test('glass is changed by the keyboard alone: arrows step to neighbours, letters filter', async ({
  app,
  page,
}) => {
  await openSinglet(app);
  const before = await app.readout('Focal length').textContent();
  const button = materialButton(app, 'Material');
  await button.focus();
  await page.keyboard.press('Enter');
  const chooser = page.getByRole('dialog', { name: 'Material' });
  const map = chooser.getByRole('listbox');
  await expect(map).toBeFocused();
  await expect(chooser.getByRole('option', { name: /^N-BK7,/, selected: true })).toHaveCount(1);

  await page.keyboard.press('ArrowUp');
  await expect(chooser.getByRole('option', { name: /^N-BK7,/, selected: true })).toHaveCount(0);
  await expect(chooser.getByRole('option', { selected: true })).toHaveCount(1);
  await drawn(page);
  await expect(app.readout('Focal length')).not.toHaveText(before ?? '');

  await page.keyboard.type('sf57');
  await expect(chooser.getByRole('option', { name: /^N-SF57,/, selected: true })).toHaveCount(1);
  await page.keyboard.press('Enter');
  await expect(chooser).toBeHidden();
  await expect(button).toBeFocused();
  await expect(button).toContainText('N-SF57');
});

test('a medium comes by code, by index, and by a formula, each with what is wrong in words', async ({
  app,
  page,
}) => {
  await openSinglet(app);
  const button = materialButton(app, 'Material');
  let chooser = await openChooser(app, 'Material');
  await chooser.getByRole('radio', { name: 'Code' }).check({ force: true });
  await chooser.getByLabel('Six-digit code').fill('62036');
  await expect(chooser.getByRole('status')).toContainText('it must be six digits');
  await chooser.getByLabel('Six-digit code').fill('620364');
  await expect(chooser).toContainText('nd 1.62000, Vd 36.40');
  await page.keyboard.press('Enter');
  await expect(button).toContainText('620364');

  chooser = page.getByRole('dialog', { name: 'Material' });
  await button.click();
  await chooser.getByRole('radio', { name: 'Index' }).check({ force: true });
  await chooser.getByLabel('Index', { exact: true }).last().fill('0,9');
  await expect(chooser.getByRole('status')).toContainText('must be between 1 and 5');
  await chooser.getByLabel('Index', { exact: true }).last().fill('1,7');
  await chooser.getByLabel('Abbe number', { exact: true }).fill('50');
  await page.keyboard.press('Enter');
  await expect(button).toContainText('n 1.7000');

  await button.click();
  await chooser.getByRole('radio', { name: 'Formula' }).check({ force: true });
  await chooser.getByLabel('Formula', { exact: true }).last().selectOption('cauchy');
  await chooser.getByLabel('Coefficients in their order, λ in µm').fill('1.5 0.004 -2');
  await chooser.getByLabel('Holds from').fill('600');
  await expect(chooser.getByRole('status')).toContainText('must be between 600 and 700 nm');
  await chooser.getByLabel('Holds from').fill('400');
  await chooser.getByRole('button', { name: 'Choose' }).click();
  await expect(button).toContainText('own');
});

test('the chooser and the sheet for tables have nothing that axe finds', async ({ app, page }) => {
  await openSinglet(app);
  await openChooser(app, 'Material');
  expect((await new AxeBuilder({ page }).analyze()).violations).toEqual([]);
  await page.keyboard.press('Escape');
  await openPrescription(app, '50 5 N-BK7\nx 40 air');
  expect((await new AxeBuilder({ page }).analyze()).violations).toEqual([]);
});

/** Copies a table elsewhere and pastes it on the drawing; gives the sheet that opens. */
async function openPrescription(app: App, text: string): Promise<Locator> {
  const { page } = app;
  await page.context().grantPermissions(['clipboard-read', 'clipboard-write']);
  await page.evaluate((table) => navigator.clipboard.writeText(table), text);
  await app.board.focus();
  await page.keyboard.press('Control+v');
  const sheet = page.getByRole('dialog', { name: 'Paste a prescription' });
  await expect(sheet).toBeVisible();
  return sheet;
}

test('the prescription of a patent is pasted, corrected and read: US 3,961,844 has a focal length of 23.5', async ({
  app,
  page,
}) => {
  const patent = cases.find(({ id }) => id === 'patent-us3961844') as unknown as {
    readonly input: {
      readonly prescription: {
        readonly surfaces: readonly { radius: number | null; thickness: number; index: number }[];
      };
    };
    readonly expected: { readonly focalLength: { readonly value: number; readonly tolerance: number } };
  };
  const rows = patent.input.prescription.surfaces.map(
    ({ radius, thickness, index }) => `${radius ?? '∞'}\t${thickness}\t${index}`,
  );
  await app.openEmpty();
  const sheet = await openPrescription(
    app,
    ['radius\tthickness\tindex', ...rows].join('\n').replace('27.597', '27.597x'),
  );
  await expect(sheet.getByRole('listitem')).toHaveText([/^Line 6: “27\.597x” is no radius/]);
  await expect(sheet.getByRole('button', { name: 'Insert' })).toBeDisabled();

  const text = sheet.getByRole('textbox');
  await text.fill((await text.inputValue()).replace('27.597x', '27.597'));
  await expect(sheet.getByRole('columnheader', { name: 'surface 8' })).toBeVisible();
  await sheet.getByRole('button', { name: 'Insert 4 glass parts' }).click();
  await expect(sheet).toBeHidden();
  await drawn(page);

  const shown = Number.parseFloat((await app.readout('Focal length').textContent()) ?? '');
  const { value, tolerance } = patent.expected.focalLength;
  expect(Math.abs(shown - value)).toBeLessThanOrEqual(tolerance);
  await expect(app.readout('Back focus')).toContainText('0.710');

  await undo(page).click();
  await expect(page.locator('[data-grip^="part:"]')).toHaveCount(0);
});
