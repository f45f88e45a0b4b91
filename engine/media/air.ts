import { type DispersionFormula, indexFrom } from './dispersion.ts';

/** The range of the air formula, in nm. */
export const AIR_RANGE_NM: readonly [number, number] = [230, 1690];

const CIDDOR: DispersionFormula = {
  kind: 'gases',
  coefficients: [0, 0.05792105, 238.0185, 0.00167917, 57.362],
};

const STANDARD_CELSIUS = 15;
const STANDARD_PASCAL = 101_325;
/** Fall of the density of air with temperature, per kelvin from 15 °C. */
const THINNING_PER_KELVIN = 0.0034785;

/**
 * Index of dry air with 450 ppm carbon dioxide against vacuum; null outside 230 to 1690 nm and where there is no such air. At 15 °C
 * and 101 325 Pa by P. E. Ciddor, Appl. Opt. 35, 1566 (1996); otherwise n − 1 in proportion to the pressure and divided by
 * 1 + 0.0034785 (T − 15), the usual handbook form, within 1e-8 of Ciddor's table from 10 to 30 °C. The formula wants the wavelength in
 * vacuum; that in air changes the index by less than 1e-8 above 350 nm.
 */
export function airIndex(
  wavelengthNm: number,
  celsius: number = STANDARD_CELSIUS,
  pascal: number = STANDARD_PASCAL,
): number | null {
  if (!(wavelengthNm >= AIR_RANGE_NM[0] && wavelengthNm <= AIR_RANGE_NM[1])) return null;
  const standard = indexFrom(CIDDOR, wavelengthNm);
  const thinning = 1 + THINNING_PER_KELVIN * (celsius - STANDARD_CELSIUS);
  if (standard === null || !(thinning > 0 && pascal >= 0)) return null;
  return 1 + ((standard - 1) * (pascal / STANDARD_PASCAL)) / thinning;
}
