import { powerAt } from '../paraxial/trace.ts';
import type { Train } from '../train/types.ts';
import { asphereBlock } from './asphere.ts';
import { BLOCK_RAYS, conicBlock, type Meeting, sphereBlock, thinBlock, WORK } from './blocks.ts';
import { LOSSES, STRIDE } from './rayBuffer.ts';

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
 * `PATH` is a length and no phase. Never allocates, never throws.
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
  for (let start = 0; start < end; start += BLOCK_RAYS * STRIDE) {
    const stop = Math.min(end - start, BLOCK_RAYS * STRIDE);
    for (let i = 0; i < stop; i++) WORK[i] = rays[start + i]!;
    meeting.stop = stop;
    for (let k = from; k < to; k++) {
      const rim = clip ? semiDiameter[k]! * (1 + RIM_SLACK) : Number.POSITIVE_INFINITY;
      meeting.reach = k === 0 ? 0 : gap[k - 1]!;
      meeting.nFront = index[k]!;
      meeting.nBehind = index[k + 1]!;
      meeting.rimSquared = rim * rim;
      meeting.code = LOSSES * k;
      const c = curvature[k]!;
      if (thinPower[k] !== 0) thinBlock(meeting, powerAt(train, k));
      else if (asphereFrom[k + 1]! > asphereFrom[k]!) asphereBlock(meeting, train, k);
      else if (conic[k]! * c === 0 && index[k]! > 0 && index[k + 1]! > 0) sphereBlock(meeting, c);
      else conicBlock(meeting, c, conic[k]!);
    }
    for (let i = 0; i < stop; i++) rays[start + i] = WORK[i]!;
  }
}

/** Filled anew for every surface: a call makes no object. */
const meeting: Meeting = { stop: 0, reach: 0, nFront: 1, nBehind: 1, rimSquared: 0, code: 0 };
