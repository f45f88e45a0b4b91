import { useReading } from '../live/reading.ts';
import { setView } from '../store/viewStore.ts';

/** What an empty sheet says: one sentence, and the way to the starting sketches. */
export function EmptySheet() {
  const empty = useReading(({ sketch }) => sketch.parts.length === 0);
  if (!empty) return null;
  return (
    <div className="empty-sheet">
      <p>Drag a part from the tray onto the axis, or tap it and then the axis.</p>
      <button type="button" className="text-button" onClick={() => setView({ sheet: 'shelf' })}>
        Begin with a starting sketch…
      </button>
    </div>
  );
}
