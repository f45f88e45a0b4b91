import type { PartId } from '../../../engine/index.ts';
import { moveParts, placesOf, setGap, valueAt } from '../../../engine/index.ts';
import { useReadingNow } from '../../live/reading.ts';
import { gapPerPosition } from '../perPosition.ts';
import { SketchNumber } from '../SketchNumber.tsx';
import { ImageDistanceField } from '../sketch/ImageDistanceField.tsx';
import { MediumFields } from '../sketch/MediumFields.tsx';
import { ObjectDistanceField } from '../sketch/ObjectDistanceField.tsx';
import { indexIn, partIn } from './partReading.ts';

/** Where the part stands: from the first part, and the spaces on both sides. */
export function PlaceFields({ id }: { readonly id: PartId }) {
  const inFront = useReadingNow(({ sketch }) => {
    const index = sketch.parts.findIndex((part) => part.id === id);
    return sketch.parts[index - 1]?.id ?? null;
  });
  const isLast = useReadingNow(({ sketch }) => sketch.parts.at(-1)?.id === id);
  return (
    <>
      {inFront !== null && <FromFirstField id={id} />}
      {inFront === null ? <ObjectDistanceField /> : <GapField label="Gap in front" partId={inFront} />}
      {isLast ? <ImageDistanceField behind={id} /> : <GapField label="Gap behind" partId={id} />}
      <MediumFields label="Medium behind" where={id} />
    </>
  );
}

/** Moving a part keeps its neighbours where they are; by the other rule what is behind moves along. */
function FromFirstField({ id }: { readonly id: PartId }) {
  return (
    <SketchNumber
      label="From first part"
      unit="length"
      read={(reading) => reading.analysis.places.parts[indexIn(reading, id)]?.frontMm ?? null}
      title="Enter moves this part alone; Shift+Enter moves what is behind along"
      edit={(value, { setting }, other) =>
        (sketch) => {
          const index = sketch.parts.findIndex((part) => part.id === id);
          const presentMm = placesOf(sketch, setting).parts[index]?.frontMm ?? value;
          return moveParts(sketch, [id], value - presentMm, setting.at, other ? 'carry' : 'neighbours');
        }}
    />
  );
}

/** Typing a gap changes that number alone: what is behind moves along. By the other rule only the next part moves. */
function GapField({ label, partId }: { readonly label: string; readonly partId: PartId }) {
  return (
    <SketchNumber
      label={label}
      unit="length"
      read={(reading) => {
        const part = partIn(reading, partId);
        return part ? valueAt(part.space.lengthMm, reading.sketch.positions, reading.setting) : null;
      }}
      title="Enter moves what is behind along; Shift+Enter moves the next part alone"
      edit={(value, { setting }, other) =>
        (sketch) =>
          setGap(sketch, partId, value, setting.at, other ? 'neighbours' : 'carry')
        }
      perPosition={gapPerPosition(partId)}
    />
  );
}
