import type { Outcome, Sketch } from '../../engine/index.ts';
import { none, some, writeSketch } from '../../engine/index.ts';
import { fileNameFrom } from './names.ts';

/** Far beyond any sketch; larger files are refused before they are read. */
export const TEXT_LIMIT_BYTES = 5 * 1024 * 1024;

/** The little of a file handle that is used (File System Access). */
export interface FileHandle {
  readonly name: string;
  readonly getFile: () => Promise<File>;
  readonly createWritable: () => Promise<{ write(text: string): Promise<void>; close(): Promise<void> }>;
}

interface PickerOptions {
  readonly suggestedName?: string;
  readonly types: readonly {
    readonly description: string;
    readonly accept: Readonly<Record<string, string[]>>;
  }[];
}

/** What of the browser opens and saves files. The pickers are absent where there is no File System Access. */
export interface FileHost {
  readonly showOpenFilePicker?: (options: PickerOptions) => Promise<FileHandle[]>;
  readonly showSaveFilePicker?: (options: PickerOptions) => Promise<FileHandle>;
  /** Asks with a file input; null when the user turned away. */
  readonly askForFile: () => Promise<File | null>;
  /** Hands `content` to the browser as a download. */
  readonly download: (name: string, content: Blob) => void;
}

/** A file's text, and its handle where the browser gives one, so that saving goes back to the same file. */
export interface OpenedText {
  readonly name: string;
  readonly text: string;
  readonly handle: FileHandle | null;
}

const SKETCH_TYPES = [{ description: 'Gapwright sketch', accept: { 'application/json': ['.json'] } }];

/** Lets the user choose a sketch file and reads it. Null when the user turned away; a sentence when it cannot be read. */
export async function openFile(host: FileHost): Promise<Outcome<OpenedText, string> | null> {
  try {
    if (host.showOpenFilePicker) {
      const [handle] = await host.showOpenFilePicker({ types: SKETCH_TYPES });
      return handle ? await readFile(await handle.getFile(), handle) : null;
    }
    const file = await host.askForFile();
    return file && (await readFile(file));
  } catch (error) {
    return turnedAway(error) ? null : none(`The file could not be opened (${reason(error)}).`);
  }
}

/** The text of `file`, or one sentence why it cannot be a sketch. */
export async function readFile(
  file: File,
  handle: FileHandle | null = null,
): Promise<Outcome<OpenedText, string>> {
  if (file.size > TEXT_LIMIT_BYTES)
    return none(
      `“${file.name}” is ${(file.size / 1024 / 1024).toFixed(1)} MB; a sketch file is at most ${TEXT_LIMIT_BYTES / 1024 / 1024} MB.`,
    );
  try {
    return some({ name: file.name, text: await file.text(), handle });
  } catch (error) {
    return none(`“${file.name}” could not be read (${reason(error)}).`);
  }
}

/** Where a saved sketch went. */
export interface SavedFile {
  readonly name: string;
  readonly handle: FileHandle | null;
}

/**
 * Saves `sketch`: into the file of `handle` when there is one, else where the user chooses, else as a download.
 * Null when the user turned away; a sentence when it could not be written.
 */
export async function saveFile(
  host: FileHost,
  sketch: Sketch,
  handle: FileHandle | null,
): Promise<Outcome<SavedFile, string> | null> {
  const text = writeSketch(sketch);
  const suggestedName = fileNameFrom(sketch.title, 'json');
  try {
    const target =
      handle ?? (await host.showSaveFilePicker?.({ suggestedName, types: SKETCH_TYPES })) ?? null;
    if (!target) {
      host.download(suggestedName, new Blob([text], { type: 'application/json' }));
      return some({ name: suggestedName, handle: null });
    }
    const writable = await target.createWritable();
    await writable.write(text);
    await writable.close();
    return some({ name: target.name, handle: target });
  } catch (error) {
    return turnedAway(error) ? null : none(`The sketch was not saved as a file (${reason(error)}).`);
  }
}

/** Calls `open` with the first file dropped anywhere on `target`; returns the way to stop. */
export function onFileDropped(target: EventTarget, open: (file: File) => void): () => void {
  const over = (event: Event) => {
    if ((event as DragEvent).dataTransfer?.types.includes('Files')) event.preventDefault();
  };
  const drop = (event: Event) => {
    const file = (event as DragEvent).dataTransfer?.files[0];
    if (!file) return;
    event.preventDefault();
    open(file);
  };
  target.addEventListener('dragover', over);
  target.addEventListener('drop', drop);
  return () => {
    target.removeEventListener('dragover', over);
    target.removeEventListener('drop', drop);
  };
}

/** A closed picker is not a failure. */
const turnedAway = (error: unknown): boolean => error instanceof Error && error.name === 'AbortError';

function reason(error: unknown): string {
  const name = error instanceof Error ? error.name : '';
  if (name === 'NotAllowedError' || name === 'SecurityError') return 'the browser did not allow it';
  if (name === 'NotFoundError') return 'it is not there any more';
  if (name === 'NotReadableError') return 'it cannot be read';
  if (name === 'QuotaExceededError') return 'the disk is full';
  return name || 'the browser gave no reason';
}
