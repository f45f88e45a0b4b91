import type { PartId, Quantity } from '../../../engine/index.ts';
import type { Reading } from '../../live/reading.ts';
import { useReading } from '../../live/reading.ts';
import { formatNumber, formatOutcome } from '../../ui/format.ts';
import { ledgerWords } from '../ledgerWords.ts';
import { indexIn } from './partReading.ts';

/** What arrives at the part and leaves it, and the work it does. */
export function LightThrough({ id }: { readonly id: PartId }) {
  const ledger = useReading((reading) => {
    const row = reading.analysis.ledger.find(({ partIndex }) => partIndex === indexIn(reading, id));
    return row ? ledgerWords(row, reading.view.unit) : '';
  });
  const work = useReading((reading) => workWords(reading, id));
  return (
    <>
      {ledger !== '' && <p className="card-line">{ledger}</p>}
      {work !== '' && <p className="card-line">{work}</p>}
    </>
  );
}

function workWords(reading: Reading, id: PartId): string {
  const row = reading.analysis.work.find(({ partIndex }) => partIndex === indexIn(reading, id));
  if (!row) return '';
  const fixed = (quantity: Quantity, digits: number) =>
    formatOutcome(quantity, (value) => formatNumber(value, digits));
  return `|f| / diameter ${fixed(row.fOverDiameter, 2)}; bends the marginal ray by ${fixed(row.bendMarginal, 4)}, the chief ray by ${fixed(row.bendChief, 4)} rad`;
}
