import { useId, useMemo, useState } from 'react';
import type { Edit, PartId, Prescription, Role, Sketch } from '../../../engine/index.ts';
import { faultsOf, insertPrescription, partName, readPrescription } from '../../../engine/index.ts';
import { useReading } from '../../live/reading.ts';
import { selectedParts } from '../../store/viewStore.ts';
import { SheetDialog } from '../../ui/SheetDialog.tsx';
import { PrescriptionTable } from './PrescriptionTable.tsx';
import '../desk.css';
import './prescription.css';

interface PasteSheetProps {
  /** What the sheet opens with. */
  readonly text: string;
  /** Makes the edit and selects what it added. */
  readonly insert: (edit: Edit) => void;
  readonly onClose: () => void;
}

/** A pasted table of surfaces, how each of its cells is read, and the way to put it on the axis as glass. */
export function PasteSheet({ text: firstText, insert, onClose }: PasteSheetProps) {
  const id = useId();
  const sketch = useReading((reading) => reading.sketch);
  const behind = useReading(({ view, ...reading }) =>
    placeBehind(reading.sketch, selectedParts(reading.sketch, view)),
  );
  const [text, setText] = useState(firstText);
  const [roles, setRoles] = useState<readonly Role[] | undefined>(undefined);
  const read = useMemo(() => readPrescription(text, roles), [text, roles]);
  const faults = useMemo(() => sentencesOf(read, sketch, behind), [read, sketch, behind]);
  const isReady = faults.length === 0;

  return (
    <SheetDialog title="Paste a prescription" onClose={onClose}>
      <form
        className="paste"
        onSubmit={(event) => {
          event.preventDefault();
          if (!isReady) return;
          insert((before) => insertPrescription(before, read, behind));
          onClose();
        }}
      >
        <label htmlFor={id} className="paste-lead">
          One surface a line: radius, thickness, and index or glass behind it, in mm. Abbe number, clear
          diameter and conic constant may follow; ∞ or flat is a plane.
        </label>
        <textarea
          id={id}
          className="paste-text"
          rows={9}
          spellCheck={false}
          // biome-ignore lint/a11y/noAutofocus: the sheet is there to paste into
          autoFocus
          value={text}
          placeholder={'50\t5\tN-BK7\n−50\t48'}
          aria-describedby={`${id}-says`}
          onChange={(event) => setText(event.target.value)}
        />
        <div id={`${id}-says`} aria-live="polite">
          {text.trim() !== '' && !isReady && (
            <ul className="desk-faults" aria-label="What cannot be read">
              {faults.map((sentence) => (
                <li key={sentence}>{sentence}</li>
              ))}
            </ul>
          )}
          {read.remarks.map((sentence) => (
            <p key={sentence} className="desk-quiet">
              {sentence}
            </p>
          ))}
        </div>
        {read.rows.length > 0 && (
          <PrescriptionTable read={read} onRole={(at, role) => setRoles(read.roles.with(at, role))} />
        )}
        <p className="paste-do">
          <button type="submit" className="main-button" disabled={!isReady}>
            {isReady ? `Insert ${partsWords(read)}` : 'Insert'}
          </button>
          <span className="desk-quiet">{whereWords(sketch, behind)}</span>
        </p>
      </form>
    </SheetDialog>
  );
}

/** Behind the last selected part, else behind all. */
const placeBehind = (sketch: Sketch, selected: readonly PartId[]): PartId | null =>
  selected.at(-1) ?? sketch.parts.at(-1)?.id ?? null;

const MOST_SENTENCES = 6;

/** Why the table does not become parts of this sketch. */
function sentencesOf(read: Prescription, sketch: Sketch, behind: PartId | null): readonly string[] {
  const own =
    read.faults.length > 0
      ? read.faults
      : faultsOf(insertPrescription(sketch, read, behind)).map(({ sentence }) => sentence);
  const sentences = [...new Set(own)];
  const left = sentences.length - MOST_SENTENCES;
  return left > 1
    ? [...sentences.slice(0, MOST_SENTENCES), `There are ${left} more cells that cannot be read.`]
    : sentences;
}

function partsWords({ parts }: Prescription): string {
  const glass = parts.filter(({ kind }) => kind === 'glass').length;
  const stops = parts.length - glass;
  const counted = (count: number, one: string) => `${count} ${one}${count === 1 ? '' : 's'}`;
  return counted(glass, 'glass part') + (stops > 0 ? ` and ${counted(stops, 'stop')}` : '');
}

function whereWords({ parts }: Sketch, behind: PartId | null): string {
  const at = parts.findIndex(({ id }) => id === behind);
  const part = parts[at];
  return part ? `behind ${partName(part, at)}` : 'into the empty sheet';
}
