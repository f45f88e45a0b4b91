import type { LengthUnit, Sketch, WarningKind } from '../../engine/index.ts';
import { settingAt } from '../../engine/index.ts';
import { currentReading, useReading } from '../live/reading.ts';
import { select, setView } from '../store/viewStore.ts';
import type { ListedWarning } from './warningList.ts';
import { listWarnings } from './warningList.ts';
import './warnings.css';

interface WarningsProps {
  /** Whether they have a heading; where they stand in a sheet, that has one. */
  readonly titled?: boolean;
}

/** What cannot be built and what should be looked at, over all positions; a press selects it and goes to its position. */
export function Warnings({ titled = true }: WarningsProps) {
  const key = useReading(({ sketch, view }) =>
    listWarnings(sketch)
      .map((listed) => textOf(sketch, listed, view.unit))
      .join('\n'),
  );
  const {
    sketch,
    view: { unit },
  } = currentReading();
  const list = key === '' ? [] : listWarnings(sketch);
  return (
    <section className="panel warnings" aria-label="Warnings">
      {titled && <h2 className="panel-title">Warnings</h2>}
      {list.length === 0 ? (
        <p className="warnings-none">none</p>
      ) : (
        <ul>
          {list.map((listed) => (
            <li key={textOf(sketch, listed, unit)}>
              <button type="button" className="warnings-item" onClick={() => goTo(listed)}>
                <span
                  className={listed.warning.severity === 'cannot be built' ? 'warnings-bad' : 'warnings-look'}
                >
                  {listed.warning.severity === 'cannot be built' ? '✗ cannot be built' : 'look at this'}
                </span>
                <span>{listed.warning.sentence(unit)}</span>
                <span className="warnings-where">{whereText(sketch, listed)}</span>
              </button>
            </li>
          ))}
        </ul>
      )}
    </section>
  );
}

const textOf = (sketch: Sketch, listed: ListedWarning, unit: LengthUnit): string =>
  `${listed.warning.severity} ${listed.warning.sentence(unit)} ${whereText(sketch, listed)}`;

/** At which positions; nothing when it is all of them. */
function whereText(sketch: Sketch, { positionIds }: ListedWarning): string {
  if (positionIds.length === sketch.positions.length) return '';
  const names = sketch.positions.filter(({ id }) => positionIds.includes(id)).map(({ name }) => name);
  return `at ${names.join(', ')}`;
}

function goTo({ warning, positionIds }: ListedWarning): void {
  const { setting } = currentReading();
  const first = positionIds[0];
  const isHere = setting.toNext === 0 && positionIds.includes(setting.at);
  if (!isHere && first !== undefined) setView({ setting: settingAt(first) });
  if (warning.partId !== null) select(warning.partId);
  else if (ABOUT_THE_IMAGE.includes(warning.kind)) select('image');
  else select();
}

/** A warning without a part is about the image's end, or about aperture and field, which the sketch's card sets. */
const ABOUT_THE_IMAGE: readonly WarningKind[] = ['sensor not covered', 'out of focus', 'image inside'];
