import { writeFile } from 'node:fs/promises';
import { type Page, test } from '@playwright/test';

/** Chromium's own file picker cannot be driven; without it the app asks with a file input, as other browsers do. */
export const withoutPickers = (page: Page) =>
  page.addInitScript(() => {
    Reflect.deleteProperty(window, 'showOpenFilePicker');
    Reflect.deleteProperty(window, 'showSaveFilePicker');
  });

/** Opens a real file of that name. Large ones are slow to hand over in any other way. */
export async function openFile(page: Page, name: string, text: string): Promise<void> {
  const path = test.info().outputPath(name);
  await writeFile(path, text);
  const [chooser] = await Promise.all([
    page.waitForEvent('filechooser'),
    page.getByRole('button', { name: 'Open', exact: true }).click(),
  ]);
  await chooser.setFiles(path);
}
