import { describe, expect, it } from 'vitest';
import { createSurface, type SurfaceSize } from '../../../app/board/surface.ts';

/** A window with one element in it, of a size and pixel ratio that the test changes. */
function screen(widthPx: number, heightPx: number, devicePixelRatio = 2) {
  const cleared: string[] = [];
  const observers: (() => void)[] = [];
  const queries: (() => void)[] = [];
  const watched: string[] = [];
  const children: { width: number; height: number; style: Record<string, string> }[] = [];
  const view = {
    devicePixelRatio,
    ResizeObserver: class {
      constructor(changed: () => void) {
        observers.push(changed);
      }
      observe() {
        observers.at(-1)?.();
      }
      disconnect() {
        observers.pop();
      }
    },
    matchMedia: (query: string) => ({
      addEventListener: (_type: string, changed: () => void) => {
        watched.push(query);
        queries.push(changed);
      },
      removeEventListener: () => queries.pop(),
    }),
  };
  const createElement = () => {
    const canvas = {
      width: 0,
      height: 0,
      style: {} as Record<string, string>,
      dataset: {} as Record<string, string>,
      scaled: 0,
      setAttribute: () => undefined,
      remove: () => children.splice(children.indexOf(canvas), 1),
      getContext: () => ({
        canvas,
        setTransform: () => undefined,
        clearRect: () => cleared.push(`${canvas.dataset.layer}`),
        scale: (factor: number) => {
          canvas.scaled = factor;
        },
      }),
    };
    return canvas;
  };
  const box = { width: widthPx, height: heightPx };
  const host = {
    ownerDocument: { defaultView: view, createElement },
    getBoundingClientRect: () => box,
    appendChild: (child: (typeof children)[number]) => children.push(child),
  };
  return { host: host as unknown as HTMLElement, view, box, children, cleared, observers, queries, watched };
}

describe('the canvases of a sheet', () => {
  it('have as many pixels as the screen has there, and one size for all layers', () => {
    const { host, children } = screen(300.4, 200);
    const sizes: SurfaceSize[] = [];
    createSurface(host, ['rays', 'grips'], (size) => sizes.push(size));
    expect(sizes).toEqual([{ widthPx: 300.4, heightPx: 200, pixelRatio: 2 }]);
    expect(children.map(({ width, height }) => [width, height])).toEqual([
      [601, 400],
      [601, 400],
    ]);
    expect(children[0]?.style.width).toBe('300.5px');
  });

  it('are cleared one by one, scaled to CSS px', () => {
    const { host, cleared } = screen(300, 200);
    const surface = createSurface(host, ['rays', 'grips'], () => undefined);
    const ctx = surface.begin('grips');
    expect(cleared).toEqual(['grips']);
    expect(ctx?.canvas).toMatchObject({ scaled: 2 });
    expect(surface.canvas('rays')).not.toBe(surface.canvas('grips'));
  });

  it('take fewer pixels for a draft, and say whether that changed them', () => {
    const { host, children } = screen(300, 200);
    const surface = createSurface(host, ['rays'], () => undefined);
    expect(surface.setDraft(true)).toBe(true);
    expect(surface.setDraft(true)).toBe(false);
    expect(children[0]?.width).toBe(300);
    expect(surface.size().pixelRatio).toBe(1);
    expect(surface.setDraft(false)).toBe(true);
    expect(children[0]?.width).toBe(600);
    expect(createSurface(screen(300, 200, 1).host, ['rays'], () => undefined).setDraft(true)).toBe(false);
  });

  it('follow the size of their place and the pixel ratio of the screen', () => {
    const { host, view, box, children, observers, queries, watched } = screen(300, 200);
    const sizes: SurfaceSize[] = [];
    createSurface(host, ['rays'], (size) => sizes.push(size));
    box.width = 500;
    observers[0]?.();
    view.devicePixelRatio = 3;
    queries[0]?.();
    expect(sizes.at(-1)).toEqual({ widthPx: 500, heightPx: 200, pixelRatio: 3 });
    expect(children[0]?.width).toBe(1500);
    expect(watched).toEqual(['(resolution: 2dppx)', '(resolution: 3dppx)']);
  });

  it('draw nothing without an area, and leave nothing behind', () => {
    const { host, children, observers, queries } = screen(0, 0);
    const surface = createSurface(host, ['rays'], () => undefined);
    expect(surface.begin('rays')).toBeNull();
    surface.destroy();
    expect([children.length, observers.length, queries.length]).toEqual([0, 0, 0]);
  });
});
