import type { PartId } from '../../../engine/index.ts';
import { setAbbeNumber, setIndex, setRoom } from '../../../engine/index.ts';
import { useReadingNow } from '../../live/reading.ts';
import { formatNumber } from '../../ui/format.ts';
import { SketchNumber } from '../SketchNumber.tsx';
import { readThin } from './partReading.ts';

/** What is assumed of the glass that a thin part will become, and the room kept for it. */
export function GlassFields({ id }: { readonly id: PartId }) {
  const assumed = useReadingNow(({ sketch }) => formatNumber(sketch.assumedIndex, 4));
  return (
    <>
      <SketchNumber
        label="Abbe number"
        unit=""
        digits={2}
        step={1}
        read={readThin(id, (part) => part.abbeNumber)}
        edit={(value) => (sketch) => setAbbeNumber(sketch, id, value)}
        empty={{ words: 'unknown', edit: (sketch) => setAbbeNumber(sketch, id, null) }}
      />
      <SketchNumber
        label="Assumed index"
        unit=""
        digits={4}
        step={0.01}
        read={readThin(id, (part) => part.index)}
        edit={(value) => (sketch) => setIndex(sketch, id, value)}
        empty={{ words: assumed, edit: (sketch) => setIndex(sketch, id, null) }}
      />
      <SketchNumber
        label="Room in front"
        unit="length"
        read={readThin(id, (part) => part.roomFrontMm)}
        edit={(value) => (sketch) => setRoom(sketch, id, 'front', value)}
      />
      <SketchNumber
        label="Room behind"
        unit="length"
        read={readThin(id, (part) => part.roomBehindMm)}
        edit={(value) => (sketch) => setRoom(sketch, id, 'behind', value)}
      />
    </>
  );
}
