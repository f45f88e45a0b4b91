import { type App, expect, test } from './support/app.ts';
import { DEMO, sketchText } from './support/engine.ts';
import { openFile, withoutPickers } from './support/files.ts';

interface BadFile {
  readonly name: string;
  readonly text: string;
  /** What the person reads about it. */
  readonly says: string;
}

const demo = (): Record<string, unknown> => JSON.parse(sketchText('inspection-zoom.json'));
const changed = (change: object): string => JSON.stringify({ ...demo(), ...change });
const [first, ...others] = DEMO.parts;
const NONSENSE = 'lorem ipsum '.repeat(900_000);

const BAD_FILES: readonly BadFile[] = [
  {
    name: 'broken.json',
    text: sketchText('inspection-zoom.json').slice(0, 400),
    says: 'The text is not JSON',
  },
  {
    name: 'later.json',
    text: changed({ version: 7 }),
    says: 'The file is of version 7; this Gapwright reads version 2.',
  },
  { name: 'unknown.json', text: changed({ zoomMotor: 3 }), says: 'The entry “zoomMotor” is unknown' },
  { name: 'nonsense.json', text: NONSENSE, says: 'MB; a sketch file is at most 5 MB.' },
  {
    name: 'far.json',
    text: changed({ parts: [{ ...first, space: { lengthMm: 1e300, medium: 'air' } }, ...others] }),
    says: 'The gap behind “first group” is 1e300 mm; it must be between −1,000,000 and 1,000,000 mm.',
  },
  {
    name: 'many.json',
    text: changed({ parts: Array.from({ length: 500 }, (_, i) => ({ ...others[2], id: `p${i}` })) }),
    says: 'The list “parts” has 500 entries; it must have at most 200.',
  },
  {
    name: 'flat.json',
    text: changed({ parts: [{ ...first, focalLengthMm: 0 }, ...others] }),
    says: 'The focal length of “first group” is 0 mm; it must be a number other than zero',
  },
];

const expectDemo = async (app: App) => {
  await expect(app.page.getByTitle('Seed line camera: sketches on the shelf')).toBeVisible();
  await expect(app.readout('Focal length')).toHaveText('25.748mm');
};

test('files that hold no sketch are refused with a sentence, and the last sketch stays', async ({
  app,
  page,
}) => {
  await withoutPickers(page);
  await app.open();
  for (const { name, text, says } of BAD_FILES) {
    await openFile(page, name, text);
    const dialog = page.getByRole('dialog', { name: `“${name}” cannot be opened` });
    const said = dialog.or(app.messages.getByRole('alert').filter({ hasText: name }));
    await expect(said, name).toContainText(says);
    if (await dialog.isVisible()) {
      await expect(dialog).toContainText('The sketch that was open is still open, as it was.');
      await dialog.getByRole('button', { name: 'Close', exact: true }).click();
    } else await app.messages.getByRole('button', { name: 'Dismiss the message' }).click();
    await expectDemo(app);
  }

  await openFile(page, 'good.json', changed({ title: 'A good one' }));
  await expect(page.getByTitle('A good one: sketches on the shelf')).toBeVisible();
  await expect(app.readout('Focal length')).toHaveText('25.748mm');
});

test('a file dropped on the window opens, or says why not', async ({ app, page }) => {
  const drop = (name: string, text: string) =>
    page.evaluate(
      ([fileName, content]) => {
        const dataTransfer = new DataTransfer();
        dataTransfer.items.add(new File([content ?? ''], fileName ?? ''));
        document.body.dispatchEvent(new DragEvent('drop', { dataTransfer, bubbles: true, cancelable: true }));
      },
      [name, text],
    );
  await app.open();
  await drop('dropped.json', '{"format": "something else"}');
  const dialog = page.getByRole('dialog', { name: '“dropped.json” cannot be opened' });
  await expect(dialog).toContainText(/gapwright-sketch/);
  await page.keyboard.press('Escape');
  await expectDemo(app);
  await drop('dropped.json', changed({ title: 'Dropped' }));
  await expect(page.getByTitle('Dropped: sketches on the shelf')).toBeVisible();
});

test('what cannot be taken from the keyboard is explained beside the field and changes nothing', async ({
  app,
  page,
}) => {
  await app.open();
  const refused = async (label: string, typed: string, says: RegExp, stays: string) => {
    await app.type(label, typed);
    await expect(app.refusal(label), `${label} ${typed}`).toContainText(says);
    await page.keyboard.press('Escape');
    await app.field(label).blur();
    await expect(app.field(label)).toHaveValue(stays);
    await expect(page.getByRole('button', { name: 'Undo' })).toBeDisabled();
  };
  await refused('Object in front', 'five hundred', /“five hundred” is not a number/, '500.000');
  await refused('Object in front', '-20', /object distance .*above 0/i, '500.000');
  await refused('Object in front', '1/0', /divided by zero/, '500.000');
  await refused('f-number', '0', /f-number.*above 0/i, '5.600');
  await app.hand.clickGrip('part:p2');
  await refused('Focal length', '0', /focal length.* 0 mm.*other than zero/i, '28.000');
  await refused('Gap behind', '1e300', /gap.*1,000,000 mm/i, '16.512');
  await refused('Stop diameter', '0', /stop diameter.*above 0/i, '10.583');
  await page.keyboard.press('Escape');
  await app.hand.clickGrip('cell:gap:p1');
  const entry = page.locator('.type-box');
  await entry.getByRole('textbox').fill('1e300');
  await entry.getByRole('textbox').press('Enter');
  await expect(entry.getByRole('alert')).toContainText(/gap.*1,000,000 mm/i);
  await page.keyboard.press('Escape');
  await expect(entry).toBeHidden();
  await expectDemo(app);

  // The last refusal is about a kind of field that is chosen first; choosing it is a step of its own.
  await page.keyboard.press('Escape');
  await app.panel.getByLabel('Field by').selectOption('half angle');
  const angle = await app.field('Half angle').inputValue();
  await app.type('Half angle', '90');
  await expect(app.refusal('Half angle')).toContainText(/field angle.*90°.*not including, 90°/);
  await page.keyboard.press('Escape');
  await app.field('Half angle').blur();
  await expect(app.field('Half angle')).toHaveValue(angle);
});

test('a browser that forbids storage, or has it full, says “not saved” and why', async ({ app, page }) => {
  await page.addInitScript(() => {
    Object.defineProperty(window, 'indexedDB', {
      get: () => {
        throw new DOMException('forbidden', 'SecurityError');
      },
    });
  });
  await app.open();
  await app.hand.drag('part:p2', { dx: 30 });
  await expect(app.saveMark).toContainText('not saved: This browser forbids storage here');
  await expect(app.readout('Focal length')).not.toHaveText('25.748mm');
});

test('storage that is full is told, and work goes on', async ({ app, page }) => {
  await page.addInitScript(() => {
    IDBObjectStore.prototype.put = () => {
      throw new DOMException('full', 'QuotaExceededError');
    };
  });
  await app.open();
  await app.hand.drag('part:p2', { dx: 30 });
  await expect(app.saveMark).toContainText("not saved: This browser's storage is full");
  await page.getByRole('button', { name: 'Undo' }).click();
  await expectDemo(app);
});

test('a refused clipboard leaves the text to be copied by hand', async ({ app, page }) => {
  await page.addInitScript(() => {
    const refuse = () => Promise.reject(new DOMException('refused', 'NotAllowedError'));
    Object.assign(navigator.clipboard, { writeText: refuse, readText: refuse });
  });
  await app.open();
  await page.getByRole('button', { name: 'Hand over', exact: true }).click();
  const sheet = page.getByRole('dialog', { name: 'Hand over' });
  await sheet.getByRole('button', { name: 'Copy as TSV, for pasting' }).click();
  await expect(sheet.getByRole('alert')).toContainText('The browser did not allow copying');
  await expect(sheet.getByRole('textbox', { name: 'Text to copy' })).toHaveValue(/26\.272/);
});
