import type { Outcome } from '../../engine/index.ts';
import { none, some } from '../../engine/index.ts';
import type { KeyValues } from './keyValues.ts';

/** What a call on the storage gives: a value, or one sentence that says why not. */
export type Kept<T> = Outcome<T, string>;

/** A sketch as it lies in storage: the text of its file, and when it was written (ISO 8601). */
export interface KeptSketch {
  readonly text: string;
  readonly savedAt: string;
}

/** The sketch that was open last. */
export interface OpenSketch extends KeptSketch {
  /** Names the writer, so that a tab can tell its own writing from another tab's. */
  readonly stamp: string;
  /** The name it has on the shelf; null when it never had one. */
  readonly shelfName: string | null;
  /** Whether it was changed since it was opened. */
  readonly changed: boolean;
}

/** One line of the shelf. */
export interface ShelfEntry {
  readonly name: string;
  readonly savedAt: string;
}

/** Everything kept in the browser. No call throws; every write is read back before it counts. */
export interface Storage {
  /** Null when nothing was kept yet. */
  readonly readOpen: () => Promise<Kept<OpenSketch | null>>;
  readonly writeOpen: (open: OpenSketch) => Promise<Kept<true>>;
  /** The kept view as plain data, to be checked by its reader; null when none was kept. */
  readonly readView: () => Promise<Kept<unknown>>;
  readonly writeView: (view: object) => Promise<Kept<true>>;
  /** The shelf, newest first. */
  readonly list: () => Promise<Kept<readonly ShelfEntry[]>>;
  readonly readShelf: (name: string) => Promise<Kept<KeptSketch>>;
  readonly writeShelf: (name: string, kept: KeptSketch) => Promise<Kept<true>>;
  readonly removeShelf: (name: string) => Promise<Kept<true>>;
}

const OPEN = 'open';
const VIEW = 'view';
const SHELF = 'shelf/';

/** Storage on top of `keyValues`. */
export function createStorage(keyValues: KeyValues): Storage {
  const write = (key: string, value: object) =>
    attempt(async () => {
      const text = JSON.stringify(value);
      await keyValues.set(key, text);
      if ((await keyValues.get(key)) !== text) throw new NotReadBack();
      return true as const;
    });
  const read = (key: string) => attempt(async () => dataIn(await keyValues.get(key)));

  return {
    readOpen: async () => {
      const data = await read(OPEN);
      return data.ok ? some(openIn(data.value)) : data;
    },
    writeOpen: (open) => write(OPEN, open),
    readView: () => read(VIEW),
    writeView: (view) => write(VIEW, view),
    list: () =>
      attempt(async () => {
        const names = (await keyValues.keys()).filter((key) => key.startsWith(SHELF));
        const entries = await Promise.all(
          names.map(async (key) => ({
            name: key.slice(SHELF.length),
            savedAt: keptIn(dataIn(await keyValues.get(key)))?.savedAt ?? '',
          })),
        );
        return entries.sort((a, b) => b.savedAt.localeCompare(a.savedAt) || a.name.localeCompare(b.name));
      }),
    readShelf: async (name) => {
      const data = await read(SHELF + name);
      if (!data.ok) return data;
      const kept = keptIn(data.value);
      return kept ? some(kept) : none(`There is no sketch named “${name}” on the shelf any more.`);
    },
    writeShelf: (name, kept) => write(SHELF + name, kept),
    removeShelf: (name) =>
      attempt(async () => {
        await keyValues.del(SHELF + name);
        return true as const;
      }),
  };
}

/** One sentence for what a browser's storage failed with, and what to do instead. */
export function storageSentence(error: unknown): string {
  const name = error instanceof Error || error instanceof DOMException ? error.name : '';
  switch (name) {
    case 'QuotaExceededError':
      return "This browser's storage is full: remove sketches from the shelf, or save this one as a file.";
    case 'SecurityError':
    case 'InvalidStateError':
    case 'NotAllowedError':
      return 'This browser forbids storage here (a private window, or blocked site data): save the sketch as a file.';
    case 'ReferenceError':
    case 'TypeError':
      return 'This browser has no storage for sketches: save the sketch as a file.';
    case 'NoAnswer':
      return "This browser's storage does not answer: save the sketch as a file.";
    case 'NotReadBack':
      return 'What was read back from storage is not what was written: save the sketch as a file.';
    default:
      return `This browser's storage failed${name ? ` (${name})` : ''}: save the sketch as a file.`;
  }
}

class NotReadBack extends Error {
  override readonly name = 'NotReadBack';
}

async function attempt<T>(job: () => Promise<T>): Promise<Kept<T>> {
  try {
    return some(await job());
  } catch (error) {
    return none(storageSentence(error));
  }
}

/** The data in a stored text; null when it is absent or no JSON. */
function dataIn(stored: unknown): unknown {
  if (typeof stored !== 'string') return null;
  try {
    return JSON.parse(stored);
  } catch {
    return null;
  }
}

function keptIn(data: unknown): KeptSketch | null {
  if (typeof data !== 'object' || data === null) return null;
  const { text, savedAt } = data as Partial<Record<keyof KeptSketch, unknown>>;
  return typeof text === 'string' && typeof savedAt === 'string' ? { text, savedAt } : null;
}

function openIn(data: unknown): OpenSketch | null {
  const kept = keptIn(data);
  if (!kept) return null;
  const { stamp, shelfName, changed } = data as Partial<Record<keyof OpenSketch, unknown>>;
  return {
    ...kept,
    stamp: typeof stamp === 'string' ? stamp : '',
    shelfName: typeof shelfName === 'string' ? shelfName : null,
    changed: changed !== false,
  };
}
