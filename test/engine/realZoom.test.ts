import { describe, expect, it } from 'vitest';
import { traceRay } from '../../engine/exact/ray.ts';
import { analyse } from '../../engine/paraxial/analyse.ts';
import { heightInSpace, paraxialRay } from '../../engine/paraxial/trace.ts';
import { faultsOf } from '../../engine/sketch/rules.ts';
import { settingAt } from '../../engine/sketch/values.ts';
import { given } from './quantity.ts';
import { REAL_ZOOM_FIGURES, realZoom } from './realZoom.ts';

/*
 * The figures are those of the reference file, by an independent program of 40 digits (see test/reference/README.md). Here the sketch is
 * the way to them, as a user would enter it.
 */

const sketch = realZoom();

describe('a zoom in real glass', () => {
  it('is a sound sketch', () => {
    expect(faultsOf(sketch)).toEqual([]);
  });

  it.each(sketch.positions.map(({ id }) => id))('has the figures of the reference at %s', (position) => {
    const { firstOrder, pupils } = analyse(sketch, settingAt(position));
    const figures: Record<string, number> = {
      focalLength: given(firstOrder.focalLengthMm),
      backFocus: given(firstOrder.backFocusMm),
      principalFront: given(firstOrder.principalFrontMm),
      principalRear: given(firstOrder.principalRearMm),
      entrancePupil: given(pupils.entrance.zMm),
      exitPupil: given(pupils.exit.zMm),
      vertexLength: firstOrder.vertexLengthMm,
    };
    for (const [quantity, value] of Object.entries(figures)) {
      const figure = REAL_ZOOM_FIGURES[`${position}.${quantity}`];
      expect(Math.abs(value - figure!.value), quantity).toBeLessThanOrEqual(figure!.tolerance);
    }
  });

  it.each(sketch.positions.map(({ id }) => id))(
    'bends exact rays as first order says when they are near the axis, at %s',
    (position) => {
      const { train, conjugates } = analyse(sketch, settingAt(position));
      const backFocus = given(conjugates.imagePlaneMm);
      /** Height in the focal plane of a ray that comes in at `yMm` parallel to the axis. */
      const errorAt = (yMm: number): number => {
        const path = traceRay(train, [0, yMm, 0], [0, 0, 1]);
        const last = path.hits.at(-1);
        if (!last?.direction) throw new Error(`lost: ${path.lost?.why}`);
        const [, y, z] = last.point;
        return y + ((backFocus - z) * last.direction[1]) / last.direction[2];
      };
      const paraxial = paraxialRay(train, 1, 0);
      const plane = train.z[train.count - 1]! + backFocus;
      // What is left is rounding of 14 refractions over some hundred mm.
      expect(Math.abs(heightInSpace(train, paraxial, train.count, plane))).toBeLessThan(1e-12);
      // The error is of third order: half the height leaves an eighth of it, up to the fifth order that joins it (y²/f² < 1e-4).
      expect(errorAt(0.2) / errorAt(0.1)).toBeCloseTo(8, 1);
    },
  );
});
