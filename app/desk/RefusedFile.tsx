import { useStore } from 'zustand';
import { SheetDialog } from '../ui/SheetDialog.tsx';
import { deskStore, dismissRefused } from './deskStore.ts';
import { faultSentences } from './faultsText.ts';
import './desk.css';

/** What is wrong with a sketch that was not opened. Renders nothing when there is none. */
export function RefusedFile() {
  const refused = useStore(deskStore, (state) => state.refused);
  if (!refused) return null;
  return (
    <SheetDialog title={`“${refused.name}” cannot be opened`} onClose={dismissRefused}>
      <ul className="desk-faults">
        {faultSentences(refused.faults).map((sentence) => (
          <li key={sentence}>{sentence}</li>
        ))}
      </ul>
      <p className="desk-quiet">The sketch that was open is still open, as it was.</p>
      <button type="button" className="main-button" onClick={dismissRefused}>
        Close
      </button>
    </SheetDialog>
  );
}
