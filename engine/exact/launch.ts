import { CODE, L, M, MISSED, N, PATH, X, Y, Z } from './rayBuffer.ts';
import type { ExactSetup } from './types.ts';

/**
 * Where the light of one field point comes from. Two launch numbers tell its rays apart: from infinity x and y in the tangent plane of the
 * first vertex (mm), from a finite object the direction cosines L and M. Both change smoothly with the place in the stop, cosines up to
 * the largest apertures, as the sine condition makes them proportional.
 */
export type Source =
  | { readonly kind: 'infinite'; readonly index: number; readonly slope: number }
  | { readonly kind: 'finite'; readonly index: number; readonly zMm: number; readonly heightMm: number };

/** The source at the share `fraction` of the field, in the object medium of line `line` of the setup. */
export function sourceOf({ object, lines }: ExactSetup, line: number, fraction: number): Source {
  const index = Math.abs((lines[line] ?? lines[0]).train.index[0]!);
  return object.kind === 'infinite'
    ? { kind: 'infinite', index, slope: fraction * object.slope }
    : { kind: 'finite', index, zMm: object.zMm, heightMm: fraction * object.heightMm };
}

/**
 * Puts the ray with launch numbers `a`, `b` into `rays` from place `at`: in the tangent plane of the first vertex, its path counted from
 * the object point, or from the plane wave through the first vertex. Cosines that are none give a ray across the axis that misses the first surface.
 */
export function launch(source: Source, a: number, b: number, rays: Float64Array, at: number): void {
  rays[at + Z] = 0;
  rays[at + CODE] = 0;
  if (source.kind === 'infinite') {
    const cosZ = 1 / Math.sqrt(1 + source.slope * source.slope);
    rays[at + X] = a;
    rays[at + Y] = b;
    rays[at + L] = 0;
    rays[at + M] = source.slope * cosZ;
    rays[at + N] = cosZ;
    rays[at + PATH] = source.index * b * source.slope * cosZ;
    return;
  }
  const squared = 1 - a * a - b * b;
  rays[at + L] = a;
  rays[at + M] = b;
  if (!(squared > 0)) {
    rays[at + X] = 0;
    rays[at + Y] = source.heightMm;
    rays[at + Z] = source.zMm;
    rays[at + N] = 0;
    rays[at + PATH] = 0;
    rays[at + CODE] = MISSED;
    return;
  }
  const cosZ = Math.sqrt(squared);
  const length = -source.zMm / cosZ;
  rays[at + X] = length * a;
  rays[at + Y] = source.heightMm + length * b;
  rays[at + N] = cosZ;
  rays[at + PATH] = source.index * length;
}

/** The launch numbers of the ray of this source through a point, z from the first vertex. */
export function launchThrough(
  source: Source,
  xMm: number,
  yMm: number,
  zMm: number,
): readonly [a: number, b: number] {
  if (source.kind === 'infinite') return [xMm, yMm - zMm * source.slope];
  const rise = yMm - source.heightMm;
  const along = zMm - source.zMm;
  const length = (along < 0 ? -1 : 1) * Math.hypot(xMm, rise, along);
  return [xMm / length, rise / length];
}
