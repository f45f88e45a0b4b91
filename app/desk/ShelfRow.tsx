import { useRef, useState } from 'react';
import { flushSync } from 'react-dom';
import { Icon } from '../ui/Icon.tsx';
import { NameForm } from './NameForm.tsx';
import type { Shelf } from './shelf.ts';
import type { ShelfEntry } from './storage.ts';

interface ShelfRowProps {
  readonly entry: ShelfEntry;
  readonly isOpen: boolean;
  readonly shelf: Shelf;
  readonly onOpen: () => void;
  /** The row went away or has another name now: the focus needs a place. */
  readonly onGone: () => void;
}

/** One sketch on the shelf: its name opens it; rename, duplicate and remove stand beside it. */
export function ShelfRow({ entry, isOpen, shelf, onOpen, onGone }: ShelfRowProps) {
  const [renaming, setRenaming] = useState(false);
  const row = useRef<HTMLLIElement>(null);
  const { name, savedAt } = entry;

  if (renaming)
    return (
      <li className="shelf-row">
        <NameForm
          label={`New name for ${name}`}
          name={name}
          verb="Rename"
          onName={(next) => {
            setRenaming(false);
            void shelf.rename(name, next).then(onGone);
          }}
          onCancel={() => {
            flushSync(() => setRenaming(false));
            row.current?.querySelector('button')?.focus();
          }}
        />
      </li>
    );

  return (
    <li ref={row} className="shelf-row">
      <button type="button" className="text-button shelf-name" onClick={onOpen}>
        {name}
      </button>
      <span className="shelf-about">
        {isOpen ? 'open now, ' : ''}
        <time dateTime={savedAt}>{dayAndTime(savedAt)}</time>
      </span>
      <span className="shelf-do">
        <button
          type="button"
          className="icon-button"
          aria-label={`Rename ${name}`}
          onClick={() => setRenaming(true)}
        >
          <Icon name="rename" />
        </button>
        <button
          type="button"
          className="icon-button"
          aria-label={`Duplicate ${name}`}
          onClick={() => void shelf.duplicate(name)}
        >
          <Icon name="copy" />
        </button>
        <button
          type="button"
          className="icon-button"
          aria-label={`Remove ${name}`}
          onClick={() => void shelf.remove(name).then(onGone)}
        >
          <Icon name="remove" />
        </button>
      </span>
    </li>
  );
}

const style = new Intl.DateTimeFormat(undefined, { dateStyle: 'medium', timeStyle: 'short' });

function dayAndTime(savedAt: string): string {
  const date = new Date(savedAt);
  return Number.isNaN(date.getTime()) ? 'unknown date' : style.format(date);
}
