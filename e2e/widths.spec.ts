import { expect, test } from './support/app.ts';
import { drawn } from './support/hand.ts';

const WIDTHS_PX = [1440, 1024, 900, 800, 600, 390] as const;

test('at any width nothing scrolls sideways and no two buttons lie over each other', async ({
  app,
  page,
}) => {
  await app.open();
  for (const width of WIDTHS_PX) {
    await page.setViewportSize({ width, height: 768 });
    await drawn(page);
    expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(width);
    const overlaps = await page.evaluate(() => {
      const shown = [...document.querySelectorAll('header button, main button, nav button, .app-tray button')]
        .map((element) => ({ element, box: element.getBoundingClientRect() }))
        .filter(({ box }) => box.width > 0);
      const nameOf = (element: Element) => element.getAttribute('aria-label') ?? element.textContent;
      const covers = (a: DOMRect, b: DOMRect) =>
        Math.min(a.right, b.right) - Math.max(a.left, b.left) > 1 &&
        Math.min(a.bottom, b.bottom) - Math.max(a.top, b.top) > 1;
      return shown.flatMap((one, i) =>
        shown
          .slice(i + 1)
          .filter((other) => covers(one.box, other.box))
          .map((other) => `${nameOf(one.element)} / ${nameOf(other.element)}`),
      );
    });
    expect(overlaps, `at ${width} px`).toEqual([]);
  }
});
