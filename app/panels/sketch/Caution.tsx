import { cautionOf } from '../../../engine/index.ts';
import { useReading } from '../../live/reading.ts';

/** The caution about collimated light, beside the object that may send it; nothing for all other layouts. */
export function Caution() {
  const caution = useReading(({ sketch }) => cautionOf(sketch));
  return caution === null ? null : <p className="card-line">{caution}</p>;
}
