import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { airIndex } from '../../../engine/media/air.ts';
import { indexFrom } from '../../../engine/media/dispersion.ts';
import { materialOf, materials } from '../../../engine/media/materials.ts';
import {
  cauchyShare,
  indexOf,
  type Medium,
  mediaEqual,
  mediumName,
  nominal,
  rangeOf,
} from '../../../engine/media/medium.ts';
import { given } from '../quantity.ts';
import { LINES } from './lines.ts';

const ROUNDING = 4e-16;
const D = LINES.mainNm;

const CROWN: Medium = { material: 'n-bk7' };
const WATER: Medium = { material: 'water' };
const FIXED: Medium = { name: 'crown', index: 1.5168, abbeNumber: 64.17 };
const CODE: Medium = { code: '517642' };
const OWN: Medium = {
  name: 'melt 7',
  formula: { kind: 'cauchy', coefficients: [1.5, 0.004, -2] },
  rangeNm: [400, 800],
};
const ALL: readonly Medium[] = ['air', CROWN, WATER, FIXED, CODE, OWN];

const unity = (medium: Medium, nm = D) => indexOf(medium, nm, LINES, 'unity');
const standard = (medium: Medium, nm = D) => indexOf(medium, nm, LINES, 'standard');
const near = (got: number, wanted: number, relative = ROUNDING): void =>
  expect(Math.abs(got / wanted - 1)).toBeLessThanOrEqual(relative);

describe('the index of a medium', () => {
  it('is 1 for air, and what its formula says for a glass', () => {
    expect(unity('air')).toEqual({ ok: true, value: 1 });
    expect(unity(CROWN)).toEqual({ ok: true, value: indexFrom(materialOf('n-bk7')!.formula, D) });
    expect(unity(CODE)).toEqual({ ok: true, value: 1.517 });
    near(given(unity(OWN, 500)), 1.516);
  });

  it('in standard air is that of the catalogue times air, so that air counts once', () => {
    const air = given(standard('air'));
    expect(air).toBe(airIndex(D));
    near(given(standard(CROWN)), given(unity(CROWN)) * 1.00027717485, 1e-11);
    for (const medium of [CROWN, WATER, FIXED, CODE, OWN])
      near(given(standard(medium)) / air, given(unity(medium)), 2 * ROUNDING);
  });

  it('of water is absolute in its formula, and smaller relative to air', () => {
    // 1.33340 by IAPWS, absolute; divided by 1.000277.
    const absolute = indexFrom(materialOf('water')!.formula, D) ?? 0;
    expect(given(standard(WATER))).toBe(absolute);
    expect(given(unity(WATER))).toBe(absolute / (airIndex(D) ?? 0));
    expect(given(unity(WATER)).toFixed(5)).toBe('1.33303');
    expect(nominal(WATER).nd?.toFixed(5)).toBe('1.33303');
  });

  it('does not bend a ray from air to air', () => {
    const before = given(standard('air', 450));
    expect(before / given(standard('air', 450))).toBe(1);
  });

  it('of a fixed index differs from short to long as its Abbe number says', () => {
    const [short, long] = [given(unity(FIXED, LINES.shortNm)), given(unity(FIXED, LINES.longNm))];
    expect(given(unity(FIXED))).toBe(1.5168);
    near((1.5168 - 1) / (short - long), 64.17, 1e-13);
    expect(unity({ ...FIXED, abbeNumber: null }, 400)).toEqual({ ok: true, value: 1.5168 });
  });

  it('is the same for a wavelength wherever it stands among the lines', () => {
    const wavelengths = fc.double({ min: 440, max: 790, noNaN: true });
    fc.assert(
      fc.property(fc.constantFrom<Medium>(CROWN, WATER, CODE, OWN), wavelengths, (medium, nm) => {
        const other = { mainNm: nm, shortNm: 440, longNm: 800 };
        expect(indexOf(medium, nm, other, 'unity')).toEqual(unity(medium, nm));
      }),
    );
  });

  it('falls with the wavelength for every glass of the catalogue in the visible', () => {
    for (const { id, family } of materials.filter((material) => material.family === 'glass')) {
      expect(family).toBe('glass');
      for (let nm = 420; nm < 700; nm += 20)
        expect(given(unity({ material: id }, nm))).toBeGreaterThan(given(unity({ material: id }, nm + 20)));
    }
  });
});

describe('the range of a medium', () => {
  it('ends where its data end, both ends included', () => {
    for (const { id } of materials) {
      const medium: Medium = { material: id };
      const [low, high] = rangeOf(medium) ?? [0, 0];
      for (const nm of [low, high]) expect(unity(medium, nm).ok, id).toBe(true);
      for (const nm of [low - 1e-9, high + 1e-9])
        expect(unity(medium, nm)).toEqual({ ok: false, why: 'outside its range' });
    }
  });

  it('leaves the g line out for a plastic measured from 436.8 nm', () => {
    expect(unity({ material: 'polystyrene' }, 435.8343).ok).toBe(false);
  });

  it('is that of the model for a code, that of the user for a formula, and none for a fixed index', () => {
    expect(rangeOf(CODE)).toEqual([400, 1000]);
    expect(unity(CODE, 399.9).ok).toBe(false);
    expect(rangeOf(OWN)).toEqual([400, 800]);
    expect(unity(OWN, 800.1).ok).toBe(false);
    expect(rangeOf(FIXED)).toBeNull();
    expect(rangeOf('air')).toBeNull();
    expect(unity('air', 10_000).ok).toBe(true);
  });

  it('in standard air lies within that of air, and for water in any air', () => {
    expect(rangeOf('air', 'standard')).toEqual([230, 1690]);
    expect(rangeOf(FIXED, 'standard')).toEqual([230, 1690]);
    expect(rangeOf(CROWN, 'standard')).toEqual([300, 1690]);
    expect(rangeOf(WATER)).toEqual([230, 1129]);
    for (const medium of ALL) {
      const [low, high] = rangeOf(medium, 'standard') ?? [0, 0];
      for (const nm of [low, high]) expect(standard(medium, nm).ok).toBe(true);
      for (const nm of [low - 1e-9, high + 1e-9])
        expect(standard(medium, nm)).toEqual({ ok: false, why: 'outside its range' });
    }
  });

  it('is told apart from an unknown material and from a formula without an index', () => {
    expect(unity({ material: 'n-bk8' })).toEqual({ ok: false, why: 'unknown material' });
    expect(unity({ code: '51764' })).toEqual({ ok: false, why: 'unknown material' });
    expect(rangeOf({ material: 'n-bk8' }, 'unity')).toBeNull();
    const none = { ...OWN, formula: { kind: 'polynomial', coefficients: [-1] } } as const;
    expect(unity(none)).toEqual({ ok: false, why: 'no index' });
    expect(unity({ name: '', index: Number.NaN, abbeNumber: null })).toEqual({ ok: false, why: 'no index' });
    expect(unity({ name: '', index: 1.5, abbeNumber: 1e-9 }, 700)).toEqual({ ok: false, why: 'no index' });
  });

  it('never lets out what is no number', () => {
    const numbers = fc.oneof(fc.double(), fc.constantFrom(0, -1, Number.NaN, Number.POSITIVE_INFINITY));
    fc.assert(
      fc.property(
        fc.constantFrom(...ALL),
        numbers,
        fc.constantFrom('unity', 'standard'),
        (medium, nm, air) => {
          const index = indexOf(medium, nm, LINES, air as 'unity' | 'standard');
          expect(!index.ok || (Number.isFinite(index.value) && index.value > 0)).toBe(true);
        },
      ),
    );
  });
});

describe('the share of a two-term law', () => {
  it('is 0 in the main line, and 1 from short to long', () => {
    expect(cauchyShare(D, LINES)).toBe(0);
    expect(cauchyShare(D, { mainNm: D, shortNm: D, longNm: D })).toBe(0);
    near(cauchyShare(LINES.shortNm, LINES) - cauchyShare(LINES.longNm, LINES), 1);
  });
});

describe('a medium', () => {
  it('has a name for the screen', () => {
    expect(ALL.map(mediumName)).toEqual([
      'air',
      'N-BK7',
      'H2O (Water), distilled',
      'crown',
      '517642',
      'melt 7',
    ]);
    expect(mediumName({ material: 'n-bk8' })).toBe('n-bk8');
    expect(mediumName({ name: ' ', index: 1.5, abbeNumber: null })).toBe('index 1.5');
    expect(mediumName({ ...OWN, name: '' })).toBe('a material of your own');
  });

  it('stands on the map by nd and Vd', () => {
    const crown = nominal(CROWN);
    near(crown.nd ?? 0, 1.51680003, 5e-9);
    near(crown.vd ?? 0, 64.16734, 1e-7);
    expect(nominal(CODE)).toEqual({ nd: 1.517, vd: 64.2 });
    expect(nominal(FIXED)).toEqual({ nd: 1.5168, vd: 64.17 });
    expect(nominal(OWN).vd).not.toBeNull();
    expect(nominal('air')).toEqual({ nd: 1, vd: null });
    expect(nominal({ material: 'si' })).toEqual({ nd: null, vd: null });
    expect(nominal({ material: 'znse' }).vd).toBeNull();
    expect(nominal({ code: 'x' })).toEqual({ nd: null, vd: null });
    expect(nominal({ ...OWN, formula: { kind: 'cauchy', coefficients: [1.5] } })).toEqual({
      nd: 1.5,
      vd: null,
    });
  });

  it('equals itself alone, entry by entry', () => {
    for (const [k, one] of ALL.entries())
      for (const [j, other] of ALL.entries()) expect(mediaEqual(one, structuredClone(other))).toBe(k === j);
    expect(mediaEqual(FIXED, { ...FIXED, abbeNumber: null })).toBe(false);
    expect(mediaEqual(FIXED, { ...FIXED, index: 1.6 })).toBe(false);
    expect(mediaEqual(FIXED, { ...FIXED, name: 'flint' })).toBe(false);
    expect(mediaEqual(OWN, { ...OWN, name: 'melt 8' })).toBe(false);
    expect(mediaEqual(OWN, { ...OWN, rangeNm: [400, 801] })).toBe(false);
    expect(mediaEqual(OWN, { ...OWN, formula: { kind: 'cauchy', coefficients: [1.5] } })).toBe(false);
  });
});
