import { useReading } from '../live/reading.ts';
import type { Command } from '../store/command.ts';

/** The app's commands by id. */
export type Commands = ReadonlyMap<string, Command>;

/** A command as a button shows it. */
interface CommandSeen {
  readonly label: string;
  readonly button: {
    readonly type: 'button';
    /** The label with the key that does the same. */
    readonly title: string;
    readonly disabled: boolean;
    readonly onClick: () => void;
  };
}

/** The command of that id with what its button needs, whatever stands on it; null when the app has none of that id. */
export function useCommand(commands: Commands, id: string): CommandSeen | null {
  const command = commands.get(id);
  const available = useReading(() => command?.available() ?? false);
  if (!command) return null;
  const { label, keys, run } = command;
  const [key] = keys;
  const title = key === undefined ? label : `${label} (${key})`;
  return { label, button: { type: 'button', title, disabled: !available, onClick: () => run() } };
}
