import { useSyncExternalStore } from 'react';
import { useStore } from 'zustand';
import type { ThemeName } from '../board/styles.ts';
import { viewStore } from '../store/viewStore.ts';

const FORCED = '(forced-colors: active)';
const DARK = '(prefers-color-scheme: dark)';

function watch(onChange: () => void): () => void {
  const queries = [FORCED, DARK].map((query) => matchMedia(query));
  for (const query of queries) query.addEventListener('change', onChange);
  return () => {
    for (const query of queries) query.removeEventListener('change', onChange);
  };
}

const systemTheme = (): ThemeName =>
  matchMedia(FORCED).matches ? 'forced' : matchMedia(DARK).matches ? 'night' : 'paper';

/** The theme that is shown now: the user's choice, the system's where it is left to it, forced colours before both. */
export function useThemeName(): ThemeName {
  const chosen = useStore(viewStore, (view) => view.theme);
  const system = useSyncExternalStore(watch, systemTheme);
  return system === 'forced' || chosen === 'system' ? system : chosen;
}
