/**
 * What rays run through: one sketch at one setting in one line, flattened. Arrays of length `count` are indexed by surface;
 * `index` and `indexSpread` have one more entry, `index[k]` being the medium in front of surface k. A thin part or a stop is one
 * surface, a plate two, glass of n surfaces n. Behind an odd number of mirrors index and gap are negative. Lengths in mm, powers in 1/mm, positive to the right.
 */
export interface Train {
  readonly count: number;
  /** From surface k to surface k + 1; the last entry runs to the fixed image plane and is 0 when the image follows the focus. */
  readonly gap: Float64Array;
  /** Vertex position from the first surface. */
  readonly z: Float64Array;
  /** 1/radius, positive when the centre lies to the right. */
  readonly curvature: Float64Array;
  /** Conic constant: 0 a sphere, −1 a paraboloid. */
  readonly conic: Float64Array;
  /** Coefficients of r⁴, r⁶, … added to the conic's sag, in mm⁻³, mm⁻⁵, …: those of all surfaces in a row. */
  readonly asphere: Float64Array;
  /** Surface k has the coefficients from `asphereFrom[k]` up to, not including, `asphereFrom[k + 1]`; count + 1 entries. */
  readonly asphereFrom: Int32Array;
  /** Power of an ideal thin part standing here; adds to (n′ − n)·curvature. */
  readonly thinPower: Float64Array;
  readonly index: Float64Array;
  /** n short − n long of each medium; 0 where no Abbe number is given. */
  readonly indexSpread: Float64Array;
  /** Power short − power long of the thin part here; 0 where no Abbe number is given. */
  readonly powerSpread: Float64Array;
  /** Infinity where the part is open. */
  readonly semiDiameter: Float64Array;
  /** Index of the part in the sketch that the surface belongs to. */
  readonly partOf: Int32Array;
  /** The surface in front of whose refraction the stop lies; −1 when no stop is given. */
  readonly stopSurface: number;
  /** z of the object from the first surface (negative when it stands in front), or null at infinity. */
  readonly objectZ: number | null;
  /** z of the fixed image plane from the first surface, or null when the image follows the focus. */
  readonly imageZ: number | null;
}
