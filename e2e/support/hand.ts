import type { Locator, Page } from '@playwright/test';
import { expect } from '@playwright/test';

export interface Point {
  readonly x: number;
  readonly y: number;
}

/** How far and in how many moves a hand goes. */
interface Way {
  readonly dx: number;
  readonly dy?: number;
  readonly steps?: number;
}

/** A mouse on the drawing: finds grips by their sliders, presses, moves in steps, releases. */
export class Hand {
  readonly #page: Page;
  #at: Point = { x: 0, y: 0 };

  constructor(page: Page) {
    this.#page = page;
  }

  /** Presses the grip with this id, such as `part:p2`; `besideY` px above (−) or below its middle. */
  async pressGrip(id: string, besideY = 0): Promise<void> {
    await drawn(this.#page);
    const { x, y } = await middleOf(grip(this.#page, id));
    await this.press({ x, y: y + besideY });
  }

  async press(at: Point): Promise<void> {
    this.#at = at;
    await this.#page.mouse.move(at.x, at.y);
    await this.#page.mouse.down();
  }

  /** Moves on by `dx`, `dy` px; `seen` is called after every step, once the page has drawn it. */
  async move({ dx, dy = 0, steps = 6 }: Way, seen?: () => Promise<void>): Promise<void> {
    const from = this.#at;
    for (let step = 1; step <= steps; step++) {
      this.#at = { x: from.x + (dx * step) / steps, y: from.y + (dy * step) / steps };
      await this.#page.mouse.move(this.#at.x, this.#at.y);
      if (!seen) continue;
      await drawn(this.#page);
      await seen();
    }
    await drawn(this.#page);
  }

  async release(): Promise<void> {
    await this.#page.mouse.up();
    await drawn(this.#page);
  }

  /** Presses, moves and releases. */
  async drag(id: string, way: Way): Promise<void> {
    await this.pressGrip(id);
    await this.move(way);
    await this.release();
  }

  async clickGrip(id: string): Promise<void> {
    await this.pressGrip(id);
    await this.release();
  }
}

/** The slider of a grip on the drawing or the ribbon. */
export const grip = (page: Page, id: string): Locator => page.locator(`[role=slider][data-grip="${id}"]`);

/** The number that a grip stands for. */
export const numberAt = async (page: Page, id: string): Promise<number> =>
  Number(await grip(page, id).getAttribute('aria-valuenow'));

/** The middle of an element in px of the window. */
export async function middleOf(element: Locator): Promise<Point> {
  const box = await element.boundingBox();
  expect(box, `${element} is on the page`).not.toBeNull();
  return { x: (box?.x ?? 0) + (box?.width ?? 0) / 2, y: (box?.y ?? 0) + (box?.height ?? 0) / 2 };
}

/** Resolves once everything asked for until now has been drawn. */
export const drawn = (page: Page): Promise<void> =>
  page.evaluate(
    () => new Promise((resolve) => requestAnimationFrame(() => requestAnimationFrame(() => resolve()))),
  );
