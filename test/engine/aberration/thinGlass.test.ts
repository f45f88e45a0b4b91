import { describe, expect, it } from 'vitest';
import { seidel } from '../../../engine/aberration/seidel.ts';
import { SUM_NAMES } from '../../../engine/aberration/sums.ts';
import { thinGlassOf } from '../../../engine/aberration/thinGlass.ts';
import { referenceRays } from '../../../engine/paraxial/rays.ts';
import type { PartId, Sketch } from '../../../engine/sketch/types.ts';
import { bendingOf } from '../../../engine/solve/bending.ts';
import { thickenPart } from '../../../engine/solve/thicken.ts';
import { apertureAt } from '../../../engine/train/places.ts';
import { trainOf } from '../../../engine/train/train.ts';
import { given } from '../quantity.ts';
import { diaphragm, GLASS, onFirst, plate, sketchOf, thin } from '../sketchOf.ts';

function sumsOf(sketch: Sketch) {
  const train = trainOf(sketch, onFirst(sketch));
  const rays = referenceRays(train, apertureAt(sketch, onFirst(sketch)), sketch.field.size);
  return given(seidel(train, rays, thinGlassOf(sketch, train)));
}

describe('the glass of thin parts', () => {
  it('is the chosen one, else the own index, else the assumed one', () => {
    const sketch = sketchOf(
      [
        thin('a', 100, 5, { material: GLASS, shapeFactor: 0.5, index: 1.9 }),
        plate('b', 3, 5),
        thin('c', 100, 5, { index: 1.7 }),
        diaphragm('d', 5),
        thin('e', 100, 5, { shapeFactor: -1 }),
      ],
      'd',
      { assumedIndex: 1.6 },
    );
    const glass = thinGlassOf(sketch, trainOf(sketch, onFirst(sketch)));
    expect(glass.index).toEqual([1.5, null, null, 1.7, null, 1.6]);
    expect(glass.shapeFactor).toEqual([0.5, null, null, null, null, -1]);
    const standard = { ...sketch, air: 'standard' as const };
    const inAir = thinGlassOf(standard, trainOf(standard, onFirst(standard)));
    expect((inAir.index[5] ?? 0) / 1.6).toBeCloseTo(1.000277, 5);
  });

  it.each(['unity', 'standard'] as const)(
    'tells in air of %s what the glass will add once it is there',
    (air) => {
      const sketch = sketchOf(
        [
          thin('a', 80, 20, { material: { material: 'n-bk7' }, shapeFactor: 0.6 }),
          thin('b', -60, 15, { material: { material: 'f2' }, shapeFactor: -0.4 }),
          diaphragm('s', 5),
          thin('c', 45, 0, { material: { material: 'n-bk7' }, shapeFactor: -0.9 }),
        ],
        's',
        { air, aperture: { kind: 'entrancePupilDiameter', diameterMm: 10 } },
      );
      const thinSums = sumsOf(sketch);
      expect(thinSums.partsLeftOut).toEqual([]);
      let glass = sketch;
      for (const part of sketch.parts) {
        if (part.kind !== 'thin' || part.material === null) continue;
        const bending = bendingOf(part.shapeFactor ?? 0);
        // As good as thin.
        const thickness = { kind: 'centre', thicknessMm: 1e-6 } as const;
        const recipe = { kind: 'singlet', material: part.material, bending, thickness } as const;
        glass = given(thickenPart(glass, part.id as PartId, recipe)).sketch;
      }
      const solid = sumsOf(glass);
      const scale = Math.max(...SUM_NAMES.slice(0, 5).map((name) => solid.absolute[name]));
      for (const name of SUM_NAMES.slice(0, 5))
        expect(Math.abs(thinSums.totals[name] - solid.totals[name])).toBeLessThanOrEqual(1e-6 * scale);

      for (const name of ['axialColour', 'lateralColour'] as const)
        expect(thinSums.totals[name]).toBeCloseTo(solid.totals[name], 8);
    },
  );
});
