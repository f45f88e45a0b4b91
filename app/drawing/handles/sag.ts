/** A curvature below this (1/mm) is flat: no radius is longer than 1e12 mm. */
const FLAT = 1e-12;
/** Share of a conic's edge that a drag leaves out, so that it does not end exactly where it is held. */
const EDGE_SHARE = 1e-6;
/** No radius is shorter than this in size, mm. */
const LEAST_RADIUS_MM = 1e-3;

/** Sag in mm of the conic alone at a height, without its powers; at its edge where it has ended. */
export function sagOfConic(
  { curvaturePerMm: c, conic }: { readonly curvaturePerMm: number; readonly conic: number },
  heightMm: number,
): number {
  const radicand = Math.max(0, 1 - (1 + conic) * c * c * heightMm * heightMm);
  return (c * heightMm * heightMm) / (1 + Math.sqrt(radicand));
}

/**
 * The curvature (1/mm) of the conic K whose sag at height h is z: 2z/(h² + (1 + K)z²), from h² − 2z/c + (1 + K)z² = 0. A sag beyond the
 * equator, |z| > h/√(1 + K), takes the one at the equator.
 */
export function curvatureForSag(sagMm: number, heightMm: number, conic: number): number {
  if (heightMm === 0) return 0;
  const mostMm = conic > -1 ? (heightMm / Math.sqrt(1 + conic)) * (1 - EDGE_SHARE) : Number.POSITIVE_INFINITY;
  const z = Math.min(mostMm, Math.max(-mostMm, sagMm));
  const square = heightMm * heightMm + (1 + conic) * z * z;
  // A hyperboloid reaches no further than its asymptotes.
  const curvature = square > 0 ? (2 * z) / square : Math.sign(z) / LEAST_RADIUS_MM;
  return Math.min(1 / LEAST_RADIUS_MM, Math.max(-1 / LEAST_RADIUS_MM, curvature));
}

/** The radius in mm of a curvature; null is flat. */
export const radiusOf = (curvaturePerMm: number): number | null =>
  Math.abs(curvaturePerMm) < FLAT ? null : 1 / curvaturePerMm;
