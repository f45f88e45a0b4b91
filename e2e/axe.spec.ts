import { AxeBuilder } from '@axe-core/playwright';
import { type App, expect, test } from './support/app.ts';

interface Screen {
  readonly name: string;
  readonly open: (app: App) => Promise<unknown>;
  /** What is new on this screen; left out, all of the page is looked through. */
  readonly within?: string;
  /** Back to where the next screen begins. */
  readonly close?: (app: App) => Promise<unknown>;
}

const press = (button: string) => (app: App) =>
  app.page.getByRole('button', { name: button, exact: true }).click();
const tab = (name: string) => (app: App) => app.page.getByRole('tab', { name }).click();
const pressEscape = (app: App) => app.page.keyboard.press('Escape');

const DRAWER = '[role=tabpanel]';
const DIALOG = 'dialog[open]';

const ON_A_DESK: readonly Screen[] = [
  { name: 'first screen', open: async () => {} },
  { name: 'all readouts', open: (app) => app.showAllReadouts(), within: '.readouts' },
  { name: 'part selected', open: (app) => app.hand.clickGrip('part:p2'), within: '[aria-label="Selected"]' },
  {
    name: 'number typed on the drawing',
    open: (app) => app.hand.clickGrip('cell:gap:p1'),
    within: '.type-box',
    close: pressEscape,
  },
  { name: 'ledger', open: tab('Ledger'), within: DRAWER },
  { name: 'trace sheet', open: tab('Trace sheet'), within: DRAWER },
  { name: 'spacing table', open: tab('Spacing table'), within: DRAWER },
  { name: 'positions', open: press('Positions'), within: '.popover:popover-open', close: pressEscape },
  { name: 'hand-over', open: press('Hand over'), within: DIALOG, close: pressEscape },
  { name: 'help', open: press('Help'), within: DIALOG, close: pressEscape },
  { name: 'shelf', open: (app) => app.openShelf(), within: DIALOG },
  { name: 'empty sketch', open: press('New empty sketch') },
];

const ON_A_PHONE: readonly Screen[] = [
  { name: 'first screen', open: async () => {} },
  { name: 'part selected', open: (app) => app.hand.clickGrip('part:p2') },
  { name: 'part from below', open: press('Part'), within: DIALOG, close: press('Close Selected part') },
  { name: 'readouts from below', open: press('Readouts'), within: DIALOG, close: press('Close Readouts') },
  { name: 'sketch from below', open: press('Sketch'), within: DIALOG },
];

/** What axe finds serious or critical on the screens, one line each. Where only colours differ, only contrast is asked. */
async function seriousOn(
  app: App,
  screens: readonly Screen[],
  contrastOnly: boolean,
): Promise<readonly string[]> {
  const found: string[] = [];
  await app.open();
  for (const { name, open, within, close } of screens) {
    await open(app);
    const axe = new AxeBuilder({ page: app.page }).setLegacyMode().options({ resultTypes: ['violations'] });
    if (within !== undefined) {
      await app.page.locator(within).first().waitFor();
      axe.include(within);
    }
    const { violations } = await (contrastOnly ? axe.withRules(['color-contrast']) : axe).analyze();
    for (const { id, impact, nodes } of violations) {
      if (impact !== 'serious' && impact !== 'critical') continue;
      found.push(...nodes.map((node) => `${name}: ${id}: ${node.html.slice(0, 160)}`));
    }
    await close?.(app);
  }
  return found;
}

for (const colorScheme of ['light', 'dark'] as const) {
  test.describe(`${colorScheme} theme`, () => {
    test.use({ colorScheme });

    test('axe finds nothing serious in any main state', async ({ app }) => {
      expect(await seriousOn(app, ON_A_DESK, colorScheme === 'dark')).toEqual([]);
    });

    test('axe finds nothing serious on a phone', async ({ app, page }) => {
      await page.setViewportSize({ width: 390, height: 844 });
      expect(await seriousOn(app, ON_A_PHONE, colorScheme === 'dark')).toEqual([]);
    });
  });
}
