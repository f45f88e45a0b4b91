import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Effect } from '../../../app/board/hand.ts';
import { FakeHand } from './fakeHand.ts';
import { SEED } from './generators.ts';

describe('pointing', () => {
  it('fills the grip under the pointer and shows its cursor, once', () => {
    const hand = new FakeHand().hover(300, 64);
    expect(hand.last('hover')?.grip).toBe('field');
    expect(hand.last('cursor')?.cursor).toBe('ns-resize');
    hand.hover(301, 64).expectNothing();
    hand.hover(200, 300);
    expect(hand.last('hover')?.grip).toBeNull();
    expect(hand.last('cursor')?.cursor).toBe('default');
  });

  it('lets go when the pointer leaves the sheet', () => {
    const hand = new FakeHand().hover(300, 64).leave();
    expect(hand.last('hover')?.grip).toBeNull();
  });

  it('does not fill grips that a held button passes over', () => {
    new FakeHand().moveTo(300, 64).expectNothing();
  });
});

describe('pressing', () => {
  it('arms a grip, and a release without moving is a click', () => {
    new FakeHand()
      .press(300, 60)
      .expectAt('pointing')
      .expectDone({ do: 'press', grip: 'field' })
      .release()
      .expectAt('idle')
      .expectDone({ do: 'click', grip: 'field', xPx: 300, yPx: 60 });
  });

  it('on paper and let go is a click on nothing', () => {
    new FakeHand().click(500, 500).expectDone({ do: 'click', grip: null });
  });

  it('trembles up to 3 px with a mouse and 8 px by touch before it drags', () => {
    new FakeHand().press(300, 60).moveTo(302, 61).expectAt('pointing').moveTo(303, 60).expectAt('dragging');
    new FakeHand('touch')
      .press(300, 60)
      .moveTo(307, 60)
      .expectAt('pointing')
      .moveTo(308, 60)
      .expectAt('dragging');
  });

  it('reaches grips 22 px away by touch and not with a mouse', () => {
    new FakeHand('touch').press(300, 80).expectDone({ do: 'press', grip: 'field' });
    new FakeHand().press(300, 80).expectDone({ do: 'press', grip: null });
  });

  it('ignores the second button', () => {
    new FakeHand().press(300, 60, { button: 2 }).expectAt('idle').expectNothing();
  });

  it('passes Shift on with a click', () => {
    const hand = new FakeHand().hold({ shift: true }).click(300, 60);
    expect(hand.last('click')?.modifiers.shift).toBe(true);
  });
});

describe('pressing again in the same place', () => {
  it('takes the next grip, and then the first one again', () => {
    const hand = new FakeHand().click(103, 100).expectDone({ do: 'click', grip: 'first' });
    hand.wait(1000).click(104, 100).expectDone({ do: 'click', grip: 'second' });
    hand.wait(1000).click(103, 100).expectDone({ do: 'click', grip: 'first' });
  });

  it('drags what the last click took', () => {
    new FakeHand()
      .click(103, 100)
      .wait(1000)
      .click(103, 100)
      .wait(1000)
      .press(103, 100)
      .moveTo(120, 100)
      .expectDone({ do: 'preview', grip: 'second' });
  });

  it('soon is a double click on the same grip', () => {
    new FakeHand()
      .click(103, 100)
      .wait(200)
      .click(103, 100)
      .expectDone({ do: 'double click', grip: 'first' });
  });

  it('elsewhere begins afresh', () => {
    new FakeHand().click(103, 100).wait(1000).click(103, 110).expectDone({ do: 'click', grip: 'first' });
  });

  it('after a drag begins afresh', () => {
    new FakeHand()
      .click(103, 100)
      .wait(1000)
      .press(103, 100)
      .moveTo(140, 100)
      .release()
      .wait(1000)
      .click(103, 100)
      .expectDone({ do: 'click', grip: 'first' });
  });

  it('by touch offers the grips by name', () => {
    new FakeHand('touch')
      .click(103, 100)
      .wait(1000)
      .click(103, 100)
      .expectDone({ do: 'choose', grips: ['first', 'second'] });
  });
});

describe('dragging', () => {
  it('reports the total movement since the press, not the last move', () => {
    new FakeHand()
      .press(300, 60)
      .moveTo(310, 60)
      .expectDone({ do: 'preview', grip: 'field', dxPx: 10, dyPx: 0, snap: true })
      .moveTo(290, 75)
      .expectDone({ do: 'preview', dxPx: -10, dyPx: 15, xPx: 290, yPx: 75 })
      .release()
      .expectAt('idle')
      .expectDone({ do: 'commit', grip: 'field' });
  });

  it('takes the place of release into account', () => {
    new FakeHand()
      .press(300, 60)
      .moveTo(310, 60)
      .releaseAt(312, 60)
      .expectDone({ do: 'preview', dxPx: 12 }, { do: 'commit' });
  });

  it.each([
    ['Escape', (hand: FakeHand) => hand.escape()],
    ['a lost capture', (hand: FakeHand) => hand.loseCapture()],
    ['another pointer', (hand: FakeHand) => hand.press(400, 400, { finger: 2 })],
  ])('is cancelled by %s, and the release that follows does nothing', (_name, cancel) => {
    const hand = new FakeHand().press(300, 60).moveTo(320, 60);
    cancel(hand).expectAt('idle').expectDone({ do: 'cancel', grip: 'field' });
    hand.moveTo(330, 60).expectDone().release().expectDone();
  });

  it('says again where it is when Shift is pressed half-way', () => {
    const hand = new FakeHand().press(300, 60).moveTo(320, 60).hold({ shift: true });
    hand.expectDone({ do: 'preview', dxPx: 20, dyPx: 0 });
    expect(hand.last('preview')?.modifiers.shift).toBe(true);
  });

  it('goes ten times as slow with Alt and does not snap, without a jump when Alt comes or goes', () => {
    new FakeHand()
      .press(300, 60)
      .moveTo(320, 60)
      .hold({ alt: true })
      .expectDone({ do: 'preview', dxPx: 20, snap: false })
      .moveTo(350, 60)
      .expectDone({ do: 'preview', dxPx: 23 })
      .hold({ alt: false })
      .expectDone({ do: 'preview', dxPx: 23, snap: true })
      .moveTo(360, 60)
      .expectDone({ do: 'preview', dxPx: 33 });
  });

  it('begun with Alt is slow from the press on', () => {
    new FakeHand()
      .hold({ alt: true })
      .press(300, 60)
      .moveTo(320, 70)
      .expectDone({ do: 'preview', dxPx: 2, dyPx: 1 });
  });

  it('does not snap when snapping is off', () => {
    new FakeHand('mouse', false).press(300, 60).moveTo(320, 60).expectDone({ do: 'preview', snap: false });
  });

  it('keeps its cursor wherever the pointer is, and takes no wheel', () => {
    const hand = new FakeHand().hover(300, 60).press(300, 60).moveTo(600, 500);
    expect(hand.last('cursor')?.cursor).toBe('ns-resize');
    hand.wheel(0, 100).expectNothing();
  });

  it('begins anew when the release before went unseen', () => {
    new FakeHand()
      .press(300, 60)
      .moveTo(320, 60)
      .press(103, 100)
      .expectAt('pointing')
      .expectDone({ do: 'cancel', grip: 'field' }, { do: 'press', grip: 'first' });
  });
});

describe('panning', () => {
  it('follows a drag on paper', () => {
    new FakeHand()
      .press(500, 300)
      .moveTo(510, 305)
      .expectAt('panning')
      .expectDone({ do: 'pan', dxPx: 10, dyPx: 5 })
      .moveTo(515, 305)
      .expectDone({ do: 'pan', dxPx: 5, dyPx: 0 })
      .release()
      .expectAt('idle')
      .expectDone();
  });

  it('follows a drag from a mark that can only be clicked, whose press then is over', () => {
    new FakeHand()
      .press(400, 100)
      .moveTo(410, 105)
      .expectAt('panning')
      .expectDone({ do: 'cancel', grip: 'mark' }, { do: 'pan', dxPx: 10, dyPx: 5 })
      .release()
      .expectAt('idle');
    expect(new FakeHand().click(400, 100).last('click')?.grip).toBe('mark');
  });

  it('goes over anything with Space or the middle button', () => {
    const hand = new FakeHand().hover(300, 60).space(true);
    expect(hand.last('cursor')?.cursor).toBe('grab');
    hand.press(300, 60).expectAt('panning').moveTo(301, 60).expectDone({ do: 'pan', dxPx: 1, dyPx: 0 });
    expect(hand.last('cursor')?.cursor).toBe('grabbing');
    new FakeHand().press(300, 60, { button: 1 }).expectAt('panning');
  });

  it('goes back on Escape and stays where it is on a lost capture', () => {
    const hand = () => new FakeHand().press(500, 300).moveTo(510, 305).moveTo(530, 310);
    hand().escape().expectAt('idle').expectDone({ do: 'pan', dxPx: -30, dyPx: -10 });
    hand().loseCapture().expectAt('idle').expectDone();
  });
});

describe('the wheel', () => {
  it('zooms about the pointer in length', () => {
    new FakeHand()
      .hover(500, 300)
      .wheel(0, -100)
      .expectDone({ do: 'zoom', about: 'length', xPx: 500, yPx: 300 });
    const hand = new FakeHand().wheel(0, -100);
    expect(hand.last('zoom')?.factor).toBeCloseTo(Math.exp(0.2), 12);
  });

  it('zooms in both directions with Ctrl or ⌘, pans sideways, and stretches heights with Shift', () => {
    new FakeHand().hold({ ctrl: true }).wheel(0, 10).expectDone({ do: 'zoom', about: 'both' });
    new FakeHand().hold({ meta: true }).wheel(0, 10).expectDone({ do: 'zoom', about: 'both' });
    new FakeHand().wheel(30, 4).expectDone({ do: 'pan', dxPx: -30, dyPx: 0 });
    new FakeHand().hold({ shift: true }).wheel(0, -50).expectDone({ do: 'stretch' });
    new FakeHand().hold({ shift: true }).wheel(-50, 0).expectDone({ do: 'stretch' });
  });

  it('undoes itself when turned back', () => {
    const hand = new FakeHand().wheel(0, 60).wheel(0, -60);
    const factors = hand.effects.flatMap((effect) => (effect.do === 'zoom' ? [effect.factor] : []));
    expect((factors[0] ?? 0) * (factors[1] ?? 0)).toBeCloseTo(1, 12);
  });

  it('never does more than a fair step at once', () => {
    const hand = new FakeHand().wheel(0, -5000).hold({ ctrl: true }).wheel(0, -5000);
    for (const effect of hand.effects) if (effect.do === 'zoom') expect(effect.factor).toBeLessThan(1.5);
  });
});

describe('two fingers', () => {
  const pinch = () => new FakeHand('touch').press(400, 300).press(500, 310, { finger: 2 });

  it('cancel the drag that the first one began', () => {
    new FakeHand('touch')
      .press(300, 60)
      .moveTo(330, 60)
      .press(500, 310, { finger: 2 })
      .expectAt('pinching')
      .expectDone({ do: 'cancel', grip: 'field' });
  });

  it('moved together pan', () => {
    pinch()
      .moveTo(404, 300)
      .expectDone({ do: 'pan', dxPx: 2, dyPx: 0 })
      .moveTo(504, 310, 2)
      .expectDone({ do: 'pan', dxPx: 2, dyPx: 0 });
  });

  it('spread sideways zoom after 12 px and then never stretch', () => {
    const hand = pinch()
      .moveTo(511, 310, 2)
      .expectDone({ do: 'pan' })
      .moveTo(512, 310, 2)
      .expectDone({ do: 'pan' });
    hand
      .moveTo(624, 310, 2)
      .expectDone({ do: 'pan' }, { do: 'zoom', factor: 2, about: 'both', xPx: 512, yPx: 305 });
    hand.moveTo(624, 600, 2).expectDone({ do: 'pan' });
  });

  it('spread upwards stretch the heights', () => {
    const hand = pinch().moveTo(500, 340, 2).moveTo(500, 380, 2);
    hand.expectDone({ do: 'pan' }, { do: 'stretch', factor: 2 });
  });

  it('pinched nearly together do not let the zoom run away', () => {
    const hand = pinch().moveTo(440, 310, 2).moveTo(401, 310, 2);
    expect(hand.last('zoom')?.factor).toBeCloseTo(24 / 40, 12);
  });

  it('go back to panning when one is lifted, and a third is ignored', () => {
    const hand = pinch().press(600, 600, { finger: 3 }).expectAt('pinching').release(2).expectAt('panning');
    hand.moveTo(405, 300).expectDone({ do: 'pan', dxPx: 5, dyPx: 0 }).release(1).expectAt('idle');
  });

  it('end on Escape', () => {
    pinch().escape().expectAt('idle').expectDone();
  });

  it('leave no grip filled behind', () => {
    const hand = new FakeHand('touch').click(300, 60);
    expect(hand.last('hover')?.grip).toBeNull();
  });
});

describe('any hand', () => {
  const anywhere = fc.tuple(fc.integer({ min: 90, max: 310 }), fc.integer({ min: 40, max: 160 }));
  const finger = fc.constantFrom(1 as const, 2 as const);
  const act = fc.oneof(
    fc.tuple(anywhere, finger).map(
      ([[x, y], f]) =>
        (hand: FakeHand) =>
          hand.press(x, y, { finger: f }),
    ),
    fc.tuple(anywhere, finger).map(
      ([[x, y], f]) =>
        (hand: FakeHand) =>
          hand.moveTo(x, y, f),
    ),
    finger.map((f) => (hand: FakeHand) => hand.release(f)),
    finger.map((f) => (hand: FakeHand) => hand.loseCapture(f)),
    fc.boolean().map((alt) => (hand: FakeHand) => hand.hold({ alt })),
    fc.constant((hand: FakeHand) => hand.escape()),
    fc.constant((hand: FakeHand) => hand.wheel(3, 50)),
    fc.boolean().map((held) => (hand: FakeHand) => hand.space(held)),
  );
  const ends = new Set<Effect['do']>(['commit', 'cancel', 'click', 'double click', 'choose']);

  it('ends every press once: previews come between a press and its end, about the same grip', () => {
    fc.assert(
      fc.property(
        fc.constantFrom('mouse', 'touch', 'pen'),
        fc.array(act, { maxLength: 40 }),
        (kind, acts) => {
          const hand = new FakeHand(kind);
          for (const one of acts) one(hand);
          hand.escape();
          let pressed: Extract<Effect, { do: 'press' }> | null = null;
          for (const effect of hand.effects) {
            if (effect.do === 'press') {
              expect(pressed).toBeNull();
              pressed = effect;
            } else if (effect.do === 'preview') {
              expect(effect.grip).toBe(pressed?.grip);
            } else if (effect.do === 'commit' || effect.do === 'cancel') {
              expect(pressed?.grip).toBe(effect.grip);
              pressed = null;
            } else if (ends.has(effect.do) || effect.do === 'pan') {
              if (effect.do !== 'pan') expect(pressed).not.toBeNull();
              pressed = null;
            }
          }
          expect(hand.gesture.at).toBe('idle');
        },
      ),
      SEED,
    );
  });
});
