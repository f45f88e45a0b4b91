import { describe, expect, it } from 'vitest';
import {
  type BendingChoice,
  bentToBest,
  firstWish,
  hasBestForm,
  semiFor,
  thickened,
} from '../../../../app/panels/part/thickenWish.ts';
import type { PartId, Sketch, ThinPart } from '../../../../engine/index.ts';
import { analyse, faultsOf, settingAt, shapeOfGlass } from '../../../../engine/index.ts';
import { inspectionZoom } from '../../../engine/demo.ts';
import { cementedPair, glassIn, withGlass } from '../../drawing/glassSketch.ts';
import { readingOf } from '../../reading.ts';

const demo = inspectionZoom();
const thinOf = (index: number): ThinPart => {
  const part = demo.parts[index];
  if (part?.kind !== 'thin') throw new Error('the demo is thin');
  return part;
};
const focalLength = (sketch: Sketch, position: Sketch['positions'][number]) => {
  const { focalLengthMm } = analyse(sketch, settingAt(position.id)).firstOrder;
  return focalLengthMm.ok ? focalLengthMm.value : Number.NaN;
};

const BENDINGS: readonly BendingChoice[] = [
  'equi',
  'flat behind',
  'flat in front',
  'least spherical',
  'zero coma',
  'number',
];

describe('thickening from the card', () => {
  it.each([0, 1, 2, 3])('begins with a lens that can be made, for group %s of the demo', (index) => {
    const reading = readingOf(demo);
    const part = thinOf(index);
    const wish = firstWish(reading, part);
    for (const kind of ['singlet', 'cemented pair'] as const) {
      const made = thickened({ ...wish, kind }, reading, part.id);
      if (!made.ok) throw new Error(made.why);
      expect(faultsOf(made.value.sketch)).toEqual([]);
      expect(made.value.notes.length).toBeGreaterThan(1);
      for (const position of demo.positions)
        expect(focalLength(made.value.sketch, position)).toBeCloseTo(focalLength(demo, position), 9);
    }
  });

  it.each(BENDINGS)('bends it %s', (bending) => {
    const reading = readingOf(demo);
    const part = thinOf(3);
    const wish = { ...firstWish(reading, part), bending, shapeFactor: 0.6 };
    const made = thickened(wish, reading, part.id);
    if (!made.ok) throw new Error(made.why);
    const q = shapeOfGlass(glassIn(made.value.sketch));
    const wanted = { equi: 0, 'flat behind': 1, 'flat in front': -1, number: 0.6 } as const;
    if (bending in wanted) expect(q).toBeCloseTo(wanted[bending as keyof typeof wanted], 9);
    else expect(Math.abs(q ?? 99)).toBeLessThan(4);
  });

  it('curves equal radii either way', () => {
    const reading = readingOf(demo);
    const part = thinOf(3);
    const radii = (bending: BendingChoice) => {
      const wish = { ...firstWish(reading, part), bending, thickness: 'centre', thicknessMm: 8 } as const;
      const made = thickened(wish, reading, part.id);
      if (!made.ok) throw new Error(made.why);
      return glassIn(made.value.sketch).surfaces.map(({ radiusMm }) => radiusMm ?? Number.NaN);
    };
    const [front = 0, rear = 0] = radii('equal radii, centres right');
    expect(front).toBeGreaterThan(0);
    expect(rear).toBeCloseTo(front, 9);
    expect(radii('equal radii, centres left')[0]).toBeCloseTo(-front, 9);
  });

  it('says why there is no such glass', () => {
    const reading = readingOf(demo);
    const part = thinOf(0);
    const wish = { ...firstWish(reading, part), kind: 'cemented pair' } as const;
    const same = { ...wish, materials: [wish.materials[0], wish.materials[0]] as const };
    const made = thickened(same, reading, part.id);
    expect(made.ok ? '' : made.why).toMatch(/^Colour cannot be cancelled/);
  });

  it('is made wide enough for every position', () => {
    const widest = semiFor({ sketch: demo }, 'p1' as PartId);
    for (const position of demo.positions) {
      const need = analyse(demo, settingAt(position.id)).clear[0]?.neededMm;
      expect(need?.ok && need.value <= widest).toBe(true);
    }
    expect(semiFor({ sketch: withGlass() }, 'p2' as PartId)).toBe(12);
  });
});

describe('best forms', () => {
  it('are for single lenses alone', () => {
    expect(hasBestForm(thinOf(0))).toBe(true);
    expect(hasBestForm(cementedPair())).toBe(false);
    expect(hasBestForm(undefined)).toBe(false);
  });

  it('are remembered by a thin part, and bend glass at constant power', () => {
    const reading = readingOf(demo);
    const part = thinOf(3);
    const thin = bentToBest(reading, part, 'least spherical');
    const meant = thin.ok ? thin.value.parts[3] : undefined;
    const q = meant?.kind === 'thin' ? meant.shapeFactor : null;
    expect(q).not.toBeNull();
    const material = { material: 'n-bk7' };
    const glazed = { ...demo, parts: demo.parts.with(3, { ...part, material }) };
    const made = thickened(firstWish(readingOf(glazed), part), readingOf(glazed), part.id);
    if (!made.ok) throw new Error(made.why);
    const thick = readingOf(made.value.sketch);
    const bent = bentToBest(thick, glassIn(thick.sketch), 'zero coma');
    if (!bent.ok) throw new Error(bent.why);
    for (const position of demo.positions)
      expect(focalLength(bent.value, position)).toBeCloseTo(focalLength(demo, position), 9);
  });
});
