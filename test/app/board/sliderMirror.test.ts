import { describe, expect, it } from 'vitest';
import type { Grip, SliderFacts } from '../../../app/board/grips.ts';
import { createSliderMirror } from '../../../app/board/sliderMirror.ts';
import { FakeDocument, FakeElement } from './fakeDocument.ts';

const facts: SliderFacts = {
  valueNow: 26.272,
  valueText: '26.272 mm behind the first',
  orientation: 'horizontal',
};
const grip = (id: string, change: Partial<Grip> = {}): Grip => ({
  id,
  order: 6,
  xPx: 100,
  yPx: 50,
  line: null,
  cursor: 'ew-resize',
  label: `${id} group, position`,
  slider: facts,
  tabStop: true,
  ...change,
});

function mirrored() {
  const document = new FakeDocument();
  const host = new FakeElement(document);
  const heard: string[] = [];
  const mirror = createSliderMirror(host as unknown as HTMLElement, {
    onStep: (id, steps, { shift }) => heard.push(`${id} ${steps}${shift ? ' shift' : ''}`),
    onFocus: (id) => heard.push(`focus ${id}`),
    onEnter: (id) => heard.push(`enter ${id}`),
  });
  const labels = (): (string | undefined)[] =>
    host.children.map((child) => child.attributes.get('data-grip'));
  const key = (at: number, name: string, held: Partial<KeyboardEvent> = {}): boolean => {
    let taken = false;
    const stop = {
      preventDefault: () => {
        taken = true;
      },
      stopPropagation: () => undefined,
    };
    host.children[at]?.emit('keydown', { key: name, shiftKey: false, ...held, ...stop });
    return taken;
  };
  return { document, host, mirror, heard, labels, key };
}

describe('the sliders over the grips', () => {
  it('say name, value and direction, and stand over the grip, transparent to the pointer', () => {
    const { host, mirror } = mirrored();
    mirror.update([grip('second', { slider: { ...facts, valueMin: 0, orientation: 'vertical' } })]);
    const element = host.children[0];
    expect(Object.fromEntries(element?.attributes ?? [])).toEqual({
      'data-grip': 'second',
      role: 'slider',
      tabindex: '0',
      'aria-label': 'second group, position',
      'aria-orientation': 'vertical',
      'aria-valuenow': '26.272',
      'aria-valuetext': '26.272 mm behind the first',
      'aria-valuemin': '0',
    });
    expect(element?.style.transform).toBe('translate(88px, 38px)');
    expect(element?.style.cssText).toContain('pointer-events:none');
  });

  it('write nothing when nothing changed, and only the value when the value changed', () => {
    const { document, host, mirror } = mirrored();
    const first = grip('a');
    mirror.update([first]);
    const before = document.writes;
    mirror.update([first]);
    mirror.update([grip('a')]);
    expect(document.writes).toBe(before);
    mirror.update([grip('a', { xPx: 120, slider: { ...facts, valueText: '27 mm', valueNow: 27 } })]);
    expect(document.writes).toBe(before + 2);
    expect(document.moves).toBe(1);
    expect(host.children[0]?.style.transform).toBe('translate(108px, 38px)');
  });

  it('come, go and follow the order of the grips; read-only marks have none', () => {
    const { mirror, labels } = mirrored();
    mirror.update([grip('a'), grip('b'), grip('mark', { slider: null })]);
    expect(labels()).toEqual(['a', 'b']);
    mirror.update([grip('c'), grip('b'), grip('a')]);
    expect(labels()).toEqual(['c', 'b', 'a']);
    mirror.update([grip('b')]);
    expect(labels()).toEqual(['b']);
    mirror.destroy();
    expect(labels()).toEqual([]);
  });

  it('forget a limit that no longer holds', () => {
    const { host, mirror } = mirrored();
    mirror.update([grip('a', { slider: { ...facts, valueMax: 5 } })]);
    mirror.update([grip('a')]);
    expect(host.children[0]?.attributes.has('aria-valuemax')).toBe(false);
  });

  it('keep the focus while others are put in order around it', () => {
    const { document, mirror, labels } = mirrored();
    mirror.update([grip('a'), grip('b'), grip('c')]);
    expect(mirror.focus('a')).toBe(true);
    const focused = document.activeElement;
    mirror.update([grip('c'), grip('b'), grip('a'), grip('d')]);
    expect(labels()).toEqual(['c', 'b', 'a', 'd']);
    expect(document.activeElement).toBe(focused);
    expect(mirror.focusedId()).toBe('a');
  });

  it('hand the focus to the drawing when the focused grip goes away', () => {
    const { document, host, mirror, heard } = mirrored();
    mirror.update([grip('a'), grip('b')]);
    mirror.focus('a');
    mirror.update([grip('b')]);
    expect(document.activeElement).toBe(host);
    expect(heard).toEqual(['focus a', 'focus null']);
    expect(mirror.focus('a')).toBe(false);
  });

  it('stop Tab only where they are told to', () => {
    const { host, mirror } = mirrored();
    mirror.update([grip('a', { tabStop: false }), grip('b')]);
    expect(host.children.map((child) => child.attributes.get('tabindex'))).toEqual(['-1', '0']);
  });
});

describe('keys on a slider', () => {
  it.each([
    ['ArrowRight', '1'],
    ['ArrowUp', '1'],
    ['ArrowLeft', '-1'],
    ['ArrowDown', '-1'],
    ['PageUp', '10'],
    ['PageDown', '-10'],
  ])('%s steps by %s', (name, steps) => {
    const { mirror, heard, key } = mirrored();
    mirror.update([grip('a')]);
    expect(key(0, name)).toBe(true);
    expect(key(0, name, { shiftKey: true })).toBe(true);
    expect(heard).toEqual([`a ${steps}`, `a ${steps} shift`]);
  });

  it('Enter and F2 type the value; letters, Tab and commands are left to the drawing', () => {
    const { mirror, heard, key } = mirrored();
    mirror.update([grip('a')]);
    expect([key(0, 'Enter'), key(0, 'F2')]).toEqual([true, true]);
    expect([key(0, 'p'), key(0, 'Tab'), key(0, 'Escape')]).toEqual([false, false, false]);
    expect([key(0, 'ArrowLeft', { altKey: true }), key(0, 'Enter', { ctrlKey: true })]).toEqual([
      false,
      false,
    ]);
    expect(heard).toEqual(['enter a', 'enter a']);
  });
});
