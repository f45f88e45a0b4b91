import { none, type Outcome, some } from '../outcome.ts';
import { AIR_RANGE_NM, airIndex } from './air.ts';
import { CODE_RANGE_NM, codeIndex, parseCode } from './code.ts';
import { type DispersionFormula, indexFrom } from './dispersion.ts';
import { lineNm } from './lines.ts';
import { materialOf } from './materials.ts';

/** `'air'` is the surrounding air, see `Air`. */
export type Medium = 'air' | SolidMedium;

/** A medium of its own: by its place in the catalogue, its six-digit code, a formula of the user's own, or a fixed index. */
export type SolidMedium = FixedMedium | CatalogueMedium | CodeMedium | OwnMedium;

export interface FixedMedium {
  readonly name: string;
  /** Index in the main line, relative to air. */
  readonly index: number;
  /** (n − 1) / (n short − n long); null when unknown: no colour is computed for it. */
  readonly abbeNumber: number | null;
}

export interface CatalogueMedium {
  /** Id in `materials`. */
  readonly material: string;
}

export interface CodeMedium {
  /** Six digits, `517642`. */
  readonly code: string;
}

export interface OwnMedium {
  readonly name: string;
  /** Gives the index relative to air. */
  readonly formula: DispersionFormula;
  /** Where the formula holds. */
  readonly rangeNm: readonly [number, number];
}

/** What surrounds everything: air of index 1, or dry air at 15 °C and 101 325 Pa by its published formula. */
export type Air = 'unity' | 'standard';

/** Why a medium has no index at a wavelength. */
export type NoIndex = 'outside its range' | 'unknown material' | 'no index';

/** The wavelengths that a fixed index and its Abbe number belong to. */
export interface MainLines {
  readonly mainNm: number;
  readonly shortNm: number;
  readonly longNm: number;
}

/**
 * Index of the medium at a wavelength. With air of unity, what is relative to air is taken as it stands, and what is relative to vacuum
 * is divided by the index of standard air. With standard air all are relative to vacuum: air has its own index, and what is relative to
 * air is multiplied by it, so that it counts once: at the surface to air nothing changes. Every index relative to air is taken as relative
 * to the same standard air.
 *
 * A fixed index follows a two-term Cauchy law through its Abbe number V: n(λ) = n + (n − 1)/V · s(λ), with s from `cauchyShare`.
 */
export function indexOf(
  medium: Medium,
  wavelengthNm: number,
  lines: MainLines,
  air: Air,
): Outcome<number, NoIndex> {
  if (medium === 'air') return air === 'unity' ? AIR_OF_UNITY : published(airIndex(wavelengthNm));
  if ('index' in medium) return relative(fixedIndex(medium, wavelengthNm, lines), wavelengthNm, air);
  if ('material' in medium) {
    const material = materialOf(medium.material);
    if (material === null) return UNKNOWN;
    if (!within(material.rangeNm, wavelengthNm)) return OUTSIDE;
    const index = indexFrom(material.formula, wavelengthNm);
    return material.relativeTo === 'air'
      ? relative(index, wavelengthNm, air)
      : absolute(index, wavelengthNm, air);
  }
  if ('code' in medium) {
    const figures = parseCode(medium.code);
    if (figures === null) return UNKNOWN;
    if (!within(CODE_RANGE_NM, wavelengthNm)) return OUTSIDE;
    return relative(codeIndex(figures, wavelengthNm), wavelengthNm, air);
  }
  if (!within(medium.rangeNm, wavelengthNm)) return OUTSIDE;
  return relative(indexFrom(medium.formula, wavelengthNm), wavelengthNm, air);
}

/**
 * How far a wavelength lies from the main line, as a share of the spread short − long in a two-term Cauchy law n = a + b/λ²:
 * (λ⁻² − λm⁻²)/(λs⁻² − λl⁻²). 0 for the main line; short minus long is 1.
 */
export function cauchyShare(wavelengthNm: number, { mainNm, shortNm, longNm }: MainLines): number {
  if (wavelengthNm === mainNm) return 0;
  return (wavelengthNm ** -2 - mainNm ** -2) / (shortNm ** -2 - longNm ** -2);
}

/** Where the medium has an index, in nm, both ends included; null when it has one everywhere, or when it is unknown. */
export function rangeOf(medium: Medium, air: Air = 'unity'): readonly [number, number] | null {
  const own = ownRange(medium);
  const bySourceOrChoice =
    air === 'standard' ||
    (medium !== 'air' && 'material' in medium && materialOf(medium.material)?.relativeTo === 'vacuum');
  if (!bySourceOrChoice) return own;
  if (own === null) return AIR_RANGE_NM;
  return [Math.max(own[0], AIR_RANGE_NM[0]), Math.min(own[1], AIR_RANGE_NM[1])];
}

function ownRange(medium: Medium): readonly [number, number] | null {
  if (medium === 'air' || 'index' in medium) return null;
  if ('material' in medium) return materialOf(medium.material)?.rangeNm ?? null;
  return 'code' in medium ? CODE_RANGE_NM : medium.rangeNm;
}

const AIR_OF_UNITY: Outcome<number, NoIndex> = some(1);
const OUTSIDE: Outcome<number, NoIndex> = none('outside its range');
const UNKNOWN: Outcome<number, NoIndex> = none('unknown material');
const NO_INDEX: Outcome<number, NoIndex> = none('no index');

const within = ([low, high]: readonly [number, number], wavelengthNm: number): boolean =>
  wavelengthNm >= low && wavelengthNm <= high;

const fixedIndex = ({ index, abbeNumber }: FixedMedium, wavelengthNm: number, lines: MainLines): number =>
  index + (abbeNumber === null ? 0 : ((index - 1) / abbeNumber) * cauchyShare(wavelengthNm, lines));

const published = (index: number | null): Outcome<number, NoIndex> =>
  index === null ? OUTSIDE : some(index);

/** The outcome of an index relative to air. */
function relative(index: number | null, wavelengthNm: number, air: Air): Outcome<number, NoIndex> {
  if (index === null || !(index > 0 && Number.isFinite(index))) return NO_INDEX;
  if (air === 'unity') return some(index);
  const around = airIndex(wavelengthNm);
  return around === null ? OUTSIDE : some(index * around);
}

/** The outcome of an index relative to vacuum. */
function absolute(index: number | null, wavelengthNm: number, air: Air): Outcome<number, NoIndex> {
  if (index === null) return NO_INDEX;
  const around = airIndex(wavelengthNm);
  if (around === null) return OUTSIDE;
  return some(air === 'standard' ? index : index / around);
}

/** What the medium is called; one without a name is called by its index. */
export function mediumName(medium: Medium): string {
  if (medium === 'air') return 'air';
  if ('material' in medium) return materialOf(medium.material)?.name ?? medium.material;
  if ('code' in medium) return medium.code;
  const name = medium.name.trim();
  if (name !== '') return name;
  return 'index' in medium ? `index ${medium.index}` : 'a material of your own';
}

/** Index in the d line and Abbe number (nd − 1)/(nF − nC), relative to air; null where the medium does not tell. */
export interface Nominal {
  readonly nd: number | null;
  readonly vd: number | null;
}

/** Where the medium stands on a map of index against Abbe number. A fixed index stands by what is given, in whatever lines that is. */
export function nominal(medium: Medium): Nominal {
  if (medium === 'air') return { nd: 1, vd: null };
  if ('index' in medium) return { nd: medium.index, vd: medium.abbeNumber };
  if ('code' in medium) return parseCode(medium.code) ?? { nd: null, vd: null };
  const [nd, nF, nC] = [indexIn(medium, 'd'), indexIn(medium, 'F'), indexIn(medium, 'C')];
  const known = nd !== null && nF !== null && nC !== null && nF !== nC;
  return { nd, vd: known ? (nd - 1) / (nF - nC) : null };
}

/** Whether two media are the same, entry by entry; the catalogue's glass and a code for it are not. */
export function mediaEqual(one: Medium, other: Medium): boolean {
  if (one === other) return true;
  if (one === 'air' || other === 'air') return false;
  if ('material' in one) return 'material' in other && one.material === other.material;
  if ('code' in one) return 'code' in other && one.code === other.code;
  if ('index' in one)
    return (
      'index' in other &&
      one.name === other.name &&
      one.index === other.index &&
      one.abbeNumber === other.abbeNumber
    );
  return (
    'formula' in other &&
    one.name === other.name &&
    one.formula.kind === other.formula.kind &&
    sameNumbers(one.formula.coefficients, other.formula.coefficients) &&
    sameNumbers(one.rangeNm, other.rangeNm)
  );
}

const sameNumbers = (one: readonly number[], other: readonly number[]): boolean =>
  one.length === other.length && one.every((number, place) => number === other[place]);

const VISIBLE: MainLines = { mainNm: lineNm('d'), shortNm: lineNm('F'), longNm: lineNm('C') };

function indexIn(medium: CatalogueMedium | OwnMedium, letter: 'd' | 'F' | 'C'): number | null {
  const index = indexOf(medium, lineNm(letter), VISIBLE, 'unity');
  return index.ok ? index.value : null;
}
