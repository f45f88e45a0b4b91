import { describe, expect, it } from 'vitest';
import { type Mark, recorderPen } from '../../../app/board/recorderPen.ts';
import { xOf } from '../../../app/board/viewport.ts';
import type { Move } from '../../../app/drawing/handle.ts';
import { type HandState, overlayLayer } from '../../../app/layout/overlay.ts';
import type { PartId } from '../../../engine/index.ts';
import { BETWEEN_MIDDLE_AND_NARROW, demoPicture, grip } from '../drawing/seen.ts';

const IDLE: HandState = { hover: null, focus: null, ring: false, dragging: null, dropXPx: null };
const picture = demoPicture({ selection: ['p2' as PartId] });

function drawn(hand: Partial<HandState>, { handles, view, plan } = picture): readonly Mark[] {
  const pen = recorderPen(3);
  overlayLayer(pen, handles, view, plan.topPx, { ...IDLE, ...hand });
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
    const dragging = { id: 'part:p2', xPx: 300, yPx: 200, move, fromPx: 250 };

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

    it('writes to the left of a pointer near the right edge, and never above the sheet', () => {
      const at = (xPx: number, yPx: number) =>
        drawn({ dragging: { ...dragging, xPx, yPx } }).find((mark) => mark.kind === 'text');
      expect(at(picture.view.widthPx - 20, 200)).toMatchObject({ place: { align: 'right' } });
      expect(at(300, 200)).toMatchObject({ place: { align: 'left' } });
      expect(at(300, 2)).toMatchObject({ yPx: 20 });
    });
  });
});
