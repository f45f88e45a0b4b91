import { describe, expect, it } from 'vitest';
import type { Pen } from '../../../../app/board/pen.ts';
import { type Mark, recorderPen } from '../../../../app/board/recorderPen.ts';
import { type Viewport, xOf, yOf } from '../../../../app/board/viewport.ts';
import { endsLayer, objectTipPx, scaleLayer } from '../../../../app/drawing/layers/ends.ts';
import { FOCAL_STEM_PX, marksLayer } from '../../../../app/drawing/layers/marks.ts';
import { glassLayer, partsLayer } from '../../../../app/drawing/layers/parts.ts';
import { raysLayer } from '../../../../app/drawing/layers/rays.ts';
import type { Scene } from '../../../../app/drawing/scene.ts';
import type { Picture } from '../../../../app/layout/picture.ts';
import type { PartId, Sketch } from '../../../../engine/index.ts';
import { emptySketch, newPlate, newStop, newThin } from '../../../../engine/index.ts';
import { inspectionZoom } from '../../../engine/demo.ts';
import { ALL_SHOWN, AT_MIDDLE, DESKTOP, demoPicture, pictureFor } from '../seen.ts';

type Layer = (pen: Pen, scene: Scene, view: Viewport) => void;

/** What a layer draws of a picture, in 1e-6 px. */
function drawn({ scene, view }: Picture, layer: Layer): readonly Mark[] {
  const pen = recorderPen(6);
  layer(pen, scene, view);
  return pen.marks;
}

/** Every line of one style. */
const linesOf = (marks: readonly Mark[], style: string): readonly (readonly number[])[] =>
  marks.flatMap((mark) => (mark.kind === 'lines' && mark.style === style ? mark.lines : []));
const stylesOf = (marks: readonly Mark[]) => [
  ...new Set(marks.flatMap((mark) => ('style' in mark ? mark.style : []))),
];

const parts: Layer = (pen, scene, view) => partsLayer(pen, scene, view, null);
const demo = inspectionZoom();
const picture = demoPicture();
const { view } = picture;
const axisY = yOf(view, 0);

/** A point on the sheet of a recorder that keeps six decimals. */
const near = (value: number) => expect.closeTo(value, 5);

describe('rays', () => {
  const marks = drawn(picture, raysLayer);

  it('lie in this order: the field inner to outer, the axial bundle, the marginal ray, the chief ray on top', () => {
    expect(stylesOf(marks)).toEqual([
      'field inner bundle',
      'field outer bundle',
      'axial bundle',
      'marginal ray',
      'chief ray',
    ]);
  });

  it('end on the sensor: the axial ones on the axis, those of the field’s edge all at its height', () => {
    const sensorX = near(xOf(view, 110));
    for (const line of linesOf(marks, 'axial bundle')) expect(line.slice(-2)).toEqual([sensorX, near(axisY)]);
    for (const line of linesOf(marks, 'field outer bundle'))
      expect(line.slice(-2)).toEqual([sensorX, near(yOf(view, 5.5))]);
  });

  it('have one line each and none besides', () => {
    const { bundles, axial } = picture.scene;
    expect(linesOf(marks, 'axial bundle')).toHaveLength(axial.length);
    expect(linesOf(marks, 'field outer bundle')).toHaveLength(bundles.at(-1)?.rays.length ?? 0);
    expect(linesOf(marks, 'marginal ray')).toHaveLength(2);
  });

  it('end short of a fold', () => {
    const fold = near(xOf(view, view.fold?.toMm ?? 0));
    for (const line of linesOf(marks, 'marginal ray')) expect(line[0]).toEqual(fold);
    const whole = pictureFor(demo, { setting: AT_MIDDLE }, DESKTOP, 'everything');
    const start = linesOf(drawn(whole, raysLayer), 'marginal ray')[0]?.[0];
    expect(start).toEqual(near(xOf(whole.view, -500)));
  });

  it('show a ring where the chief ray crosses the axis in the stop', () => {
    expect(marks.at(-1)).toMatchObject({
      kind: 'circle',
      style: 'chief ray',
      xPx: near(xOf(view, picture.scene.stop?.zMm ?? 0)),
      yPx: near(axisY),
    });
  });
});

describe('parts', () => {
  it('that are positive have arrowheads outward, negative ones inward', () => {
    const lines = linesOf(drawn(picture, parts), 'part');
    const heads = lines.filter((line) => line.length === 6);
    expect(heads).toHaveLength(8);
    const [negative, positive] = [heads[0], heads[2]];
    expect((negative?.[1] ?? 0) - (negative?.[3] ?? 0)).toBeLessThan(0);
    expect((positive?.[1] ?? 0) - (positive?.[3] ?? 0)).toBeGreaterThan(0);
  });

  it('reach as high as they are clear', () => {
    const [line] = linesOf(drawn(picture, parts), 'part');
    const semi = picture.scene.parts[0]?.semiMm ?? 0;
    expect([line?.[1], line?.[3]]).toEqual([near(yOf(view, semi)), near(yOf(view, -semi))]);
  });

  it('that are selected or hovered look so', () => {
    const pen = recorderPen();
    const selected = demoPicture({ selection: ['p1' as PartId] });
    partsLayer(pen, selected.scene, selected.view, 'p3');
    expect(stylesOf(pen.marks)).toEqual(['part selected', 'part', 'part hover', 'stop']);
  });

  it('show the room kept for real glass, where there is any', () => {
    const roomy: Sketch = {
      ...demo,
      parts: demo.parts.map((part) => (part.kind === 'thin' ? { ...part, roomBehindMm: 4 } : part)),
    };
    const marks = drawn(pictureFor(roomy, { setting: AT_MIDDLE }), parts);
    expect(linesOf(marks, 'room')).toHaveLength(4);
    expect(linesOf(drawn(picture, parts), 'room')).toHaveLength(0);
  });

  it('may be plates, as wide as thick, and diaphragms with their own opening', () => {
    const sketch: Sketch = {
      ...emptySketch(),
      parts: [
        { ...newThin(50, 'p1' as PartId), space: { lengthMm: 10, medium: 'air' } },
        { ...newPlate(6, 'p2' as PartId), space: { lengthMm: 10, medium: 'air' } },
        { ...newStop('p3' as PartId), semiDiameterMm: 3 },
      ],
    };
    const mixed = pictureFor(sketch);
    const marks = drawn(mixed, parts);
    const plate = drawn(mixed, glassLayer).find((mark) => mark.kind === 'closed');
    expect(plate?.kind === 'closed' && [plate.points[0], plate.points[2]]).toEqual([
      near(xOf(mixed.view, 10)),
      near(xOf(mixed.view, 16)),
    ]);
    const edges = linesOf(marks, 'stop').map((line) => line[1]);
    expect(edges).toContainEqual(near(yOf(mixed.view, 3)));
    expect(edges).toContainEqual(near(yOf(mixed.view, -3)));
  });

  it('let the stop’s edges stand at the marginal ray’s height', () => {
    const semi = picture.scene.stop?.semiMm ?? 0;
    const edges = linesOf(drawn(picture, parts), 'stop').map((line) => line[1] ?? 0);
    expect(Math.min(...edges)).toBeCloseTo(yOf(view, semi), 5);
    expect(Math.max(...edges)).toBeCloseTo(yOf(view, -semi), 5);
  });
});

describe('marks', () => {
  it('draw a virtual image and the rays’ backward extensions to it dotted', () => {
    const marks = drawn(picture, marksLayer);
    const [upper, lower] = linesOf(marks, 'marginal ray virtual');
    const image = [near(xOf(view, picture.scene.images[0]?.zMm ?? 0)), near(axisY)];
    expect(upper?.slice(-2)).toEqual(image);
    expect(lower?.slice(-2)).toEqual(image);
    expect((upper?.[1] ?? 0) - axisY).toBeCloseTo(axisY - (lower?.[1] ?? 0), 5);
    expect(linesOf(marks, 'image virtual').length).toBeGreaterThan(0);
  });

  it('draw a real image between parts solid, without extensions', () => {
    const relay: Sketch = {
      ...emptySketch(),
      object: { distanceMm: 100, medium: 'air' },
      parts: [
        { ...newThin(50, 'p1' as PartId), space: { lengthMm: 200, medium: 'air' } },
        newThin(50, 'p2' as PartId),
      ],
      stop: 'p1' as PartId,
      aperture: { kind: 'stopDiameter', diameterMm: 10 },
      field: { size: { kind: 'objectHeight', heightMm: 10 }, fractions: [0, 1], vignetting: 0 },
    };
    const marks = drawn(pictureFor(relay), marksLayer);
    expect(linesOf(marks, 'marginal ray virtual')).toEqual([]);
    expect(linesOf(marks, 'image virtual')).toEqual([]);
    expect(linesOf(marks, 'image')).toHaveLength(2);
  });

  it('draw pupils, principal planes and focal points once they are switched on', () => {
    expect(stylesOf(drawn(picture, marksLayer))).not.toContain('pupil');
    const styles = stylesOf(drawn(demoPicture({ shown: ALL_SHOWN }), marksLayer));
    for (const style of ['pupil', 'principal plane', 'focal point']) expect(styles).toContain(style);
  });

  it('show a selected part’s own focal points on stems below the axis', () => {
    const selected = demoPicture({ selection: ['p2' as PartId] });
    const stems = linesOf(drawn(selected, marksLayer), 'leader');
    const at = selected.scene.parts[1]?.frontMm ?? 0;
    expect(stems).toEqual(
      [-28, 28].map((f) => {
        const x = near(xOf(selected.view, at + f));
        const y = yOf(selected.view, 0);
        return [x, near(y), x, near(y + FOCAL_STEM_PX)];
      }),
    );
  });
});

describe('the ends', () => {
  it('break the axis inside the fold, between the object and the parts', () => {
    const axis = linesOf(drawn(picture, endsLayer), 'axis');
    expect(axis).toHaveLength(2);
    expect(axis[0]?.[0]).toBe(0);
    expect(axis[0]?.[2]).toBeGreaterThan(xOf(view, -500));
    expect(axis[1]?.[0]).toBeLessThan(xOf(view, 0));
    expect(axis[1]?.[2]).toBe(view.widthPx);
    expect(linesOf(drawn(picture, endsLayer), 'fold')).toHaveLength(2);
    const whole = pictureFor(demo, { setting: AT_MIDDLE }, DESKTOP, 'everything');
    expect(linesOf(drawn(whole, endsLayer), 'axis')).toHaveLength(1);
  });

  it('cut an object that is taller than the sheet to what the sheet holds', () => {
    expect(objectTipPx(view, 1e5)).toBe(24);
    expect(objectTipPx(view, -1e5)).toBe(view.heightPx - 24);
    expect(objectTipPx(view, 1)).toBe(yOf(view, 1));
  });

  it('draw the sensor at its size, or at a plain one where its size is not given', () => {
    const [sensor] = linesOf(drawn(picture, endsLayer), 'sensor');
    expect(sensor).toEqual([
      near(xOf(view, 110)),
      near(yOf(view, 5.5)),
      near(xOf(view, 110)),
      near(yOf(view, -5.5)),
    ]);
    const bare = pictureFor({ ...demo, sensor: null }, { setting: AT_MIDDLE });
    const [line] = linesOf(drawn(bare, endsLayer), 'sensor');
    expect((line?.[3] ?? 0) - (line?.[1] ?? 0)).toBe(80);
  });

  it('draw an image that follows the focus, with no sensor known, as an arrow', () => {
    const open = pictureFor({ ...demo, sensor: null, image: 'focus' }, { setting: AT_MIDDLE });
    const marks = drawn(open, endsLayer);
    expect(linesOf(marks, 'sensor')).toEqual([]);
    const shaft = linesOf(marks, 'object').find(
      (line) => line.length === 4 && Math.abs((line[0] ?? 0) - xOf(open.view, 110)) < 0.01,
    );
    expect(shaft?.[3]).toEqual(near(yOf(open.view, 5.5)));
  });

  it('draw the mount plane where there is one', () => {
    const mounted = pictureFor({ ...demo, registerMm: 12 }, { setting: AT_MIDDLE });
    expect(linesOf(drawn(mounted, endsLayer), 'mount')[0]?.[0]).toEqual(near(xOf(mounted.view, 98)));
  });
});

describe('the scale', () => {
  const scaleOf = (unit: 'mm' | 'in', stretch = view.stretch) =>
    drawn(picture, (pen, _scene, at) => scaleLayer(pen, { ...at, stretch }, unit, 400));
  const texts = (marks: readonly Mark[]) =>
    marks.flatMap((mark) => (mark.kind === 'text' ? [mark.text] : []));

  it('bar is as long as it says', () => {
    for (const [unit, mm] of [
      ['mm', 1],
      ['in', 25.4],
    ] as const) {
      const marks = scaleOf(unit);
      const [bar] = linesOf(marks, 'scale bar');
      const [, said = ''] = texts(marks);
      expect(said).toMatch(/^[125]0*(\.[0125]+)? (mm|in)$|^0\.0*[125] (mm|in)$/);
      expect((bar?.[2] ?? 0) - (bar?.[0] ?? 0)).toBeCloseTo(Number.parseFloat(said) * mm * view.pxPerMm, 5);
    }
  });

  it('says how much taller heights are drawn', () => {
    expect(texts(scaleOf('mm', 2.5))[0]).toBe('heights ×2.5');
    expect(texts(scaleOf('mm', 1))[0]).toBe('heights to scale');
  });
});
