/**
 * The sketch: the one document. Lengths in millimetres, wavelengths in nanometres, angles in degrees,
 * in memory as in the file, so that reading back what was written changes nothing.
 * Light runs to the right; distances are positive to the right, heights positive up.
 */

import type { Air, Medium, SolidMedium } from '../media/medium.ts';

export type { Air, FixedMedium, Medium, SolidMedium } from '../media/medium.ts';

declare const idOf: unique symbol;
/** Ids are plain strings in the file; the brand keeps one kind from being taken for another. */
type Id<Kind extends string> = string & { readonly [idOf]: Kind };

export type PartId = Id<'part'>;
export type PositionId = Id<'position'>;
export type GroupId = Id<'group'>;

/** One value for all positions, or one for each, keyed by the position's id. */
export type PerPosition<T = number> = T | { readonly [position: PositionId]: T };

/**
 * What follows a part: from its rear vertex to the front vertex of the next part. Behind the last part it is
 * the distance to the sensor; when the image follows the focus that length is kept but not used.
 */
export interface Space {
  /** May be negative while dragging: drawn, warned about, refused by the hand-over. */
  readonly lengthMm: PerPosition;
  readonly medium: Medium;
}

interface PartBase {
  readonly id: PartId;
  readonly name: string;
  readonly note: string;
  /** Half the clear diameter; null means open: drawn as wide as the rays need, vignetting nothing. */
  readonly semiDiameterMm: number | null;
  readonly space: Space;
}

/** An ideal thin element: power 1/f in any medium. Its gaps run from principal plane to principal plane. */
export interface ThinPart extends PartBase {
  readonly kind: 'thin';
  /** 1/power in air; never 0. */
  readonly focalLengthMm: number;
  readonly abbeNumber: number | null;
  /** Index assumed for the Petzval sum; null takes the sketch's `assumedIndex`. */
  readonly index: number | null;
  /** The glass meant: it gives index and dispersion in the place of the two numbers above. */
  readonly material: SolidMedium | null;
  /** Bending (R2 + R1)/(R2 − R1) meant for the glass, for the thin-element sums; null when open. */
  readonly shapeFactor: number | null;
  /** Room reserved for real glass, in front of and behind the principal plane. */
  readonly roomFrontMm: number;
  readonly roomBehindMm: number;
}

/** A diaphragm standing free. It is the aperture stop only when the sketch's `stop` names it. */
export interface StopPart extends PartBase {
  readonly kind: 'stop';
}

/** A flat plate: cover glass, filter, window, or a prism unfolded. */
export interface PlatePart extends PartBase {
  readonly kind: 'plate';
  readonly thicknessMm: number;
  readonly material: SolidMedium;
}

/** One surface of real glass: a conic plus even powers of the radius. */
export interface GlassSurface {
  /** Positive when the centre lies to the right; null is flat. */
  readonly radiusMm: number | null;
  /** 0 a sphere, −1 a paraboloid. */
  readonly conic: number;
  /** Coefficients of r⁴, r⁶, … in mm⁻³, mm⁻⁵, … */
  readonly asphere: readonly number[];
  /** Half the clear diameter; null takes the part's. */
  readonly semiDiameterMm: number | null;
}

/** What lies between two surfaces of a glass part. */
export interface Filling {
  readonly thicknessMm: number;
  readonly material: SolidMedium;
}

/** Real glass: a singlet, a cemented doublet or triplet. There is one filling fewer than there are surfaces. */
export interface GlassPart extends PartBase {
  readonly kind: 'glass';
  /** At least two, from left to right. */
  readonly surfaces: readonly GlassSurface[];
  readonly fillings: readonly Filling[];
}

export type Part = ThinPart | StopPart | PlatePart | GlassPart;
export type PartKind = Part['kind'];

/** Distance from the object to the first part, positive, or at infinity. */
export type ObjectDistance = number | 'infinity';

export interface ObjectEnd {
  readonly distanceMm: PerPosition<ObjectDistance>;
  readonly medium: Medium;
}

/** Where the image is taken: at the paraxial focus, or on a plane fixed behind the last part. */
export type ImagePlane = 'focus' | 'fixed';

/** Size of the sensor; the pixel pitch is null when unknown. */
export interface Sensor {
  readonly size: { readonly widthMm: number; readonly heightMm: number } | { readonly diagonalMm: number };
  readonly pixelPitchMm: number | null;
}

export type Aperture =
  | { readonly kind: 'stopDiameter'; readonly diameterMm: PerPosition }
  /** 1 / (2 n′ |u′|) at the image. */
  | { readonly kind: 'workingFNumber'; readonly fNumber: number }
  /** |focal length| / entrance-pupil diameter. */
  | { readonly kind: 'infinityFNumber'; readonly fNumber: number }
  /** n sin U at the object. */
  | { readonly kind: 'objectNA'; readonly na: number }
  | { readonly kind: 'entrancePupilDiameter'; readonly diameterMm: number };

export type FieldSize =
  /** Half angle of the chief ray in object space. */
  | { readonly kind: 'angle'; readonly angleDeg: number }
  | { readonly kind: 'objectHeight'; readonly heightMm: number }
  /** Paraxial height in the main line at the image plane. */
  | { readonly kind: 'imageHeight'; readonly heightMm: number };

export interface Field {
  /** The largest field, as a magnitude. */
  readonly size: FieldSize;
  /** The fields drawn, as shares of the largest, each from −1 to 1. */
  readonly fractions: readonly number[];
  /** Share of the pupil's height that may be lost at the largest field, 0 to 1: the vignetting that clear diameters are sized for. */
  readonly vignetting: number;
}

/** The wavelengths; colour is short minus long. */
export interface Lines {
  readonly mainNm: number;
  readonly shortNm: number;
  readonly longNm: number;
  /** How much each counts in spots and contrast; the main one always counts. */
  readonly weights: { readonly main: number; readonly short: number; readonly long: number };
  /** Further wavelengths for spots and colour curves, at most two. */
  readonly more: readonly { readonly wavelengthNm: number; readonly weight: number }[];
}
export type Line = 'main' | 'short' | 'long' | 'fourth' | 'fifth';

export interface Position {
  readonly id: PositionId;
  readonly name: string;
}

/** Parts tied together: dragging one moves them all. */
export interface Group {
  readonly id: GroupId;
  readonly name: string;
  readonly partIds: readonly PartId[];
}

export interface Sketch {
  readonly title: string;
  readonly notes: string;
  readonly object: ObjectEnd;
  /** From left to right. */
  readonly parts: readonly Part[];
  readonly image: ImagePlane;
  readonly sensor: Sensor | null;
  /** Distance from the mount plane to the sensor; null when there is no mount. */
  readonly registerMm: number | null;
  /** The part that carries the aperture stop: a free stop, or the part it rides on, in front of its refraction. Null: the rims decide. */
  readonly stop: PartId | null;
  readonly aperture: Aperture;
  readonly field: Field;
  readonly lines: Lines;
  /** Air as index 1, or by the formula for standard air; indices of glass are relative to air and follow. */
  readonly air: Air;
  /** At least one. */
  readonly positions: readonly Position[];
  readonly groups: readonly Group[];
  /** Index assumed for thin parts that do not name one (Petzval sum). */
  readonly assumedIndex: number;
  /** Blur diameter for the depths of focus and field; null takes one pixel. */
  readonly blurMm: number | null;
}

/**
 * Where the scrubber stands: on a position, or a share of the way to the next one.
 * `toNext` runs from 0 (on the position) up to, not including, 1.
 */
export interface Setting {
  readonly at: PositionId;
  readonly toNext: number;
}
