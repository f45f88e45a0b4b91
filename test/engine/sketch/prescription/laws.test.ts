import { fc, test } from '@fast-check/vitest';
import { describe, expect } from 'vitest';
import { readPrescription } from '../../../../engine/sketch/prescription/prescription.ts';

const millimetres = fc.integer({ min: 1, max: 99_999 }).map((thousandths) => thousandths / 1000);
const radius = fc.oneof(
  { weight: 5, arbitrary: fc.tuple(millimetres, fc.boolean()).map(([size, left]) => (left ? -size : size)) },
  { weight: 1, arbitrary: fc.constant(null) },
);
const singlets = fc.array(
  fc.record({
    radii: fc.tuple(radius, radius),
    thicknessMm: millimetres,
    index: fc.integer({ min: 1400, max: 2000 }).map((thousandths) => thousandths / 1000),
    gapMm: millimetres,
  }),
  { minLength: 1, maxLength: 8 },
);

const point = (value: number): string => value.toFixed(3);
const comma = (value: number): string => point(value).replace('.', ',');
const styles = fc.constantFrom(
  { separator: '\t', number: point, flat: '∞' },
  { separator: '\t', number: comma, flat: 'flat' },
  { separator: ';', number: comma, flat: 'inf' },
  { separator: ',', number: point, flat: 'plano' },
  { separator: ', ', number: comma, flat: '∞' },
  { separator: '   ', number: comma, flat: '∞' },
  { separator: ' ', number: point, flat: 'inf' },
);

describe('reading a prescription', () => {
  test.prop([singlets, styles])(
    'gives the same lenses however the table is written',
    (lenses, { separator, number, flat }) => {
      const cell = (value: number | null) => (value === null ? flat : number(value));
      const text = lenses
        .flatMap(({ radii: [front, rear], thicknessMm, index, gapMm }) => [
          [front, thicknessMm, index],
          [rear, gapMm, 1],
        ])
        .map((row) => row.map(cell).join(separator))
        .join('\n');
      const { parts, faults } = readPrescription(text);
      expect(faults).toEqual([]);
      expect(
        parts.map((part) => part.kind === 'glass' && [part.surfaces, part.fillings, part.space.lengthMm]),
      ).toMatchObject(
        lenses.map(({ radii: [front, rear], thicknessMm, index, gapMm }) => [
          [{ radiusMm: front }, { radiusMm: rear }],
          [{ thicknessMm, material: { index } }],
          gapMm,
        ]),
      );
    },
  );

  const anyCell = fc.constantFrom(
    '1',
    '-2,5',
    '∞',
    'n',
    'N-BK7',
    '517642',
    'stop',
    'OBJ',
    '',
    '"',
    'é',
    '1e999',
  );
  const anySeparator = fc.constantFrom('\t', ';', ',', ' ', ', ', '\n', '\r\n');
  test.prop([fc.array(fc.tuple(anyCell, anySeparator), { maxLength: 60 })])(
    'never fails: every text has parts or a sentence',
    (pieces) => {
      const { parts, faults, rows, roles } = readPrescription(pieces.flat().join(''));
      expect(parts.length > 0).toBe(faults.length === 0);
      for (const { cells } of rows) expect(cells).toHaveLength(roles.length);
    },
  );
});
