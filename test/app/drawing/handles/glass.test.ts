import { describe, expect, it } from 'vitest';
import { xOf, yOf } from '../../../../app/board/viewport.ts';
import { curvatureForSag, radiusOf, sagOfConic } from '../../../../app/drawing/handles/sag.ts';
import { ownFocalLength } from '../../../../app/drawing/own.ts';
import { analysisOf } from '../../../../app/live/analysis.ts';
import type { PartId, Sketch } from '../../../../engine/index.ts';
import { settingAt } from '../../../../engine/index.ts';
import { cementedPair, glassIn, surface, withGlass } from '../glassSketch.ts';
import { edited, grip, kept, moveOf, pictureFor } from '../seen.ts';

const selected = { selection: ['p2' as PartId] };
const sketch = withGlass();
const picture = pictureFor(sketch, selected);

const focalOf = (of: Sketch): number => {
  const analysis = analysisOf(of, settingAt('only' as never));
  return ownFocalLength(glassIn(of), 1, analysis) ?? Number.NaN;
};

describe('the grips of glass', () => {
  it('are those of its radii, bending, thicknesses and rim, and only when it is selected', () => {
    const own = (ids: readonly string[]) => ids.filter((id) => id.includes(':p2') && !id.startsWith('cell'));
    expect(own(picture.handles.map(({ id }) => id))).toEqual([
      'part:p2',
      'rim:p2:upper',
      'rim:p2:lower',
      'radius:p2:0',
      'radius:p2:1',
      'radius:p2:2',
      'bend:p2',
      'thickness:p2:0',
      'thickness:p2:1',
      'tick:p2',
    ]);
    expect(own(pictureFor(sketch).handles.map(({ id }) => id))).toEqual(['part:p2', 'tick:p2']);
  });

  it('stand on the faces in turn above and below the axis, thicknesses above it, bending below', () => {
    const { view } = picture;
    const axisPx = yOf(view, 0);
    const heights = [0, 1, 2].map((k) => axisPx - grip(picture, `radius:p2:${k}`).yPx);
    expect(heights.map(Math.sign)).toEqual([1, -1, 1]);
    expect(grip(picture, 'thickness:p2:0')).toMatchObject({ yPx: axisPx - 14, xPx: xOf(view, 26) });
    expect(grip(picture, 'bend:p2').yPx).toBe(axisPx + 14);
    expect(grip(picture, 'rim:p2:upper').yPx).toBeCloseTo(yOf(view, 12), 9);
  });

  it('a radius follows the hand: the sag under it changes by what was dragged', () => {
    const move = moveOf(grip(picture, 'radius:p2:0'), { dzMm: 0.3 });
    const radius = glassIn(edited(sketch, move.edit)).surfaces[0]?.radiusMm ?? Number.NaN;
    const sag = (R: number) => R - Math.sqrt(R * R - (0.72 * 12) ** 2);
    expect(sag(radius) - sag(61.47)).toBeCloseTo(0.3, 9);
    expect(move.says).toBe(`R ${radius.toFixed(3)} mm`);
  });

  it('a radius dragged through flat changes its sign, and says flat when it is', () => {
    const flat = withGlass(cementedPair({ surfaces: [surface(null), surface(-44.64), surface(-129.94)] }));
    const handle = grip(pictureFor(flat, selected), 'radius:p2:0');
    expect(handle.slider?.valueText).toBe('radius of surface 1 flat');
    const radius = (dzMm: number) =>
      glassIn(kept(flat, moveOf(handle, { dzMm }).edit)).surfaces[0]?.radiusMm ?? 0;
    expect(radius(0.2)).toBeGreaterThan(0);
    expect(radius(-0.2)).toBeCloseTo(-radius(0.2), 9);
    expect(glassIn(kept(flat, handle.entry?.set(Number.POSITIVE_INFINITY) ?? ((s) => s)))).toBe(
      glassIn(flat),
    );
  });

  it('never bends a face beyond its equator, nor a hyperboloid beyond its asymptotes', () => {
    expect(Math.abs(radiusOf(curvatureForSag(50, 10, 0)) ?? 0)).toBeGreaterThanOrEqual(10);
    expect(Number.isFinite(curvatureForSag(1e6, 10, -2))).toBe(true);
    for (const conic of [-3, -1, -0.5, 0, 2])
      for (const sagMm of [-1.2, -1e-9, 0, 0.4]) {
        const c = curvatureForSag(sagMm, 8, conic);
        expect(sagOfConic({ curvaturePerMm: c, conic }, 8)).toBeCloseTo(sagMm, 12);
      }
  });

  it('bending keeps the focal length and says the front radius', () => {
    const handle = grip(picture, 'bend:p2');
    for (const dzMm of [-2, 0.4, 3]) {
      const move = moveOf(handle, { dzMm });
      const bent = edited(sketch, move.edit);
      expect(glassIn(bent).surfaces).not.toEqual(glassIn(sketch).surfaces);
      expect(focalOf(bent)).toBeCloseTo(focalOf(sketch), 10);
      expect(move.says).toMatch(/^bent to (R [−\d.]+ mm|flat) in front$/);
      expect(move.frameMm).toBe(0);
    }
  });

  it('bending the first part moves the frame of reference by what its front vertex gives way', () => {
    const alone: Sketch = { ...sketch, parts: sketch.parts.slice(1), stop: 'p2' as PartId };
    const move = moveOf(grip(pictureFor(alone, selected), 'bend:p2'), { dzMm: 2 });
    const bent = edited(alone, move.edit);
    const planes = (of: Sketch) => {
      const { firstOrder } = analysisOf(of, settingAt('only' as never));
      return firstOrder.principalFrontMm.ok ? firstOrder.principalFrontMm.value : Number.NaN;
    };
    // Everything but the glass itself stands where it stood: the whole train's front principal plane moves with the frame.
    expect(planes(bent) + move.frameMm).toBeCloseTo(planes(alone), 9);
  });

  it('bending says why where there is no such lens, and leaves the sketch as it was', () => {
    const window = withGlass(cementedPair({ surfaces: [surface(null), surface(null), surface(null)] }));
    const move = moveOf(grip(pictureFor(window, selected), 'bend:p2'), { dzMm: 1 });
    expect(move.edit(window)).toBe(window);
    expect(move.says).toMatch(/Light passes unbent/);
  });

  it('a thickness follows the hand and what is behind moves along', () => {
    const bent = edited(sketch, moveOf(grip(picture, 'thickness:p2:1'), { dzMm: 1.25 }).edit);
    expect(glassIn(bent).fillings.map(({ thicknessMm }) => thicknessMm)).toEqual([6, 3.75]);
    const gone = edited(sketch, moveOf(grip(picture, 'thickness:p2:0'), { dzMm: -20 }).edit);
    expect(glassIn(gone).fillings[0]?.thicknessMm).toBe(0.01);
  });

  it('a face with a rim of its own has its own rim grips', () => {
    const own = withGlass(
      cementedPair({ surfaces: [surface(61.47, { semiDiameterMm: 9 }), surface(-44.64), surface(-129.94)] }),
    );
    const handle = grip(pictureFor(own, selected), 'rim:p2:0:upper');
    const wider = glassIn(edited(own, moveOf(handle, { dyMm: 1 }).edit));
    expect(wider.surfaces[0]?.semiDiameterMm).toBe(10);
    expect(wider.semiDiameterMm).toBe(12);
  });
});
