export interface Autosave {
  /** Something changed: a write follows once it has been quiet for a moment. */
  readonly mark: () => void;
  /** Writes at once what was marked; resolves when nothing is left to write. */
  readonly flush: () => Promise<void>;
}

/** Calls `write` after `quietMs` without another mark; never two writes at a time. `write` must not throw. */
export function createAutosave(write: () => Promise<void>, quietMs: number): Autosave {
  let timer: ReturnType<typeof setTimeout> | null = null;
  let marked = false;
  let writing: Promise<void> | null = null;

  const flush = async (): Promise<void> => {
    if (timer !== null) clearTimeout(timer);
    timer = null;
    while (marked || writing) {
      if (!writing) {
        marked = false;
        writing = write().finally(() => {
          writing = null;
        });
      }
      await writing;
    }
  };

  const mark = () => {
    marked = true;
    if (timer !== null) clearTimeout(timer);
    timer = setTimeout(() => void flush(), quietMs);
  };

  return { mark, flush };
}
