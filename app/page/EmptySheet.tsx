import { useReading } from '../live/reading.ts';
import { CommandButton } from '../panels/CommandButton.tsx';
import type { Commands } from '../panels/useCommand.ts';
import { setView } from '../store/viewStore.ts';

interface EmptySheetProps {
  readonly commands: Commands;
}

/** What an empty sheet says: one sentence, and the ways to begin. */
export function EmptySheet({ commands }: EmptySheetProps) {
  const empty = useReading(({ sketch }) => sketch.parts.length === 0);
  if (!empty) return null;
  return (
    <div className="empty-sheet">
      <p>Drag a part from the tray onto the axis, or tap it and then the axis.</p>
      <button type="button" className="text-button" onClick={() => setView({ sheet: 'shelf' })}>
        Begin with a starting sketch…
      </button>
      <CommandButton commands={commands} id="pastePrescription" word="Paste a prescription…" />
    </div>
  );
}
