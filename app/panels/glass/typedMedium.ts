import type { DispersionFormula, Outcome, SolidMedium } from '../../../engine/index.ts';
import { codeFault, formulaFaults, none, some } from '../../../engine/index.ts';
import { parseEntry } from '../../ui/entry.ts';

/** A medium from what was typed, or one sentence on what is wrong with it. */
export type TypedMedium = Outcome<SolidMedium, string>;

/** The glass of a six-digit code; signs and blanks between the digits do not count. */
export function mediumOfCode(text: string): TypedMedium {
  const code = text.replaceAll(/[\s./:-]/g, '');
  const fault = codeFault(code);
  return fault === null ? some({ code }) : none(fault);
}

export interface TypedIndex {
  readonly name: string;
  readonly index: string;
  readonly abbeNumber: string;
}

/** A fixed index; its Abbe number may be left out. Ranges are judged by the rules of the sketch. */
export function mediumOfIndex({ name, index, abbeNumber }: TypedIndex): TypedMedium {
  const read = numberIn(index);
  if (!read.ok) return read;
  if (abbeNumber.trim() === '') return some({ name: name.trim(), index: read.value, abbeNumber: null });
  const abbe = numberIn(abbeNumber);
  return abbe.ok ? some({ name: name.trim(), index: read.value, abbeNumber: abbe.value }) : abbe;
}

export interface TypedFormula {
  readonly name: string;
  readonly kind: DispersionFormula['kind'];
  readonly coefficients: string;
  readonly fromNm: string;
  readonly toNm: string;
}

/** A formula of the user's own with the range in which it holds. */
export function mediumOfFormula({ name, kind, coefficients, fromNm, toNm }: TypedFormula): TypedMedium {
  const [numbers, from, to] = [coefficientsIn(coefficients), numberIn(fromNm), numberIn(toNm)];
  if (!numbers.ok) return numbers;
  if (!from.ok) return from;
  if (!to.ok) return to;
  const formula = { kind, coefficients: numbers.value };
  const rangeNm = [from.value, to.value] as const;
  const fault = formulaFaults(formula, rangeNm);
  return fault === null ? some({ name: name.trim(), formula, rangeNm }) : none(fault);
}

const numberIn = (text: string): Outcome<number, string> =>
  parseEntry(text, { unit: '', current: null, allowInfinity: false });

/**
 * Coefficients in their order, parted by blanks, lines, semicolons or commas; a comma is a decimal comma where there are no decimal
 * points. Names in front of them, as in `B1 = 1.04`, are left out.
 */
function coefficientsIn(text: string): Outcome<readonly number[], string> {
  const points = text.includes('.');
  const plain = text
    .replaceAll(/[\u2212\u2013]/g, '-')
    .replaceAll(/(^|[\s;,])[A-Za-z]\w?\s*[=:]/g, '$1 ')
    .replaceAll(points ? /[;,]/g : /[;]|,(?!\d)/g, ' ')
    .replaceAll(',', '.');
  const tokens = plain.split(/\s+/).filter(Boolean);
  if (tokens.length === 0) return none('Type the coefficients in their order, parted by blanks.');
  const odd = tokens.find((token) => !Number.isFinite(Number(token)));
  return odd === undefined
    ? some(tokens.map(Number))
    : none(`“${odd}” is not a coefficient; it must be a number.`);
}
