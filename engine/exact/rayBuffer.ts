import type { Loss, Lost } from './types.ts';

/**
 * Rays lie in one `Float64Array`, `STRIDE` numbers each, one ray after the other: the place `X`, `Y`, `Z` (mm), the direction
 * cosines `L`, `M`, `N`, the optical path `PATH` so far (mm) and a `CODE`, 0 as long as the ray runs.
 */
export const STRIDE = 8;
export const X = 0;
export const Y = 1;
export const Z = 2;
export const L = 3;
export const M = 4;
export const N = 5;
export const PATH = 6;
export const CODE = 7;

/** A code is LOSSES · surface + one of these. */
export const LOSSES = 4;
export const MISSED = 1;
export const REFLECTED = 2;
export const CLIPPED = 3;

/** Where and why the ray with this code ended; null when it runs. */
export function lostOf(code: number): Lost | null {
  if (code === 0) return null;
  const surface = Math.floor(code / LOSSES);
  return { why: WHY[code - LOSSES * surface] ?? 'missed', surface };
}

const WHY: readonly (Loss | undefined)[] = [undefined, 'missed', 'totally reflected', 'clipped'];
