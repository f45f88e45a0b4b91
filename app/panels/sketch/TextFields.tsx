import { setNotes, setTitle } from '../../../engine/index.ts';
import { useReadingNow } from '../../live/reading.ts';
import { TextField } from '../../ui/TextField.tsx';
import { tryEdit } from '../edit.ts';

/** Title and notes of the sketch. */
export function TextFields() {
  const title = useReadingNow(({ sketch }) => sketch.title);
  const notes = useReadingNow(({ sketch }) => sketch.notes);
  return (
    <>
      <TextField
        label="Title"
        value={title}
        onCommit={(text) => tryEdit((sketch) => setTitle(sketch, text.trim()))}
      />
      <TextField
        label="Notes"
        value={notes}
        multiline
        onCommit={(text) => tryEdit((sketch) => setNotes(sketch, text))}
      />
    </>
  );
}
