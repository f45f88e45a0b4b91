import { describe, expect, it } from 'vitest';
import { cellsOf } from '../../../app/ribbon/cells.ts';
import type { Sketch } from '../../../engine/index.ts';
import { firstOrder, partTrain, settingAt, thinPart, trainOf } from '../../../engine/index.ts';
import { cementedPair, glassIn, withGlass } from '../drawing/glassSketch.ts';
import { edited, grip, moveOf, pictureFor, sightFor } from '../drawing/seen.ts';

const sketch = withGlass(cementedPair(), { object: { distanceMm: 400, medium: 'air' } });
const shown = { ...sightFor(sketch).reading.view.shown };
const byPlanes = { shown: { ...shown, equivalentGaps: true } };

const planesOf = (of: Sketch) => {
  const own = partTrain(trainOf(of, settingAt('only' as never)), 1);
  if (!own) throw new Error('the glass has surfaces');
  const { principalFrontMm, principalRearMm } = firstOrder(own);
  if (!principalFrontMm.ok || !principalRearMm.ok) throw new Error('the glass has planes');
  return { frontMm: principalFrontMm.value, rearMm: principalRearMm.value };
};

describe('the ribbon of glass', () => {
  it('has its thicknesses between the gaps from vertex to vertex', () => {
    const cells = cellsOf(sightFor(sketch));
    expect(cells.map(({ id }) => id)).toEqual([
      'object',
      'gap:p1',
      'thickness:p2:0',
      'thickness:p2:1',
      'gap:p2',
      'gap:p3',
    ]);
    expect(cells.map(({ label }) => label)).toContain('thickness 2 of glass 2');
    expect(cells.slice(1, 5).map(({ valueMm }) => valueMm)).toEqual([20, 6, 2.5, 30]);
    for (const [i, one] of cells.slice(1).entries()) expect(one.fromMm).toBe(cells[i]?.toMm);
  });

  it('types each thickness', () => {
    const handle = grip(pictureFor(sketch), 'cell:thickness:p2:1');
    const thicker = edited(sketch, handle.entry?.set(4) ?? ((same) => same));
    expect(glassIn(thicker).fillings.map(({ thicknessMm }) => thicknessMm)).toEqual([6, 4]);
  });

  it('measures between principal planes on demand, as the thin equivalent has its gaps', () => {
    const cells = cellsOf(sightFor(sketch, byPlanes));
    expect(cells.map(({ id }) => id)).toEqual(['object', 'gap:p1', 'planes:p2', 'gap:p2', 'gap:p3']);
    const thin = thinPart(sketch, glassIn(sketch).id);
    if (!thin.ok) throw new Error(thin.why);
    const gaps = thin.value.sketch.parts.map(({ space }) => space.lengthMm as number);
    expect(cells[1]?.valueMm).toBeCloseTo(gaps[0] ?? 0, 10);
    expect(cells[3]?.valueMm).toBeCloseTo(gaps[1] ?? 0, 10);
    for (const [i, one] of cells.slice(1).entries()) expect(one.fromMm).toBe(cells[i]?.toMm);
  });

  it('sets the gap from vertex to vertex so that the one typed between the planes holds', () => {
    const picture = pictureFor(sketch, byPlanes);
    const { frontMm, rearMm } = planesOf(sketch);
    const before = edited(sketch, grip(picture, 'cell:gap:p1').entry?.set(25) ?? ((same) => same));
    expect(before.parts[0]?.space.lengthMm).toBeCloseTo(25 - frontMm, 10);
    const behind = edited(sketch, grip(picture, 'cell:gap:p2').entry?.set(33) ?? ((same) => same));
    expect(behind.parts[1]?.space.lengthMm).toBeCloseTo(33 + rearMm, 10);
    const dragged = edited(sketch, moveOf(grip(picture, 'cell:gap:p1'), { dzMm: 2 }).edit);
    expect(dragged.parts[0]?.space.lengthMm).toBeCloseTo(22, 10);
  });

  it('only tells the distance between the planes', () => {
    const handle = grip(pictureFor(sketch, byPlanes), 'cell:planes:p2');
    expect(handle.drag).toBeNull();
    expect(handle.why).toMatch(/principal planes follow/);
  });
});
