import type { Train } from '../train/types.ts';

/**
 * A paraxial ray by the y–nu method: `y[k]` is its height at surface k (mm), `nu[k]` index times slope in front of surface k,
 * `nu[count]` in image space. Heights positive up, slopes positive when rising to the right.
 */
export interface ParaxialRay {
  readonly y: Float64Array;
  readonly nu: Float64Array;
}

/** The ray that meets the first surface at height `yMm` with index times slope `nu` in front of it. */
export const paraxialRay = (train: Train, yMm: number, nu: number): ParaxialRay =>
  rayThrough(train, 0, yMm, nu);

/** A ray of zeros through `count` surfaces, its two lists in one block. */
export function emptyRay(count: number): ParaxialRay {
  const block = new Float64Array(2 * count + 1);
  return { y: block.subarray(0, count), nu: block.subarray(count) };
}

/**
 * The ray that meets `surface` at height `yMm` with index times slope `nu` in front of it, traced both ways from there, so that a ray
 * through the centre of the stop is there exactly 0. Transfer y′ = y + t·nu/n, refraction nu′ = nu − φ·y (Kingslake, Lens Design
 * Fundamentals, on the (y, nu) method).
 */
export function rayThrough(train: Train, surface: number, yMm: number, nu: number): ParaxialRay {
  const { count, gap, index } = train;
  const ray = emptyRay(count);
  let height = yMm;
  let slope = nu;
  ray.nu[surface] = slope;
  for (let k = surface; k < count; k++) {
    ray.y[k] = height;
    slope -= powerAt(train, k) * height;
    ray.nu[k + 1] = slope;
    height += (gap[k]! / index[k + 1]!) * slope;
  }
  height = yMm;
  slope = nu;
  for (let k = surface - 1; k >= 0; k--) {
    height -= (gap[k]! / index[k + 1]!) * slope;
    ray.y[k] = height;
    slope += powerAt(train, k) * height;
    ray.nu[k] = slope;
  }
  return ray;
}

/** Power of one surface in 1/mm: (n′ − n)·curvature plus that of a thin part standing there. */
export const powerAt = (train: Train, surface: number): number =>
  (train.index[surface + 1]! - train.index[surface]!) * train.curvature[surface]! + train.thinPower[surface]!;

/**
 * Height in mm of the ray, or of its straight extension, at the plane `zMm` (from the first surface), taken in the space in front
 * of surface `space` (`count` is image space).
 */
export function heightInSpace(train: Train, ray: ParaxialRay, space: number, zMm: number): number {
  const surface = Math.max(space - 1, 0);
  if (train.count === 0) return 0;
  return ray.y[surface]! + ((zMm - train.z[surface]!) / train.index[space]!) * ray.nu[space]!;
}

/**
 * Height in mm of the ray at the plane `zMm` (from the first surface), in the space that holds it: the one behind the last surface
 * that stands at or in front of the plane.
 */
export function heightAt(train: Train, ray: ParaxialRay, zMm: number): number {
  let space = train.count;
  while (space > 0 && train.z[space - 1]! > zMm) space--;
  return heightInSpace(train, ray, space, zMm);
}

/** Slope dy/dz of the ray in front of surface `space` (`count` is image space). */
export const slopeIn = (train: Train, ray: ParaxialRay, space: number): number =>
  ray.nu[space]! / train.index[space]!;

/** `factor` times the ray. */
export function scaledRay(ray: ParaxialRay, factor: number): ParaxialRay {
  const result = emptyRay(ray.y.length);
  for (let k = 0; k < ray.y.length; k++) result.y[k] = factor * ray.y[k]!;
  for (let k = 0; k < ray.nu.length; k++) result.nu[k] = factor * ray.nu[k]!;
  return result;
}

/** True when every number of the ray is finite. */
export const isFiniteRay = (ray: ParaxialRay): boolean =>
  ray.y.every(Number.isFinite) && ray.nu.every(Number.isFinite);
