import type { PartId, Quantity } from '../../../engine/index.ts';
import { setSemiDiameter } from '../../../engine/index.ts';
import type { Reading } from '../../live/reading.ts';
import { currentReading, useReading, useReadingNow } from '../../live/reading.ts';
import { formatLength } from '../../ui/format.ts';
import { tryEdit } from '../edit.ts';
import { SketchNumber } from '../SketchNumber.tsx';
import { partIn } from './partReading.ts';

/** The clear diameter, open or given, and what the rays need. A free stop that is the aperture stop has none of its own. */
export function RimField({ id }: { readonly id: PartId }) {
  const isStopItself = useReadingNow(
    (reading) => reading.sketch.stop === id && partIn(reading, id)?.kind === 'stop',
  );
  if (isStopItself) return null;
  return (
    <SketchNumber
      label="Clear diameter"
      unit="length"
      read={(reading) => {
        const semi = partIn(reading, id)?.semiDiameterMm ?? null;
        return semi === null ? null : 2 * semi;
      }}
      edit={(value) => (sketch) => setSemiDiameter(sketch, id, value / 2)}
      empty={{ words: 'open', edit: (sketch) => setSemiDiameter(sketch, id, null) }}
      hint={<Needs id={id} />}
    />
  );
}

function Needs({ id }: { readonly id: PartId }) {
  const text = useReading((reading) => needsText(reading, id));
  const hasNeed = useReading((reading) => needOf(reading, id, 'neededMm') !== null);
  const take = () => {
    const need = needOf(currentReading(), id, 'neededMm');
    if (need !== null) tryEdit((sketch) => setSemiDiameter(sketch, id, need));
  };
  return (
    <>
      {text}{' '}
      {hasNeed && (
        <button type="button" className="card-link" onClick={take}>
          Take it
        </button>
      )}
    </>
  );
}

function needsText(reading: Reading, id: PartId): string {
  const { unit } = reading.view;
  const unvignetted = needOf(reading, id, 'unvignettedMm');
  const needed = needOf(reading, id, 'neededMm');
  if (unvignetted === null || needed === null) return `need unknown: ${absenceOf(reading, id)}`;
  const { vignetting } = reading.sketch.field;
  const all = `needs ${formatLength(2 * unvignetted, unit)} ${unit} for no vignetting`;
  if (vignetting === 0) return all;
  const lost = `${(vignetting * 100).toFixed(0)} %`;
  return `${all}, ${formatLength(2 * needed, unit)} ${unit} for the chosen ${lost}`;
}

/** The largest need over the part's surfaces, as a semi-diameter in mm; null when a ray is missing. */
function needOf(
  { analysis, sketch }: Reading,
  id: PartId,
  which: 'unvignettedMm' | 'neededMm',
): number | null {
  const needs = needsOn(analysis, sketch, id).map((need) => need[which]);
  if (needs.length === 0 || needs.some((need) => !need.ok)) return null;
  return Math.max(...needs.map((need) => (need.ok ? need.value : 0)));
}

function absenceOf({ analysis, sketch }: Reading, id: PartId): string {
  const absent = needsOn(analysis, sketch, id)
    .map(({ unvignettedMm }): Quantity => unvignettedMm)
    .find((need) => !need.ok);
  return absent && !absent.ok ? absent.why : 'no rays';
}

function needsOn({ train, clear }: Reading['analysis'], sketch: Reading['sketch'], id: PartId) {
  return clear.filter((_need, surface) => sketch.parts[train.partOf[surface] ?? -1]?.id === id);
}
