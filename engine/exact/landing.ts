/**
 * Rays of one field in one line where they meet the image plane: places in mm, slopes dx/dz and dy/dz there, and the share of the pupil
 * that each stands for. Lost rays are left out and counted; `count` are through, and what lies behind them in the arrays means nothing.
 */
export interface Landing {
  readonly x: Float64Array;
  readonly y: Float64Array;
  readonly slopeX: Float64Array;
  readonly slopeY: Float64Array;
  readonly weight: Float64Array;
  count: number;
  lost: number;
}

/** A landing with room for `size` rays, its lists in one block, or in `block` (5 · size numbers) when given. */
export function emptyLanding(size: number, block = new Float64Array(5 * size)): Landing {
  const list = (place: number) => block.subarray(place * size, (place + 1) * size);
  return { x: list(0), y: list(1), slopeX: list(2), slopeY: list(3), weight: list(4), count: 0, lost: 0 };
}

/** A landing and how much its line, or its field, counts. */
export interface Weighted {
  readonly landing: Landing;
  readonly weight: number;
}

/** The landing by itself. */
export const alone = (landing: Landing): readonly Weighted[] => [{ landing, weight: 1 }];
