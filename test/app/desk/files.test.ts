import { describe, expect, test } from 'vitest';
import { onFileDropped, openFile, readFile, saveFile, TEXT_LIMIT_BYTES } from '../../../app/desk/files.ts';
import { emptySketch, parseSketch } from '../../../engine/index.ts';
import { diskFile, failure, inputsAndDownloads } from './fakes.ts';

const sketch = { ...emptySketch('Würfel: 3 × f/4'), notes: 'n' };

describe('opening files', () => {
  test('without file pickers the file input is asked', async () => {
    const { files } = inputsAndDownloads(new File(['hello'], 'a.json'));
    expect(await openFile(files)).toEqual({
      ok: true,
      value: { name: 'a.json', text: 'hello', handle: null },
    });
  });

  test('with a picker the handle is kept, so that saving goes back to the file', async () => {
    const { handle } = diskFile('b.json', 'text');
    const opened = await openFile({
      ...inputsAndDownloads().files,
      showOpenFilePicker: async () => [handle],
    });
    expect(opened).toEqual({ ok: true, value: { name: 'b.json', text: 'text', handle } });
  });

  test('turning away is no failure', async () => {
    const { files } = inputsAndDownloads(null);
    const abort = async () => {
      throw failure('AbortError');
    };
    expect(await openFile(files)).toBeNull();
    expect(await openFile({ ...files, showOpenFilePicker: abort })).toBeNull();
    expect(await saveFile({ ...files, showSaveFilePicker: abort }, sketch, null)).toBeNull();
  });

  test('10 MB of nonsense are refused before they are read', async () => {
    const big = { name: 'huge.json', size: 10 * 1024 * 1024, text: () => Promise.reject(new Error('read')) };
    expect(await readFile(big as unknown as File)).toEqual({
      ok: false,
      why: `“huge.json” is 10.0 MB; a sketch file is at most ${TEXT_LIMIT_BYTES / 1024 / 1024} MB.`,
    });
  });

  test('a file that went away or is kept from us is named in a sentence', async () => {
    const gone = {
      ...diskFile('c.json', '').handle,
      getFile: async () => {
        throw failure('NotFoundError');
      },
    };
    const opened = await openFile({ ...inputsAndDownloads().files, showOpenFilePicker: async () => [gone] });
    expect(opened).toEqual({ ok: false, why: 'The file could not be opened (it is not there any more).' });
    const unreadable = { name: 'd.json', size: 1, text: () => Promise.reject(failure('NotReadableError')) };
    expect(await readFile(unreadable as unknown as File)).toEqual({
      ok: false,
      why: '“d.json” could not be read (it cannot be read).',
    });
  });

  test('a file dropped on the window is opened, other drops are left alone', () => {
    const target = new EventTarget();
    const opened: string[] = [];
    const stop = onFileDropped(target, (file) => opened.push(file.name));
    const drop = (files: readonly File[], types: readonly string[]) => {
      const event = new Event('drop', { cancelable: true });
      Object.assign(event, { dataTransfer: { files, types } });
      target.dispatchEvent(event);
      return event.defaultPrevented;
    };
    expect(drop([new File([''], 'e.json')], ['Files'])).toBe(true);
    expect(drop([], ['text/plain'])).toBe(false);
    stop();
    drop([new File([''], 'late.json')], ['Files']);
    expect(opened).toEqual(['e.json']);
  });
});

describe('saving files', () => {
  test('without a picker it is a download that reads back to the same sketch', async () => {
    const { files, downloads } = inputsAndDownloads();
    expect(await saveFile(files, sketch, null)).toEqual({
      ok: true,
      value: { name: 'würfel-3-f-4.json', handle: null },
    });
    const [download] = downloads;
    expect(download?.name).toBe('würfel-3-f-4.json');
    expect(parseSketch((await download?.content.text()) ?? '')).toEqual({ ok: true, sketch });
  });

  test('a sketch that came from a file goes back into it without asking', async () => {
    const { handle, disk } = diskFile('mine.json', '');
    const { files, downloads } = inputsAndDownloads();
    expect(await saveFile(files, sketch, handle)).toEqual({ ok: true, value: { name: 'mine.json', handle } });
    expect(parseSketch(disk.text)).toEqual({ ok: true, sketch });
    expect(downloads).toEqual([]);
  });

  test.each([
    ['NotAllowedError', 'The sketch was not saved as a file (the browser did not allow it).'],
    ['QuotaExceededError', 'The sketch was not saved as a file (the disk is full).'],
  ])('a file that refuses with %s is said in one sentence', async (name, why) => {
    const { handle } = diskFile('mine.json', '', failure(name));
    expect(await saveFile(inputsAndDownloads().files, sketch, handle)).toEqual({ ok: false, why });
  });
});
