import type { ReactNode } from 'react';
import { useEffect, useRef, useState } from 'react';
import { useStore } from 'zustand';
import { sketchStore } from '../store/sketchStore.ts';
import { SheetDialog } from '../ui/SheetDialog.tsx';
import type { Desk } from './desk.ts';
import { deskStore } from './deskStore.ts';
import { NameForm } from './NameForm.tsx';
import { Notice } from './Notice.tsx';
import { ShelfRow } from './ShelfRow.tsx';
import type { Starter } from './starters.ts';
import type { Kept } from './storage.ts';
import './desk.css';

interface ShelfProps {
  readonly desk: Desk;
  /** The ways of the open sketch out of the browser. */
  readonly ways: ReactNode;
  readonly onClose: () => void;
}

/** The sketches kept in this browser, the starting sketches, and the other ways to begin. */
export function Shelf({ desk, ways, onClose }: ShelfProps) {
  useEffect(() => {
    void desk.shelf.look();
  }, [desk]);

  /** Closes once something was opened; what could not be opened is said and the shelf stays. */
  const closeAfter = async (opening: Promise<boolean>) => {
    if (await opening) onClose();
  };

  return (
    <SheetDialog title="Sketches" onClose={onClose}>
      <div className="shelf">
        <section aria-labelledby="shelf-present">
          <h3 id="shelf-present" className="desk-head">
            The open sketch
          </h3>
          <Present desk={desk} />
          <p className="shelf-ways">{ways}</p>
        </section>
        <section aria-labelledby="shelf-kept">
          <h3 id="shelf-kept" className="desk-head">
            On the shelf
          </h3>
          <Entries desk={desk} onOpen={(name) => void closeAfter(desk.shelf.open(name))} />
        </section>
        <section aria-labelledby="shelf-begin">
          <h3 id="shelf-begin" className="desk-head">
            Begin with
          </h3>
          <Starters desk={desk} onOpen={(starter) => void closeAfter(desk.openStarter(starter))} />
          <p className="shelf-begin">
            <button
              type="button"
              className="main-button"
              onClick={() => void closeAfter(desk.openNew().then(() => true))}
            >
              New empty sketch
            </button>
            <button type="button" className="text-button" onClick={() => void closeAfter(desk.openFile())}>
              Open a file…
            </button>
          </p>
        </section>
        <Notice inSheet />
      </div>
    </SheetDialog>
  );
}

function Present({ desk }: { readonly desk: Desk }) {
  const shelfName = useStore(deskStore, (state) => state.shelfName);
  const title = useStore(sketchStore, (doc) => doc.sketch.title);
  return (
    <NameForm
      key={shelfName ?? title}
      label="Name on the shelf"
      name={shelfName ?? title}
      verb="Keep on the shelf"
      onName={(name) => void desk.shelf.keepAs(name)}
    />
  );
}

interface EntriesProps {
  readonly desk: Desk;
  readonly onOpen: (name: string) => void;
}

function Entries({ desk, onOpen }: EntriesProps) {
  const shelf = useStore(deskStore, (state) => state.shelf);
  const openName = useStore(deskStore, (state) => state.shelfName);
  const place = useRef<HTMLDivElement>(null);
  if (shelf === null) return <p className="desk-quiet">Looking…</p>;
  if (!shelf.ok) return <p className="desk-bad">{shelf.why}</p>;
  return (
    <div ref={place} tabIndex={-1}>
      {shelf.value.length === 0 ? (
        <p className="desk-quiet">Nothing yet: give the open sketch a name above to keep it.</p>
      ) : (
        <ul className="shelf-list">
          {shelf.value.map((entry) => (
            <ShelfRow
              key={entry.name}
              entry={entry}
              isOpen={entry.name === openName}
              shelf={desk.shelf}
              onOpen={() => onOpen(entry.name)}
              onGone={() => place.current?.focus()}
            />
          ))}
        </ul>
      )}
    </div>
  );
}

interface StartersProps {
  readonly desk: Desk;
  readonly onOpen: (starter: Starter) => void;
}

function Starters({ desk, onOpen }: StartersProps) {
  const [list, setList] = useState<Kept<readonly Starter[]> | null>(null);
  useEffect(() => {
    let wanted = true;
    void desk.starters().then((found) => {
      if (wanted) setList(found);
    });
    return () => {
      wanted = false;
    };
  }, [desk]);

  if (list === null) return <p className="desk-quiet">Looking…</p>;
  if (!list.ok) return <p className="desk-bad">{list.why}</p>;
  return (
    <ul className="shelf-list">
      {list.value.map((starter) => (
        <li key={starter.file} className="shelf-row">
          <button type="button" className="text-button shelf-name" onClick={() => onOpen(starter)}>
            {starter.title}
          </button>
          <span className="shelf-about">{starter.summary}</span>
        </li>
      ))}
    </ul>
  );
}
