import { useSyncExternalStore } from 'react';

/** The width below which panels rise from the lower edge; as in page.css. */
const NARROW = '(max-width: 760px)';

function watch(onChange: () => void): () => void {
  const query = matchMedia(NARROW);
  query.addEventListener('change', onChange);
  return () => query.removeEventListener('change', onChange);
}

/** Whether the screen is a narrow one. */
export const useNarrow = (): boolean => useSyncExternalStore(watch, () => matchMedia(NARROW).matches);
