import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Box } from '../../../../app/board/labels.ts';
import { overlaps } from '../../../../app/board/labels.ts';
import { roughMeasure } from '../../../../app/board/measure.ts';
import { recorderPen } from '../../../../app/board/recorderPen.ts';
import { newViewport } from '../../../../app/board/viewport.ts';
import { labelsLayer, labelsOf } from '../../../../app/drawing/layers/labels.ts';
import { paintParts } from '../../../../app/layout/paint.ts';
import type { Picture } from '../../../../app/layout/picture.ts';
import { viewToolsBox } from '../../../../app/layout/viewToolsBox.ts';
import type { Part, PartId, Sketch } from '../../../../engine/index.ts';
import { emptySketch, newPlate, newStop, settingAt } from '../../../../engine/index.ts';
import { inspectionZoom } from '../../../engine/demo.ts';
import { anySketch } from '../../../engine/sketch/arbitrary.ts';
import { STARTING_SKETCHES } from '../../../public/startingSketches.ts';
import { ALL_SHOWN, AT_MIDDLE, DESKTOP, demoPicture, PHONE, pictureFor, sceneFor } from '../seen.ts';

const placesOf = (picture: Picture) => paintParts(recorderPen(), picture);
/** The labels of what is in view. */
const inView = ({ labels, view }: Picture) => labels.filter(({ xPx }) => xPx >= 0 && xPx <= view.widthPx);

/** Pairs of labels that cover each other. */
function covering(picture: Picture): readonly string[] {
  const places = placesOf(picture);
  return places.flatMap((one, i) =>
    places.slice(i + 1).flatMap((other) => (overlaps(one, other) ? [`${one.id} on ${other.id}`] : [])),
  );
}

/** A long train, whose many images are named far above and below it. */
const crowd = (): Sketch => {
  const [first] = inspectionZoom().parts;
  if (first?.kind !== 'thin') throw new Error('the inspection zoom begins with a thin part');
  const parts = Array.from(
    { length: 12 },
    (_, i): Part => ({
      ...first,
      id: `p${i + 1}` as PartId,
      name: '',
      focalLengthMm: [60, -120, 90, 200][i % 4] ?? 1,
      space: { lengthMm: 4 + (i % 5), medium: 'air' },
    }),
  );
  return { ...inspectionZoom(), parts, stop: 'p2' as PartId };
};

const textsOf = ({ labels }: Picture) => Object.fromEntries(labels.map(({ id, text }) => [id, text]));

describe('the labels', () => {
  it('keep clear of what lies over the drawing', () => {
    const picture = pictureFor(crowd(), { setting: AT_MIDDLE });
    const tools = viewToolsBox(picture.view.widthPx);
    const over = (covered: readonly Box[]) =>
      paintParts(recorderPen(), picture, null, { former: [], frozen: new Set(), covered }).filter((place) =>
        overlaps(place, tools),
      );
    expect(over([])).not.toEqual([]);
    expect(over([tools])).toEqual([]);
  });
});

describe('the labels of the demo', () => {
  it('say the focal lengths, and which part carries the stop', () => {
    expect(textsOf(demoPicture())).toMatchObject({
      'part:p1': 'f \u221232',
      'part:p2': 'f 28, stop',
      'part:p3': 'f \u221246',
      'part:p4': 'f 48',
      image: 'sensor',
      'marginal ray': 'marginal ray',
      'chief ray': 'chief ray',
    });
  });

  it('say how far away and how large the object is, in the unit shown', () => {
    expect(textsOf(demoPicture())).toMatchObject({
      object: expect.stringMatching(/^object 500 mm away, ±68\.[78] mm, not to scale$/),
    });
    expect(textsOf(demoPicture({ unit: 'in' }))).toMatchObject({
      object: expect.stringMatching(/^object 19\.68504 in away, ±2\.70\d in, not to scale$/),
    });
    const whole = pictureFor(inspectionZoom(), { setting: AT_MIDDLE }, DESKTOP, 'everything');
    expect(textsOf(whole).object).toMatch(/^object 500 mm away, ±68\.[78] mm$/);
  });

  it('name an image after the part that forms it, or as the object of the part in front of it', () => {
    expect(textsOf(demoPicture())).toMatchObject({
      'image:0': 'image of first group',
      'image:1': 'object for third group',
    });
  });

  it('stand where none covers another, with everything switched on', () => {
    const picture = demoPicture({ shown: ALL_SHOWN });
    expect(placesOf(picture).map(({ id }) => id)).toEqual(inView(picture).map(({ id }) => id));
    expect(covering(picture)).toEqual([]);
  });

  it('are left out when switched off', () => {
    expect(demoPicture({ shown: { ...ALL_SHOWN, labels: false } }).labels).toEqual([]);
  });

  it('keep their side while something is hovered, though the layout moves under them', () => {
    const before = placesOf(demoPicture());
    const { labels, scene, view } = demoPicture({ setting: { ...AT_MIDDLE, toNext: 0.2 } });
    const frozen = new Set(before.map(({ id }) => id));
    const after = labelsLayer(recorderPen(), labels, scene, view, [], before, frozen);
    const sides = (places: typeof before) => new Map(places.map(({ id, side, step }) => [id, [side, step]]));
    for (const [id, side] of sides(after)) if (frozen.has(id)) expect(side).toEqual(sides(before).get(id));
  });
});

describe('labels', () => {
  it('call a plate and a diaphragm by name or kind, and a stop a stop', () => {
    const sketch = {
      ...emptySketch(),
      parts: [newPlate(2, 'p1' as PartId), newStop('p2' as PartId), newStop('p3' as PartId)],
      stop: 'p2' as PartId,
    };
    expect(textsOf(pictureFor(sketch))).toMatchObject({
      'part:p1': 'plate 1',
      'part:p2': 'stop',
      'part:p3': 'stop 3',
    });
  });

  it('of what lies beside the view are not drawn', () => {
    const scene = sceneFor(inspectionZoom(), { setting: AT_MIDDLE });
    const close = { ...newViewport(400, 300), originMm: 80, pxPerMm: 20 };
    const pen = recorderPen();
    labelsLayer(pen, labelsOf(scene, close, 'mm', roughMeasure), scene, close, [], [], new Set());
    const texts = pen.marks.flatMap((mark) => (mark.kind === 'text' ? [mark.text] : []));
    expect(texts).toContain('f 48');
    expect(texts).not.toContain('f 28, stop');
  });

  it('never cover each other on any sketch', () => {
    fc.assert(
      fc.property(
        anySketch({ leastParts: 1 }),
        fc.constantFrom(DESKTOP, PHONE),
        fc.constantFrom('parts' as const, 'everything' as const),
        (sketch, size, what) => {
          expect(covering(pictureFor(sketch, { shown: ALL_SHOWN }, size, what))).toEqual([]);
        },
      ),
    );
  });
});

describe.each(STARTING_SKETCHES)('the labels of $sketch.title', ({ sketch }) => {
  it.each([
    ['a desk', DESKTOP],
    ['a phone', PHONE],
  ])('all stand on the sheet of %s, and none covers another', (_which, size) => {
    for (const { id } of sketch.positions) {
      const picture = pictureFor(sketch, { setting: settingAt(id) }, size);
      const shown = placesOf(picture);
      expect(covering(picture)).toEqual([]);
      expect(shown.map((place) => place.id)).toEqual(inView(picture).map((label) => label.id));
      for (const { xPx, widthPx, yPx, heightPx } of shown) {
        expect([xPx >= 0, xPx + widthPx <= size.widthPx]).toEqual([true, true]);
        expect([yPx >= 0, yPx + heightPx <= picture.view.heightPx]).toEqual([true, true]);
      }
      expect(covering(pictureFor(sketch, { setting: settingAt(id), shown: ALL_SHOWN }, size))).toEqual([]);
    }
  });
});
