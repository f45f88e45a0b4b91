import type { GlassPart, GlassSurface, Part, PartId, Sketch } from '../engine/index.ts';
import { emptySketch, newGlass, newStop, writeSketch } from '../engine/index.ts';
import { expect, test } from './support/app.ts';
import { linesIn, recorded } from './support/board.ts';
import { sketchIn, sketchText } from './support/engine.ts';
import { openFile, withoutPickers } from './support/files.ts';

const RELAY = sketchIn(sketchText('chute-relay-in-glass.json'));
const [lens, ...others] = RELAY.parts as [GlassPart, ...Sketch['parts']];

const withLens = (change: Partial<GlassPart>): Sketch => ({
  ...RELAY,
  parts: [{ ...lens, ...change }, ...others],
});
const withFront = (change: Partial<GlassSurface>): Sketch =>
  withLens({ surfaces: lens.surfaces.map((one, k) => (k === 0 ? { ...one, ...change } : one)) });
const filled = (material: object): Sketch =>
  withLens({ fillings: lens.fillings.map((one) => ({ ...one, material }) as GlassPart['fillings'][number]) });

const LOST = /no exact ray/i;

/** A ball far behind its stop: rays at 60° pass it by. */
function passedBy(): Sketch {
  const stop: Part = { ...newStop('p1' as PartId), space: { lengthMm: 20, medium: 'air' } };
  const ball = { ...newGlass(5, 10, 'p2' as PartId), space: { lengthMm: 5, medium: 'air' as const } };
  return {
    ...emptySketch(),
    parts: [stop, ball],
    stop: stop.id,
    aperture: { kind: 'stopDiameter', diameterMm: 2 },
    field: { size: { kind: 'angle', angleDeg: 60 }, fractions: [1], vignetting: 0 },
  };
}

/** What is drawn as far as it exists, and what is said about it. */
const DRAWN: readonly { readonly name: string; readonly sketch: Sketch; readonly says: RegExp }[] = [
  { name: 'radius smaller than the rim', sketch: withFront({ radiusMm: 9 }), says: /chute lens/i },
  {
    name: 'surfaces that cross',
    sketch: withLens({ fillings: lens.fillings.map((one) => ({ ...one, thicknessMm: 0.2 })) }),
    says: /of chute lens cross/i,
  },
  { name: 'a conic beyond its edge', sketch: withFront({ conic: 60 }), says: /chute lens/i },
  { name: 'coefficients that make the sag wild', sketch: withFront({ asphere: [1] }), says: /chute lens/i },
  { name: 'every ray of a field is lost', sketch: passedBy(), says: LOST },
];

const REFUSED: readonly { readonly name: string; readonly sketch: Sketch; readonly says: RegExp }[] = [
  {
    name: 'unknown glass',
    sketch: filled({ material: 'n-xx99' }),
    says: /The material is “n-xx99”; it must be/,
  },
  {
    name: 'index below 1',
    sketch: filled({ name: 'odd', index: 0.5, abbeNumber: null }),
    says: /The index of .* is 0\.5; it must be between 1 and 5\./,
  },
  {
    name: 'wavelength outside the range',
    sketch: { ...RELAY, lines: { ...RELAY.lines, longNm: 5000 } },
    says: /The long wavelength is 5000 nm; it must be between .*N-/,
  },
];

const fileOf = (name: string): string => `${name.replaceAll(' ', '-')}.json`;

test('glass that cannot be is drawn as far as it exists, with a sentence, and no number is none', async ({
  app,
  page,
}) => {
  const errors: string[] = [];
  page.on('pageerror', (error) => errors.push(error.message));
  await withoutPickers(page);
  await app.open();
  for (const { name, sketch, says } of DRAWN) {
    await openFile(page, fileOf(name), writeSketch({ ...sketch, title: name }));
    await expect(page.getByTitle(`${name}: sketches on the shelf`)).toBeVisible();
    await expect(app.panel.locator('#warnings'), name).toContainText(says);
    const marks = await recorded(page);
    expect(linesIn(marks, 'marginal ray').length, name).toBeGreaterThan(0);
    expect(JSON.stringify(marks), name).not.toMatch(/NaN|null|Infinity/);
    for (const tab of ['Fans', 'Wavefront', 'Spots', 'Field', 'Contrast', 'Colour', 'Sums']) {
      await page.getByRole('tab', { name: tab, exact: true }).click();
      await expect(page.locator('.plots'), `${name}, ${tab}`).toBeVisible();
      expect(await page.locator('body').textContent(), `${name}, ${tab}`).not.toMatch(
        /NaN|Infinity|undefined/,
      );
    }
  }
  expect(errors).toEqual([]);
});

test('glass that is unknown or has no index is refused with a sentence', async ({ app, page }) => {
  await withoutPickers(page);
  await app.open();
  for (const { name, sketch, says } of REFUSED) {
    await openFile(page, fileOf(name), writeSketch(sketch));
    const dialog = page.getByRole('dialog');
    await expect(dialog, name).toContainText(says);
    await dialog.getByRole('button', { name: 'Close', exact: true }).click();
  }
});
