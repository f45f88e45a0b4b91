import type { Outcome } from '../outcome.ts';
import type { Absence, Quantity } from '../paraxial/absence.ts';
import type { ParaxialRay } from '../paraxial/trace.ts';
import type { Line } from '../sketch/types.ts';
import type { Train } from '../train/types.ts';

/** x (out of the meridian), y (up), z (to the right): a point in mm, or direction cosines. */
export type Vector = readonly [x: number, y: number, z: number];

/** Why a ray does not get through: a short phrase that can stand on the screen. */
export type Loss = 'missed' | 'totally reflected' | 'clipped';

/** Where a ray ends, and why. */
export interface Lost {
  readonly why: Loss;
  /** The surface that it misses, that reflects it, or whose rim cuts it. */
  readonly surface: number;
}

/** What a ray does at one surface. */
export interface Hit {
  /** In the frame of the surface's own vertex, mm. */
  readonly point: Vector;
  /** Behind the surface; null where the ray ends. */
  readonly direction: Vector | null;
  /** Unit normal on the side that the light leaves to. */
  readonly normal: Vector;
  /** Of the angles to the normal, positive. */
  readonly cosIncidence: number;
  /** Null where the ray ends. */
  readonly cosRefraction: number | null;
  /** Index times length from the start point up to here in mm, positive also behind mirrors. */
  readonly opticalPathMm: number;
}

/** One ray with everything that it does on its way. */
export interface RayPath {
  /** z from the first vertex. */
  readonly start: Vector;
  readonly direction: Vector;
  /** One for each surface that it meets, in order. A ray that misses a surface has none there. */
  readonly hits: readonly Hit[];
  readonly lost: Lost | null;
}

/** One line of the light, with the train as it is in that line. */
export interface ExactLine {
  readonly line: Line;
  readonly wavelengthNm: number;
  /** In sums over the lines; they need not add up to 1. */
  readonly weight: number;
  readonly train: Train;
}

/**
 * What all exact analyses of one setting share. Field points are shares of the paraxial chief ray's data in object space, so that
 * the paraxial and the exact ray start from the same object point; pupil points are shares of the stop's radius.
 */
export interface ExactSetup {
  /** The main line first; never empty. */
  readonly lines: readonly [ExactLine, ...ExactLine[]];
  readonly stopSurface: number;
  /** Height of the paraxial marginal ray at the stop, positive. */
  readonly stopRadiusMm: number;
  /** The image plane in use from the last vertex; 'image at infinity'. */
  readonly imagePlaneMm: Quantity;
  /** Paraxial rays of the main line: axis to the edge of the aperture, edge of the field to the centre of the stop. */
  readonly marginal: ParaxialRay;
  readonly chief: ParaxialRay;
  readonly object: ObjectEdge;
}

/** Where the light of the whole field's edge comes from. */
export type ObjectEdge =
  /** A point at z from the first vertex, `heightMm` above the axis. */
  | { readonly kind: 'finite'; readonly zMm: number; readonly heightMm: number }
  /** A direction: dy/dz of all its rays. */
  | { readonly kind: 'infinite'; readonly slope: number };

export type SetupOutcome = Outcome<ExactSetup, Absence>;
