import type { FileHandle, FileHost } from '../../../app/desk/files.ts';
import type { KeyValues } from '../../../app/desk/keyValues.ts';

/** What a browser's storage fails with, by the name the browser gives it. */
export const failure = (name: string): DOMException => new DOMException('', name);

/** Key-value storage in memory. What `fail` gives for a call is thrown in its place. */
export function memory(fail: (call: keyof KeyValues, key: string) => Error | null = () => null) {
  const kept = new Map<string, string>();
  const attempt = async <T>(call: keyof KeyValues, key: string, job: () => T): Promise<T> => {
    const error = fail(call, key);
    if (error) throw error;
    return job();
  };
  const keyValues: KeyValues = {
    get: (key) => attempt('get', key, () => kept.get(key)),
    set: (key, value) => attempt('set', key, () => void kept.set(key, value)),
    del: (key) => attempt('del', key, () => void kept.delete(key)),
    keys: () => attempt('keys', '', () => [...kept.keys()]),
  };
  return { keyValues, kept };
}

/** A browser without file pickers: `choose` is the file the user picks, `downloads` is what was handed over. */
export function inputsAndDownloads(choose: File | null = null) {
  const downloads: { name: string; content: Blob }[] = [];
  const files: FileHost = {
    askForFile: async () => choose,
    download: (name, content) => {
      downloads.push({ name, content });
    },
  };
  return { files, downloads };
}

/** A file on a disk that can be written, or that refuses with `error`. */
export function diskFile(name: string, text: string, error: Error | null = null) {
  const disk = { text };
  const handle: FileHandle = {
    name,
    getFile: async () => new File([disk.text], name),
    createWritable: async () => {
      if (error) throw error;
      let pending = '';
      return {
        write: async (part: string) => {
          pending += part;
        },
        close: async () => {
          disk.text = pending;
        },
      };
    },
  };
  return { handle, disk };
}
