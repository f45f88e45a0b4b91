/** A stack of canvases of one size, one above the other, each redrawn on its own. */
export interface Surface<Layer extends string> {
  readonly size: () => SurfaceSize;
  /** The layer cleared and scaled to CSS px, ready to be drawn on; null when it has no area or no context. */
  readonly begin: (layer: Layer) => CanvasRenderingContext2D | null;
  /** Draft: one pixel to the CSS px, quicker to paint while something is dragged. Returns whether that changed it. */
  readonly setDraft: (draft: boolean) => boolean;
  readonly canvas: (layer: Layer) => HTMLCanvasElement;
  readonly destroy: () => void;
}

export interface SurfaceSize {
  readonly widthPx: number;
  readonly heightPx: number;
  /** Device pixels to the CSS px that the canvases have at present. */
  readonly pixelRatio: number;
}

/**
 * Canvases for the named layers, bottom first, filling `host` and following its size and the screen's pixel ratio.
 * `onResize` is called after every change of either, the first time as soon as the size is known.
 */
export function createSurface<Layer extends string>(
  host: HTMLElement,
  layers: readonly Layer[],
  onResize: (size: SurfaceSize) => void,
): Surface<Layer> {
  const view = host.ownerDocument.defaultView as Window & typeof globalThis;
  const canvases = new Map(layers.map((layer) => [layer, canvasIn(host, layer)]));
  let box = { widthPx: 0, heightPx: 0 };
  let draft = false;

  const pixelRatio = (): number => (draft ? 1 : view.devicePixelRatio || 1);
  const size = (): SurfaceSize => ({ ...box, pixelRatio: pixelRatio() });
  const fitAll = (): void => {
    for (const canvas of canvases.values()) fitCanvas(canvas, size());
  };

  const measure = (): void => {
    const { width, height } = host.getBoundingClientRect();
    box = { widthPx: width, heightPx: height };
    fitAll();
    onResize(size());
  };
  const observer = new view.ResizeObserver(measure);
  observer.observe(host);
  const stopWatching = watchPixelRatio(view, measure);

  return {
    size,
    begin(layer) {
      const ctx = canvases.get(layer)?.getContext('2d') ?? null;
      if (ctx === null || box.widthPx === 0 || box.heightPx === 0) return null;
      const { canvas } = ctx;
      ctx.setTransform(1, 0, 0, 1, 0, 0);
      ctx.clearRect(0, 0, canvas.width, canvas.height);
      ctx.scale(pixelRatio(), pixelRatio());
      return ctx;
    },
    setDraft(next) {
      if (next === draft) return false;
      const before = pixelRatio();
      draft = next;
      if (pixelRatio() === before) return false;
      fitAll();
      return true;
    },
    canvas: (layer) => canvases.get(layer) as HTMLCanvasElement,
    destroy() {
      observer.disconnect();
      stopWatching();
      for (const canvas of canvases.values()) canvas.remove();
    },
  };
}

function canvasIn(host: HTMLElement, layer: string): HTMLCanvasElement {
  const canvas = host.ownerDocument.createElement('canvas');
  canvas.dataset.layer = layer;
  canvas.setAttribute('aria-hidden', 'true');
  canvas.style.cssText = 'position:absolute;left:0;top:0;pointer-events:none';
  host.appendChild(canvas);
  return canvas;
}

/** Setting a canvas' size clears it, so only real changes are written. */
function fitCanvas(canvas: HTMLCanvasElement, { widthPx, heightPx, pixelRatio }: SurfaceSize): void {
  const width = Math.max(1, Math.round(widthPx * pixelRatio));
  const height = Math.max(1, Math.round(heightPx * pixelRatio));
  if (canvas.width !== width) canvas.width = width;
  if (canvas.height !== height) canvas.height = height;
  // Whole device pixels, or the browser would blur what was drawn sharp.
  canvas.style.width = `${width / pixelRatio}px`;
  canvas.style.height = `${height / pixelRatio}px`;
}

/** Calls `onChange` when the window moves to a screen of another pixel ratio or the page is zoomed. */
function watchPixelRatio(view: Window, onChange: () => void): () => void {
  let query: MediaQueryList | null = null;
  const changed = (): void => {
    watch();
    onChange();
  };
  const watch = (): void => {
    query?.removeEventListener('change', changed);
    query = view.matchMedia(`(resolution: ${view.devicePixelRatio}dppx)`);
    query.addEventListener('change', changed);
  };
  watch();
  return () => query?.removeEventListener('change', changed);
}
