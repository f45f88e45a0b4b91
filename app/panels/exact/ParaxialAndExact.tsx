import { memo, type ReactNode, useId } from 'react';
import { sentenceOf } from '../../../engine/index.ts';
import { useReading } from '../../live/reading.ts';
import { Group } from '../../ui/Group.tsx';
import { CommandButton } from '../CommandButton.tsx';
import { useFolding } from '../folding.ts';
import type { Commands } from '../useCommand.ts';
import { Drift } from './Drift.tsx';
import { IDEAL } from './ideal.ts';
import { LoupeFields } from './LoupeFields.tsx';
import {
  COMPARED_COLUMNS,
  COMPARED_ROWS,
  type ComparedColumn,
  type ComparedRow,
  comparedText,
} from './rows.ts';
import { TrustField } from './TrustField.tsx';
import './exact.css';

interface ParaxialAndExactProps {
  readonly commands: Commands;
}

/** What exact rays make of the first order, how far it can be trusted, where it drifts most, and the loupe to look at it. */
export function ParaxialAndExact({ commands }: ParaxialAndExactProps) {
  const id = useId();
  return (
    <section className="panel" aria-labelledby={id}>
      <h2 className="panel-title" id={id}>
        Paraxial and exact
      </h2>
      <Folding name="Compared">
        <Compared />
        <div className="card-actions">
          <CommandButton commands={commands} id="focusLeastSpot" word="Focus for the least spot" />
        </div>
      </Folding>
      <Folding name="Drift" startsFolded>
        <Drift />
      </Folding>
      <Folding name="Loupe" startsFolded>
        <LoupeFields />
      </Folding>
    </section>
  );
}

interface FoldingProps {
  readonly name: string;
  readonly startsFolded?: boolean;
  readonly children: ReactNode;
}

function Folding({ name, startsFolded = false, children }: FoldingProps) {
  const [folded, fold] = useFolding(`exact: ${name}`, startsFolded);
  return (
    <Group title={name} folded={folded} onFold={fold}>
      {children}
    </Group>
  );
}

/** The table, or why there is nothing to compare. */
function Compared() {
  const nothing = useReading(({ sketch, exact }) => {
    if (sketch.parts.length === 0) return sentenceOf('no parts');
    if (!exact.setup.ok) return sentenceOf(exact.setup.why);
    return exact.differs ? null : IDEAL;
  });
  const unit = useReading(({ view }) => view.unit);
  if (nothing !== null) return <p className="exact-note">{nothing}</p>;
  return (
    <>
      <table className="compared">
        <thead>
          <tr>
            <th scope="col">
              <span className="compared-unit">{unit}</span>
            </th>
            {COMPARED_COLUMNS.map((column) => (
              <th key={column} scope="col">
                {column}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {COMPARED_ROWS.map((row) => (
            <Row key={row.label} row={row} />
          ))}
        </tbody>
      </table>
      <TrustField />
    </>
  );
}

/** One quantity; where neither kind of ray has it, the reason stands once. */
const Row = memo(function Row({ row }: { readonly row: ComparedRow }) {
  const absence = useReading(({ exact: { comparison } }) => {
    if (!comparison.ok) return comparison.why;
    const { paraxial, exact } = row.read(comparison.value);
    return paraxial.ok || exact.ok ? null : paraxial.why;
  });
  return (
    <tr>
      <th scope="row" title={row.title}>
        {row.label}
      </th>
      {absence === null ? (
        COMPARED_COLUMNS.map((column) => <Cell key={column} row={row} column={column} />)
      ) : (
        <td className="compared-absent" colSpan={3} title={sentenceOf(absence)}>
          {absence}
        </td>
      )}
    </tr>
  );
});

interface CellProps {
  readonly row: ComparedRow;
  readonly column: ComparedColumn;
}

function Cell({ row, column }: CellProps) {
  const isAbsent = useReading(
    ({ exact: { comparison } }) => !comparison.ok || !row.read(comparison.value)[column].ok,
  );
  const text = useReading(({ exact: { comparison }, view }) =>
    comparison.ok ? comparedText(row, column, row.read(comparison.value)[column], view.unit) : comparison.why,
  );
  // A reason stands where the exact value would; beside it the difference is left blank.
  const shown = isAbsent && column === 'difference' ? '' : text;
  return <td className={isAbsent ? 'compared-absent' : `compared-${column}`}>{shown}</td>;
}
