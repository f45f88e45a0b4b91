import { SaveMark } from '../desk/SaveMark.tsx';
import { useReading } from '../live/reading.ts';
import { CommandButton } from '../panels/CommandButton.tsx';
import { Scrubber } from '../panels/Scrubber.tsx';
import type { Commands } from '../panels/useCommand.ts';
import { setView } from '../store/viewStore.ts';
import { CommandIcon } from './CommandIcon.tsx';

interface BarProps {
  readonly commands: Commands;
}

/** The bar: title and history, the scrubber, and the ways in and out. */
export function Bar({ commands }: BarProps) {
  const title = useReading(({ sketch }) => sketch.title || 'Untitled');
  return (
    <header className="bar">
      <h1 className="bar-name">Gapwright</h1>
      <button
        type="button"
        className="text-button bar-title"
        title={`${title}: sketches on the shelf`}
        onClick={() => setView({ sheet: 'shelf' })}
      >
        <span className="bar-title-text">{title}</span>
        <span aria-hidden="true">▾</span>
      </button>
      <SaveMark />
      <span className="bar-history">
        <CommandIcon commands={commands} id="undo" icon="undo" />
        <CommandIcon commands={commands} id="redo" icon="redo" />
      </span>
      <div className="bar-middle">
        <Scrubber />
      </div>
      <span className="bar-end">
        <CommandButton commands={commands} id="open" word="Open" />
        <CommandButton commands={commands} id="save" word="Save" />
        <CommandButton commands={commands} id="copyLink" word="Share" />
        <CommandButton commands={commands} id="handOver" word="Hand over" className="main-button" />
        <CommandIcon commands={commands} id="theme" icon="theme" />
        <CommandIcon commands={commands} id="help" icon="help" />
      </span>
    </header>
  );
}
