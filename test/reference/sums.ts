import { type Seidel, seidel } from '../../engine/aberration/seidel.ts';
import type { SumName } from '../../engine/aberration/sums.ts';
import { finite } from '../../engine/paraxial/absence.ts';
import type { ReferenceRays } from '../../engine/paraxial/rays.ts';
import { signedRays } from './light.ts';
import type { Measured } from './measure.ts';
import type { Laid } from './prescription.ts';

/** What the case files call each sum. */
export const SUM_CODES: Readonly<Record<string, SumName>> = {
  S1: 'spherical',
  S2: 'coma',
  S3: 'astigmatism',
  S4: 'petzval',
  S5: 'distortion',
  C1: 'axialColour',
  C2: 'lateralColour',
};

/** Rounding of a sum of products, of the size of what was added. */
const SUM_FLOOR = 1e-14;

/** The quantities `sumS1` … `sumC2` of a prescription. */
export function sumRows(
  laid: Laid,
  prescription: Record<string, unknown>,
): readonly [string, () => Measured][] {
  const rays = signedRays(laid, prescription);
  if (rays === null || laid.train.thinPower.some((power) => power !== 0)) return [];
  const sums = seidel(laid.train, rays);
  if (!sums.ok) return [];
  const { totals } = sums.value;
  return Object.entries(SUM_CODES).map(([code, name]) => [
    `sum${code}`,
    () => ({ value: finite(totals[name]), floor: SUM_FLOOR * addedIn(laid, rays, sums.value, name) }),
  ]);
}

/**
 * The sum of absolute terms, before and behind, sphere and asphere each counted as a term of its own: a single surface whose parts cancel
 * has no other measure.
 */
function addedIn({ train }: Laid, { marginal, chief }: ReferenceRays, sums: Seidel, name: SumName): number {
  if (!marginal.ok || !chief.ok) return 0;
  let added = sums.absolute[name];
  for (let k = 0; k < train.count; k++) {
    const [y, yChief] = [Math.abs(marginal.value.y[k]!), Math.abs(chief.value.y[k]!)];
    const [n, c] = [Math.abs(train.index[k]!), Math.abs(train.curvature[k]!)];
    const nAfter = Math.abs(train.index[k + 1]!);
    const [nu, nuAfter] = [Math.abs(marginal.value.nu[k]!), Math.abs(marginal.value.nu[k + 1]!)];
    const [A, AChief] = [nu + n * c * y, Math.abs(chief.value.nu[k]!) + n * c * yChief];
    const slopes = nuAfter / nAfter ** 2 + nu / n ** 2;
    const aspheric = Math.abs(train.conic[k]!) * c ** 3 * (n + nAfter);
    const inverse = 1 / n + 1 / nAfter;
    const terms: Partial<Record<SumName, number>> = {
      spherical: y * (A * A * slopes + aspheric * y ** 3),
      coma: y * (A * AChief * slopes + aspheric * y ** 2 * yChief),
      astigmatism: y * (AChief * AChief * slopes + aspheric * y * yChief ** 2),
      distortion:
        AChief * inverse * (yChief * c * (2 * AChief * y + A * yChief) + AChief ** 2 * y * inverse) +
        aspheric * y * yChief ** 3,
    };
    added += terms[name] ?? 0;
  }
  return added;
}
