/** Longest title or shelf name kept. */
const NAME_LIMIT = 80;
const UNNAMED = 'Untitled';

/** `text` as a name for the shelf: one line, no longer than 80 characters, never empty. */
export function nameFrom(text: string): string {
  const line = text.replace(/\s+/g, ' ').trim().slice(0, NAME_LIMIT).trim();
  return line === '' ? UNNAMED : line;
}

/** `name`, or `name 2`, `name 3` … when it is taken. */
export function freeName(name: string, taken: Iterable<string>): string {
  const used = new Set(taken);
  if (!used.has(name)) return name;
  let number = 2;
  while (used.has(`${name} ${number}`)) number += 1;
  return `${name} ${number}`;
}

/** A file name from a title: letters and digits of any script, the rest as hyphens, and the extension. */
export function fileNameFrom(title: string, extension: string): string {
  const stem = nameFrom(title)
    .normalize('NFC')
    .replace(/[^\p{L}\p{N}]+/gu, '-')
    .replace(/^-+|-+$/g, '')
    .toLowerCase();
  return `${stem || 'sketch'}.${extension}`;
}
