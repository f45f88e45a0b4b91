import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import type { DeskParts } from '../../../app/desk/desk.ts';
import { createDesk } from '../../../app/desk/desk.ts';
import { deskStore, dismissRefused } from '../../../app/desk/deskStore.ts';
import type { KeyValues } from '../../../app/desk/keyValues.ts';
import { followLinks } from '../../../app/desk/links.ts';
import { dismissNotice, noticeStore } from '../../../app/desk/notices.ts';
import { createStorage } from '../../../app/desk/storage.ts';
import {
  applyEdit,
  cancelEdit,
  openSketch,
  previewEdit,
  sketchStore,
  undo,
} from '../../../app/store/sketchStore.ts';
import { setView, type View, viewStore } from '../../../app/store/viewStore.ts';
import { emptySketch, newThin, setTitle, writeSketch } from '../../../engine/index.ts';
import { diskFile, failure, inputsAndDownloads, memory } from './fakes.ts';

const QUIET_MS = 2000;
const demo = emptySketch('the demo');
const withPart = writeSketch({ ...demo, parts: [newThin(50)] });
const startView = viewStore.getState();

const beside: Readonly<Record<string, string>> = {
  'sketches/index.json': JSON.stringify([{ file: 'demo.json', title: 'Demo', summary: 'ours' }]),
  'sketches/demo.json': writeSketch(demo),
};

let writers = 0;

/** A tab of the app on `keyValues`, as it stands after it was opened at `hash`. */
async function openTab(keyValues: KeyValues, more: Partial<DeskParts> = {}, hash = '') {
  writers += 1;
  const tab = writers;
  let writes = 0;
  openSketch(emptySketch());
  const desk = createDesk({
    storage: createStorage(keyValues),
    files: inputsAndDownloads().files,
    fetchText: async (path) => beside[path] ?? Promise.reject(new Error('404')),
    now: () => new Date('2026-12-01T10:00:00Z'),
    newStamp: () => {
      writes += 1;
      return `${tab}-${writes}`;
    },
    ...more,
  });
  await desk.reopen(hash);
  return { desk, stop: desk.watch() };
}

const rename = (title: string) => applyEdit((sketch) => setTitle(sketch, title));
const title = () => sketchStore.getState().sketch.title;
const notice = () => noticeStore.getState().notice;
const names = () => {
  const { shelf } = deskStore.getState();
  return shelf?.ok ? shelf.value.map((entry) => entry.name) : [];
};

describe('the desk', () => {
  const stops: (() => void)[] = [];
  const tab = async (...args: Parameters<typeof openTab>) => {
    const opened = await openTab(...args);
    stops.push(opened.stop);
    return opened.desk;
  };

  beforeEach(() => {
    vi.useFakeTimers();
    dismissNotice();
    dismissRefused();
    viewStore.setState(startView, true);
    deskStore.setState({ shelf: null, shelfName: null, save: 'saved' });
  });
  afterEach(() => {
    for (const stop of stops.splice(0)) stop();
    vi.useRealTimers();
  });

  test('the first time, the demo is open and nothing is complained about', async () => {
    await tab(memory().keyValues);
    expect(title()).toBe('the demo');
    expect(notice()).toBeNull();
  });

  test('every step is saved by itself, and a reload finds sketch and view as they were left', async () => {
    const { keyValues } = memory();
    const desk = await tab(keyValues);
    rename('changed');
    const view: Partial<View> = {
      unit: 'in',
      theme: 'night',
      digits: 4,
      selection: ['image'],
      drawer: 'trace',
      topic: 'backFocus',
    };
    setView(view);
    expect(deskStore.getState().save).toBe('saving');
    await vi.advanceTimersByTimeAsync(QUIET_MS);
    expect(deskStore.getState().save).toBe('saved');
    await desk.flush();

    viewStore.setState(startView, true);
    await tab(keyValues);
    expect(title()).toBe('changed');
    expect(viewStore.getState()).toMatchObject(view);
  });

  test('a drag is not saved before it is released', async () => {
    const { keyValues, kept } = memory();
    const desk = await tab(keyValues);
    await desk.flush();
    previewEdit((sketch) => setTitle(sketch, 'half-way'));
    expect(deskStore.getState().save).toBe('saved');
    await vi.advanceTimersByTimeAsync(QUIET_MS);
    expect(kept.get('open') ?? '').not.toContain('half-way');
    cancelEdit();
  });

  test('leaving the page during a drag keeps the sketch as it was before the drag', async () => {
    const { keyValues, kept } = memory();
    const desk = await tab(keyValues);
    rename('before the drag');
    previewEdit((sketch) => setTitle(sketch, 'half-way'));
    await desk.flush();
    expect(kept.get('open')).toContain('before the drag');
  });

  test.each([
    ['full', 'QuotaExceededError', /full/],
    ['forbidden', 'SecurityError', /forbids/],
  ])('storage that is %s is said beside the title, and the sketch stays', async (_, name, sentence) => {
    await tab(memory((call) => (call === 'set' ? failure(name) : null)).keyValues);
    rename('still here');
    await vi.advanceTimersByTimeAsync(QUIET_MS);
    expect(deskStore.getState().save).toEqual({ notSaved: expect.stringMatching(sentence) });
    expect(title()).toBe('still here');
  });

  test('storage that cannot even be read opens the demo and says why nothing is saved', async () => {
    await tab(memory(() => failure('SecurityError')).keyValues);
    expect(title()).toBe('the demo');
    expect(deskStore.getState().save).toEqual({ notSaved: expect.stringContaining('forbids storage') });
  });

  test('a kept sketch that is broken is put aside on the shelf, said, and the demo opens', async () => {
    const { keyValues, kept } = memory();
    kept.set('open', JSON.stringify({ text: '{"format":"other"}', savedAt: '', stamp: 'x' }));
    const desk = await tab(keyValues);
    expect(title()).toBe('the demo');
    expect(notice()?.text).toMatch(/could not be read: .*It stays on the shelf as “Unreadable sketch”\.$/);
    await desk.shelf.look();
    expect(names()).toEqual(['Unreadable sketch']);
  });

  test('a kept view that is broken costs only the broken fields', async () => {
    const { keyValues, kept } = memory();
    kept.set('view', JSON.stringify({ unit: 'in', digits: 77, theme: 'purple', snap: 'yes', selection: 3 }));
    await tab(keyValues);
    const { unit, digits, theme, snap, selection } = viewStore.getState();
    expect({ unit, digits, theme, snap, selection }).toEqual({
      unit: 'in',
      digits: 3,
      theme: 'system',
      snap: true,
      selection: [],
    });
  });

  test('opening another sketch keeps the one that was changed, and the way back has its history', async () => {
    const desk = await tab(memory().keyValues);
    rename('my work');
    await desk.openNew();
    expect(title()).toBe('Untitled');
    expect(notice()).toMatchObject({ text: '“my work” is kept on the shelf.' });
    notice()?.action?.run();
    await vi.runAllTimersAsync();
    expect(title()).toBe('my work');
    undo();
    expect(title()).toBe('the demo');
  });

  test('opening another sketch leaves an untouched one alone', async () => {
    const desk = await tab(memory().keyValues);
    await desk.openNew();
    await desk.shelf.look();
    expect(names()).toEqual([]);
    expect(notice()).toBeNull();
  });

  test('a sketch that cannot be kept can still be gone back to, and that is said', async () => {
    const desk = await tab(
      memory((call) => (call === 'set' ? failure('QuotaExceededError') : null)).keyValues,
    );
    rename('my work');
    await desk.openNew();
    expect(notice()).toMatchObject({
      urgent: true,
      text: expect.stringMatching(/^“my work” is not kept\. .*full/),
    });
    notice()?.action?.run();
    expect(title()).toBe('my work');
  });

  test('a shelf entry that is changed and left is updated under its name', async () => {
    const desk = await tab(memory().keyValues);
    await desk.shelf.keepAs('relay');
    rename('relay, longer');
    await desk.openNew();
    expect(names()).toEqual(['relay']);
    await desk.shelf.open('relay');
    expect(title()).toBe('relay, longer');
  });

  test('a name on the shelf is given once: renaming and keeping say so', async () => {
    const desk = await tab(memory().keyValues);
    await desk.shelf.keepAs('a');
    await desk.openNew();
    expect(await desk.shelf.keepAs('a')).toBe(false);
    expect(notice()?.text).toBe(
      'There is already a sketch named “a” on the shelf: take another name, or remove that one first.',
    );
    expect(await desk.shelf.keepAs('b')).toBe(true);
    expect(await desk.shelf.rename('b', 'a')).toBe(false);
    expect(await desk.shelf.rename('b', 'c')).toBe(true);
    expect(await desk.shelf.duplicate('c')).toBe(true);
    expect(names().toSorted()).toEqual(['a', 'c', 'c copy']);
    expect(deskStore.getState().shelfName).toBe('c');
  });

  test('a sketch taken off the shelf can be put back', async () => {
    const desk = await tab(memory().keyValues);
    await desk.shelf.keepAs('a');
    await desk.shelf.remove('a');
    expect(names()).toEqual([]);
    notice()?.action?.run();
    await vi.runAllTimersAsync();
    expect(names()).toEqual(['a']);
  });

  test('two tabs on one sketch: the later one goes on under a name of its own, nothing is lost', async () => {
    const { keyValues, kept } = memory();
    const { desk: first, stop } = await openTab(keyValues);
    rename('from the first tab');
    await first.flush();
    stop();
    await tab(keyValues);
    // The first tab writes again while the second one is open.
    const open = JSON.parse(kept.get('open') ?? '{}');
    kept.set('open', JSON.stringify({ ...open, stamp: 'first tab again' }));
    rename('from the second tab');
    await vi.advanceTimersByTimeAsync(QUIET_MS);
    expect(notice()?.text).toBe(
      'Another tab works on this sketch too. The one in this tab is kept on the shelf as “from the second tab”.',
    );
    expect(kept.get('open')).toContain('from the first tab');
    expect(kept.get('shelf/from the second tab')).toContain('from the second tab');
  });

  test.each([
    ['is not JSON', 'hello', /not JSON/],
    ['is of a later version', '{"format":"gapwright-sketch","version":99}', /version 99/],
    ['has an unknown key', writeSketch(demo).replace('"notes"', '"colour": 1, "notes"'), /colour/],
    [
      'has a gap of 1e300',
      withPart.replace('"lengthMm": 0', '"lengthMm": 1e300'),
      /is 1e300 mm; it must be between/,
    ],
  ])('a file that %s is refused in words, and the open sketch stays', async (_, text, sentence) => {
    const desk = await tab(memory().keyValues);
    rename('good');
    expect(await desk.openDropped(new File([text], 'bad.json'))).toBe(false);
    const { refused } = deskStore.getState();
    expect(refused?.name).toBe('bad.json');
    expect(refused?.faults.map((fault) => fault.sentence).join(' ')).toMatch(sentence);
    expect(title()).toBe('good');
  });

  test('saving goes back to the file that was opened, and what is saved need not be kept on the shelf', async () => {
    const { handle, disk } = diskFile('mine.json', writeSketch(emptySketch('on disk')));
    const files = { ...inputsAndDownloads().files, showOpenFilePicker: async () => [handle] };
    const desk = await tab(memory().keyValues, { files });
    expect(await desk.openFile()).toBe(true);
    rename('edited');
    await desk.saveFile();
    expect(disk.text).toContain('edited');
    expect(notice()?.text).toBe('Saved as “mine.json”.');
    await desk.openNew();
    await desk.shelf.look();
    expect(names()).toEqual([]);
  });

  test('a link carries the sketch to another browser', async () => {
    vi.useRealTimers();
    const sender = await tab(memory().keyValues);
    rename('from afar');
    const link = await sender.link('https://example.org/gapwright/?x=1#old');
    if (!link.ok) throw new Error(link.why);
    expect(link.value).toMatch(/^https:\/\/example\.org\/gapwright\/\?x=1#sketch=[\w-]+$/);
    await tab(memory().keyValues, {}, new URL(link.value).hash);
    expect(title()).toBe('from afar');
  });

  test('a link followed while the page is open opens, keeps what was there, and leaves the address', async () => {
    vi.useRealTimers();
    const desk = await tab(memory().keyValues);
    rename('from afar');
    const link = await desk.link('https://example.org/');
    if (!link.ok) throw new Error(link.why);
    rename('my work');
    const page = Object.assign(new EventTarget(), {
      location: { hash: '', pathname: '/', search: '?x=1' },
      history: {
        replaceState: (_state: unknown, _title: string, address: string) => {
          page.location = { ...page.location, hash: '' };
          addresses.push(address);
        },
      },
    });
    const addresses: string[] = [];
    stops.push(followLinks(desk, page as unknown as Window));
    page.location = { ...page.location, hash: new URL(link.value).hash };
    page.dispatchEvent(new Event('hashchange'));
    await vi.waitFor(() => expect(addresses).toEqual(['/?x=1']));
    expect(title()).toBe('from afar');
    expect(notice()?.text).toBe('“my work” is kept on the shelf.');
  });

  test('a damaged link is said in one sentence and opens nothing', async () => {
    vi.useRealTimers();
    for (const hash of ['#sketch=', '#sketch=%%%', '#sketch=AAAA', '#sketch=bm9uc2Vuc2U']) {
      await tab(memory().keyValues, {}, hash);
      expect(title()).toBe('the demo');
      expect(notice()?.text).toBe('The link holds a damaged sketch: ask for it again, or for the file.');
    }
  });

  test('starting sketches that cannot be fetched leave an empty sketch and a sentence', async () => {
    const fetchText = () => Promise.reject(new Error('offline'));
    await tab(memory().keyValues, { fetchText });
    expect(title()).toBe('Untitled');
    expect(notice()?.text).toMatch(/could not be fetched/);
  });
});
