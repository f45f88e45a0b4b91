import { describe, expect, it } from 'vitest';
import { xOf } from '../../../app/board/viewport.ts';
import { BETWEEN } from '../../../app/drawing/handle.ts';
import { sketchStore, undo } from '../../../app/store/sketchStore.ts';
import { setView, viewStore } from '../../../app/store/viewStore.ts';
import type { PartId, Sketch } from '../../../engine/index.ts';
import { emptySketch, newThin } from '../../../engine/index.ts';
import { inspectionZoom } from '../../engine/demo.ts';
import { AT_MIDDLE, BETWEEN_MIDDLE_AND_NARROW, frontsOf } from '../drawing/seen.ts';
import { DrawingHand } from './drawingHand.ts';

const demo = inspectionZoom();
const sketch = () => sketchStore.getState().sketch;
const steps = () => sketchStore.getState().past.length;
const selection = () => viewStore.getState().selection;
const over = (change = {}) => new DrawingHand(demo, { setting: AT_MIDDLE, snap: false, ...change });

/** Where a part can be taken without its stop, rims or focal points being nearer, px above the axis. */
const CLEAR_PX = 40;
/** The view is moved by sums of px: what is left after a dozen of them. */
const PX_DIGITS = 8;

describe('a click', () => {
  it('selects a part, adds another with Shift, and takes it away again', () => {
    const hand = over().clickGrip('part:p3', CLEAR_PX);
    expect(selection()).toEqual(['p3']);
    hand.hold({ shift: true }).clickGrip('part:p4', CLEAR_PX);
    expect(selection()).toEqual(['p3', 'p4']);
    hand.wait(1000).clickGrip('part:p4', CLEAR_PX);
    expect(selection()).toEqual(['p3']);
    expect(steps()).toBe(0);
  });

  it('on paper selects nothing', () => {
    const hand = over({ selection: ['p3' as PartId] });
    hand.click(hand.view.widthPx - 20, 20);
    expect(selection()).toEqual([]);
  });

  it('on a ribbon value opens it for typing, a double click on a part its focal length', () => {
    const hand = over().clickGrip('cell:gap:p2');
    expect(viewStore.getState().typing).toBe('cell:gap:p2');
    hand.wait(1000).clickGrip('part:p3', CLEAR_PX).wait(100).clickGrip('part:p3', CLEAR_PX);
    expect(viewStore.getState().typing).toBe('focal:p3:rear');
  });

  it('gives the grip the keyboard', () => {
    expect(over().clickGrip('part:p3', CLEAR_PX).focused).toEqual(['part:p3']);
  });

  it('sets down what waits in the tray', () => {
    const hand = over({ placing: 'positive' }).click(500, 200);
    expect(hand.setDownAt).toEqual([500]);
    expect(selection()).toEqual([]);
  });
});

describe('a drag', () => {
  it('shows every move, is one step of history, and undoes to the very same sketch', () => {
    const hand = over().pressGrip('part:p3', CLEAR_PX);
    const seen = new Set<number>();
    for (let i = 0; i < 6; i++) {
      hand.moveBy(7);
      seen.add(frontsOf(sketch())[2] ?? 0);
    }
    expect(seen.size).toBe(6);
    hand.release();
    expect(frontsOf(sketch())[2]).toBeCloseTo(frontsOf(demo)[2]! + 42 / hand.view.pxPerMm, 9);
    expect(steps()).toBe(1);
    undo();
    expect(sketch()).toBe(demo);
  });

  it('selects what it takes, and says the value at the pointer while it lasts', () => {
    const hand = over().pressGrip('part:p3', CLEAR_PX).moveBy(20);
    expect(selection()).toEqual(['p3']);
    const { dragging } = hand.state;
    expect(dragging).toMatchObject({ id: 'part:p3', xPx: hand.pointerXPx });
    expect(dragging?.move.says).toBe(`${frontsOf(sketch())[2]?.toFixed(3)} mm`);
    expect(hand.release().state.dragging).toBeNull();
  });

  it('that comes back to where it began is no step', () => {
    over().pressGrip('part:p3', CLEAR_PX).moveBy(20).moveBy(-20).release();
    expect(steps()).toBe(0);
    expect(sketch()).toEqual(demo);
  });

  it('follows Shift pressed half-way', () => {
    const hand = over().pressGrip('part:p2', CLEAR_PX).moveBy(30);
    const last = () => frontsOf(sketch())[3] ?? 0;
    expect(last()).toBeCloseTo(84, 9);
    hand.hold({ shift: true });
    expect(last()).toBeCloseTo(84 + 30 / hand.view.pxPerMm, 9);
    hand.hold({ shift: false });
    expect(last()).toBeCloseTo(84, 9);
  });

  it('follows the toggle that stands for Shift, and Shift then means the other', () => {
    const hand = over({ otherRule: true }).pressGrip('part:p2', CLEAR_PX).moveBy(30);
    expect(frontsOf(sketch())[3]).toBeGreaterThan(85);
    hand.hold({ shift: true });
    expect(frontsOf(sketch())[3]).toBeCloseTo(84, 9);
  });

  it('is ten times finer with Alt, and is not caught', () => {
    const hand = over({ snap: true }).pressGrip('part:p3', CLEAR_PX).hold({ alt: true }).moveBy(30);
    expect(frontsOf(sketch())[2]).toBeCloseTo(frontsOf(demo)[2]! + 3 / hand.view.pxPerMm, 9);
    expect(hand.state.dragging?.move.caught).toBeNull();
  });

  it('is caught within a few px of a focal point, and names it', () => {
    const hand = over({ snap: true }).pressGrip('part:p3', CLEAR_PX);
    const wantedMm = frontsOf(demo)[1]! + 28;
    hand.moveBy((wantedMm - frontsOf(demo)[2]!) * hand.view.pxPerMm + 5);
    expect(hand.state.dragging?.move.caught?.name).toBe('rear focus of second group');
    expect(frontsOf(sketch())[2]).toBeCloseTo(wantedMm, 9);
  });

  it.each([
    ['left', -30],
    ['far to the left, into the fold', -260],
    ['right', 40],
  ])('of the first part to the %s moves it alone: the folded object and all others stay', (_where, dxPx) => {
    const hand = over();
    const others = ['object:foot', 'part:p2', 'part:p3', 'part:p4', 'image'];
    const before = others.map((id) => hand.grip(id).xPx);
    const firstPx = hand.grip('part:p1').xPx;
    expect(hand.view.fold).not.toBeNull();
    hand.pressGrip('part:p1', CLEAR_PX).moveBy(dxPx / 2);
    for (let move = 0; move < 2; move++) {
      const stays = others.map((id, i) => Math.abs(hand.grip(id).xPx - (before[i] ?? 0)) < 10 ** -PX_DIGITS);
      // The object gives way once the part has used up the piece in front of it.
      expect(stays.slice(dxPx < -200 && move === 1 ? 1 : 0)).not.toContain(false);
      hand.moveBy(dxPx / 2);
      expect(hand.grip('part:p1').xPx).toBeCloseTo(firstPx + dxPx * (move === 0 ? 1 : 1.5), PX_DIGITS);
    }
  });

  it('of the folded object changes its distance, not where it is drawn', () => {
    const hand = over();
    const placesOf = () => ['object:foot', 'part:p1', 'part:p4'].map((id) => hand.grip(id).xPx);
    const before = placesOf();
    hand.pressGrip('object:foot').moveBy(-50);
    expect(sketch().object.distanceMm).toBeCloseTo(550, 9);
    for (const [i, xPx] of placesOf().entries()) expect(xPx).toBeCloseTo(before[i] ?? 0, PX_DIGITS);
    hand.escape();
    expect(hand.view.fold?.fromMm).toBe(-500);
  });

  it('ended by Escape leaves the very same sketch, no step and the view as it was', () => {
    const hand = over();
    const { camera } = viewStore.getState();
    hand.pressGrip('part:p1', CLEAR_PX).moveBy(35).escape();
    expect(sketch()).toBe(demo);
    expect(steps()).toBe(0);
    expect(viewStore.getState().camera).toEqual(camera);
    expect(hand.hand.busy()).toBe(false);
  });

  it('between positions says what to do, and changes nothing', () => {
    const hand = over({ setting: BETWEEN_MIDDLE_AND_NARROW })
      .pressGrip('part:p3', CLEAR_PX)
      .moveBy(20)
      .release();
    expect(hand.said[0]).toBe(BETWEEN);
    expect(sketch()).toBe(demo);
  });

  it('of a ribbon value scrubs it', () => {
    const hand = over().pressGrip('cell:gap:p2').moveBy(25).release();
    expect(frontsOf(sketch())[3]).toBeCloseTo(84 + 25 / hand.view.pxPerMm, 9);
    expect(viewStore.getState().typing).toBeNull();
  });

  it('of a rim and of a stop’s edge goes by heights', () => {
    const hand = over({ selection: ['p4' as PartId] });
    const before = hand.picture.scene.parts[3]?.semiMm ?? 0;
    hand.pressGrip('rim:p4:upper').moveBy(0, -20).release();
    const pxPerMm = hand.view.pxPerMm * hand.view.stretch;
    expect(sketch().parts[3]?.semiDiameterMm).toBeCloseTo(before + 20 / pxPerMm, 9);
  });

  it('of several selected parts moves them all', () => {
    const hand = over({ selection: ['p2' as PartId, 'p3' as PartId] });
    hand.pressGrip('part:p3', CLEAR_PX).moveBy(20).release();
    const moved = frontsOf(sketch()).map((front, i) => front - frontsOf(demo)[i]!);
    const mm = 20 / hand.view.pxPerMm;
    for (const [i, wanted] of [0, mm, mm, 0].entries()) expect(moved[i]).toBeCloseTo(wanted, 9);
    expect(selection()).toEqual(['p2', 'p3']);
  });
});

describe('dragging the first part, which all places are measured from', () => {
  it.each([
    ['to scale', { ...demo, object: { distanceMm: 120, medium: 'air' } } satisfies Sketch],
    ['beyond a fold', demo],
  ])('keeps it under the pointer and all others where they were, the object %s', (where, before) => {
    const hand = new DrawingHand(before, { setting: AT_MIDDLE, snap: false });
    const others = () =>
      frontsOf(sketch())
        .slice(1)
        .map((front) => xOf(hand.view, front));
    const objectPx = () => xOf(hand.view, -(sketch().object.distanceMm as number));
    const stood = others();
    const objectStood = objectPx();
    hand.pressGrip('part:p1', CLEAR_PX);
    for (const dxPx of [10, 23, -51, 4, 14]) {
      hand.moveBy(dxPx);
      expect(xOf(hand.view, 0)).toBeCloseTo(hand.pointerXPx, PX_DIGITS);
      for (const [i, px] of others().entries()) expect(px).toBeCloseTo(stood[i]!, PX_DIGITS);
      if (where === 'to scale') expect(objectPx()).toBeCloseTo(objectStood, PX_DIGITS);
    }
    hand.moveBy(0.25).release();
    expect(steps()).toBe(1);
  });

  it('brings everything back when the pointer comes back', () => {
    const hand = over();
    const before = xOf(hand.view, 0);
    hand.pressGrip('part:p1', CLEAR_PX).moveBy(40).moveBy(-40);
    expect(xOf(hand.view, 0)).toBeCloseTo(before, PX_DIGITS);
    hand.release();
    expect(steps()).toBe(0);
  });

  it('works alike from infinity', () => {
    const far: Sketch = {
      ...emptySketch(),
      parts: [
        { ...newThin(50, 'p1' as PartId), space: { lengthMm: 40, medium: 'air' } },
        newThin(80, 'p2' as PartId),
      ],
    };
    const hand = new DrawingHand(far, { snap: false });
    const second = xOf(hand.view, 40);
    hand.pressGrip('part:p1', CLEAR_PX).moveBy(-30);
    expect(xOf(hand.view, 0)).toBeCloseTo(hand.pointerXPx, PX_DIGITS);
    const at = currentFront(1);
    expect(xOf(hand.view, at)).toBeCloseTo(second, PX_DIGITS);
  });

  it('stops at the object: the last good place stays, under it the last good view', () => {
    const near: Sketch = { ...demo, object: { distanceMm: 20, medium: 'air' } };
    const hand = new DrawingHand(near, { setting: AT_MIDDLE, snap: false });
    const objectPx = xOf(hand.view, -20);
    hand.pressGrip('part:p1', CLEAR_PX).moveBy(-10 * hand.view.pxPerMm);
    const good = xOf(hand.view, 0);
    hand.moveBy(-15 * hand.view.pxPerMm);
    expect(sketch().object.distanceMm).toBeCloseTo(10, 9);
    expect(xOf(hand.view, 0)).toBe(good);
    expect(xOf(hand.view, -10)).toBeCloseTo(objectPx, PX_DIGITS);
    expect(sketchStore.getState().note?.faults[0]?.sentence).toContain('object distance');
  });

  it('by the ribbon’s object distance moves the parts and not the object', () => {
    const near: Sketch = { ...demo, object: { distanceMm: 120, medium: 'air' } };
    const hand = new DrawingHand(near, { setting: AT_MIDDLE, snap: false });
    const objectPx = xOf(hand.view, -120);
    hand.pressGrip('cell:object').moveBy(24);
    expect(xOf(hand.view, -(sketch().object.distanceMm as number))).toBeCloseTo(objectPx, PX_DIGITS);
  });
});

describe('keys on a grip', () => {
  it('are one step of history each, and can be undone one by one', () => {
    const { hand } = over();
    hand.step('part:p3', 0.1, false);
    hand.step('part:p3', 0.1, true);
    expect(steps()).toBe(2);
    undo();
    expect(frontsOf(sketch())[2]).toBeCloseTo(frontsOf(demo)[2]! + 0.1, 9);
    expect(frontsOf(sketch())[3]).toBeCloseTo(84, 9);
  });

  it('say why nothing moves between positions', () => {
    const drawing = over({ setting: BETWEEN_MIDDLE_AND_NARROW });
    drawing.hand.step('part:p3', 0.1, false);
    drawing.hand.type('cell:gap:p2');
    expect(drawing.said).toEqual([BETWEEN, BETWEEN]);
    expect(sketch()).toBe(demo);
  });

  it('open the number that belongs to the grip', () => {
    const { hand } = over({ selection: ['p2' as PartId] });
    const typing = (id: string) => {
      hand.type(id);
      return viewStore.getState().typing;
    };
    expect(typing('cell:gap:p1')).toBe('cell:gap:p1');
    expect(typing('part:p2')).toBe('focal:p2:rear');
    expect(typing('part:p3')).toBe('part:p3');
    setView({ typing: null });
    expect(typing('part:p1')).toBeNull();
  });
});

describe('the jog strip', () => {
  it('drags a grip from elsewhere, as one step', () => {
    const drawing = over();
    for (const dxPx of [5, 12, 31]) drawing.hand.jog('part:p3', dxPx, 0, false);
    expect(drawing.hand.busy()).toBe(true);
    drawing.hand.endJog(true);
    expect(frontsOf(sketch())[2]).toBeCloseTo(frontsOf(demo)[2]! + 31 / drawing.view.pxPerMm, 9);
    expect([steps(), drawing.hand.busy()]).toEqual([1, false]);
  });

  it('that loses its finger gives the sketch back', () => {
    const { hand } = over();
    hand.jog('part:p3', 31, 0, false);
    hand.endJog(false);
    expect(sketch()).toBe(demo);
    expect(steps()).toBe(0);
  });
});

describe('the view', () => {
  it('panned, zoomed or stretched follows no longer', () => {
    const hand = over();
    const { camera } = viewStore.getState();
    expect(camera.follow).toBe('parts');
    hand
      .press(hand.view.widthPx - 30, 30)
      .moveBy(-40)
      .release();
    expect(viewStore.getState().camera).toMatchObject({ follow: null, pxPerMm: camera.pxPerMm });
    const zMm = frontsOf(demo)[2]!;
    const before = xOf(hand.view, zMm);
    hand.hand.onEffect({ do: 'zoom', xPx: before, yPx: 100, factor: 1.5, about: 'length' });
    expect(hand.view.pxPerMm).toBeCloseTo(1.5 * camera.pxPerMm, 9);
    expect(xOf(hand.view, zMm)).toBeCloseTo(before, 6);
    hand.hand.onEffect({ do: 'stretch', factor: 2 });
    expect(hand.view.stretch).toBeCloseTo(2 * camera.stretch, 9);
    expect(steps()).toBe(0);
  });

  it('keeps what was selected and closes what was typed while it is panned', () => {
    const hand = over({ selection: ['p3' as PartId], typing: 'focal:p3:rear' });
    hand
      .press(hand.view.widthPx - 30, 30)
      .moveBy(-40)
      .release();
    expect(selection()).toEqual(['p3']);
    expect(viewStore.getState().typing).toBeNull();
  });
});

describe('a finger', () => {
  it('pressed again where several grips lie is offered them by name', () => {
    const hand = new DrawingHand(demo, { setting: AT_MIDDLE, selection: ['p2' as PartId] }, 'touch');
    hand.clickGrip('focal:p2:rear').wait(1000).clickGrip('focal:p2:rear');
    expect(hand.chosen[0]?.length).toBeGreaterThan(1);
    expect(hand.chosen[0]).toContain('focal:p2:rear');
  });
});

const currentFront = (index: number): number =>
  frontsOf(sketch(), { at: sketch().positions[0]!.id, toNext: 0 })[index] ?? Number.NaN;
