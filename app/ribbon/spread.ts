/** Something that wants its middle at a place along a row. */
export interface RowWish {
  readonly atPx: number;
  readonly halfPx: number;
}

/**
 * Middles for things in one row, each as near to its wish as the others let it: in the order given they keep `apartPx` between them and
 * stay between `fromPx` and `toPx` where they have room. Least squares, by pooling neighbours that are in each other's way.
 */
export function spread(
  wishes: readonly RowWish[],
  apartPx: number,
  fromPx: number,
  toPx: number,
): readonly number[] {
  // Measured from where each would stand if all were packed, the order is kept when these never fall.
  const packed: number[] = [];
  for (const [i, { halfPx }] of wishes.entries()) {
    const before = wishes[i - 1];
    packed.push(before ? (packed[i - 1] ?? 0) + before.halfPx + apartPx + halfPx : 0);
  }
  const pools: { sum: number; count: number }[] = [];
  for (const [i, { atPx }] of wishes.entries()) {
    let pool = { sum: atPx - (packed[i] ?? 0), count: 1 };
    for (let last = pools.at(-1); last && mean(last) > mean(pool); last = pools.at(-1)) {
      pools.pop();
      pool = { sum: pool.sum + last.sum, count: pool.count + last.count };
    }
    pools.push(pool);
  }
  const least = fromPx + (wishes[0]?.halfPx ?? 0);
  const most = toPx - (wishes.at(-1)?.halfPx ?? 0) - (packed.at(-1) ?? 0);
  return pools
    .flatMap((pool) => Array<number>(pool.count).fill(Math.max(least, Math.min(most, mean(pool)))))
    .map((shift, i) => shift + (packed[i] ?? 0));
}

const mean = ({ sum, count }: { readonly sum: number; readonly count: number }): number => sum / count;
