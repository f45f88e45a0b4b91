import { parseCode } from './code.ts';
import { type DispersionFormula, FORMULA_KINDS, indexFrom } from './dispersion.ts';
import { materialOf, materials } from './materials.ts';

/** What a formula of the user's own may be: the wavelengths and indices that a sketch knows. */
const NM = { low: 100, high: 20_000 } as const;
const INDEX = { low: 1, high: 5 } as const;
const MOST_COEFFICIENTS = 30;
/** Places over the range at which the index is asked for; poles are found apart. */
const SAMPLES = 32;

/** What is wrong with a material's id, in one sentence; null when the catalogue has it. */
export const materialFault = (id: string): string | null =>
  materialOf(id) === null
    ? `The material is ${quoted(id)}; it must be one of the ${materials.length} in the catalogue.`
    : null;

/** What is wrong with a six-digit glass code, in one sentence; null when it is sound. */
export const codeFault = (code: string): string | null =>
  parseCode(code) === null
    ? `The glass code is ${quoted(code)}; it must be six digits as in 517642: three decimals of nd, then ten times Vd, which is not 0.`
    : null;

/** What is wrong with a formula and the range in which it shall hold, in one sentence; null when it gives an index all over the range. */
export function formulaFaults(formula: DispersionFormula, rangeNm: readonly [number, number]): string | null {
  return shapeFault(formula) ?? rangeFault(rangeNm) ?? indexFault(formula, rangeNm);
}

function shapeFault({ kind, coefficients }: DispersionFormula): string | null {
  if (!FORMULA_KINDS.includes(kind))
    return `The formula is ${quoted(kind)}; it must be one of ${FORMULA_KINDS.join(', ')}.`;
  if (coefficients.length === 0 || coefficients.length > MOST_COEFFICIENTS)
    return `The formula has ${coefficients.length} coefficients; it must have between 1 and ${MOST_COEFFICIENTS}.`;
  const bad = coefficients.findIndex((coefficient) => !Number.isFinite(coefficient));
  if (bad >= 0)
    return `Coefficient ${bad + 1} of the formula is ${shown(coefficients[bad])}; it must be a finite number.`;
  return null;
}

function rangeFault([low, high]: readonly [number, number]): string | null {
  if (!(low >= NM.low && low <= NM.high)) return endFault('begins', low);
  if (!(high >= NM.low && high <= NM.high)) return endFault('ends', high);
  if (low < high) return null;
  return `The formula’s range ends at ${shown(high)} nm; it must end above its beginning, ${shown(low)} nm.`;
}

const endFault = (verb: 'begins' | 'ends', nm: number): string =>
  `The formula’s range ${verb} at ${shown(nm)} nm; it must be between ${shown(NM.low)} and ${shown(NM.high)} nm.`;

function indexFault(formula: DispersionFormula, [low, high]: readonly [number, number]): string | null {
  const pole = polesNm(formula).find((nm) => nm >= low && nm <= high);
  if (pole !== undefined)
    return `The formula has a pole at ${shown(pole)} nm; its range, ${shown(low)} to ${shown(high)} nm, must not hold one.`;
  for (let k = 0; k <= SAMPLES; k++) {
    const nm = k === SAMPLES ? high : low + ((high - low) * k) / SAMPLES;
    const index = indexFrom(formula, nm);
    if (index === null || index < INDEX.low || index > INDEX.high)
      return `The formula’s index at ${shown(nm)} nm is ${index === null ? 'no number' : shown(index)}; it must be between ${INDEX.low} and ${INDEX.high} over the range.`;
  }
  return null;
}

/** The wavelengths at which a term of the formula has no value, in nm. */
function polesNm({ kind, coefficients: c }: DispersionFormula): readonly number[] {
  const at = (k: number): number => c[k] ?? 0;
  const squares: number[] = [];
  const add = (factor: number, square: number): void => {
    if (factor !== 0 && square > 0) squares.push(square);
  };
  if (kind === 'combined') for (const k of [1, 5]) add(at(k), at(k + 2) ** at(k + 3));
  if (kind === 'sellmeier') for (let k = 1; k < c.length; k += 2) add(at(k), at(k + 1) ** 2);
  if (kind === 'sellmeier-squared') for (let k = 1; k < c.length; k += 2) add(at(k), at(k + 1));
  if (kind === 'gases') for (let k = 1; k < c.length; k += 2) add(at(k), 1 / at(k + 1));
  return squares.map((square) => 1000 * Math.sqrt(square));
}

const LONGEST_QUOTE = 40;

const quoted = (text: string): string =>
  `“${text.length > LONGEST_QUOTE ? `${text.slice(0, LONGEST_QUOTE - 1)}…` : text}”`;

function shown(value: number | undefined): string {
  if (value === undefined || Number.isNaN(value)) return 'not a number';
  if (!Number.isFinite(value)) return value > 0 ? 'infinite' : 'minus infinity';
  return value.toLocaleString('en', { maximumSignificantDigits: 6 }).replace('-', '−');
}
