import { tickIncrement } from 'd3';
import {
  type Fold,
  type LengthRange,
  PX_PER_MM_LIMITS,
  STRETCH_LIMITS,
  type Viewport,
  withLengthAt,
} from './viewport.ts';

export interface Margins {
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly bottom: number;
}

export interface FitRange extends LengthRange {
  /** The tallest height (mm, either side of the axis) that should stay in view. */
  readonly maxHeightMm: number;
}

/** A space is folded when it is this many times as long as the rest of the layout. */
const LONG_SPACE = 1.5;
/** Of a folded space, the piece next to the parts that stays to scale, as a share of the rest. */
const KEPT_SHARE = 0.4;
/** Heights are never drawn flatter than this by a fit; a taller layout is drawn smaller instead. */
const LEAST_STRETCH = 0.25;
/** Width of the break on screen, px. */
const FOLD_WIDTH_PX = 18;
/** An arrow key moves at most so far on screen, px, */
const MOST_KEY_STEP_PX = 10;
/** unless its step is below this, mm: fine enough however close one looks. */
const FINE_STEP_MM = 0.005;
/** Steps of the height stretch within a decade, so that the shown figure is a plain one. */
const STRETCH_STEPS = [1, 1.25, 1.5, 1.75, 2, 2.5, 3, 3.5, 4, 5, 6, 7, 8];

/**
 * The view whose lengths `fromMm … toMm` fill the width between the margins (px) and whose greatest height fits
 * in the height between them; the stretch is rounded down to a plain figure, the axis stands half-way. A layout too
 * tall for that is drawn smaller, in the middle. Without room, or over an empty range, the scale stays as it is.
 */
export function fitted(view: Viewport, range: FitRange, margins: Margins): Viewport {
  const roomPx = view.widthPx - margins.left - margins.right;
  const tallPx = view.heightPx - margins.top - margins.bottom;
  const folded = foldedPart(view.fold, range);
  const scaleMm = range.toMm - range.fromMm - folded.lengthMm;
  const hasRoom = scaleMm > 0 && roomPx > folded.widthPx;
  const filling = hasRoom ? limited((roomPx - folded.widthPx) / scaleMm) : view.pxPerMm;
  const wanted = wantedStretch(range.maxHeightMm, filling, tallPx);
  const pxPerMm = limited(filling * Math.min(1, wanted / LEAST_STRETCH));
  const stretch = stretchFor(range.maxHeightMm, filling, tallPx);
  const axisYPx = tallPx > 0 ? margins.top + tallPx / 2 : view.heightPx / 2;
  const drawnPx = Math.max(0, scaleMm) * pxPerMm + folded.widthPx;
  const leftPx = margins.left + (roomPx - drawnPx) / 2;
  return withLengthAt({ ...view, pxPerMm, stretch, axisYPx }, range.fromMm, leftPx);
}

/**
 * The plain stretch with which heights up to `maxHeightMm` on both sides of the axis fill `tallPx` at this scale, or the flattest that
 * a fit allows when they do not fit; 1 without heights or room.
 */
export function stretchFor(maxHeightMm: number, pxPerMm: number, tallPx: number): number {
  const wanted = wantedStretch(maxHeightMm, pxPerMm, tallPx);
  return plainStretch(Math.min(STRETCH_LIMITS.most, Math.max(LEAST_STRETCH, wanted)));
}

const wantedStretch = (maxHeightMm: number, pxPerMm: number, tallPx: number): number =>
  maxHeightMm > 0 && tallPx > 0 ? tallPx / 2 / (maxHeightMm * pxPerMm) : 1;

/**
 * The fold of a space that is long against the rest of the layout (`restMm`), or null when it is short enough to
 * be drawn to scale. `partsAt` says which end of the space the parts are at; the piece next to them stays to
 * scale, and the fold reaches to the other end, where the object or the image stands, not to scale.
 */
export function foldOf(
  space: LengthRange,
  restMm: number,
  partsAt: 'end' | 'start' = 'end',
  widthPx: number = FOLD_WIDTH_PX,
): Fold | null {
  const lengthMm = space.toMm - space.fromMm;
  if (!(restMm > 0) || !Number.isFinite(lengthMm) || lengthMm <= LONG_SPACE * restMm) return null;
  const keptMm = KEPT_SHARE * restMm;
  return partsAt === 'end'
    ? { fromMm: space.fromMm, toMm: space.toMm - keptMm, widthPx }
    : { fromMm: space.fromMm + keptMm, toMm: space.toMm, widthPx };
}

export interface ScaleBar {
  /** Length in the display unit, a round 1-2-5 number. */
  readonly length: number;
  readonly widthPx: number;
}

/** The longest bar of 1, 2 or 5 times a power of ten display units (`mmPerUnit` each) at most `maxPx` wide. */
export function scaleBar(view: Viewport, maxPx = 110, mmPerUnit = 1): ScaleBar {
  const pxPerUnit = view.pxPerMm * mmPerUnit;
  const most = maxPx / pxPerUnit;
  const decade = Math.floor(Math.log10(most));
  const length = [5, 2, 1].map((n) => decimal(n, decade)).find((n) => n <= most) ?? decimal(1, decade);
  return { length, widthPx: length * pxPerUnit };
}

/**
 * The step (mm) of one arrow key: the greatest of 1, 0.1, 0.01 … display units (`mmPerUnit` each) that moves at most 10 px on screen,
 * however small once it is some thousandths of a mm.
 */
export function keyStepMm(view: Viewport, mmPerUnit = 1): number {
  const steps = [1, 0.1, 0.01, 0.001, 0.0001].map((step) => step * mmPerUnit);
  return steps.find((mm) => mm * view.pxPerMm <= MOST_KEY_STEP_PX || mm < FINE_STEP_MM) ?? FINE_STEP_MM;
}

/** Round lengths (mm) in view, about one in `everyPx`, none of them inside the fold. */
export function gridLengths(view: Viewport, range: LengthRange, everyPx: number): readonly number[] {
  const stepMm = roundStep(everyPx / view.pxPerMm);
  const first = Math.ceil(range.fromMm / stepMm);
  const last = Math.floor(range.toMm / stepMm);
  const { fold } = view;
  return Array.from({ length: Math.max(0, last - first + 1) }, (_, i) => (first + i) * stepMm).filter(
    (z) => fold === null || z <= fold.fromMm || z >= fold.toMm,
  );
}

function foldedPart(fold: Fold | null, range: LengthRange): { lengthMm: number; widthPx: number } {
  if (fold === null) return { lengthMm: 0, widthPx: 0 };
  const lengthMm = Math.min(fold.toMm, range.toMm) - Math.max(fold.fromMm, range.fromMm);
  if (lengthMm <= 0) return { lengthMm: 0, widthPx: 0 };
  return { lengthMm, widthPx: (fold.widthPx * lengthMm) / (fold.toMm - fold.fromMm) };
}

function plainStretch(wanted: number): number {
  const decade = Math.floor(Math.log10(wanted));
  const lead = wanted / 10 ** decade;
  const step = STRETCH_STEPS.findLast((s) => s <= lead) ?? 1;
  return step * 10 ** decade;
}

function roundStep(aboutMm: number): number {
  const step = tickIncrement(0, aboutMm, 1);
  return step > 0 ? step : -1 / step;
}

/** `digit × 10^decade` without the dust of a multiplication. */
function decimal(digit: number, decade: number): number {
  return Number(`${digit}e${decade}`);
}

function limited(pxPerMm: number): number {
  return Math.min(PX_PER_MM_LIMITS.most, Math.max(PX_PER_MM_LIMITS.least, pxPerMm));
}
