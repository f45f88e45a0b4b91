import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { roughMeasure } from '../../../app/board/measure.ts';
import { recorderPen } from '../../../app/board/recorderPen.ts';
import { newViewport, type Viewport } from '../../../app/board/viewport.ts';
import { fitCamera, foldIn, type Size, viewportOf } from '../../../app/layout/camera.ts';
import { IDLE_HAND, overlayLayer } from '../../../app/layout/overlay.ts';
import { paintParts, paintRays } from '../../../app/layout/paint.ts';
import { type Picture, pictureOf, sceneOfReading } from '../../../app/layout/picture.ts';
import type { PartId, Setting, Sketch } from '../../../engine/index.ts';
import { inspectionZoom } from '../../engine/demo.ts';
import { anySetting, anySketch } from '../../engine/sketch/arbitrary.ts';
import { ALL_SHOWN, AT_MIDDLE, demoPicture } from '../drawing/seen.ts';
import { readingOf } from '../reading.ts';

/** Every paint of a picture, with the grip `held` hovered, focused and dragged. */
function painted(picture: Picture, decimals: number, held: string | null = null) {
  const pen = recorderPen(decimals);
  pen.group('rays', () => paintRays(pen, picture));
  pen.group('parts', () => paintParts(pen, picture, held));
  pen.group('overlay', () => {
    const hand = { ...IDLE_HAND, hover: held, focus: held, ring: true, dropXPx: 40, step: '1 mm' };
    const room = { measure: roughMeasure, labels: [], former: [] };
    overlayLayer(pen, picture.handles, picture.view, picture.plan.topPx, hand, room);
  });
  return pen;
}

/** Every number in some data, with its path. */
function badNumbers(data: unknown, path = ''): readonly string[] {
  if (typeof data === 'number') return Number.isFinite(data) ? [] : [`${path}: ${data}`];
  if (typeof data === 'string') return /NaN|Infinity|undefined/.test(data) ? [`${path}: ${data}`] : [];
  if (typeof data !== 'object' || data === null) return [];
  return Object.entries(data).flatMap(([key, value]) => badNumbers(value, `${path}.${key}`));
}

describe('the picture of the demo', () => {
  it('is drawn like this', async () => {
    const reading = readingOf(inspectionZoom(), {
      setting: AT_MIDDLE,
      raysPerBundle: 3,
      selection: ['p2' as PartId],
    });
    const view: Viewport = { ...newViewport(1000, 500), originMm: -70, pxPerMm: 5, stretch: 2 };
    const scene = sceneOfReading(reading);
    const fold = foldIn(scene, reading.view.camera);
    const picture = pictureOf(reading, { ...view, fold }, roughMeasure, scene);
    await expect(`${painted(picture, 0, 'part:p2').toText()}\n`).toMatchFileSnapshot('demo.drawing.txt');
  });

  it('is the same at every call', () => {
    const [one, other] = [demoPicture(), demoPicture()].map((picture) => painted(picture, 3).toText());
    expect(one).toBe(other);
  });
});

describe('the picture of any sketch', () => {
  interface Screen {
    readonly sketch: Sketch;
    readonly setting: Setting;
    readonly size: Size;
    readonly what: 'parts' | 'everything';
    readonly zoom: number;
    readonly panPx: number;
  }
  const anyScreen = (sketches: fc.Arbitrary<Sketch>): fc.Arbitrary<Screen> =>
    sketches.chain((sketch) =>
      fc.record({
        sketch: fc.constant(sketch),
        setting: anySetting(sketch.positions),
        size: fc.constantFrom(
          { widthPx: 1440, heightPx: 800 },
          { widthPx: 390, heightPx: 400 },
          { widthPx: 40, heightPx: 130 },
        ),
        what: fc.constantFrom('parts' as const, 'everything' as const),
        zoom: fc.constantFrom(1, 1, 0.01, 500),
        panPx: fc.constantFrom(0, 0, -5000, 5000),
      }),
    );
  const pictureOn = ({ sketch, setting, size, what, zoom, panPx }: Screen): Picture => {
    const reading = readingOf(sketch, {
      setting,
      shown: ALL_SHOWN,
      selection: [...sketch.parts.map(({ id }) => id), 'object', 'image'],
    });
    const scene = sceneOfReading(reading);
    const fitted = fitCamera(scene, size, what);
    const camera = {
      ...fitted,
      pxPerMm: fitted.pxPerMm * zoom,
      originMm: fitted.originMm + panPx / fitted.pxPerMm,
    };
    return pictureOf(reading, viewportOf(camera, size, foldIn(scene, camera)), roughMeasure, scene);
  };

  it('is drawn with numbers, wherever one looks', () => {
    fc.assert(
      fc.property(anyScreen(anySketch()), (screen) => {
        const picture = pictureOn(screen);
        expect(badNumbers(painted(picture, 3, 'image').marks)).toEqual([]);
        expect(
          badNumbers(picture.handles.map(({ xPx, yPx, line, slider }) => ({ xPx, yPx, line, slider }))),
        ).toEqual([]);
      }),
    );
  });

  it('is drawn with numbers though its lengths are as extreme as the rules allow', () => {
    const extreme = (sketch: Sketch, factor: number): Sketch => ({
      ...sketch,
      parts: sketch.parts.map((part, index) => ({
        ...part,
        space: { ...part.space, lengthMm: index % 2 === 0 ? factor : -factor },
        ...(part.kind === 'thin' && { focalLengthMm: index % 2 === 0 ? 0.001 : -1e6 }),
      })),
    });
    const extremes = fc
      .tuple(anySketch({ leastParts: 1 }), fc.constantFrom(1e6, 1e-12, 0, -1e6))
      .map(([sketch, factor]) => extreme(sketch, factor));
    fc.assert(
      fc.property(anyScreen(extremes), (screen) => {
        expect(badNumbers(painted(pictureOn(screen), 3).marks)).toEqual([]);
      }),
    );
  });
});
