import { coddington } from '../../engine/exact/coddington.ts';
import { traceRay } from '../../engine/exact/ray.ts';
import type { Hit, RayPath, Vector } from '../../engine/exact/types.ts';
import { firstOrder } from '../../engine/paraxial/firstOrder.ts';
import type { Train } from '../../engine/train/types.ts';
import { isRecord, numberIn } from './json.ts';
import { layOut } from './prescription.ts';
import type { CaseReport, Miss } from './report.ts';

/** Of points and paths, times the size of the numbers that made them, at least 1 mm. */
const LENGTH_MM = 1e-12;
/** Of direction cosines and of the cosines to the normal. */
const COSINE = 1e-13;
/** What rays may take instead that leave a surface near the critical angle, and heights in a focus plane that a ray hardly runs towards. */
const WIDER = 1e-11;
/** Cosine of refraction below which it is the root of a difference, of which doubles keep half the digits less. */
const NEAR_CRITICAL = 0.05;
/** Direction cosine along the axis below which the focus plane is far away on the ray. */
const ACROSS = 0.05;

/** Runs every ray of a parsed file of exact rays; a report for each, under the ray's id. Null when it is no such file. */
export function runExactRays(json: unknown): readonly CaseReport[] | null {
  if (!isRecord(json) || !Array.isArray(json.systems)) return null;
  return json.systems.flatMap((system: unknown): CaseReport[] => {
    if (!isRecord(system) || !Array.isArray(system.rays)) return [];
    const train = layOut(system.prescription)?.train ?? null;
    return system.rays.map((ray: unknown, place: number) => runRay(train, ray, `${system.id} ${place + 1}`));
  });
}

/** What one ray was compared with. */
class Comparison {
  readonly covered: string[] = [];
  readonly left: string[] = [];
  readonly misses: Miss[] = [];

  same(quantity: string, got: unknown, wanted: unknown): void {
    this.covered.push(quantity);
    if (got !== wanted) {
      this.misses.push({ quantity, got: String(got), wanted: String(wanted), tolerance: 0 });
    }
  }

  near(quantity: string, got: number | undefined, wanted: number, tolerance: number): void {
    this.covered.push(quantity);
    if (!(got !== undefined && Math.abs(got - wanted) <= tolerance)) {
      this.misses.push({ quantity, got: String(got), wanted: String(wanted), tolerance });
    }
  }
}

function runRay(train: Train | null, entry: unknown, place: string): CaseReport {
  const id = isRecord(entry) && typeof entry.id === 'string' ? entry.id : place;
  const start = isRecord(entry) ? vectorOf(entry.start) : null;
  const direction = isRecord(entry) ? vectorOf(entry.direction) : null;
  const seen = new Comparison();
  if (train && isRecord(entry) && start && direction) {
    compareRay(train, traceRay(train, start, direction), entry, seen);
  }
  const { covered, left, misses } = seen;
  if (covered.length === 0) return { id, outcome: 'skipped', covered, left, misses };
  return { id, outcome: misses.length > 0 ? 'failed' : 'passed', covered, left, misses };
}

/** What makes a ray of the file hard for doubles: the first surface it leaves near the critical angle, and a far focus plane. */
export function hardshipsOf(ray: unknown): {
  readonly nearCritical: number | null;
  readonly farFocus: boolean;
} {
  const surfaces: readonly unknown[] = isRecord(ray) && Array.isArray(ray.surfaces) ? ray.surfaces : [];
  const grazing = surfaces.findIndex((surface) => {
    const cosine = isRecord(surface) ? numberIn(surface, 'cosRefraction') : null;
    return cosine !== null && cosine < NEAR_CRITICAL;
  });
  const last = surfaces.at(-1);
  const direction = isRecord(last) ? vectorOf(last.direction) : null;
  return {
    nearCritical: grazing < 0 ? null : grazing,
    farFocus: direction !== null && Math.abs(direction[2]) < ACROSS,
  };
}

const STATUS: Readonly<Record<string, string>> = {
  'totally reflected': 'totalReflection',
  missed: 'miss',
};

function compareRay(train: Train, path: RayPath, entry: Record<string, unknown>, seen: Comparison): void {
  seen.same('status', path.lost ? STATUS[path.lost.why] : 'ok', entry.status);
  if (entry.failsAt !== undefined) seen.same('failsAt', path.lost?.surface, entry.failsAt);
  const surfaces: readonly unknown[] = Array.isArray(entry.surfaces) ? entry.surfaces : [];
  seen.same('surfaces', path.hits.length, surfaces.length);
  const { nearCritical, farFocus } = hardshipsOf(entry);
  for (const [k, wanted] of surfaces.entries()) {
    const wider = nearCritical !== null && k >= nearCritical ? WIDER : 0;
    if (isRecord(wanted)) compareHit(path.hits[k], wanted, `surface ${k + 1}`, wider, seen);
  }
  const focus = entry.atParaxialFocus;
  if (isRecord(focus)) {
    const wider = farFocus || nearCritical !== null;
    compareFocus(train, path, focus, wider ? WIDER : LENGTH_MM, seen);
  }
  if (isRecord(entry.parallelBundleFoci)) compareFoci(train, path, entry.parallelBundleFoci, seen);
}

function compareHit(
  hit: Hit | undefined,
  wanted: Record<string, unknown>,
  name: string,
  wider: number,
  seen: Comparison,
): void {
  const cosine = Math.max(COSINE, wider);
  const point = vectorOf(wanted.point);
  const path = numberIn(wanted, 'opticalPath');
  const scale = Math.max(1, Math.hypot(...(point ?? [0])), Math.abs(path ?? 0));
  const length = Math.max(LENGTH_MM, wider) * scale;
  for (const [i, value] of (point ?? []).entries()) {
    seen.near(`${name} point ${'xyz'[i]}`, hit?.point[i], value, length);
  }
  if (path !== null) seen.near(`${name} path`, hit?.opticalPathMm, path, length);
  const direction = vectorOf(wanted.direction);
  if (!direction) seen.same(`${name} direction`, hit?.direction, null);
  for (const [i, value] of (direction ?? []).entries()) {
    seen.near(`${name} direction ${'xyz'[i]}`, hit?.direction?.[i], value, cosine);
  }
  for (const [quantity, got] of [
    ['cosIncidence', hit?.cosIncidence],
    ['cosRefraction', hit?.cosRefraction],
  ] as const) {
    const value = numberIn(wanted, quantity);
    if (value === null) seen.same(`${name} ${quantity}`, got, null);
    else seen.near(`${name} ${quantity}`, got ?? undefined, value, cosine);
  }
}

/** x and y in the plane of the paraxial focus. */
function compareFocus(
  train: Train,
  path: RayPath,
  wanted: Record<string, unknown>,
  relative: number,
  seen: Comparison,
): void {
  const back = firstOrder(train).backFocusMm;
  const last = path.hits.at(-1);
  const direction = last?.direction;
  const reach = back.ok && last && direction ? (back.value - last.point[2]) / direction[2] : Number.NaN;
  for (const [i, axis] of (['x', 'y'] as const).entries()) {
    const value = numberIn(wanted, axis);
    if (value === null) continue;
    const got = (last?.point[i] ?? 0) + reach * (direction?.[i] ?? 0);
    const scale = Math.max(1, Math.abs(value), Math.abs(back.ok ? back.value : 0));
    seen.near(`focus ${axis}`, got, value, relative * scale);
  }
  const z = numberIn(wanted, 'z');
  if (z !== null)
    seen.near('focus z', back.ok ? back.value : undefined, z, LENGTH_MM * Math.max(1, Math.abs(z)));
}

/** The foci of a narrow parallel pencil about the ray, along it from its last point. */
function compareFoci(train: Train, path: RayPath, wanted: Record<string, unknown>, seen: Comparison): void {
  const foci = coddington(train, path, null);
  for (const name of ['tangential', 'sagittal'] as const) {
    const value = numberIn(wanted, name);
    const got = foci[name];
    if (value === null) seen.same(`${name} focus`, got.ok, false);
    else
      seen.near(
        `${name} focus`,
        got.ok ? got.value : undefined,
        value,
        LENGTH_MM * Math.max(1, Math.abs(value)),
      );
  }
}

function vectorOf(value: unknown): Vector | null {
  if (!Array.isArray(value) || value.length !== 3 || !value.every(Number.isFinite)) return null;
  return value as unknown as Vector;
}
