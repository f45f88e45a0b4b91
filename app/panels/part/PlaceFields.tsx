import type { PartId } from '../../../engine/index.ts';
import { fixSensor, moveParts, placesOf, setGap, valueAt } from '../../../engine/index.ts';
import { useReading } from '../../live/reading.ts';
import { gapPerPosition } from '../perPosition.ts';
import { orWhy, SketchNumber } from '../SketchNumber.tsx';
import { MediumFields } from '../sketch/MediumFields.tsx';
import { ObjectDistanceField } from '../sketch/ObjectDistanceField.tsx';
import { indexIn, partIn } from './partReading.ts';

/** Where the part stands: from the first part, and the spaces on both sides. */
export function PlaceFields({ id }: { readonly id: PartId }) {
  const inFront = useReading(({ sketch }) => {
    const index = sketch.parts.findIndex((part) => part.id === id);
    return sketch.parts[index - 1]?.id ?? null;
  });
  const isLast = useReading(({ sketch }) => sketch.parts.at(-1)?.id === id);
  return (
    <>
      {inFront !== null && <FromFirstField id={id} />}
      {inFront === null ? <ObjectDistanceField /> : <GapField label="Gap in front" partId={inFront} />}
      {isLast ? <ImageGapField id={id} /> : <GapField label="Gap behind" partId={id} />}
      <MediumFields label="Medium behind" where={id} />
    </>
  );
}

/** Moving a part keeps its neighbours where they are. */
function FromFirstField({ id }: { readonly id: PartId }) {
  return (
    <SketchNumber
      label="From first part"
      unit="length"
      read={(reading) => reading.analysis.places.parts[indexIn(reading, id)]?.frontMm ?? null}
      edit={(value, { setting }) =>
        (sketch) => {
          const index = sketch.parts.findIndex((part) => part.id === id);
          const presentMm = placesOf(sketch, setting).parts[index]?.frontMm ?? value;
          return moveParts(sketch, [id], value - presentMm, setting.at, 'neighbours');
        }}
    />
  );
}

/** Typing a gap changes that number alone: what is behind moves along. */
function GapField({ label, partId }: { readonly label: string; readonly partId: PartId }) {
  return (
    <SketchNumber
      label={label}
      unit="length"
      read={(reading) => {
        const part = partIn(reading, partId);
        return part ? valueAt(part.space.lengthMm, reading.sketch.positions, reading.setting) : null;
      }}
      edit={(value, { setting }) =>
        (sketch) =>
          setGap(sketch, partId, value, setting.at, 'carry')
        }
      perPosition={gapPerPosition(partId)}
    />
  );
}

/** Behind the last part stands the image plane; typing its distance fixes the sensor there. */
function ImageGapField({ id }: { readonly id: PartId }) {
  const follows = useReading(({ sketch }) => sketch.image === 'focus');
  return (
    <SketchNumber
      label={follows ? 'Image behind' : 'Sensor behind'}
      unit="length"
      read={({ analysis }) => orWhy(analysis.conjugates.imagePlaneMm)}
      edit={(value, { setting }) =>
        (sketch) =>
          fixSensor(sketch, value, setting.at)
        }
      hint={follows ? 'follows the focus; typing fixes the sensor' : undefined}
      {...(!follows && { perPosition: gapPerPosition(id) })}
    />
  );
}
