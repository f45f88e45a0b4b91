import { describe, expect, it } from 'vitest';
import { analyse } from '../../../engine/paraxial/analyse.ts';
import { conjugates } from '../../../engine/paraxial/conjugates.ts';
import { heightInSpace, rayThrough } from '../../../engine/paraxial/trace.ts';
import type { Part, Sketch } from '../../../engine/sketch/types.ts';
import { trainOf } from '../../../engine/train/train.ts';
import { given } from '../quantity.ts';
import { onFirst, plate, sketchOf, thin } from '../sketchOf.ts';

const analysed = (parts: readonly Part[], more: Partial<Sketch> = {}) => {
  const sketch = sketchOf(parts, 'p1', more);
  return { sketch, ...analyse(sketch, onFirst(sketch)) };
};
const abbe = (abbeNumber: number) => ({ abbeNumber });

describe('the thin colour', () => {
  it('of one lens is −f/V along the axis, short minus long', () => {
    const { colour } = analysed([thin('p1', 80, 0, abbe(50))]);
    expect(given(colour.axialMm)).toBeCloseTo(-1.6, 13);
    expect(given(colour.lateralMm)).toBeCloseTo(0, 15);
  });

  it('vanishes for a thin achromat', () => {
    const [V1, V2] = [64.17, 36.37];
    const parts = [
      thin('p1', (100 * (V1 - V2)) / V1, 0, abbe(V1)),
      thin('p2', (-100 * (V1 - V2)) / V2, 0, abbe(V2)),
    ];
    expect(given(analysed(parts).colour.axialMm)).toBeCloseTo(0, 12);
  });

  it('is the limit of the differences between traces in the short and the long line', () => {
    // A hundredth of the dispersion leaves the first order: what remains is of the second.
    const weak = 1 / 100;
    const glass = { name: 'glass', index: 1.6, abbeNumber: 40 / weak };
    const parts = [
      thin('p1', 70, 12, abbe(60 / weak)),
      plate('p2', 8, 9, { material: glass }),
      thin('p3', -45, 20, abbe(30 / weak)),
      thin('p4', 38, 0, abbe(55 / weak)),
    ];
    const {
      sketch,
      colour,
      rays,
      train,
      conjugates: main,
    } = analysed(parts, {
      object: { distanceMm: 400, medium: 'air' },
    });
    const [short, long] = (['short', 'long'] as const).map((line) => trainOf(sketch, onFirst(sketch), line));
    if (!short || !long) throw new Error('two lines were asked for');
    const axial = given(conjugates(short).imageDistanceMm) - given(conjugates(long).imageDistanceMm);
    expect(Math.abs(given(colour.axialMm) / axial - 1)).toBeLessThan(weak / 10);
    const plane = given(main.trackMm);
    const chief = given(rays.chief);
    const ends = [short, long].map((coloured) => {
      // The stop rides on the first part, so the chief ray starts alike in every line.
      const ray = rayThrough(coloured, 0, 0, chief.nu[0] ?? 0);
      return heightInSpace(coloured, ray, train.count, plane);
    }) as [number, number];
    expect(Math.abs(given(colour.lateralMm) / (ends[0] - ends[1]) - 1)).toBeLessThan(weak / 10);
  });

  it('adds up from what each surface contributes', () => {
    const { colour } = analysed([
      thin('p1', 70, 12, abbe(60)),
      plate('p2', 8, 9),
      thin('p3', 45, 0, abbe(30)),
    ]);
    const { axialMm, lateralMm } = given(colour.perSurface);
    const sum = (terms: Float64Array | null) => terms?.reduce((total, term) => total + term, 0);
    expect(sum(axialMm)).toBeCloseTo(given(colour.axialMm), 14);
    expect(sum(lateralMm)).toBeCloseTo(given(colour.lateralMm), 14);
    expect(axialMm).toHaveLength(4);
  });

  it('names the parts that it could not count', () => {
    const bare = { material: { name: 'filter', index: 1.5, abbeNumber: null } };
    const parts = [
      thin('p1', 70, 12, abbe(60)),
      thin('p2', 50, 5),
      plate('p3', 2, 5, bare),
      plate('p4', 2, 5),
    ];
    expect(analysed(parts).colour.partsLeftOut).toEqual([1, 2]);
  });

  it('needs an Abbe number and an image', () => {
    expect(analysed([thin('p1', 80)]).colour.axialMm).toEqual({ ok: false, why: 'no Abbe number' });
    const expander = [thin('p1', -50, 150, abbe(60)), thin('p2', 200, 0, abbe(60))];
    const more = { aperture: { kind: 'entrancePupilDiameter', diameterMm: 5 } } as const;
    expect(analysed(expander, more).colour.axialMm).toEqual({ ok: false, why: 'image at infinity' });
  });
});

describe('the Petzval sum', () => {
  it('is the sum of power over index, its radius the negative inverse', () => {
    const { petzval } = analysed([thin('p1', 50, 9, { index: 1.6 }), thin('p2', -40, 9), thin('p3', 60)], {
      assumedIndex: 1.5,
    });
    const sum = 1 / 50 / 1.6 - 1 / 40 / 1.5 + 1 / 60 / 1.5;
    expect(given(petzval.sumPerMm)).toBeCloseTo(sum, 16);
    expect(given(petzval.radiusMm)).toBeCloseTo(-1 / sum, 10);
    expect(petzval.perSurface[0]).toBeCloseTo(1 / 80, 16);
  });

  it('says that the field is flat when equal powers cancel', () => {
    const { petzval } = analysed([thin('p1', 50, 20), thin('p2', -50)]);
    expect(petzval.radiusMm).toEqual({ ok: false, why: 'flat field' });
    expect(given(petzval.sumPerMm)).toBe(0);
  });
});
