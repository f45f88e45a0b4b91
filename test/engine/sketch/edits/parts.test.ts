import { describe, expect, test } from 'vitest';
import { newPlate } from '../../../../engine/sketch/create.ts';
import { insertPart } from '../../../../engine/sketch/edits/insert.ts';
import {
  flipSign,
  renamePart,
  setAbbeNumber,
  setFocalLength,
  setIndex,
  setMaterial,
  setNote,
  setRoom,
  setSemiDiameter,
  setThickness,
} from '../../../../engine/sketch/edits/parts.ts';
import { propose, unsettled } from '../../../../engine/sketch/propose.ts';
import { id, ONLY, row } from '../layout.ts';

const P1 = id('p1');
const PLATE = id('p3');
const glazed = () => insertPart(row(10, 20), newPlate(2, PLATE), 4, ONLY);

describe('a number of one part', () => {
  test('is set and leaves the other parts as they are', () => {
    const before = row(10, 20);
    const after = setRoom(setRoom(setFocalLength(before, P1, -80), P1, 'front', 2), P1, 'behind', 3);
    const described = setIndex(setAbbeNumber(setSemiDiameter(after, P1, 9), P1, 60), P1, 1.6);
    expect(setNote(renamePart(described, P1, 'first group'), P1, 'stock').parts[0]).toEqual({
      kind: 'thin',
      id: 'p1',
      name: 'first group',
      note: 'stock',
      semiDiameterMm: 9,
      focalLengthMm: -80,
      abbeNumber: 60,
      index: 1.6,
      material: null,
      shapeFactor: null,
      roomFrontMm: 2,
      roomBehindMm: 3,
      space: { lengthMm: 10, medium: 'air' },
    });
    expect(after.parts[1]).toBe(before.parts[1]);
  });

  test('changes sign only when it is told to', () => {
    expect(flipSign(row(10), P1).parts[0]).toMatchObject({ focalLengthMm: -50 });
  });

  test('of a plate is its thickness or its material', () => {
    const flint = { name: 'flint', index: 1.62, abbeNumber: 36.4 };
    expect(setMaterial(setThickness(glazed(), PLATE, 5), PLATE, flint).parts[1]).toMatchObject({
      thicknessMm: 5,
      material: flint,
      space: { lengthMm: 4 },
    });
  });

  test('is left alone on a part of another kind, on none, or when it is there already', () => {
    const sketch = glazed();
    expect(setFocalLength(sketch, PLATE, 10)).toBe(sketch);
    expect(setThickness(sketch, P1, 10)).toBe(sketch);
    expect(setFocalLength(sketch, id('p9'), 10)).toBe(sketch);
    expect(setFocalLength(sketch, P1, 50)).toBe(sketch);
    expect(renamePart(sketch, P1, '')).toBe(sketch);
  });

  test.each([0, Number.NaN, Infinity, 1e300, 1e-9])(
    'as a focal length of %d mm is refused',
    (focalLengthMm) => {
      const before = row(10, 20);
      const proposal = propose(before, (sketch) => setFocalLength(sketch, P1, focalLengthMm), unsettled);
      expect(proposal.sketch).toBe(before);
      expect(proposal.note?.faults.map((fault) => fault.path)).toEqual(['parts[0].focalLengthMm']);
    },
  );
});
