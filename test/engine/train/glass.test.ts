import { describe, expect, it } from 'vitest';
import { airIndex } from '../../../engine/media/air.ts';
import { indexOf } from '../../../engine/media/medium.ts';
import { firstOrder } from '../../../engine/paraxial/firstOrder.ts';
import { emptySketch, LINES, newGlass, newSurface, newThin } from '../../../engine/sketch/create.ts';
import type { GlassPart, Line, Sketch } from '../../../engine/sketch/types.ts';
import { settingAt } from '../../../engine/sketch/values.ts';
import { conicEdge, sagAt } from '../../../engine/train/profile.ts';
import { partTrain } from '../../../engine/train/slice.ts';
import { trainOf } from '../../../engine/train/train.ts';
import { id, ONLY } from '../sketch/layout.ts';

const doublet: GlassPart = {
  ...newGlass(40, 5, id('p1')),
  semiDiameterMm: 9,
  surfaces: [
    { ...newSurface(40), conic: -0.5, asphere: [1e-6, 2e-9] },
    { ...newSurface(-30), semiDiameterMm: 8 },
    newSurface(null),
  ],
  fillings: [
    { thicknessMm: 5, material: { material: 'n-bk7' } },
    { thicknessMm: 2, material: { material: 'f2' } },
  ],
  space: { lengthMm: 10, medium: 'air' },
};
const sketch: Sketch = { ...emptySketch(), parts: [newThin(80, id('p0')), doublet, newThin(80, id('p2'))] };
const at = (of: Sketch, line: Line = 'main') => trainOf(of, settingAt(ONLY), line);
const indexAt = (material: string, nm: number) => {
  const known = indexOf({ material }, nm, LINES.d, 'unity');
  return known.ok ? known.value : Number.NaN;
};

describe('the train of glass', () => {
  it('has a surface for each of the part, with its shape, rim and index', () => {
    const train = at(sketch);
    expect([...train.partOf]).toEqual([0, 1, 1, 1, 2]);
    expect([...train.gap]).toEqual([0, 5, 2, 10, 0]);
    expect([...train.curvature]).toEqual([0, 1 / 40, -1 / 30, 0, 0]);
    expect([...train.conic]).toEqual([0, -0.5, 0, 0, 0]);
    expect([...train.asphere]).toEqual([1e-6, 2e-9]);
    expect([...train.asphereFrom]).toEqual([0, 0, 2, 2, 2, 2]);
    expect([...train.semiDiameter]).toEqual([Infinity, 9, 8, 9, Infinity]);
    expect(train.index[2]).toBe(indexAt('n-bk7', LINES.d.mainNm));
    expect(train.indexSpread[3]).toBe(indexAt('f2', LINES.d.shortNm) - indexAt('f2', LINES.d.longNm));
  });

  it('takes each line’s own index, the further lines too', () => {
    const lit = { ...sketch, lines: { ...sketch.lines, more: [{ wavelengthNm: 435.8343, weight: 1 }] } };
    expect(at(lit, 'short').index[2]).toBe(indexAt('n-bk7', LINES.d.shortNm));
    expect(at(lit, 'fourth').index[2]).toBe(indexAt('n-bk7', 435.8343));
  });

  it('carries the stop on its first surface', () => {
    expect(at({ ...sketch, stop: id('p1') }).stopSurface).toBe(1);
  });

  it('in standard air refracts as in air of unity: the index of air counts once', () => {
    const real = at({ ...sketch, air: 'standard' });
    const air = airIndex(LINES.d.mainNm) ?? Number.NaN;
    expect(real.index[0]).toBe(air);
    // One multiplication and one division.
    expect(real.index[2]! / real.index[1]!).toBeCloseTo(indexAt('n-bk7', LINES.d.mainNm), 15);
  });

  it('by itself has the focal length of the part alone', () => {
    const own = partTrain(at(sketch), 1);
    const alone = at({ ...emptySketch(), parts: [doublet] });
    expect(own && firstOrder(own).focalLengthMm).toEqual(firstOrder(alone).focalLengthMm);
    expect(own && [...own.asphere]).toEqual([1e-6, 2e-9]);
    expect(partTrain(at(sketch), 7)).toBeNull();
  });
});

describe('a thin part with a glass', () => {
  const thin = (material: string | null, abbeNumber: number | null = null): Sketch => ({
    ...emptySketch(),
    parts: [{ ...newThin(50), abbeNumber, material: material === null ? null : { material } }],
  });

  it('changes its power as n − 1 of that glass', () => {
    const power = (line: Line) => at(thin('n-sf6'), line).thinPower[0]!;
    const excess = (nm: number) => indexAt('n-sf6', nm) - 1;
    expect(power('main')).toBe(1 / 50);
    expect(power('short')).toBeCloseTo((excess(LINES.d.shortNm) / excess(LINES.d.mainNm)) * 0.02, 16);
    expect(at(thin('n-sf6')).powerSpread[0]).toBeCloseTo(power('short') - power('long'), 16);
  });

  it('spreads as its Abbe number says: φ/V, V of the catalogue', () => {
    // N-BK7: V = 64.167 (materials.json), so the spread is φ/V to the digits of V.
    expect(at(thin('n-bk7')).powerSpread[0]).toBeCloseTo(1 / 50 / 64.16734, 9);
  });
});

describe('the profile of a surface', () => {
  const sphere = { curvaturePerMm: 1 / 10, conic: 0, asphere: [] };

  it('is that of the circle, the parabola and the plane', () => {
    expect(sagAt(sphere, 6)).toBeCloseTo(2, 15);
    expect(sagAt({ ...sphere, conic: -1 }, 6)).toBeCloseTo(36 / 20, 15);
    expect(sagAt({ ...sphere, curvaturePerMm: 0 }, 6)).toBe(0);
    expect(sagAt({ ...sphere, curvaturePerMm: 0, asphere: [1e-3, 1e-5] }, 2)).toBeCloseTo(
      1e-3 * 16 + 1e-5 * 64,
      15,
    );
  });

  it('ends at the equator, and a paraboloid never', () => {
    expect(conicEdge(sphere)).toBe(10);
    expect(sagAt(sphere, 10)).toBe(10);
    expect(sagAt(sphere, 10.001)).toBeNull();
    expect(conicEdge({ ...sphere, conic: -1 })).toBe(Infinity);
    expect(conicEdge({ ...sphere, conic: 3 })).toBe(5);
    expect(sagAt({ ...sphere, asphere: [1e300, 1e300] }, 1e9)).toBeNull();
  });
});
