import type { Locator, Page } from '@playwright/test';
import { type App, expect, test } from './support/app.ts';
import { drawn, grip, middleOf, numberAt, type Point } from './support/hand.ts';

test.use({ viewport: { width: 390, height: 844 }, hasTouch: true, isMobile: true });

const STEPS = 8;
/** Longer than two taps that count as a double one are apart. */
const DOUBLE_TAP_MS = 600;

const now = (page: Page): Promise<number> => page.evaluate(() => performance.now());

async function tap(page: Page, target: Locator): Promise<void> {
  await drawn(page);
  const { x, y } = await middleOf(target);
  await page.touchscreen.tap(x, y);
  await drawn(page);
}

/** Fingers on the glass: where each begins, and how far it goes. */
interface Finger {
  readonly from: Point;
  readonly dx: number;
  readonly dy?: number;
}

/** Presses all fingers, moves them along in steps, and lifts them; `seen` is called after every step. */
async function slide(page: Page, fingers: readonly Finger[], seen = async () => {}): Promise<void> {
  const touch = await page.context().newCDPSession(page);
  const at = (share: number) =>
    fingers.map(({ from, dx, dy = 0 }, id) => ({ x: from.x + dx * share, y: from.y + dy * share, id }));
  await touch.send('Input.dispatchTouchEvent', { type: 'touchStart', touchPoints: at(0) });
  for (let step = 1; step <= STEPS; step++) {
    await touch.send('Input.dispatchTouchEvent', { type: 'touchMove', touchPoints: at(step / STEPS) });
    await drawn(page);
    await seen();
  }
  await touch.send('Input.dispatchTouchEvent', { type: 'touchEnd', touchPoints: [] });
  await drawn(page);
}

/** Drags the strip under the ribbon. */
async function jog(page: Page, dx: number, seen?: () => Promise<void>): Promise<void> {
  await slide(page, [{ from: await middleOf(page.locator('.jog-strip')), dx }], seen);
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
  await jog(page, -90, async () => {
    places.add(await numberAt(page, 'part:p2'));
  });
  expect(places.size).toBeGreaterThanOrEqual(5);
  expect(await numberAt(page, 'part:p2')).toBeLessThan(40);
  await tap(page, page.getByRole('button', { name: 'Undo' }));
  await expect(grip(page, 'part:p2')).toHaveAttribute('aria-valuetext', /41\.219 mm/);
  await expect(page.getByRole('button', { name: 'Undo' })).toBeDisabled();

  await tap(page, chips.getByRole('button', { name: 'Focal' }));
  await jog(page, 60);
  expect(await numberAt(page, 'focal:p2:rear')).toBeGreaterThan(29);
  await tap(page, chips.getByRole('button', { name: 'Rim' }));
  const rim = await numberAt(page, 'rim:p2:upper');
  await jog(page, 40);
  expect(await numberAt(page, 'rim:p2:upper')).toBeGreaterThan(rim);

  // The toggle stands for Shift: what is behind moves along.
  await tap(page, chips.getByRole('button', { name: 'behind moves' }));
  await tap(page, chips.getByRole('button', { name: 'Position' }));
  const gap = await numberAt(page, 'cell:gap:p2');
  await jog(page, 50);
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

test('on a phone a finger drags a part, two fingers zoom, and what lies close is offered by name', async ({
  app,
  page,
}) => {
  await app.open();
  const third = await middleOf(grip(page, 'part:p3'));
  await slide(page, [{ from: { x: third.x, y: third.y + 30 }, dx: 30 }]);
  expect(await numberAt(page, 'part:p3')).toBeGreaterThan(60);
  await expect(page.getByRole('button', { name: 'Undo' })).toBeEnabled();
  await tap(page, page.getByRole('button', { name: 'Undo' }));

  const length = async () =>
    (await middleOf(grip(page, 'part:p4'))).x - (await middleOf(grip(page, 'part:p3'))).x;
  const before = await length();
  const y = third.y + 100;
  await slide(page, [
    { from: { x: 150, y }, dx: -60 },
    { from: { x: 230, y }, dx: 60 },
  ]);
  expect(await length()).toBeGreaterThan(1.5 * before);
  await expect(page.getByRole('button', { name: 'Undo' })).toBeDisabled();
  await tap(page, page.getByRole('button', { name: 'fit parts' }));

  // The rim and the stop's edge lie together; a second tap, too late for a double one, asks which is meant.
  await tap(page, grip(page, 'part:p2'));
  await tap(page, grip(page, 'stop:upper'));
  const late = (await now(page)) + DOUBLE_TAP_MS;
  await expect.poll(() => now(page)).toBeGreaterThan(late);
  await tap(page, grip(page, 'stop:upper'));
  const offered = page.getByRole('menu', { name: 'Which one?' });
  await offered.getByRole('menuitem', { name: 'second group, upper rim' }).tap();
  await expect(offered).toBeHidden();
  await expect(grip(page, 'rim:p2:upper')).toBeFocused();
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
