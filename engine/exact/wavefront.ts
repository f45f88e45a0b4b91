import { none, type Outcome, some } from '../outcome.ts';
import { type Absence, finite, type Quantity } from '../paraxial/absence.ts';
import { axisCrossing, rayScale } from '../paraxial/scale.ts';
import { rayThrough } from '../paraxial/trace.ts';
import type { Train } from '../train/types.ts';
import { L, M, N, PATH, X, Y, Z } from './rayBuffer.ts';

/**
 * What the wavefront of one field is measured against: a sphere about the image point `x = 0, yMm, zMm` (z from the last vertex) through the
 * point of the chief ray in the paraxial exit pupil.
 */
export interface ReferenceSphere {
  readonly yMm: number;
  readonly zMm: number;
  /** From the pupil's point to the image point along the light, negative when the pupil lies behind the image; absent with the pupil at infinity. */
  readonly radiusMm: Quantity;
}

/** The paraxial exit pupil from the last vertex; 'pupil at infinity'. */
export function exitPupil(train: Train, stopSurface: number): Quantity {
  const { count, index } = train;
  const central = rayThrough(train, stopSurface, 0, 1);
  const scale = rayScale(train, stopSurface, 0, 1);
  return axisCrossing(
    index[count]!,
    central.y[count - 1]!,
    central.nu[count]!,
    scale.nu[count]!,
    'pupil at infinity',
  );
}

/**
 * The sphere about the point where the chief ray, at place `at` of `rays`, meets the plane `planeMm` behind the last vertex, through the exit
 * pupil. 'pupil at the image' when it would have no radius.
 */
export function referenceSphere(
  rays: Float64Array,
  at: number,
  planeMm: number,
  pupilMm: Quantity,
): Outcome<ReferenceSphere, Absence> {
  const [m, n, z] = [rays[at + M]!, rays[at + N]!, rays[at + Z]!];
  const sphere = { yMm: rays[at + Y]! + ((planeMm - z) * m) / n, zMm: planeMm };
  if (!pupilMm.ok) return some({ ...sphere, radiusMm: pupilMm });
  const radius = finite((planeMm - pupilMm.value) / n);
  return radius.ok && radius.value === 0 ? none('pupil at the image') : some({ ...sphere, radiusMm: radius });
}

/** Square of the distance at which the ray at place `at` passes the image point, mm². */
function missSquared(rays: Float64Array, at: number, { yMm, zMm }: ReferenceSphere): number {
  const [l, m, n] = [rays[at + L]!, rays[at + M]!, rays[at + N]!];
  const along = (zMm - rays[at + Z]!) / n;
  const x = rays[at + X]! + along * l;
  const y = rays[at + Y]! + along * m - yMm;
  const part = x * l + y * m;
  return Math.max(0, x * x + y * y - part * part);
}

/**
 * How far along the light, in mm, a ray that passes the image point at this distance squared runs from its foot, the point of it nearest to the
 * image point, to the reference sphere, less the same for a ray through the image point: (distance)²/(2R) in the main. NaN when the ray passes the
 * sphere by. With a pupil at infinity it is 0: the limit of long spheres, which needs no radius.
 */
function sphereBehindFoot(squared: number, { radiusMm }: ReferenceSphere): number {
  if (!radiusMm.ok) return 0;
  const radius = Math.abs(radiusMm.value);
  return (Math.sign(radiusMm.value) * squared) / (radius + Math.sqrt(radius * radius - squared));
}

/** The same for the ray at place `at`. */
export const beyondFoot = (rays: Float64Array, at: number, sphere: ReferenceSphere): number =>
  sphereBehindFoot(missSquared(rays, at, sphere), sphere);

/** Share of a distance squared below which the miss leaves its root all digits. */
const SMALL_MISS = 1e-2;

/**
 * Optical path in mm of the ray at place `at` up to the reference sphere, but for a length that all rays to this sphere share. The sphere is
 * reached from the ray's foot near the image point: no long radius is squared and subtracted, and a pupil at infinity is no case of its own.
 */
export function pathToSphere(
  rays: Float64Array,
  at: number,
  indexMagnitude: number,
  sphere: ReferenceSphere,
): number {
  const [x, y, z] = [rays[at + X]!, rays[at + Y]! - sphere.yMm, rays[at + Z]! - sphere.zMm];
  const squared = missSquared(rays, at, sphere);
  const projected = rays[at + L]! * x + rays[at + M]! * y + rays[at + N]! * z;
  const distanceSquared = x * x + y * y + z * z;
  // The distance, where it is nearly that to the foot, holds more digits: a direction is of unit length but for its rounding.
  const pastFoot =
    squared < SMALL_MISS * distanceSquared
      ? Math.sign(projected) * Math.sqrt(distanceSquared - squared)
      : projected;
  return rays[at + PATH]! + indexMagnitude * (sphereBehindFoot(squared, sphere) - pastFoot);
}

/**
 * The same along a fan in the meridian of a train whose parts have no path of their own, from the transverse errors: the path to the foot
 * changes by −n′·ε·dM, ε the height beside the image point and M the direction cosine (from dV = n′ D·dr, Malus). `count` rays stand at equal steps
 * of the pupil from `from` on, the chief ray at the place `centre` among them; paths are written into `into`, that of the chief being 0, and NaN beyond
 * a ray that is lost. Integrated by cubics through four neighbours.
 */
export function pathsFromErrors(
  height: Float64Array,
  cosine: Float64Array,
  indexMagnitude: number,
  centre: number,
  into: Float64Array,
): void {
  into.fill(Number.NaN);
  let [from, to] = [centre, centre];
  while (from > 0 && !Number.isNaN(height[from - 1]!)) from--;
  while (to < height.length - 1 && !Number.isNaN(height[to + 1]!)) to++;
  const rate = new Float64Array(to - from + 1);
  for (let i = from; i <= to; i++)
    rate[i - from] = -indexMagnitude * height[i]! * stepOf(cosine, i, from, to);
  into[centre] = 0;
  for (let i = centre; i < to; i++) into[i + 1] = into[i]! + between(rate, i - from);
  for (let i = centre; i > from; i--) into[i - 1] = into[i]! - between(rate, i - 1 - from);
}

/** Derivative by the place in the list, by differences of fourth order where there are five values. */
function stepOf(values: Float64Array, i: number, from: number, to: number): number {
  const at = (place: number) => values[place]!;
  if (to - from < 4) {
    if (i > from && i < to) return (at(i + 1) - at(i - 1)) / 2;
    if (to === from) return 0;
    return i === from ? at(i + 1) - at(i) : at(i) - at(i - 1);
  }
  if (i - from >= 2 && to - i >= 2) return (at(i - 2) - 8 * at(i - 1) + 8 * at(i + 1) - at(i + 2)) / 12;
  const [end, way] = i - from < 2 ? [from, 1] : [to, -1];
  const off = (k: number) => at(end + way * k);
  return i === end
    ? (way * (-25 * off(0) + 48 * off(1) - 36 * off(2) + 16 * off(3) - 3 * off(4))) / 12
    : (way * (-3 * off(0) - 10 * off(1) + 18 * off(2) - 6 * off(3) + off(4))) / 12;
}

/** Integral from place i to i + 1 of the cubic through four neighbours, or of the line where there are fewer. */
function between(values: Float64Array, i: number): number {
  const at = (place: number) => values[place]!;
  const last = values.length - 1;
  if (last < 3) return (at(i) + at(i + 1)) / 2;
  if (i > 0 && i < last - 1) return (13 * (at(i) + at(i + 1)) - at(i - 1) - at(i + 2)) / 24;
  return i === 0
    ? (9 * at(0) + 19 * at(1) - 5 * at(2) + at(3)) / 24
    : (9 * at(last) + 19 * at(last - 1) - 5 * at(last - 2) + at(last - 3)) / 24;
}
