import { lineNm } from './lines.ts';

/** What a six-digit glass code tells: the index in the d line and the Abbe number. */
export interface CodeFigures {
  readonly nd: number;
  readonly vd: number;
}

/** How other lines get their index from a code, for the screen. */
export const CODE_MODEL =
  'n₀ + A/λ + B/λ³·⁵ (Conrady) through nd, Vd and the partial dispersion of normal glasses';

/** Where the model holds, in nm. */
export const CODE_RANGE_NM: readonly [number, number] = [400, 1000];

const ZERO = '0'.charCodeAt(0);
const DIGITS = 6;
/** The code leaves the whole number of the index out. No glass is below 1.1, and codes are not given from 2.1 on. */
const LOWEST_DECIMALS_OF_ONE = 100;

/**
 * Index and Abbe number of a code: three decimals of nd, then ten times Vd. `517642` is 1.517 and 64.2; `003283` is 2.003 and
 * 28.3, since no glass has an index of 1.003. Null when the text is not six digits or the Abbe number is 0.
 */
export function parseCode(code: string): CodeFigures | null {
  if (code.length !== DIGITS) return null;
  let whole = 0;
  for (let k = 0; k < DIGITS; k++) {
    const digit = code.charCodeAt(k) - ZERO;
    if (!(digit >= 0 && digit <= 9)) return null;
    whole = 10 * whole + digit;
  }
  const decimals = Math.floor(whole / 1000);
  const vd = (whole % 1000) / 10;
  if (vd === 0) return null;
  return { nd: (decimals < LOWEST_DECIMALS_OF_ONE ? 2000 + decimals : 1000 + decimals) / 1000, vd };
}

const um = (wavelengthNm: number): number => wavelengthNm / 1000;
const D = um(lineNm('d'));
const F = um(lineNm('F'));
const C = um(lineNm('C'));
const G = um(lineNm('g'));

const first = (wavelengthUm: number): number => 1 / wavelengthUm;
const second = (wavelengthUm: number): number => 1 / (wavelengthUm ** 3 * Math.sqrt(wavelengthUm));

const FIRST_D = first(D);
const SECOND_D = second(D);
/** Differences F − C and g − F of the two terms, and the determinant of the pair of equations for A and B. */
const FIRST_FC = first(F) - first(C);
const SECOND_FC = second(F) - second(C);
const FIRST_GF = first(G) - first(F);
const SECOND_GF = second(G) - second(F);
const DETERMINANT = FIRST_FC * SECOND_GF - FIRST_GF * SECOND_FC;

/**
 * Index at a wavelength of the glass that a code describes: n = n₀ + A/λ + B/λ³·⁵ (A. E. Conrady, Applied Optics and Optical
 * Design, part 2, 1960), with n₀, A and B such that nd and Vd come out, and Pg,F = 0.6438 − 0.001682 Vd, the line through the glasses
 * K7 and F2 near which normal glasses lie (SCHOTT, Technical Information TIE-29). Exact in the d line and for nF − nC. Elsewhere a guess:
 * of the glasses of the catalogue half lie within 3e-5 of it between F and C beside the rounding of nd, within 5e-4 from 400 to
 * 1000 nm; dense flints stray most, by up to 7e-3 at 400 nm. Meant for `CODE_RANGE_NM`.
 */
export function codeIndex({ nd, vd }: CodeFigures, wavelengthNm: number): number {
  const spread = (nd - 1) / vd;
  const blueSpread = spread * (0.6438 - 0.001682 * vd);
  const a = (spread * SECOND_GF - blueSpread * SECOND_FC) / DETERMINANT;
  const b = (blueSpread * FIRST_FC - spread * FIRST_GF) / DETERMINANT;
  const wavelengthUm = um(wavelengthNm);
  return nd + a * (first(wavelengthUm) - FIRST_D) + b * (second(wavelengthUm) - SECOND_D);
}
