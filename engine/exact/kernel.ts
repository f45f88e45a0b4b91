import { powerAt } from '../paraxial/trace.ts';
import type { Train } from '../train/types.ts';
import { asphereBlock } from './asphere.ts';
import { type Block, conicBlock, sphereBlock, thinBlock } from './blocks.ts';
import { LOSSES, STRIDE } from './rayBuffer.ts';

/** So many rays go through a surface before the next one: neighbours do not wait for each other, and a block stays in the nearest cache. */
const BLOCK = 128;

/** Share of a rim's radius by which a ray may pass beyond it: a ray aimed at the very edge passes. */
const RIM_SLACK = 1e-9;

/**
 * Traces `count` rays (see rayBuffer.ts) in place through the surfaces from `from` up to, not including, `to`; through the whole
 * train by default.
 *
 * On entry `Z` counts from the vertex of surface `from − 1`, for `from` = 0 from the first vertex; on return from the vertex of surface
 * `to − 1`. Directions are of unit length. `PATH` grows by index times length, positive also behind mirrors, where `N` is negative.
 * With `clip` a ray ends at the first rim that it passes outside of (`train.semiDiameter`).
 *
 * A ray whose `CODE` is not 0 is left alone. One that ends on the way gets a code that `lostOf` reads. Where it missed a surface it stays
 * as it left the one before, `Z` counting from that one's vertex; where it is reflected totally or clipped it has the point on that
 * surface and the direction in front of it. Beyond the equator of a conic, where its sag is no graph, is a miss, and so is a ray that
 * runs against the light.
 *
 * A thin part is a plane with the collinear map n′ dx′/dz = n dx/dz − φ x, the same in y; its own path is 0, so behind thin parts
 * `PATH` is a length and no phase. Never allocates but for one record at the call, never throws.
 */
export function traceBatch(
  train: Train,
  rays: Float64Array,
  count: number,
  clip = false,
  from = 0,
  to = train.count,
): void {
  const { gap, index, curvature, conic, asphereFrom, thinPower, semiDiameter } = train;
  const end = count * STRIDE;
  const block: Block = { rays, start: 0, stop: 0, reach: 0, nFront: 1, nBehind: 1, rimSquared: 0, code: 0 };
  for (let start = 0; start < end; start += BLOCK * STRIDE) {
    block.start = start;
    block.stop = Math.min(end, start + BLOCK * STRIDE);
    for (let k = from; k < to; k++) {
      const rim = clip ? semiDiameter[k]! * (1 + RIM_SLACK) : Number.POSITIVE_INFINITY;
      block.reach = k === 0 ? 0 : gap[k - 1]!;
      block.nFront = index[k]!;
      block.nBehind = index[k + 1]!;
      block.rimSquared = rim * rim;
      block.code = LOSSES * k;
      if (thinPower[k] !== 0) thinBlock(block, powerAt(train, k));
      else if (asphereFrom[k + 1]! > asphereFrom[k]!) asphereBlock(block, train, k);
      else if (conic[k] === 0 || curvature[k] === 0) sphereBlock(block, curvature[k]!);
      else conicBlock(block, curvature[k]!, conic[k]!);
    }
  }
}
