import { heightInSpace, type ParaxialRay } from '../paraxial/trace.ts';
import { CODE, L, M, N, X, Y, Z } from './rayBuffer.ts';
import type { ExactSetup } from './types.ts';

/** Height y (mm) of the ray at place `at`, behind the last surface, on the plane `planeMm` behind the last vertex; NaN when it is lost. */
export const yOn = (rays: Float64Array, at: number, planeMm: number): number =>
  rays[at + CODE] === 0
    ? rays[at + Y]! + ((planeMm - rays[at + Z]!) * rays[at + M]!) / rays[at + N]!
    : Number.NaN;

/** The same of x. */
export const xOn = (rays: Float64Array, at: number, planeMm: number): number =>
  rays[at + CODE] === 0
    ? rays[at + X]! + ((planeMm - rays[at + Z]!) * rays[at + L]!) / rays[at + N]!
    : Number.NaN;

/** Where the ray in the meridian crosses the axis, in mm from the last vertex; NaN when it is lost, not finite when it runs along the axis. */
export const crossing = (rays: Float64Array, at: number): number =>
  rays[at + CODE] === 0 ? rays[at + Z]! - (rays[at + Y]! * rays[at + N]!) / rays[at + M]! : Number.NaN;

/** Height (mm) of a paraxial ray of the main line on the same plane. */
export function paraxialOn({ lines }: ExactSetup, ray: ParaxialRay, planeMm: number): number {
  const { train } = lines[0];
  return heightInSpace(train, ray, train.count, train.z[train.count - 1]! + planeMm);
}
