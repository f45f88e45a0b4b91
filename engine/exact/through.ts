import type { Train } from '../train/types.ts';
import { traceBatch } from './kernel.ts';
import { CODE, LOSSES, MISSED, N, STRIDE } from './rayBuffer.ts';

/**
 * Traces `count` rays in place through the whole train. A ray that leaves the last surface sideways or against the light never meets an image
 * plane: it is lost as one that missed the surface `train.count`.
 */
export function traceThrough(train: Train, rays: Float64Array, count: number, clip = false): void {
  traceBatch(train, rays, count, clip);
  const forward = Math.sign(train.index[train.count]!);
  const code = LOSSES * train.count + MISSED;
  for (let at = 0; at < count * STRIDE; at += STRIDE) {
    if (rays[at + CODE] === 0 && !(forward * rays[at + N]! > 0)) rays[at + CODE] = code;
  }
}
