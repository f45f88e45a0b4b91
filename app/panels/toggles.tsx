import { useReading } from '../live/reading.ts';
import type { ThemeChoice } from '../store/viewStore.ts';
import { setView } from '../store/viewStore.ts';
import { Icon } from '../ui/Icon.tsx';

const NEXT_THEME: Readonly<Record<ThemeChoice, ThemeChoice>> = {
  system: 'paper',
  paper: 'night',
  night: 'system',
};
const THEME_WORDS: Readonly<Record<ThemeChoice, string>> = {
  system: 'as the system',
  paper: 'paper',
  night: 'night',
};

/** Goes round the themes: as the system, paper, night. */
export function ThemeToggle() {
  const theme = useReading(({ view }) => view.theme);
  const next = NEXT_THEME[theme];
  const words = `Theme: ${THEME_WORDS[theme]}. Change to ${THEME_WORDS[next]}`;
  return (
    <button
      type="button"
      className="icon-button"
      aria-label={words}
      title={words}
      onClick={() => setView({ theme: next })}
    >
      <Icon name="theme" />
    </button>
  );
}

/** Changes the unit of lengths on the screen; the sketch stays in millimetres. */
export function UnitToggle() {
  const unit = useReading(({ view }) => view.unit);
  const next = unit === 'mm' ? 'in' : 'mm';
  const words = `Lengths in ${unit}. Change to ${next}`;
  return (
    <button
      type="button"
      className="icon-button"
      aria-label={words}
      title={words}
      onClick={() => setView({ unit: next })}
    >
      {unit}
    </button>
  );
}
