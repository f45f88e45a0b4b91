import type { Effect, Wheel } from './hand.ts';

/** Zoom per px of wheel (natural logarithm): a notch of 100 px is a factor of 1.22. */
const PER_PX = 0.002;
/** A trackpad's pinch reports about a tenth of what a wheel does. */
const PER_PINCH_PX = 0.01;
/** One event never does more than this many px' worth. */
const MOST_PX = 200;
const MOST_PINCH_PX = 25;
/** Px to a line and to a page, for wheels that count in those (`deltaMode` 1 and 2). */
const UNIT_PX = [1, 16, 400];

/**
 * Ctrl or ⌘: zoom about the pointer; Shift: stretch the heights; sideways: pan; else zoom about the pointer in length.
 */
export function wheelEffects({ xPx, yPx, dxPx, dyPx, modifiers }: Wheel): readonly Effect[] {
  if (modifiers.ctrl || modifiers.meta) {
    const factor = Math.exp(-limited(dyPx, MOST_PINCH_PX) * PER_PINCH_PX);
    return factor === 1 ? [] : [{ do: 'zoom', xPx, yPx, factor, about: 'both' }];
  }
  if (modifiers.shift) {
    // Some systems turn the wheel sideways while Shift is held.
    const factor = Math.exp(-limited(dyPx === 0 ? dxPx : dyPx, MOST_PX) * PER_PX);
    return factor === 1 ? [] : [{ do: 'stretch', factor }];
  }
  if (Math.abs(dxPx) > Math.abs(dyPx)) return [{ do: 'pan', dxPx: -dxPx, dyPx: 0 }];
  const factor = Math.exp(-limited(dyPx, MOST_PX) * PER_PX);
  return factor === 1 ? [] : [{ do: 'zoom', xPx, yPx, factor, about: 'length' }];
}

/** A wheel event's delta in px, from its `deltaMode`. */
export function wheelPx(delta: number, deltaMode: number): number {
  return delta * (UNIT_PX[deltaMode] ?? 1);
}

function limited(px: number, most: number): number {
  return Math.min(most, Math.max(-most, px));
}
