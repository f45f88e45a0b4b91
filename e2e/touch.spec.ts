import type { Locator, Page } from '@playwright/test';
import { type App, expect, test } from './support/app.ts';
import { drawn, grip, middleOf, numberAt } from './support/hand.ts';

test.use({ viewport: { width: 390, height: 844 }, hasTouch: true, isMobile: true });

async function tap(page: Page, target: Locator): Promise<void> {
  await drawn(page);
  const { x, y } = await middleOf(target);
  await page.touchscreen.tap(x, y);
  await drawn(page);
}

/** A finger that presses an element, moves along by `dx` px in steps, and lifts. */
async function slide(page: Page, target: Locator, dx: number, seen: () => Promise<void>): Promise<void> {
  const from = await middleOf(target);
  const touch = await page.context().newCDPSession(page);
  const at = (x: number) => [{ x, y: from.y, id: 1 }];
  await touch.send('Input.dispatchTouchEvent', { type: 'touchStart', touchPoints: at(from.x) });
  for (let step = 1; step <= 8; step++) {
    await touch.send('Input.dispatchTouchEvent', {
      type: 'touchMove',
      touchPoints: at(from.x + (dx * step) / 8),
    });
    await drawn(page);
    await seen();
  }
  await touch.send('Input.dispatchTouchEvent', { type: 'touchEnd', touchPoints: [] });
  await drawn(page);
}

/** Nothing scrolls sideways, and the bar at the bottom hides nothing of the drawing. */
async function expectToFit({ page, board }: App): Promise<void> {
  const width = await page.evaluate(() => ({
    page: document.documentElement.scrollWidth,
    window: window.innerWidth,
  }));
  expect(width.page).toBeLessThanOrEqual(width.window);
  const drawing = await board.boundingBox();
  const bar = await page.getByRole('navigation', { name: 'Panels' }).boundingBox();
  expect(drawing && bar && drawing.y + drawing.height).toBeLessThanOrEqual(bar?.y ?? 0);
  expect((bar?.y ?? 0) + (bar?.height ?? 0)).toBeLessThanOrEqual(844);
  expect(drawing?.height, 'height left for drawing and ribbon').toBeGreaterThan(300);
}

test('on a phone a part is tapped, chosen by its chips and moved from the strip', async ({ app, page }) => {
  await app.open();
  await expectToFit(app);
  await tap(page, grip(page, 'part:p2'));
  const chips = page.getByRole('group', { name: 'What the strip moves' });
  await expect(chips.getByRole('button', { name: 'Position' })).toHaveAttribute('aria-pressed', 'true');
  await expectToFit(app);

  const places = new Set<number>();
  await slide(page, page.locator('.jog-strip'), -90, async () => {
    places.add(await numberAt(page, 'part:p2'));
  });
  expect(places.size).toBeGreaterThanOrEqual(5);
  expect(await numberAt(page, 'part:p2')).toBeLessThan(40);
  await tap(page, page.getByRole('button', { name: 'Undo' }));
  await expect(grip(page, 'part:p2')).toHaveAttribute('aria-valuetext', /41\.219 mm/);
  await expect(page.getByRole('button', { name: 'Undo' })).toBeDisabled();

  await tap(page, chips.getByRole('button', { name: 'Focal' }));
  await slide(page, page.locator('.jog-strip'), 60, async () => {});
  expect(await numberAt(page, 'focal:p2:rear')).toBeGreaterThan(29);
  await tap(page, chips.getByRole('button', { name: 'Rim' }));
  const rim = await numberAt(page, 'rim:p2:upper');
  await slide(page, page.locator('.jog-strip'), 40, async () => {});
  expect(await numberAt(page, 'rim:p2:upper')).toBeGreaterThan(rim);

  // The toggle stands for Shift: what is behind moves along.
  await tap(page, chips.getByRole('button', { name: 'behind moves' }));
  await tap(page, chips.getByRole('button', { name: 'Position' }));
  const gap = await numberAt(page, 'cell:gap:p2');
  await slide(page, page.locator('.jog-strip'), 50, async () => {});
  expect(await numberAt(page, 'cell:gap:p2')).toBeCloseTo(gap, 9);
});

test('on a phone parts come from the tray by two taps, and panels rise from below', async ({ app, page }) => {
  await app.open();
  await tap(page, page.getByRole('button', { name: 'positive', exact: true }));
  const [second, third] = await Promise.all(['p2', 'p3'].map((id) => middleOf(grip(page, `part:${id}`))));
  await page.touchscreen.tap((second!.x + third!.x) / 2, second!.y);
  await app.typeOnDrawing('80');
  await expect(page.locator('[data-grip^="part:"]')).toHaveCount(5);
  await expectToFit(app);

  for (const [button, title] of [
    ['Readouts', 'Readouts'],
    ['Part', 'Selected part'],
    ['Sketch', 'Sketch'],
    ['Warnings', 'Warnings'],
  ] as const) {
    await tap(page, page.getByRole('navigation', { name: 'Panels' }).getByRole('button', { name: button }));
    const sheet = page.getByRole('dialog', { name: title });
    await expect(sheet).toBeVisible();
    const box = await sheet.boundingBox();
    expect(box?.height, `${title} leaves the drawing in view`).toBeLessThanOrEqual(0.46 * 844);
    await expectToFit(app);
    await tap(page, sheet.getByRole('button', { name: `Close ${title}` }));
    await expect(sheet).toBeHidden();
  }
});

test('on a phone in the night theme nothing overlaps or scrolls sideways', async ({ app, page }) => {
  await page.emulateMedia({ colorScheme: 'dark' });
  await app.open();
  await expect(page.locator('html')).toHaveAttribute('data-theme', 'night');
  await expectToFit(app);
  const back = await page.evaluate(() => getComputedStyle(document.body).backgroundColor);
  const sum = back
    .match(/\d+/g)
    ?.slice(0, 3)
    .reduce((total, part) => total + Number(part), 0);
  expect(sum, `a dark sheet, not ${back}`).toBeLessThan(150);
});
