import type { Page } from '@playwright/test';
import { type App, expect, test } from './support/app.ts';
import { drawn, grip, middleOf } from './support/hand.ts';

/** Grips stand at tenths of a px; pointers at whole ones. */
const ABOUT_PX = 0.6;

const xOf = async (page: Page, id: string): Promise<number> => (await middleOf(grip(page, id))).x;

/** Drags a part from the tray onto the axis, `asidePx` from the drawing's left edge; gives the x it was let go at. */
async function drop({ page, board }: App, kind: string, asidePx: number): Promise<number> {
  const from = await middleOf(page.getByRole('button', { name: kind, exact: true }));
  const box = await board.boundingBox();
  const x = (box?.x ?? 0) + asidePx;
  await page.mouse.move(from.x, from.y);
  await page.mouse.down();
  await page.mouse.move(x, (box?.y ?? 0) + 200, { steps: 6 });
  await page.mouse.up();
  await drawn(page);
  await page.keyboard.press('Escape');
  return x;
}

test('what is dropped stays where it was let go, and what was there before does not move', async ({
  app,
  page,
}) => {
  await app.openEmpty();
  const places: [string, number][] = [];
  for (const [id, kind, asidePx] of [
    ['part:p1', 'positive', 500],
    ['part:p2', 'negative', 660],
    ['part:p3', 'plate', 400],
    ['part:p4', 'positive', 590],
  ] as const) {
    const x = await drop(app, kind, asidePx);
    for (const [known, wasX] of places)
      expect(Math.abs((await xOf(page, known)) - wasX), known).toBeLessThan(ABOUT_PX);
    if (kind !== 'plate') expect(Math.abs((await xOf(page, id)) - x), id).toBeLessThan(ABOUT_PX);
    places.push([id, await xOf(page, id)]);
  }

  await app.board.focus();
  await page.keyboard.press('f');
  await expect
    .poll(async () => (await xOf(page, 'part:p2')) - (await xOf(page, 'part:p3')))
    .toBeGreaterThan(300);
});

test('dragging the first part leaves the folded object and the others where they are, also when undone', async ({
  app,
  page,
}) => {
  await app.open();
  const others = ['object:foot', 'part:p2', 'part:p3', 'part:p4', 'image'];
  const before = await Promise.all(others.map((id) => xOf(page, id)));
  const first = await xOf(page, 'part:p1');
  const expectStill = async () => {
    for (const [i, id] of others.entries())
      expect(Math.abs((await xOf(page, id)) - (before[i] ?? 0)), id).toBeLessThan(ABOUT_PX);
  };
  await app.hand.pressGrip('part:p1', -60);
  await app.hand.move({ dx: -40 }, expectStill);
  await app.hand.release();
  await expectStill();
  expect(Math.abs((await xOf(page, 'part:p1')) - first + 40)).toBeLessThan(ABOUT_PX);
  await page.keyboard.press('Control+z');
  await drawn(page);
  await expectStill();
  expect(Math.abs((await xOf(page, 'part:p1')) - first)).toBeLessThan(ABOUT_PX);
});

test('Space pans over anything, also while a grip or nothing has the focus', async ({ app, page }) => {
  await app.open();
  const blurred = () => page.evaluate(() => (document.activeElement as HTMLElement | null)?.blur());
  const undo = page.getByRole('button', { name: 'Undo' });
  for (const focus of [() => grip(page, 'part:p3').focus(), blurred]) {
    const from = await xOf(page, 'part:p3');
    await focus();
    await page.keyboard.down(' ');
    await app.hand.drag('part:p3', { dx: 30 });
    await page.keyboard.up(' ');
    expect((await xOf(page, 'part:p3')) - from).toBeCloseTo(30, 0);
    await expect(undo).toBeDisabled();
  }
});
