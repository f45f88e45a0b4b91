/** The dispersion formulas that catalogues print. */
export const FORMULA_KINDS = [
  'sellmeier',
  'sellmeier-squared',
  'polynomial',
  'combined',
  'cauchy',
  'gases',
] as const;

export type FormulaKind = (typeof FORMULA_KINDS)[number];

/** A dispersion formula with its coefficients C1, C2, … in the order in which they are printed; a missing one is 0. */
export interface DispersionFormula {
  readonly kind: FormulaKind;
  readonly coefficients: readonly number[];
}

/**
 * The index that `formula` gives at a wavelength; null where it gives none, because n² is not positive or a term has a pole there.
 * What the index is relative to is the coefficients' matter. With L the wavelength in µm:
 *
 *     sellmeier          n² = 1 + C1 + C2 L²/(L² − C3²) + C4 L²/(L² − C5²) + …
 *     sellmeier-squared  n² = 1 + C1 + C2 L²/(L² − C3) + C4 L²/(L² − C5) + …
 *     polynomial         n² = C1 + C2 L^C3 + C4 L^C5 + …
 *     combined           n² = C1 + C2 L^C3/(L² − C4^C5) + C6 L^C7/(L² − C8^C9) + C10 L^C11 + C12 L^C13 + …
 *     cauchy             n  = C1 + C2 L^C3 + C4 L^C5 + …
 *     gases              n  = 1 + C1 + C2/(C3 − L⁻²) + C4/(C5 − L⁻²) + …
 *
 * Source: the formulas of the refractiveindex.info database, in the order of its numbers 1 to 6.
 */
export function indexFrom(formula: DispersionFormula, wavelengthNm: number): number | null {
  const { kind, coefficients } = formula;
  const um = wavelengthNm / 1000;
  const sum = SUMS[kind](coefficients, um, um * um);
  const index = kind === 'cauchy' || kind === 'gases' ? sum : Math.sqrt(sum);
  return index > 0 && Number.isFinite(index) ? index : null;
}

type Sum = (coefficients: readonly number[], um: number, um2: number) => number;

/** What each formula makes n² or n of. A term whose factor is 0 is left out, so that it has no pole. */
const SUMS: Readonly<Record<FormulaKind, Sum>> = {
  sellmeier: (c, _, um2) => {
    let sum = 1 + (c[0] ?? 0);
    for (let k = 1; k < c.length; k += 2) {
      const factor = c[k] ?? 0;
      if (factor !== 0) sum += (factor * um2) / (um2 - (c[k + 1] ?? 0) ** 2);
    }
    return sum;
  },
  'sellmeier-squared': (c, _, um2) => {
    let sum = 1 + (c[0] ?? 0);
    for (let k = 1; k < c.length; k += 2) {
      const factor = c[k] ?? 0;
      if (factor !== 0) sum += (factor * um2) / (um2 - (c[k + 1] ?? 0));
    }
    return sum;
  },
  polynomial: (c, um) => powers(c, 1, um, c[0] ?? 0),
  combined: (c, um, um2) => {
    let sum = c[0] ?? 0;
    for (let k = 1; k < COMBINED_POWERS; k += 4) {
      const factor = c[k] ?? 0;
      if (factor !== 0) sum += (factor * um ** (c[k + 1] ?? 0)) / (um2 - (c[k + 2] ?? 0) ** (c[k + 3] ?? 0));
    }
    return powers(c, COMBINED_POWERS, um, sum);
  },
  cauchy: (c, um) => powers(c, 1, um, c[0] ?? 0),
  gases: (c, _, um2) => {
    let sum = 1 + (c[0] ?? 0);
    for (let k = 1; k < c.length; k += 2) {
      const factor = c[k] ?? 0;
      if (factor !== 0) sum += factor / ((c[k + 1] ?? 0) - 1 / um2);
    }
    return sum;
  },
};

/** Where the plain powers of a combined formula begin, behind its two terms with poles. */
const COMBINED_POWERS = 9;

/** `sum` and, from place `from` on, each factor times the wavelength to the exponent behind it. */
function powers(c: readonly number[], from: number, um: number, sum: number): number {
  let total = sum;
  for (let k = from; k < c.length; k += 2) {
    const factor = c[k] ?? 0;
    if (factor !== 0) total += factor * um ** (c[k + 1] ?? 0);
  }
  return total;
}
