import { afterEach, describe, expect, test, vi } from 'vitest';
import type { KeyPlace, KeyPress } from '../../../app/commands/keys.ts';
import { commandFor, keyName, listenToKeys } from '../../../app/commands/keys.ts';
import { keyWords } from '../../../app/commands/keyWords.ts';
import type { Command } from '../../../app/store/command.ts';

const press = (key: string, more: Partial<KeyPress> = {}): KeyPress => ({
  key,
  code: /^[a-z]$/i.test(key) ? `Key${key.toUpperCase()}` : '',
  ctrlKey: false,
  metaKey: false,
  altKey: false,
  shiftKey: false,
  repeat: false,
  isComposing: false,
  ...more,
});

const ctrl = { ctrlKey: true };
const commands: readonly Command[] = [
  'P',
  '.',
  '?',
  'Delete',
  'Escape',
  '1',
  'Ctrl+Z',
  'Ctrl+Shift+Z',
  'Ctrl+C',
  'Ctrl+S',
].map((key) => ({ id: key, label: key, keys: [key], available: () => true, run: () => {} }));
const means = (key: KeyPress, place: KeyPlace) => commandFor(key, commands, place)?.id ?? null;

describe('keys', () => {
  test('⌘ counts as Ctrl, and Shift is named with letters and named keys only', () => {
    expect(keyName(press('z', ctrl))).toBe('Ctrl+Z');
    expect(keyName(press('z', { metaKey: true }))).toBe('Ctrl+Z');
    expect(keyName(press('Z', { ...ctrl, shiftKey: true }))).toBe('Ctrl+Shift+Z');
    expect(keyName(press('?', { shiftKey: true }))).toBe('?');
    expect(keyName(press('1', { shiftKey: true }))).toBe('1');
    expect(keyName(press('Delete', { shiftKey: true }))).toBe('Shift+Delete');
    expect(keyName(press('p', { altKey: true }))).toBe('Alt+P');
  });

  test('a capital by Caps Lock is the same key', () => {
    expect(keyName(press('P'))).toBe('P');
  });

  test('a Greek or Cyrillic keyboard goes by the place of the key', () => {
    expect(keyName(press('я', { code: 'KeyZ', ctrlKey: true }))).toBe('Ctrl+Z');
    expect(keyName(press('π', { code: 'KeyP' }))).toBe('P');
  });

  test('letters, digits and marks act on the drawing only', () => {
    for (const key of ['p', '.', '?', 'Delete', '1']) {
      expect(means(press(key), 'drawing')).toBe(key.length === 1 ? key.toUpperCase() : key);
      for (const place of ['page', 'text', 'sheet'] as const) expect(means(press(key), place)).toBeNull();
    }
  });

  test('a text field keeps its own undo and copy, and a sheet over the page lets nothing through to the sketch', () => {
    for (const place of ['text', 'sheet'] as const) {
      expect(means(press('z', ctrl), place)).toBeNull();
      expect(means(press('c', ctrl), place)).toBeNull();
      expect(means(press('Escape'), place)).toBeNull();
    }
    expect(means(press('z', ctrl), 'page')).toBe('Ctrl+Z');
  });

  test('a field without typing leaves undo to the sketch, and nothing else', () => {
    expect(means(press('z', ctrl), 'field')).toBe('Ctrl+Z');
    expect(means(press('Z', { ...ctrl, shiftKey: true }), 'field')).toBe('Ctrl+Shift+Z');
    expect(means(press('c', ctrl), 'field')).toBeNull();
    for (const key of ['p', '.', '1', 'Escape', 'Delete']) expect(means(press(key), 'field')).toBeNull();
  });

  test('copying text on the page stays the browser’s', () => {
    expect(means(press('c', ctrl), 'page')).toBeNull();
    expect(means(press('c', ctrl), 'drawing')).toBe('Ctrl+C');
  });

  test('saving works wherever the focus is', () => {
    for (const place of ['drawing', 'page', 'text', 'field', 'sheet'] as const)
      expect(means(press('s', ctrl), place)).toBe('Ctrl+S');
  });

  test('a held key steps on through history, but makes no second part', () => {
    expect(means(press('z', { ...ctrl, repeat: true }), 'drawing')).toBe('Ctrl+Z');
    expect(means(press('p', { repeat: true }), 'drawing')).toBeNull();
  });

  test('keys that compose a character mean nothing', () => {
    expect(means(press('p', { isComposing: true }), 'drawing')).toBeNull();
  });

  test('help shows the keys that are there', () => {
    expect(keyWords('Ctrl+Shift+Z', true)).toBe('⌘⇧Z');
    expect(keyWords('Ctrl+Shift+Z', false)).toBe('Ctrl+Shift+Z');
    expect(keyWords('to the rim, ↑ ↓', false)).toBe('to the rim, ↑\u00a0↓');
  });

  test('keys go on being heard, and what is not available is left alone', () => {
    vi.stubGlobal('Element', class {});
    const page = new EventTarget();
    let runs = 0;
    const command: Command = {
      id: 'undo',
      label: 'Undo',
      keys: ['Ctrl+Z'],
      available: () => runs < 2,
      run: () => {
        runs += 1;
      },
    };
    const stop = listenToKeys(page as Document, new Map([['undo', command]]).values(), () => false);
    for (let time = 0; time < 4; time += 1)
      page.dispatchEvent(Object.assign(new Event('keydown'), press('z', ctrl)));
    expect(runs).toBe(2);
    stop();
  });
  afterEach(() => vi.unstubAllGlobals());
});
