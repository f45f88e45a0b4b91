import type { Desk } from './desk.ts';
import { carriesSketch } from './share.ts';

/**
 * Opens the sketches of links that are followed while the page is open; returns the way to stop. The address forgets a
 * sketch once it is open, so that a reload finds what became of it. Call it once the desk has reopened.
 */
export function followLinks(desk: Desk, page: Window): () => void {
  const forget = () => {
    const { hash, pathname, search } = page.location;
    if (carriesSketch(hash)) page.history.replaceState(null, '', pathname + search);
  };
  const follow = () => void desk.openLink(page.location.hash).then(forget);
  forget();
  page.addEventListener('hashchange', follow);
  return () => page.removeEventListener('hashchange', follow);
}
