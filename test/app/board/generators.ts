import fc from 'fast-check';
import type { Viewport } from '../../../app/board/viewport.ts';

export const SEED = { seed: 20261201 };

const finite = (min: number, max: number) => fc.double({ min, max, noNaN: true });

/** A length scale between a house and a hair, evenly over the decades. */
const anyScale = finite(-2, 2).map((decade) => 10 ** decade);

/** A view of any size and scale, with a fold about half the time. */
export const anyViewport = (): fc.Arbitrary<Viewport> =>
  fc
    .record({
      widthPx: finite(100, 4000),
      heightPx: finite(100, 3000),
      originMm: finite(-2000, 2000),
      pxPerMm: anyScale,
      stretch: finite(0.1, 50),
      axisYPx: finite(-500, 3500),
      foldFromMm: finite(-5000, 2000),
      foldLengthMm: finite(1, 5000),
      foldWidthPx: finite(4, 60),
      folded: fc.boolean(),
    })
    .map(({ foldFromMm, foldLengthMm, foldWidthPx, folded, ...view }) => ({
      ...view,
      fold: folded ? { fromMm: foldFromMm, toMm: foldFromMm + foldLengthMm, widthPx: foldWidthPx } : null,
    }));

export const anyLengthMm = () => finite(-6000, 6000);
export const anyPx = () => finite(-1000, 5000);
export const anyFactor = () => finite(0.2, 5);
