import { describe, expect, it } from 'vitest';
import { distanceTo, gripsAt, MOUSE_RADIUS_PX } from '../../../app/board/grips.ts';
import { roughMeasure } from '../../../app/board/measure.ts';
import { type Mark, recorderPen } from '../../../app/board/recorderPen.ts';
import { IDLE_HAND, overlayLayer } from '../../../app/layout/overlay.ts';
import { sketchStore } from '../../../app/store/sketchStore.ts';
import { type LoupeView, viewStore } from '../../../app/store/viewStore.ts';
import { realZoom } from '../../engine/realZoom.ts';
import { DrawingHand } from './drawingHand.ts';

const { loupe: AS_AT_FIRST } = viewStore.getInitialState();
const newHand = (change: Partial<LoupeView> = {}) =>
  new DrawingHand(realZoom(), { loupe: { ...AS_AT_FIRST, shown: true, ...change } });
const loupe = () => viewStore.getState().loupe;

describe('a hand on the loupe', () => {
  it('drags what it looks at, and changes nothing of the sketch', () => {
    const hand = newHand();
    const before = sketchStore.getState();
    hand.pressGrip('loupe').moveBy(-100).moveBy(-60, 12).release();
    expect(loupe().zMm).toBeCloseTo(hand.picture.loupe?.look.zMm ?? 0, 9);
    expect(loupe().zMm).not.toBeNull();
    expect(sketchStore.getState().sketch).toBe(before.sketch);
    expect(sketchStore.getState().past).toBe(before.past);
    expect(hand.focused).toEqual([]);
  });

  it('puts it back when the drag is given up', () => {
    const hand = newHand();
    const before = loupe();
    hand.pressGrip('loupe').moveBy(-100);
    expect(loupe()).not.toEqual(before);
    hand.escape();
    expect(loupe()).toEqual(before);
  });

  it('says the plane through focus while it is dragged, finely with Alt', () => {
    const hand = newHand();
    const perPx = 1 / (hand.picture.loupe?.inside.pxPerMm ?? 1);
    hand.pressGrip('loupe:plane').moveBy(20);
    expect(loupe().planeMm).toBeCloseTo(20 * perPx, 9);
    expect(hand.state.dragging?.move.says).toMatch(/^plane \+[\d.]+ µm$/);
    hand.hold({ alt: true }).moveBy(20).release();
    expect(loupe().planeMm).toBeCloseTo(22 * perPx, 9);
  });

  it('focuses its slider with a click, and steps it by keys', () => {
    const hand = newHand();
    hand.clickGrip('loupe');
    expect(hand.focused).toEqual(['loupe']);
    const zMm = hand.picture.loupe?.look.zMm ?? 0;
    hand.hand.step('loupe', -0.5, false);
    expect(loupe().zMm).toBeCloseTo(zMm - 0.5, 9);
  });
});

describe('what lies under the ring', () => {
  it('is neither drawn nor taken, but keeps its slider', () => {
    const hand = newHand({ heightMm: 0 });
    const { picture } = hand;
    const ring = hand.grip('loupe');
    const [xPx, yPx] = [ring.xPx + 20, ring.yPx - 20];
    expect(gripsAt(picture.handles, xPx, yPx, MOUSE_RADIUS_PX)[0]?.id).toBe('loupe');
    const inside = picture.handles.filter(
      (handle) => !handle.id.startsWith('loupe') && distanceTo(ring, handle.xPx, handle.yPx) === 0,
    );
    expect(inside.some(({ slider }) => slider !== null)).toBe(true);
    for (const handle of inside) expect(handle.look).toBe('none');
  });
});

it('words of a grip stand beside it while the pointer is over it', () => {
  const { picture } = newHand();
  const [first, ...others] = picture.handles;
  const pen = recorderPen(1);
  const handles = first ? [{ ...first, says: 'missed surface 3' }, ...others] : [];
  const hand = { ...IDLE_HAND, hover: first?.id ?? null };
  const room = { measure: roughMeasure, labels: [], former: [] };
  overlayLayer(pen, handles, picture.view, picture.plan.topPx, hand, room);
  const texts = pen.marks.flatMap((mark: Mark) => (mark.kind === 'text' ? [mark.text] : []));
  expect(texts).toEqual(['missed surface 3']);
});

it('a round grip is at hand everywhere in its circle', () => {
  const round = { xPx: 0, yPx: 0, line: null, radiusPx: 50 };
  expect(distanceTo(round, 30, 40)).toBe(0);
  expect(distanceTo(round, 60, 80)).toBe(50);
});
