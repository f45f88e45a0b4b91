import { afterEach, describe, expect, test, vi } from 'vitest';
import { browserKeyValues } from '../../../app/desk/keyValues.ts';
import { createStorage, storageSentence } from '../../../app/desk/storage.ts';
import { failure, memory } from './fakes.ts';

const open = { text: '{}', savedAt: '2026-12-01T10:00:00.000Z', stamp: 'a', shelfName: null, changed: true };

describe('what is kept in the browser', () => {
  test('the open sketch is there again as it was written', async () => {
    const storage = createStorage(memory().keyValues);
    expect(await storage.readOpen()).toEqual({ ok: true, value: null });
    expect(await storage.writeOpen(open)).toEqual({ ok: true, value: true });
    expect(await storage.readOpen()).toEqual({ ok: true, value: open });
  });

  test('the shelf lists the newest first and knows nothing of other keys', async () => {
    const storage = createStorage(memory().keyValues);
    await storage.writeOpen(open);
    await storage.writeShelf('old', { text: '1', savedAt: '2026-01-01T00:00:00.000Z' });
    await storage.writeShelf('new', { text: '2', savedAt: '2026-12-01T00:00:00.000Z' });
    const list = await storage.list();
    expect(list.ok && list.value.map((entry) => entry.name)).toEqual(['new', 'old']);
  });

  test('a sketch taken off the shelf is asked for in words', async () => {
    const storage = createStorage(memory().keyValues);
    await storage.writeShelf('relay', { text: '1', savedAt: '' });
    await storage.removeShelf('relay');
    expect(await storage.readShelf('relay')).toEqual({
      ok: false,
      why: 'There is no sketch named “relay” on the shelf any more.',
    });
  });

  test('what lies there in another form counts as nothing, never as a crash', async () => {
    const { keyValues, kept } = memory();
    const storage = createStorage(keyValues);
    for (const damaged of ['', 'no json', 'null', '7', '[]', '{"text":5}', '{"text":"x"}']) {
      kept.set('open', damaged);
      expect(await storage.readOpen()).toEqual({ ok: true, value: null });
    }
  });

  test('a write that does not read back is not a write', async () => {
    const { keyValues } = memory();
    const forgetful = createStorage({ ...keyValues, set: async () => {} });
    const result = await forgetful.writeOpen(open);
    expect(!result.ok && result.why).toBe(
      'What was read back from storage is not what was written: save the sketch as a file.',
    );
  });

  test.each([
    ['full', failure('QuotaExceededError'), /storage is full: remove sketches from the shelf/],
    ['forbidden', failure('SecurityError'), /forbids storage here/],
    ['a private window', failure('InvalidStateError'), /forbids storage here \(a private window/],
    ['absent', new ReferenceError('indexedDB is not defined'), /has no storage for sketches/],
    ['broken in a way of its own', failure('UnknownError'), /storage failed \(UnknownError\)/],
  ])('storage that is %s answers every call with one plain sentence', async (_, error, sentence) => {
    const storage = createStorage(memory(() => error).keyValues);
    const results = [
      await storage.readOpen(),
      await storage.writeOpen(open),
      await storage.readView(),
      await storage.writeView({}),
      await storage.list(),
      await storage.readShelf('a'),
      await storage.writeShelf('a', open),
      await storage.removeShelf('a'),
    ];
    for (const result of results) {
      expect(!result.ok && result.why).toMatch(sentence);
      expect(!result.ok && result.why).toMatch(/^[A-Z][^.]*\.$/);
    }
  });

  test('something thrown that is no error still has a sentence', () => {
    expect(storageSentence('odd')).toBe("This browser's storage failed: save the sketch as a file.");
  });
});

describe("the browser's own storage", () => {
  afterEach(() => {
    vi.unstubAllGlobals();
    vi.useRealTimers();
  });

  test('where there is none, that is said', async () => {
    const result = await createStorage(browserKeyValues()).readOpen();
    expect(!result.ok && result.why).toMatch(/^This browser has no storage for sketches/);
  });

  test('one that never answers does not hold up the start', async () => {
    vi.useFakeTimers();
    vi.stubGlobal('indexedDB', { open: () => ({}) });
    const reading = createStorage(browserKeyValues()).readOpen();
    await vi.advanceTimersByTimeAsync(10_000);
    expect(await reading).toEqual({
      ok: false,
      why: "This browser's storage does not answer: save the sketch as a file.",
    });
  });
});
