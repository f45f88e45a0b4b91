import type { Loss } from '../../engine/exact/types.ts';
import type { PlainSurface } from './kernelPrescription.ts';

export interface PlainVector {
  readonly x: number;
  readonly y: number;
  readonly z: number;
}

/** A ray at one surface: an object for each, kept. */
export interface PlainHit {
  readonly point: PlainVector;
  readonly normal: PlainVector;
  readonly direction: PlainVector;
  readonly path: number;
}

export interface PlainRay {
  readonly hits: readonly PlainHit[];
  readonly lost: { readonly why: Loss; readonly surface: number } | null;
}

const plus = (a: PlainVector, b: PlainVector): PlainVector => ({ x: a.x + b.x, y: a.y + b.y, z: a.z + b.z });
const times = (a: PlainVector, by: number): PlainVector => ({ x: a.x * by, y: a.y * by, z: a.z * by });
const dot = (a: PlainVector, b: PlainVector): number => a.x * b.x + a.y * b.y + a.z * b.z;

/**
 * A ray as one would write it down first, with a new object for each surface and for each vector; points in the frame of each vertex. `start` has its z from where the first surface's distance counts.
 */
export function tracePlain(
  surfaces: readonly PlainSurface[],
  start: PlainVector,
  direction: PlainVector,
): PlainRay {
  const hits: PlainHit[] = [];
  let last: PlainHit = { point: start, normal: { x: 0, y: 0, z: 1 }, direction, path: 0 };
  for (const [surface, shape] of surfaces.entries()) {
    const next = hitOf(shape, last);
    if (typeof next === 'string') return { hits, lost: { why: next, surface } };
    hits.push(next);
    last = next;
  }
  return { hits, lost: null };
}

function hitOf(
  { curvature, distance, indexBefore, indexAfter }: PlainSurface,
  { point: before, direction, path }: PlainHit,
): PlainHit | Loss {
  const from = plus(before, { x: 0, y: 0, z: -distance });
  const inPlane = plus(from, times(direction, -from.z / direction.z));
  const f = curvature * dot(inPlane, inPlane);
  const g = direction.z - curvature * dot(inPlane, direction);
  const squared = g * g - curvature * f;
  if (squared < 0) return 'missed';
  const cosine = Math.sqrt(squared);
  const length = f / (g + cosine);
  const point = plus(inPlane, times(direction, length));
  const normal = plus({ x: 0, y: 0, z: 1 }, times(point, -curvature));
  const ratio = indexBefore / indexAfter;
  const behind = 1 - ratio * ratio * (1 - squared);
  if (behind < 0) return 'totally reflected';
  const bend = Math.sqrt(behind) - ratio * cosine;
  return {
    point,
    normal,
    direction: plus(times(direction, ratio), times(normal, bend)),
    path: path + indexBefore * (length - from.z / direction.z),
  };
}
