import { describe, expect, it } from 'vitest';
import { recorderPen } from '../../../../app/board/recorderPen.ts';
import { newViewport } from '../../../../app/board/viewport.ts';
import { glowLayer } from '../../../../app/drawing/layers/glow.ts';
import { sceneOf } from '../../../../app/drawing/scene.ts';
import type { PartId, Sketch } from '../../../../engine/index.ts';
import { emptySketch, newGlass, newPlate, newThin } from '../../../../engine/index.ts';
import { readingOf } from '../../reading.ts';

const view = { ...newViewport(800, 400), pxPerMm: 2 };

/** A thin part at 0, a plate from 20 to 25, glass from 40 to 44. */
const sketch: Sketch = {
  ...emptySketch(),
  parts: [
    { ...newThin(100, 'p1' as PartId), semiDiameterMm: 10, space: { lengthMm: 20, medium: 'air' } },
    {
      ...newPlate(5, 'p2' as PartId),
      semiDiameterMm: 10,
      space: { lengthMm: 15, medium: 'air' },
    },
    { ...newGlass(50, 4, 'p3' as PartId), semiDiameterMm: 10 },
  ],
  stop: 'p1' as PartId,
};

function glowing(surface: number | null): readonly number[] | null {
  const { analysis, view: shown } = readingOf(sketch);
  const pen = recorderPen();
  glowLayer(pen, sceneOf(sketch, analysis, shown), view, surface);
  const [mark] = pen.marks;
  return mark?.kind === 'lines' && mark.style === 'glow' ? (mark.lines[0] ?? null) : null;
}

describe('the glow of a surface', () => {
  it('lies on the surface that is counted through all parts, from rim to rim', () => {
    const middle = (surface: number) => glowing(surface)?.[2 * 20];
    expect([0, 1, 2, 3, 4].map(middle)).toEqual([0, 40, 50, 80, 88]);
    const ends = glowing(3);
    expect([ends?.[1], ends?.at(-1)]).toEqual([220, 180]);
    // The front face bulges to the left: its rim lies to the right of its vertex.
    expect(ends?.[0]).toBeGreaterThan(80);
  });

  it('is nowhere when nothing is pointed at, or the surface is gone', () => {
    expect([glowing(null), glowing(5)]).toEqual([null, null]);
  });
});
