import { useReadingNow } from '../live/reading.ts';
import { setView } from '../store/viewStore.ts';

/** Changes the unit of lengths on the screen; the sketch stays in millimetres. */
export function UnitToggle() {
  const unit = useReadingNow(({ view }) => view.unit);
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
