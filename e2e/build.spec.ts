import type { Page } from '@playwright/test';
import { type App, expect, test } from './support/app.ts';
import { DEMO } from './support/engine.ts';
import { grip } from './support/hand.ts';

const GROUPS = [
  { kind: 'negative', focalLength: '-32' },
  { kind: 'positive', focalLength: '28' },
  { kind: 'negative', focalLength: '−46' },
  { kind: 'positive', focalLength: '48' },
] as const;

/** The three gaps of a position with all their digits, as the demo file has them. */
const GAPS = DEMO.positions.map(({ id }) =>
  DEMO.parts.slice(0, 3).map(({ space: { lengthMm } }) => {
    if (typeof lengthMm === 'number') throw new Error('the demo has common gaps between its groups');
    return String(lengthMm[id]);
  }),
);

const EXPECTED = [
  { name: 'Wide', f: '25.748', back: '24.713', stop: '10.583', m: '−0.0500' },
  { name: 'Middle', f: '41.198', back: '22.704', stop: '13.383', m: '−0.0800' },
  { name: 'Narrow', f: '61.289', back: '18.645', stop: '16.394', m: '−0.1200' },
] as const;

test('the inspection camera is built from an empty sketch by dragging and typing', async ({ app, page }) => {
  await app.openEmpty();
  await expect(app.readout('Focal length')).toHaveCount(0);

  for (const [index, { kind, focalLength }] of GROUPS.entries()) {
    await app.dragFromTray(kind, index === 0 ? undefined : { part: `part:p${index}`, px: 60 });
    await app.typeOnDrawing(focalLength);
  }
  await expect(page.locator('[data-grip^="part:"]')).toHaveCount(4);

  // A gap is typed where it stands, under the drawing.
  for (const [index, gap] of (GAPS[0] ?? []).entries()) {
    await app.hand.clickGrip(`cell:gap:p${index + 1}`);
    await app.typeOnDrawing(gap);
  }
  await page.keyboard.press('Escape');
  await page.keyboard.press('Escape');
  await app.type('Object in front', '500');
  await app.panel.getByLabel('Sensor size').selectOption('width × height');
  await app.type('Image behind', '26');
  await app.type('Sensor width', '8.8');
  await app.type('Sensor height', '6.6');
  await app.panel.getByLabel('Aperture by').selectOption('working f-number');
  await app.type('f-number', '5.6');
  await app.panel.getByLabel('Field by').selectOption('image height');
  await app.type('Image height', '5.5');

  await app.hand.clickGrip('part:p2');
  await app.panel.getByRole('button', { name: 'Let the stop ride on it' }).click();
  await expect(app.panel.getByText('The stop rides on it, in front of its refraction.')).toBeVisible();

  await nameThePositions(page);
  await splitTheGaps(app);
  for (const [position, gaps] of GAPS.entries()) {
    await page.getByRole('button', { name: new RegExp(`^Go to ${EXPECTED[position]?.name}`, 'i') }).click();
    for (const [index, gap] of gaps.entries()) {
      await app.hand.clickGrip(`cell:gap:p${index + 1}`);
      await app.typeOnDrawing(gap);
    }
  }

  for (const { name, f, back, stop, m } of EXPECTED) {
    await page.getByRole('button', { name: new RegExp(`^Go to ${name}`, 'i') }).click();
    await expect(page.getByRole('heading', { name: `${name} position` })).toBeVisible();
    await expect(app.readout('Focal length')).toHaveText(`${f}mm`);
    await expect(app.readout('Back focus')).toHaveText(`${back}mm`);
    await expect(app.readout('Stop diameter')).toHaveText(`${stop}mm`);
    await expect(app.readout('Magnification')).toHaveText(`${m}×`);
    await expect(app.readout('Defocus')).toHaveText('0.000mm');
    await expect(app.readout('Track')).toHaveText('110.000mm');
    if (name !== 'Middle') continue;
    await expect(app.readout('Entrance, behind first')).toHaveText('14.427mm');
    await expect(app.readout('Entrance diameter')).toHaveText('7.349mm');
  }
  await expect(app.strip('f')).toHaveText('61.289 mm');
  await expect(grip(page, 'part:p4')).toHaveAttribute('aria-valuetext', /84\.000 mm behind the first part$/);
  await expect(app.panel.getByRole('button', { name: 'no warnings' })).toBeVisible();
});

async function nameThePositions(page: Page): Promise<void> {
  const add = page.getByRole('button', { name: '+ position' });
  await add.click();
  await add.click();
  await page.getByRole('button', { name: 'Positions', exact: true }).click();
  for (const [index, { name }] of EXPECTED.entries()) {
    const field = page.getByRole('textbox', { name: `Name of position ${index + 1}` });
    await field.fill(name.toLowerCase());
    await field.press('Enter');
  }
  await page.keyboard.press('Escape');
}

async function splitTheGaps(app: App): Promise<void> {
  for (const id of ['p1', 'p2', 'p3']) {
    await app.hand.clickGrip(`part:${id}`);
    await app.panel.getByRole('button', { name: /^Gap behind is the same at all positions/ }).click();
  }
}
