import { AxeBuilder } from '@axe-core/playwright';
import type { Locator, Page } from '@playwright/test';
import { type App, expect, test } from './support/app.ts';
import { linesIn, recorded } from './support/board.ts';
import { drawn, grip, middleOf, numberAt } from './support/hand.ts';
import { beginRenders, endRenders, watchRenders } from './support/renders.ts';

/** A cell of the table of paraxial and exact values. */
const compared = (app: App, row: string, column: 'paraxial' | 'exact' | 'difference'): Locator =>
  app.panel.getByRole('row', { name: new RegExp(`^${row} `) }).locator(`.compared-${column}`);

async function numberIn(cell: Locator): Promise<number> {
  return Number(((await cell.textContent()) ?? '').replace('−', '-'));
}

const unfold = (app: App, group: string) =>
  app.panel.getByRole('button', { name: group, exact: true }).click();

/** The first group of the demo as a singlet, bent by its grip afterwards. */
async function thickenFirst(app: App, page: Page): Promise<void> {
  await app.open();
  await app.hand.clickGrip('part:p1');
  await app.panel.getByRole('button', { name: 'Thicken…' }).click();
  await app.panel.getByRole('button', { name: 'Thicken', exact: true }).click();
  await drawn(page);
}

test('an element of the demo is thickened and bent: the exact marginal height moves, the paraxial one stays', async ({
  app,
  page,
}) => {
  await app.open();
  await expect(app.panel.getByText(/^All parts are ideal/)).toBeVisible();
  await thickenFirst(app, page);
  const paraxial = compared(app, 'Marginal height', 'paraxial');
  const exact = compared(app, 'Marginal height', 'exact');
  await expect(paraxial).toBeVisible();
  const before = { paraxial: await paraxial.textContent(), exact: await numberIn(exact) };
  const seen = new Set<string>();
  await app.hand.pressGrip('bend:p1');
  await app.hand.move({ dx: 30, steps: 8 }, async () => {
    seen.add((await exact.textContent()) ?? '');
    await expect(paraxial).toHaveText(before.paraxial ?? '');
  });
  await app.hand.release();
  expect(seen.size, 'exact heights seen on the way').toBeGreaterThanOrEqual(5);
  expect(await numberIn(exact)).not.toBe(before.exact);
  await expect(paraxial).toHaveText(before.paraxial ?? '');
  const difference = await numberIn(compared(app, 'Marginal height', 'difference'));
  expect(difference).toBeCloseTo((await numberIn(exact)) - (await numberIn(paraxial)), 3);
  await expect(app.panel.locator('[data-trust]')).toHaveText(/^First order holds within 0\.01 mm /);

  await app.type('Trusted within', '0.0001');
  await expect(app.panel.locator('[data-trust]')).toHaveText(
    /^First order holds within 0\.0001 mm up to \d+ % of the aperture \(f\/[\d.]+\)/,
  );
});

test('exact and paraxial rays are hidden and shown, and whiskers point at the largest drift', async ({
  app,
  page,
}) => {
  await thickenFirst(app, page);
  await page.keyboard.press('Escape');
  await page.keyboard.press('Escape');
  await unfold(app, 'Drawn');
  const lines = async (style: Parameters<typeof linesIn>[1]) => linesIn(await recorded(page), style).length;
  const exactRays = app.panel.getByRole('checkbox', { name: 'Exact rays' });
  const paraxialRays = app.panel.getByRole('checkbox', { name: 'Paraxial rays' });
  expect(await lines('chief ray')).toBeGreaterThan(0);
  await exactRays.uncheck();
  await drawn(page);
  expect(await lines('marginal ray')).toBe(0);
  expect(await lines('marginal ray paraxial')).toBe(2);
  await exactRays.check();
  await paraxialRays.uncheck();
  await drawn(page);
  expect(await lines('marginal ray')).toBe(2);
  expect(await lines('marginal ray paraxial')).toBe(0);
  await paraxialRays.check();

  await unfold(app, 'Drift');
  await app.panel.getByRole('checkbox', { name: 'Drift whiskers' }).first().check();
  await app.type('Stretch ×', '400');
  await app.type('Limit', '0.000001');
  expect(await lines('drift beyond')).toBeGreaterThan(0);
  await expect(app.panel.getByText(/^✗ \d+ of \d+ whiskers are beyond 0 mm\.$|^✗ /)).toBeVisible();
  const largest = app.panel.getByRole('button', { name: /^largest / });
  await expect(largest).toHaveText(/^largest −?[\d.]+ mm, .+, at (surface \d+|the image plane)/);
  await largest.click();
  await expect(largest).toHaveAttribute('aria-pressed', 'true');
});

test('the loupe is dragged anywhere, and its plane goes through focus by pointer, slider and keys', async ({
  app,
  page,
}) => {
  await thickenFirst(app, page);
  await unfold(app, 'Loupe');
  await app.panel.getByRole('checkbox', { name: 'Loupe on the drawing' }).check();
  await drawn(page);
  expect(linesIn(await recorded(page), 'loupe plane')).toHaveLength(1);
  const rms = app.panel.locator('[data-rms]');
  await expect(rms).toHaveText(/^rms spot \d+\.\d\d µm$/);
  const first = await rms.textContent();

  await app.hand.drag('loupe:plane', { dx: 25 });
  expect(await numberAt(page, 'loupe:plane')).toBeGreaterThan(0);
  await expect(rms).not.toHaveText(first ?? '');
  const slider = app.panel.getByRole('slider', { name: 'Plane through focus' });
  await slider.fill('0');
  await expect(rms).toHaveText(first ?? '');
  await slider.press('ArrowRight');
  await expect(rms).not.toHaveText(first ?? '');
  await grip(page, 'loupe:plane').focus();
  await page.keyboard.press('ArrowLeft');
  await page.keyboard.press('PageDown');
  await drawn(page);
  await expect(grip(page, 'loupe:plane')).toHaveAttribute(
    'aria-valuetext',
    /^plane −[\d.]+ µm, rms [\d.]+ µm$/,
  );

  const zMm = await numberAt(page, 'loupe');
  const from = await middleOf(grip(page, 'loupe'));
  await app.hand.press(from);
  await app.hand.move({ dx: -160, dy: 10 });
  await app.hand.release();
  expect(await numberAt(page, 'loupe')).toBeLessThan(zMm - 5);
  const to = await middleOf(grip(page, 'loupe'));
  // Near the edge of the sheet the ring stands aside of its point.
  expect(Math.abs(to.x - from.x + 160)).toBeLessThan(60);
  await app.hand.press(to);
  await app.hand.move({ dx: -70, dy: 5 });
  await app.hand.release();
  expect((await middleOf(grip(page, 'loupe'))).x - to.x).toBeCloseTo(-70, 0);
  await app.panel.getByRole('button', { name: 'Look at the image' }).click();
  await drawn(page);
  expect(await numberAt(page, 'loupe')).toBeCloseTo(zMm, 6);

  // By keys alone: the point along the axis, its height, and Escape gives a drag up.
  await grip(page, 'loupe').focus();
  await page.keyboard.press('ArrowLeft');
  await drawn(page);
  expect(await numberAt(page, 'loupe')).toBeLessThan(zMm);
  const height = await numberAt(page, 'loupe:height');
  await grip(page, 'loupe:height').focus();
  await page.keyboard.press('ArrowUp');
  await drawn(page);
  expect(await numberAt(page, 'loupe:height')).toBeGreaterThan(height);
  const there = await numberAt(page, 'loupe');
  await app.hand.press(await middleOf(grip(page, 'loupe')));
  await app.hand.move({ dx: -60 });
  await page.keyboard.press('Escape');
  await app.hand.release();
  expect(await numberAt(page, 'loupe')).toBeCloseTo(there, 9);
  await app.type('Heights ×', '100');
  await app.type('Looks at', '60');
  expect(await numberAt(page, 'loupe')).toBeCloseTo(60, 9);
});

test('the sensor is fixed where the spots are least', async ({ app, page }) => {
  await thickenFirst(app, page);
  const rmsBefore = await spotAt(app, page);
  await app.panel.getByRole('button', { name: 'Focus for the least spot' }).click();
  await drawn(page);
  expect(await spotAt(app, page)).not.toBe(rmsBefore);
  await page.keyboard.press('Control+z');
  await drawn(page);
  expect(await spotAt(app, page)).toBe(rmsBefore);
});

/** The marginal ray's exact height on the image plane, which moves with it. */
async function spotAt(app: App, page: Page): Promise<string> {
  await drawn(page);
  return (await compared(app, 'Marginal height', 'exact').textContent()) ?? '';
}

test('with everything exact on show a drag renders nothing for nothing, and nothing is missing for a screen reader', async ({
  app,
  page,
}) => {
  await watchRenders(page);
  await thickenFirst(app, page);
  for (const group of ['Drift', 'Loupe']) await unfold(app, group);
  await app.panel.getByRole('checkbox', { name: 'Loupe on the drawing' }).check();
  const { violations } = await new AxeBuilder({ page }).include('[aria-label="Panel"]').analyze();
  expect(violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ html }) => html).join(' ')}`)).toEqual([]);
  await app.hand.pressGrip('bend:p1');
  await app.hand.move({ dx: 6 });
  await beginRenders(page);
  await app.hand.move({ dx: 40, steps: 10 });
  const { commits, idle } = await endRenders(page);
  await page.keyboard.press('Escape');
  await app.hand.release();
  expect(commits).toBeGreaterThanOrEqual(5);
  expect(idle).toEqual([]);
});

test.describe('on a phone', () => {
  test.use({ viewport: { width: 390, height: 844 }, hasTouch: true, isMobile: true });

  test('the loupe is switched on from below and moved with a finger', async ({ app, page }) => {
    await app.open();
    await page.getByRole('button', { name: 'Readouts', exact: true }).click();
    const sheet = page.getByRole('dialog', { name: 'Readouts' });
    await sheet.getByRole('button', { name: 'Loupe', exact: true }).click();
    await sheet.getByRole('checkbox', { name: 'Loupe on the drawing' }).check();
    await page.getByRole('button', { name: 'Close Readouts' }).click();
    await drawn(page);
    const before = await numberAt(page, 'loupe');
    const from = await middleOf(grip(page, 'loupe'));
    const touch = await page.context().newCDPSession(page);
    const at = (dx: number) => [{ x: from.x + dx, y: from.y - 20, id: 0 }];
    await touch.send('Input.dispatchTouchEvent', { type: 'touchStart', touchPoints: at(0) });
    for (let dx = -20; dx >= -120; dx -= 20) {
      await touch.send('Input.dispatchTouchEvent', { type: 'touchMove', touchPoints: at(dx) });
      await drawn(page);
    }
    await touch.send('Input.dispatchTouchEvent', { type: 'touchEnd', touchPoints: [] });
    await drawn(page);
    expect(await numberAt(page, 'loupe')).toBeLessThan(before - 10);
  });
});
