import { useReadingNow } from '../live/reading.ts';
import { setView, viewStore } from '../store/viewStore.ts';

/**
 * Whether the group of that name is folded, and the way to change it. The view remembers the groups that are not as they
 * start.
 */
export function useFolding(
  name: string,
  startsFolded = false,
): readonly [boolean, (folded: boolean) => void] {
  const folded = useReadingNow(({ view }) => view.foldedGroups.includes(name) !== startsFolded);
  const fold = (folds: boolean) => {
    const others = viewStore.getState().foldedGroups.filter((other) => other !== name);
    setView({ foldedGroups: folds === startsFolded ? others : [...others, name] });
  };
  return [folded, fold];
}
