import type { Reading } from '../live/reading.ts';
import { useReading } from '../live/reading.ts';
import { setView } from '../store/viewStore.ts';
import { Icon } from '../ui/Icon.tsx';
import { quantityText, quantityUnit } from './quantity.ts';
import { readoutById } from './readouts/table.ts';
import { countWarnings } from './warningList.ts';
import './summaryStrip.css';

interface SummaryStripProps {
  /** What a press on the count does; it opens the warnings unless said otherwise. */
  readonly onWarnings?: () => void;
}

/** The four things always in view: focal length or angular magnification, magnification, defocus, the count of warnings. */
export function SummaryStrip({ onWarnings = () => setView({ panel: 'warnings' }) }: SummaryStripProps) {
  const afocal = useReading(({ analysis }) => analysis.firstOrder.afocal);
  return (
    <div className="strip">
      <dl className="strip-list">
        <StripItem
          key={String(afocal)}
          label={afocal ? 'angular' : 'f'}
          name={afocal ? 'Angular magnification' : 'Focal length'}
          id={afocal ? 'afocalMagnification' : 'focalLength'}
        />
        <StripItem label="m" name="Magnification" id="magnification" />
        <StripItem label="defocus" name="Defocus" id="defocus" />
      </dl>
      <WarningCount onPress={onWarnings} />
    </div>
  );
}

interface StripItemProps {
  readonly label: string;
  readonly name: string;
  readonly id: string;
}

function StripItem({ label, name, id }: StripItemProps) {
  const text = useReading((reading) => stripText(id, reading));
  return (
    <div className="strip-item">
      <dt title={name}>{label}</dt>
      <dd>{text}</dd>
    </div>
  );
}

function stripText(id: string, { analysis, view }: Reading): string {
  const { read, kind, digits } = readoutById(id, []);
  const outcome = read(analysis);
  if (!outcome.ok) return outcome.why;
  const unit = quantityUnit(kind, view.unit);
  return `${quantityText(outcome.value, kind, digits, view.unit)}${unit === '×' ? '' : ` ${unit}`}`;
}

function WarningCount({ onPress }: { readonly onPress: () => void }) {
  const count = useReading(({ sketch }) => countWarnings(sketch));
  const words = count === 0 ? 'no warnings' : count === 1 ? '1 warning' : `${count} warnings`;
  return (
    <button
      type="button"
      className={count === 0 ? 'strip-count' : 'strip-count strip-count-some'}
      onClick={onPress}
    >
      {count > 0 && <Icon name="warning" size={14} />}
      {words}
    </button>
  );
}
