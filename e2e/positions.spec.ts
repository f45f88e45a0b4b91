import { formatLength } from '../app/ui/format.ts';
import { type App, expect, test } from './support/app.ts';
import { analysisAt, DEMO } from './support/engine.ts';
import { middleOf, numberAt } from './support/hand.ts';

/** What the panel shows at each of the three positions, worked out by the engine. */
const SHOWN = DEMO.positions.map(({ name }, index) => {
  const { firstOrder, conjugates } = analysisAt(DEMO, index);
  if (!firstOrder.focalLengthMm.ok || !conjugates.magnification.ok) throw new Error('the demo has no image');
  return {
    title: `${name[0]?.toUpperCase()}${name.slice(1)} position`,
    f: `${formatLength(firstOrder.focalLengthMm.value, 'mm')}mm`,
    m: ['−0.0500', '−0.0800', '−0.1200'][index] ?? '',
  };
});

const expectPosition = async (app: App, index: number) => {
  const { title, f, m } = SHOWN[index]!;
  await expect(app.page.getByRole('heading', { name: title })).toBeVisible();
  await expect(app.readout('Focal length')).toHaveText(f);
  await expect(app.strip('m')).toHaveText(m);
};

test('the positions are stepped through by their stops, by the thumb and by keys', async ({ app, page }) => {
  await app.open();
  await expectPosition(app, 0);
  await page.getByRole('button', { name: 'Go to narrow' }).click();
  await expectPosition(app, 2);

  const thumb = page.getByRole('slider', { name: 'Scrubber' });
  await thumb.press('Home');
  await expectPosition(app, 0);
  await thumb.press('PageUp');
  await expectPosition(app, 1);
  await thumb.press('3');
  await expectPosition(app, 2);

  await app.board.focus();
  for (const [key, index] of [
    ['2', 1],
    ['1', 0],
    ['3', 2],
  ] as const) {
    await page.keyboard.press(key);
    await expectPosition(app, index);
  }
});

test('between two positions the screen says so, offers to add one, and stores nothing', async ({
  app,
  page,
}) => {
  await app.open();
  const stops = await Promise.all(
    ['wide', 'middle'].map((name) => middleOf(page.getByRole('button', { name: `Go to ${name}` }))),
  );
  const thumb = page.getByRole('slider', { name: 'Scrubber' });
  await expect(page.getByText('between', { exact: true })).toBeHidden();

  const seen = new Set<string>();
  await app.hand.press(await middleOf(thumb));
  await app.hand.move({ dx: (stops[1]!.x - stops[0]!.x) / 2, steps: 6 }, async () => {
    seen.add((await app.readout('Focal length').textContent()) ?? '');
  });
  await app.hand.release();
  expect(seen.size).toBeGreaterThanOrEqual(5);
  await expect(page.getByText('between', { exact: true })).toBeVisible();
  await expect(page.getByRole('heading', { name: 'Between wide and middle' })).toBeVisible();
  const gap = await numberAt(page, 'cell:gap:p1');
  expect(gap).toBeGreaterThan(26.3);
  expect(gap).toBeLessThan(41.2);

  // What is stored for each position cannot be changed here: a drag says so and changes nothing.
  await app.hand.drag('cell:gap:p1', { dx: 30 });
  await expect(app.messages).toContainText(
    'Between positions nothing is stored here: add a position, or go to one.',
  );
  expect(await numberAt(page, 'cell:gap:p1')).toBe(gap);
  await expect(page.getByRole('button', { name: 'Undo' })).toBeDisabled();

  const f = (await app.readout('Focal length').textContent()) ?? '';
  await page.getByRole('button', { name: 'Add position here' }).click();
  await expect(page.getByText('between', { exact: true })).toBeHidden();
  await expect(page.getByRole('heading', { name: 'Position 4' })).toBeVisible();
  await expect(app.readout('Focal length')).toHaveText(f);
  await expect(page.getByRole('button', { name: /^Go to/ })).toHaveCount(4);
  await page.getByRole('button', { name: 'Undo' }).click();
  await expect(page.getByRole('button', { name: /^Go to/ })).toHaveCount(3);
});

test('a gap is common to all positions until its mark is pressed', async ({ app, page }) => {
  await app.open();
  await app.hand.clickGrip('part:p4');
  const mark = app.panel.getByRole('button', { name: /^Sensor behind is the same at all positions/ });
  await expect(mark).toHaveText('= all');
  await app.type('Sensor behind', '26.5');
  await page.getByRole('button', { name: 'Go to middle' }).click();
  await expect(app.field('Sensor behind')).toHaveValue('26.500');

  await mark.click();
  await expect(app.panel.getByRole('button', { name: /^Sensor behind has its own value/ })).toHaveText(
    'each',
  );
  await app.type('Sensor behind', '+0.25');
  await app.field('Sensor behind').blur();
  await expect(app.field('Sensor behind')).toHaveValue('26.750');
  await page.getByRole('button', { name: 'Go to narrow' }).click();
  await expect(app.field('Sensor behind')).toHaveValue('26.500');
});
