import { formatLength } from '../app/ui/format.ts';
import { type PartId, setGap } from '../engine/index.ts';
import { expect, test } from './support/app.ts';
import { analysisAt, DEMO } from './support/engine.ts';

/** The gap behind the third group at the middle position, set by hand to this. */
const GAP_MM = 32.5;

test('after a reload everything is as it was left', async ({ app, page }) => {
  const changed = setGap(DEMO, 'p3' as PartId, GAP_MM, DEMO.positions[1]!.id, 'carry');
  const { focalLengthMm } = analysisAt(changed, 1).firstOrder;
  const f = focalLengthMm.ok ? `${formatLength(focalLengthMm.value, 'in')}in` : '';
  await app.open();
  const theme = page.getByRole('button', { name: /^Change the theme/ });
  await theme.click();
  await theme.click();
  await expect(page.locator('html')).toHaveAttribute('data-theme', 'night');
  await page.getByRole('button', { name: 'Hand over', exact: true }).click();
  const sheet = page.getByRole('dialog', { name: 'Hand over' });
  await sheet.getByRole('radio', { name: 'in', exact: true }).click();
  await page.keyboard.press('Escape');
  await page.getByRole('tab', { name: 'Ledger' }).click();
  await page.getByRole('button', { name: 'Go to middle' }).click();
  await app.hand.clickGrip('part:p3');
  await app.type('Gap behind', `${GAP_MM} mm`);
  await expect(app.readout('Focal length')).toHaveText(f);
  await expect(app.saveMark).toHaveText('saved');

  await page.reload();
  await expect(page.locator('html')).toHaveAttribute('data-theme', 'night');
  await expect(page.getByRole('heading', { name: 'Middle position' })).toBeVisible();
  await expect(app.readout('Focal length')).toHaveText(f);
  await expect(app.panel.getByRole('heading', { name: 'third group' })).toBeVisible();
  await expect(page.getByRole('tab', { name: 'Ledger' })).toHaveAttribute('aria-selected', 'true');
  await expect(app.field('Gap behind')).toHaveValue(formatLength(GAP_MM, 'in'));
});

test('a sketch kept on the shelf is there again after another one was open', async ({ app, page }) => {
  await app.open();
  await app.hand.clickGrip('cell:gap:p1');
  await app.typeOnDrawing('40.5');
  const f = (await app.readout('Focal length').textContent()) ?? '';
  const shelf = await app.openShelf();
  await shelf.getByRole('textbox', { name: 'Name on the shelf' }).fill('Line A, shorter');
  await shelf.getByRole('button', { name: 'Keep on the shelf' }).click();
  await expect(shelf.getByText('“Line A, shorter” is on the shelf.')).toBeVisible();

  await shelf.getByRole('button', { name: 'Chute scanner expander' }).click();
  await expect(shelf).toBeHidden();
  await expect(app.strip('angular')).toBeVisible();
  await expect(app.panel.getByText('afocal').first()).toBeVisible();

  await app.openShelf();
  await shelf.getByRole('button', { name: 'Line A, shorter', exact: true }).click();
  await expect(app.readout('Focal length')).toHaveText(f);

  // Every starting sketch opens, and nothing is said to be wrong with it.
  for (const title of [
    'Sorting-chute relay',
    'Colour check camera',
    'Germination macro',
    'Seed line camera',
  ]) {
    await app.openShelf();
    await shelf.getByRole('button', { name: title, exact: true }).click();
    await expect(page.getByTitle(`${title}: sketches on the shelf`)).toBeVisible();
    await expect(app.panel.getByText('✗ cannot be built')).toHaveCount(0);
  }
});
