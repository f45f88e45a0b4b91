/** What a thin element of glass in one medium is given by, for its third-order sums. */
export interface ThinElement {
  /** Power in 1/mm, and the signed index of the medium on both its sides. */
  readonly powerPerMm: number;
  readonly mediumIndex: number;
  /** Index of its glass, positive. */
  readonly glassIndex: number;
  /** Bending q = (R2 + R1)/(R2 − R1). */
  readonly shapeFactor: number;
}

/** Heights at the element in mm, and index times slope in front of it, of the marginal and of the chief ray. */
export interface RaysAtElement {
  readonly y: number;
  readonly nu: number;
  readonly yChief: number;
  readonly nuChief: number;
}

/** S_I to S_V of one element, mm. */
export interface MonochromaticSums {
  readonly spherical: number;
  readonly coma: number;
  readonly astigmatism: number;
  readonly petzval: number;
  readonly distortion: number;
}

/**
 * S_I to S_V of a thin element, at its own conjugates and with the stop where the chief ray says. The structural form of Welford,
 * Aberrations of Optical Systems (1986), chapter on thin lenses: with the stop at the element S_II = yK, S_III = H²φ, S_IV = H²φ/n, S_V = 0,
 * moved to its place by the stop-shift equations.
 *
 * Written without the conjugate factor and without ȳ/y, so that an element at an image (y = 0) is an ordinary one. S_V comes from the chief
 * ray's own coma, with marginal and chief ray exchanged, less H·φ·ȳ·(ū + ū′), so it needs no division by y either.
 *
 * Null when glass and medium have one index. A medium other than air: indices relative to it, power over its index, sums times its index.
 */
export function thinElementSums(element: ThinElement, rays: RaysAtElement): MonochromaticSums | null {
  const { mediumIndex, shapeFactor } = element;
  const n = element.glassIndex / Math.abs(mediumIndex);
  if (n === 1) return null;
  const power = element.powerPerMm / mediumIndex;
  const { y, yChief } = rays;
  const [u, uChief] = [rays.nu / mediumIndex, rays.nuChief / mediumIndex];
  const H = u * yChief - uChief * y;
  // Slope in front plus slope behind: the conjugate factor is this over y·power.
  const slopes = 2 * u - power * y;
  const slopesChief = 2 * uChief - power * yChief;

  /** S_I/y² of a ray, and the coma of the stop in contact over −H·power/2·y. */
  const spherical = (height: number, sum: number): number => {
    const bend = height * power;
    const bent = bend * shapeFactor + ((2 * (n * n - 1)) / (n + 2)) * sum;
    return (
      (power / 4) *
      ((n / (n - 1)) ** 2 * bend * bend +
        ((n + 2) / (n * (n - 1) ** 2)) * bent * bent -
        (n / (n + 2)) * sum * sum)
    );
  };
  const coma = (height: number, sum: number): number =>
    ((n + 1) / (n * (n - 1))) * height * power * shapeFactor + ((2 * n + 1) / n) * sum;

  const S = spherical(y, slopes);
  const K = -0.5 * H * power * coma(y, slopes);
  const chiefS = spherical(yChief, slopesChief);
  const chiefK = 0.5 * H * power * coma(yChief, slopesChief);
  const petzval = (H * H * power) / n;
  return {
    spherical: mediumIndex * y * y * S,
    coma: mediumIndex * y * (yChief * S + K),
    astigmatism: mediumIndex * (yChief * (yChief * S + 2 * K) + H * H * power),
    petzval: mediumIndex * petzval,
    distortion: mediumIndex * yChief * (y * chiefS + chiefK - H * power * slopesChief),
  };
}
