import { describe, expect, it } from 'vitest';
import { type Mark, recorderPen } from '../../../../app/board/recorderPen.ts';
import { xOf, yOf, zOf } from '../../../../app/board/viewport.ts';
import type { Handle } from '../../../../app/drawing/handle.ts';
import { fittedTimes, loupeLook, REAL_PX_PER_MM } from '../../../../app/drawing/loupe/look.ts';
import { type Loupe, TARGET_PX } from '../../../../app/drawing/loupe/loupe.ts';
import { paintLoupe } from '../../../../app/layout/paint.ts';
import type { Picture } from '../../../../app/layout/picture.ts';
import { type LoupeView, viewStore } from '../../../../app/store/viewStore.ts';
import { inspectionZoom } from '../../../engine/demo.ts';
import { realZoom } from '../../../engine/realZoom.ts';
import { readingOf } from '../../reading.ts';
import { AT_MIDDLE, demoPicture, grip, PHONE, pictureFor } from '../seen.ts';

const { loupe: AS_AT_FIRST } = viewStore.getInitialState();
const withLoupe = (change: Partial<LoupeView> = {}) => ({
  loupe: { ...AS_AT_FIRST, shown: true, ...change },
});

function loupeIn({ loupe }: Picture): Loupe {
  if (!loupe) throw new Error('there is a loupe');
  return loupe;
}

function drawn(picture: Picture): readonly Mark[] {
  const pen = recorderPen(3);
  paintLoupe(pen, picture);
  return pen.marks;
}

const inside = (marks: readonly Mark[]): readonly Mark[] =>
  marks.flatMap((mark) => (mark.kind === 'clipped' ? mark.marks : []));
const linesOf = (marks: readonly Mark[], style: string) =>
  marks.flatMap((mark) => (mark.kind === 'lines' && mark.style === style ? mark.lines : []));

const zoom = realZoom();
const picture = pictureFor(zoom, withLoupe());
const loupe = loupeIn(picture);

describe('the loupe', () => {
  it('is not there until it is asked for', () => {
    expect(pictureFor(zoom).loupe).toBeNull();
    expect(drawn(pictureFor(zoom))).toEqual([]);
  });

  it('looks at the end of the field on the image plane, its ring beside that point', () => {
    const { look, target, xPx, yPx, radiusPx } = loupe;
    const { conjugates, light, train } = picture.reading.analysis;
    const lastMm = train.z.at(-1) ?? 0;
    expect(conjugates.imagePlaneMm.ok && light.imageHeightMm.ok).toBe(true);
    if (!conjugates.imagePlaneMm.ok || !light.imageHeightMm.ok) return;
    expect(look.zMm).toBeCloseTo(lastMm + conjugates.imagePlaneMm.value, 9);
    expect(look.yMm).toBeCloseTo(light.imageHeightMm.value, 9);
    expect(Math.hypot(xPx - target.xPx, yPx - target.yPx)).toBeGreaterThanOrEqual(
      radiusPx + TARGET_PX - 1e-6,
    );
  });

  it('lies on the sheet, also on a phone and wherever it looks', () => {
    for (const size of [undefined, PHONE]) {
      for (const zMm of [null, -20, 0, 60, 500]) {
        const { view, loupe: there } = pictureFor(zoom, withLoupe({ zMm, heightMm: 0 }), size);
        const { xPx, yPx, radiusPx } = there ?? loupe;
        expect(xPx - radiusPx).toBeGreaterThanOrEqual(0);
        expect(xPx + radiusPx).toBeLessThanOrEqual(view.widthPx);
        expect(yPx - radiusPx).toBeGreaterThanOrEqual(0);
        expect(yPx + radiusPx).toBeLessThanOrEqual(view.heightPx);
      }
    }
  });

  it('has scales of its own, in times of real size', () => {
    const there = loupeIn(pictureFor(zoom, withLoupe({ lengths: 4, heights: 40 })));
    const { inside: view, look, xPx, yPx } = there;
    expect(xOf(view, look.zMm)).toBeCloseTo(xPx, 6);
    expect(yOf(view, look.yMm)).toBeCloseTo(yPx, 6);
    expect(xOf(view, look.zMm + 1) - xPx).toBeCloseTo(4 * REAL_PX_PER_MM, 6);
    expect(yPx - yOf(view, look.yMm + 0.1)).toBeCloseTo(4 * REAL_PX_PER_MM, 6);
  });

  it('fits magnifications in steps of 1, 2 and 5 so that image and best focus are inside', () => {
    const { lengths, heights } = fittedTimes(loupe.look);
    for (const times of [lengths, heights]) {
      const first = Number(times.toExponential(6).split('e')[0]);
      expect([1, 2, 5]).toContain(first);
    }
    for (const place of [loupe.look.bestFocus, loupe.look.paraxialPoint]) {
      expect(place).not.toBeNull();
      if (!place) continue;
      const [x, y] = [xOf(loupe.inside, place.zMm), yOf(loupe.inside, place.yMm)];
      expect(Math.hypot(x - loupe.xPx, y - loupe.yPx)).toBeLessThan(loupe.radiusPx);
    }
  });

  it('shows exact and paraxial rays of the field nearest to it', () => {
    const marks = inside(drawn(picture));
    expect(linesOf(marks, 'field outer bundle')).toHaveLength(9);
    expect(linesOf(marks, 'field outer bundle paraxial').length).toBeGreaterThan(0);
    const onAxis = loupeIn(pictureFor(zoom, withLoupe({ heightMm: 0.2 })));
    expect(onAxis.look.share).toBe(0);
  });

  it('draws the Airy disc to scale and a tick for each pixel', () => {
    const shown = pictureFor(
      { ...zoom, sensor: { size: { widthMm: 8, heightMm: 6 }, pixelPitchMm: 0.005 } },
      withLoupe({ heights: 400 }),
    );
    const marks = inside(drawn(shown));
    const { inside: view } = loupeIn(shown);
    const ticks = linesOf(marks, 'scale bar').map(([, y = 0]) => y);
    const pitch = 0.005 * view.pxPerMm * view.stretch;
    for (const [i, y] of ticks.slice(1).entries())
      expect(Math.abs(y - (ticks[i] ?? 0))).toBeCloseTo(pitch, 2);
    const [airy = []] = linesOf(marks, 'loupe airy');
    // 1.22 λ F to either side.
    const radius = 1.22 * zoom.lines.mainNm * 1e-6 * 8;
    expect(Math.abs((airy[3] ?? 0) - (airy[5] ?? 0))).toBeCloseTo(
      2 * radius * view.pxPerMm * view.stretch,
      2,
    );
  });

  it('of ideal parts shows one solid pencil through one point', () => {
    const ideal = demoPicture(withLoupe());
    const marks = inside(drawn(ideal));
    expect(linesOf(marks, 'field outer bundle')).toHaveLength(9);
    expect(linesOf(marks, 'field outer bundle paraxial')).toEqual([]);
    const { rmsMm } = loupeIn(ideal).look;
    expect(rmsMm.ok && rmsMm.value).toBeLessThan(1e-9);
  });
});

describe('the plane through focus', () => {
  const rmsAt = (planeMm: number): number => {
    const look = loupeLook(readingOf(zoom, withLoupe({ planeMm })));
    return look?.rmsMm.ok ? look.rmsMm.value : Number.NaN;
  };

  it('has the least spot at the best focus', () => {
    const { bestFocus, zMm } = loupe.look;
    const best = (bestFocus?.zMm ?? 0) - zMm;
    expect(Math.abs(best)).toBeGreaterThan(0.1);
    expect(rmsAt(best)).toBeLessThan(rmsAt(0));
    for (const beside of [-0.02, 0.02]) expect(rmsAt(best)).toBeLessThan(rmsAt(best + beside));
  });

  it('tells nothing of a spot in front of the last surface', () => {
    const look = loupeLook(readingOf(zoom, withLoupe({ zMm: 5 })));
    expect(look?.rmsMm).toEqual({ ok: false, why: 'only behind the last surface' });
  });
});

describe('grips of the loupe', () => {
  const viewing = (handle: Handle) => {
    if (!handle.viewing) throw new Error(`${handle.id} changes the view`);
    return handle.viewing;
  };
  const ring = grip(picture, 'loupe');

  it('drag what it looks at with the pointer', () => {
    const { change } = viewing(ring).drag(-200, 30, false);
    const { zMm, heightMm } = change.loupe ?? AS_AT_FIRST;
    expect(xOf(picture.view, zMm ?? 0)).toBeCloseTo(loupe.target.xPx - 200, 6);
    expect(yOf(picture.view, heightMm ?? 0)).toBeCloseTo(loupe.target.yPx + 30, 6);
  });

  it('are caught by the image plane and the end of the field', () => {
    const away = grip(
      pictureFor(
        zoom,
        withLoupe({ zMm: zOf(picture.view, loupe.target.xPx - 100), heightMm: loupe.look.yMm }),
      ),
      'loupe',
    );
    expect(viewing(away).drag(97, 2, true).change.loupe).toMatchObject({ zMm: null, heightMm: null });
    expect(viewing(away).drag(97, 2, false).change.loupe?.zMm).not.toBeNull();
    expect(viewing(away).drag(50, 2, true).change.loupe?.zMm).not.toBeNull();
  });

  it('move the plane, and not out of the ring', () => {
    const plane = grip(picture, 'loupe:plane');
    const moved = viewing(plane).drag(20, 0, true).change.loupe?.planeMm ?? 0;
    expect(moved).toBeCloseTo(20 / loupe.inside.pxPerMm, 9);
    expect(viewing(plane).drag(5000, 0, true).change.loupe?.planeMm).toBe(loupe.halfMm);
  });

  it('have steps by keys and say their values', () => {
    const plane = grip(picture, 'loupe:plane');
    expect(viewing(plane).step(1).change.loupe?.planeMm).toBeGreaterThan(0);
    expect(plane.slider?.valueText).toMatch(/^plane 0 µm, rms \d+\.\d\d µm$/);
    expect(viewing(grip(picture, 'loupe:height')).step(0.5).change.loupe?.heightMm).toBeCloseTo(
      loupe.look.yMm + 0.5,
      9,
    );
    expect(viewing(ring).step(-2).change.loupe?.zMm).toBeCloseTo(loupe.look.zMm - 2, 9);
  });

  it('leave the sketch as it is', () => {
    for (const id of ['loupe', 'loupe:plane', 'loupe:height']) {
      expect(grip(picture, id).drag).toBeNull();
      expect(Object.keys(viewing(grip(picture, id)).drag(3, 3, true).change)).toEqual(['loupe']);
    }
  });
});

it('an empty sheet has no loupe', () => {
  const empty = { ...inspectionZoom(), parts: [], stop: null };
  expect(loupeLook(readingOf(empty, { setting: AT_MIDDLE, ...withLoupe() }))).toBeNull();
});
