import type { Commands } from './useCommand.ts';
import { useCommand } from './useCommand.ts';
import './card.css';

interface CommandButtonProps {
  readonly commands: Commands;
  readonly id: string;
  /** Stands on the button where the place already says what the command acts on. */
  readonly word: string;
  readonly className?: string;
}

/** A command in a word, its whole label in the tooltip; nothing when the app has none of that id. */
export function CommandButton({ commands, id, word, className = 'text-button' }: CommandButtonProps) {
  const command = useCommand(commands, id);
  return (
    command && (
      <button {...command.button} className={className}>
        {word}
      </button>
    )
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
