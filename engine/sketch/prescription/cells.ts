import { materialNamed } from '../../media/chooser.ts';
import { parseCode } from '../../media/code.ts';
import { materials } from '../../media/materials.ts';
import { none, type Outcome, some } from '../../outcome.ts';
import { LIMITS } from '../limits.ts';
import type { Medium } from '../types.ts';
import { numberText, quoted } from '../words.ts';

/** The value of a cell, or one sentence on why it has none. */
export type CellRead<T> = Outcome<T, string>;

const NUMBER = /^[-+]?(\d+([.,]\d*)?|[.,]\d+)(e[-+]?\d+)?$/i;
/** Dashes and blanks as they are printed. */
const plain = (text: string): string =>
  text
    .replaceAll(/[\u2212\u2013\u2010\u2011]/g, '-')
    .replaceAll(/[\u00a0\u2009\u202f]/g, '')
    .replace(/\s*mm$/i, '')
    .trim();

/** The number in a cell, with a decimal point or comma, a printed minus sign, mm behind it; null when it is none. */
export function numberIn(text: string): number | null {
  const typed = plain(text);
  if (!NUMBER.test(typed)) return null;
  // The file could not give −0 back.
  const value = Number(typed.replace(',', '.')) + 0;
  return Number.isFinite(value) ? value : null;
}

const FLAT =
  /^[-+]?(∞|inf|infinity|infinite|unendlich|1e\+?(1[2-9]|[2-9]\d))$|^(flat|plano?|plane|planar|pl)\.?$/i;

/** Whether the cell says that a surface is flat, or that a distance is infinite. */
export const isFlat = (text: string): boolean => FLAT.test(plain(text));

/** A radius in mm; null is flat. Zero is how some tables write a plane. */
export function radiusIn(text: string): CellRead<number | null> {
  if (isFlat(text)) return some(null);
  const value = numberIn(text);
  if (value === null)
    return none(`${quoted(text)} is no radius; it must be a number, or ∞ or flat for a plane`);
  return some(value === 0 ? null : value);
}

/** A length, a conic constant or an Abbe number; `what` names it in the sentence. */
export function valueIn(text: string, what: string): CellRead<number> {
  const value = numberIn(text);
  return value === null ? none(`${quoted(text)} is no ${what}; it must be a number`) : some(value);
}

const AIR = /^(air|luft|-|--|1([.,]0*)?)?$/i;
const MIRROR = /^(mirror|refl.*|spiegel)$/i;
/** Perhaps with a sign between the threes. */
const CODE = /^\d{3}[-./: ]?\d{3}$/;
/** Measured air stands in some tables; no glass has so little. */
const AIR_BELOW = 1.001;

/**
 * What lies behind a surface: air for an empty cell or 1; six digits a glass code, with or without a sign between the threes; a
 * name one of the catalogue; any other number an index, whose Abbe number stands elsewhere.
 */
export function mediumIn(text: string): CellRead<Medium> {
  const typed = plain(text);
  if (AIR.test(typed)) return some('air');
  if (MIRROR.test(typed)) return none(`${quoted(text)}: mirrors are not among the parts`);
  const code = CODE.test(typed) ? typed.replaceAll(/\D/g, '') : '';
  if (parseCode(code) !== null) return some({ code });
  const index = numberIn(typed);
  if (index !== null) return indexMedium(index, text);
  const known = materialNamed(materials, typed) ?? materialNamed(materials, `N-${typed}`);
  if (known === null)
    return none(
      `${quoted(text)} is no glass of the catalogue; give its six-digit code, or its index with an Abbe number`,
    );
  return some({ material: known.id });
}

function indexMedium(index: number, text: string): CellRead<Medium> {
  const { low, high } = LIMITS.index;
  if (index >= low && index < AIR_BELOW) return some('air');
  if (index < low || index > high)
    return none(`${quoted(text)} is no index; it must be between ${numberText(low)} and ${numberText(high)}`);
  return some({ name: '', index, abbeNumber: null });
}
