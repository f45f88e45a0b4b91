import { type Pen, segment } from '../../board/pen.ts';
import type { Viewport } from '../../board/viewport.ts';
import { xOf, yOf } from '../../board/viewport.ts';
import type { ExactView } from '../../store/viewStore.ts';
import { formatNumber } from '../../ui/format.ts';
import { pencilLayer } from '../exact/layer.ts';
import { plain } from '../words.ts';
import { type Loupe, TARGET_PX, WORDS_LINE_PX, wordsPlace } from './loupe.ts';

const TICK_PX = 5;
/** Ticks nearer to each other than this are left out. */
const LEAST_TICK_PX = 4;
const MARK_PX = 4;
const AIRY_ASIDE_PX = 8;
const ALL = { paraxial: true, exact: true };

/** The loupe: a ring beside the point that it looks at, and in it rays, sensor, pixels, Airy disc and foci at its own scales. */
export function loupeLayer(pen: Pen, loupe: Loupe, exact: ExactView, sensorFixed: boolean): void {
  const { xPx, yPx, radiusPx, target, inside, look } = loupe;
  leader(pen, loupe);
  pen.circle(target.xPx, target.yPx, TARGET_PX, 'loupe target');
  pen.circle(xPx, yPx, radiusPx, 'paper');
  pen.clipped({ kind: 'disc', xPx, yPx, radiusPx }, () => {
    const [left, right, top, bottom] = [xPx - radiusPx, xPx + radiusPx, yPx - radiusPx, yPx + radiusPx];
    segment(pen, left, yOf(inside, 0), right, yOf(inside, 0), 'axis');
    if (look.imageMm !== null) imagePlane(pen, loupe, xOf(inside, look.imageMm), sensorFixed);
    const planePx = xOf(inside, look.planeMm);
    segment(pen, planePx, top, planePx, bottom, 'loupe plane');
    pencilLayer(pen, loupe, look.style, look.differs ? exact : ALL, inside);
    airy(pen, loupe, planePx);
    marks(pen, loupe);
  });
  pen.circle(xPx, yPx, radiusPx, 'loupe ring');
  words(pen, loupe);
}

/** From the point to a ring that had to stand away from it. */
function leader(pen: Pen, { target, xPx, yPx, radiusPx }: Loupe): void {
  const [dx, dy] = [xPx - target.xPx, yPx - target.yPx];
  const apart = Math.hypot(dx, dy);
  if (apart <= radiusPx + TARGET_PX + 1) return;
  const share = TARGET_PX / apart;
  segment(pen, target.xPx + share * dx, target.yPx + share * dy, xPx, yPx, 'loupe target');
}

function imagePlane(pen: Pen, { look, inside, yPx, radiusPx }: Loupe, x: number, sensorFixed: boolean): void {
  segment(pen, x, yPx - radiusPx, x, yPx + radiusPx, sensorFixed ? 'sensor' : 'image');
  const pitchPx = (look.pixelPitchMm ?? 0) * inside.pxPerMm * inside.stretch;
  if (pitchPx < LEAST_TICK_PX) return;
  const axisPx = yOf(inside, 0);
  const first = Math.ceil((yPx - radiusPx - axisPx) / pitchPx);
  const last = Math.floor((yPx + radiusPx - axisPx) / pitchPx);
  for (let tick = first; tick <= last; tick++) {
    const y = axisPx + tick * pitchPx;
    segment(pen, x, y, x + TICK_PX, y, 'scale bar');
  }
}

/** The Airy disc edge on, to scale, beside the plane through focus. */
function airy(pen: Pen, { look, inside }: Loupe, planePx: number): void {
  const { airyRadiusMm, bestFocus, paraxialPoint, yMm } = look;
  if (airyRadiusMm === null) return;
  const middle = bestFocus?.yMm ?? paraxialPoint?.yMm ?? yMm;
  const [top, bottom] = [yOf(inside, middle + airyRadiusMm), yOf(inside, middle - airyRadiusMm)];
  const x = planePx - AIRY_ASIDE_PX;
  pen.polyline([x + MARK_PX, top, x, top, x, bottom, x + MARK_PX, bottom], 'loupe airy');
}

/** A ring at the paraxial image point, a filled diamond at the best focus. */
function marks(pen: Pen, { look: { paraxialPoint, bestFocus }, inside }: Loupe): void {
  if (paraxialPoint) {
    const { xPx, yPx } = placeOf(inside, paraxialPoint);
    pen.circle(xPx, yPx, MARK_PX, 'focal point');
  }
  if (bestFocus) {
    const { xPx: x, yPx: y } = placeOf(inside, bestFocus);
    pen.closed([x - MARK_PX, y, x, y - MARK_PX, x + MARK_PX, y, x, y + MARK_PX], 'ink');
  }
}

const placeOf = (view: Viewport, { zMm, yMm }: { readonly zMm: number; readonly yMm: number }) => ({
  xPx: xOf(view, zMm),
  yPx: yOf(view, yMm),
});

/** Its scales and the spot, on the side with more room. */
function words(pen: Pen, loupe: Loupe): void {
  const { xPx, yPx, align } = wordsPlace(loupe);
  for (const [i, text] of loupeWords(loupe).entries()) {
    const style = i === 0 ? 'label' : 'label quiet';
    pen.text(xPx, yPx + i * WORDS_LINE_PX, text, style, { align, baseline: 'middle' });
  }
}

/** What stands beside the ring. */
function loupeWords({ look, lengths, heights }: Loupe): readonly string[] {
  const { rmsMm, planeMm, imageMm, zMm } = look;
  const shift = planeMm - (imageMm ?? zMm);
  const text = Math.abs(shift) < 1 ? `${plain(1000 * shift, 0)} µm` : `${plain(shift, 2)} mm`;
  const at = Math.abs(shift) < 5e-7 ? '' : `, ${shift > 0 ? '+' : ''}${text}`;
  return [
    'loupe',
    `heights ×${plain(heights, 2)}`,
    `lengths ×${plain(lengths, 2)}`,
    rmsMm.ok ? `rms ${formatNumber(1000 * rmsMm.value, 2)} µm${at}` : rmsMm.why,
  ];
}
