import { describe, expect, test } from 'vitest';
import { emptySketch, newGlass, newPlate, newSurface, newThin } from '../../../engine/sketch/create.ts';
import { parseSketch } from '../../../engine/sketch/parse.ts';
import { faultsOf } from '../../../engine/sketch/rules.ts';
import type { GlassPart, GlassSurface, Lines, Sketch, SolidMedium } from '../../../engine/sketch/types.ts';
import { id } from './layout.ts';

const lens = (change: Partial<GlassPart> = {}): Sketch => ({
  ...emptySketch(),
  parts: [{ ...newGlass(50, 4), name: 'front lens', ...change }],
});
const surface = (change: Partial<GlassSurface>): Sketch =>
  lens({ surfaces: [{ ...newSurface(50), ...change }, newSurface(-50)] });
const filled = (material: SolidMedium): Sketch => lens({ fillings: [{ thicknessMm: 4, material }] });
const lit = (lines: Partial<Lines>, sketch = lens()): Sketch => ({
  ...sketch,
  lines: { ...sketch.lines, ...lines },
});

describe('glass that keeps the rules', () => {
  test('may be flat, nearly flat, conic, aspheric or of no thickness', () => {
    expect(faultsOf(lens())).toEqual([]);
    expect(faultsOf(surface({ radiusMm: null, conic: -1, asphere: [1e-6, 0, -1e-12] }))).toEqual([]);
    expect(faultsOf(surface({ radiusMm: 1e12, semiDiameterMm: 10 }))).toEqual([]);
    expect(faultsOf(lens({ fillings: [{ thicknessMm: 0, material: { code: '620364' } }] }))).toEqual([]);
  });

  test('may have a rim wider than its radius: that is drawn and warned about, not refused', () => {
    expect(faultsOf(surface({ radiusMm: 5, semiDiameterMm: 20 }))).toEqual([]);
  });
});

describe('glass that breaks a rule', () => {
  test.each<[string, Sketch, string, string]>([
    [
      'a radius of zero',
      surface({ radiusMm: 0 }),
      'parts[0].surfaces[0].radiusMm',
      'The radius of surface 1 of “front lens” is 0 mm; it must be a number other than zero, between 0.001 and 1,000,000,000,000 mm in size, or flat.',
    ],
    [
      'a conic constant that is no number',
      surface({ conic: Number.NaN }),
      'parts[0].surfaces[0].conic',
      'The conic constant of surface 1 of “front lens” is not a number; it must be between −1,000,000 and 1,000,000.',
    ],
    [
      'a coefficient that is infinite',
      surface({ asphere: [0, Number.POSITIVE_INFINITY] }),
      'parts[0].surfaces[0].asphere[1]',
      'The coefficient of surface 1 of “front lens” is infinite; it must be a finite number, at most 1e30 in size.',
    ],
    [
      'a clear diameter of nothing',
      surface({ semiDiameterMm: 0 }),
      'parts[0].surfaces[0].semiDiameterMm',
      'The semi-diameter of surface 1 of “front lens” is 0 mm; it must be above 0 and at most 1,000,000 mm.',
    ],
    [
      'a negative thickness',
      lens({ fillings: [{ thicknessMm: -1, material: { material: 'n-bk7' } }] }),
      'parts[0].fillings[0].thicknessMm',
      'The thickness of “front lens” is −1 mm; it must be between 0 and 1,000,000 mm.',
    ],
    [
      'one surface',
      lens({ surfaces: [newSurface(50)], fillings: [] }),
      'parts[0].surfaces',
      'The number of surfaces of “front lens” is 1; it must be between 2 and 20.',
    ],
    [
      'fillings that do not fit the surfaces',
      lens({ fillings: [] }),
      'parts[0].fillings',
      'The number of fillings of “front lens” is 0; it must be one fewer than its 2 surfaces.',
    ],
    [
      'an index below 1',
      filled({ name: 'odd', index: 0.9, abbeNumber: null }),
      'parts[0].fillings[0].material.index',
      'The index of “front lens” is 0.9; it must be between 1 and 5.',
    ],
  ])('is told in one sentence: %s', (_name, sketch, path, sentence) => {
    expect(faultsOf(sketch)).toEqual([{ path, sentence }]);
  });

  test('names an unknown glass, a bad code and a formula without an index', () => {
    const [unknown] = faultsOf(filled({ material: 'n-xx99' }));
    expect(unknown?.path).toBe('parts[0].fillings[0].material.material');
    expect(unknown?.sentence).toMatch(/^The material is “n-xx99”; it must be .* \(in “front lens”\)\.$/);
    const [code] = faultsOf(filled({ code: '51764' }));
    expect(code?.sentence).toMatch(/^The glass code is “51764”; it must be six digits/);
    const poleAt550 = { kind: 'sellmeier', coefficients: [0, 1, 0.55] } as const;
    const [pole] = faultsOf(filled({ name: 'mine', formula: poleAt550, rangeNm: [400, 700] }));
    expect(pole?.path).toBe('parts[0].fillings[0].material.formula');
  });
});

describe('a line outside the range of a medium', () => {
  test('is refused with the range, wherever the medium stands', () => {
    const sentence =
      'The main wavelength is 200 nm; it must be between 300 and 2500 nm, where the index of N-BK7 in “front lens” is known.';
    expect(faultsOf(lit({ mainNm: 200, shortNm: 190 }))).toContainEqual({ path: 'lines.mainNm', sentence });
    const fourth = faultsOf(lit({ more: [{ wavelengthNm: 3000, weight: 1 }] }));
    expect(fourth).toHaveLength(1);
    expect(fourth[0]?.path).toBe('lines.more[0].wavelengthNm');
    const plate = { ...newPlate(2), material: { material: 'n-bk7' } };
    const thin = { ...newThin(50, id('p2')), material: { material: 'n-bk7' } };
    for (const part of [plate, thin])
      expect(faultsOf(lit({ longNm: 3000 }, { ...emptySketch(), parts: [part] }))).toHaveLength(1);
    const space = { lengthMm: 1, medium: { material: 'water' } };
    const wet = { ...emptySketch(), parts: [{ ...newThin(50), space }] };
    expect(faultsOf(lit({ longNm: 1500 }, wet)).map(({ path }) => path)).toEqual(['lines.longNm']);
  });

  test('is refused too where a steep fixed index has fallen below 0', () => {
    const steep = filled({ name: 'odd', index: 1.5, abbeNumber: 0.1 });
    expect(faultsOf(steep)).toEqual([
      {
        path: 'lines.longNm',
        sentence:
          'The long wavelength is 656.2725 nm; it must be a wavelength at which odd in “front lens” has an index above 0.',
      },
    ]);
  });

  test('of standard air counts too', () => {
    const vacuum = lit({ mainNm: 150, shortNm: 140 }, { ...emptySketch(), parts: [newThin(50)] });
    expect(faultsOf(vacuum)).toEqual([]);
    expect(faultsOf({ ...vacuum, air: 'standard' }).map(({ path }) => path)).toEqual([
      'lines.mainNm',
      'lines.shortNm',
    ]);
  });
});

describe('the weights of the lines', () => {
  test('are 0 or more, that of the main line above 0', () => {
    const weighed = (main: number, short: number) => lit({ weights: { main, short, long: 1 } });
    expect(faultsOf(weighed(1, 0))).toEqual([]);
    expect(faultsOf(weighed(0, 1)).map(({ path }) => path)).toEqual(['lines.weights.main']);
    expect(faultsOf(weighed(1, -1)).map(({ path }) => path)).toEqual(['lines.weights.short']);
    const three = Array.from({ length: 3 }, () => ({ wavelengthNm: 600, weight: 1 }));
    expect(faultsOf(lit({ more: three })).map(({ path }) => path)).toEqual(['lines.more']);
  });
});

describe('a file of version 1', () => {
  test('opens with the weights, further lines, air and glass that it could not have', () => {
    const { air: _air, lines, ...body } = { ...emptySketch(), parts: [newThin(50)] };
    const { weights: _weights, more: _more, ...three } = lines;
    const parts = body.parts.map(({ material: _material, shapeFactor: _shape, ...old }) => old);
    const text = JSON.stringify({ format: 'gapwright-sketch', version: 1, ...body, parts, lines: three });
    expect(parseSketch(text)).toEqual({ ok: true, sketch: { ...emptySketch(), parts: [newThin(50)] } });
  });
});
