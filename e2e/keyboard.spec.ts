import type { Locator, Page } from '@playwright/test';
import { type App, expect, test } from './support/app.ts';
import { drawn, grip, numberAt } from './support/hand.ts';

/** More tab stops than this between two places would be a fault of its own. */
const MOST_STOPS = 60;

async function tabTo(page: Page, target: Locator, key: 'Tab' | 'Shift+Tab' = 'Tab'): Promise<void> {
  for (let stops = 0; stops < MOST_STOPS; stops++) {
    if (await target.evaluateAll((found) => found.includes(document.activeElement as never))) return;
    await page.keyboard.press(key);
  }
  throw new Error(`tabTo: ${target} is not within ${MOST_STOPS} tab stops`);
}

/** The entry on the drawing has the focus as soon as it opens. */
async function typeHere(page: Page, value: string): Promise<void> {
  await expect(page.locator('.type-box input')).toBeFocused();
  await page.keyboard.press('ControlOrMeta+a');
  await page.keyboard.type(value);
  await page.keyboard.press('Enter');
  await expect(page.locator('.type-box')).toHaveCount(0);
}

test.use({ permissions: ['clipboard-read', 'clipboard-write'] });

test('a layout is made, changed and taken away by the keyboard alone', async ({ app, page }) => {
  await app.open();
  await tabTo(page, page.getByTitle(/sketches on the shelf$/));
  await page.keyboard.press('Enter');
  await tabTo(page, page.getByRole('button', { name: 'New empty sketch' }));
  await page.keyboard.press('Enter');
  await expect(app.panel.getByText('nothing on the axis yet', { exact: true })).toBeVisible();

  await tabTo(page, app.board);
  await page.keyboard.press('p');
  await typeHere(page, '28');
  await page.keyboard.press('n');
  await typeHere(page, '-46');
  await page.keyboard.press('l');
  await expect(page.locator('[data-grip^="part:"]')).toHaveCount(3);
  await expect(app.panel.getByRole('heading', { name: 'plate 3' })).toBeVisible();

  // Back to the second element; the arrow keys move it between its neighbours.
  await page.keyboard.press(',');
  await expect(app.panel.getByRole('heading', { name: 'element 2' })).toBeVisible();
  await expect(grip(page, 'part:p2')).toBeFocused();
  const place = await numberAt(page, 'part:p2');
  const moved = async (...keys: readonly string[]) => {
    for (const key of keys) await page.keyboard.press(key);
    await drawn(page);
    return (await numberAt(page, 'part:p2')) - place;
  };
  const step = await moved('ArrowRight');
  expect(
    [1, 0.1, 0.01].some((size) => Math.abs(step - size) < 1e-9),
    `a step of ${step}`,
  ).toBe(true);
  expect(await moved('PageUp')).toBeCloseTo(11 * step, 9);
  expect(await moved('PageDown', 'ArrowLeft')).toBeCloseTo(0, 9);

  await page.keyboard.press('.');
  await expect(app.panel.getByRole('heading', { name: 'plate 3' })).toBeVisible();
  await page.keyboard.press('Delete');
  await expect(page.locator('[data-grip^="part:"]')).toHaveCount(2);

  // A dimension of the ribbon: Enter opens it, Enter takes it.
  await tabTo(page, grip(page, 'cell:gap:p1'));
  await page.keyboard.press('Enter');
  await typeHere(page, '20+1/4');
  await expect(grip(page, 'cell:gap:p1')).toBeFocused();
  await expect(grip(page, 'cell:gap:p1')).toHaveAttribute('aria-valuenow', '20.25');
  // 1/f = 1/28 − 1/46 + 20.25/(28 · 46)
  await expect(app.readout('Focal length')).toHaveText(`${((28 * 46) / (46 - 28 + 20.25)).toFixed(3)}mm`);

  await expect(page.locator('[aria-live="polite"]#voice')).toHaveText(
    /: 20\.250 mm.*\. Focal length 33\.673 mm$/,
  );

  await page.keyboard.press('?');
  const help = page.getByRole('dialog', { name: 'Help' });
  await expect(help.getByRole('rowheader', { name: 'Delete the selected parts' })).toBeVisible();
  await page.keyboard.press('Escape');
  await expect(help).toBeHidden();
  await page.keyboard.press('Control+z');
  await expect(app.readout('Focal length')).not.toHaveText('33.673mm');
  await page.keyboard.press('Control+Shift+z');

  await copyTable(app);
  const table = await page.evaluate(() => navigator.clipboard.readText());
  expect(table).toContain('20.250');
  expect(table.split('\n')[0]).toContain('\t');
});

async function copyTable({ page, messages: _messages }: App): Promise<void> {
  await tabTo(page, page.getByRole('button', { name: 'Hand over', exact: true }), 'Shift+Tab');
  await page.keyboard.press('Enter');
  const sheet = page.getByRole('dialog', { name: 'Hand over' });
  await tabTo(page, sheet.getByRole('button', { name: 'Copy as TSV, for pasting' }));
  await page.keyboard.press('Enter');
  await expect(sheet.getByText('The spacing table is copied.')).toBeVisible();
}
