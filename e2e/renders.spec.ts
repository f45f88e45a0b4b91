import { expect, test } from './support/app.ts';
import { beginRenders, endRenders, watchRenders } from './support/renders.ts';

/** A drag of so many moves changes at least this many texts, or the count itself is broken. */
const LEAST_NEEDED = 50;

test('during a drag React renders no component whose text did not change', async ({ app, page }) => {
  await watchRenders(page);
  await app.open();
  await app.showAllReadouts();
  await app.hand.clickGrip('part:p2');

  for (const drawer of ['Ledger', 'Trace sheet', 'Spacing table']) {
    await page.getByRole('tab', { name: drawer }).click();
    await app.hand.pressGrip('part:p2', 40);
    await app.hand.move({ dx: 10 });
    await beginRenders(page);
    await app.hand.move({ dx: 60, steps: 10 });
    const { commits, needed, idle } = await endRenders(page);
    await page.keyboard.press('Escape');
    await app.hand.release();

    expect(commits).toBeGreaterThanOrEqual(5);
    expect(needed).toBeGreaterThan(LEAST_NEEDED);
    expect(idle, `what components showed that rendered for nothing, with the ${drawer} open`).toEqual([]);
  }
});
