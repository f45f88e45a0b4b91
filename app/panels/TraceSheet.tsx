import { sentenceOf } from '../../engine/index.ts';
import type { Reading } from '../live/reading.ts';
import { currentReading, useReading } from '../live/reading.ts';
import { Icon } from '../ui/Icon.tsx';
import type { Readout } from './readouts/readout.ts';
import { readoutById } from './readouts/table.ts';
import { readoutText } from './readouts/words.ts';
import type { Worksheet } from './worksheet.ts';
import { cellText, rowUnit, worksheetOf, worksheetTsv } from './worksheet.ts';
import './tables.css';

interface TraceSheetProps {
  /** Takes the sheet as tab-separated text to the clipboard. */
  readonly onCopy: (text: string) => void;
}

/** The working of a readout: the y–nu worksheet of the marginal and the chief ray, quantities as rows, surfaces as columns. */
export function TraceSheet({ onCopy }: TraceSheetProps) {
  const id = useReading(({ view }) => view.topic);
  const fractions = useReading(({ sketch }) => sketch.field.fractions);
  const readout = readoutById(id, fractions);
  const copy = () => onCopy(worksheetTsv(sheetOf(currentReading())));
  return (
    <section className="panel-table" aria-label="Trace sheet">
      <div className="panel-table-head">
        <h2 className="panel-title">{readout.label}</h2>
        <ReadoutLine readout={readout} />
        <button type="button" className="text-button" onClick={copy}>
          <Icon name="copy" /> Copy
        </button>
      </div>
      <p className="panel-table-note">
        {readout.formula}. <Particulars readout={readout} />
      </p>
      <Sheet />
    </section>
  );
}

function ReadoutLine({ readout }: { readonly readout: Readout }) {
  const text = useReading((reading) => {
    const outcome = readout.read(reading.analysis);
    const words = readoutText(readout, reading);
    return outcome.ok ? words : `${words}. ${sentenceOf(outcome.why)}`;
  });
  return <span className="panel-table-value">{text}</span>;
}

function Particulars({ readout }: { readonly readout: Readout }) {
  return useReading((reading) => readout.particulars?.(reading) ?? '');
}

function Sheet() {
  const heads = useReading((reading) => headsOf(reading).join(SEPARATOR)).split(SEPARATOR);
  const rows = useReading((reading) => sheetOf(reading).rows.length);
  return (
    // biome-ignore lint/a11y/noNoninteractiveTabindex: a wide sheet scrolls, also by keys
    <section className="panel-table-scroll" tabIndex={0} aria-label="Worksheet">
      <table>
        <caption className="visually-hidden">
          Marginal ray y and nu, chief ray ȳ and nū, surface by surface
        </caption>
        <thead>
          <tr>
            <th scope="col">
              <span className="visually-hidden">quantity</span>
            </th>
            {heads.map((head, index) => (
              // biome-ignore lint/suspicious/noArrayIndexKey: a column is its place along the axis
              <th key={index} scope="col" title={head}>
                {head}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {Array.from({ length: rows }, (_, index) => (
            // biome-ignore lint/suspicious/noArrayIndexKey: the rows are fixed
            <SheetRow key={index} index={index} />
          ))}
        </tbody>
      </table>
    </section>
  );
}

const SEPARATOR = '\u0000';

const remembered = new WeakMap<Reading['analysis'], Worksheet>();

/** One worksheet serves all rows of a frame. */
function sheetOf({ sketch, analysis }: Reading): Worksheet {
  const sheet = remembered.get(analysis) ?? worksheetOf(sketch, analysis);
  remembered.set(analysis, sheet);
  return sheet;
}

const headsOf = (reading: Reading): readonly string[] => sheetOf(reading).columns;

function SheetRow({ index }: { readonly index: number }) {
  const texts = useReading((reading) => rowTexts(reading, index).join(SEPARATOR)).split(SEPARATOR);
  const [label = '', unit = '', ...cells] = texts;
  return (
    <tr>
      <th scope="row">
        {label} {unit !== '' && <span className="panel-table-unit">{unit}</span>}
      </th>
      {cells.map((cell, place) => (
        // biome-ignore lint/suspicious/noArrayIndexKey: a cell is its place along the axis
        <td key={place}>{cell}</td>
      ))}
    </tr>
  );
}

function rowTexts(reading: Reading, index: number): readonly string[] {
  const { view } = reading;
  const row = sheetOf(reading).rows[index];
  if (!row) return [];
  return [row.label, rowUnit(row, view.unit), ...row.cells.map((cell) => cellText(cell, row, view.unit))];
}
