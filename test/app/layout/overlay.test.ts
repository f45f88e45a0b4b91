import { describe, expect, it } from 'vitest';
import { type LabelPlace, overlaps } from '../../../app/board/labels.ts';
import { roughMeasure } from '../../../app/board/measure.ts';
import { type Mark, recorderPen } from '../../../app/board/recorderPen.ts';
import { xOf } from '../../../app/board/viewport.ts';
import type { Move } from '../../../app/drawing/handle.ts';
import { type HandState, IDLE_HAND, type OverlayRoom, overlayLayer } from '../../../app/layout/overlay.ts';
import type { PartId } from '../../../engine/index.ts';
import { BETWEEN_MIDDLE_AND_NARROW, demoPicture, grip } from '../drawing/seen.ts';

const ROOM: OverlayRoom = { measure: roughMeasure, labels: [], former: [] };
const picture = demoPicture({ selection: ['p2' as PartId] });

function drawn(hand: Partial<HandState>, { handles, view, plan } = picture): readonly Mark[] {
  const pen = recorderPen(3);
  overlayLayer(pen, handles, view, plan.topPx, { ...IDLE_HAND, ...hand }, ROOM);
  return pen.marks;
}

const withStyle = (marks: readonly Mark[], style: string) =>
  marks.filter((mark) => 'style' in mark && mark.style === style);
const texts = (marks: readonly Mark[]) => marks.flatMap((mark) => (mark.kind === 'text' ? [mark.text] : []));

describe('the overlay', () => {
  it('shows the grips of what is selected; one that cannot be dragged now is hollow', () => {
    expect(withStyle(drawn({}), 'grip').length).toBeGreaterThan(4);
    const between = demoPicture({ setting: BETWEEN_MIDDLE_AND_NARROW });
    const hollow = withStyle(drawn({}, between), 'grip hollow');
    const held = between.handles.filter(({ look, drag }) => look !== 'none' && drag === null);
    expect(hollow).toHaveLength(held.length);
  });

  it('fills the grip under the pointer', () => {
    expect(withStyle(drawn({}), 'grip hover')).toEqual([]);
    const { xPx, yPx } = grip(picture, 'focal:p2:rear');
    expect(withStyle(drawn({ hover: 'focal:p2:rear' }), 'grip hover')).toEqual([
      expect.objectContaining({ kind: 'circle', xPx: expect.closeTo(xPx, 3), yPx: expect.closeTo(yPx, 3) }),
    ]);
  });

  it('rings the focused grip when the focus came by the keyboard only', () => {
    expect(withStyle(drawn({ focus: 'part:p2', ring: true }), 'grip focus')).toHaveLength(1);
    expect(withStyle(drawn({ focus: 'part:p2', ring: false }), 'grip focus')).toEqual([]);
    expect(withStyle(drawn({ focus: 'cell:gap:p2', ring: true }), 'grip focus')[0]?.kind).toBe('closed');
  });

  it('shows where what comes from the tray would be set down', () => {
    expect(withStyle(drawn({ dropXPx: 333 }), 'drop place')).toEqual([
      expect.objectContaining({ lines: [[333, 16, 333, picture.plan.topPx]] }),
    ]);
  });

  describe('during a drag', () => {
    const move: Move = { edit: (sketch) => sketch, says: '28.000 mm', caught: null, frameMm: 0 };
    const dragging = {
      id: 'part:p2',
      xPx: 300,
      yPx: 200,
      move,
      from: { xPx: 250, yPx: 200 },
      byFinger: false,
    };

    it('says the value at the pointer and shows the old place', () => {
      const marks = drawn({ dragging });
      expect(texts(marks)).toEqual(['28.000 mm']);
      expect(withStyle(marks, 'former place')).toEqual([
        expect.objectContaining({ lines: [[250, 16, 250, picture.plan.topPx]] }),
      ]);
    });

    it('names what caught it and marks its place, in the frame that moved with the first part', () => {
      const caught = { at: 54, name: 'rear focus of second group' };
      const marks = drawn({ dragging: { ...dragging, move: { ...move, caught, frameMm: 4 } } });
      expect(texts(marks)).toEqual(['28.000 mm', 'rear focus of second group']);
      const [mark] = withStyle(marks, 'snap');
      expect(mark?.kind === 'lines' && mark.lines[0]?.[0]).toBeCloseTo(xOf(picture.view, 50), 2);
    });

    const wordsAt = (xPx: number, yPx: number, change = {}, room = ROOM) => {
      const pen = recorderPen(3);
      const hand = { ...IDLE_HAND, dragging: { ...dragging, xPx, yPx, ...change } };
      const { handles, view, plan } = picture;
      const [place] = overlayLayer(pen, handles, view, plan.topPx, hand, room);
      return place as LabelPlace;
    };

    it('writes beside the pointer, to its left near the right edge, and never off the sheet', () => {
      expect(wordsAt(300, 200).xPx).toBeGreaterThan(300);
      const { xPx, widthPx } = wordsAt(picture.view.widthPx - 20, 200);
      expect(xPx + widthPx).toBeLessThan(picture.view.widthPx - 20);
      expect(wordsAt(300, 2).yPx).toBeGreaterThan(2);
    });

    it('writes where neither a label nor a finger hides it, and does not jump from side to side', () => {
      const free = wordsAt(300, 200);
      const dodged = wordsAt(300, 200, {}, { ...ROOM, labels: [free] });
      expect(overlaps(free, dodged)).toBe(false);
      expect(wordsAt(304, 200, {}, { ...ROOM, former: [dodged] }).side).toBe(dodged.side);
      expect(200 - wordsAt(300, 200, { byFinger: true }).yPx).toBeGreaterThan(200 - free.yPx);
    });

    it('marks the old height of what is dragged up or down', () => {
      const upper = grip(picture, 'stop:upper');
      const from = { xPx: upper.xPx, yPx: upper.yPx + 30 };
      const marks = drawn({ dragging: { ...dragging, id: 'stop:upper', from } });
      const [mark] = withStyle(marks, 'former place');
      const [line] = mark?.kind === 'lines' ? mark.lines : [];
      expect([line?.[1], line?.[3]]).toEqual([expect.closeTo(from.yPx, 3), expect.closeTo(from.yPx, 3)]);
    });
  });

  it('says at the focus ring how far an arrow key goes', () => {
    expect(texts(drawn({ focus: 'part:p2', ring: true, step: '0.1 mm' }))).toEqual(['step 0.1 mm']);
    expect(texts(drawn({ focus: 'part:p2', ring: false, step: '0.1 mm' }))).toEqual([]);
  });
});
