import { none, type Outcome, some } from '../outcome.ts';
import type { Absence } from '../paraxial/absence.ts';
import { diffractionContrast } from '../paraxial/sensor.ts';
import type { Landing, Weighted } from './landing.ts';

/** Contrast of a pattern of lines at one frequency, 0 to 1: of the traced spot alone, and what diffraction alone would leave. */
export interface Contrast {
  readonly perMm: number;
  /** Lines across the meridian: the spot's spread in y counts. */
  readonly tangential: number;
  /** Lines along the meridian: its spread in x counts. */
  readonly sagittal: number;
  readonly tangentialLimit: number;
  readonly sagittalLimit: number;
}

export interface ContrastPair {
  readonly atNyquist: Contrast;
  readonly atHalfNyquist: Contrast;
}

/** What diffraction allows in the main line: the f-numbers of the bundle as it arrives on the image plane, Infinity for one that has no width. */
export interface DiffractionLimit {
  readonly wavelengthNm: number;
  readonly tangentialFNumber: number;
  readonly sagittalFNumber: number;
}

/**
 * The limit of a bundle from the directions in which its rays arrive, 1/(n′·spread of the direction cosines): on the axis 1/(2 n′ sin U′), off it with the
 * obliquity and the vignetting that the bundle has. An outline that is cut is taken as the ellipse of the same width and height.
 */
export function diffractionLimit(landing: Landing, index: number, wavelengthNm: number): DiffractionLimit {
  const { slopeX, slopeY, count } = landing;
  let [widest, lowest, highest] = [0, 1, -1];
  for (let i = 0; i < count; i++) {
    const [sx, sy] = [slopeX[i]!, slopeY[i]!];
    const stretch = Math.sqrt(1 + sx * sx + sy * sy);
    const [l, m] = [Math.abs(sx) / stretch, sy / stretch];
    if (l > widest) widest = l;
    if (m < lowest) lowest = m;
    if (m > highest) highest = m;
  }
  return {
    wavelengthNm,
    tangentialFNumber: 1 / (index * Math.max(0, highest - lowest)),
    sagittalFNumber: 1 / (index * 2 * widest),
  };
}

/**
 * Contrast at `nyquistPerMm` line pairs per mm and at half of it, on the plane `defocusMm` behind the image plane: the size of the spot's
 * Fourier transform (Born and Wolf, Principles of Optics, 9.5, in the limit of short waves), all lines together. 'no ray through'.
 */
export function contrastOf(
  parts: readonly Weighted[],
  nyquistPerMm: number,
  limit: DiffractionLimit,
  defocusMm = 0,
): Outcome<ContrastPair, Absence> {
  const first = parts.find(({ landing }) => landing.count > 0)?.landing;
  if (first === undefined) return none('no ray through');
  // Phases are counted from one of the rays: far off the axis they would be large numbers with a small meaning.
  const x0 = first.x[0]! + defocusMm * first.slopeX[0]!;
  const y0 = first.y[0]! + defocusMm * first.slopeY[0]!;
  const wave = Math.PI * nyquistPerMm;
  let [total, cosX, sinX, cosY, sinY] = [0, 0, 0, 0, 0];
  let [cos2X, sin2X, cos2Y, sin2Y] = [0, 0, 0, 0];
  for (const { landing, weight: share } of parts) {
    const { x, y, slopeX, slopeY, weight, count } = landing;
    for (let i = 0; i < count; i++) {
      const w = share * weight[i]!;
      const phaseX = wave * (x[i]! - x0 + defocusMm * slopeX[i]!);
      const phaseY = wave * (y[i]! - y0 + defocusMm * slopeY[i]!);
      const [cx, sx, cy, sy] = [Math.cos(phaseX), Math.sin(phaseX), Math.cos(phaseY), Math.sin(phaseY)];
      total += w;
      cosX += w * cx;
      sinX += w * sx;
      cosY += w * cy;
      sinY += w * sy;
      cos2X += w * (cx * cx - sx * sx);
      sin2X += w * (2 * sx * cx);
      cos2Y += w * (cy * cy - sy * sy);
      sin2Y += w * (2 * sy * cy);
    }
  }
  if (total === 0) return none('no ray through');
  const at = (perMm: number, tangential: number, sagittal: number): Contrast => ({
    perMm,
    tangential: tangential / total,
    sagittal: sagittal / total,
    tangentialLimit: limitAt(perMm, limit.wavelengthNm, limit.tangentialFNumber),
    sagittalLimit: limitAt(perMm, limit.wavelengthNm, limit.sagittalFNumber),
  });
  return some({
    atNyquist: at(nyquistPerMm, Math.hypot(cos2Y, sin2Y), Math.hypot(cos2X, sin2X)),
    atHalfNyquist: at(nyquistPerMm / 2, Math.hypot(cosY, sinY), Math.hypot(cosX, sinX)),
  });
}

const limitAt = (perMm: number, wavelengthNm: number, fNumber: number): number =>
  perMm === 0 ? 1 : diffractionContrast(perMm, wavelengthNm, fNumber);
