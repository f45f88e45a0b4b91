import { none, type Outcome, some } from '../outcome.ts';
import { type Absence, finite, type Quantity } from '../paraxial/absence.ts';
import type { Weighted } from './landing.ts';
import type { ExactSetup } from './types.ts';

/** The size of a spot on a plane, lengths in mm; the lines that make it up taken together. */
export interface SpotSize {
  readonly centroidXMm: number;
  readonly centroidYMm: number;
  /** Root of the mean square distance from the centroid. */
  readonly rmsMm: number;
  /** Its parts in the sagittal (x) and tangential (y) direction. */
  readonly rmsXMm: number;
  readonly rmsYMm: number;
  /** Largest distance from the centroid. */
  readonly largestMm: number;
  /** Rays that reach the plane, and rays that do not. */
  readonly through: number;
  readonly lost: number;
}

/**
 * Centroid, rms and largest radius of the spot that these landings make together on the plane `defocusMm` behind the image plane. In two passes:
 * the mean of squares minus the square of the mean would lose the small spot far off the axis. 'no ray through'.
 */
export function spotSize(parts: readonly Weighted[], defocusMm = 0): Outcome<SpotSize, Absence> {
  let [total, sumX, sumY] = [0, 0, 0];
  let [through, lost] = [0, 0];
  for (const { landing, weight: share } of parts) {
    const { x, y, slopeX, slopeY, weight, count } = landing;
    for (let i = 0; i < count; i++) {
      const w = share * weight[i]!;
      total += w;
      sumX += w * (x[i]! + defocusMm * slopeX[i]!);
      sumY += w * (y[i]! + defocusMm * slopeY[i]!);
    }
    through += count;
    lost += landing.lost;
  }
  if (total === 0) return none('no ray through');
  const [centroidXMm, centroidYMm] = [sumX / total, sumY / total];
  let [squareX, squareY, largest] = [0, 0, 0];
  for (const { landing, weight: share } of parts) {
    const { x, y, slopeX, slopeY, weight, count } = landing;
    for (let i = 0; i < count; i++) {
      const w = share * weight[i]!;
      const dx = x[i]! + defocusMm * slopeX[i]! - centroidXMm;
      const dy = y[i]! + defocusMm * slopeY[i]! - centroidYMm;
      squareX += w * dx * dx;
      squareY += w * dy * dy;
      const distance = dx * dx + dy * dy;
      if (distance > largest) largest = distance;
    }
  }
  return some({
    centroidXMm,
    centroidYMm,
    rmsMm: Math.sqrt((squareX + squareY) / total),
    rmsXMm: Math.sqrt(squareX / total),
    rmsYMm: Math.sqrt(squareY / total),
    largestMm: Math.sqrt(largest),
    through,
    lost,
  });
}

/** Radius (mm) of the first dark ring in the main line, 1.22 λ N with the paraxial working f-number (Airy; Born and Wolf, Principles of Optics, 8.5); 'image at infinity'. */
export function airyRadius({ lines, marginal, imagePlaneMm }: ExactSetup): Quantity {
  const nu = Math.abs(marginal.nu[lines[0].train.count]!);
  if (!imagePlaneMm.ok || nu === 0) return none('image at infinity');
  return finite((1.22 * lines[0].wavelengthNm * 1e-6) / (2 * nu));
}
