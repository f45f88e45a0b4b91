import type { Plot } from './plot.ts';
import { firstStop, nearestStop, readAt, readingText, stopBeside, stopsOf } from './read.ts';
import type { LengthAxis, Room } from './room.ts';
import { stopUnder } from './stopUnder.ts';
import { summaryOf } from './summary.ts';

export interface CellClient {
  /** What is read has changed; null when nothing is. */
  readonly onCursor: (stop: number | null) => void;
  /** Enter or a press on what is read. */
  readonly onChoose: (stop: number) => void;
  readonly repaint: () => void;
}

/** The element of one plot: a canvas to look at, and a slider that reads along it by keys. */
export interface PlotCell {
  readonly id: string;
  readonly element: HTMLElement;
  readonly show: (
    plot: Plot,
    room: Room,
    axis: LengthAxis,
    draw: (ctx: CanvasRenderingContext2D, cursor: number | null) => void,
  ) => void;
  readonly destroy: () => void;
}

/** How many stops a page key goes. */
const PAGE = 5;

const STEPS: Readonly<Record<string, number>> = {
  ArrowLeft: -1,
  ArrowDown: -1,
  ArrowRight: 1,
  ArrowUp: 1,
  PageDown: -PAGE,
  PageUp: PAGE,
  Home: Number.NEGATIVE_INFINITY,
  End: Number.POSITIVE_INFINITY,
};

export function createPlotCell(id: string, client: CellClient): PlotCell {
  const element = document.createElement('div');
  element.className = 'plot';
  const canvas = document.createElement('canvas');
  canvas.setAttribute('aria-hidden', 'true');
  element.append(canvas);
  let shown: { readonly plot: Plot; readonly room: Room; readonly axis: LengthAxis } | null = null;
  /** The value that is read, kept while the plot changes. */
  let cursor: number | null = null;

  const put = (stop: number | null) => {
    if (stop === cursor) return;
    cursor = stop;
    client.onCursor(stop);
    client.repaint();
  };

  const under = (event: PointerEvent): number | null => {
    if (!shown) return null;
    const box = canvas.getBoundingClientRect();
    return stopUnder(shown.plot, shown.room, event.clientX - box.left, event.clientY - box.top, shown.axis);
  };

  const onKeyDown = (event: KeyboardEvent) => {
    if (!shown || event.ctrlKey || event.metaKey || event.altKey) return;
    const steps = STEPS[event.key];
    if (steps !== undefined) {
      event.preventDefault();
      put(cursor === null ? firstStop(shown.plot) : stopBeside(shown.plot, cursor, steps));
    } else if (event.key === 'Enter' && cursor !== null) client.onChoose(cursor);
    else if (event.key === 'Escape' && cursor !== null) {
      event.stopPropagation();
      put(null);
    }
  };
  const handlers = {
    pointermove: (event: PointerEvent) => put(under(event)),
    pointerdown: (event: PointerEvent) => put(under(event)),
    click: () => cursor !== null && client.onChoose(cursor),
    // A finger leaves as it is lifted; what it read stays until something else has the focus.
    pointerleave: (event: PointerEvent) => event.pointerType !== 'touch' && put(null),
    keydown: onKeyDown,
    blur: () => put(null),
  };
  const listener = (event: Event) => handlers[event.type as keyof typeof handlers](event as never);
  for (const type of Object.keys(handlers)) element.addEventListener(type, listener);

  const tell = (plot: Plot) => {
    const stops = stopsOf(plot);
    const readable = stops.length > 0;
    write(element, 'aria-label', plot.title);
    write(element, 'role', readable ? 'slider' : 'note');
    if (!readable) {
      element.removeAttribute('tabindex');
      write(element, 'aria-label', `${plot.title}: ${summaryOf(plot)}`);
      return;
    }
    element.tabIndex = 0;
    write(element, 'aria-valuemin', String(stops[0]));
    write(element, 'aria-valuemax', String(stops.at(-1)));
    write(element, 'aria-valuenow', String(cursor ?? firstStop(plot)));
    write(element, 'aria-valuetext', cursor === null ? summaryOf(plot) : readingText(readAt(plot, cursor)));
  };

  return {
    id,
    element,
    show(plot, room, axis, draw) {
      shown = { plot, room, axis };
      if (cursor !== null) cursor = nearestStop(plot, cursor);
      tell(plot);
      fitCanvas(canvas, room);
      const ctx = canvas.getContext('2d');
      if (!ctx) return;
      ctx.setTransform(devicePixelRatio, 0, 0, devicePixelRatio, 0, 0);
      ctx.clearRect(0, 0, room.widthPx, room.heightPx);
      draw(ctx, cursor);
    },
    destroy() {
      if (cursor !== null) client.onCursor(null);
      element.remove();
    },
  };
}

function write(element: Element, name: string, value: string): void {
  if (element.getAttribute(name) !== value) element.setAttribute(name, value);
}

/** Whole device pixels, or the browser would blur what was drawn sharp. */
export function fitCanvas(canvas: HTMLCanvasElement, { widthPx, heightPx }: Room): void {
  const width = Math.max(1, Math.round(widthPx * devicePixelRatio));
  const height = Math.max(1, Math.round(heightPx * devicePixelRatio));
  if (canvas.width !== width) canvas.width = width;
  if (canvas.height !== height) canvas.height = height;
  canvas.style.width = `${width / devicePixelRatio}px`;
  canvas.style.height = `${height / devicePixelRatio}px`;
}
