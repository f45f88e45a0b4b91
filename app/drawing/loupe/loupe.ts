import type { DrawnRay } from '../../../engine/index.ts';
import type { Box } from '../../board/labels.ts';
import type { Viewport } from '../../board/viewport.ts';
import { xOf, yOf } from '../../board/viewport.ts';
import type { Reading } from '../../live/reading.ts';
import { fittedTimes, type LoupeLook, loupeLook, loupeRays, REAL_PX_PER_MM } from './look.ts';

/** The loupe as it stands on the sheet. */
export interface Loupe {
  readonly look: LoupeLook;
  readonly rays: readonly DrawnRay[];
  /** Where it looks. */
  readonly target: { readonly xPx: number; readonly yPx: number };
  readonly xPx: number;
  readonly yPx: number;
  readonly radiusPx: number;
  readonly lengths: number;
  readonly heights: number;
  /** Places inside the ring, in px of the sheet. */
  readonly inside: Viewport;
  /** Half of the length that it shows. */
  readonly halfMm: number;
}

/** Radius of the little ring about the point that is looked at, px. */
export const TARGET_PX = 8;
const RADIUS_PX = { least: 52, most: 92, share: 0.18 };
/** Room for the view tools above, and to the edges of the sheet, px. */
const TOP_PX = 44;
const EDGE_PX = 6;
/** The loupe of a reading in a view; null when it is not shown, or there is nothing to look at. */
export function loupeOf(reading: Reading, view: Viewport): Loupe | null {
  if (!reading.view.loupe.shown) return null;
  const look = loupeLook(reading);
  if (!look) return null;
  const fitted = fittedTimes(look);
  const lengths = reading.view.loupe.lengths ?? fitted.lengths;
  const heights = reading.view.loupe.heights ?? fitted.heights;
  const { widthPx, heightPx } = view;
  const { least, most, share } = RADIUS_PX;
  const radiusPx = Math.min(most, Math.max(least, share * Math.min(widthPx, heightPx)));
  const target = { xPx: xOf(view, look.zMm), yPx: yOf(view, look.yMm) };
  const { xPx, yPx } = ringPlace(target, radiusPx, view, look.yMm < 0);
  const pxPerMm = lengths * REAL_PX_PER_MM;
  const pxPerMmUp = heights * REAL_PX_PER_MM;
  const inside: Viewport = {
    widthPx,
    heightPx,
    fold: null,
    pxPerMm,
    stretch: pxPerMmUp / pxPerMm,
    originMm: look.zMm - xPx / pxPerMm,
    axisYPx: yPx + look.yMm * pxPerMmUp,
  };
  const halfMm = radiusPx / pxPerMm;
  const { train } = reading.analysis;
  const firstMm = Math.min(0, look.zMm) - halfMm;
  const rays = loupeRays(
    reading,
    look.share,
    firstMm,
    Math.max(train.z.at(-1) ?? 0, look.zMm + 1.1 * halfMm),
  );
  return { look, rays, target, xPx, yPx, radiusPx, lengths, heights, inside, halfMm };
}

/**
 * Outwards of the field beside the point, as nearly above or below it as the edges of the sheet allow, so that a dragged ring stays under
 * the pointer; on the other side where there is no room.
 */
function ringPlace(
  target: Loupe['target'],
  radiusPx: number,
  { widthPx, heightPx }: Viewport,
  isBelow: boolean,
): { readonly xPx: number; readonly yPx: number } {
  const reach = radiusPx + TARGET_PX;
  const xPx = between(target.xPx, radiusPx + EDGE_PX, widthPx - radiusPx - EDGE_PX);
  const aside = Math.min(reach, Math.abs(xPx - target.xPx));
  const away = Math.sqrt(reach * reach - aside * aside);
  const [top, bottom] = [radiusPx + TOP_PX, heightPx - radiusPx - EDGE_PX];
  const sides = isBelow ? [1, -1] : [-1, 1];
  const heights = sides.map((side) => target.yPx + side * away);
  const free = heights.find((yPx) => yPx >= top && yPx <= bottom) ?? heights[0] ?? target.yPx;
  return { xPx, yPx: between(free, top, bottom) };
}

const between = (value: number, from: number, to: number): number => Math.max(from, Math.min(to, value));

/** Where the words stand beside the ring: their edge next to it, the middle of the first line, and the way they run. */
export function wordsPlace({ xPx, yPx, radiusPx, inside }: Loupe) {
  const isLeft = xPx > inside.widthPx / 2;
  return {
    xPx: isLeft ? xPx - radiusPx - 6 : xPx + radiusPx + 6,
    yPx: yPx - radiusPx * 0.75,
    align: isLeft ? ('right' as const) : ('left' as const),
  };
}

/** Height of a line of the words, and what the longest of them needs, px. */
export const WORDS_LINE_PX = 16;
const WORDS_LINES = 4;
const WORDS_PX = 112;

/** What ring and words cover. */
export function loupeBoxes(loupe: Loupe): readonly Box[] {
  const { xPx, yPx, radiusPx } = loupe;
  const words = wordsPlace(loupe);
  return [
    { xPx: xPx - radiusPx, yPx: yPx - radiusPx, widthPx: 2 * radiusPx, heightPx: 2 * radiusPx },
    {
      xPx: words.align === 'right' ? words.xPx - WORDS_PX : words.xPx,
      yPx: words.yPx - WORDS_LINE_PX / 2,
      widthPx: WORDS_PX,
      heightPx: WORDS_LINES * WORDS_LINE_PX,
    },
  ];
}
