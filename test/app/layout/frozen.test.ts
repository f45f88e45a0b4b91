import { describe, expect, it } from 'vitest';
import { recorderPen } from '../../../app/board/recorderPen.ts';
import { frozenLabels } from '../../../app/layout/frozen.ts';
import { IDLE_HAND } from '../../../app/layout/overlay.ts';
import { paintParts } from '../../../app/layout/paint.ts';
import { demoPicture } from '../drawing/seen.ts';

const picture = demoPicture();
const places = paintParts(recorderPen(), picture);
const move = { edit: <T>(sketch: T) => sketch, says: '', caught: null, frameMm: 0 };
const dragging = { id: 'part:p3', xPx: 0, yPx: 0, move, from: { xPx: 0, yPx: 0 }, byFinger: false };
const frozen = (change: object) => [...frozenLabels({ ...IDLE_HAND, ...change }, places)];

describe('labels freeze', () => {
  it('one by one where they are pointed at or their grip has the focus', () => {
    expect(frozen({})).toEqual([]);
    expect(frozen({ hover: 'label:p3' })).toEqual(['part:p3']);
    expect(frozen({ hover: 'part:p2', focus: 'focal:p4:rear' })).toEqual(['part:p2', 'part:p4']);
    expect(frozen({ hover: 'cell:gap:p2' })).toEqual([]);
  });

  it('all together while something is dragged', () => {
    expect(frozen({ dragging })).toEqual(places.map(({ id }) => id));
  });
});
