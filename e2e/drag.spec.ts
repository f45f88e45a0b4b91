import { formatLength } from '../app/ui/format.ts';
import type { PartId, Sketch } from '../engine/index.ts';
import { analyse, moveParts, settingAt } from '../engine/index.ts';
import { type App, expect, test } from './support/app.ts';
import { endOf, linesIn, recorded, textsIn } from './support/board.ts';
import { DEMO } from './support/engine.ts';
import { grip, middleOf, numberAt } from './support/hand.ts';

/** Coordinates are recorded to a thousandth of a px; grips stand at tenths. */
const RECORDED_PX = 0.06;
const WIDE = DEMO.positions[0]!.id;
const SECOND = 'p2' as PartId;

test.beforeEach(async ({ app }) => {
  await app.open();
});

test('readouts follow a dragged part, and every ray ends on the sensor', async ({ app, page }) => {
  const focalLength = app.readout('Focal length');
  const seen = new Set<string>();
  await app.hand.pressGrip('part:p2', 40);
  await app.hand.move({ dx: 96, steps: 12 }, async () => {
    seen.add((await focalLength.textContent()) ?? '');
    expect(await endsOffSensor(app), 'ends that are not on the sensor').toEqual([]);
  });

  expect(seen.size, 'distinct focal lengths while the button is down').toBeGreaterThanOrEqual(5);
  const place = Number(await grip(page, 'part:p2').getAttribute('aria-valuenow'));
  const expected = focalLengthOf(moveParts(DEMO, [SECOND], place - 41.2187245423499, WIDE, 'neighbours'));
  await expect(focalLength).toHaveText(`${formatLength(expected, 'mm')}mm`);
  await app.hand.release();
  await expect(focalLength).toHaveText(`${formatLength(expected, 'mm')}mm`);
});

test('while the image follows the focus, the marginal rays meet on the axis at every step', async ({
  app,
  page,
}) => {
  await app.panel.getByRole('button', { name: 'Follow focus' }).click();
  const track = app.readout('Track');
  const seen = new Set<string>();
  await app.hand.pressGrip('part:p2', 40);
  await app.hand.move({ dx: -60, steps: 8 }, async () => {
    seen.add((await track.textContent()) ?? '');
    const [axis, image] = await Promise.all([axisPx(app), middleOf(grip(page, 'image'))]);
    const board = await middleOfBoard(app);
    for (const end of linesIn(await recorded(page), 'marginal ray').map(endOf)) {
      expect(Math.abs(end.y - axis)).toBeLessThan(RECORDED_PX);
      expect(Math.abs(end.x + board.left - image.x)).toBeLessThan(RECORDED_PX);
    }
  });
  expect(seen.size).toBeGreaterThanOrEqual(5);
  await app.hand.release();
});

test('one drag is one step of undo', async ({ app, page }) => {
  const before = await app.readout('Focal length').textContent();
  const undo = page.getByRole('button', { name: 'Undo' });
  await expect(undo).toBeDisabled();
  await app.hand.pressGrip('part:p3', 40);
  await app.hand.move({ dx: 70, steps: 9 });
  await app.hand.release();
  const after = await app.readout('Focal length').textContent();
  expect(after).not.toBe(before);

  await undo.click();
  await expect(app.readout('Focal length')).toHaveText(before ?? '');
  await expect(undo).toBeDisabled();
  await page.getByRole('button', { name: 'Redo' }).click();
  await expect(app.readout('Focal length')).toHaveText(after ?? '');
});

for (const keys of ['Escape', 'Control+z']) {
  test(`${keys} while the button is down gives up the drag and nothing else`, async ({ app, page }) => {
    await app.hand.drag('part:p1', { dx: 20 });
    const before = await app.readout('Focal length').textContent();
    await app.hand.pressGrip('part:p3', 40);
    await app.hand.move({ dx: 50 });
    await expect(app.readout('Focal length')).not.toHaveText(before ?? '');

    await page.keyboard.press(keys);
    await expect(app.readout('Focal length')).toHaveText(before ?? '');
    await app.hand.move({ dx: 30 });
    await expect(app.readout('Focal length')).toHaveText(before ?? '');
    await app.hand.release();
    await expect(app.readout('Focal length')).toHaveText(before ?? '');

    await page.getByRole('button', { name: 'Undo' }).click();
    await expect(app.readout('Focal length')).toHaveText('25.748mm');
    await expect(page.getByRole('button', { name: 'Undo' })).toBeDisabled();
  });
}

test('a moved part keeps its neighbours; with Shift what is behind moves along', async ({ app, page }) => {
  const gaps = () => Promise.all(['gap:p1', 'gap:p2', 'gap:p3'].map((id) => numberAt(page, `cell:${id}`)));
  const [first, second, third] = await gaps();
  await app.hand.pressGrip('part:p2', 40);
  await app.hand.move({ dx: -47 });
  const [kept1, kept2, kept3] = await gaps();
  expect(kept1! + kept2!).toBeCloseTo(first! + second!, 9);
  expect(kept1!).toBeLessThan(first! - 1);
  expect(kept3).toBeCloseTo(third!, 9);

  // Pressed half-way, Shift makes the same movement anew by the other rule.
  await page.keyboard.down('Shift');
  await expect.poll(() => numberAt(page, 'cell:gap:p2')).toBeCloseTo(second!, 9);
  const [carried1, , carried3] = await gaps();
  expect(carried1).toBeCloseTo(kept1!, 9);
  expect(carried3).toBeCloseTo(third!, 9);
  await page.keyboard.up('Shift');
  await expect.poll(() => numberAt(page, 'cell:gap:p2')).toBeCloseTo(kept2!, 9);
  await app.hand.release();
});

test('Alt goes finely: a tenth of the motion', async ({ app, page }) => {
  const before = await numberAt(page, 'part:p2');
  await app.hand.pressGrip('part:p2', 40);
  await page.keyboard.down('Alt');
  await app.hand.move({ dx: 100 });
  const fine = (await numberAt(page, 'part:p2')) - before;
  await app.hand.release();
  await page.keyboard.up('Alt');
  await page.getByRole('button', { name: 'Undo' }).click();

  await app.hand.pressGrip('part:p2', 40);
  await app.hand.move({ dx: -100 });
  const plain = (await numberAt(page, 'part:p2')) - before;
  await app.hand.release();
  expect(fine / -plain).toBeGreaterThan(0.09);
  expect(fine / -plain).toBeLessThan(0.11);
});

test('a drag is caught at a focal plane of another part, and the drawing names it', async ({ app, page }) => {
  const rearFocusOfSecond = 41.2187245423499 + 28;
  const pxPerMm = await scaleOf(app);
  const third = await numberAt(page, 'part:p3');
  await app.hand.pressGrip('part:p3', 40);
  await app.hand.move({ dx: (rearFocusOfSecond - third) * pxPerMm - 4 });
  await expect(grip(page, 'part:p3')).toHaveAttribute('aria-valuetext', /69\.219 mm behind the first part$/);
  expect(textsIn(await recorded(page))).toContain('rear focus of second group');

  await page.keyboard.down('Alt');
  await expect(grip(page, 'part:p3')).not.toHaveAttribute('aria-valuetext', /69\.219 mm/);
  expect(textsIn(await recorded(page))).not.toContain('rear focus of second group');
  await page.keyboard.up('Alt');
  await app.hand.release();
});

test('focal point, rim, stop edge, object, sensor, field and ribbon value can be dragged', async ({
  app,
  page,
}) => {
  const change = async (id: string, way: { dx: number; dy?: number }) => {
    const before = await numberAt(page, id);
    await app.hand.drag(id, way);
    const after = await numberAt(page, id);
    await page.getByRole('button', { name: 'Undo' }).click();
    await expect(grip(page, id)).toHaveAttribute('aria-valuenow', String(before));
    await expect(page.getByRole('button', { name: 'Undo' })).toBeDisabled();
    return after - before;
  };
  await app.hand.clickGrip('part:p2');
  expect(await change('focal:p2:rear', { dx: 30 })).toBeGreaterThan(1);
  expect(await change('rim:p2:lower', { dx: 0, dy: 25 })).toBeGreaterThan(0.5);
  expect(await change('stop:upper', { dx: 0, dy: 30 })).toBeLessThan(-1);
  expect(await change('object:foot', { dx: -25 })).toBeGreaterThan(1);
  expect(await change('field:end', { dx: 0, dy: 20 })).toBeLessThan(-0.5);
  expect(await change('image', { dx: 25 })).toBeGreaterThan(1);
  expect(await change('cell:gap:p3', { dx: -30 })).toBeLessThan(-1);
});

const focalLengthOf = (sketch: Sketch): number => {
  const { focalLengthMm } = analyse(sketch, settingAt(WIDE)).firstOrder;
  return focalLengthMm.ok ? focalLengthMm.value : Number.NaN;
};

async function middleOfBoard(app: App): Promise<{ left: number; top: number }> {
  const box = await app.board.boundingBox();
  return { left: box?.x ?? 0, top: box?.y ?? 0 };
}

/** The axis in px of the board: the grip of any part stands on it. */
async function axisPx(app: App): Promise<number> {
  return (await middleOf(grip(app.page, 'part:p1'))).y - (await middleOfBoard(app)).top;
}

async function scaleOf(app: App): Promise<number> {
  const [first, last] = await Promise.all(['p1', 'p4'].map((id) => middleOf(grip(app.page, `part:${id}`))));
  return (last!.x - first!.x) / (await numberAt(app.page, 'part:p4'));
}

/** The ends of rays, in px of the board, that are not in the line of the sensor. */
async function endsOffSensor(app: App) {
  const sensor = (await middleOf(grip(app.page, 'image'))).x - (await middleOfBoard(app)).left;
  const marks = await recorded(app.page);
  const rays = (['marginal ray', 'chief ray', 'axial bundle', 'field outer bundle'] as const).flatMap(
    (style) => linesIn(marks, style).filter((line) => line.length > 0),
  );
  expect(rays.length).toBeGreaterThan(10);
  return rays.map(endOf).filter((end) => Math.abs(end.x - sensor) > RECORDED_PX);
}
