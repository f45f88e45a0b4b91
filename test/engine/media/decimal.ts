import { Decimal } from 'decimal.js';
import type { DispersionFormula } from '../../../engine/media/dispersion.ts';

/** The dispersion formulas once more, in forty digits and over the inverse square of the wavelength where the engine takes the square. */
const D = Decimal.clone({ precision: 40 });

/** The index of a formula in forty digits. */
export function decimalIndex({ kind, coefficients }: DispersionFormula, wavelengthNm: number): Decimal {
  const um = new D(wavelengthNm).div(1000);
  const inverse = um.pow(-2);
  const c = (place: number): Decimal => new D(coefficients[place - 1] ?? 0);
  const places = (from: number, step: number): number[] => {
    const list: number[] = [];
    for (let place = from; place <= coefficients.length; place += step) list.push(place);
    return list;
  };
  const sum = (list: readonly number[], term: (place: number) => Decimal): Decimal =>
    list.reduce((total, place) => (c(place).isZero() ? total : total.plus(term(place))), new D(0));
  const power = (place: number): Decimal => c(place).times(um.pow(c(place + 1)));
  // B L²/(L² − S) = B/(1 − S/L²)
  const resonance = (place: number, square: Decimal): Decimal =>
    c(place).div(new D(1).minus(square.times(inverse)));
  switch (kind) {
    case 'sellmeier':
      return sum(places(2, 2), (k) => resonance(k, c(k + 1).pow(2)))
        .plus(1)
        .plus(c(1))
        .sqrt();
    case 'sellmeier-squared':
      return sum(places(2, 2), (k) => resonance(k, c(k + 1)))
        .plus(1)
        .plus(c(1))
        .sqrt();
    case 'polynomial':
      return sum(places(2, 2), power).plus(c(1)).sqrt();
    case 'combined': {
      const poles = sum([2, 6], (k) => power(k).div(um.pow(2).minus(c(k + 2).pow(c(k + 3)))));
      return poles
        .plus(sum(places(10, 2), power))
        .plus(c(1))
        .sqrt();
    }
    case 'cauchy':
      return sum(places(2, 2), power).plus(c(1));
    case 'gases':
      return sum(places(2, 2), (k) => c(k).div(c(k + 1).minus(inverse)))
        .plus(1)
        .plus(c(1));
  }
}
