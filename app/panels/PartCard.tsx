import type { PartId } from '../../engine/index.ts';
import { useReadingNow } from '../live/reading.ts';
import { selectedParts } from '../store/viewStore.ts';
import { OnePart } from './part/OnePart.tsx';
import { SeveralParts } from './part/SeveralParts.tsx';
import { FieldFields } from './sketch/FieldFields.tsx';
import { MediumFields } from './sketch/MediumFields.tsx';
import { ObjectDistanceField } from './sketch/ObjectDistanceField.tsx';
import { SensorFields } from './sketch/SensorFields.tsx';
import type { Commands } from './useCommand.ts';
import './card.css';
import './readouts.css';

/** No id holds it, whatever a file says. */
const SEPARATOR = '\u0000';

interface PartCardProps {
  readonly commands: Commands;
}

/** What is selected: one part, several, the object or the image; nothing when nothing is. */
export function PartCard({ commands }: PartCardProps) {
  const ids = useReadingNow(({ sketch, view }) => selectedParts(sketch, view).join(SEPARATOR));
  const end = useReadingNow(({ view }) =>
    view.selection.find((selected) => selected === 'object' || selected === 'image'),
  );
  const parts = ids === '' ? [] : (ids.split(SEPARATOR) as PartId[]);
  const [first] = parts;
  if (first === undefined && end === undefined) return null;
  return (
    <section className="panel" aria-label="Selected">
      {first === undefined ? (
        <EndCard end={end === 'image' ? 'image' : 'object'} />
      ) : parts.length === 1 ? (
        <OnePart key={first} id={first} commands={commands} />
      ) : (
        <SeveralParts key={ids} ids={parts} commands={commands} />
      )}
    </section>
  );
}

function EndCard({ end }: { readonly end: 'object' | 'image' }) {
  return (
    <>
      <h2 className="panel-title">{end === 'object' ? 'Object' : 'Image and sensor'}</h2>
      {end === 'object' ? (
        <>
          <ObjectDistanceField />
          <MediumFields label="Medium" where="object" />
          <FieldFields />
        </>
      ) : (
        <SensorFields />
      )}
    </>
  );
}
