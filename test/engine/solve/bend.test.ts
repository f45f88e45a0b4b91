import { describe, expect, it } from 'vitest';
import { analyse } from '../../../engine/paraxial/analyse.ts';
import { firstOrder } from '../../../engine/paraxial/firstOrder.ts';
import { newGlass, newSurface } from '../../../engine/sketch/create.ts';
import type { GlassPart, PartId, Sketch } from '../../../engine/sketch/types.ts';
import { settingAt } from '../../../engine/sketch/values.ts';
import { bendGlass, bendGlassToShape, shapeOfGlass } from '../../../engine/solve/bend.ts';
import { partTrain } from '../../../engine/train/slice.ts';
import { trainOf } from '../../../engine/train/train.ts';
import { onFirst, sketchOf, thin } from '../sketchOf.ts';

const ID = 'g' as PartId;

const singlet = (more: Partial<GlassPart> = {}): GlassPart => ({
  ...newGlass(50, 6, ID),
  space: { lengthMm: 20, medium: 'air' },
  ...more,
});

const pair = (): GlassPart =>
  singlet({
    surfaces: [newSurface(61.47), newSurface(-44.64), newSurface(-129.94)],
    fillings: [
      { thicknessMm: 6, material: { material: 'n-bk7' } },
      { thicknessMm: 2.5, material: { material: 'n-sf5' } },
    ],
  });

/** The glass between two thin elements, 30 mm behind the first. */
const between = (glass: GlassPart): Sketch =>
  sketchOf([thin('a', -80, 30), glass, thin('b', 120)], 'a', {
    object: { distanceMm: 250, medium: 'air' },
  });

const focalLengthOf = (sketch: Sketch): number => {
  const index = sketch.parts.findIndex(({ id }) => id === ID);
  const own = partTrain(trainOf(sketch, onFirst(sketch)), index);
  const focal = own && firstOrder(own).focalLengthMm;
  if (!focal?.ok) throw new Error('the glass has a focal length');
  return focal.value;
};

const bent = (sketch: Sketch, curvature: number): Sketch => {
  const made = bendGlass(sketch, ID, curvature);
  if (!made.ok) throw new Error(made.why);
  return made.value.sketch;
};

const glassOf = (sketch: Sketch): GlassPart => {
  const glass = sketch.parts.find(({ id }) => id === ID);
  if (glass?.kind !== 'glass') throw new Error('the glass is there');
  return glass;
};

/** Rounding of a few sums, relative. */
const ROUNDING = 1e-13;

describe('bending glass at constant power', () => {
  it.each([
    ['a singlet', singlet()],
    ['a cemented pair', pair()],
  ])('keeps the focal length of %s and its place in the paraxial layout', (_name, glass) => {
    const sketch = between(glass);
    const before = analyse(sketch, onFirst(sketch));
    for (const curvature of [-0.02, 0, 0.013, 0.04]) {
      const after = bent(sketch, curvature);
      expect(glassOf(after).surfaces[0]?.radiusMm ?? Infinity).toBeCloseTo(1 / curvature || Infinity, 9);
      expect(Math.abs(focalLengthOf(after) / focalLengthOf(sketch) - 1)).toBeLessThan(ROUNDING);
      const analysis = analyse(after, onFirst(after));
      for (const which of ['magnification', 'imageDistanceMm'] as const) {
        const [was, is] = [before.conjugates[which], analysis.conjugates[which]];
        expect(was.ok && is.ok && Math.abs(is.value / was.value - 1)).toBeLessThan(1e-11);
      }
    }
  });

  it('makes an equi-convex lens plano-convex as the lens maker’s formula says', () => {
    // Flat in front: the power is that of the rear surface alone, R2 = −(n − 1) f.
    const sketch = sketchOf([singlet()], ID);
    const after = bent(sketch, 0);
    const n = trainOf(sketch, onFirst(sketch)).index[1] ?? 1;
    expect(glassOf(after).surfaces[0]?.radiusMm).toBeNull();
    expect(glassOf(after).surfaces[1]?.radiusMm).toBeCloseTo(-(n - 1) * focalLengthOf(sketch), 10);
  });

  it('bends the cemented surface along and leaves shapes and rims alone', () => {
    const shaped = pair();
    const surfaces = shaped.surfaces.with(2, { ...newSurface(-129.94), conic: -0.5, semiDiameterMm: 9 });
    const after = glassOf(bent(sketchOf([{ ...shaped, surfaces }], ID), 1 / 61.47 + 0.004));
    expect(1 / (after.surfaces[1]?.radiusMm ?? 1)).toBeCloseTo(1 / -44.64 + 0.004, 12);
    expect(after.surfaces[2]).toMatchObject({ conic: -0.5, semiDiameterMm: 9 });
    expect(after.fillings).toEqual(shaped.fillings);
  });

  it('comes back from where it was bent to', () => {
    const sketch = between(pair());
    const back = glassOf(bent(bent(sketch, 0.05), 1 / 61.47));
    for (const [k, radius] of [61.47, -44.64, -129.94].entries())
      expect(back.surfaces[k]?.radiusMm).toBeCloseTo(radius, 9);
  });

  it('changes the gaps at every position by the same', () => {
    const sketch: Sketch = {
      ...between(singlet()),
      positions: [
        { id: 'near' as never, name: 'near' },
        { id: 'far' as never, name: 'far' },
      ],
    };
    const moved = { ...singlet(), space: { lengthMm: { near: 20, far: 35 }, medium: 'air' as const } };
    const split = { ...sketch, parts: sketch.parts.with(1, moved as GlassPart) };
    const after = glassOf(bent(split, 0.03)).space.lengthMm as unknown as { near: number; far: number };
    expect(after.far - after.near).toBeCloseTo(15, 12);
    expect(analyse(split, settingAt('far' as never)).conjugates.magnification).toMatchObject({ ok: true });
  });

  it('gives the same sketch for the bending that is there', () => {
    const sketch = between(singlet());
    expect(bent(sketch, 1 / 50)).toBe(sketch);
  });

  it('reaches a wanted shape factor, also of a cemented pair', () => {
    for (const glass of [singlet(), pair()])
      for (const q of [-2, -1, 0, 0.7, 1, 3]) {
        const made = bendGlassToShape(between(glass), ID, q);
        if (!made.ok) throw new Error(made.why);
        expect(shapeOfGlass(glassOf(made.value.sketch))).toBeCloseTo(q, 9);
        expect(focalLengthOf(made.value.sketch) / focalLengthOf(between(glass))).toBeCloseTo(1, 12);
      }
  });

  it('says why there is none: no glass, no power, nothing that the last surface could do', () => {
    expect(bendGlass(between(singlet()), 'a' as PartId, 0.1)).toEqual({ ok: false, why: 'no such part' });
    const window = singlet({ surfaces: [newSurface(null), newSurface(null)] });
    expect(bendGlass(sketchOf([window], ID), ID, 0.1)).toEqual({ ok: false, why: 'no power' });
    // The ray crosses the axis on the last surface: n/((n − 1) t) in front.
    const n = trainOf(sketchOf([singlet()], ID), onFirst(sketchOf([singlet()], ID))).index[1] ?? 1;
    const made = bendGlass(sketchOf([singlet()], ID), ID, n / ((n - 1) * 6));
    expect(made).toEqual({ ok: false, why: 'no such radii' });
  });
});
