import { describe, expect, it } from 'vitest';
import type { Grip } from '../../../app/board/grips.ts';
import type { Effect } from '../../../app/board/hand.ts';
import { createHost } from '../../../app/board/host.ts';

/** A node of the page: it takes events, and knows what lies in it. */
class FakeNode extends EventTarget {
  readonly style = { cursor: '' };
  readonly inside: FakeNode[] = [];
  captured: number[] = [];
  focused = 0;
  defaultView = new EventTarget();
  body: FakeNode | null = null;
  ownerDocument: FakeNode | null = null;

  contains(node: unknown): boolean {
    return node === this || this.inside.some((one) => one.contains(node));
  }
  getBoundingClientRect() {
    return { left: 10, top: 20 };
  }
  setPointerCapture(id: number) {
    this.captured.push(id);
  }
  focus() {
    this.focused++;
  }
}

const part: Grip = {
  id: 'part',
  order: 6,
  xPx: 100,
  yPx: 100,
  line: { topPx: 50, bottomPx: 150 },
  cursor: 'ew-resize',
  label: 'part',
  slider: null,
  tabStop: false,
};

const NO_KEYS = { shiftKey: false, altKey: false, ctrlKey: false, metaKey: false };

function sheet() {
  const page = new FakeNode();
  const element = new FakeNode();
  const slider = new FakeNode();
  const field = new FakeNode();
  page.body = new FakeNode();
  element.ownerDocument = page;
  element.inside.push(slider);
  const effects: Effect[] = [];
  const client = {
    grips: () => [part],
    snapOn: () => true,
    onEffect: (effect: Effect) => effects.push(effect),
  };
  const host = createHost(element as unknown as HTMLElement, client);
  const send = (to: EventTarget, type: string, more: object) => {
    const event = new Event(type, { cancelable: true, bubbles: true });
    for (const [key, value] of Object.entries({ ...NO_KEYS, ...more }))
      Object.defineProperty(event, key, { value, configurable: true });
    to.dispatchEvent(event);
    return event;
  };
  const pointer = (type: string, clientX: number, clientY: number, buttons = 1) =>
    send(element, type, { pointerId: 1, pointerType: 'mouse', button: 0, buttons, clientX, clientY });
  const key = (type: 'keydown' | 'keyup', name: string, target: FakeNode | null, more = {}) =>
    send(page, type, { key: name, target, ...more });
  const done = (what: Effect['do']) => effects.filter((effect) => effect.do === what);
  return { page, element, slider, field, host, pointer, key, done };
}

describe('the host of a sheet', () => {
  it('counts px from the sheet’s corner, captures the pointer and takes the focus at a press', () => {
    const { element, pointer, done } = sheet();
    pointer('pointerdown', 110, 120);
    expect(done('press')).toEqual([expect.objectContaining({ grip: 'part', xPx: 100, yPx: 100 })]);
    expect([element.captured, element.focused]).toEqual([[1], 1]);
    pointer('pointermove', 130, 120);
    expect(done('preview')).toEqual([expect.objectContaining({ grip: 'part', dxPx: 20 })]);
    pointer('pointerup', 130, 120, 0);
    expect(done('commit')).toHaveLength(1);
  });

  it.each([
    ['Escape', {}],
    ['z', { ctrlKey: true }],
    ['Z', { metaKey: true }],
  ])('gives up the gesture on %s and keeps the key from everything else', (name, held) => {
    const { pointer, key, page, done, host } = sheet();
    expect(key('keydown', name, page.body, held).defaultPrevented).toBe(false);
    pointer('pointerdown', 110, 120);
    pointer('pointermove', 130, 120);
    expect(host.busy()).toBe(true);
    expect(key('keydown', name, page.body, held).defaultPrevented).toBe(true);
    expect([done('cancel').length, done('commit').length, host.busy()]).toEqual([1, 0, false]);
  });

  it('pans with Space held while the focus is on the sheet, on a grip of it or nowhere, but not in a field', () => {
    for (const [where, pans] of [
      ['element', true],
      ['slider', true],
      ['body', true],
      ['field', false],
    ] as const) {
      const made = sheet();
      const target = where === 'body' ? made.page.body : made[where];
      expect(made.key('keydown', ' ', target).defaultPrevented).toBe(pans);
      made.pointer('pointerdown', 110, 120);
      made.pointer('pointermove', 130, 120);
      expect([made.done('pan').length, made.done('preview').length]).toEqual(pans ? [1, 0] : [0, 1]);
      made.host.destroy();
    }
  });

  it('forgets Space when the window loses the focus, and hears nothing once destroyed', () => {
    const { key, page, element, pointer, done, host } = sheet();
    key('keydown', ' ', element);
    page.defaultView.dispatchEvent(new Event('blur'));
    pointer('pointerdown', 110, 120);
    pointer('pointermove', 130, 120);
    expect(done('pan')).toEqual([]);
    host.destroy();
    pointer('pointermove', 150, 120);
    expect(done('preview')).toHaveLength(1);
  });
});
