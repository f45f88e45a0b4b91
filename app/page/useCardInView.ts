import type { RefObject } from 'react';
import { useLayoutEffect, useRef } from 'react';
import { useReadingNow } from '../live/reading.ts';

/**
 * Scrolls a panel to the card at `place` when something becomes selected elsewhere and its card begins too low in the panel, and
 * back when nothing is selected any more. A panel that the user has scrolled or works in stays where it is. How much of
 * a card must be in view is the place's scroll margin.
 */
export function useCardInView(
  panel: RefObject<HTMLElement | null>,
  place: RefObject<HTMLElement | null>,
): void {
  const selection = useReadingNow(({ view }) => view.selection.join(' '));
  const way = useRef<{ readonly from: number; readonly to: number } | null>(null);

  useLayoutEffect(() => {
    const element = panel.current;
    if (!element || element.contains(document.activeElement)) return;
    const at = element.scrollTop;
    if (way.current && way.current.to !== at) way.current = null;
    if (selection === '') {
      if (way.current) element.scrollTop = way.current.from;
      way.current = null;
      return;
    }
    place.current?.scrollIntoView({ block: 'nearest' });
    if (element.scrollTop !== at) way.current = { from: way.current?.from ?? at, to: element.scrollTop };
  }, [selection, panel, place]);
}
