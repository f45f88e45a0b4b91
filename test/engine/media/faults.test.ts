import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { type DispersionFormula, FORMULA_KINDS, indexFrom } from '../../../engine/media/dispersion.ts';
import { codeFault, formulaFaults, materialFault } from '../../../engine/media/faults.ts';
import { materials } from '../../../engine/media/materials.ts';

const SOUND: DispersionFormula = { kind: 'cauchy', coefficients: [1.5, 0.004, -2] };
const RANGE = [400, 800] as const;

describe('a material', () => {
  it('of the catalogue is sound, another is named with what is allowed', () => {
    for (const { id } of materials) expect(materialFault(id)).toBeNull();
    expect(materialFault('n-bk8')).toBe(
      'The material is “n-bk8”; it must be one of the 59 in the catalogue.',
    );
    expect(materialFault('x'.repeat(500))?.length).toBeLessThan(120);
  });

  it('given by a code must have six digits', () => {
    expect(codeFault('517642')).toBeNull();
    expect(codeFault('51764')).toBe(
      'The glass code is “51764”; it must be six digits as in 517642: three decimals of nd, then ten times Vd, which is not 0.',
    );
  });
});

describe('a formula of the user’s own', () => {
  it('is sound when it gives an index all over its range, as those of the catalogue do', () => {
    expect(formulaFaults(SOUND, RANGE)).toBeNull();
    for (const { formula, rangeNm } of materials) expect(formulaFaults(formula, rangeNm)).toBeNull();
  });

  it.each([
    [{ kind: 'cauchy', coefficients: [] }, RANGE, 'has 0 coefficients; it must have between 1 and 30'],
    [
      { kind: 'cauchy', coefficients: [1.5, Number.NaN] },
      RANGE,
      'Coefficient 2 of the formula is not a number',
    ],
    [
      { kind: 'cauchy', coefficients: [Number.NEGATIVE_INFINITY] },
      RANGE,
      'is minus infinity; it must be a finite',
    ],
    [SOUND, [50, 800], 'range begins at 50 nm; it must be between 100 and 20,000 nm'],
    [SOUND, [400, 30_000], 'range ends at 30,000 nm'],
    [SOUND, [400, Number.NaN], 'range ends at not a number nm'],
    [SOUND, [800, 400], 'range ends at 400 nm; it must end above its beginning, 800 nm'],
    [{ kind: 'cauchy', coefficients: [0.5] }, RANGE, 'index at 400 nm is 0.5; it must be between 1 and 5'],
    [{ kind: 'cauchy', coefficients: [6] }, RANGE, 'index at 400 nm is 6; it must be'],
    [{ kind: 'polynomial', coefficients: [-1] }, RANGE, 'index at 400 nm is no number; it must be'],
    [
      { kind: 'sellmeier', coefficients: [0, 1, 0.501] },
      RANGE,
      'pole at 501 nm; its range, 400 to 800 nm, must',
    ],
    [{ kind: 'sellmeier-squared', coefficients: [0, 1, 0.3] }, RANGE, 'pole at 547.723 nm'],
    [{ kind: 'combined', coefficients: [2, 1, 2, 0.5, 2] }, RANGE, 'pole at 500 nm'],
    [{ kind: 'gases', coefficients: [0, 1, 4] }, RANGE, 'pole at 500 nm'],
  ] as const)('%j over %j is refused in a sentence', (formula, rangeNm, words) => {
    const sentence = formulaFaults(formula as DispersionFormula, rangeNm);
    expect(sentence).toContain(words);
    expect(sentence).toMatch(/^[A-Z].*\.$/);
  });

  it('is refused when its index is good at both ends alone', () => {
    // 10 (L − 0.6)² + 0.9
    const dip: DispersionFormula = { kind: 'cauchy', coefficients: [4.5, -12, 1, 10, 2] };
    expect(formulaFaults(dip, RANGE)).toMatch(/index at 5\d\d(\.\d+)? nm is 0\.9/);
  });

  it('may have a pole outside its range, or one without weight', () => {
    expect(formulaFaults({ kind: 'sellmeier', coefficients: [0, 1, 0.1, 0, 0.5] }, RANGE)).toBeNull();
  });

  it('names a kind that does not exist', () => {
    const odd = { kind: 'odd', coefficients: [1] } as unknown as DispersionFormula;
    expect(formulaFaults(odd, RANGE)).toContain('The formula is “odd”; it must be one of sellmeier,');
  });

  it('that passes has an index at both ends and in between', () => {
    const formulas = fc.record({
      kind: fc.constantFrom(...FORMULA_KINDS),
      coefficients: fc.array(fc.double({ min: -2, max: 3, noNaN: true }), { minLength: 1, maxLength: 9 }),
    });
    fc.assert(
      fc.property(formulas, (formula) => {
        if (formulaFaults(formula, RANGE) !== null) return;
        for (const nm of [400, 600, 800]) expect(indexFrom(formula, nm)).toBeGreaterThanOrEqual(1);
      }),
    );
  });
});
