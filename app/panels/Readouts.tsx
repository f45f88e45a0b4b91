import type { KeyboardEvent } from 'react';
import { memo, useId } from 'react';
import { sentenceOf } from '../../engine/index.ts';
import { useReading } from '../live/reading.ts';
import { setView } from '../store/viewStore.ts';
import { Group } from '../ui/Group.tsx';
import { Icon } from '../ui/Icon.tsx';
import { useFolding } from './folding.ts';
import { settingName } from './names.ts';
import { quantityText, quantityUnit } from './quantity.ts';
import type { Readout, ReadoutGroup } from './readouts/readout.ts';
import { READOUT_GROUPS } from './readouts/readout.ts';
import { readoutById, readoutsIn } from './readouts/table.ts';
import { UnitToggle } from './UnitToggle.tsx';
import './readouts.css';

/** Everything first order about the layout at the present position, grouped by the question it answers. */
export function Readouts() {
  const title = useReading(({ sketch, setting }) => settingName(sketch, setting));
  const isEmpty = useReading(({ sketch }) => sketch.parts.length === 0);
  const id = useId();
  return (
    <section className="panel" aria-labelledby={id}>
      <div className="panel-head">
        <h2 className="panel-title" id={id}>
          {title}
        </h2>
        <UnitToggle />
      </div>
      {isEmpty ? (
        <p className="readouts-none">{sentenceOf('no parts')}</p>
      ) : (
        READOUT_GROUPS.map((group) => <FoldingReadouts key={group} group={group} />)
      )}
    </section>
  );
}

/** A group shows its main readouts; the others come with "more". */
function FoldingReadouts({ group }: { readonly group: ReadoutGroup }) {
  const [folded, fold] = useFolding(group);
  const [short, shorten] = useFolding(`${group}: all`, true);
  return (
    <Group
      title={group}
      folded={folded}
      onFold={fold}
      aside={
        !folded && (
          <button
            type="button"
            className="readouts-more"
            aria-expanded={!short}
            aria-label={`${group}: ${short ? 'more' : 'fewer'} readouts`}
            onClick={() => shorten(!short)}
          >
            {short ? 'more' : 'less'}
          </button>
        )
      }
    >
      <ReadoutList group={group} short={short} />
    </Group>
  );
}

interface ReadoutListProps {
  readonly group: ReadoutGroup;
  readonly short: boolean;
}

/** Renders anew only when other readouts apply; a number that changes renders its own leaf. */
function ReadoutList({ group, short }: ReadoutListProps) {
  const fractions = useReading(({ sketch }) => sketch.field.fractions);
  const ids = useReading(({ analysis, sketch }) =>
    readoutsIn(group, analysis, sketch.field.fractions)
      .filter(({ isMain = false }) => isMain || !short)
      .map(({ id }) => id)
      .join(' '),
  );
  if (ids === '') return null;
  return (
    <dl className="readouts" onKeyDown={moveFocus}>
      {ids.split(' ').map((id, index) => (
        <ReadoutRow key={id} readout={readoutById(id, fractions)} tabStop={index === 0} />
      ))}
    </dl>
  );
}

/** The arrow keys go from row to row, so that a group is one tab stop. */
function moveFocus(event: KeyboardEvent<HTMLElement>): void {
  const step = event.key === 'ArrowDown' ? 1 : event.key === 'ArrowUp' ? -1 : 0;
  if (step === 0) return;
  const buttons = [...event.currentTarget.querySelectorAll<HTMLElement>('.readout-working')];
  const target = buttons[buttons.indexOf(event.target as HTMLElement) + step];
  if (!target) return;
  event.preventDefault();
  target.focus();
}

interface ReadoutRowProps {
  readonly readout: Readout;
  readonly tabStop: boolean;
}

const ReadoutRow = memo(function ReadoutRow({ readout, tabStop }: ReadoutRowProps) {
  return (
    <div className="readout" data-readout={readout.id}>
      <dt className="readout-label">{readout.label}</dt>
      <dd className="readout-value">
        <ReadoutValue readout={readout} />
        <button
          type="button"
          className="icon-button readout-working"
          tabIndex={tabStop ? 0 : -1}
          aria-label={`${readout.label}: show the working`}
          title="Show the working"
          onClick={() => setView({ drawer: 'trace', topic: readout.id })}
        >
          <Icon name="working" size={13} />
        </button>
      </dd>
    </div>
  );
});

/** The leaf: number and unit, or the reason in quiet words. */
function ReadoutValue({ readout }: { readonly readout: Readout }) {
  const absence = useReading(({ analysis }) => {
    const outcome = readout.read(analysis);
    return outcome.ok ? null : outcome.why;
  });
  const text = useReading(({ analysis, view }) => {
    const outcome = readout.read(analysis);
    return outcome.ok ? quantityText(outcome.value, readout.kind, readout.digits, view.unit) : outcome.why;
  });
  const unit = useReading(({ view }) => quantityUnit(readout.kind, view.unit));
  if (absence !== null) {
    return (
      <span className="readout-absent" title={sentenceOf(absence)}>
        {absence}
      </span>
    );
  }
  return (
    <>
      <span className="readout-number">{text}</span>
      <span className="readout-unit">{unit}</span>
    </>
  );
}
