import { describe, expect, it } from 'vitest';
import { gripsAt, MOUSE_RADIUS_PX } from '../../../../app/board/grips.ts';
import { recorderPen } from '../../../../app/board/recorderPen.ts';
import { labelHandles, labelOf, typedByLabel } from '../../../../app/drawing/handles/labels.ts';
import { paintParts } from '../../../../app/layout/paint.ts';
import type { PartId } from '../../../../engine/index.ts';
import { AT_MIDDLE, demoPicture, edited, frontsOf, grip, moveOf } from '../seen.ts';

const picture = demoPicture({ selection: ['p3' as PartId] });
const places = paintParts(recorderPen(), picture);
const handles = labelHandles(picture.sight, places);

describe('the label of a thin part', () => {
  it('is a grip as wide as its text, where the text stands', () => {
    expect(handles.map(({ id }) => id)).toEqual(['label:p1', 'label:p2', 'label:p3', 'label:p4']);
    for (const place of places.filter(({ id }) => id.startsWith('part:'))) {
      const handle = grip({ handles }, place.id.replace('part:', 'label:'));
      expect(handle.xPx - (handle.halfWidthPx ?? 0)).toBeCloseTo(place.xPx, 9);
      expect(handle.xPx + (handle.halfWidthPx ?? 0)).toBeCloseTo(place.xPx + place.widthPx, 9);
      expect(handle.yPx).toBeCloseTo(place.yPx + place.heightPx / 2, 9);
    }
  });

  it('types the focal length at a click', () => {
    expect(typedByLabel('label:p3')).toBe('focal:p3:rear');
    expect(typedByLabel('part:p3')).toBeNull();
    expect(grip(picture, typedByLabel('label:p3') ?? '').entry?.value).toBe(-46);
  });

  it('moves the part at a drag', () => {
    const { reading } = picture;
    const move = moveOf(grip({ handles }, 'label:p3'), { dzMm: 3 });
    const [, , before = 0] = frontsOf(reading.sketch, AT_MIDDLE);
    expect(frontsOf(edited(reading.sketch, move.edit), AT_MIDDLE)[2]).toBeCloseTo(before + 3, 9);
  });

  it('is taken on its text, and gives way to the part on the part’s line', () => {
    const all = [...picture.handles, ...handles];
    const takenAt = (xPx: number, yPx: number) => gripsAt(all, xPx, yPx, MOUSE_RADIUS_PX)[0]?.id;
    const label = grip({ handles }, 'label:p2');
    const part = grip(picture, 'part:p2');
    expect(takenAt(label.xPx + (label.halfWidthPx ?? 0) - 2, label.yPx)).toBe('label:p2');
    expect(takenAt(part.xPx, part.yPx - 40)).toBe('part:p2');
  });

  it('stays put while anything of the part is pointed at', () => {
    for (const id of ['part:p2', 'label:p2', 'focal:p2:rear', 'rim:p2:upper', 'tick:p2'])
      expect(labelOf(id)).toBe('part:p2');
    expect(['object:foot', 'object:tip', 'image', 'field:end'].map(labelOf)).toEqual([
      'object',
      'object',
      'image',
      'image',
    ]);
    expect(['cell:gap:p2', 'track', 'split:gap:p2', 'stop:upper'].map(labelOf)).toEqual([
      null,
      null,
      null,
      null,
    ]);
  });
});
