/** A piece of the length axis cut to a fixed width on screen. `fromMm < toMm`, `widthPx > 0`. */
export interface Fold {
  readonly fromMm: number;
  readonly toMm: number;
  readonly widthPx: number;
}

/**
 * Where a drawn sheet looks: lengths along the axis (mm, to the right) and heights (mm, upwards) against
 * screen px (x to the right, y downwards). Heights are drawn `pxPerMm · stretch` px to the millimetre.
 */
export interface Viewport {
  readonly widthPx: number;
  readonly heightPx: number;
  /** The length at the left edge of the sheet. */
  readonly originMm: number;
  readonly pxPerMm: number;
  readonly stretch: number;
  /** Screen y of height 0. */
  readonly axisYPx: number;
  readonly fold: Fold | null;
}

export interface LengthRange {
  readonly fromMm: number;
  readonly toMm: number;
}

/** Zoom limits: a kilometre on a small screen, and half a micrometre to the pixel. */
export const PX_PER_MM_LIMITS = { least: 1e-4, most: 2000 } as const;
export const STRETCH_LIMITS = { least: 0.02, most: 200 } as const;

/** A view of `widthPx × heightPx` with length 0 at the left edge, 1 px/mm and the axis half-way down. */
export function newViewport(widthPx: number, heightPx: number): Viewport {
  return { widthPx, heightPx, originMm: 0, pxPerMm: 1, stretch: 1, axisYPx: heightPx / 2, fold: null };
}

/** Screen x (px) of a length on the axis (mm). Strictly increasing, also across the fold. */
export function xOf(view: Viewport, zMm: number): number {
  return rolled(view, zMm) - rolled(view, view.originMm);
}

/** The length (mm) at a screen x (px); inverse of `xOf`. */
export function zOf(view: Viewport, xPx: number): number {
  return unrolled(view, xPx + rolled(view, view.originMm));
}

/** Screen y (px, downwards) of a height (mm, upwards). */
export function yOf(view: Viewport, yMm: number): number {
  return view.axisYPx - yMm * view.pxPerMm * view.stretch;
}

/** The height (mm, upwards) at a screen y (px); inverse of `yOf`. */
export function heightOf(view: Viewport, yPx: number): number {
  return (view.axisYPx - yPx) / (view.pxPerMm * view.stretch);
}

/** The view with what is drawn moved by `dxPx` to the right and `dyPx` downwards. */
export function panBy(view: Viewport, dxPx: number, dyPx: number): Viewport {
  if (dxPx === 0 && dyPx === 0) return view;
  return { ...view, originMm: zOf(view, -dxPx), axisYPx: view.axisYPx + dyPx };
}

/**
 * The view scaled by `factor` in lengths and heights alike (the stretch stays), within the limits.
 * The length under `xPx` keeps its place; so does the height under `yPx`, or the axis when it is left out.
 */
export function zoomAbout(view: Viewport, xPx: number, factor: number, yPx = view.axisYPx): Viewport {
  if (!(factor > 0) || !Number.isFinite(factor)) return view;
  const pxPerMm = clamp(view.pxPerMm * factor, PX_PER_MM_LIMITS);
  if (pxPerMm === view.pxPerMm) return view;
  const axisYPx = yPx + (view.axisYPx - yPx) * (pxPerMm / view.pxPerMm);
  return withLengthAt({ ...view, pxPerMm, axisYPx }, zOf(view, xPx), xPx);
}

/** The view with heights drawn `factor` times as tall, within the limits; the axis stays where it is. */
export function stretchBy(view: Viewport, factor: number): Viewport {
  if (!(factor > 0) || !Number.isFinite(factor)) return view;
  const stretch = clamp(view.stretch * factor, STRETCH_LIMITS);
  return stretch === view.stretch ? view : { ...view, stretch };
}

/** The view at another size; the length in the middle and the axis' share of the height stay. */
export function resized(view: Viewport, widthPx: number, heightPx: number): Viewport {
  if (widthPx === view.widthPx && heightPx === view.heightPx) return view;
  const axisYPx = view.heightPx > 0 ? (view.axisYPx / view.heightPx) * heightPx : heightPx / 2;
  const middleMm = zOf(view, view.widthPx / 2);
  return withLengthAt({ ...view, widthPx, heightPx, axisYPx }, middleMm, widthPx / 2);
}

/** The view with another fold (or none), the length at `xPx` keeping its place. */
export function refolded(view: Viewport, fold: Fold | null, xPx: number): Viewport {
  return withLengthAt({ ...view, fold }, zOf(view, xPx), xPx);
}

/** The lengths (mm) at the left and right edge. */
export function visibleRange(view: Viewport): LengthRange {
  return { fromMm: zOf(view, 0), toMm: zOf(view, view.widthPx) };
}

/** The view with the length `zMm` at screen `xPx`. */
export function withLengthAt(view: Viewport, zMm: number, xPx: number): Viewport {
  return { ...view, originMm: unrolled(view, rolled(view, zMm) - xPx) };
}

/** Px from the fold's left end along the axis as drawn: one increasing function of the length, fold included. */
function rolled({ fold, pxPerMm }: Viewport, zMm: number): number {
  if (fold === null) return zMm * pxPerMm;
  if (zMm <= fold.fromMm) return (zMm - fold.fromMm) * pxPerMm;
  if (zMm >= fold.toMm) return fold.widthPx + (zMm - fold.toMm) * pxPerMm;
  return ((zMm - fold.fromMm) / (fold.toMm - fold.fromMm)) * fold.widthPx;
}

function unrolled({ fold, pxPerMm }: Viewport, rolledPx: number): number {
  if (fold === null) return rolledPx / pxPerMm;
  if (rolledPx <= 0) return fold.fromMm + rolledPx / pxPerMm;
  if (rolledPx >= fold.widthPx) return fold.toMm + (rolledPx - fold.widthPx) / pxPerMm;
  return fold.fromMm + (rolledPx / fold.widthPx) * (fold.toMm - fold.fromMm);
}

function clamp(value: number, { least, most }: { readonly least: number; readonly most: number }): number {
  return Math.min(most, Math.max(least, value));
}
