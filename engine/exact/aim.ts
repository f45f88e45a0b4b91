import { AIMED, type Chief, NEARLY } from './chief.ts';
import { traceBatch } from './kernel.ts';
import { launch, type Source } from './launch.ts';
import { CODE, LOSSES, MISSED, STRIDE, X, Y } from './rayBuffer.ts';
import { reaches, type Sight, shoot } from './sight.ts';

/** What the aiming of one bundle starts from: its chief ray, and how much the launch numbers change per radius of the stop there. */
export interface AimedBundle {
  readonly source: Source;
  readonly chief: Chief;
  readonly perRadiusX: number;
  readonly perRadiusY: number;
}

const ROUNDS = 30;
const SHORTEST = 1 / 512;
const NEWTON_STEPS = 25;
/** Of the launch step per radius: how far beside a ray its neighbour for a derivative runs. */
const NUDGE = 1e-6;

/** The bundle about a chief ray; `perRadius` is the paraxial change of the launch number, used where the ray has no neighbours. */
export function bundleAbout(sight: Sight, source: Source, chief: Chief, perRadius: number): AimedBundle {
  const nudge = NUDGE * perRadius;
  const slope = (there: boolean, value: number): number => {
    const found = nudge / value;
    return there && Number.isFinite(found) && value !== 0 ? found : perRadius;
  };
  if (chief.code !== 0) return { source, chief, perRadiusX: perRadius, perRadiusY: perRadius };
  const perRadiusX = slope(shoot(sight, source, nudge, chief.b), sight.x);
  const perRadiusY = slope(shoot(sight, source, 0, chief.b + nudge), sight.y);
  return { source, chief, perRadiusX, perRadiusY };
}

/**
 * Aims `count` rays at points of the real stop: `pupil` has x and y in turn, in shares of its radius. `rays` gets them as `launch` starts
 * them. A point that no ray gets to has a ray with a code from its start, of the surface that is in the way (of a miss of the stop when
 * nothing is): the last one that was tried, which is lost there. Starts at the chief ray; all rays go together by Newton steps with Broyden's correction
 * (Math. Comp. 19, 577, 1965), halved where they lose the ray or lead away. Those that do not arrive are sought again in small steps when `thorough`.
 */
export function aimAll(
  sight: Sight,
  bundle: AimedBundle,
  pupil: ArrayLike<number>,
  count: number,
  rays: Float64Array,
  guess: ((x: number, y: number) => readonly [number, number]) | null = null,
  thorough = true,
): void {
  const { source, chief, perRadiusX, perRadiusY } = bundle;
  if (chief.code !== 0) {
    for (let i = 0; i < count; i++) {
      launch(source, 0, chief.b, rays, i * STRIDE);
      rays[i * STRIDE + CODE] = chief.code;
    }
    return;
  }
  const searches = Array.from({ length: count }, (_, i): Search => {
    const [px, py] = [pupil[2 * i]!, pupil[2 * i + 1]!];
    const [a, b] = guess?.(px, py) ?? [px * perRadiusX, chief.b + py * perRadiusY];
    return {
      px,
      py,
      a,
      b,
      goodA: 0,
      goodB: chief.b,
      missX: -px,
      missY: -py,
      xx: perRadiusX,
      xy: 0,
      yx: 0,
      yy: perRadiusY,
      done: false,
    };
  });
  const { train, stopSurface, stopRadiusMm } = sight;
  for (let round = 0; round < ROUNDS; round++) {
    let active = 0;
    for (const [i, search] of searches.entries()) {
      if (search.done) rays[i * STRIDE + CODE] = MISSED;
      else {
        launch(source, search.a, search.b, rays, i * STRIDE);
        active++;
      }
    }
    if (active === 0) break;
    traceBatch(train, rays, count, false, 0, stopSurface + 1);
    for (const [i, search] of searches.entries()) {
      if (search.done) continue;
      const at = i * STRIDE;
      const there = reaches(rays[at + CODE]!, stopSurface);
      improve(search, there, rays[at + X]! / stopRadiusMm, rays[at + Y]! / stopRadiusMm);
    }
  }
  for (const [i, search] of searches.entries()) {
    const at = i * STRIDE;
    const code = search.done ? 0 : thorough ? walk(sight, bundle, search) : LOSSES * stopSurface + MISSED;
    launch(source, search.a, search.b, rays, at);
    if (code !== 0) rays[at + CODE] = code;
  }
}

/** One point of the stop and the ray that is to go there. */
interface Search {
  readonly px: number;
  readonly py: number;
  /** The launch numbers to try, or those that hit. */
  a: number;
  b: number;
  /** The best so far, and where it passed the point. */
  goodA: number;
  goodB: number;
  missX: number;
  missY: number;
  /** Change of the launch numbers per miss. */
  xx: number;
  xy: number;
  yx: number;
  yy: number;
  done: boolean;
}

/** Takes in where the tried ray met the stop, and chooses what to try next. */
function improve(search: Search, there: boolean, x: number, y: number): void {
  const [missX, missY] = [x - search.px, y - search.py];
  const size = Math.hypot(missX, missY);
  const before = Math.hypot(search.missX, search.missY);
  const [stepA, stepB] = [search.a - search.goodA, search.b - search.goodB];
  if (there && size <= AIMED) {
    search.done = true;
    return;
  }
  if (!(there && size < before)) {
    if (before <= NEARLY) {
      [search.a, search.b, search.done] = [search.goodA, search.goodB, true];
    } else {
      [search.a, search.b] = [search.goodA + stepA / 2, search.goodB + stepB / 2];
    }
    return;
  }
  // Broyden: the inverse takes the change just seen to the step just made.
  const [dx, dy] = [missX - search.missX, missY - search.missY];
  const [toA, toB] = [search.xx * dx + search.xy * dy, search.yx * dx + search.yy * dy];
  const share = stepA * toA + stepB * toB;
  if (share !== 0 && Number.isFinite(share)) {
    const [row1, row2] = [stepA * search.xx + stepB * search.yx, stepA * search.xy + stepB * search.yy];
    const [lackA, lackB] = [(stepA - toA) / share, (stepB - toB) / share];
    search.xx += lackA * row1;
    search.xy += lackA * row2;
    search.yx += lackB * row1;
    search.yy += lackB * row2;
  }
  [search.goodA, search.goodB, search.missX, search.missY] = [search.a, search.b, missX, missY];
  search.a -= search.xx * missX + search.xy * missY;
  search.b -= search.yx * missX + search.yy * missY;
}

/**
 * The same search by small steps from the chief ray outwards, each by Newton's method with derivatives from neighbours. Returns 0 with
 * the ray in `search`, or the code of what is in the way, and there the last ray that was lost to it.
 */
function walk(sight: Sight, bundle: AimedBundle, search: Search): number {
  const { chief, perRadiusX, perRadiusY } = bundle;
  const { px, py } = search;
  const at: Step = { a: 0, b: chief.b, lostA: Number.NaN, lostB: Number.NaN, code: 0 };
  let [part, stride] = [0, 1 / 4];
  let [rateA, rateB] = [px * perRadiusX, py * perRadiusY];
  while (part < 1) {
    const next = Math.min(1, part + stride);
    const { a, b } = at;
    at.a += rateA * (next - part);
    at.b += rateB * (next - part);
    if (step(sight, bundle, next * px, next * py, at)) {
      [rateA, rateB] = [(at.a - a) / (next - part), (at.b - b) / (next - part)];
      part = next;
      stride *= 2;
    } else {
      [at.a, at.b] = [a, b];
      stride /= 2;
      if (stride < SHORTEST) {
        const lost = at.code !== 0;
        [search.a, search.b] = lost ? [at.lostA, at.lostB] : [a, b];
        return lost ? at.code : LOSSES * sight.stopSurface + MISSED;
      }
    }
  }
  [search.a, search.b] = [at.a, at.b];
  return 0;
}

interface Step {
  a: number;
  b: number;
  /** The last try that was lost, and how. */
  lostA: number;
  lostB: number;
  code: number;
}

/** Newton's method from the launch numbers in `at` to the point (px, py), halving steps that lose the ray; true when it gets there. */
function step(sight: Sight, bundle: AimedBundle, px: number, py: number, at: Step): boolean {
  const { source, perRadiusX, perRadiusY } = bundle;
  const [nudgeA, nudgeB] = [NUDGE * perRadiusX, NUDGE * perRadiusY];
  let [a, b] = [at.a, at.b];
  let [goodA, goodB, best] = [Number.NaN, Number.NaN, Number.POSITIVE_INFINITY];
  for (let tries = 0; tries < NEWTON_STEPS; tries++) {
    const there = shoot(sight, source, a, b);
    if (!there) [at.lostA, at.lostB, at.code] = [a, b, sight.code];
    const [missX, missY] = [sight.x - px, sight.y - py];
    const size = Math.hypot(missX, missY);
    if (!(there && size < best)) {
      if (best <= NEARLY || !Number.isFinite(goodA)) break;
      [a, b] = [(a + goodA) / 2, (b + goodB) / 2];
      continue;
    }
    [goodA, goodB, best] = [a, b, size];
    if (size <= AIMED) break;
    const { x, y } = sight;
    if (!shoot(sight, source, a + nudgeA, b)) break;
    const [xA, yA] = [(sight.x - x) / nudgeA, (sight.y - y) / nudgeA];
    if (!shoot(sight, source, a, b + nudgeB)) break;
    const [xB, yB] = [(sight.x - x) / nudgeB, (sight.y - y) / nudgeB];
    const determinant = xA * yB - xB * yA;
    a -= (yB * missX - xB * missY) / determinant;
    b -= (xA * missY - yA * missX) / determinant;
  }
  if (!(best <= NEARLY)) return false;
  [at.a, at.b] = [goodA, goodB];
  return true;
}
