import { describe, expect, it } from 'vitest';
import { analyse } from '../../../engine/paraxial/analyse.ts';
import type { Part, Sketch } from '../../../engine/sketch/types.ts';
import { given } from '../quantity.ts';
import { diaphragm, onFirst, sketchOf, thin } from '../sketchOf.ts';

const analysed = (parts: readonly Part[], stop: string | null, more: Partial<Sketch> = {}) => {
  const sketch = sketchOf(parts, stop, more);
  return analyse(sketch, onFirst(sketch));
};

describe('the pupils', () => {
  it('are the images of a stop between two lenses', () => {
    const { pupils } = analysed([thin('p1', 50, 20), diaphragm('p2', 10), thin('p3', 40)], 'p2', {
      aperture: { kind: 'stopDiameter', diameterMm: 6 },
    });
    // Seen from the left: 1/z = 1/20 − 1/50. From the right: 1/z′ = −1/10 + 1/40.
    expect(given(pupils.entrance.zMm)).toBeCloseTo(100 / 3, 12);
    expect(given(pupils.entrance.magnification)).toBeCloseTo(5 / 3, 13);
    expect(given(pupils.entrance.diameterMm)).toBeCloseTo(10, 12);
    expect(given(pupils.exit.zMm)).toBeCloseTo(-40 / 3, 12);
    expect(given(pupils.exit.magnification)).toBeCloseTo(4 / 3, 13);
    expect(given(pupils.exit.diameterMm)).toBeCloseTo(8, 12);
    expect(given(pupils.stopDiameterMm)).toBeCloseTo(6, 13);
    expect(pupils.limitedBy).toBe('stop');
  });

  it('stand with the stop when nothing is between: in front of the first part and riding on the last', () => {
    const { pupils } = analysed([diaphragm('p1', 8), thin('p2', 50)], 'p1');
    expect(given(pupils.entrance.zMm)).toBe(0);
    expect(given(pupils.entrance.magnification)).toBe(1);
    const riding = analysed([thin('p1', 50, 8), thin('p2', 70)], 'p2').pupils;
    expect(given(riding.exit.zMm)).toBe(0);
    expect(given(riding.exit.magnification)).toBe(1);
  });

  it('are both at infinity with the stop in the common focus of a 4f relay', () => {
    const { pupils, firstOrder } = analysed(
      [thin('p1', 120, 120), diaphragm('p2', 80), thin('p3', 80)],
      'p2',
      {
        object: { distanceMm: 120, medium: 'air' },
        aperture: { kind: 'objectNA', na: 0.05 },
        field: { size: { kind: 'objectHeight', heightMm: 4 }, fractions: [1], vignetting: 0 },
      },
    );
    for (const quantity of [pupils.entrance.zMm, pupils.entrance.diameterMm, pupils.exit.magnification]) {
      expect(quantity).toEqual({ ok: false, why: 'pupil at infinity' });
    }
    expect(given(pupils.stopDiameterMm)).toBeCloseTo(240 * Math.tan(Math.asin(0.05)), 12);
    expect(firstOrder.afocal).toBe(true);
    expect(given(firstOrder.angularMagnification)).toBeCloseTo(-1.5, 13);
  });

  it('belong to the rim that cuts the axial bundle first when no stop is given', () => {
    const parts = [
      thin('p1', 50, 25, { semiDiameterMm: 10 }),
      thin('p2', -80, 5, { semiDiameterMm: 4 }),
      diaphragm('p3', 5, { semiDiameterMm: 7 }),
    ];
    // From infinity the axial ray halves its height on the way to the second lens: 10 against 8.
    const { pupils, rays } = analysed(parts, null);
    expect(given(pupils.stopSurface)).toBe(1);
    expect(pupils.limitedBy).toBe('rim');
    expect(given(rays.chief).y[1]).toBe(0);
    const open = analysed([thin('p1', 50)], null).pupils;
    expect(open.stopSurface).toEqual({ ok: false, why: 'no stop' });
    expect(open.limitedBy).toBeNull();
  });

  it('are not set by a rim that stands on an image of the object', () => {
    // Distances whose rounding leaves a little height where there should be none.
    for (const [focal, distanceMm] of [
      [50, 150],
      [48.3, 151.7],
      [31.1, 77.7],
    ] as const) {
      const image = 1 / (1 / focal - 1 / distanceMm);
      const parts = [thin('p1', focal, image), thin('p2', 40, 20, { semiDiameterMm: 3 })];
      const { pupils } = analysed(parts, null, { object: { distanceMm, medium: 'air' } });
      expect(pupils.stopSurface).toEqual({ ok: false, why: 'no stop' });
    }
  });

  it('move with the object when the rims decide', () => {
    const parts = [thin('p1', 50, 40, { semiDiameterMm: 10 }), diaphragm('p2', 5, { semiDiameterMm: 4 })];
    const stop = (distanceMm: number | 'infinity') =>
      given(analysed(parts, null, { object: { distanceMm, medium: 'air' } }).pupils.stopSurface);
    expect(stop('infinity')).toBe(0);
    expect(stop(60)).toBe(1);
  });
});

describe('the windows', () => {
  const sensor = { size: { widthMm: 8, heightMm: 6 }, pixelPitchMm: null };
  const near = { object: { distanceMm: 150, medium: 'air' }, sensor, image: 'fixed' } as const;

  it('are the object field and the sensor for a fixed sensor in focus', () => {
    const { windows } = analysed([thin('p1', 50, 75)], 'p1', near);
    expect(windows.fieldStop).toEqual({ ok: true, value: { kind: 'sensor' } });
    expect(given(windows.entrance.zMm)).toBeCloseTo(-150, 10);
    expect(given(windows.entrance.diameterMm)).toBeCloseTo(20, 11);
    expect(given(windows.exit.zMm)).toBe(75);
    expect(given(windows.exit.diameterMm)).toBe(10);
  });

  it('have an entrance window at infinity for an object there', () => {
    const { windows } = analysed([thin('p1', 50, 50)], 'p1', { sensor, image: 'fixed' });
    expect(windows.entrance.zMm).toEqual({ ok: false, why: 'window at infinity' });
  });

  it('belong to the rim that cuts the chief ray first when no sensor limits the field', () => {
    const parts = [thin('p1', 50, 30), thin('p2', 60, 30, { semiDiameterMm: 5 }), thin('p3', 40)];
    const { windows } = analysed(parts, 'p1');
    expect(windows.fieldStop).toEqual({ ok: true, value: { kind: 'rim', surface: 1 } });
    // The first lens images the rim: 1/z = 1/30 − 1/50.
    expect(given(windows.entrance.zMm)).toBeCloseTo(75, 11);
    expect(given(windows.entrance.diameterMm)).toBeCloseTo(25, 11);
    expect(analysed([thin('p1', 50)], 'p1').windows.fieldStop).toEqual({ ok: false, why: 'no field stop' });
  });
});
