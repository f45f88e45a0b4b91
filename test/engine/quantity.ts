import type { Outcome } from '../../engine/outcome.ts';

/** The value of a quantity that must exist; fails with the reason when it does not. */
export function given<T>(quantity: Outcome<T> | undefined): T {
  if (!quantity?.ok) throw new Error(`absent: ${quantity?.why}`);
  return quantity.value;
}
