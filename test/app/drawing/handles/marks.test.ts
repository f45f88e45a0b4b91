import { describe, expect, it } from 'vitest';
import { gripsAt, MOUSE_RADIUS_PX } from '../../../../app/board/grips.ts';
import { xOf, yOf } from '../../../../app/board/viewport.ts';
import { markHandles } from '../../../../app/drawing/handles/marks.ts';
import { ALL_SHOWN, demoPicture, grip } from '../seen.ts';

const picture = demoPicture({ shown: ALL_SHOWN });
const handles = markHandles(picture.sight);

describe('images, pupils and cardinal points', () => {
  it('say what they follow from, and cannot be moved', () => {
    expect(grip({ handles }, 'image:0').why).toBe(
      'The image of first group follows from the parts in front of it.',
    );
    for (const handle of handles) {
      expect(handle).toMatchObject({ fixed: true, drag: null, step: null, entry: null, slider: null });
      expect(handle.why).toMatch(/^The .*\.$/);
    }
    const planes = picture.scene.planes.map(({ name }) => name);
    expect(handles.map(({ id }) => id)).toEqual([
      ...picture.scene.images.map(({ partIndex }) => `image:${partIndex}`),
      ...planes,
    ]);
  });

  it('stand where they are drawn', () => {
    const [image] = picture.scene.images;
    const ends = [yOf(picture.view, 0), yOf(picture.view, image?.heightMm ?? 0)].sort((a, b) => a - b);
    const { xPx, line } = grip({ handles }, 'image:0');
    expect(xPx).toBe(xOf(picture.view, image?.zMm ?? 0));
    expect([line?.topPx, line?.bottomPx]).toEqual(ends);
  });

  it('give way to what can be moved', () => {
    const part = grip(picture, 'part:p2');
    const onPart = { ...grip({ handles }, 'image:0'), xPx: part.xPx, line: part.line };
    expect(gripsAt([onPart, part], part.xPx + 1, part.yPx, MOUSE_RADIUS_PX)[0]?.id).toBe('part:p2');
  });
});
