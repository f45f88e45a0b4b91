import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { refolded, visibleRange, xOf, yOf } from '../../../app/board/viewport.ts';
import type { Scene } from '../../../app/drawing/scene.ts';
import {
  cameraAt,
  fitCamera,
  foldIn,
  followed,
  type Size,
  sameFold,
  viewportOf,
} from '../../../app/layout/camera.ts';
import { RIBBON_PX } from '../../../app/ribbon/layout.ts';
import type { PartId, Sketch } from '../../../engine/index.ts';
import { emptySketch, newThin } from '../../../engine/index.ts';
import { inspectionZoom, NARROW, WIDE } from '../../engine/demo.ts';
import { anySketch } from '../../engine/sketch/arbitrary.ts';
import { AT_MIDDLE, DESKTOP, fittedView, PHONE, sceneFor } from '../drawing/seen.ts';

const demo = inspectionZoom();
const scene = sceneFor(demo, { setting: AT_MIDDLE });
const SIZES: readonly Size[] = [
  DESKTOP,
  PHONE,
  { widthPx: 700, heightPx: 400 },
  { widthPx: 2400, heightPx: 1300 },
];
const BOTH = ['parts', 'everything'] as const;

/** A length is on the sheet when it is no further out than rounding carries it, px. */
const EDGE_PX = 1e-6;

const isInView = (zMm: number, view: ReturnType<typeof fittedView>) =>
  xOf(view, zMm) >= -EDGE_PX && xOf(view, zMm) <= view.widthPx + EDGE_PX;

describe.each(SIZES)('a fit on $widthPx × $heightPx px', (size) => {
  it('to the parts shows every part, the image and, over a fold, the object', () => {
    const view = fittedView(scene, size, 'parts');
    for (const zMm of [-500, ...scene.parts.map(({ frontMm }) => frontMm), 110])
      expect(isInView(zMm, view)).toBe(true);
    expect(view.fold).not.toBeNull();
    for (const { semiMm } of scene.parts) expect(yOf(view, semiMm)).toBeGreaterThan(0);
  });

  it('to everything shows the object to scale', () => {
    const view = fittedView(scene, size, 'everything');
    expect(view.fold).toBeNull();
    expect(isInView(-500, view)).toBe(true);
    expect(isInView(110, view)).toBe(true);
  });

  it('uses the width: parts are drawn larger than everything is', () => {
    expect(fittedView(scene, size, 'parts').pxPerMm).toBeGreaterThan(
      2 * fittedView(scene, size, 'everything').pxPerMm,
    );
  });

  it('leaves the ribbon its place below', () => {
    expect(fittedView(scene, size).heightPx).toBe(size.heightPx - RIBBON_PX);
  });
});

describe('a camera', () => {
  it('and the view it gives are the same thing', () => {
    const camera = fitCamera(scene, DESKTOP, 'parts');
    expect(cameraAt(viewportOf(camera, DESKTOP, null), 'parts')).toEqual(camera);
    expect(cameraAt(viewportOf(camera, DESKTOP, null)).follow).toBeNull();
  });

  it('on a board without room still has numbers', () => {
    for (const size of [
      { widthPx: 0, heightPx: 0 },
      { widthPx: 60, heightPx: 100 },
    ])
      for (const value of Object.values(fitCamera(scene, size, 'parts')))
        if (typeof value === 'number') expect(Number.isFinite(value)).toBe(true);
  });

  it('shows 200 mm of an empty axis', () => {
    const view = fittedView(sceneFor(emptySketch()));
    expect([isInView(0, view), isInView(200, view)]).toEqual([true, true]);
  });
});

describe('the fold', () => {
  it('belongs to the fit to the parts and to a view that was moved, not to the fit to everything', () => {
    const camera = fitCamera(scene, DESKTOP, 'parts');
    expect(foldIn(scene, camera)).not.toBeNull();
    expect(foldIn(scene, { ...camera, follow: null })).not.toBeNull();
    expect(foldIn(scene, { ...camera, follow: 'everything' })).toBeNull();
  });

  it('is compared by what it cuts', () => {
    const fold = { fromMm: -500, toMm: -40, widthPx: 18 };
    expect(sameFold(fold, { ...fold })).toBe(true);
    expect(sameFold(fold, { ...fold, fromMm: -501 })).toBe(false);
    expect([sameFold(null, null), sameFold(fold, null), sameFold(null, fold)]).toEqual([true, false, false]);
  });
});

describe('following', () => {
  const fit = fitCamera(scene, DESKTOP, 'parts');
  const fold = foldIn(scene, fit);
  const goOn = (change: Partial<typeof fit>, drawn = scene, cut = fold) =>
    followed(drawn, { ...fit, ...change }, DESKTOP, cut);

  it('holds still while what it follows is well in view, and fits again when it has left', () => {
    expect(followed(scene, fit, DESKTOP, fold)).toBe(fit);
    for (const change of [
      { originMm: fit.originMm + 60 },
      { pxPerMm: fit.pxPerMm / 4 },
      { stretch: fit.stretch * 30 },
    ])
      expect(goOn(change)).toEqual(fit);
  });

  it('ends as soon as the user looks elsewhere', () => {
    const elsewhere = { ...fit, follow: null, originMm: 1e4 };
    expect(followed(scene, elsewhere, DESKTOP, fold)).toBe(elsewhere);
  });

  it('does not jump from one position of the demo to another', () => {
    for (const at of [WIDE, NARROW])
      expect(followed(sceneFor(demo, { setting: { at, toNext: 0 } }), fit, DESKTOP, fold)).toBe(fit);
  });

  it('notices an object that has come into the parts’ own scale', () => {
    const near = sceneFor({ ...demo, object: { distanceMm: 120, medium: 'air' } }, { setting: AT_MIDDLE });
    const view = viewportOf(fit, DESKTOP, fold);
    const unfolded = cameraAt(refolded(view, null, xOf(view, 0)), 'parts');
    expect(followed(near, unfolded, DESKTOP, null)).toEqual(fitCamera(near, DESKTOP, 'parts'));
  });
});

describe('a fit of any sketch', () => {
  const anyBoard = () =>
    fc.record({
      sketch: anySketch(),
      size: fc.constantFrom(...SIZES),
      what: fc.constantFrom(...BOTH),
    });
  const shown = ({ stage }: Scene, what: 'parts' | 'everything') =>
    what === 'everything' ? stage.everything : stage.parts;

  it('shows everything that was wanted', () => {
    fc.assert(
      fc.property(anyBoard(), ({ sketch, size, what }) => {
        const drawn = sceneFor(sketch);
        const view = fittedView(drawn, size, what);
        const { fromMm, toMm } = shown(drawn, what);
        expect([isInView(fromMm, view), isInView(toMm, view)]).toEqual([true, true]);
        const visible = visibleRange(view);
        expect(visible.fromMm).toBeLessThan(visible.toMm);
        expect(yOf(view, drawn.tallestMm)).toBeGreaterThanOrEqual(0);
        expect(yOf(view, -drawn.tallestMm)).toBeLessThanOrEqual(view.heightPx);
      }),
    );
  });

  it('is final: following it comes to rest at once', () => {
    fc.assert(
      fc.property(anyBoard(), ({ sketch, size, what }) => {
        const drawn = sceneFor(sketch);
        const camera = fitCamera(drawn, size, what);
        expect(followed(drawn, camera, size, foldIn(drawn, camera))).toBe(camera);
      }),
    );
  });

  it.each([
    ['taller than long', 12, 1],
    ['flat and long', 0.02, 1e5],
  ])('is final on one that is %s', (_which, semiDiameterMm, lengthMm) => {
    const sketch: Sketch = {
      ...emptySketch(),
      parts: [
        { ...newThin(1, 'p1' as PartId), semiDiameterMm, space: { lengthMm, medium: 'air' } },
        { ...newThin(1, 'p2' as PartId), semiDiameterMm },
      ],
    };
    const drawn = sceneFor(sketch);
    for (const what of BOTH) {
      const camera = fitCamera(drawn, DESKTOP, what);
      expect(followed(drawn, camera, DESKTOP, foldIn(drawn, camera))).toBe(camera);
    }
  });
});
