import { type Outcome, some } from '../outcome.ts';
import type { Train } from '../train/types.ts';
import type { Absence } from './absence.ts';
import type { ReferenceRays } from './rays.ts';
import type { ParaxialRay } from './trace.ts';

/** What the rims leave of the bundle at one field. Pupil heights run from −1 to 1, positive where the marginal ray passes. */
export interface Vignetting {
  readonly fraction: number;
  /** Share of the pupil's area that passes, 0 to 1, within 1e-6. */
  readonly areaShare: number;
  /** Lower and upper limit in the meridian; null when nothing passes. */
  readonly meridian: {
    readonly lower: number;
    readonly upper: number;
    /** The surface that sets the limit; null where the stop does. */
    readonly lowerSurface: number | null;
    readonly upperSurface: number | null;
  } | null;
}

/** A disc on the pupil: centre on the meridian, radius, and the surface it belongs to. */
interface Disc {
  readonly centre: number;
  readonly radius: number;
  readonly surface: number | null;
}

/**
 * The vignetting that the clear diameters cause at each of `fractions` of the field. A rim at surface k passes the pupil points with
 * (pₓ y)² + (ȳ + p_y y)² ≤ a²: a disc of radius a/|y| about −ȳ/y. The area common to all of them and to the pupil is integrated strip
 * by strip between the crossings of the discs.
 */
export function vignettingAt(
  train: Train,
  rays: ReferenceRays,
  fractions: readonly number[],
): Outcome<readonly Vignetting[], Absence> {
  const { marginal, chief } = rays;
  if (!marginal.ok) return marginal;
  if (!chief.ok) return chief;
  return some(fractions.map((fraction) => atField(train, marginal.value, chief.value, fraction)));
}

function atField(train: Train, marginal: ParaxialRay, chief: ParaxialRay, fraction: number): Vignetting {
  const discs: Disc[] = [{ centre: 0, radius: 1, surface: null }];
  for (let k = 0; k < train.count; k++) {
    const a = train.semiDiameter[k]!;
    const y = marginal.y[k]!;
    const yBar = fraction * chief.y[k]!;
    if (Math.abs(yBar) + Math.abs(y) <= a) continue;
    // The whole bundle passes through one point of the rim's plane, or misses the rim as a whole.
    if (Math.abs(yBar) - Math.abs(y) >= a) return { fraction, areaShare: 0, meridian: null };
    discs.push({ centre: -yBar / y, radius: a / Math.abs(y), surface: k });
  }
  if (discs.length === 1) {
    return {
      fraction,
      areaShare: 1,
      meridian: { lower: -1, upper: 1, lowerSurface: null, upperSurface: null },
    };
  }
  const meridian = meridianOf(discs);
  if (meridian === null) return { fraction, areaShare: 0, meridian };
  const area = commonArea(discs, meridian.lower, meridian.upper);
  return { fraction, areaShare: Math.min(1, area / Math.PI), meridian };
}

function meridianOf(discs: readonly Disc[]): Vignetting['meridian'] {
  let lower = Number.NEGATIVE_INFINITY;
  let upper = Number.POSITIVE_INFINITY;
  let lowerSurface: number | null = null;
  let upperSurface: number | null = null;
  for (const { centre, radius, surface } of discs) {
    if (centre - radius > lower) {
      lower = centre - radius;
      lowerSurface = surface;
    }
    if (centre + radius < upper) {
      upper = centre + radius;
      upperSurface = surface;
    }
  }
  return lower < upper ? { lower, upper, lowerSurface, upperSurface } : null;
}

/**
 * Area common to all discs, in units of the pupil radius squared. All centres lie on the meridian, so the squared half widths differ by
 * straight lines in the height: walking up, the narrowest disc gives way only to one that is centred lower.
 */
function commonArea(discs: readonly Disc[], lower: number, upper: number): number {
  let disc = narrowest(discs, lower);
  let from = lower;
  let area = 0;
  while (from < upper) {
    let to = upper;
    let next = disc;
    for (const other of discs) {
      if (other.centre >= disc.centre) continue;
      const at = Math.max(from, crossing(disc, other));
      if (at >= to) continue;
      to = at;
      next = other;
    }
    area += stripArea(disc, from, to);
    from = to;
    disc = next;
  }
  return area;
}

/** Where the circles of two discs cross, on the meridian. */
const crossing = (one: Disc, other: Disc): number =>
  (one.centre +
    other.centre +
    ((other.radius - one.radius) * (other.radius + one.radius)) / (one.centre - other.centre)) /
  2;

function narrowest(discs: readonly Disc[], at: number): Disc {
  return discs.reduce((best, disc) =>
    halfWidthSquared(disc, at) < halfWidthSquared(best, at) ? disc : best,
  );
}

const halfWidthSquared = ({ centre, radius }: Disc, at: number): number =>
  (radius - (at - centre)) * (radius + (at - centre));

// Twelve-point Gauss–Legendre rule on −1 … 1 (Abramowitz and Stegun, table 25.4), the positive half.
const NODES = [
  0.125233408511469, 0.36783149899818, 0.587317954286617, 0.769902674194305, 0.904117256370475,
  0.981560634246719,
];
const WEIGHTS = [
  0.249147045813403, 0.233492536538355, 0.203167426723066, 0.160078328543346, 0.106939325995318,
  0.047175336386512,
];

/** Area of the disc between two heights. The sine in the place of the height takes the square root's steep ends away. */
function stripArea(disc: Disc, from: number, to: number): number {
  const middle = (from + to) / 2;
  const half = (to - from) / 2;
  let sum = 0;
  for (const [i, node] of NODES.entries()) {
    for (const angle of [(-Math.PI / 2) * node, (Math.PI / 2) * node]) {
      const width = 2 * Math.sqrt(Math.max(0, halfWidthSquared(disc, middle + half * Math.sin(angle))));
      sum += (WEIGHTS[i] ?? 0) * width * Math.cos(angle);
    }
  }
  return (Math.PI / 2) * half * sum;
}
