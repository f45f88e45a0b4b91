import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { overlaps } from '../../../app/board/labels.ts';
import { roughMeasure } from '../../../app/board/measure.ts';
import { recorderPen } from '../../../app/board/recorderPen.ts';
import { textLook } from '../../../app/board/styles.ts';
import { xOf } from '../../../app/board/viewport.ts';
import { cellsOf } from '../../../app/ribbon/cells.ts';
import { extensionLines, ribbonLayer } from '../../../app/ribbon/layer.ts';
import { type PlacedCell, RIBBON_PX, ribbonPlan } from '../../../app/ribbon/layout.ts';
import type { PartId, Sketch } from '../../../engine/index.ts';
import { emptySketch, newThin, settingAt } from '../../../engine/index.ts';
import { inspectionZoom } from '../../engine/demo.ts';
import { anySketch } from '../../engine/sketch/arbitrary.ts';
import { STARTING_SKETCHES } from '../../public/startingSketches.ts';
import { AT_MIDDLE, DESKTOP, demoPicture, PHONE, pictureFor } from '../drawing/seen.ts';

/** Height of a value's text, px. */
const TEXT_PX = 12;
/** Least distance that two values on leaders keep, px. */
const APART_PX = 4;

/** Thin elements with these gaps behind them, the last one's image at the focus. */
const row = (...gaps: readonly number[]): Sketch => ({
  ...emptySketch(),
  parts: gaps.map((lengthMm, index) => ({
    ...newThin(200, `p${index + 1}` as PartId),
    space: { lengthMm, medium: 'air' },
  })),
});

const boxOf = ({ textXPx, textYPx, halfTextPx }: PlacedCell) => ({
  left: textXPx - halfTextPx,
  right: textXPx + halfTextPx,
  top: textYPx - TEXT_PX / 2,
  bottom: textYPx + TEXT_PX / 2,
});

function covering(cells: readonly PlacedCell[], apartPx = 0): readonly string[] {
  return cells.flatMap((one, i) =>
    cells.slice(i + 1).flatMap((other) => {
      const [a, b] = [boxOf(one), boxOf(other)];
      const clear =
        a.right + apartPx <= b.left || b.right + apartPx <= a.left || a.bottom <= b.top || b.bottom <= a.top;
      return clear ? [] : [`${one.id} on ${other.id}`];
    }),
  );
}

const textsOf = (picture: ReturnType<typeof demoPicture>, hovered: string | null = null) => {
  const pen = recorderPen();
  ribbonLayer(pen, picture.plan, picture.view, hovered);
  return pen.marks.flatMap((mark) => (mark.kind === 'text' ? [mark] : []));
};

describe('the ribbon', () => {
  it('shows every dimension under its space, with the digits and the unit chosen', () => {
    const { plan, view } = demoPicture();
    for (const cell of plan.cells) {
      expect([cell.fromPx, cell.toPx]).toEqual([xOf(view, cell.fromMm), xOf(view, cell.toMm)]);
    }
    expect(plan.cells.map(({ text }) => text)).toEqual(['500.000', '26.272', '25.315', '32.413', '26.000']);
    expect(demoPicture({ digits: 1 }).plan.cells[1]?.text).toBe('26.3');
    expect(demoPicture({ unit: 'in' }).plan.cells[1]?.text).toBe('1.03434');
  });

  it('shows the length from the first part to the image below', () => {
    const { plan, view } = demoPicture();
    expect(plan.overall).toMatchObject({ fromPx: xOf(view, 0), text: '110.000' });
    expect(plan.overall?.toPx).toBeCloseTo(xOf(view, 110), 6);
    expect(pictureFor(row(0)).plan.overall).toBeNull();
    expect(pictureFor(emptySketch()).plan).toMatchObject({ cells: [], overall: null });
  });

  it('lies below the drawing and within its height', () => {
    const { plan, view } = demoPicture();
    expect(plan.topPx).toBe(view.heightPx);
    for (const cell of [...plan.cells, ...pictureFor(row(1, 1, 1, 1, 200, 0)).plan.cells]) {
      expect(boxOf(cell).top).toBeGreaterThan(plan.topPx);
      expect(boxOf(cell).bottom).toBeLessThan(plan.topPx + RIBBON_PX);
    }
  });

  it('sets a value that is wider than its space on a leader below the line', () => {
    const { plan } = pictureFor(row(1, 60, 0));
    const [narrow, wide] = plan.cells;
    expect(narrow).toMatchObject({ id: 'gap:p1', onLeader: true });
    expect(narrow?.textYPx).toBeGreaterThan(narrow?.linePx ?? 0);
    expect(wide).toMatchObject({ id: 'gap:p2', onLeader: false });
    expect(wide?.textYPx).toBeLessThan(wide?.linePx ?? 0);
  });

  it('staggers narrow neighbours', () => {
    const { plan } = pictureFor(row(3, 3, 3, 200, 0));
    const rows = new Set(plan.cells.filter(({ onLeader }) => onLeader).map(({ textYPx }) => textYPx));
    expect(rows.size).toBe(2);
    expect(covering(plan.cells)).toEqual([]);
  });

  it('keeps many narrow values apart, pushing them aside where two rows are not enough', () => {
    const { plan } = pictureFor(row(1, 1, 1, 1, 1, 1, 1, 1, 150, 0));
    const leaders = plan.cells.filter(({ onLeader }) => onLeader);
    expect(leaders.length).toBeGreaterThanOrEqual(8);
    expect(covering(leaders, APART_PX)).toEqual([]);
  });

  it('never lets a value cover another on any sketch', () => {
    fc.assert(
      fc.property(
        anySketch({ leastParts: 1 }),
        fc.constantFrom(DESKTOP, PHONE),
        fc.constantFrom('parts' as const, 'everything' as const),
        fc.constantFrom('mm' as const, 'in' as const),
        (sketch, size, what, unit) => {
          const { cells } = pictureFor(sketch, { unit }, size, what).plan;
          expect(covering(cells)).toEqual([]);
        },
      ),
    );
  });
});

/** Digits and small letters fill about this share of their type size; the rest is air above and below. */
const INK_SHARE = 0.8;

/** What a text of the ribbon covers, px. */
function inkOf({ text, xPx, yPx, style, place }: ReturnType<typeof textsOf>[number]) {
  const sizePx = textLook(style).sizePx;
  const heightPx = INK_SHARE * sizePx;
  const widthPx = roughMeasure(text, style);
  const bottomPx = place.baseline === 'bottom' ? yPx - (sizePx - heightPx) : yPx + heightPx / 2;
  return { text, xPx: xPx - widthPx / 2, yPx: bottomPx - heightPx, widthPx, heightPx };
}

/** Pairs of texts on the sheet that cover each other. */
function coveringTexts(picture: ReturnType<typeof demoPicture>): readonly string[] {
  const inks = textsOf(picture).map(inkOf);
  return inks.flatMap((one, i) =>
    inks.slice(i + 1).flatMap((other) => (overlaps(one, other) ? [`${one.text} on ${other.text}`] : [])),
  );
}

describe('no two texts of the ribbon cover each other', () => {
  const boards = [DESKTOP, PHONE].flatMap((size) =>
    (['parts', 'everything'] as const).map((what) => ({ size, what })),
  );

  it.each(STARTING_SKETCHES)('on $sketch.title, at every position', ({ sketch }) => {
    for (const { size, what } of boards)
      for (const { id } of sketch.positions)
        for (const digits of [1, 3, 6]) {
          const picture = pictureFor(sketch, { setting: settingAt(id), digits }, size, what);
          expect(coveringTexts(picture), `${id} on ${size.widthPx} px`).toEqual([]);
        }
  });

  it.each([
    ['a pair of narrow gaps', row(8.245, 60, 3, 0)],
    ['many narrow gaps', row(1, 2, 1, 2, 1, 2, 150, 0)],
    ['a narrow gap beside a wide one that cannot be built', row(40, 2, -30, 40, 0)],
  ])('with %s', (_what, sketch) => {
    for (const { size, what } of boards)
      expect(coveringTexts(pictureFor({ ...sketch, image: 'focus' }, {}, size, what))).toEqual([]);
  });

  it('and those of narrow gaps stay on the sheet', () => {
    for (const { size, what } of boards) {
      const picture = pictureFor(row(1, 1, 1, 150, 1, 1, 0), {}, size, what);
      for (const { xPx, widthPx } of textsOf(picture).map(inkOf)) {
        expect(xPx).toBeGreaterThanOrEqual(0);
        expect(xPx + widthPx).toBeLessThanOrEqual(size.widthPx);
      }
    }
  });
});

describe('a dimension that runs off the sheet', () => {
  it('shows its value on the piece that is in view', () => {
    const { view, sight } = demoPicture();
    const close = { ...view, originMm: 30, pxPerMm: 40 };
    const { cells } = ribbonPlan(cellsOf({ ...sight, view: close }), { ...sight, view: close }, roughMeasure);
    const value = cells.find(({ id }) => id === 'gap:p2');
    expect(value?.toPx).toBeLessThan(close.widthPx);
    expect(value?.textXPx).toBeCloseTo((value?.toPx ?? 0) / 2, 6);
    const beside = cells.find(({ id }) => id === 'gap:p4');
    expect((beside?.textXPx ?? 0) - (beside?.halfTextPx ?? 0)).toBeGreaterThanOrEqual(close.widthPx);
  });
});

describe('the ribbon’s words', () => {
  it('mark what is common on a narrow screen too, where there is room', () => {
    const { cells } = demoPicture({ digits: 1 }, PHONE).plan;
    expect(cells.filter(({ mark }) => mark?.text === '= all').map(({ id }) => id)).toEqual([
      'object',
      'gap:p4',
    ]);
  });

  it('are the values, then what is common or follows, and the whole length', () => {
    expect(textsOf(demoPicture()).map(({ text }) => text)).toEqual(
      expect.arrayContaining(['26.272', '= all', '110.000']),
    );
    const following = pictureFor({ ...inspectionZoom(), image: 'focus' }, { setting: AT_MIDDLE });
    expect(textsOf(following).map(({ text }) => text)).toContain('follows focus');
  });

  it('are stronger while hovered and quiet where they follow', () => {
    const styleOf = (text: string, hovered: string | null) =>
      textsOf(demoPicture(), hovered).find((mark) => mark.text === text)?.style;
    expect(styleOf('26.272', null)).toBe('value');
    expect(styleOf('26.272', 'cell:gap:p1')).toBe('value strong');
    const following = pictureFor({ ...inspectionZoom(), image: 'focus' }, { setting: AT_MIDDLE });
    expect(textsOf(following).find(({ text }) => text === '26.000')?.style).toBe('value quiet');
  });

  it.each([
    ['part:p2', ['gap:p1', 'gap:p2']],
    ['tick:p1', ['object', 'gap:p1']],
    ['cell:gap:p2', ['gap:p2']],
    ['object:foot', ['object']],
    ['image', ['gap:p4']],
    ['rim:p2:upper', []],
  ])('are strong for what %s changes', (hovered, ids) => {
    const { cells } = demoPicture().plan;
    const strong = textsOf(demoPicture(), hovered).filter(({ style }) => style === 'value strong');
    expect(strong.map(({ text }) => text)).toEqual(
      ids.map((id) => cells.find((cell) => cell.id === id)?.text),
    );
  });

  it.each([
    ['wide', -30],
    ['narrow', -2],
  ])('say once that a %s gap cannot be built, clear of its value', (_which, gapMm) => {
    const picture = pictureFor(row(40, gapMm, 40, 0));
    const cell = picture.plan.cells.find(({ id }) => id === 'gap:p2');
    expect(cell?.bad).toBe(true);
    const words = textsOf(picture).filter(({ text }) => text.includes('cannot be built'));
    expect(words).toHaveLength(1);
    const value = textsOf(picture).find(({ text }) => text.startsWith(`\u2212${-gapMm}.000`));
    const apart = Math.abs((value?.yPx ?? 0) - (words[0]?.yPx ?? 0));
    expect(value?.text === words[0]?.text || apart >= TEXT_PX).toBe(true);
  });

  it('come with a hatch and a reversed line where a gap cannot be built', () => {
    const picture = pictureFor(row(40, -30, 40, 0));
    const pen = recorderPen();
    ribbonLayer(pen, picture.plan, picture.view, null);
    const lines = (style: string) =>
      pen.marks.flatMap((mark) => (mark.kind === 'lines' && mark.style === style ? mark.lines : []));
    expect(lines('hatch').length).toBeGreaterThan(3);
    const [bad] = lines('dimension bad');
    expect(bad?.[0]).toBeGreaterThan(bad?.[2] ?? 0);
  });
});

describe('the hatch of a gap that cannot be built', () => {
  it('is drawn on the sheet only, however deep one looks into it', () => {
    const { plan, view } = pictureFor(row(40, -30, 40, 0));
    const cells = plan.cells.map((cell) => ({ ...cell, fromPx: 1e9, toPx: -1e9 }));
    const pen = recorderPen();
    ribbonLayer(pen, { ...plan, cells }, view, null);
    const strokes = pen.marks.filter((mark) => mark.kind === 'lines' && mark.style === 'hatch');
    expect(strokes.length).toBeGreaterThan(100);
    expect(strokes.length).toBeLessThan(view.widthPx);
  });
});

describe('extension lines', () => {
  it('come down once from every place that is dimensioned', () => {
    const { plan, view } = demoPicture();
    const pen = recorderPen(6);
    extensionLines(pen, plan, view);
    const places = new Set(plan.cells.flatMap(({ fromPx, toPx }) => [fromPx, toPx]));
    expect(pen.marks).toHaveLength(places.size);
  });

  it('are measured with the type that is drawn', () => {
    const [cell] = demoPicture().plan.cells;
    expect(cell?.halfTextPx).toBe(roughMeasure('500.000', 'value') / 2);
  });
});
