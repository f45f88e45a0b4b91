import { test as base, expect, type Locator, type Page } from '@playwright/test';
import type { TrayKind } from '../../app/store/viewStore.ts';
import { drawn, grip, Hand, middleOf } from './hand.ts';

/** The page as a person reads it: everything by role and visible text. */
export class App {
  readonly page: Page;
  readonly hand: Hand;

  constructor(page: Page) {
    this.page = page;
    this.hand = new Hand(page);
  }

  get board(): Locator {
    return this.page.getByRole('region', { name: 'Drawing and ribbon' });
  }

  get panel(): Locator {
    return this.page.getByRole('complementary', { name: 'Panel' });
  }

  get messages(): Locator {
    return this.page.getByRole('region', { name: 'Messages' });
  }

  get saveMark(): Locator {
    return this.page.getByRole('banner').getByRole('status');
  }

  /** Opens the app as it is on a first visit: with the demo, its drawing drawn. */
  async open(path = '/'): Promise<void> {
    await this.page.goto(path);
    await this.page.locator('[data-grip^="cell:"]').first().waitFor({ state: 'attached' });
  }

  /** Opens the app and leaves the demo for an empty sketch. */
  async openEmpty(): Promise<void> {
    await this.open();
    await this.openShelf();
    await this.page.getByRole('button', { name: 'New empty sketch' }).click();
    await this.page.locator('[data-grip^="part:"]').first().waitFor({ state: 'detached' });
  }

  async openShelf(): Promise<Locator> {
    await this.page.getByTitle(/sketches on the shelf$/).click();
    return this.page.getByRole('dialog', { name: 'Sketches' });
  }

  /** The number and unit of a readout. */
  readout(label: string): Locator {
    return this.panel.locator('.readout', { has: this.page.getByText(label, { exact: true }) }).locator('dd');
  }

  /** A number of the fixed strip: f, m or defocus. */
  strip(label: string): Locator {
    return this.panel
      .locator('.strip-item', { has: this.page.getByText(label, { exact: true }) })
      .locator('dd');
  }

  async showAllReadouts(): Promise<void> {
    for (const group of ['Power', 'Conjugates', 'Light', 'Pupils', 'Sensor'])
      await this.panel.getByRole('button', { name: `${group}: more readouts` }).click();
  }

  field(label: string): Locator {
    return this.panel.getByRole('textbox', { name: label, exact: true });
  }

  /** The sentence under a field that says why an entry was not taken. */
  refusal(label: string): Locator {
    const input = this.page.getByRole('textbox', { name: label, exact: true });
    return this.panel.locator('.field', { has: input }).getByRole('alert');
  }

  async type(label: string, value: string): Promise<void> {
    const field = this.field(label);
    await field.fill(value);
    await field.press('Enter');
    await drawn(this.page);
  }

  /** Types into the entry that stands open on the drawing. */
  async typeOnDrawing(value: string): Promise<void> {
    const entry = this.page.locator('.type-box input');
    await entry.fill(value);
    await entry.press('Enter');
    await entry.waitFor({ state: 'detached' });
    await drawn(this.page);
  }

  /** Takes a part from the tray to a place on the axis: so many px behind a part, or a third into an empty sheet. */
  async dragFromTray(kind: TrayKind, behind?: { readonly part: string; readonly px: number }): Promise<void> {
    await drawn(this.page);
    const to = behind ? await middleOf(grip(this.page, behind.part)) : await middleOf(this.board);
    const from = await middleOf(this.page.getByRole('button', { name: kind, exact: true }));
    await this.hand.press(from);
    await this.hand.move({ dx: to.x + (behind?.px ?? 0) - from.x, dy: to.y - from.y });
    await this.hand.release();
  }
}

export const test = base.extend<{ app: App }>({
  app: async ({ page }, use) => {
    const complaints: string[] = [];
    page.on('pageerror', (error) => complaints.push(error.message));
    page.on('console', (message) => {
      if (message.type() === 'error' || message.type() === 'warning') complaints.push(message.text());
    });
    await use(new App(page));
    expect(complaints, 'what the browser complained of').toEqual([]);
  },
});

export { expect };
