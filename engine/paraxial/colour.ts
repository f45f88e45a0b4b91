import { none, type Outcome, some } from '../outcome.ts';
import type { Train } from '../train/types.ts';
import { type Absence, finite, type Quantity } from './absence.ts';
import type { Axial } from './axial.ts';
import type { ReferenceRays } from './rays.ts';
import { isNegligible } from './scale.ts';
import type { ParaxialRay } from './trace.ts';

export interface Petzval {
  /** Sum of φ/n over thin parts and (n′ − n)c/(n n′) over surfaces, 1/mm. */
  readonly sumPerMm: Quantity;
  /** −1/sum, negative for a field that curves towards the lens; 'flat field'. */
  readonly radiusMm: Quantity;
  readonly perSurface: Float64Array;
}

/** The Petzval sum; `glassIndex` has the index (assumed or given) of the thin part at each surface. */
export function petzval(train: Train, glassIndex: Float64Array): Petzval {
  const perSurface = new Float64Array(train.count);
  let sum = 0;
  let scale = 0;
  for (let k = 0; k < train.count; k++) {
    const n = train.index[k]!;
    const nAfter = train.index[k + 1]!;
    perSurface[k] =
      ((nAfter - n) * train.curvature[k]!) / (n * nAfter) + train.thinPower[k]! / glassIndex[k]!;
    sum += perSurface[k]!;
    scale += Math.abs(perSurface[k]!);
  }
  if (train.count === 0) return { sumPerMm: none('no parts'), radiusMm: none('no parts'), perSurface };
  return {
    sumPerMm: finite(sum),
    radiusMm: isNegligible(sum, scale) ? none('flat field') : finite(-1 / sum),
    perSurface,
  };
}

export interface Colour {
  /** Image distance short − long, mm. */
  readonly axialMm: Quantity;
  /** Chief-ray height in the paraxial image plane short − long, mm. */
  readonly lateralMm: Quantity;
  /** What each surface adds to the axial and the lateral colour in the image; absent for the same reasons. */
  readonly perSurface: Outcome<
    { readonly axialMm: Float64Array; readonly lateralMm: Float64Array | null },
    Absence
  >;
  /** Parts, by their place in the sketch, that bend or shift light but have no Abbe number: counted as free of dispersion. */
  readonly partsLeftOut: readonly number[];
}

/**
 * First-order colour. Each surface adds C = A·y·Δ(δn/n) + y²·δφ to the axial sum (A = n i; written here without A, as a thin part has no
 * single incidence) and the same with one y exchanged for the chief ray to the lateral one. l′ short − long = −ΣC/(n′u′²), h′ short −
 * long = ΣC̄/(n′u′) (Welford, Aberrations of Optical Systems, 1986, chapter on chromatic aberration). 'no Abbe number' when no medium
 * or part disperses.
 */
export function thinColour(train: Train, rays: ReferenceRays, axial: Axial): Colour {
  const { marginal, chief } = rays;
  const { count } = train;
  const partsLeftOut = withoutDispersion(train);
  const absent = (why: Outcome<never, Absence> & { ok: false }): Colour => ({
    axialMm: why,
    lateralMm: why,
    perSurface: why,
    partsLeftOut,
  });
  if (count === 0) return absent(none('no parts'));
  if (!disperses(train)) return absent(none('no Abbe number'));
  if (!marginal.ok) return absent(marginal);
  if (!axial.imageDistanceMm.ok) return absent(axial.imageDistanceMm);
  const m = marginal.value;
  const nuRear = m.nu[count]!;
  const axialMm = contributions(train, m, m, -train.index[count]! / (nuRear * nuRear));
  const lateral = chief.ok ? some(contributions(train, m, chief.value, 1 / nuRear)) : chief;
  const terms = { axialMm, lateralMm: lateral.ok ? lateral.value : null };
  return {
    axialMm: sumOf(axialMm),
    lateralMm: lateral.ok ? sumOf(lateral.value) : lateral,
    perSurface: isFiniteList(axialMm) && isFiniteList(terms.lateralMm) ? some(terms) : none('out of range'),
    partsLeftOut,
  };
}

const sumOf = (terms: Float64Array): Quantity => finite(terms.reduce((sum, term) => sum + term, 0));

const isFiniteList = (terms: Float64Array | null): boolean => terms?.every(Number.isFinite) ?? true;

const disperses = (train: Train): boolean =>
  train.powerSpread.some((spread) => spread !== 0) || train.indexSpread.some((spread) => spread !== 0);

function withoutDispersion(train: Train): readonly number[] {
  const parts = new Set<number>();
  for (let k = 0; k < train.count; k++) {
    const silentMedia = train.indexSpread[k] === 0 && train.indexSpread[k + 1] === 0;
    const silentPower = train.thinPower[k] !== 0 && train.powerSpread[k] === 0;
    if (silentPower || (train.index[k] !== train.index[k + 1] && silentMedia)) parts.add(train.partOf[k]!);
  }
  return [...parts];
}

/** `factor` times the sum's term at each surface: `second` is the marginal ray for axial colour, the chief ray for lateral. */
function contributions(
  train: Train,
  marginal: ParaxialRay,
  second: ParaxialRay,
  factor: number,
): Float64Array {
  const terms = new Float64Array(train.count);
  for (let k = 0; k < train.count; k++) {
    const y = marginal.y[k]!;
    const before = train.indexSpread[k]!;
    const after = train.indexSpread[k + 1]!;
    const power = train.curvature[k]! * (after - before) + train.powerSpread[k]!;
    const slopes =
      (after * second.nu[k + 1]!) / train.index[k + 1]! - (before * second.nu[k]!) / train.index[k]!;
    terms[k] = factor * y * (second.y[k]! * power + slopes);
  }
  return terms;
}
