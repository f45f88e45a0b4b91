import { describe, expect, test } from 'vitest';
import { mediumOfCode, mediumOfFormula, mediumOfIndex } from '../../../../app/panels/glass/typedMedium.ts';

const FORMULA = { name: 'mine', kind: 'cauchy', fromNm: '400', toNm: '700' } as const;
const coefficients = (text: string) => {
  const read = mediumOfFormula({ ...FORMULA, coefficients: text });
  return read.ok && 'formula' in read.value ? read.value.formula.coefficients : read;
};

describe('a medium of the user’s own', () => {
  test.each(['517642', '517 642', '517/642', '517.642'])('is read from the code %s', (typed) => {
    expect(mediumOfCode(typed)).toEqual({ ok: true, value: { code: '517642' } });
  });

  test('has its index and, where known, its Abbe number', () => {
    expect(mediumOfIndex({ name: ' oil ', index: '1,515', abbeNumber: '' })).toEqual({
      ok: true,
      value: { name: 'oil', index: 1.515, abbeNumber: null },
    });
    expect(mediumOfIndex({ name: '', index: '1.6', abbeNumber: 'x' }).ok).toBe(false);
  });

  test.each([
    '1.5 0.004 -2',
    '1.5\n0.004\n\u22122',
    '1.5, 0.004, -2',
    '1.5,0.004,-2',
    '1.5; 0.004; -2',
    '1,5 0,004 -2',
    '1,5; 0,004; -2',
    'C1 = 1.5 C2 = 0.004 C3 = -2',
    'A: 1.5, B: 4e-3, C: -2',
  ])('has the coefficients of %j', (typed) => {
    expect(coefficients(typed)).toEqual([1.5, 0.004, -2]);
  });

  test('is refused in words: no coefficients, a word among them, no index over its range', () => {
    expect(coefficients('')).toMatchObject({
      why: 'Type the coefficients in their order, parted by blanks.',
    });
    expect(coefficients('1.5 glass')).toMatchObject({
      why: '“glass” is not a coefficient; it must be a number.',
    });
    expect(coefficients('0.5')).toMatchObject({ ok: false });
  });
});
