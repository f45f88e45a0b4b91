import { fc, test } from '@fast-check/vitest';
import { describe, expect } from 'vitest';
import { firstOrder } from '../../../../engine/paraxial/firstOrder.ts';
import { emptySketch, newGlass, newSurface, newThin } from '../../../../engine/sketch/create.ts';
import { flipParts } from '../../../../engine/sketch/edits/order.ts';
import {
  setGlass,
  setMaterial,
  setShapeFactor,
  setSurface,
  setThickness,
} from '../../../../engine/sketch/edits/parts.ts';
import { scaleSketch } from '../../../../engine/sketch/edits/scale.ts';
import type { GlassPart, Sketch } from '../../../../engine/sketch/types.ts';
import { settingAt } from '../../../../engine/sketch/values.ts';
import { placesOf } from '../../../../engine/train/places.ts';
import { partTrain } from '../../../../engine/train/slice.ts';
import { trainOf } from '../../../../engine/train/train.ts';
import { anySketch } from '../arbitrary.ts';
import { id, ONLY } from '../layout.ts';

const P1 = id('p1');
const P2 = id('p2');

/** An aspheric doublet in front of a thin part. */
function doublet(): Sketch {
  const first: GlassPart = {
    ...newGlass(40, 5, P1),
    surfaces: [{ ...newSurface(40), conic: -0.5, asphere: [1e-6, 2e-9] }, newSurface(-30), newSurface(null)],
    fillings: [
      { thicknessMm: 5, material: { material: 'n-bk7' } },
      { thicknessMm: 2, material: { material: 'f2' } },
    ],
    space: { lengthMm: 10, medium: 'air' },
  };
  return { ...emptySketch(), parts: [first, newThin(80, P2)] };
}

const glassOf = (sketch: Sketch): GlassPart => sketch.parts[0] as GlassPart;

describe('an edit of glass', () => {
  test('changes one surface, one filling, or all of it, and leaves the rest', () => {
    const before = doublet();
    const bent = setSurface(before, P1, 1, { radiusMm: 25 });
    expect(glassOf(bent).surfaces.map(({ radiusMm }) => radiusMm)).toEqual([40, 25, null]);
    expect(glassOf(bent).surfaces[0]).toBe(glassOf(before).surfaces[0]);
    expect(bent.parts[1]).toBe(before.parts[1]);
    expect(glassOf(setThickness(before, P1, 3, 1)).fillings.map((one) => one.thicknessMm)).toEqual([5, 3]);
    const crown = setMaterial(before, P1, { code: '620364' }, 1);
    expect(glassOf(crown).fillings[1]).toEqual({ thicknessMm: 2, material: { code: '620364' } });
    const single = { surfaces: [newSurface(50), newSurface(-50)], fillings: [glassOf(before).fillings[0]!] };
    expect(glassOf(setGlass(before, P1, single))).toMatchObject(single);
  });

  test('of what is not there, or is there already, changes nothing', () => {
    const sketch = doublet();
    expect(setSurface(sketch, P1, 3, { radiusMm: 25 })).toBe(sketch);
    expect(setSurface(sketch, P1, 0, { radiusMm: 40, asphere: [1e-6, 2e-9] })).toBe(sketch);
    expect(setThickness(sketch, P1, 5, 2)).toBe(sketch);
    expect(setMaterial(sketch, P1, { material: 'f2' }, 1)).toBe(sketch);
    expect(setMaterial(sketch, P1, null)).toBe(sketch);
    expect(setSurface(sketch, P2, 0, { radiusMm: 25 })).toBe(sketch);
  });

  test('gives a thin part a glass and a bending, and takes them away', () => {
    const meant = setShapeFactor(setMaterial(doublet(), P2, { material: 'n-sf6' }), P2, 0.5);
    expect(meant.parts[1]).toMatchObject({ material: { material: 'n-sf6' }, shapeFactor: 0.5 });
    expect(setShapeFactor(setMaterial(meant, P2, null), P2, null)).toEqual(doublet());
  });

  test('moves what is behind when the glass grows', () => {
    const places = placesOf(setThickness(doublet(), P1, 8, 0), settingAt(ONLY));
    expect(places.parts.map(({ frontMm }) => frontMm)).toEqual([0, 20]);
  });
});

describe('glass turned round', () => {
  test('has its surfaces and fillings in the other order, centres on the other side', () => {
    const turned = glassOf(flipParts(doublet(), [P1]));
    expect(turned.surfaces.map(({ radiusMm }) => radiusMm)).toEqual([null, 30, -40]);
    expect(turned.surfaces[2]).toMatchObject({ conic: -0.5, asphere: [-1e-6, -2e-9] });
    expect(turned.fillings.map(({ thicknessMm }) => thicknessMm)).toEqual([2, 5]);
    expect(flipParts(flipParts(doublet(), [P1]), [P1])).toEqual(doublet());
  });

  test('keeps its power in air', () => {
    const powerOf = (sketch: Sketch) => {
      const own = partTrain(trainOf(sketch, settingAt(ONLY)), 0);
      const power = own && firstOrder(own).powerPerMm;
      return power?.ok ? power.value : Number.NaN;
    };
    // Some ten roundings of numbers near 0.05.
    expect(powerOf(flipParts(doublet(), [P1]))).toBeCloseTo(powerOf(doublet()), 15);
  });
});

/** Powers of two scale without rounding. */
const SCALING = 1e-12;

test.prop([anySketch({ leastParts: 1 }), fc.constantFrom(0.5, 2, 8)])(
  'scaling a layout scales every surface: sags, gaps and focal lengths by the factor',
  (sketch, factor) => {
    const setting = settingAt(sketch.positions[0]!.id);
    const before = trainOf(sketch, setting);
    const after = trainOf(scaleSketch(sketch, factor), setting);
    for (let k = 0; k < before.count; k++) {
      expect(after.curvature[k]! * factor).toBeCloseTo(before.curvature[k]!, 14);
      expect(after.conic[k]).toBe(before.conic[k]);
      for (let at = before.asphereFrom[k]!; at < before.asphereFrom[k + 1]!; at++) {
        const power = 3 + 2 * (at - before.asphereFrom[k]!);
        const wanted = before.asphere[at]!;
        expect(Math.abs(after.asphere[at]! * factor ** power - wanted)).toBeLessThanOrEqual(
          SCALING * Math.abs(wanted),
        );
      }
    }
  },
);
