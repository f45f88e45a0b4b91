import type { Reading } from '../live/reading.ts';
import { useReading } from '../live/reading.ts';
import { setView } from '../store/viewStore.ts';
import { Icon } from '../ui/Icon.tsx';
import { readoutById } from './readouts/table.ts';
import { readoutText } from './readouts/words.ts';
import { countWarnings } from './warningList.ts';
import './summaryStrip.css';

interface SummaryStripProps {
  /** What a press on the count does; it opens the warnings unless said otherwise. */
  readonly onWarnings?: () => void;
}

/** The four things always in view: focal length or angular magnification, magnification, defocus, the count of warnings. */
export function SummaryStrip({ onWarnings = () => setView({ panel: 'warnings' }) }: SummaryStripProps) {
  const leads = useReading(leadingReadout);
  return (
    <div className="strip">
      {leads === null ? (
        <span className="strip-none">nothing on the axis yet</span>
      ) : (
        <dl className="strip-list">
          <StripItem key={leads} label={leads === 'focalLength' ? 'f' : 'angular'} id={leads} />
          <StripItem label="m" id="magnification" />
          <StripItem label="defocus" id="defocus" />
        </dl>
      )}
      <WarningCount onPress={onWarnings} />
    </div>
  );
}

/** An afocal layout has an angular magnification in place of a focal length; an empty one has neither. */
function leadingReadout({ analysis, sketch }: Reading): 'focalLength' | 'afocalMagnification' | null {
  if (sketch.parts.length === 0) return null;
  return analysis.firstOrder.afocal ? 'afocalMagnification' : 'focalLength';
}

interface StripItemProps {
  readonly label: string;
  readonly id: string;
}

function StripItem({ label, id }: StripItemProps) {
  const text = useReading((reading) => stripText(id, reading));
  const isAbsent = useReading(({ analysis }) => !readoutById(id, []).read(analysis).ok);
  return (
    <div className="strip-item">
      <dt title={readoutById(id, []).label}>{label}</dt>
      <dd className={isAbsent ? 'strip-absent' : undefined}>{text}</dd>
    </div>
  );
}

/** The sign of a ratio goes without saying beside "m". */
const stripText = (id: string, reading: Reading): string =>
  readoutText(readoutById(id, []), reading).replace(/ ×$/, '');

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
