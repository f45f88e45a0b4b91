import type { Commands } from '../panels/useCommand.ts';
import { useCommand } from '../panels/useCommand.ts';
import type { IconName } from '../ui/Icon.tsx';
import { Icon } from '../ui/Icon.tsx';

interface CommandIconProps {
  readonly commands: Commands;
  readonly id: string;
  readonly icon: IconName;
}

/** A command as a small icon, named by its label. */
export function CommandIcon({ commands, id, icon }: CommandIconProps) {
  const command = useCommand(commands, id);
  return (
    command && (
      <button {...command.button} className="icon-button" aria-label={command.label}>
        <Icon name={icon} />
      </button>
    )
  );
}
