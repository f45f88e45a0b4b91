import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { refolded, visibleRange, xOf, yOf } from '../../../app/board/viewport.ts';
import type { Scene } from '../../../app/drawing/scene.ts';
import {
  cameraAt,
  fitCamera,
  fitLook,
  foldIn,
  followed,
  heldFold,
  inPlace,
  type Look,
  type Size,
  settled,
  viewportOf,
} from '../../../app/layout/camera.ts';
import { RIBBON_PX } from '../../../app/ribbon/layout.ts';
import type { PartId, Sketch } from '../../../engine/index.ts';
import { emptySketch, fixSensor, moveParts, newThin } from '../../../engine/index.ts';
import { inspectionZoom, NARROW, WIDE } from '../../engine/demo.ts';
import { anySketch } from '../../engine/sketch/arbitrary.ts';
import { AT_MIDDLE, DESKTOP, edited, fittedView, PHONE, sceneFor } from '../drawing/seen.ts';

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

  it('gives way to the first part and to the object while a hand moves them, and else stays', () => {
    const fold = { fromMm: -500, toMm: -40, widthPx: 18 };
    expect(heldFold(fold, -500, 0)).toEqual(fold);
    expect(heldFold(fold, -490, -10)).toEqual({ ...fold, fromMm: -490, toMm: -30 });
    expect(heldFold(fold, -450, -50)).toEqual({ ...fold, fromMm: -450, toMm: 0 });
    expect(heldFold(fold, -40, 0)).toBeNull();
    expect([heldFold(null, -500, 0), heldFold(fold, null, 0)]).toEqual([null, null]);
  });
});

describe('following', () => {
  const look = fitLook(scene, DESKTOP, 'parts');
  const { camera: fit, fold } = look;
  const goOn = (change: Partial<typeof fit>, drawn = scene, cut = fold) =>
    followed(drawn, { camera: { ...fit, ...change }, fold: cut }, DESKTOP).camera;

  it('holds still while what it follows is well in view, and fits again when it has left', () => {
    expect(followed(scene, look, DESKTOP)).toBe(look);
    for (const change of [
      { originMm: fit.originMm + 60 },
      { pxPerMm: fit.pxPerMm / 12 },
      { stretch: fit.stretch * 30 },
      { stretch: fit.stretch / 30 },
    ])
      expect(goOn(change)).toEqual(fit);
  });

  it('ends as soon as the user looks elsewhere', () => {
    const elsewhere = { camera: { ...fit, follow: null, originMm: 1e4 }, fold };
    expect(followed(scene, elsewhere, DESKTOP)).toBe(elsewhere);
  });

  it('does not jump from one position of the demo to another', () => {
    for (const at of [WIDE, NARROW])
      expect(followed(sceneFor(demo, { setting: { at, toNext: 0 } }), look, DESKTOP)).toBe(look);
  });

  it('notices an object that has come into the parts’ own scale', () => {
    const near = sceneFor({ ...demo, object: { distanceMm: 120, medium: 'air' } }, { setting: AT_MIDDLE });
    const view = viewportOf(fit, DESKTOP, fold);
    const unfolded = cameraAt(refolded(view, null, xOf(view, 0)), 'parts');
    expect(followed(near, { camera: unfolded, fold: null }, DESKTOP).camera).toEqual(
      fitCamera(near, DESKTOP, 'parts'),
    );
  });
});

describe('between gestures', () => {
  const empty = sceneFor(emptySketch());
  const start = fitLook(empty, DESKTOP, 'parts');
  const lens = (focalLengthMm: number, id: string, lengthMm = 0) => ({
    ...newThin(focalLengthMm, id as PartId),
    space: { lengthMm, medium: 'air' as const },
  });
  const withParts = (...parts: Sketch['parts']) => sceneFor({ ...emptySketch(), parts });
  const goOn = (drawn: Scene, look: Look) => settled(drawn, look, DESKTOP, false, DESKTOP);
  const lengthsOf = ({ camera: { originMm, pxPerMm } }: Look) => ({ originMm, pxPerMm });

  it('parts dropped one after the other leave the axis where it is', () => {
    const one = goOn(withParts(lens(50, 'p1')), start);
    const two = goOn(withParts(lens(50, 'p1', 30), lens(-50, 'p2')), one);
    expect([lengthsOf(one), lengthsOf(two)]).toEqual([lengthsOf(start), lengthsOf(start)]);
  });

  it('a part whose image leaves the sheet is fitted', () => {
    const drawn = withParts(lens(400, 'p1'));
    const look = goOn(drawn, start);
    expect(look).toEqual(fitLook(drawn, DESKTOP, 'parts'));
    expect(isInView(400, viewportOf(look.camera, DESKTOP, look.fold))).toBe(true);
  });

  it('a layout that has become too tall is drawn flatter, where it stands', () => {
    const drawn = withParts({ ...lens(50, 'p1'), semiDiameterMm: 120 });
    const look = goOn(drawn, start);
    expect(lengthsOf(look)).toEqual(lengthsOf(start));
    expect(yOf(viewportOf(look.camera, DESKTOP, look.fold), 120)).toBeGreaterThan(0);
  });

  it('a sketch just opened is fitted, unless the user looks elsewhere', () => {
    const drawn = withParts(lens(50, 'p1'));
    expect(settled(drawn, start, DESKTOP, true, DESKTOP)).toEqual(fitLook(drawn, DESKTOP, 'parts'));
    const own = { ...start, camera: { ...start.camera, follow: null } };
    expect(settled(drawn, own, DESKTOP, true, DESKTOP).camera).toEqual(own.camera);
  });

  it('a board of another width is fitted, one of another height keeps lengths', () => {
    const look = fitLook(scene, DESKTOP, 'parts');
    const at = (size: Size) => settled(scene, look, size, false, DESKTOP);
    expect(at({ ...DESKTOP, widthPx: 700 })).toEqual(fitLook(scene, { ...DESKTOP, widthPx: 700 }, 'parts'));
    const low = at({ ...DESKTOP, heightPx: 400 });
    expect(lengthsOf(low)).toEqual(lengthsOf(look));
    expect(low.camera.stretch).toBeLessThan(look.camera.stretch);
    const back = settled(scene, low, DESKTOP, false, { ...DESKTOP, heightPx: 400 });
    expect(back.camera).toEqual(look.camera);
  });

  it('the fold stays cut where it was while the layout changes a little', () => {
    const look = fitLook(scene, DESKTOP, 'parts');
    const longer = sceneFor(
      edited(demo, (sketch) => fixSensor(sketch, 31, AT_MIDDLE.at)),
      { setting: AT_MIDDLE },
    );
    expect(foldIn(longer, look.camera)?.toMm).not.toBe(look.fold?.toMm);
    expect(goOn(longer, look)).toEqual(look);
  });

  it('the parts and the object stay where they are when only the first part has moved', () => {
    const look = fitLook(scene, DESKTOP, 'parts');
    const before = { scene, view: viewportOf(look.camera, DESKTOP, look.fold) };
    const edit = (sketch: Sketch) => moveParts(sketch, ['p1' as PartId], -8, AT_MIDDLE.at, 'neighbours');
    const drawn = sceneFor(edited(demo, edit), { setting: AT_MIDDLE });
    const after = goOn(drawn, inPlace(before, drawn, look));
    const view = viewportOf(after.camera, DESKTOP, after.fold);
    const placesOf = ({ parts, stage }: Scene, seen: typeof view) =>
      [stage.objectMm, ...parts.map(({ frontMm }) => frontMm), stage.imageMm].map((z) => xOf(seen, z ?? 0));
    const [object, first = 0, ...others] = placesOf(drawn, view);
    const [objectWas, firstWas = 0, ...othersWere] = placesOf(scene, before.view);
    expect(object).toBeCloseTo(objectWas ?? 0, 6);
    expect(first).toBeCloseTo(firstWas - 8 * view.pxPerMm, 6);
    for (const [i, x] of others.entries()) expect(x).toBeCloseTo(othersWere[i] ?? 0, 6);
  });

  it('the others stay where they are when a part is put in front of the first', () => {
    const before = { scene: withParts(lens(50, 'p1')), view: viewportOf(start.camera, DESKTOP, null) };
    const after = inPlace(before, withParts(lens(80, 'p2', 12), lens(50, 'p1')), start);
    const view = viewportOf(after.camera, DESKTOP, after.fold);
    expect(xOf(view, 12)).toBeCloseTo(xOf(before.view, 0), 9);
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
        expect(followed(drawn, { camera, fold: foldIn(drawn, camera) }, size).camera).toBe(camera);
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
      expect(followed(drawn, { camera, fold: foldIn(drawn, camera) }, DESKTOP).camera).toBe(camera);
    }
  });
});
