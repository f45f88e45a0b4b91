import { none } from '../outcome.ts';

import { finite, type Quantity } from '../paraxial/absence.ts';
import { axisCrossing } from '../paraxial/scale.ts';
import { powerAt } from '../paraxial/trace.ts';
import type { Train } from '../train/types.ts';
import type { Hit, RayPath } from './types.ts';

/** Where the rays close to one ray come together, in mm along the ray from its last surface, positive the way the light runs. */
export interface Foci {
  /** In the meridian. */
  readonly tangential: Quantity;
  /** Across it. */
  readonly sagittal: Quantity;
}

/**
 * The foci of the narrow pencil about a ray in the meridian, by Coddington's equations n′cos²I′/t′ − n cos²I/t = Φκt and n′/s′ − n/s = Φκs,
 * Φ = n′cos I′ − n cos I, with the curvatures κ of the surface at the very point (Welford, Aberrations of Optical Systems, 9.7; Smith,
 * Modern Optical Engineering, on Coddington's equations). They are carried as offset and slope of the close rays, so that a focus passes
 * through infinity and back without a case. The pencil starts at `objectZ` (from the first vertex), or parallel when it is null.
 * 'ray lost' when the ray does not get through, 'image at infinity' when the pencil leaves parallel.
 */
export function coddington(train: Train, path: RayPath, objectZ: number | null): Foci {
  if (path.lost !== null) return { tangential: none('ray lost'), sagittal: none('ray lost') };
  const { count } = train;
  let [offsetT, offsetS, slopeT, slopeS] = objectZ === null ? [1, 1, 0, 0] : [0, 0, 1, 1];
  let [scaleT, scaleS] = [1, 1];
  let z = objectZ ?? 0;
  let directionZ = path.direction[2];
  for (let k = 0; k < count; k++) {
    const hit = path.hits[k];
    if (hit?.direction == null || hit.cosRefraction === null) break;
    const at = train.z[k]! + hit.point[2];
    const [n, nRear] = [train.index[k]!, train.index[k + 1]!];
    // Behind a mirror, where the index is negative, lengths along the ray are negative too.
    const length = (at - z) / (directionZ * Math.sign(n));
    offsetT += length * slopeT;
    offsetS += length * slopeS;
    const power = train.thinPower[k] === 0 ? 0 : powerAt(train, k);
    if (power === 0) {
      const [cosI, cosR] = [hit.cosIncidence, hit.cosRefraction];
      const [curvedT, curvedS] = localCurvatures(train, k, hit);
      const bend = nRear * cosR - n * cosI;
      const arc = offsetT / cosI;
      const [cameT, bentT] = [n * cosI * slopeT, bend * curvedT * arc];
      const [cameS, bentS] = [n * slopeS, bend * curvedS * offsetS];
      slopeT = (cameT - bentT) / (nRear * cosR);
      slopeS = (cameS - bentS) / nRear;
      scaleT = (Math.abs(cameT) + Math.abs(bentT)) / Math.abs(nRear * cosR);
      scaleS = (Math.abs(cameS) + Math.abs(bentS)) / Math.abs(nRear);
      offsetT = arc * cosR;
    } else {
      // The collinear map acts on depths along the axis, n′/z′ = n/z + φ, in both directions alike.
      const cosZ = directionZ * Math.sign(n);
      const cosRearZ = hit.direction[2] * Math.sign(nRear);
      const [cameT, bentT] = [(n * slopeT) / cosZ, power * offsetT];
      const [cameS, bentS] = [(n * slopeS) / cosZ, power * offsetS];
      slopeT = (cosRearZ / nRear) * (cosRearZ / cosZ) * (cameT - bentT);
      slopeS = (cosRearZ / nRear) * (cameS - bentS);
      scaleT = (Math.abs(cameT) + Math.abs(bentT)) / Math.abs(nRear);
      scaleS = (Math.abs(cameS) + Math.abs(bentS)) / Math.abs(nRear);
      offsetT *= cosRearZ / cosZ;
    }
    z = at;
    directionZ = hit.direction[2];
  }
  const way = Math.sign(train.index[count]!);
  return {
    tangential: axisCrossing(way, offsetT, slopeT, scaleT, 'image at infinity'),
    sagittal: axisCrossing(way, offsetS, slopeS, scaleS, 'image at infinity'),
  };
}

/** z of both foci less the plane `planeZ`, all from the last vertex: what a plot of the field shows. */
export function fociFrom(foci: Foci, path: RayPath, planeZ: number): Foci {
  const last = path.hits.at(-1);
  const shift = (along: Quantity): Quantity =>
    along.ok && last?.direction != null
      ? finite(last.point[2] + along.value * last.direction[2] - planeZ)
      : along;
  return { tangential: shift(foci.tangential), sagittal: shift(foci.sagittal) };
}

/**
 * Curvatures of surface `k` where the ray meets it, in the meridian z″/(1 + z′²)^{3/2} and across it z′/(r√(1 + z′²)), in 1/mm, positive when
 * the centre lies to the right. z′/r is formed without dividing by r, so that the vertex is no case of its own.
 */
function localCurvatures(train: Train, k: number, { point }: Hit): readonly [number, number] {
  const c = train.curvature[k]!;
  const squared = point[0] * point[0] + point[1] * point[1];
  const root = Math.sqrt(1 - (1 + train.conic[k]!) * c * c * squared);
  let slopeOverR = 0;
  let second = 0;
  for (let i = train.asphereFrom[k + 1]! - 1; i >= train.asphereFrom[k]!; i--) {
    const power = 2 * (i - train.asphereFrom[k]!) + 4;
    const coefficient = train.asphere[i]!;
    slopeOverR = slopeOverR * squared + power * coefficient;
    second = second * squared + power * (power - 1) * coefficient;
  }
  slopeOverR = slopeOverR * squared + c / root;
  second = second * squared + c / root ** 3;
  const stretch = Math.sqrt(1 + slopeOverR * slopeOverR * squared);
  return [second / stretch ** 3, slopeOverR / stretch];
}
