import type { Page } from '@playwright/test';
import { type App, expect, test } from './support/app.ts';
import { recorded, textsIn } from './support/board.ts';
import { drawn, grip, middleOf, numberAt, type Point } from './support/hand.ts';

/** A mouse points at whole px; grips stand at tenths. */
const ABOUT_PX = 0.6;

test.beforeEach(async ({ app }) => {
  await app.open();
});

const placeOf = (page: Page, id: string): Promise<Point> => middleOf(grip(page, id));

async function lengthPx(page: Page): Promise<number> {
  await drawn(page);
  return (await placeOf(page, 'part:p4')).x - (await placeOf(page, 'part:p2')).x;
}

/** A place on the drawing where nothing can be taken. */
async function paper(app: App): Promise<Point> {
  const third = await placeOf(app.page, 'part:p3');
  return { x: third.x + 60, y: third.y + 180 };
}

test('the wheel zooms about the pointer, Shift stretches heights, the hand pans, keys fit again', async ({
  app,
  page,
}) => {
  const before = await lengthPx(page);
  const third = await placeOf(page, 'part:p3');
  await page.mouse.move(third.x, third.y + 180);
  await page.mouse.wheel(0, -240);
  await expect.poll(() => lengthPx(page)).toBeGreaterThan(1.2 * before);
  expect(Math.abs((await placeOf(page, 'part:p3')).x - third.x)).toBeLessThan(ABOUT_PX);

  const stop = await placeOf(page, 'stop:upper');
  await page.keyboard.down('Shift');
  await page.mouse.wheel(0, 240);
  const axis = third.y;
  await expect
    .poll(async () => axis - (await placeOf(page, 'stop:upper')).y)
    .toBeLessThan(0.95 * (axis - stop.y));
  await page.keyboard.up('Shift');

  const from = await placeOf(page, 'part:p3');
  await app.hand.press(await paper(app));
  await app.hand.move({ dx: -50, dy: 20 });
  await app.hand.release();
  const panned = await placeOf(page, 'part:p3');
  expect(panned.x - from.x).toBeCloseTo(-50, 0);
  expect(panned.y - from.y).toBeCloseTo(20, 0);
  await expect(page.getByRole('button', { name: 'Undo' })).toBeDisabled();

  await app.board.focus();
  await page.keyboard.press('f');
  await expect.poll(async () => Math.abs((await lengthPx(page)) - before)).toBeLessThan(1);
  await page.keyboard.press('a');
  await expect.poll(() => lengthPx(page)).toBeLessThan(0.4 * before);
  expect(textsIn(await recorded(page)).some((text) => text.includes('not to scale'))).toBe(false);
});

test('several parts are selected with Shift and move together', async ({ app, page }) => {
  await app.hand.clickGrip('part:p2');
  await page.keyboard.down('Shift');
  await app.hand.clickGrip('part:p3');
  await page.keyboard.up('Shift');
  await expect(app.panel.getByRole('heading', { name: '2 parts' })).toBeVisible();
  const between = await numberAt(page, 'cell:gap:p2');
  const [front, behind] = [await numberAt(page, 'cell:gap:p1'), await numberAt(page, 'cell:gap:p3')];
  await app.hand.drag('part:p3', { dx: 35 });
  expect(await numberAt(page, 'cell:gap:p2')).toBeCloseTo(between, 9);
  expect(await numberAt(page, 'cell:gap:p1')).toBeGreaterThan(front + 1);
  expect((await numberAt(page, 'cell:gap:p1')) + (await numberAt(page, 'cell:gap:p3'))).toBeCloseTo(
    front + behind,
    9,
  );
});

test('a value left as it was typed keeps all its digits, and a sum is understood', async ({ app, page }) => {
  const stored = await numberAt(page, 'cell:gap:p1');
  await app.hand.clickGrip('cell:gap:p1');
  const entry = page.locator('.type-box input');
  await expect(entry).toHaveValue('41.2187245423499');
  await entry.press('Enter');
  await expect(entry).toHaveCount(0);
  expect(await numberAt(page, 'cell:gap:p1')).toBe(stored);
  await expect(page.getByRole('button', { name: 'Undo' })).toBeDisabled();

  await app.hand.clickGrip('cell:gap:p1');
  await app.typeOnDrawing('+1/4');
  expect(await numberAt(page, 'cell:gap:p1')).toBeCloseTo(stored + 0.25, 12);
  await app.hand.clickGrip('cell:gap:p1');
  await app.typeOnDrawing('1,5 in');
  expect(await numberAt(page, 'cell:gap:p1')).toBeCloseTo(38.1, 12);
});

test('the mark “= all” on the ribbon gives a gap its own value at every position', async ({ app, page }) => {
  const label = grip(page, 'cell:gap:p4');
  await expect(label).toHaveAttribute('aria-valuetext', '26.000 mm, the same at all positions');
  const { x, y } = await middleOf(label);
  await app.hand.press({ x, y: y + 32 });
  await app.hand.release();
  await expect(label).toHaveAttribute('aria-valuetext', '26.000 mm');
  await app.hand.clickGrip('cell:gap:p4');
  await app.typeOnDrawing('27');
  await page.getByRole('button', { name: 'Go to middle' }).click();
  await expect(label).toHaveAttribute('aria-valuetext', '26.000 mm');
});

test('a stop dropped on a part rides on it and is freed again', async ({ app, page }) => {
  await app.hand.clickGrip('part:p2');
  await app.panel.getByRole('button', { name: 'Release' }).click();
  await expect(page.locator('[data-grip^="part:"]')).toHaveCount(5);
  await page.getByRole('button', { name: 'Undo' }).click();
  await app.dragFromTray('stop', { part: 'part:p3', px: 2 });
  await expect(page.locator('[data-grip^="part:"]')).toHaveCount(4);
  await app.hand.clickGrip('part:p3');
  await expect(app.panel.getByText('The stop rides on it, in front of its refraction.')).toBeVisible();
});

test('in inches the keys step by round inches, and the hand-over rounds to inches', async ({ app, page }) => {
  await app.open();
  await app.panel.getByRole('button', { name: 'Lengths in mm. Change to in' }).click();
  await expect(app.readout('Focal length')).toHaveText('1.01371in');
  await grip(page, 'part:p2').focus();
  const before = Number(await grip(page, 'part:p2').getAttribute('aria-valuenow'));
  await page.keyboard.press('ArrowRight');
  await expect
    .poll(async () => Number(await grip(page, 'part:p2').getAttribute('aria-valuenow')) - before)
    .toBeCloseTo(0.01 * 25.4, 9);
  await page.getByRole('button', { name: 'Hand over', exact: true }).click();
  const rounding = page.getByRole('dialog', { name: 'Hand over' }).getByLabel('Rounded to');
  await expect(rounding.locator('option:checked')).toHaveText('0.00001 in');
});

test('the ledger and the trace sheet tell how the light gets through', async ({ app, page }) => {
  await page.getByRole('tab', { name: 'Ledger' }).click();
  const ledger = page.getByRole('region', { name: 'Ledger' });
  const rows = (name: string) => ledger.getByRole('row').filter({ hasText: name });
  await expect(rows('first group')).toContainText(/real−30\.075virtual/);
  for (const [position, object] of [
    ['wide', '29.596'],
    ['middle', '30.342'],
    ['narrow', '29.578'],
  ] as const) {
    await page.getByRole('button', { name: `Go to ${position}` }).click();
    await expect(rows('third group').getByRole('cell').nth(0)).toHaveText(object);
    await expect(rows('third group').getByRole('cell').nth(1)).toHaveText('virtual');
  }
  await ledger.getByLabel('Distances positive when real').click();
  await expect(rows('third group').getByRole('cell').nth(0)).toHaveText('−29.578');

  await app.readout('Back focus').getByRole('button', { name: 'Back focus: show the working' }).click();
  await expect(page.getByRole('tab', { name: 'Trace sheet' })).toHaveAttribute('aria-selected', 'true');
  await expect(page.getByRole('tabpanel')).toContainText('from the last vertex to the rear focal point');
});
