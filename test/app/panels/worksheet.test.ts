import { test } from '@fast-check/vitest';
import { describe, expect, it } from 'vitest';
import { cellText, rowUnit, worksheetOf, worksheetTsv } from '../../../app/panels/worksheet.ts';
import type { Sketch } from '../../../engine/index.ts';
import { analyse, newGlass, settingAt } from '../../../engine/index.ts';
import { newSurface } from '../../../engine/sketch/create.ts';
import { inspectionZoom, MIDDLE } from '../../engine/demo.ts';
import { anySketch } from '../../engine/sketch/arbitrary.ts';
import { empty } from './sketches.ts';

const sheetOf = (sketch: Sketch, at = sketch.positions[0]?.id ?? MIDDLE) =>
  worksheetOf(sketch, analyse(sketch, settingAt(at)));

const rowOf = (sketch: Sketch, label: string) => {
  const row = sheetOf(sketch).rows.find((line) => line.label === label);
  if (!row) throw new Error(`rowOf: no row ${label}`);
  return row;
};

describe('the trace sheet', () => {
  it('has a column for the object, every surface and the image', () => {
    expect(sheetOf(inspectionZoom(), MIDDLE).columns).toEqual([
      'object',
      'first group',
      'second group',
      'third group',
      'fourth group',
      'image',
    ]);
  });

  it('begins on the object and ends on the image with a marginal ray of height zero', () => {
    const y = rowOf(inspectionZoom(), 'y').cells;
    expect(y[0]).toBeCloseTo(0, 9);
    expect(y.at(-1)).toBeCloseTo(0, 9);
    expect(rowOf(inspectionZoom(), 'ȳ').cells.at(-1)).toBeCloseTo(5.5, 9);
  });

  it('lets every column follow from the one before it', () => {
    const cells = (label: string) => rowOf(inspectionZoom(), label).cells.map((cell) => cell ?? 0);
    const [power, gap, index, y, nu] = ['power', 'gap behind', 'index behind', 'y', 'nu behind'].map(cells);
    for (let k = 1; k <= 4; k++) {
      const before = k - 1;
      expect(
        (y?.[before] ?? 0) + ((gap?.[before] ?? 0) / (index?.[before] ?? 1)) * (nu?.[before] ?? 0),
      ).toBeCloseTo(y?.[k] ?? Number.NaN, 10);
      expect((nu?.[before] ?? 0) - (power?.[k] ?? 0) * (y?.[k] ?? 0)).toBeCloseTo(nu?.[k] ?? Number.NaN, 12);
    }
  });

  it('has radius and incidence where surfaces are curved, and counts the surfaces of cemented glass', () => {
    const singlet = { ...empty(), parts: [newGlass(50, 4)] };
    expect(sheetOf(singlet).columns).toEqual(['object', 'glass 1, front', 'glass 1, rear', 'image']);
    expect(rowOf(singlet, 'radius').cells).toEqual([null, 50, -50, null]);
    const [, incidence] = rowOf({ ...singlet, stop: singlet.parts[0]?.id ?? null }, 'i').cells;
    const [, y] = rowOf({ ...singlet, stop: singlet.parts[0]?.id ?? null }, 'y').cells;
    // A ray parallel to the axis meets the first surface at y/R.
    expect(incidence).toBeCloseTo((y ?? Number.NaN) / 50, 15);
    const cemented = {
      ...newGlass(50, 4),
      surfaces: [newSurface(50), newSurface(-50), newSurface(null)],
      fillings: [1, 2].map((thicknessMm) => ({ thicknessMm, material: { material: 'f2' } })),
    };
    expect(sheetOf({ ...empty(), parts: [cemented] }).columns[2]).toBe('surface 2 of glass 1');
    expect(sheetOf(inspectionZoom(), MIDDLE).rows.map(({ label }) => label)).not.toContain('radius');
  });

  it('leaves the heights of an empty sketch open', () => {
    const { columns, rows } = sheetOf(empty());
    expect(columns).toEqual(['object', 'image']);
    for (const { label, cells } of rows)
      if (label !== 'index behind') expect(cells.every((cell) => cell === null)).toBe(true);
  });

  it('shows powers per inch beside lengths in inches', () => {
    const power = rowOf(inspectionZoom(), 'power');
    expect(rowUnit(power, 'in')).toBe('1/in');
    expect(cellText(-0.03125, power, 'in')).toBe('−0.793750');
    expect(cellText(null, power, 'in')).toBe('');
  });

  test.prop([anySketch()])(
    'has one cell per column, and its text is read back as the same numbers',
    (sketch) => {
      const sheet = sheetOf(sketch);
      const lines = worksheetTsv(sheet)
        .split('\n')
        .slice(0, -1)
        .map((line) => line.split('\t'));
      expect(lines.length).toBe(sheet.rows.length + 1);
      for (const [index, row] of sheet.rows.entries()) {
        expect(row.cells.length).toBe(sheet.columns.length);
        const read = (lines[index + 1] ?? []).slice(2).map((text) => (text === '' ? null : Number(text)));
        expect(read).toEqual(row.cells.map((cell) => (cell === null ? null : cell + 0)));
      }
    },
  );
});
