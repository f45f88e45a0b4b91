import { type App, expect, test } from './support/app.ts';
import { drawn } from './support/hand.ts';

/** Everything that the person sees of the sketch: the numbers of the drawing's grips and of the panel. */
async function seen({ page }: App): Promise<string> {
  await drawn(page);
  return page.evaluate(() => {
    const grips = [...document.querySelectorAll('[data-grip]')].map(
      (slider) => `${slider.getAttribute('aria-label')}: ${slider.getAttribute('aria-valuetext')}`,
    );
    const readouts = [...document.querySelectorAll('.side .readout, .side .strip')];
    return [...grips, ...readouts.map(({ textContent }) => textContent)].join('\n');
  });
}

test('everything can be undone to the empty sheet and redone', async ({ app, page }) => {
  await app.openEmpty();
  const undo = page.getByRole('button', { name: 'Undo' });
  const redo = page.getByRole('button', { name: 'Redo' });
  await expect(undo).toBeDisabled();
  // What is selected is no part of the history: between the looks nothing is.
  const look = async () => {
    await app.board.press('Escape');
    return seen(app);
  };
  const looks = [await look()];
  const step = async (work: () => Promise<unknown>) => {
    await work();
    looks.push(await look());
    expect(looks.at(-1), 'each step shows').not.toBe(looks.at(-2));
  };

  await step(async () => {
    await app.dragFromTray('negative');
    await page.keyboard.press('Escape');
  });
  await step(async () => {
    await app.dragFromTray('positive', { part: 'part:p1', px: 120 });
    await page.keyboard.press('Escape');
  });
  await step(async () => {
    await app.hand.clickGrip('part:p2');
    await app.type('Focal length', '28');
  });
  await step(() => app.hand.drag('part:p2', { dx: 30 }));
  await step(async () => {
    await app.hand.clickGrip('cell:gap:p1');
    await app.typeOnDrawing('41-1.5');
  });
  await step(() => app.type('Object in front', '500'));
  await step(() => app.dragFromTray('stop', { part: 'part:p2', px: -30 }));
  await step(() => page.getByRole('button', { name: '+ position' }).click());
  await step(async () => {
    await app.hand.clickGrip('part:p1');
    await page.keyboard.press('d');
  });
  await step(async () => {
    await app.hand.clickGrip('part:p2');
    await page.keyboard.press('Delete');
  });

  for (let index = looks.length - 2; index >= 0; index--) {
    await undo.click();
    expect(await look(), `after ${looks.length - 1 - index} steps back`).toBe(looks[index]);
  }
  await expect(undo).toBeDisabled();
  await expect(app.panel.getByText('nothing on the axis yet', { exact: true })).toBeVisible();
  for (let index = 1; index < looks.length; index++) {
    await redo.click();
    expect(await look(), `after ${index} steps forward`).toBe(looks[index]);
  }
  await expect(redo).toBeDisabled();
});
