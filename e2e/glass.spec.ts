import type { Page } from '@playwright/test';
import { type App, expect, test } from './support/app.ts';
import { recorded, textsIn } from './support/board.ts';
import { DEMO } from './support/engine.ts';
import { drawn, grip, numberAt } from './support/hand.ts';

/** Every surface's radius as it stands in the card. */
async function radii(app: App): Promise<readonly string[]> {
  const fields = app.panel.getByRole('textbox', { name: /^Radius of surface \d$/ });
  return Promise.all((await fields.all()).map((field) => field.inputValue()));
}

const press = async (app: App, page: Page, ...keys: readonly string[]) => {
  await app.board.focus();
  for (const key of keys) await page.keyboard.press(key);
  await drawn(page);
};

test('a glass lens from the tray is bent by its grip: the radii change, the focal length stays', async ({
  app,
  page,
}) => {
  await app.openEmpty();
  await app.dragFromTray('glass');
  await press(app, page, 'f');
  const focalLength = app.readout('Focal length');
  const before = await focalLength.textContent();
  expect(before).toMatch(/^49\.\d{3}mm$/);
  expect(await radii(app)).toEqual(['50.000', '−50.000']);
  const seen = new Set<string>();
  await app.hand.pressGrip('bend:p1');
  await app.hand.move({ dx: 24, steps: 8 }, async () => {
    seen.add((await radii(app)).join(' '));
    await expect(focalLength).toHaveText(before ?? '');
  });
  expect(textsIn(await recorded(page))).toContainEqual(
    expect.stringMatching(/^bent to R [\d.]+ mm in front$/),
  );
  await app.hand.release();
  expect(seen.size, 'bendings seen on the way').toBeGreaterThanOrEqual(6);
  const [front = '', rear = ''] = await radii(app);
  expect(Number(front)).toBeLessThan(50);
  expect(rear).not.toBe('−50.000');
  await expect(focalLength).toHaveText(before ?? '');

  await page.keyboard.press('Control+z');
  await drawn(page);
  expect(await radii(app)).toEqual(['50.000', '−50.000']);
});

test('radius, thickness and rim have grips by hand and by keys, and entries that understand flat', async ({
  app,
  page,
}) => {
  await app.openEmpty();
  await app.dragFromTray('glass');
  await press(app, page, 'f');
  await app.hand.drag('radius:p1:0', { dx: -24 });
  expect(await numberAt(page, 'radius:p1:0')).toBeLessThan(0);
  await grip(page, 'thickness:p1:0').focus();
  await page.keyboard.press('Shift+PageUp');
  await drawn(page);
  expect(await numberAt(page, 'thickness:p1:0')).toBeGreaterThan(4);
  await page.keyboard.press('Enter');
  await app.typeOnDrawing('7.5');
  await expect(app.field('Thickness behind surface 1')).toHaveValue('7.500');

  await app.type('Radius of surface 1', 'flat');
  await expect(app.field('Radius of surface 1')).toHaveValue('∞');
  await app.type('Radius of surface 1', '80');
  await grip(page, 'radius:p1:1').focus();
  await page.keyboard.press('Enter');
  await app.typeOnDrawing('∞');
  // Flat behind: f = R/(n − 1), whatever the thickness.
  await expect(app.field('Radius of surface 2')).toHaveValue('∞');
  await expect(app.readout('Focal length')).toHaveText(/^154\.7\d\dmm$/);

  await app.panel.getByRole('button', { name: 'Add r⁴' }).click();
  await app.type('r⁴ of surface 1', '−2e-6');
  await expect(app.field('r⁴ of surface 1')).toHaveValue('−0.000002');
});

test('surfaces that cross are hatched and said, a radius inside its rim too', async ({ app, page }) => {
  await app.openEmpty();
  await app.dragFromTray('glass');
  await app.type('Clear diameter', '36');
  expect(textsIn(await recorded(page))).toContain('surfaces cross');
  await expect(app.panel.getByText(/The surfaces of glass 1 cross within the clear diameter/)).toBeVisible();
  await app.type('Radius of surface 1', '15');
  await expect(
    app.panel.getByText(/radius of surface 1 of glass 1 is 15\.000 mm, smaller than its rim/),
  ).toBeVisible();
});

test('an element of the demo is thickened: focal length and magnification stay at every position', async ({
  app,
  page,
}) => {
  await app.open();
  const read = async () => {
    const numbers: string[] = [];
    for (const [index] of DEMO.positions.entries()) {
      await press(app, page, String(index + 1));
      numbers.push((await app.readout('Focal length').textContent()) ?? '');
      numbers.push((await app.readout('Magnification').textContent()) ?? '');
    }
    return numbers;
  };
  const before = await read();
  await app.hand.clickGrip('part:p4');
  await app.panel.getByRole('button', { name: 'Thicken…' }).click();
  const form = app.panel.getByRole('group', { name: 'Thicken', exact: true });
  await form.getByRole('combobox', { name: 'Bending' }).selectOption('Flat behind');
  await expect(form.getByText(/back focus changes by|gap behind changes by/)).toBeVisible();
  await form.getByRole('button', { name: 'Thicken', exact: true }).click();
  await drawn(page);
  await expect(app.field('Radius of surface 2')).toHaveValue('∞');
  expect(await read()).toEqual(before);

  await app.hand.drag('bend:p4', { dx: -10 });
  expect(await read()).toEqual(before);

  await app.panel.getByRole('button', { name: 'Make thin' }).click();
  await drawn(page);
  await expect(app.field('Focal length')).toHaveValue('48.000');
  expect(await read()).toEqual(before);
});
