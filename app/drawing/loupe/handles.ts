import { mmPer } from '../../../engine/index.ts';
import { keyStepMm } from '../../board/fit.ts';
import { heightOf, xOf, yOf, zOf } from '../../board/viewport.ts';
import type { LoupeView } from '../../store/viewStore.ts';
import { formatNumber } from '../../ui/format.ts';
import type { Handle, Viewed } from '../handle.ts';
import type { Sight } from '../sight.ts';
import { plain } from '../words.ts';
import type { Loupe } from './loupe.ts';

/** So near, px, the image plane and the end of the field catch the loupe. */
const CATCH_PX = 9;
/** The grip of the plane stands in the lower part of the ring, and is easy to hit. */
const PLANE_GRIP_SHARE = 0.84;
const PLANE_GRIP_PX = 8;
/** Steps of the plane through half the loupe. */
const PLANE_STEPS = 40;

/** The loupe's grips: its ring and the point it looks at go anywhere, the plane in it through focus. */
export function loupeHandles({ reading, view, length }: Sight, loupe: Loupe | null): readonly Handle[] {
  if (!loupe) return [];
  const { look, target, xPx, yPx, radiusPx, inside } = loupe;
  const before = reading.view.loupe;
  const words = (zMm: number, yMm: number) => `${length(zMm)} behind the first vertex, height ${length(yMm)}`;
  const viewed = (change: Partial<LoupeView>, says: string): Viewed => ({
    change: { loupe: { ...before, ...change } },
    says,
  });
  const lookAt = (dxPx: number, dyPx: number, snap: boolean): Viewed => {
    const [toX, toY] = [target.xPx + dxPx, target.yPx + dyPx];
    const zMm = zOf(view, toX);
    const heightMm = heightOf(view, toY);
    const isOnImage = snap && look.imageMm !== null && Math.abs(xOf(view, look.imageMm) - toX) < CATCH_PX;
    const end = fieldEndMm(reading);
    const isAtEnd = isOnImage && end !== null && Math.abs(yOf(view, end) - toY) < CATCH_PX;
    return viewed(
      { zMm: isOnImage ? null : zMm, heightMm: isAtEnd ? null : heightMm },
      isOnImage ? 'on the image plane' : words(zMm, heightMm),
    );
  };
  const plane = (shiftMm: number): Viewed => {
    const planeMm = Math.min(loupe.halfMm, Math.max(-loupe.halfMm, shiftMm));
    return viewed({ planeMm }, planeWords(planeMm));
  };
  const keyMm = keyStepMm(view, mmPer(reading.view.unit));
  const rms = look.rmsMm.ok ? `, rms ${formatNumber(1000 * look.rmsMm.value, 2)} µm` : '';
  const planePx = xOf(inside, look.planeMm);
  return [
    {
      ...base,
      id: 'loupe:plane',
      order: 0,
      xPx: planePx,
      yPx: yPx + PLANE_GRIP_SHARE * radiusPx,
      line: null,
      radiusPx: PLANE_GRIP_PX,
      cursor: 'col-resize',
      label: 'loupe, plane through focus',
      look: 'round',
      slider: {
        valueNow: before.planeMm,
        valueText: `${planeWords(before.planeMm)}${rms}`,
        valueMin: -loupe.halfMm,
        valueMax: loupe.halfMm,
        orientation: 'horizontal',
      },
      viewing: {
        drag: (dxPx) => plane(before.planeMm + dxPx / inside.pxPerMm),
        step: (amountMm) => plane(before.planeMm + ((amountMm / keyMm) * loupe.halfMm) / PLANE_STEPS),
      },
    },
    {
      ...base,
      id: 'loupe',
      order: 1,
      xPx,
      yPx,
      line: null,
      radiusPx,
      cursor: 'move',
      label: 'loupe',
      look: 'none',
      slider: { valueNow: look.zMm, valueText: words(look.zMm, look.yMm), orientation: 'horizontal' },
      viewing: {
        drag: lookAt,
        step: (amountMm) => viewed({ zMm: look.zMm + amountMm, heightMm: look.yMm }, ''),
      },
    },
    {
      ...base,
      id: 'loupe:height',
      order: 6,
      xPx: target.xPx,
      yPx: target.yPx,
      line: null,
      cursor: 'move',
      label: 'loupe, height',
      look: 'none',
      slider: { valueNow: look.yMm, valueText: words(look.zMm, look.yMm), orientation: 'vertical' },
      viewing: {
        drag: lookAt,
        step: (amountMm) => viewed({ heightMm: look.yMm + amountMm }, ''),
      },
    },
  ];
}

/** The grips with those that the ring covers no longer drawn; they keep their sliders. */
export function withCovered(handles: readonly Handle[], loupe: Loupe | null): readonly Handle[] {
  if (!loupe) return handles;
  const isCovered = ({ xPx, yPx }: Handle) => Math.hypot(xPx - loupe.xPx, yPx - loupe.yPx) < loupe.radiusPx;
  return handles.map((handle) =>
    handle.look !== 'none' && isCovered(handle) ? { ...handle, look: 'none' } : handle,
  );
}

/** Where the plane through focus stands from the middle of the loupe. */
const planeWords = (shiftMm: number): string =>
  `plane ${shiftMm > 0 ? '+' : ''}${plain(1000 * shiftMm, 1)} µm`;

/** The height of the outermost field's paraxial chief ray on the image plane. */
function fieldEndMm({ analysis, sketch }: Sight['reading']): number | null {
  const height = analysis.light.imageHeightMm;
  const outermost = sketch.field.fractions.reduce(
    (most, share) => (Math.abs(share) > Math.abs(most) ? share : most),
    0,
  );
  return height.ok ? outermost * height.value : null;
}

const base = {
  tabStop: true,
  selects: null,
  drag: null,
  step: null,
  entry: null,
  why: null,
} as const;
