/** The profile of one surface: a conic plus even powers of the radius (the form of ISO 10110-12). */
export interface Profile {
  /** 1/radius, positive when the centre lies to the right; 0 is a plane. */
  readonly curvaturePerMm: number;
  /** 0 a sphere, −1 a paraboloid. */
  readonly conic: number;
  /** Coefficients of r⁴, r⁶, … in mm⁻³, mm⁻⁵, … */
  readonly asphere: ArrayLike<number>;
}

/**
 * Sag z(r) in mm, positive to the right of the vertex: c r²/(1 + √(1 − (1 + K)c²r²)) + A4 r⁴ + A6 r⁶ + …; null where the conic has
 * ended, as a sphere does at its equator.
 */
export function sagAt({ curvaturePerMm: c, conic, asphere }: Profile, radiusMm: number): number | null {
  const squared = radiusMm * radiusMm;
  const share = c * radiusMm;
  const radicand = 1 - (1 + conic) * share * share;
  if (!(radicand >= 0)) return null;
  let powers = 0;
  for (let i = asphere.length - 1; i >= 0; i--) powers = powers * squared + (asphere[i] ?? 0);
  const sag = (c * squared) / (1 + Math.sqrt(radicand)) + powers * squared * squared;
  return Number.isFinite(sag) ? sag : null;
}

/** The height in mm at which the conic of a profile ends: 1/(c√(1 + K)); Infinity when it never does. */
export const conicEdge = ({ curvaturePerMm: c, conic }: Profile): number =>
  c === 0 || conic <= -1 ? Number.POSITIVE_INFINITY : 1 / (Math.abs(c) * Math.sqrt(1 + conic));
