import { conicEdge, sagAt } from '../train/profile.ts';
import { launchThrough, type Source, sourceOf } from './launch.ts';
import { LOSSES, MISSED } from './rayBuffer.ts';
import { type Sight, shoot } from './sight.ts';
import type { ExactSetup } from './types.ts';

/** Of the stop's radius: a ray this near to its point of the stop is aimed. */
export const AIMED = 1e-11;
/** Where rounding on the way to the stop may leave it instead. */
export const NEARLY = 1e-7;
/** A chief ray further from the paraxial one than this share of the bundle's half width is sought from the axis outwards. */
const FAR_OFF = 0.5;
const STEPS = 60;
const SHORTEST = 1 / 4096;
const SCANNED = 128;
const EDGE_HALVINGS = 24;

/** The launch number of the chief ray, or the code of the loss that keeps any ray from the stop's centre. */
export interface Chief {
  readonly b: number;
  readonly code: number;
}

/**
 * The chief ray of a field point: the ray through the centre of the real stop. From the paraxial one by secants; where that fails or leads
 * far off, by continuation from the axis; at last by a search over the first surface.
 */
export function aimChief(sight: Sight, setup: ExactSetup, line: number, fraction: number): Chief {
  const source = sourceOf(setup, line, fraction);
  const near = paraxialLaunch(source, setup, fraction, 0);
  const perRadius = paraxialLaunch(source, setup, fraction, 1) - near;
  const direct = aimInMeridian(sight, source, 0, near, perRadius);
  if (Math.abs(direct - near) <= FAR_OFF * Math.abs(perRadius)) return { b: direct, code: 0 };
  const led = leadOutwards(sight, setup, line, fraction);
  if (led.code === 0) return led;
  const found = scan(sight, source, led.b);
  return Number.isFinite(found) ? { b: found, code: 0 } : led;
}

/** The launch number of the paraxial ray through the share `pupil` of the stop, in the meridian. */
export function paraxialLaunch(
  source: Source,
  { chief, marginal, lines, stopSurface }: ExactSetup,
  fraction: number,
  pupil: number,
): number {
  const up = Math.sign(marginal.y[stopSurface]!) * pupil;
  if (source.kind === 'infinite') return fraction * chief.y[0]! + up * marginal.y[0]!;
  const u = (fraction * chief.nu[0]! + up * marginal.nu[0]!) / lines[0].train.index[0]!;
  return u / Math.hypot(1, u);
}

/**
 * The launch number of the meridional ray of `source` that meets the stop at the share `target` of its radius, by secants from `guess`
 * that are halved where they lose the ray and kept between the two sides of the target once both are known; NaN when that ends nowhere.
 */
function aimInMeridian(
  sight: Sight,
  source: Source,
  target: number,
  guess: number,
  perRadius: number,
): number {
  let b = guess;
  let slope = 1 / perRadius;
  let [goodB, goodMiss] = [Number.NaN, Number.NaN];
  let [under, over] = [Number.NaN, Number.NaN];
  for (let step = 0; step < STEPS; step++) {
    const there = shoot(sight, source, 0, b);
    const miss = sight.y - target;
    if (there && Math.abs(miss) <= AIMED) return b;
    if (!there || Math.abs(miss) > 2 * Math.abs(goodMiss)) {
      const halfway = (b + goodB) / 2;
      if (!Number.isFinite(halfway) || halfway === b || halfway === goodB) break;
      b = halfway;
      continue;
    }
    if (miss < 0) under = b;
    else over = b;
    if (miss !== goodMiss && b !== goodB && Number.isFinite(goodB)) slope = (miss - goodMiss) / (b - goodB);
    [goodB, goodMiss] = [b, miss];
    const between = (under + over) / 2;
    let next = b - miss / slope;
    if ((next - under) * (over - next) <= 0 || (step > STEPS / 3 && Number.isFinite(between))) next = between;
    if (next === b || !Number.isFinite(next)) break;
    b = next;
  }
  return Math.abs(goodMiss) <= NEARLY ? goodB : Number.NaN;
}

/**
 * The chief ray by steps of the field from the axis outwards. Launch number over field is even in the field, so each start is carried on
 * in its square. The steps halve where one fails; at last the code of the ray that failed says what is in the way.
 */
function leadOutwards(sight: Sight, setup: ExactSetup, line: number, fraction: number): Chief {
  const edge = sourceOf(setup, line, fraction);
  const angle = edge.kind === 'infinite' ? Math.atan(edge.slope) : 0;
  const shareAt = (part: number): number =>
    edge.kind === 'infinite' ? (fraction * Math.tan(part * angle)) / edge.slope : part * fraction;
  const perRadius = paraxialLaunch(edge, setup, 0, 1) - paraxialLaunch(edge, setup, 0, 0);
  let part = 0;
  let stride = 1 / 8;
  let ratio = paraxialLaunch(edge, setup, 1, 0);
  let [lastSquare, lastRatio] = [0, ratio];
  let [b, code] = [0, 0];
  while (part < 1) {
    const next = Math.min(1, part + stride);
    const share = shareAt(next);
    const square = part * part;
    const steepness = square > lastSquare ? (ratio - lastRatio) / (square - lastSquare) : 0;
    const guess = share * (ratio + steepness * (next * next - square));
    const source = sourceOf(setup, line, share);
    const found = aimInMeridian(sight, source, 0, guess, perRadius);
    if (Number.isFinite(found)) {
      [lastSquare, lastRatio] = [square, ratio];
      [ratio, part, b] = [found / share, next, found];
      stride *= 2;
    } else {
      code = sight.code;
      b = guess;
      stride /= 2;
      if (stride < SHORTEST) return { b, code: code || LOSSES * sight.stopSurface + MISSED };
    }
  }
  return { b, code: 0 };
}

/** A chief ray found by looking over the whole first surface; of several that nearest to `expected`. NaN when there is none. */
function scan(sight: Sight, source: Source, expected: number): number {
  const { train, stopRadiusMm } = sight;
  const profile = {
    curvaturePerMm: train.curvature[0]!,
    conic: train.conic[0]!,
    asphere: train.asphere.subarray(train.asphereFrom[0]!, train.asphereFrom[1]!),
  };
  const reach = Math.min(conicEdge(profile) * 0.9999, train.semiDiameter[0]!, 1e4 * stopRadiusMm);
  let best = Number.NaN;
  let last: Seen | null = null;
  for (let i = -SCANNED; i <= SCANNED; i++) {
    // Denser towards the axis, where layouts have their light.
    const y = reach * (i / SCANNED) * Math.abs(i / SCANNED);
    const sag = sagAt(profile, Math.abs(y));
    if (sag === null) continue;
    const seen: Seen = look(sight, source, launchThrough(source, 0, y, sag)[1]);
    const pair: readonly [Seen, Seen] | null = last && changeBetween(sight, source, last, seen);
    if (pair) {
      const [one, other] = pair;
      const perRadius = (other.b - one.b) / (other.y - one.y);
      const found = aimInMeridian(sight, source, 0, one.b - one.y * perRadius, perRadius);
      const nearer = !(Math.abs(found - expected) >= Math.abs(best - expected));
      if (Number.isFinite(found) && nearer) best = found;
    }
    last = seen;
  }
  return best;
}

/** A meridional ray that was tried: its height in the stop, in radii, NaN when it does not get there. */
interface Seen {
  readonly b: number;
  readonly y: number;
}

function look(sight: Sight, source: Source, b: number): Seen {
  return { b, y: shoot(sight, source, 0, b) ? sight.y : Number.NaN };
}

/** Two rays on either side of the stop's centre between these two; sought up to where rays are lost, as heights run off there. Null when there are none. */
function changeBetween(sight: Sight, source: Source, one: Seen, other: Seen): readonly [Seen, Seen] | null {
  if (one.y * other.y <= 0) return [one, other];
  let [good, lost] = Number.isNaN(one.y) ? [other, one] : [one, other];
  if (Number.isNaN(good.y) || !Number.isNaN(lost.y)) return null;
  for (let halving = 0; halving < EDGE_HALVINGS; halving++) {
    const middle = look(sight, source, (good.b + lost.b) / 2);
    if (middle.y * good.y <= 0) return [good, middle];
    if (Number.isNaN(middle.y)) lost = middle;
    else good = middle;
  }
  return null;
}
