import type { Train } from './types.ts';

/** One surface and the space behind it. Lengths in mm, powers in 1/mm, positive to the right. */
export interface SurfaceSpec {
  /** Place in the sketch of the part that the surface belongs to. */
  readonly part: number;
  /** 1/radius, positive when the centre lies to the right; 0 (the default) is a plane. */
  readonly curvaturePerMm?: number;
  readonly conic?: number;
  /** Coefficients of r⁴, r⁶, … added to the conic's sag, in mm⁻³, mm⁻⁵, … */
  readonly asphere?: readonly number[];
  /** Power of an ideal thin part standing here. */
  readonly thinPowerPerMm?: number;
  /** Thin power short − long. */
  readonly powerSpreadPerMm?: number;
  /** Half the clear diameter; Infinity (the default) where the part is open. */
  readonly semiDiameterMm?: number;
  /** Index of the medium behind; negative behind an odd number of mirrors. */
  readonly indexAfter: number;
  /** n short − n long of the medium behind. */
  readonly spreadAfter?: number;
  /** To the next surface; negative where light runs to the left. Without meaning on the last surface. */
  readonly gapMm: number;
}

export interface TrainSpec {
  readonly objectIndex: number;
  readonly objectSpread?: number;
  readonly surfaces: readonly SurfaceSpec[];
  /** The surface in front of whose refraction the stop lies; −1 (the default) when no stop is given. */
  readonly stopSurface?: number;
  /** z of the object from the first surface; null at infinity. */
  readonly objectZ: number | null;
  /** Fixed image plane from the last surface; null when the image follows the focus. */
  readonly imageDistanceMm: number | null;
}

/**
 * The train that `spec` describes: its surfaces laid out in flat arrays. Curved surfaces, mirrors (a negative
 * index and a negative gap behind them) and ideal thin parts may be mixed.
 */
export function buildTrain(spec: TrainSpec): Train {
  const count = spec.surfaces.length;
  // One block for all the numbers: a small buffer of its own for each array costs more than filling it.
  const block = new Float64Array(9 * count + 2);
  const list = (place: number) => block.subarray(place * count, (place + 1) * count);
  const [gap, z, curvature, conic] = [list(0), list(1), list(2), list(3)];
  const [thinPower, powerSpread, semiDiameter] = [list(4), list(5), list(6)];
  const index = block.subarray(7 * count, 8 * count + 1);
  const indexSpread = block.subarray(8 * count + 1);
  const partOf = new Int32Array(count);
  const asphereFrom = new Int32Array(count + 1);
  for (const [k, surface] of spec.surfaces.entries())
    asphereFrom[k + 1] = asphereFrom[k]! + (surface.asphere?.length ?? 0);
  const asphere = new Float64Array(asphereFrom[count]!);
  index[0] = spec.objectIndex;
  indexSpread[0] = spec.objectSpread ?? 0;
  let at = 0;
  for (const [k, surface] of spec.surfaces.entries()) {
    const last = k === count - 1;
    z[k] = at;
    gap[k] = last ? (spec.imageDistanceMm ?? 0) : surface.gapMm;
    if (!last) at += surface.gapMm;
    curvature[k] = surface.curvaturePerMm ?? 0;
    conic[k] = surface.conic ?? 0;
    if (surface.asphere !== undefined) asphere.set(surface.asphere, asphereFrom[k]!);
    thinPower[k] = surface.thinPowerPerMm ?? 0;
    powerSpread[k] = surface.powerSpreadPerMm ?? 0;
    index[k + 1] = surface.indexAfter;
    indexSpread[k + 1] = surface.spreadAfter ?? 0;
    semiDiameter[k] = surface.semiDiameterMm ?? Number.POSITIVE_INFINITY;
    partOf[k] = surface.part;
  }
  return {
    count,
    gap,
    z,
    curvature,
    conic,
    asphere,
    asphereFrom,
    thinPower,
    index,
    indexSpread,
    powerSpread,
    semiDiameter,
    partOf,
    stopSurface: spec.stopSurface ?? -1,
    objectZ: spec.objectZ,
    imageZ: spec.imageDistanceMm === null ? null : at + spec.imageDistanceMm,
  };
}
