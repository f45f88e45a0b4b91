import type { Command } from '../store/command.ts';

/** The little of a keyboard event that decides. */
export interface KeyPress {
  readonly key: string;
  readonly code: string;
  readonly ctrlKey: boolean;
  readonly metaKey: boolean;
  readonly altKey: boolean;
  readonly shiftKey: boolean;
  readonly repeat: boolean;
  readonly isComposing: boolean;
}

/**
 * Where the focus is: on the drawing, in a text that is being typed, in a field that holds nothing typed, in a modal sheet, or
 * anywhere else on the page.
 */
export type KeyPlace = 'drawing' | 'text' | 'field' | 'sheet' | 'page';

/** These have a meaning of their own wherever text can be selected. */
const TEXT_COMMANDS = new Set(['Ctrl+A', 'Ctrl+C', 'Ctrl+X', 'Ctrl+V']);
/** These mean the whole sketch wherever they are pressed; the browser's own would be of no use here. */
const EVERYWHERE = new Set(['Ctrl+S', 'Ctrl+Shift+S', 'Ctrl+O', 'Ctrl+P']);
/** A field without typing has no history of its own, so there too these go through that of the sketch. */
const HISTORY = new Set(['Ctrl+Z', 'Ctrl+Shift+Z', 'Ctrl+Y']);
/** A held key may go on stepping, but never go on making parts. */
const MAY_REPEAT = new Set([...HISTORY, ',', '.']);

/**
 * The name of a key press as commands write it: `Ctrl+Shift+Z`, `P`, `?`, `Delete`. ⌘ counts as Ctrl. Shift is named with
 * letters and named keys only, since other characters may need it to be typed. Keyboards of other scripts go by the place
 * of the key.
 */
export function keyName(press: KeyPress): string {
  const letter = /^Key([A-Z])$/.exec(press.code)?.[1];
  const foreign = press.key.length === 1 && press.key > '\u007f' && letter !== undefined;
  const key = foreign ? letter : press.key.length === 1 ? press.key.toUpperCase() : press.key;
  const modifiers = [
    (press.ctrlKey || press.metaKey) && 'Ctrl',
    press.altKey && 'Alt',
    press.shiftKey && /^([A-Z]|..+)$/.test(key) && 'Shift',
  ];
  return [...modifiers.filter(Boolean), key].join('+');
}

/**
 * The command that a key press means, available or not; null when it means none there. Keys without Ctrl act only on the
 * drawing (WCAG 2.1.4), Escape also on the page; a text field keeps its own copy and paste, and its undo while it is typed in.
 */
export function commandFor(press: KeyPress, commands: Iterable<Command>, place: KeyPlace): Command | null {
  if (press.isComposing) return null;
  const name = keyName(press);
  if (!actsAt(name, place) || (press.repeat && !MAY_REPEAT.has(name))) return null;
  for (const command of commands) if (command.keys.includes(name)) return command;
  return null;
}

function actsAt(name: string, place: KeyPlace): boolean {
  if (place === 'drawing' || EVERYWHERE.has(name)) return true;
  if (place === 'field') return HISTORY.has(name);
  if (place !== 'page') return false;
  return name === 'Escape' || (name.startsWith('Ctrl+') && !TEXT_COMMANDS.has(name));
}

const TEXTS = 'textarea, select, [contenteditable], input:not([type=range], [type=checkbox], [type=radio])';

/** Where `target` stands; `isDrawing` tells whether an element belongs to the drawing. */
function placeOf(target: EventTarget | null, isDrawing: (element: Element) => boolean): KeyPlace {
  if (!(target instanceof Element)) return 'page';
  const isModal = target.closest('dialog:modal') !== null;
  if (target.closest(TEXTS)) return !isModal && target.matches('select, [data-untouched]') ? 'field' : 'text';
  if (isModal) return 'sheet';
  return isDrawing(target) ? 'drawing' : 'page';
}

/** Runs commands by their keys, wherever on `page` they are pressed; returns the way to stop. */
export function listenToKeys(
  page: Document,
  commands: Iterable<Command>,
  isDrawing: (element: Element) => boolean,
): () => void {
  // An iterator could be gone through only once.
  const all = [...commands];
  const onKeyDown = (event: KeyboardEvent) => {
    if (event.defaultPrevented) return;
    const place = placeOf(event.target, isDrawing);
    const command = commandFor(event, all, place);
    if (!command) return;
    if (command.available()) {
      event.preventDefault();
      // What is being typed or stepped counts before the sketch is saved or printed.
      if (place === 'text' || (place === 'field' && !HISTORY.has(keyName(event))))
        (event.target as HTMLElement).blur();
      command.run();
    } else if (event.ctrlKey || event.metaKey) event.preventDefault();
  };
  page.addEventListener('keydown', onKeyDown);
  return () => page.removeEventListener('keydown', onKeyDown);
}
