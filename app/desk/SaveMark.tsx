import { useStore } from 'zustand';
import { deskStore } from './deskStore.ts';
import './desk.css';

/** Stands beside the title: whether the sketch is kept in this browser, and if not, why. */
export function SaveMark() {
  const save = useStore(deskStore, (state) => state.save);
  const why = typeof save === 'string' ? null : save.notSaved;
  return (
    <span className={why ? 'save-mark save-mark-failed' : 'save-mark'} role="status" title={why ?? undefined}>
      {why ? `not saved: ${why}` : save === 'saved' ? 'saved' : 'saving'}
    </span>
  );
}
