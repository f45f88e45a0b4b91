const APPLE: readonly (readonly [RegExp, string])[] = [
  [/Ctrl\+/g, '⌘'],
  [/\bAlt\b/g, '⌥'],
  [/Shift\+/g, '⇧'],
];

/** Keys as the keyboard in front of the user has them; arrows beside each other stay on one line. */
export function keyWords(keys: string, apple: boolean): string {
  const together = keys.replaceAll(/(?<=[←→↑↓]) (?=[←→↑↓])/g, '\u00a0');
  return apple ? APPLE.reduce((text, [from, to]) => text.replace(from, to), together) : together;
}
