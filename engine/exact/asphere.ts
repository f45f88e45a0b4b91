import type { Train } from '../train/types.ts';
import { type Meeting, WORK } from './blocks.ts';
import { CLIPPED, MISSED, REFLECTED } from './rayBuffer.ts';

/*
 * Surfaces with even powers beyond the conic. With h(t) = z − sag(r) along the ray from the tangent plane, the hit is where h changes
 * sign in the light's direction. Newton steps from the conic's hit find it nearly always; where one leaves the surface, turns back
 * or grows, the sign change is bracketed and halved. Both end after a fixed number of steps.
 */

/** Of the ray's own height and step: a smaller change is rounding. */
const SETTLED = 1e-14;
/** Steps that no longer shrink but are this small move within rounding. */
const NOISE = 1e-11;
const NEWTON_STEPS = 12;
const BRACKET_STEPS = 80;
const HALVINGS = 200;

/** One surface with one ray at hand: the point in the tangent plane, the direction, and what was last computed. */
interface Course {
  x0: number;
  y0: number;
  l: number;
  m: number;
  cosZ: number;
  c: number;
  /** (1 + K)c². */
  edge: number;
  powers: Float64Array;
  first: number;
  last: number;
  /** At `t`: h, and sag′(r)/r. */
  height: number;
  slope: number;
}

const course: Course = {
  x0: 0,
  y0: 0,
  l: 0,
  m: 0,
  cosZ: 1,
  c: 0,
  edge: 0,
  powers: new Float64Array(0),
  first: 0,
  last: 0,
  height: 0,
  slope: 0,
};

/** The block through surface `k` of the train, which has even powers. */
export function asphereBlock(
  { stop, reach, nFront, nBehind, rimSquared, code }: Meeting,
  train: Train,
  k: number,
): void {
  const rays = WORK;
  const side = nFront > 0 ? 1 : -1;
  const mirror = nFront * nBehind < 0;
  const mu = Math.abs(nFront / nBehind);
  const muSquared = mu * mu;
  const n = Math.abs(nFront);
  const at = course;
  at.c = train.curvature[k]!;
  at.edge = (1 + train.conic[k]!) * at.c * at.c;
  at.powers = train.asphere;
  at.first = train.asphereFrom[k]!;
  at.last = train.asphereFrom[k + 1]! - 1;
  for (let i = 0; i < stop; i += 8) {
    if (rays[i + 7] !== 0) continue;
    const l = rays[i + 3]!;
    const m = rays[i + 4]!;
    const cosZ = rays[i + 5]!;
    const toPlane = (reach - rays[i + 2]!) / cosZ;
    at.l = l;
    at.m = m;
    at.cosZ = cosZ;
    at.x0 = rays[i]! + toPlane * l;
    at.y0 = rays[i + 1]! + toPlane * m;
    const t = side * cosZ > 0 ? meet(at, side, train.conic[k]!) : Number.NaN;
    if (!(t - t === 0)) {
      rays[i + 7] = code + MISSED;
      continue;
    }
    const x = at.x0 + t * l;
    const y = at.y0 + t * m;
    const { slope } = at;
    rays[i] = x;
    rays[i + 1] = y;
    rays[i + 2] = t * cosZ;
    rays[i + 6] = rays[i + 6]! + n * (toPlane + t);
    if (!(x * x + y * y <= rimSquared)) {
      rays[i + 7] = code + CLIPPED;
      continue;
    }
    const length = 1 / Math.sqrt(1 + slope * slope * (x * x + y * y));
    const cosine = (cosZ - slope * (x * l + y * m)) * length;
    const behind = 1 - muSquared * (1 - cosine * cosine);
    if (behind < 0) {
      rays[i + 7] = code + REFLECTED;
      continue;
    }
    const bend = (mirror ? -2 * cosine : side * Math.sqrt(behind) - mu * cosine) * length;
    rays[i + 3] = mu * l - bend * slope * x;
    rays[i + 4] = mu * m - bend * slope * y;
    rays[i + 5] = mu * cosZ + bend;
  }
}

/** Length from the tangent plane to the hit, with `at.slope` there; NaN when the surface is missed. */
function meet(at: Course, side: number, conic: number): number {
  const begin = conicHit(at, side, conic);
  let t = begin;
  let before = Number.POSITIVE_INFINITY;
  for (let step = 0; step < NEWTON_STEPS; step++) {
    if (!evaluate(at, t)) break;
    const x = at.x0 + t * at.l;
    const y = at.y0 + t * at.m;
    const rise = at.cosZ - at.slope * (x * at.l + y * at.m);
    if (!(side * rise > 0)) break;
    const change = at.height / rise;
    const size = Math.abs(change);
    const scale = Math.abs(t) + Math.abs(x) + Math.abs(y);
    if (size >= before) {
      if (size <= NOISE * scale) return t;
      break;
    }
    if (size <= SETTLED * scale) return t;
    t -= change;
    before = size;
  }
  return bracketed(at, side, begin);
}

/** Where the ray meets the conic, which is near the hit; 0, the tangent plane, when it misses it. */
function conicHit({ x0, y0, l, m, cosZ, c }: Course, side: number, conic: number): number {
  const f = c * (x0 * x0 + y0 * y0);
  const g = cosZ - c * (x0 * l + y0 * m);
  const radicand = g * g - c * (1 + conic * cosZ * cosZ) * f;
  const t = f / (g + side * Math.sqrt(radicand));
  return radicand >= 0 && (1 + conic) * c * t * cosZ < 1 ? t : 0;
}

/** Puts height and slope at `t` into `at`; false beyond the conic's edge or where they are not finite. */
function evaluate(at: Course, t: number): boolean {
  const { powers, first, c } = at;
  const x = at.x0 + t * at.l;
  const y = at.y0 + t * at.m;
  const squared = x * x + y * y;
  const radicand = 1 - at.edge * squared;
  if (!(radicand > 0)) return false;
  const root = Math.sqrt(radicand);
  let sum = 0;
  let rate = 0;
  for (let j = at.last; j >= first; j--) {
    const a = powers[j]!;
    sum = sum * squared + a;
    rate = rate * squared + (4 + 2 * (j - first)) * a;
  }
  at.height = t * at.cosZ - squared * (c / (1 + root) + sum * squared);
  at.slope = c / root + rate * squared;
  return at.height - at.height === 0 && at.slope - at.slope === 0;
}

/** The first change of sign found from `begin`, in front of it or behind, halved until it is found or lost. NaN when there is none. */
function bracketed(at: Course, side: number, begin: number): number {
  const { x0, y0, l, m, edge } = at;
  let least = Number.NEGATIVE_INFINITY;
  let most = Number.POSITIVE_INFINITY;
  if (edge > 0) {
    // Where the ray is nearer to the axis than the conic's edge.
    const across = l * l + m * m;
    const inward = x0 * l + y0 * m;
    const room = 1 / edge - (x0 * x0 + y0 * y0);
    if (across === 0) {
      if (room <= 0) return Number.NaN;
    } else {
      const half = Math.sqrt(inward * inward + across * room) * (1 - 1e-13);
      if (!(half > 0)) return Number.NaN;
      least = (-inward - half) / across;
      most = (-inward + half) / across;
    }
  }
  let t = Math.min(most, Math.max(least, begin));
  if (!evaluate(at, t)) return Number.NaN;
  const forward = side * at.height < 0 ? 1 : -1;
  let other = t;
  // Small against the radius, or a rim that bends away would be leapt over.
  const radius = Math.hypot(x0 + t * l, y0 + t * m);
  let stride = Math.min(Math.abs(at.height) / 4, radius / 16) + 1e-6 * (Math.abs(at.height) + radius);
  for (let step = 0; ; step++) {
    if (step === BRACKET_STEPS || t === (forward > 0 ? most : least)) return Number.NaN;
    other = t;
    t = Math.min(most, Math.max(least, t + forward * stride));
    if (!evaluate(at, t)) return Number.NaN;
    if (side * at.height * forward >= 0) break;
    stride *= 1.25;
  }
  return halved(at, side, Math.min(t, other), Math.max(t, other));
}

/** The sign change between `before` and `after`, by Newton steps that stay between them, else by halves. */
function halved(at: Course, side: number, before: number, after: number): number {
  let [low, high] = [before, after];
  let t = (low + high) / 2;
  for (let step = 0; step < HALVINGS; step++) {
    if (!evaluate(at, t)) return Number.NaN;
    if (side * at.height < 0) low = t;
    else high = t;
    const x = at.x0 + t * at.l;
    const y = at.y0 + t * at.m;
    const rise = at.cosZ - at.slope * (x * at.l + y * at.m);
    const scale = Math.abs(t) + Math.abs(x) + Math.abs(y);
    const newton = t - at.height / rise;
    const inside = newton > low && newton < high;
    const next = inside && step % 4 !== 3 ? newton : (low + high) / 2;
    if (Math.abs(next - t) <= SETTLED * scale || high - low <= SETTLED * scale) {
      return side * rise > 0 ? t : Number.NaN;
    }
    t = next;
  }
  return Number.NaN;
}
