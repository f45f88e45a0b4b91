import { none, type Outcome, some } from '../outcome.ts';
import { isNegligible } from '../paraxial/scale.ts';
import { type Solved, solvedIf, type Unsolvable } from './absence.ts';
import type { Bending } from './bending.ts';
import { type Stack, trainOfStack } from './stack.ts';
import { type ThinEquivalent, thinEquivalent } from './thinEquivalent.ts';
import type { TwoElements } from './twoElements.ts';

/** A glass by its index in the main line and its Abbe number (n − 1)/(n short − n long). */
export interface Glass {
  readonly index: number;
  readonly abbeNumber: number;
}

export interface AchromatWish {
  /** 1/power of the pair, met exactly at its full thickness. */
  readonly focalLengthMm: number;
  /** From left to right. */
  readonly glasses: readonly [Glass, Glass];
  readonly thicknessesMm: readonly [number, number];
  /** Bending of the first of the two; equal radii are not allowed, as the pair's colour hangs on their difference. */
  readonly bending: Bending;
  /** Index in front and behind; 1 unless given. */
  readonly indexInFront?: number;
  readonly indexBehind?: number;
}

/** A cemented pair that was solved for. */
export interface Achromat extends ThinEquivalent {
  /** From left to right, 1/mm. */
  readonly curvaturesPerMm: readonly [number, number, number];
}

/**
 * A cemented pair without thin-element axial colour: (c1 − c2)·δn1 + (c2 − c3)·δn2 = 0, δn = (n − 1)/V, which in air is
 * φ1 = φV1/(V1 − V2), φ2 = −φV2/(V1 − V2) (Kingslake, Lens Design Fundamentals, chapter on achromats). All three curvatures are then
 * multiplied by one number until the pair with its thicknesses has the wished focal length.
 */
export function achromat(wish: AchromatWish): Solved<Achromat> {
  const { glasses, thicknessesMm, bending, indexInFront = 1, indexBehind = 1 } = wish;
  const [crown, flint] = glasses;
  const [spread, spreadBehind] = glasses.map(({ index, abbeNumber }) => (index - 1) / abbeNumber);
  if (!spread || !spreadBehind) return none('no dispersion');
  const { front, rear } = bending;
  if (front === rear) return none('no bending');
  const indices = [indexInFront, crown.index, flint.index, indexBehind];
  const directions = [front, rear, rear + ((front - rear) * spread) / spreadBehind];
  const factor = scaleFor({ curvaturesPerMm: directions, indices, thicknessesMm }, 1 / wish.focalLengthMm);
  if (!factor.ok) return factor;
  const [c1 = 0, c2 = 0, c3 = 0] = directions.map((direction) => direction * factor.value + 0);
  const curvaturesPerMm = [c1, c2, c3] as const;
  const equivalent = thinEquivalent(trainOfStack({ curvaturesPerMm, indices, thicknessesMm }));
  if (!equivalent.ok) return none('out of range');
  return solvedIf({ ...equivalent.value, curvaturesPerMm }, curvaturesPerMm);
}

/**
 * Focal lengths (1/power, mm) of two thin parts in contact without axial colour: f(V1 − V2)/V1 and −f(V1 − V2)/V2; source as above. 'equal Abbe
 * numbers'.
 */
export function achromaticPair(
  focalLengthMm: number,
  abbeNumber: number,
  abbeNumberBehind: number,
): Solved<TwoElements> {
  if (abbeNumber === abbeNumberBehind) return none('equal Abbe numbers');
  const step = focalLengthMm * (abbeNumber - abbeNumberBehind);
  const pair = { firstFocalLengthMm: step / abbeNumber, secondFocalLengthMm: -step / abbeNumberBehind };
  return solvedIf(pair, Object.values(pair));
}

/** Thickness is put on in so many equal shares, so that the root that began at the thin pair is not lost. */
const SHARES = 16;
/** Newton steps for one share; two or three are usual. */
const MOST_STEPS = 30;

/**
 * The number that all curvatures of a thick pair are multiplied by so that its power is `powerPerMm`: the root of
 * φ = φ1 + φ2 + φ3 − τ1φ1(φ2 + φ3) − τ2(φ1 + φ2)φ3 + τ1τ2φ1φ2φ3, τ = t/n, continuous with τ → 0.
 */
function scaleFor({ curvaturesPerMm, indices, thicknessesMm }: Stack, powerPerMm: number): Solved<number> {
  const [p1 = 0, p2 = 0, p3 = 0] = curvaturesPerMm.map(
    (c, k) => c * ((indices[k + 1] ?? 1) - (indices[k] ?? 1)),
  );
  const [tau1 = 0, tau2 = 0] = thicknessesMm.map((thickness, k) => thickness / (indices[k + 1] ?? 1));
  const linear = p1 + p2 + p3;
  if (isNegligible(linear, Math.abs(p1) + Math.abs(p2) + Math.abs(p3))) return none('equal Abbe numbers');
  let factor = powerPerMm / linear;
  for (let share = 1; share <= SHARES; share++) {
    const [t1, t2] = [(tau1 * share) / SHARES, (tau2 * share) / SHARES];
    const square = -t1 * p1 * (p2 + p3) - t2 * (p1 + p2) * p3;
    const root = newton([linear, square, t1 * t2 * p1 * p2 * p3], powerPerMm, factor);
    if (!root.ok) return root;
    factor = root.value;
  }
  return some(factor);
}

/** The root of a·x + b·x² + c·x³ = `value` near `start`, on the branch where the sum still grows with x as a does. */
function newton(
  [a, b, c]: readonly [number, number, number],
  value: number,
  start: number,
): Outcome<number, Unsolvable> {
  let x = start;
  for (let i = 0; i < MOST_STEPS; i++) {
    const slope = a + x * (2 * b + 3 * c * x);
    const next = x - (x * (a + x * (b + c * x)) - value) / slope;
    if (!(slope / a > 0) || !Number.isFinite(next)) return none('no such radii');
    if (Math.abs(next - x) <= 4 * Number.EPSILON * Math.abs(x)) return some(next);
    x = next;
  }
  return none('no such radii');
}
