import { describe, expect, it } from 'vitest';
import { airIndex } from '../../../engine/media/air.ts';
import { lineNm } from '../../../engine/media/lines.ts';
import { decimalIndex } from './decimal.ts';

/** The values are given to eleven decimals. */
const HALF_DIGIT = 5.001e-12;

describe('the index of air', () => {
  // Computed apart from the formula of Ciddor (1996) and the handbook form, see the README of engine/media for both.
  it.each([
    [15, 1.00027717485],
    [20, 1.0002724365],
    [25, 1.00026785743],
    [60, 1.00023966023],
  ])('at %d °C in the d line is as computed apart', (celsius, index) => {
    const got = airIndex(lineNm('d'), celsius) ?? Number.NaN;
    expect(Math.abs(got - index)).toBeLessThanOrEqual(HALF_DIGIT);
  });

  it('agrees with forty digits of the published formula over its range', () => {
    const formula = {
      kind: 'gases',
      coefficients: [0, 0.05792105, 238.0185, 0.00167917, 57.362],
    } as const;
    for (let nm = 230; nm <= 1690; nm += 20)
      expect(Math.abs((airIndex(nm) ?? 0) - decimalIndex(formula, nm).toNumber())).toBeLessThan(3e-16);
  });

  it('meets the table of Ciddor at 633 nm and 100 kPa', () => {
    // P. E. Ciddor, Appl. Opt. 35, 1566 (1996), table of dry air, n − 1 in units of 1e-8, at 20 °C.
    const TABLE = 26824.4;
    const got = ((airIndex(633, 20, 100_000) ?? Number.NaN) - 1) * 1e8;
    expect(Math.abs(got - TABLE)).toBeLessThan(1);
  });

  it('is that of vacuum without pressure, and thins out with warmth', () => {
    expect(airIndex(600, 15, 0)).toBe(1);
    expect(airIndex(600, 30)).toBeLessThan(airIndex(600, 20) ?? 0);
  });

  it('is not known outside 230 to 1690 nm, nor where there is no such air', () => {
    expect(airIndex(230)).not.toBeNull();
    expect(airIndex(1690)).not.toBeNull();
    expect(airIndex(229.999)).toBeNull();
    expect(airIndex(1690.001)).toBeNull();
    expect(airIndex(Number.NaN)).toBeNull();
    expect(airIndex(600, -300)).toBeNull();
    expect(airIndex(600, 20, -1)).toBeNull();
  });
});
