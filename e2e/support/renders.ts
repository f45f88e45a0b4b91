import type { Page } from '@playwright/test';

/** What React rendered since the count began. */
export interface Renders {
  readonly commits: number;
  /** Components whose render changed what they show. */
  readonly needed: number;
  /** What components showed whose render changed nothing. */
  readonly idle: readonly string[];
}

interface Counting {
  __renders: { begin(): void; end(): Renders };
}

/** Counts renders from now on. `watchRenders` must have been called before the page was opened. */
export const beginRenders = (page: Page): Promise<void> =>
  page.evaluate(() => (window as unknown as Counting).__renders.begin());

export const endRenders = (page: Page): Promise<Renders> =>
  page.evaluate(() => (window as unknown as Counting).__renders.end());

/**
 * Listens to React's commits by the hook that it offers to developer tools. A component has rendered when its fiber is new in the
 * commit and carries the flag of performed work; the render was needed when the elements under it look different afterwards.
 */
export const watchRenders = (page: Page): Promise<unknown> =>
  page.addInitScript(() => {
    interface Fiber {
      readonly tag: number;
      readonly flags: number;
      readonly alternate: Fiber | null;
      readonly child: Fiber | null;
      readonly sibling: Fiber | null;
      readonly stateNode: unknown;
    }
    const FUNCTION_TAGS = [0, 11, 15];
    const PERFORMED_WORK = 1;

    let counting = false;
    let commits = 0;
    let needed = 0;
    let idle: string[] = [];
    let root: Fiber | null = null;
    const shown = new WeakMap<Fiber, string>();

    const lookOf = (fiber: Fiber): string => {
      if (fiber.tag === 6) return (fiber.stateNode as Text).data;
      if (fiber.tag === 5) {
        const element = fiber.stateNode as HTMLElement;
        const values = [element, ...element.querySelectorAll('input, textarea, select')].map(
          (field) => (field as Partial<HTMLInputElement>).value ?? '',
        );
        return element.outerHTML + values.join('\n');
      }
      return childrenOf(fiber).map(lookOf).join('');
    };
    const childrenOf = (fiber: Fiber): Fiber[] => {
      const children: Fiber[] = [];
      for (let child = fiber.child; child; child = child.sibling) children.push(child);
      return children;
    };
    const keep = (fiber: Fiber): void => {
      if (FUNCTION_TAGS.includes(fiber.tag)) {
        const look = lookOf(fiber);
        shown.set(fiber, look);
        if (fiber.alternate) shown.set(fiber.alternate, look);
      }
      childrenOf(fiber).forEach(keep);
    };
    const judge = (fiber: Fiber, before: Fiber | null): void => {
      const rendered = FUNCTION_TAGS.includes(fiber.tag) && (fiber.flags & PERFORMED_WORK) !== 0;
      if (rendered) {
        const look = lookOf(fiber);
        if (shown.get(fiber) !== look) needed += 1;
        else idle.push(look.slice(0, 160));
      }
      if (before !== null && fiber.child === before.child) return;
      for (const child of childrenOf(fiber)) if (child !== child.alternate) judge(child, child.alternate);
    };

    const hook = {
      renderers: new Map<number, unknown>(),
      supportsFiber: true,
      inject: (renderer: unknown) => hook.renderers.set(hook.renderers.size + 1, renderer).size,
      onCommitFiberRoot: (_id: number, { current }: { current: Fiber }) => {
        root = current;
        if (!counting) return;
        commits += 1;
        judge(current, current.alternate);
        keep(current);
      },
      onCommitFiberUnmount: () => {},
      onPostCommitFiberRoot: () => {},
    };
    Object.assign(window, {
      __REACT_DEVTOOLS_GLOBAL_HOOK__: hook,
      __renders: {
        begin: () => {
          counting = true;
          commits = 0;
          needed = 0;
          idle = [];
          if (root) keep(root);
        },
        end: () => {
          counting = false;
          return { commits, needed, idle };
        },
      },
    });
  });
