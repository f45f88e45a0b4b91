import { useReading } from '../live/reading.ts';
import type { Command } from '../store/command.ts';
import './card.css';

/** The app's commands by id. */
export type Commands = ReadonlyMap<string, Command>;

interface CommandButtonProps {
  readonly commands: Commands;
  readonly id: string;
  /** Stands on the button where the place already says what the command acts on. */
  readonly word: string;
}

/** A command in a word, its whole label in the tooltip; nothing when the app has none of that id. */
function CommandButton({ commands, id, word }: CommandButtonProps) {
  const command = commands.get(id);
  const available = useReading(() => command?.available() ?? false);
  if (!command) return null;
  const key = command.keys[0];
  return (
    <button
      type="button"
      className="text-button"
      disabled={!available}
      title={key === undefined ? command.label : `${command.label} (${key})`}
      onClick={() => command.run()}
    >
      {word}
    </button>
  );
}

interface CommandRowProps {
  readonly commands: Commands;
  /** Ids and words. */
  readonly row: readonly (readonly [id: string, word: string])[];
}

/** Commands side by side. */
export function CommandRow({ commands, row }: CommandRowProps) {
  return (
    <div className="card-actions">
      {row.map(([id, word]) => (
        <CommandButton key={id} commands={commands} id={id} word={word} />
      ))}
    </div>
  );
}
