const APPLE: readonly (readonly [RegExp, string])[] = [
  [/Ctrl\+/g, '⌘'],
  [/\bAlt\b/g, '⌥'],
  [/Shift\+/g, '⇧'],
];

/** Keys as the keyboard in front of the user has them. */
export function keyWords(keys: string, apple: boolean): string {
  return apple ? APPLE.reduce((text, [from, to]) => text.replace(from, to), keys) : keys;
}
