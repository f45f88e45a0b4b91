import { useReading } from '../live/reading.ts';
import { setView, viewStore } from '../store/viewStore.ts';

/** Whether the group of that name is folded, and the way to change it; the view remembers. */
export function useFolding(name: string): readonly [boolean, (folded: boolean) => void] {
  const folded = useReading(({ view }) => view.foldedGroups.includes(name));
  const fold = (fold: boolean) => {
    const others = viewStore.getState().foldedGroups.filter((other) => other !== name);
    setView({ foldedGroups: fold ? [...others, name] : others });
  };
  return [folded, fold];
}
