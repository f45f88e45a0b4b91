import { type DispersionFormula, FORMULA_KINDS, indexFrom } from '../../engine/media/dispersion.ts';
import { spectralLines } from '../../engine/media/lines.ts';
import { materialOf } from '../../engine/media/materials.ts';
import { derive2, finite, type Quantity } from '../../engine/paraxial/absence.ts';
import { isRecord, numberIn } from './json.ts';
import type { Measured, Reader } from './measure.ts';

/** An index is rounded to a few times 1e-16; differences of two indices carry that, and so do quotients of differences. */
const INDEX_ROUNDING = 1e-15;

/**
 * The quantities of a case of kind `dispersion`, from its `input`: `n_d`, `n(1060)` in nm, differences `n_F-n_C`, `V_d`, `V_e` and partial
 * dispersions `P_g,F`. Without a formula, the wavelengths of the spectral lines by their letters. Null when the formula
 * cannot be read.
 */
export function readDispersion(input: Record<string, unknown>): Reader | null {
  const lineNm = linesOf(input);
  if (Object.keys(input).every((key) => key === 'lines')) {
    return (quantity) => {
      const nm = lineNm(quantity);
      return nm === null ? null : { value: finite(nm), floor: 0 };
    };
  }
  const formula = formulaOf(input);
  if (formula === null) return null;
  const indexAt = (nm: number | null): Quantity | null =>
    nm === null ? null : finite(indexFrom(formula, nm) ?? Number.NaN);
  return (quantity) => read(quantity, (letter) => indexAt(lineNm(letter)), indexAt);
}

type IndexOfLine = (letter: string) => Quantity | null;

function read(
  quantity: string,
  lineIndex: IndexOfLine,
  indexAt: (nm: number) => Quantity | null,
): Measured | null {
  const plain = /^n_(\w'?)$/.exec(quantity);
  if (plain) return measured(lineIndex(plain[1] ?? ''), INDEX_ROUNDING);
  const at = /^n\(([\d.]+)\)$/.exec(quantity);
  if (at) return measured(indexAt(Number(at[1])), INDEX_ROUNDING);
  const difference = /^n_(\w'?)-n_(\w'?)$/.exec(quantity);
  if (difference) return measured(spread(lineIndex, difference), INDEX_ROUNDING);
  const abbe = /^V_([de])$/.exec(quantity);
  if (abbe) {
    const [, letter = ''] = abbe;
    const all = spread(lineIndex, letter === 'd' ? FOR_D : FOR_E);
    const main = lineIndex(letter);
    const value = main && all && derive2(main, all, (n, by) => (n - 1) / by);
    return measured(value, roundingOver(all, value));
  }
  const partial = /^P_(\w'?),(\w'?)$/.exec(quantity);
  if (!partial) return null;
  const [all, some] = [spread(lineIndex, FOR_D), spread(lineIndex, partial)];
  const value = some && all && derive2(some, all, (part, by) => part / by);
  return measured(value, roundingOver(all, { ok: true, value: 1 }));
}

/** Short and long line of the Abbe number, in the places of a match. */
const FOR_D = ['', 'F', 'C'];
const FOR_E = ['', "F'", "C'"];

function spread(lineIndex: IndexOfLine, [, short = '', long = '']: readonly string[]): Quantity | null {
  const [one, other] = [lineIndex(short), lineIndex(long)];
  return one && other && derive2(one, other, (a, b) => a - b);
}

/** What the rounding of indices comes to in a quotient `value` by the difference `by`. */
const roundingOver = (by: Quantity | null, value: Quantity | null): number =>
  by?.ok && value?.ok ? INDEX_ROUNDING * Math.abs(value.value / by.value) : 0;

const measured = (value: Quantity | null, floor: number): Measured | null => value && { value, floor };

/** Wavelengths by letter: those that the case gives, else those of the tool. */
function linesOf({ lines }: Record<string, unknown>): (letter: string) => number | null {
  if (isRecord(lines)) return (letter) => numberIn(lines, letter);
  return (letter) => spectralLines.find(({ id }) => id === letter)?.nm ?? null;
}

const SQUARED = 'n^2 - 1 = sum B_i L^2/(L^2 - C_i), L in micrometres';
const LENGTHS = 'n^2 - 1 = sum B_i L^2/(L^2 - C_i^2), L in micrometres';

/** A sum of terms with B and C, kind and coefficients, or a material of the catalogue. */
function formulaOf(input: Record<string, unknown>): DispersionFormula | null {
  const { formula, B, C, material } = input;
  if (typeof material === 'string') return materialOf(material)?.formula ?? null;
  if (isRecord(formula)) return namedFormula(formula);
  if (formula !== SQUARED && formula !== LENGTHS) return null;
  const [factors, poles] = [numbers(B), numbers(C)];
  if (factors === null || poles === null || factors.length !== poles.length) return null;
  return {
    kind: formula === SQUARED ? 'sellmeier-squared' : 'sellmeier',
    coefficients: [0, ...factors.flatMap((factor, k) => [factor, poles[k] ?? 0])],
  };
}

function namedFormula({ kind, coefficients }: Record<string, unknown>): DispersionFormula | null {
  const known = FORMULA_KINDS.find((name) => name === kind);
  const list = numbers(coefficients);
  return known && list ? { kind: known, coefficients: list } : null;
}

const numbers = (list: unknown): readonly number[] | null =>
  Array.isArray(list) && list.every((entry) => typeof entry === 'number') ? list : null;
