import { describe, expect, test } from 'vitest';
import { emptySketch, newThin } from '../../../../engine/sketch/create.ts';
import {
  insertPrescription,
  looksLikePrescription,
  type Prescription,
  readPrescription,
} from '../../../../engine/sketch/prescription/prescription.ts';
import { faultsOf } from '../../../../engine/sketch/rules.ts';
import type { PartId } from '../../../../engine/sketch/types.ts';

/** Radii of each part, thickness and medium of each filling, and the gap behind it. */
const told = ({ parts, faults }: Prescription) =>
  faults.length > 0
    ? faults
    : parts.map((part) =>
        part.kind === 'glass'
          ? [
              part.surfaces.map(({ radiusMm }) => radiusMm),
              part.fillings.map(({ thicknessMm, material }) => [thicknessMm, shortly(material)]),
              part.space.lengthMm,
            ]
          : [part.kind, part.space.lengthMm],
      );

const shortly = (material: object): unknown => {
  if ('index' in material && 'abbeNumber' in material)
    return material.abbeNumber === null ? material.index : [material.index, material.abbeNumber];
  return Object.values(material)[0];
};

const SINGLET = [[[50, -50], [[5, 1.5]], 47.5]];

describe('a pasted table of one lens', () => {
  test.each([
    ['tabs', '50\t5\t1.5\n-50\t47.5\t1'],
    ['semicolons', '50;5;1.5\n-50;47.5;1'],
    ['commas', '50,5,1.5\n-50,47.5,1'],
    ['commas with blanks', '50, 5, 1.5\n-50, 47.5, 1'],
    ['blanks', '  50 5   1.5\n -50   47.5  1'],
    ['tabs and decimal commas', '50,0\t5\t1,5\n-50,0\t47,5\t1'],
    ['semicolons and decimal commas', '50,0;5;1,5\n-50,0;47,5;1'],
    ['blanks and decimal commas', '50,0 5 1,5\n-50,0 47,5 1'],
    ['commas with blanks and decimal commas', '50,0, 5, 1,5\n-50,0, 47,5, 1'],
    ['quotes', '"50","5","1.5"\n"-50","47.5","1"'],
    ['printed minus signs, units and lines of Windows', '50 mm;5 mm;1.5\r\n\u221250 mm;47.5 mm;air\r\n'],
    ['numbers of the surfaces in front', '1 50 5 1.5\n2 -50 47.5 1'],
    ['an empty cell for air', '50\t5\t1.5\n-50\t47.5\t'],
    ['a missing cell for air', '50 5 1.5\n-50 47.5'],
  ])('is read with %s', (_, text) => {
    expect(told(readPrescription(text))).toEqual(SINGLET);
  });

  test.each(['∞', '-∞', 'inf', 'Infinity', 'flat', 'Plano', 'plane', '0', '1e20'])(
    'takes %s for a flat surface',
    (flat) => {
      expect(told(readPrescription(`${flat}\t5\t1.5\n-50\t10\t1`))).toEqual([[[null, -50], [[5, 1.5]], 10]]);
    },
  );

  test('leaves the last distance open when it is infinite or missing', () => {
    expect(told(readPrescription('50 5 1.5\n-50 inf'))).toEqual([[[50, -50], [[5, 1.5]], 0]]);
    expect(told(readPrescription('50 5 1.5\n-50'))).toEqual([[[50, -50], [[5, 1.5]], 0]]);
  });

  test.each([
    ['N-BK7', 'n-bk7'],
    ['bk7', 'n-bk7'],
    ['SF6', 'sf6'],
    ['n sf6', 'n-sf6'],
    ['517642', '517642'],
    ['517/642', '517642'],
    ['517.642', '517642'],
    ['1.5168', 1.5168],
  ])('takes %s for a glass', (typed, medium) => {
    expect(told(readPrescription(`50\t5\t${typed}\n-50\t10\tair`))).toEqual([[[50, -50], [[5, medium]], 10]]);
  });

  test('takes a fourth column for Abbe numbers only where they can be', () => {
    expect(readPrescription('50 5 1.5 60\n-50 10 1').roles).toEqual([
      'radius',
      'thickness',
      'medium',
      'abbe',
    ]);
    expect(readPrescription('50 5 1.5 60\n-50 10 1 60').roles[3]).toBe('unused');
    expect(readPrescription('50 5 1.5 9\n-50 10 1').roles[3]).toBe('unused');
  });
});

describe('a heading', () => {
  test('says what the columns hold, in any order', () => {
    const text = 'No.\tGlass\tRadius (mm)\tSemi-diameter\tDistance\n1\tN-BK7\t50\t8\t5\n2\t\t-50\t7\t10';
    const read = readPrescription(text);
    expect(read.roles).toEqual(['number', 'medium', 'radius', 'semiDiameter', 'thickness']);
    expect(told(read)).toEqual([[[50, -50], [[5, 'n-bk7']], 10]]);
    const [part] = read.parts;
    expect(part?.kind === 'glass' && part.surfaces.map(({ semiDiameterMm }) => semiDiameterMm)).toEqual([
      8, 7,
    ]);
  });

  test('names index, Abbe number, clear diameter and conic constant', () => {
    const read = readPrescription('r d nd vd Diameter conic\n50 5 1.5 60 16 -1\n-50 10 1 0 14 0');
    expect(told(read)).toEqual([[[50, -50], [[5, [1.5, 60]]], 10]]);
    const [part] = read.parts;
    expect(part?.kind === 'glass' && part.surfaces).toMatchObject([
      { semiDiameterMm: 8, conic: -1 },
      { semiDiameterMm: 7, conic: 0 },
    ]);
  });

  test('keeps the name of a glass whose index stands beside it', () => {
    const read = readPrescription('radius;thickness;glass;nd\n50;5;N-BK7;1.5168\n-50;10;;1');
    expect(told(read)).toEqual([[[50, -50], [[5, 'n-bk7']], 10]]);
  });

  test('that names nothing known leaves the order of such tables', () => {
    expect(told(readPrescription('Objective, first form\n50 5 1.5\n-50 47.5'))).toEqual(SINGLET);
  });
});

describe('a table of several lenses', () => {
  test('makes a part of each run of glass, with the air between them', () => {
    const text = '50 5 1.5 60\n-40 2 1.6 36\n-90 3 1\n30 4 1.5 60\nflat 20 1';
    expect(told(readPrescription(text))).toEqual([
      [
        [50, -40, -90],
        [
          [5, [1.5, 60]],
          [2, [1.6, 36]],
        ],
        3,
      ],
      [[30, null], [[4, [1.5, 60]]], 20],
    ]);
  });

  test('leaves object and image out, keeps a stop in air, and counts the distance of other planes in air', () => {
    const text =
      'OBJ inf 100 air\n1 50 5 1.5\n2 -50 2 air\n3 inf 3 air\nSTO inf 4 air\n5 30 4 1.5\n6 inf 20 air\nIMA inf 0';
    const read = readPrescription(text);
    expect(told(read)).toEqual([
      [[50, -50], [[5, 1.5]], 5],
      ['stop', 4],
      [[30, null], [[4, 1.5]], 20],
    ]);
    expect(read.remarks).toEqual([
      'Line 1 is the object and is left out.',
      'Line 8 is the image and is left out.',
      'Line 4 has air on both sides and is left out; its distance is kept.',
    ]);
    expect(insertPrescription(emptySketch(), read, null).stop).toBe('p2');
  });
});

describe('what cannot be read', () => {
  test.each([
    ['50 5 1.5\nabc 10 1', 'Line 2: “abc” is no radius; it must be a number, or ∞ or flat for a plane.'],
    ['50 x 1.5\n-50 10 1', 'Line 1: “x” is no thickness; it must be a number.'],
    ['50\t\t1.5\n-50\t10\t1', 'Line 1: the thickness is missing.'],
    [
      '50 5 XY99\n-50 10 1',
      'Line 1: “XY99” is no glass of the catalogue; give its six-digit code, or its index with an Abbe number.',
    ],
    ['50 5 0.5\n-50 10 1', 'Line 1: “0.5” is no index; it must be between 1 and 5.'],
    ['50 5 mirror\n-50 10 1', 'Line 1: “mirror”: mirrors are not among the parts.'],
    ['50 5 1.5\n-50 10 1.6', 'Line 2 is the last and has glass behind it; a surface to air must follow.'],
    ['50 5 1\n-50 10 1', 'No line has glass behind it.'],
    [
      '50.0\t1,234\t1.5\n-50.0\t10\t1',
      'Line 1: “1,234” has a comma where other numbers have a point; write both the same way.',
    ],
    ['', 'Paste or type a table: radius, thickness, and index or glass, one surface a line.'],
    ['nothing of the kind', 'No line holds a surface: radius, thickness, and index or glass.'],
  ])('%j has its sentence', (text, sentence) => {
    const read = readPrescription(text);
    expect(read.faults).toContain(sentence);
    expect(read.parts).toEqual([]);
    expect(insertPrescription(emptySketch(), read, null)).toEqual(emptySketch());
  });

  test('shows each cell with its reading', () => {
    const { rows } = readPrescription('∞ 5 517642\n-66,137 x');
    expect(rows.map(({ becomes, cells }) => [becomes, ...cells.map(({ words }) => words)])).toEqual([
      ['surface 1', 'flat', '5 mm', 'glass code 517642'],
      ['surface 2', '−66.137 mm', 'not read', 'air'],
    ]);
  });

  test('yields to the user, who knows what a column holds', () => {
    const read = readPrescription('50 5 1.5 8\n-50 10 1 7', ['radius', 'thickness', 'medium', 'diameter']);
    const [part] = read.parts;
    expect(part?.kind === 'glass' && part.surfaces.map(({ semiDiameterMm }) => semiDiameterMm)).toEqual([
      4, 3.5,
    ]);
    expect(readPrescription('50 5 1.5', ['radius', 'thickness', 'unused']).faults).toContain(
      'No column is taken for the index or glass.',
    );
  });
});

describe('the parts of a table', () => {
  const read = readPrescription('50 5 N-BK7\n-50 3\n30 4 N-SF5\n-30 47.5');

  test('stand alone in an empty sketch and keep the last distance', () => {
    const sketch = insertPrescription(emptySketch(), read, null);
    expect(sketch.parts.map(({ id, space }) => [id, space.lengthMm])).toEqual([
      ['p1', 3],
      ['p2', 47.5],
    ]);
    expect(sketch.stop).toBe('p1');
    expect(faultsOf(sketch)).toEqual([]);
  });

  test('come behind a part with a nominal gap, and what was behind it keeps its distance', () => {
    const first = { ...newThin(100), space: { lengthMm: 7, medium: 'air' as const } };
    const before = { ...emptySketch(), parts: [first, newThin(50, 'p2' as PartId)] };
    const sketch = insertPrescription(before, read, first.id);
    expect(sketch.parts.map(({ id, space }) => [id, space.lengthMm])).toEqual([
      ['p1', 10],
      ['p3', 3],
      ['p4', 7],
      ['p2', 0],
    ]);
  });

  test('are told from other texts', () => {
    expect(looksLikePrescription('50 5 N-BK7\n-50 3')).toBe(true);
    expect(looksLikePrescription('radius thickness glass\n50 5 N-BK7\n-50 3 air\n20 4 XY99\n-20 5 air')).toBe(
      true,
    );
    expect(looksLikePrescription('A sentence of 12 words.\nAnd another.')).toBe(false);
    expect(looksLikePrescription('1\n2\n3')).toBe(false);
    expect(looksLikePrescription('')).toBe(false);
  });
});
