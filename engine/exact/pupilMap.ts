import { none, type Outcome, some } from '../outcome.ts';
import { type AimedBundle, aimAll, bundleAbout } from './aim.ts';
import { aimChief, paraxialLaunch } from './chief.ts';
import { launch, sourceOf } from './launch.ts';
import { CODE, L, lostOf, M, N, PATH, STRIDE, X, Y, Z } from './rayBuffer.ts';
import { type Sight, sightOf } from './sight.ts';
import type { ExactSetup, Lost, Vector } from './types.ts';

/**
 * The rays of one field point in one line, by where they go in the real stop. The chief ray and eight others are aimed; the rest can be
 * placed between them by `mapRays`, or aimed one by one by `aimRays`.
 */
export interface PupilMap {
  readonly setup: ExactSetup;
  /** Place in `setup.lines`. */
  readonly line: number;
  /** Share of the field. */
  readonly fraction: number;
  /** Why there is no chief ray, and so no bundle; null when there is one. */
  readonly lost: Lost | null;
  /** Null when no eight rays around the chief ray get to the stop: then every ray has to be aimed. */
  readonly shape: Shape | null;
  readonly bundle: AimedBundle;
  readonly sight: Sight;
}

/** Launch numbers as polynomials in the place (x, y) in the stop, in shares of `ring`; a is odd in x, b even. */
interface Shape {
  /** How far out, in shares of the stop's radius, the aimed rays lie: 1 unless the rim is out of reach. */
  readonly ring: number;
  /** x · (1, x², y, y²). */
  readonly a: readonly [number, number, number, number];
  /** 1, y, y², y³, y⁴. */
  readonly b: readonly [number, number, number, number, number];
  /** x² · (1, x², y, y²). */
  readonly across: readonly [number, number, number, number];
}

/** Tried in turn; further out the polynomials are carried on. */
const RINGS = [1, 0.7, 0.5, 0.3, 0.15];
const INNER = 0.6;
const DIAGONAL = Math.SQRT1_2;
/** Rim and an inner zone, in the meridian, across it and between; those on the other side of the meridian are alike. */
const AIMED_POINTS = new Float64Array([
  ...[0, 1, 0, -1, 0, INNER, 0, -INNER],
  ...[1, 0, INNER, 0, DIAGONAL, DIAGONAL, DIAGONAL, -DIAGONAL],
]);
const AIMED_COUNT = AIMED_POINTS.length / 2;

const made = new WeakMap<ExactSetup, Map<number, PupilMap>>();

/**
 * The bundle of the share `fraction` of the field in line `line` of the setup. Its `lost` says when no ray gets to the stop's centre.
 * Drawing, plots and comparison ask for the same few, and aiming costs more than tracing: each is made once for a setup.
 */
export function pupilMapOf(setup: ExactSetup, line: number, fraction: number): PupilMap {
  const known = made.get(setup) ?? new Map<number, PupilMap>();
  made.set(setup, known);
  const key = line * FIELDS_APART + fraction;
  const map = known.get(key) ?? makeMap(setup, line, fraction);
  known.set(key, map);
  return map;
}

/** Shares of the field lie between −1 and 1, so that line and share make one number. */
const FIELDS_APART = 4;

function makeMap(setup: ExactSetup, line: number, fraction: number): PupilMap {
  const sight = sightOf(setup, line);
  const chief = aimChief(sight, setup, line, fraction);
  const source = sourceOf(setup, line, fraction);
  const paraxial = paraxialLaunch(source, setup, fraction, 1) - paraxialLaunch(source, setup, fraction, 0);
  const bundle = bundleAbout(sight, source, chief, paraxial);
  const shape = chief.code === 0 ? widestShape(sight, bundle) : null;
  return { setup, line, fraction, lost: lostOf(chief.code), shape, bundle, sight };
}

/**
 * Starts `count` rays for `traceBatch`, each to its point of the stop (`pupil` has x and y in turn, in shares of its radius), placed
 * between the aimed ones: good for drawing and dragging; where the map has no shape they are aimed. Rays of one map have paths that can be
 * compared. A ray that cannot get there has its `CODE` from the start, so that `traceBatch` leaves it alone.
 */
export function mapRays(map: PupilMap, pupil: ArrayLike<number>, count: number, rays: Float64Array): void {
  const { bundle, shape } = map;
  if (shape === null) {
    aimRays(map, pupil, count, rays);
    return;
  }
  for (let i = 0; i < count; i++) {
    const x = pupil[2 * i]!;
    const y = pupil[2 * i + 1]!;
    launch(bundle.source, firstAt(shape, x, y), secondAt(shape, x, y), rays, i * STRIDE);
  }
}

/** As `mapRays`, with every ray aimed at its point of the stop. */
export function aimRays(map: PupilMap, pupil: ArrayLike<number>, count: number, rays: Float64Array): void {
  const { sight, bundle, shape } = map;
  const guess = shape && ((x: number, y: number) => [firstAt(shape, x, y), secondAt(shape, x, y)] as const);
  aimAll(sight, bundle, pupil, count, rays, guess);
}

/** The start of a single aimed ray for `traceRay`, z from the first vertex. */
export interface AimedRay {
  readonly start: Vector;
  readonly direction: Vector;
  /** Index times length from the object point to the start; from infinity, from the plane wave through the first vertex. */
  readonly pathMm: number;
}

/** The ray to the point (x, y) of the stop, in shares of its radius: (0, 0) is the chief, (0, ±1) are the marginal rays. Absent when none gets there. */
export function aimedRay(map: PupilMap, x: number, y: number): Outcome<AimedRay, Lost['why']> {
  const ray = new Float64Array(STRIDE);
  aimRays(map, [x, y], 1, ray);
  const lost = lostOf(ray[CODE]!);
  if (lost) return none(lost.why);
  return some({
    start: [ray[X]!, ray[Y]!, ray[Z]!],
    direction: [ray[L]!, ray[M]!, ray[N]!],
    pathMm: ray[PATH]!,
  });
}

function firstAt({ a, ring }: Shape, xInStop: number, yInStop: number): number {
  const [x, y] = [xInStop / ring, yInStop / ring];
  return x * (a[0] + a[1] * x * x + y * (a[2] + a[3] * y));
}

function secondAt({ b, across, ring }: Shape, xInStop: number, yInStop: number): number {
  const [x, y] = [xInStop / ring, yInStop / ring];
  const inMeridian = b[0] + y * (b[1] + y * (b[2] + y * (b[3] + y * b[4])));
  return inMeridian + x * x * (across[0] + across[1] * x * x + y * (across[2] + across[3] * y));
}

/** The shape through the widest ring of rays that get to the stop. */
function widestShape(sight: Sight, bundle: AimedBundle): Shape | null {
  for (const ring of RINGS) {
    const shape = shapeOf(sight, bundle, ring);
    if (shape) return shape;
  }
  return null;
}

/** The polynomials through the nine aimed rays, each term from the rays that single it out; null when one of them does not get there. */
function shapeOf(sight: Sight, bundle: AimedBundle, ring: number): Shape | null {
  const rays = new Float64Array(AIMED_COUNT * STRIDE);
  const points = AIMED_POINTS.map((share) => share * ring);
  aimAll(sight, bundle, points, AIMED_COUNT, rays, null, false);
  const numbers = Array.from({ length: AIMED_COUNT }, (_, i): readonly [number, number] => {
    const at = i * STRIDE;
    if (rays[at + CODE] !== 0) return [Number.NaN, Number.NaN];
    return bundle.source.kind === 'infinite'
      ? [rays[at + X]!, rays[at + Y]!]
      : [rays[at + L]!, rays[at + M]!];
  });
  const [up, down, upIn, downIn, side, sideIn, upSide, downSide] = numbers;
  if (!(up && down && upIn && downIn && side && sideIn && upSide && downSide)) return null;
  const centre = bundle.chief.b;
  const [odd, cubic] = oddThrough((up[1] - down[1]) / 2, (upIn[1] - downIn[1]) / 2);
  const [even, quartic] = evenThrough((up[1] + down[1]) / 2 - centre, (upIn[1] + downIn[1]) / 2 - centre);
  const [across, acrossQuartic] = evenThrough(side[1] - centre, sideIn[1] - centre);
  const [linear, acrossCubic] = oddThrough(side[0], sideIn[0]);
  const plain: Shape = {
    ring,
    a: [linear, acrossCubic, 0, 0],
    b: [centre, odd, even, cubic, quartic],
    across: [across, acrossQuartic, 0, 0],
  };
  const [d, dd] = [DIAGONAL, DIAGONAL * DIAGONAL];
  const leftA = (ray: readonly [number, number], y: number) =>
    (ray[0] - firstAt(plain, d * ring, y * ring)) / d;
  const leftB = (ray: readonly [number, number], y: number) =>
    (ray[1] - secondAt(plain, d * ring, y * ring)) / dd;
  const [upA, downA, upB, downB] = [
    leftA(upSide, d),
    leftA(downSide, -d),
    leftB(upSide, d),
    leftB(downSide, -d),
  ];
  const shape: Shape = {
    ring,
    a: [linear, acrossCubic, (upA - downA) / (2 * d), (upA + downA) / (2 * dd)],
    b: plain.b,
    across: [across, acrossQuartic, (upB - downB) / (2 * d), (upB + downB) / (2 * dd)],
  };
  return [...shape.a, ...shape.b, ...shape.across].every(Number.isFinite) ? shape : null;
}

/** [p, q] of p·x + q·x³ from its values at 1 and at the inner zone. */
function oddThrough(atRim: number, inside: number): readonly [number, number] {
  const q = (atRim - inside / INNER) / (1 - INNER * INNER);
  return [atRim - q, q];
}

/** [p, q] of p·x² + q·x⁴ from its values at 1 and at the inner zone. */
function evenThrough(atRim: number, inside: number): readonly [number, number] {
  const q = (atRim - inside / (INNER * INNER)) / (1 - INNER * INNER);
  return [atRim - q, q];
}
