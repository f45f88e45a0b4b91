import { describe, expect, it } from 'vitest';
import { type DispersionFormula, FORMULA_KINDS, indexFrom } from '../../../engine/media/dispersion.ts';
import { lineNm, spectralLines } from '../../../engine/media/lines.ts';
import { materialOf, materials } from '../../../engine/media/materials.ts';
import { decimalIndex } from './decimal.ts';

/** A dozen roundings. */
const ROUNDING = 2e-15;
const WAVELENGTHS = 61;

const MADE_UP: Readonly<Record<DispersionFormula['kind'], readonly number[]>> = {
  sellmeier: [0.1, 1.1, 0.08, 0.2, 0.14, 0.9, 10],
  'sellmeier-squared': [0.1, 1.1, 0.006, 0.2, 0.02, 0.9, 103],
  polynomial: [2.3, -0.01, 2, 0.012, -2, 0.0002, -4],
  combined: [2, 0.9, 2, 0.1, 2, 0.3, 0, 0.2, 2, -0.004, 2, 0.001, -4],
  cauchy: [1.5, 0.004, -2, 0.0001, -4],
  gases: [0, 0.05792105, 238.0185, 0.00167917, 57.362],
};

describe('a dispersion formula', () => {
  it.each(FORMULA_KINDS)('of kind %s agrees with forty digits at every wavelength', (kind) => {
    const formula = { kind, coefficients: MADE_UP[kind] };
    for (let nm = 350; nm <= 2000; nm += 13.7) {
      const wanted = decimalIndex(formula, nm).toNumber();
      expect(Math.abs((indexFrom(formula, nm) ?? Number.NaN) / wanted - 1)).toBeLessThanOrEqual(ROUNDING);
    }
  });

  it.each(materials)('of $name agrees with forty digits over its whole range', ({ formula, rangeNm }) => {
    const [low, high] = rangeNm;
    for (let k = 0; k < WAVELENGTHS; k++) {
      const nm = low + ((high - low) * k) / (WAVELENGTHS - 1);
      const wanted = decimalIndex(formula, nm).toNumber();
      expect(Math.abs((indexFrom(formula, nm) ?? Number.NaN) / wanted - 1)).toBeLessThanOrEqual(ROUNDING);
    }
  });

  it('takes a missing coefficient as 0', () => {
    const short = { kind: 'sellmeier', coefficients: [0, 1.25] } as const;
    expect(indexFrom(short, 500)).toBe(1.5);
    expect(indexFrom({ kind: 'cauchy', coefficients: [1.4, 0.1] }, 700)).toBe(1.5);
    expect(indexFrom({ kind: 'combined', coefficients: [2.25] }, 1000)).toBe(1.5);
  });

  it('gives no index where n² is not positive, at a pole, or beyond all numbers', () => {
    expect(indexFrom({ kind: 'polynomial', coefficients: [] }, 500)).toBeNull();
    expect(indexFrom({ kind: 'polynomial', coefficients: [-1] }, 500)).toBeNull();
    expect(indexFrom({ kind: 'cauchy', coefficients: [-1] }, 500)).toBeNull();
    expect(indexFrom({ kind: 'sellmeier', coefficients: [0, 1, 0.5] }, 500)).toBeNull();
    expect(indexFrom({ kind: 'polynomial', coefficients: [2, 1, 1e9] }, 5000)).toBeNull();
    expect(indexFrom({ kind: 'cauchy', coefficients: [1.5] }, Number.NaN)).not.toBeNaN();
  });
});

describe('the catalogue', () => {
  /** nd and vd are printed to 8 and 5 decimals. */
  const HALF_DIGIT = { nd: 5.0001e-9, vd: 5.001e-6 };

  it.each(materials)('has nd and vd of $name as its formula gives them', ({ formula, rangeNm, nd, vd }) => {
    const at = (letter: 'd' | 'F' | 'C'): number => {
      const nm = lineNm(letter);
      const inside = nm >= rangeNm[0] && nm <= rangeNm[1];
      return inside ? (indexFrom(formula, nm) ?? Number.NaN) : Number.NaN;
    };
    const abbe = (at('d') - 1) / (at('F') - at('C'));
    if (nd === null) expect(at('d')).toBeNaN();
    else expect(Math.abs(at('d') - nd)).toBeLessThanOrEqual(HALF_DIGIT.nd);
    if (vd === null) expect(abbe).toBeNaN();
    else expect(Math.abs(abbe - vd)).toBeLessThanOrEqual(HALF_DIGIT.vd);
  });

  it('holds what the tool and later reckoning need, in the form that the types say', () => {
    expect(materials).toHaveLength(59);
    expect(new Set(materials.map(({ id }) => id)).size).toBe(59);
    for (const material of materials) {
      expect(FORMULA_KINDS).toContain(material.formula.kind);
      expect(material.formula.coefficients.every(Number.isFinite)).toBe(true);
      expect(['glass', 'plastic', 'crystal', 'liquid']).toContain(material.family);
      expect(material.rangeNm).toHaveLength(2);
      expect(material.rangeNm[0]).toBeLessThan(material.rangeNm[1]);
      expect(material.source.dataSet).toBe('refractiveindex.info database, CC0 1.0');
      const { thermal, expansionPerK, densityGPerCm3 } = material;
      expect([thermal, expansionPerK, densityGPerCm3].filter((entry) => entry !== null).length % 3).toBe(0);
      if (thermal !== null) expect(Object.values(thermal).every(Number.isFinite)).toBe(true);
    }
    expect(materials.filter(({ thermal }) => thermal !== null)).toHaveLength(43);
  });

  it('knows water alone to be relative to vacuum', () => {
    expect(materials.filter(({ relativeTo }) => relativeTo === 'vacuum').map(({ id }) => id)).toEqual([
      'water',
    ]);
  });

  it('finds a material by its id, and none by another', () => {
    expect(materialOf('n-bk7')?.name).toBe('N-BK7');
    expect(materialOf('N-BK7')).toBeNull();
    expect(materialOf('constructor')).toBeNull();
  });

  it('has the two reference lines of ISO 7944 among its thirteen lines', () => {
    expect(spectralLines).toHaveLength(13);
    expect(spectralLines.filter(({ isoReference }) => isoReference).map(({ id, nm }) => [id, nm])).toEqual([
      ['e', 546.074],
      ['d', 587.5618],
    ]);
  });
});
