import { useReading } from '../live/reading.ts';
import type { Command } from '../store/command.ts';
import './card.css';

/** The app's commands by id. */
export type Commands = ReadonlyMap<string, Command>;

interface CommandButtonProps {
  readonly commands: Commands;
  readonly id: string;
}

/** A command in words; nothing when the app has none of that id. */
export function CommandButton({ commands, id }: CommandButtonProps) {
  const command = commands.get(id);
  const available = useReading(() => command?.available() ?? false);
  if (!command) return null;
  const key = command.keys[0];
  return (
    <button
      type="button"
      className="text-button"
      disabled={!available}
      title={key === undefined ? undefined : `${command.label} (${key})`}
      onClick={() => command.run()}
    >
      {command.label}
    </button>
  );
}

interface CommandRowProps {
  readonly commands: Commands;
  readonly ids: readonly string[];
}

/** Commands side by side. */
export function CommandRow({ commands, ids }: CommandRowProps) {
  return (
    <div className="card-actions">
      {ids.map((id) => (
        <CommandButton key={id} commands={commands} id={id} />
      ))}
    </div>
  );
}
