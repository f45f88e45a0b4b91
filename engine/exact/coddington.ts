import { none } from '../outcome.ts';
import type { Quantity } from '../paraxial/absence.ts';
import { axisCrossing } from '../paraxial/scale.ts';
import { powerAt } from '../paraxial/trace.ts';
import type { Train } from '../train/types.ts';
import { traceBatch } from './kernel.ts';
import { CODE, L, M, N, STRIDE, X, Y, Z } from './rayBuffer.ts';
import { runAt } from './surface.ts';
import type { RayPath } from './types.ts';

/** Where the rays close to one ray come together, in mm along the ray from its last surface, positive the way the light runs. */
export interface Foci {
  /** In the meridian. */
  readonly tangential: Quantity;
  /** Across it. */
  readonly sagittal: Quantity;
}

/**
 * The foci of the narrow pencil about a ray in the meridian, by Coddington's equations n′cos²I′/t′ − n cos²I/t = Φκt and n′/s′ − n/s = Φκs,
 * Φ = n′cos I′ − n cos I, with the curvatures κ of the surface at the very point (Welford, Aberrations of Optical Systems, 9.7). The ray has
 * its start (z from the first vertex) and direction; the pencil starts at `objectZ`, or parallel when it is null. 'ray lost', 'image at infinity'.
 */
export function coddington(
  train: Train,
  { start, direction }: Pick<RayPath, 'start' | 'direction'>,
  objectZ: number | null,
): Foci {
  const ray = new Float64Array(STRIDE);
  const length = Math.hypot(...direction);
  ray.set(start, X);
  for (let i = 0; i < 3; i++) ray[L + i] = direction[i]! / length;
  const [pencil] = follow(train, ray, 1, objectZ);
  if (!pencil || ray[CODE] !== 0) return { tangential: none('ray lost'), sagittal: none('ray lost') };
  return { tangential: along(train, pencil.meridian), sagittal: along(train, pencil.across) };
}

/** The z of the foci of many rays, in mm from the last vertex; NaN where the ray is lost or its pencil leaves parallel. */
export interface FocusDepths {
  readonly tangential: Float64Array;
  readonly sagittal: Float64Array;
}

/** The same for `count` rays in the meridian as they start in the first vertex plane; `starts` stays as it is. */
export function focusDepths(
  train: Train,
  starts: Float64Array,
  count: number,
  objectZ: number | null,
): FocusDepths {
  const rays = starts.slice(0, count * STRIDE);
  const pencils = follow(train, rays, count, objectZ);
  const depths = (which: 'meridian' | 'across') =>
    Float64Array.from(pencils, (pencil, i) => {
      const focus = rays[i * STRIDE + CODE] === 0 ? along(train, pencil[which]) : none('ray lost');
      return focus.ok ? rays[i * STRIDE + Z]! + focus.value * rays[i * STRIDE + N]! : Number.NaN;
    });
  return { tangential: depths('meridian'), sagittal: depths('across') };
}

/** A ray close by: how far beside the ray it runs and how fast that grows, and what was added up to get the slope. */
interface Neighbour {
  offset: number;
  slope: number;
  scale: number;
}

interface Pencil {
  readonly meridian: Neighbour;
  readonly across: Neighbour;
  /** Of the ray: where it last was, z from the first vertex, and its direction from there. */
  z: number;
  cosZ: number;
  cosY: number;
}

/** Crossing with the ray at −offset/slope: a focus passes through infinity and back without a case of its own. */
const along = ({ index, count }: Train, { offset, slope, scale }: Neighbour): Quantity =>
  axisCrossing(Math.sign(index[count]!), offset, slope, scale, 'image at infinity');

/** Traces the rays surface by surface, and the pencils about them. */
function follow(train: Train, rays: Float64Array, count: number, objectZ: number | null): Pencil[] {
  const close = (): Neighbour => ({
    offset: objectZ === null ? 1 : 0,
    slope: objectZ === null ? 0 : 1,
    scale: 1,
  });
  const pencils = Array.from({ length: count }, (_, i) => ({
    meridian: close(),
    across: close(),
    z: objectZ ?? 0,
    cosZ: rays[i * STRIDE + N]!,
    cosY: rays[i * STRIDE + M]!,
  }));
  for (let k = 0; k < train.count; k++) {
    traceBatch(train, rays, count, false, k, k + 1);
    for (const [i, pencil] of pencils.entries()) {
      if (rays[i * STRIDE + CODE] === 0) meet(pencil, train, k, rays, i * STRIDE);
    }
  }
  return pencils;
}

/** Takes the pencil to surface `k` and through it; the ray at place `at` is behind it. */
function meet(pencil: Pencil, train: Train, k: number, rays: Float64Array, at: number): void {
  const { meridian, across, cosZ, cosY } = pencil;
  const [n, nRear] = [train.index[k]!, train.index[k + 1]!];
  const z = train.z[k]! + rays[at + Z]!;
  // Behind a mirror, where the index is negative, lengths along the ray are negative too.
  const length = (z - pencil.z) / (cosZ * Math.sign(n));
  meridian.offset += length * meridian.slope;
  across.offset += length * across.slope;
  const [rearY, rearZ] = [rays[at + M]!, rays[at + N]!];
  if (train.thinPower[k] !== 0) {
    // The collinear map acts on depths along the axis, n′/z′ = n/z + φ, in both directions alike.
    const [front, rear] = [cosZ * Math.sign(n), rearZ * Math.sign(nRear)];
    const power = powerAt(train, k);
    bend(meridian, (n * meridian.slope) / front, power * meridian.offset, (rear * rear) / (nRear * front));
    bend(across, (n * across.slope) / front, power * across.offset, rear / nRear);
    meridian.offset *= rear / front;
  } else {
    const y = rays[at + Y]!;
    const { slope, bend: second, slopeOverRadius } = runAt(train, k, Math.abs(y));
    const rise = slopeOverRadius * y;
    const stretch = Math.sqrt(1 + slope * slope);
    const cosI = Math.abs(cosZ - rise * cosY) / stretch;
    const cosR = Math.abs(rearZ - rise * rearY) / stretch;
    const power = nRear * cosR - n * cosI;
    const arc = meridian.offset / cosI;
    bend(meridian, n * cosI * meridian.slope, (power * second * arc) / stretch ** 3, 1 / (nRear * cosR));
    bend(across, n * across.slope, (power * slopeOverRadius * across.offset) / stretch, 1 / nRear);
    meridian.offset = arc * cosR;
  }
  pencil.z = z;
  pencil.cosZ = rearZ;
  pencil.cosY = rearY;
}

function bend(neighbour: Neighbour, came: number, bent: number, share: number): void {
  neighbour.slope = (came - bent) * share;
  neighbour.scale = (Math.abs(came) + Math.abs(bent)) * Math.abs(share);
}
