import { none, type Outcome, some } from '../outcome.ts';
import type { Absence } from '../paraxial/absence.ts';
import type { ReferenceRays } from '../paraxial/rays.ts';
import type { ParaxialRay } from '../paraxial/trace.ts';
import type { Train } from '../train/types.ts';
import { eachSum, SUM_NAMES, type SumName, type Sums } from './sums.ts';
import { thinElementSums } from './thinElement.ts';

/** Third-order and first-order colour sums of one train for its marginal and chief ray, mm. */
export interface Seidel {
  /** What each surface adds. */
  readonly perSurface: Readonly<Record<SumName, Float64Array>>;
  readonly totals: Sums;
  /** Sums of the surfaces' terms without their signs: what the totals' rounding is judged by. */
  readonly absolute: Sums;
  /** Parts whose five monochromatic terms are missing: thin, without a known index or bending, or between two media. */
  readonly partsLeftOut: readonly number[];
}

/** Glass of the thin part at each surface; null where it is not known. */
export interface ThinGlass {
  readonly index: readonly (number | null)[];
  /** Bending q = (R2 + R1)/(R2 − R1). */
  readonly shapeFactor: readonly (number | null)[];
}

const UNKNOWN: ThinGlass = { index: [], shapeFactor: [] };

/**
 * The Seidel sums in Welford's convention (Aberrations of Optical Systems, 1986). With A = n i and Ā of the chief ray, Δ behind minus in
 * front and H = nu·ȳ − nū·y, a surface adds S_I = −A²yΔ(u/n), S_II = −AĀyΔ(u/n), S_III = −Ā²yΔ(u/n), S_IV = −H²cΔ(1/n),
 * S_V = (Ā/A)(S_III + S_IV), C_I = AyΔ(δn/n), C_II = ĀyΔ(δn/n); wavefront at the rim S_I/8. δn is short minus long.
 * A conic or an r⁴ term, G r⁴ = (K c³/8 + A4) r⁴, adds 8Gy⁴Δn to S_I and its multiples by powers of ȳ/y to S_II, S_III and S_V.
 * A thin part adds what its glass and bending make of it (`thinElementSums`), and y²δφ, yȳδφ to the colours.
 *
 * Absent when a reference ray is, 'no parts', 'out of range'.
 */
export function seidel(
  train: Train,
  { marginal, chief }: ReferenceRays,
  glass: ThinGlass = UNKNOWN,
): Outcome<Seidel, Absence> {
  if (train.count === 0) return none('no parts');
  if (!marginal.ok) return marginal;
  if (!chief.ok) return chief;
  const perSurface = eachSum(() => new Float64Array(train.count));
  const partsLeftOut = new Set<number>();
  for (let k = 0; k < train.count; k++) {
    addColour(perSurface, train, k, marginal.value, chief.value);
    if (train.thinPower[k] === 0) addSurface(perSurface, train, k, marginal.value, chief.value);
    else if (!addThin(perSurface, train, k, marginal.value, chief.value, glass))
      partsLeftOut.add(train.partOf[k]!);
  }
  const totals = eachSum((name) => perSurface[name].reduce((sum, term) => sum + term, 0));
  const absolute = eachSum((name) => perSurface[name].reduce((sum, term) => sum + Math.abs(term), 0));
  return SUM_NAMES.every((name) => Number.isFinite(absolute[name]))
    ? some({ perSurface, totals, absolute, partsLeftOut: [...partsLeftOut] })
    : none('out of range');
}

type Terms = Record<SumName, Float64Array>;

function addSurface(terms: Terms, train: Train, k: number, marginal: ParaxialRay, chief: ParaxialRay): void {
  const n = train.index[k]!;
  const nAfter = train.index[k + 1]!;
  const c = train.curvature[k]!;
  const [y, yChief] = [marginal.y[k]!, chief.y[k]!];
  const A = marginal.nu[k]! + n * c * y;
  const AChief = chief.nu[k]! + n * c * yChief;
  const H = marginal.nu[k]! * yChief - chief.nu[k]! * y;
  const inverseStep = (n - nAfter) / (n * nAfter);
  const inverseSum = 1 / n + 1 / nAfter;
  // Δ(u/n) = AΔ(1/n²) − ycΔ(1/n): nothing is lost where the indices hardly differ.
  const slopeStep = inverseStep * (A * inverseSum - y * c);
  // H = Aȳ − Āy turns (Ā/A)(S_III + S_IV) into a form that survives A = 0.
  const distortion =
    AChief * inverseStep * (yChief * c * (2 * AChief * y - A * yChief) - AChief * AChief * y * inverseSum);
  // Departure from the vertex sphere.
  const fourth =
    (train.conic[k]! * c * c * c) / 8 +
    (train.asphereFrom[k + 1]! > train.asphereFrom[k]! ? train.asphere[train.asphereFrom[k]!]! : 0);
  const aspheric = 8 * fourth * (nAfter - n) * y;
  terms.spherical[k] = y * (aspheric * y * y - A * A * slopeStep) + 0;
  terms.coma[k] = aspheric * y * y * yChief - A * AChief * y * slopeStep + 0;
  terms.astigmatism[k] = aspheric * y * yChief * yChief - AChief * AChief * y * slopeStep + 0;
  terms.petzval[k] = -H * H * c * inverseStep + 0;
  terms.distortion[k] = aspheric * yChief * yChief * yChief + distortion + 0;
}

function addThin(
  terms: Terms,
  train: Train,
  k: number,
  marginal: ParaxialRay,
  chief: ParaxialRay,
  glass: ThinGlass,
): boolean {
  const glassIndex = glass.index[k] ?? null;
  const shapeFactor = glass.shapeFactor[k] ?? null;
  const mediumIndex = train.index[k]!;
  if (glassIndex === null || shapeFactor === null || mediumIndex !== train.index[k + 1]) return false;
  const sums = thinElementSums(
    { powerPerMm: train.thinPower[k]!, mediumIndex, glassIndex, shapeFactor },
    { y: marginal.y[k]!, nu: marginal.nu[k]!, yChief: chief.y[k]!, nuChief: chief.nu[k]! },
  );
  if (sums === null) return false;
  terms.spherical[k] = sums.spherical;
  terms.coma[k] = sums.coma;
  terms.astigmatism[k] = sums.astigmatism;
  terms.petzval[k] = sums.petzval;
  terms.distortion[k] = sums.distortion;
  return true;
}

/** Written without A, as a thin part has no single incidence: AΔ(δn/n) = Δ(δn·u) + cyΔδn. */
function addColour(terms: Terms, train: Train, k: number, marginal: ParaxialRay, chief: ParaxialRay): void {
  const before = train.indexSpread[k]!;
  const after = train.indexSpread[k + 1]!;
  const power = train.curvature[k]! * (after - before) + train.powerSpread[k]!;
  const y = marginal.y[k]!;
  const bend = (ray: ParaxialRay): number =>
    y *
    (ray.y[k]! * power +
      (after * ray.nu[k + 1]!) / train.index[k + 1]! -
      (before * ray.nu[k]!) / train.index[k]!);
  terms.axialColour[k] = bend(marginal) + 0;
  terms.lateralColour[k] = bend(chief) + 0;
}
