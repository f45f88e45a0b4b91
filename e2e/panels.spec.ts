import type { Locator, Page } from '@playwright/test';
import { expect, test } from './support/app.ts';
import { drawn, grip, numberAt } from './support/hand.ts';

/** What a control shows right after the press, before a frame could pass. */
const pressed = (control: Locator): Promise<boolean> =>
  control.evaluate((input: HTMLInputElement) => {
    input.click();
    return input.checked;
  });

/** Where the focus is, to tell whether it was moved. */
const focused = (page: Page): Promise<string> =>
  page.evaluate(() => document.activeElement?.outerHTML.slice(0, 200) ?? '');

test('a pressed checkbox, radio or list shows the new state at once', async ({ app, page }) => {
  await app.open();
  await app.panel.getByRole('button', { name: 'Drawn', exact: true }).click();
  const pupils = app.panel.getByRole('checkbox', { name: 'Pupils' });
  expect(await pressed(pupils)).toBe(true);
  expect(await pressed(pupils)).toBe(false);

  const aperture = app.panel.getByRole('combobox', { name: 'Aperture by' });
  const chosen = await aperture.evaluate((list: HTMLSelectElement) => {
    list.value = 'objectNA';
    list.dispatchEvent(new Event('change', { bubbles: true }));
    return list.value;
  });
  expect(chosen).toBe('objectNA');

  await page.getByRole('button', { name: 'Hand over', exact: true }).click();
  expect(await pressed(page.getByRole('radio', { name: 'in', exact: true }))).toBe(true);
  expect(await pressed(page.getByRole('radio', { name: 'mm', exact: true }))).toBe(true);
});

test('undo in a field is that of the typing while there is some, and of the sketch otherwise', async ({
  app,
  page,
}) => {
  await app.open();
  await app.hand.clickGrip('part:p2');
  const field = app.field('Focal length');
  await field.click();
  await page.keyboard.type('30');
  await page.keyboard.press('Enter');
  await page.keyboard.type('31');
  await page.keyboard.press('Enter');
  await expect(field).toHaveValue('31');

  await page.keyboard.press('Control+z');
  await expect(field).toHaveValue('30');
  await expect(field).toBeFocused();
  await page.keyboard.press('Control+z');
  await expect(field).toHaveValue('28');
  await expect(page.getByRole('button', { name: 'Undo' })).toBeDisabled();
  await page.keyboard.press('Control+Shift+z');
  await expect(field).toHaveValue('30');

  await page.keyboard.type('7');
  await expect(field).toHaveValue('7');
  await page.keyboard.press('Control+z');
  await expect(field).toHaveValue('30');
  await page.keyboard.press('Control+z');
  await expect(field).toHaveValue('28');
  await app.board.focus();
  await expect(field).toHaveValue('28.000');
  await page.getByRole('button', { name: 'Redo' }).click();
  await field.click();

  // Steps that are not taken yet are taken back as one.
  await page.keyboard.press('ArrowUp');
  await page.keyboard.press('ArrowUp');
  await expect(field).toHaveValue('32');
  await page.keyboard.press('Control+z');
  await expect(field).toHaveValue('30');
  await page.keyboard.press('Enter');
  await page.keyboard.press('Control+z');
  await expect(field).toHaveValue('28');

  const name = app.field('Name');
  await name.fill('mover');
  await name.press('Enter');
  await expect(app.panel.getByRole('heading', { name: 'mover' })).toBeVisible();
  await name.press('Control+z');
  await expect(name).toHaveValue('second group');
});

test('Shift with Enter or a step changes a gap by the other rule', async ({ app, page }) => {
  await app.open();
  const gap = (id: string) => numberAt(page, `cell:gap:${id}`);
  const behind = await gap('p2');
  await app.hand.clickGrip('part:p2');
  const field = app.field('Gap in front');
  await expect(field).toHaveAttribute('title', /Shift\+Enter/);

  await app.type('Gap in front', '40');
  expect(await gap('p2')).toBeCloseTo(behind, 9);
  await field.fill('41');
  await field.press('Shift+Enter');
  await drawn(page);
  expect(await gap('p1')).toBeCloseTo(41, 9);
  expect(await gap('p2')).toBeCloseTo(behind - 1, 9);

  await field.press('Shift+ArrowUp');
  await field.press('Enter');
  await drawn(page);
  expect(await gap('p1')).toBeCloseTo(42, 9);
  expect(await gap('p2')).toBeCloseTo(behind - 2, 9);
  await field.press('PageUp');
  await field.press('Enter');
  await drawn(page);
  expect(await gap('p1')).toBeCloseTo(52, 9);
  expect(await gap('p2')).toBeCloseTo(behind - 2, 9);

  // A part moved by its number keeps its neighbours; with Shift what is behind comes along.
  const before = await gap('p2');
  await app.field('From first part').fill('50');
  await app.field('From first part').press('Shift+Enter');
  await drawn(page);
  expect(await gap('p1')).toBeCloseTo(50, 9);
  expect(await gap('p2')).toBeCloseTo(before, 9);
});

test('a part changes places by the buttons of its card', async ({ app, page }) => {
  await app.open();
  await app.hand.clickGrip('part:p1');
  const left = app.panel.getByRole('button', { name: 'One place left' });
  await expect(left).toBeDisabled();
  await app.panel.getByRole('button', { name: 'One place right' }).click();
  await drawn(page);
  expect(await numberAt(page, 'part:p1')).toBeGreaterThan(await numberAt(page, 'part:p2'));
  await left.click();
  await expect(left).toBeDisabled();
});

test('the trace sheet explains the same readout after a reload', async ({ app, page }) => {
  await app.open();
  await app.readout('Back focus').getByRole('button').click();
  const title = page.getByRole('tabpanel').getByRole('heading', { name: 'Back focus' });
  await expect(title).toBeVisible();
  // The view is written before a sketch that was changed after it.
  await app.type('Object in front', '510');
  await expect(app.saveMark).toHaveText('saved');
  await page.reload();
  await expect(title).toBeVisible();
});

test('the title block is a full rectangle on a desktop, on a phone and in print', async ({ app, page }) => {
  await app.open();
  await page.getByRole('button', { name: 'Hand over', exact: true }).click();
  const block = page.locator('.title-block');
  const empty = () =>
    block.evaluate((element) => {
      const area = ({ width, height }: { width: number; height: number }) => width * height;
      const cells = [...element.children].map((cell) => area(cell.getBoundingClientRect()));
      const whole = area({ width: element.clientWidth, height: element.clientHeight });
      return 1 - cells.reduce((sum, cell) => sum + cell, 0) / whole;
    });
  for (const [width, height, media] of [
    [1440, 900, 'screen'],
    [900, 768, 'screen'],
    [390, 844, 'screen'],
    [1010, 700, 'print'],
  ] as const) {
    await page.setViewportSize({ width, height });
    await page.emulateMedia({ media });
    expect(Math.abs(await empty()), `${media}, ${width} px`).toBeLessThan(0.01);
  }
});

test.describe('on a low screen', () => {
  test.use({ viewport: { width: 1366, height: 768 } });

  test('the card of a part that is pressed comes into view, and the panel goes back afterwards', async ({
    app,
    page,
  }) => {
    await app.open();
    const panel = page.locator('.side-scroll');
    const top = () => panel.evaluate((element) => element.scrollTop);
    await app.hand.clickGrip('part:p2');
    await expect(app.field('Gap behind')).toBeInViewport({ ratio: 1 });
    expect(await focused(page)).not.toContain('field-input');
    expect(await top()).toBeGreaterThan(0);
    await page.keyboard.press('Escape');
    await expect(app.panel.getByRole('heading', { name: 'Sketch', exact: true })).toBeVisible();
    expect(await top()).toBe(0);

    // Where the user scrolled to is where it stays.
    await app.hand.clickGrip('part:p3');
    await panel.evaluate((element) => element.scrollTo(0, 40));
    await page.keyboard.press('Escape');
    await expect(app.panel.getByRole('heading', { name: 'Sketch', exact: true })).toBeVisible();
    expect(await top()).toBe(40);
  });
});

test.describe('on a phone', () => {
  test.use({ viewport: { width: 390, height: 844 }, hasTouch: true, isMobile: true });

  test('the bar is one row of 44 px with a single position, and everything left out is in a sheet', async ({
    app,
    page,
  }) => {
    await app.open();
    const shelf = await app.openShelf();
    for (const name of ['Save as a file', 'Copy a link', 'Open a file…', 'New empty sketch'])
      await expect(shelf.getByRole('button', { name })).toBeVisible();
    await shelf.getByRole('button', { name: 'Chute scanner expander' }).click();
    await expect(shelf).toBeHidden();

    const bar = page.getByRole('banner');
    expect((await bar.boundingBox())?.height).toBeLessThanOrEqual(45);
    for (const name of ['Undo', 'Redo', 'Change the theme: system, paper, night', 'Help'])
      await expect(bar.getByRole('button', { name })).toBeInViewport({ ratio: 1 });
    await expect(app.saveMark).toBeInViewport();

    const panels = page.getByRole('navigation', { name: 'Panels' });
    await panels.getByRole('button', { name: 'Sketch' }).click();
    const sheet = page.getByRole('dialog', { name: 'Sketch' });
    await sheet.getByRole('button', { name: 'Zoom and focus positions' }).click();
    await sheet.getByRole('button', { name: 'Add position' }).click();
    await expect(page.getByRole('slider', { name: 'Scrubber' })).toBeVisible();
    expect((await bar.boundingBox())?.height).toBeGreaterThan(80);
  });

  test('no sheet says its title twice, and a number left open lines up with the others', async ({
    app,
    page,
  }) => {
    await app.open();
    const panels = page.getByRole('navigation', { name: 'Panels' });
    for (const name of ['Readouts', 'Sketch', 'Warnings']) {
      await panels.getByRole('button', { name }).click();
      await expect(page.getByRole('dialog', { name }).getByText(name, { exact: true })).toHaveCount(1);
    }
    await grip(page, 'part:p3').tap({ force: true });
    await panels.getByRole('button', { name: 'Part' }).click();
    const sheet = page.getByRole('dialog', { name: 'Selected part' });
    const right = async (label: string) => {
      const box = await sheet.getByRole('textbox', { name: label, exact: true }).boundingBox();
      return (box?.x ?? 0) + (box?.width ?? 0);
    };
    expect(await right('Clear diameter')).toBeCloseTo(await right('Gap behind'), 0);
    const name = await sheet.getByRole('textbox', { name: 'Name', exact: true }).boundingBox();
    expect(name?.width, 'a text has the whole width').toBeGreaterThan(340);
  });
});
