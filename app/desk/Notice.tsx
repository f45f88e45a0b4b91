import { useEffect, useId } from 'react';
import { useStore } from 'zustand';
import type { Note } from '../../engine/index.ts';
import { dismissNote, sketchStore } from '../store/sketchStore.ts';
import { viewStore } from '../store/viewStore.ts';
import { Icon } from '../ui/Icon.tsx';
import { faultsLine } from './faultsText.ts';
import type { NoticeBox } from './notices.ts';
import { dismissNotice, noticeStore } from './notices.ts';
import './desk.css';

/** What went well leaves by itself; errors and offers stay. */
const STAY_MS = 8000;

/**
 * The one quiet place for messages: the newest notice, and above it why the last edit was refused. It never takes the
 * focus. A modal sheet shows its own, since what lies behind it is out of reach.
 */
export function Notice({ inSheet = false }: { readonly inSheet?: boolean }) {
  const covered = useStore(viewStore, ({ sheet }) => !inSheet && (sheet === 'shelf' || sheet === 'handOver'));
  const notice = useStore(noticeStore, (state) => (covered ? null : state.notice));
  const note = useStore(sketchStore, (doc) => (covered ? null : doc.note));
  const leaves = notice !== null && !notice.urgent && notice.action === null;
  const id = notice?.id;

  useEffect(() => {
    if (!leaves) return;
    const timer = setTimeout(() => dismissNotice(id), STAY_MS);
    return () => clearTimeout(timer);
  }, [leaves, id]);

  return (
    <section className="notice" aria-label="Messages">
      <NoteLine note={note} />
      <div className={notice ? 'notice-line' : undefined}>
        <div role="status">{notice && !notice.urgent && <p className="notice-text">{notice.text}</p>}</div>
        <div role="alert">{notice?.urgent && <p className="notice-text notice-urgent">{notice.text}</p>}</div>
        {notice && (
          <div className="notice-do">
            {notice.action && (
              <button
                type="button"
                className="text-button"
                onClick={() => {
                  dismissNotice(notice.id);
                  notice.action?.run();
                }}
              >
                {notice.action.label}
              </button>
            )}
            <Dismiss onClick={() => dismissNotice(notice.id)} />
          </div>
        )}
        {notice?.box && <Box key={notice.id} box={notice.box} />}
      </div>
    </section>
  );
}

function NoteLine({ note }: { readonly note: Note | null }) {
  return (
    <div className={note ? 'notice-line' : undefined}>
      <div role="status">
        {note && <p className="notice-text notice-urgent">{faultsLine(note.faults)}</p>}
      </div>
      {note && (
        <div className="notice-do">
          <Dismiss onClick={dismissNote} />
        </div>
      )}
    </div>
  );
}

function Dismiss({ onClick }: { readonly onClick: () => void }) {
  return (
    <button type="button" className="icon-button" aria-label="Dismiss the message" onClick={onClick}>
      <Icon name="close" />
    </button>
  );
}

function Box({ box }: { readonly box: NoticeBox }) {
  const id = useId();
  return (
    <div className="notice-box">
      <label htmlFor={id}>{box.kind === 'copy' ? 'Text to copy' : 'Paste here'}</label>
      {box.kind === 'copy' ? (
        <textarea id={id} readOnly rows={4} value={box.text} onFocus={(event) => event.target.select()} />
      ) : (
        <textarea
          id={id}
          rows={2}
          value=""
          onChange={(event) => {
            dismissNotice();
            box.take(event.target.value);
          }}
        />
      )}
    </div>
  );
}
