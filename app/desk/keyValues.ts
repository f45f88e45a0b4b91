import { createStore, del, get, keys, set } from 'idb-keyval';

/** The little of a key-value store that the desk needs. Every call may fail; what it failed with is for `storageSentence`. */
export interface KeyValues {
  readonly get: (key: string) => Promise<unknown>;
  readonly set: (key: string, value: string) => Promise<void>;
  readonly del: (key: string) => Promise<void>;
  readonly keys: () => Promise<readonly string[]>;
}

/** Long enough for a slow disk; a browser that blocks the database without a word would otherwise hold up the start. */
const PATIENCE_MS = 5000;

/** What a store that does not answer fails with. */
class NoAnswer extends Error {
  override readonly name = 'NoAnswer';
}

/** This browser's own store for this site (IndexedDB). Opened at first use, so that a forbidden one fails there. */
export function browserKeyValues(): KeyValues {
  const store = createStore('gapwright', 'desk');
  return {
    get: (key) => answered(async () => get<unknown>(key, store)),
    set: (key, value) => answered(async () => set(key, value, store)),
    del: (key) => answered(async () => del(key, store)),
    keys: () => answered(async () => (await keys(store)).map(String)),
  };
}

async function answered<T>(job: () => Promise<T>): Promise<T> {
  let timer: ReturnType<typeof setTimeout> | undefined;
  const silence = new Promise<never>((_, reject) => {
    timer = setTimeout(() => reject(new NoAnswer()), PATIENCE_MS);
  });
  try {
    return await Promise.race([job(), silence]);
  } finally {
    clearTimeout(timer);
  }
}
