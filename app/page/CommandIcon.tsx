import type { ComponentProps } from 'react';
import { useReading } from '../live/reading.ts';
import type { Commands } from '../panels/CommandButton.tsx';
import { Icon } from '../ui/Icon.tsx';

interface CommandIconProps {
  readonly commands: Commands;
  readonly id: string;
  readonly icon: ComponentProps<typeof Icon>['name'];
}

/** A command as a small icon, named by its label. */
export function CommandIcon({ commands, id, icon }: CommandIconProps) {
  const command = commands.get(id);
  const available = useReading(() => command?.available() ?? false);
  if (!command) return null;
  const key = command.keys[0];
  return (
    <button
      type="button"
      className="icon-button"
      aria-label={command.label}
      title={key ? `${command.label} (${key})` : command.label}
      disabled={!available}
      onClick={command.run}
    >
      <Icon name={icon} />
    </button>
  );
}

interface CommandWordProps {
  readonly commands: Commands;
  readonly id: string;
  readonly word: string;
  readonly strong?: boolean;
}

/** A command in the bar as one word; its whole label is the tooltip. */
export function CommandWord({ commands, id, word, strong = false }: CommandWordProps) {
  const command = commands.get(id);
  if (!command) return null;
  const key = command.keys[0];
  return (
    <button
      type="button"
      className={strong ? 'main-button' : 'text-button'}
      title={key ? `${command.label} (${key})` : command.label}
      onClick={command.run}
    >
      {word}
    </button>
  );
}
