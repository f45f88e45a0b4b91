import type { KeyboardEvent } from 'react';

/**
 * Whether a key press asks for undo or redo, on any keyboard. A field that holds nothing typed says so by `data-untouched`; the
 * press then means the history of the page, and the field must hold on to nothing.
 */
export const isHistoryKey = ({ ctrlKey, metaKey, key, code }: KeyboardEvent): boolean =>
  (ctrlKey || metaKey) && (/^[zy]$/i.test(key) || code === 'KeyZ' || code === 'KeyY');
