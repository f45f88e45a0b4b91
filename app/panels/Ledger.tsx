import type { LedgerRow, LengthUnit, PartId, Quantity } from '../../engine/index.ts';
import type { Reading } from '../live/reading.ts';
import { useReading, useReadingNow } from '../live/reading.ts';
import { select, setView } from '../store/viewStore.ts';
import { Checkbox } from '../ui/choices.tsx';
import { formatLength, formatNumber, formatOutcome } from '../ui/format.ts';
import { partName } from './names.ts';
import './tables.css';

/** Object and image of every part in turn, real or virtual, with the magnification so far. */
export function Ledger() {
  const ids = useReading(ledgerIds);
  const unit = useReading(({ view }) => view.unit);
  return (
    <section className="panel-table" aria-label="Ledger">
      <RealIsPositive />
      <div className="panel-table-scroll">
        <table>
          <caption className="visually-hidden">Object and image of every part in turn</caption>
          <thead>
            <tr>
              <th scope="col">part</th>
              <th scope="col">object, {unit}</th>
              <th scope="col" className="panel-table-words">
                object is
              </th>
              <th scope="col">image, {unit}</th>
              <th scope="col" className="panel-table-words">
                image is
              </th>
              <th scope="col">magnification</th>
              <th scope="col">so far</th>
            </tr>
          </thead>
          <tbody>
            {ids === '' ? (
              <tr>
                <td colSpan={7} className="panel-table-none">
                  Nothing on the axis forms an image yet.
                </td>
              </tr>
            ) : (
              ids.split(SEPARATOR).map((id) => <Row key={id} id={id as PartId} />)
            )}
          </tbody>
        </table>
      </div>
    </section>
  );
}

const SEPARATOR = '\u0000';

const ledgerIds = ({ analysis, sketch }: Reading): string =>
  analysis.ledger.map(({ partIndex }) => sketch.parts[partIndex]?.id ?? '').join(SEPARATOR);

function RealIsPositive() {
  const checked = useReadingNow(({ view }) => view.realIsPositive);
  return (
    <Checkbox
      label="Distances positive when real"
      checked={checked}
      onChange={(realIsPositive) => setView({ realIsPositive })}
    />
  );
}

function Row({ id }: { readonly id: PartId }) {
  const name = useReading(({ sketch }) => partName(sketch, id));
  const chosen = useReading(({ view }) => view.selection.includes(id));
  const cells = useReading((reading) => cellsOf(reading, id).join(SEPARATOR)).split(SEPARATOR);
  return (
    <tr className={chosen ? 'panel-table-chosen' : undefined} onClick={() => select(id)}>
      <th scope="row">
        <button type="button" className="panel-table-part" aria-pressed={chosen} title={name}>
          {name}
        </button>
      </th>
      {COLUMNS.map((column, index) => (
        <td key={column} className={column.endsWith('Is') ? 'panel-table-words' : undefined}>
          {cells[index]}
        </td>
      ))}
    </tr>
  );
}

const COLUMNS = ['object', 'objectIs', 'image', 'imageIs', 'local', 'running'] as const;

function cellsOf({ analysis, sketch, view }: Reading, id: PartId): readonly string[] {
  const row = analysis.ledger.find(({ partIndex }) => sketch.parts[partIndex]?.id === id);
  return row ? ledgerCells(row, view.unit, view.realIsPositive) : COLUMNS.map(() => '');
}

/** The cells of one line: object distance and kind, image distance and kind, local and running magnification. */
export function ledgerCells(row: LedgerRow, unit: LengthUnit, realIsPositive: boolean): readonly string[] {
  const { objectDistanceMm, imageDistanceMm } = realIsPositive ? row.realIsPositive : row;
  const length = (quantity: Quantity) => (quantity.ok ? formatLength(quantity.value, unit) : '∞');
  const ratio = (quantity: Quantity) => formatOutcome(quantity, (value) => formatNumber(value, 4));
  return [
    length(objectDistanceMm),
    row.objectIs,
    length(imageDistanceMm),
    row.imageIs,
    ratio(row.magnification),
    ratio(row.runningMagnification),
  ];
}
