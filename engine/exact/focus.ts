import { none, type Outcome, some } from '../outcome.ts';
import { type Absence, finite, type Quantity } from '../paraxial/absence.ts';
import { isNegligible } from '../paraxial/scale.ts';
import type { Weighted } from './landing.ts';

/**
 * Rays are straight, so the mean square radius of a spot about its own centroid is a parabola in the shift d of the plane:
 * square + 2·cross·d + slopeSquare·d², in mm² and mm.
 */
export interface SpotMoments {
  readonly square: number;
  readonly cross: number;
  readonly slopeSquare: number;
  /** Mean square of the slopes themselves: what `slopeSquare` is judged against. */
  readonly slopeScale: number;
}

/** The moments of the spot that these landings make together, in two passes; 'no ray through'. */
export function spotMoments(parts: readonly Weighted[]): Outcome<SpotMoments, Absence> {
  let [total, sumX, sumY, sumSX, sumSY] = [0, 0, 0, 0, 0];
  for (const { landing, weight: share } of parts) {
    const { x, y, slopeX, slopeY, weight, count } = landing;
    for (let i = 0; i < count; i++) {
      const w = share * weight[i]!;
      total += w;
      sumX += w * x[i]!;
      sumY += w * y[i]!;
      sumSX += w * slopeX[i]!;
      sumSY += w * slopeY[i]!;
    }
  }
  if (total === 0) return none('no ray through');
  const [meanX, meanY, meanSX, meanSY] = [sumX / total, sumY / total, sumSX / total, sumSY / total];
  let [square, cross, slopeSquare] = [0, 0, 0];
  for (const { landing, weight: share } of parts) {
    const { x, y, slopeX, slopeY, weight, count } = landing;
    for (let i = 0; i < count; i++) {
      const w = (share * weight[i]!) / total;
      const [dx, dy] = [x[i]! - meanX, y[i]! - meanY];
      const [dsx, dsy] = [slopeX[i]! - meanSX, slopeY[i]! - meanSY];
      square += w * (dx * dx + dy * dy);
      cross += w * (dx * dsx + dy * dsy);
      slopeSquare += w * (dsx * dsx + dsy * dsy);
    }
  }
  return some({ square, cross, slopeSquare, slopeScale: slopeSquare + meanSX * meanSX + meanSY * meanSY });
}

/** The rms radius (mm) of a spot on each of the planes `defocusMm` behind the image plane. */
export const throughFocus = (moments: SpotMoments, defocusMm: Float64Array): Float64Array =>
  defocusMm.map((d) => {
    const { square, cross, slopeSquare } = moments;
    return Math.sqrt(Math.max(0, square + d * (2 * cross + d * slopeSquare)));
  });

/** The moments of a field's spot and how much the field counts. */
export interface WeightedMoments {
  readonly moments: SpotMoments;
  readonly weight: number;
}

/**
 * How far behind the image plane (mm, negative: in front of it) the weighted mean square of the fields' spot radii is least: −Σcross/Σslope².
 * 'no ray through' without fields; 'image at infinity' when the rays of every field are parallel.
 */
export function bestFocus(fields: readonly WeightedMoments[]): Quantity {
  let [cross, slopeSquare, scale] = [0, 0, 0];
  for (const { moments, weight } of fields) {
    cross += weight * moments.cross;
    slopeSquare += weight * moments.slopeSquare;
    scale += weight * moments.slopeScale;
  }
  if (fields.length === 0) return none('no ray through');
  return slopeSquare === 0 || isNegligible(Math.sqrt(slopeSquare), Math.sqrt(scale))
    ? none('image at infinity')
    : finite(-cross / slopeSquare);
}
