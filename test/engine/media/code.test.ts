import { describe, expect, it } from 'vitest';
import { CODE_MODEL, codeIndex, parseCode } from '../../../engine/media/code.ts';
import { lineNm } from '../../../engine/media/lines.ts';
import { materials } from '../../../engine/media/materials.ts';
import { indexOf } from '../../../engine/media/medium.ts';
import { given } from '../quantity.ts';
import { LINES } from './lines.ts';

/** A code rounds the index to three decimals and the Abbe number to one; the catalogue rounds to five and two before. */
const CODE_STEP = { nd: 0.000506, vd: 0.0551 };
const ROUNDING = 1e-14;

const coded = materials.filter(({ sixDigitCode }) => sixDigitCode !== null);
const glasses = coded.filter(({ family, source }) => family === 'glass' && source.path.includes('/specs/'));

describe('a six-digit code', () => {
  it.each(coded)('$sixDigitCode of $name tells its index and Abbe number', ({ sixDigitCode, nd, vd }) => {
    const figures = parseCode(sixDigitCode ?? '');
    expect(Math.abs((figures?.nd ?? 0) - (nd ?? 0))).toBeLessThanOrEqual(CODE_STEP.nd);
    expect(Math.abs((figures?.vd ?? 0) - (vd ?? 0))).toBeLessThanOrEqual(CODE_STEP.vd);
  });

  it('leaves out the whole number of the index, which is 2 where it cannot be 1', () => {
    expect(parseCode('517642')).toEqual({ nd: 1.517, vd: 64.2 });
    expect(parseCode('003283')).toEqual({ nd: 2.003, vd: 28.3 });
    expect(parseCode('100001')).toEqual({ nd: 1.1, vd: 0.1 });
  });

  it('is six digits and nothing else', () => {
    for (const text of ['', '51764', '5176420', '51764x', '517 42', '−17642', '1.5176', '517000', '٥١٧٦٤٢'])
      expect(parseCode(text), text).toBeNull();
  });
});

describe('the glass that a code describes', () => {
  it.each(['517642', '620364', '003283', '434952'])(
    'of %s has the index and Abbe number of the code',
    (code) => {
      const figures = parseCode(code) ?? { nd: 0, vd: 0 };
      const at = (letter: 'd' | 'F' | 'C' | 'g'): number => codeIndex(figures, lineNm(letter));
      expect(at('d')).toBe(figures.nd);
      const spread = at('F') - at('C');
      expect(Math.abs((figures.nd - 1) / spread / figures.vd - 1)).toBeLessThanOrEqual(100 * ROUNDING);
      // SCHOTT, Technical Information TIE-29: the line through K7 and F2.
      const normal = 0.6438 - 0.001682 * figures.vd;
      expect(Math.abs((at('g') - at('F')) / spread - normal)).toBeLessThanOrEqual(100 * ROUNDING);
    },
  );

  it('lies as near to the glasses of the catalogue as the model says', () => {
    const strays = (low: number, high: number): readonly number[] =>
      glasses
        .map(({ id, nd, vd, rangeNm }) => {
          let worst = 0;
          for (let nm = low; nm <= Math.min(high, rangeNm[1]); nm += 4) {
            const real = given(indexOf({ material: id }, nm, LINES, 'unity'));
            worst = Math.max(worst, Math.abs(codeIndex({ nd: nd ?? 0, vd: vd ?? 0 }, nm) - real));
          }
          return worst;
        })
        .sort((a, b) => a - b);
    expect(glasses).toHaveLength(42);
    const [visible, wide] = [strays(486, 658), strays(400, 1000)];
    expect(visible[21]).toBeLessThan(3e-5);
    expect(wide[21]).toBeLessThan(5.5e-4);
    expect(wide[41]).toBeLessThan(7e-3);
  });

  it('says on the screen by which model', () => {
    expect(CODE_MODEL).toContain('Conrady');
  });
});
