import type { FileHost } from './files.ts';

/** This browser's ways to open and save files. */
export function browserFiles(): FileHost {
  const { showOpenFilePicker, showSaveFilePicker } = window as unknown as Partial<FileHost>;
  return {
    ...(showOpenFilePicker && { showOpenFilePicker: showOpenFilePicker.bind(window) }),
    ...(showSaveFilePicker && { showSaveFilePicker: showSaveFilePicker.bind(window) }),
    askForFile,
    download,
  };
}

function askForFile(): Promise<File | null> {
  return new Promise((resolve) => {
    const input = document.createElement('input');
    input.type = 'file';
    input.accept = '.json,application/json';
    input.hidden = true;
    const end = (file: File | null) => {
      input.remove();
      resolve(file);
    };
    input.addEventListener('change', () => end(input.files?.[0] ?? null));
    input.addEventListener('cancel', () => end(null));
    document.body.append(input);
    input.click();
  });
}

/** Long enough for the slowest browser to take the download over. */
const KEEP_URL_MS = 60_000;

function download(name: string, content: Blob): void {
  const url = URL.createObjectURL(content);
  const link = document.createElement('a');
  link.href = url;
  link.download = name;
  link.hidden = true;
  document.body.append(link);
  link.click();
  link.remove();
  setTimeout(() => URL.revokeObjectURL(url), KEEP_URL_MS);
}
