import { none, some } from '../outcome.ts';
import { isNegligible } from '../paraxial/scale.ts';
import { sagAt } from '../train/profile.ts';
import { type Solved, solvedIf } from './absence.ts';
import type { Bending } from './bending.ts';
import { trainOfStack } from './stack.ts';
import { type ThinEquivalent, thinEquivalent } from './thinEquivalent.ts';

/** The thickness on the axis, or at the rim: then the one on the axis is solved for. */
export type Thickness =
  | { readonly kind: 'centre'; readonly thicknessMm: number }
  | { readonly kind: 'edge'; readonly thicknessMm: number; readonly semiDiameterMm: number };

export interface LensWish {
  /** 1/power, kept exactly whatever surrounds the lens. */
  readonly focalLengthMm: number;
  readonly index: number;
  readonly bending: Bending;
  readonly thickness: Thickness;
  /** Equal radii give the same power curved either way: 1 (the default) puts the centres to the right, −1 to the left. */
  readonly curved?: 1 | -1;
  /** Index in front and behind; 1 unless given. */
  readonly indexInFront?: number;
  readonly indexBehind?: number;
}

/** A lens of one glass that was solved for. */
export interface ThickLens extends ThinEquivalent {
  /** Front and rear, 1/mm, positive when the centre lies to the right. */
  readonly curvaturesPerMm: readonly [number, number];
  readonly thicknessMm: number;
}

/**
 * The lens of the wished focal length at its full thickness. With c1 = k·front and c2 = k·rear its power is P k + Q k²,
 * P = (n − n0)·front + (n1 − n)·rear and Q = −(n − n0)(n1 − n)·front·rear·t/n; the root that stays as t → 0 is taken in the form
 * without subtraction, 2φ/(P ± √(P² + 4Qφ)). Equal radii in air have P = 0 and two roots of one size.
 */
export function thickLens(wish: LensWish): Solved<ThickLens> {
  const { thickness } = wish;
  if (!(Math.abs(wish.focalLengthMm) > 0)) return none('out of range');
  if (thickness.kind === 'centre') return lensAt(wish, thickness.thicknessMm);
  const centreMm = centreFor(wish, thickness.thicknessMm, thickness.semiDiameterMm);
  return centreMm.ok ? lensAt(wish, centreMm.value) : centreMm;
}

function lensAt(wish: LensWish, thicknessMm: number): Solved<ThickLens> {
  const curvatures = curvaturesAt(wish, thicknessMm);
  if (!curvatures.ok) return curvatures;
  const { index, indexInFront = 1, indexBehind = 1 } = wish;
  const equivalent = thinEquivalent(
    trainOfStack({
      curvaturesPerMm: curvatures.value,
      indices: [indexInFront, index, indexBehind],
      thicknessesMm: [thicknessMm],
    }),
  );
  // A power that is all rounding is none.
  if (!equivalent.ok) return none(equivalent.why === 'afocal' ? 'no such radii' : 'out of range');
  return some({ ...equivalent.value, curvaturesPerMm: curvatures.value, thicknessMm });
}

function curvaturesAt(wish: LensWish, thicknessMm: number): Solved<readonly [number, number]> {
  const { index, bending, curved = 1, indexInFront = 1, indexBehind = 1 } = wish;
  const { front, rear } = bending;
  const power = 1 / wish.focalLengthMm;
  if (front === 0 && rear === 0) return none('no bending');
  const [atFront, atRear] = [(index - indexInFront) * front, (indexBehind - index) * rear];
  if (atFront === 0 && atRear === 0) return none('index of its surroundings');
  const linear = atFront + atRear;
  const square = (-atFront * atRear * thicknessMm) / index;
  const balanced = isNegligible(linear, Math.abs(atFront) + Math.abs(atRear));
  if (balanced && square === 0) return none('equal radii without thickness');
  const radicand = (balanced ? 0 : linear * linear) + 4 * square * power;
  if (!(radicand >= 0)) return none(Number.isNaN(radicand) ? 'out of range' : 'no such radii');
  const root = Math.sqrt(radicand);
  const factor = balanced
    ? (curved * root) / (2 * Math.abs(square))
    : (2 * power) / (linear + Math.sign(linear) * root);
  const curvatures = [factor * front + 0, factor * rear + 0] as const;
  return solvedIf(curvatures, curvatures);
}

/** Steps of the secant; three or four are usual, as curvature hardly feels thickness. */
const MOST_STEPS = 60;
/** Share of the lengths added below which an edge counts as met. */
const MET = 4e-16;

/** The centre thickness at which the edge is `edgeMm` thick: centre − sag of the front + sag of the rear. */
function centreFor(wish: LensWish, edgeMm: number, semiDiameterMm: number): Solved<number> {
  /** What is missing from the edge, and the scale that its rounding is judged by. */
  const missing = (centreMm: number): Solved<readonly [number, number]> => {
    const curvatures = curvaturesAt(wish, centreMm);
    if (!curvatures.ok) return curvatures;
    const [front, rear] = curvatures.value.map((curvaturePerMm) =>
      sagAt({ curvaturePerMm, conic: 0, asphere: [] }, semiDiameterMm),
    );
    if (front == null || rear == null) return none('rim beyond a surface');
    return some([
      edgeMm - (centreMm - front + rear),
      Math.abs(edgeMm) + Math.abs(centreMm) + Math.abs(front) + Math.abs(rear),
    ]);
  };
  let centreMm = edgeMm;
  let step = 0;
  let before = 0;
  for (let i = 0; i < MOST_STEPS; i++) {
    const rest = missing(centreMm);
    if (!rest.ok) return rest;
    const [lacking, scale] = rest.value;
    if (Math.abs(lacking) <= MET * scale) break;
    // The edge follows the centre nearly one to one: the first step goes by that, later ones by the secant.
    const rate = i === 0 ? -1 : (lacking - before) / step;
    step = rate === 0 ? 0 : -lacking / rate;
    if (centreMm + step === centreMm) break;
    if (!Number.isFinite(step) || i === MOST_STEPS - 1) return none('no such edge');
    before = lacking;
    centreMm += step;
  }
  return centreMm > 0 ? some(centreMm) : none('no such edge');
}
