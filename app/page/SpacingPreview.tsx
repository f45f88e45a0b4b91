import { spacingTable } from '../../engine/index.ts';
import { SheetTables } from '../desk/SheetTables.tsx';
import type { Reading } from '../live/reading.ts';
import { useReading } from '../live/reading.ts';

let last: { readonly key: readonly unknown[]; readonly spacing: ReturnType<typeof spacingTable> } | null =
  null;

/** The table of a reading, kept while nothing it depends on changes. */
function spacingOf({ sketch, view: { datum, digits, unit } }: Reading): ReturnType<typeof spacingTable> {
  const key = [sketch, datum, digits, unit];
  if (!last || key.some((value, i) => value !== last?.key[i]))
    last = { key, spacing: spacingTable(sketch, { datum, digits, unit }) };
  return last.spacing;
}

/** The spacing table live in the drawer, as the hand-over will print it. */
export function SpacingPreview() {
  const spacing = useReading(spacingOf);
  if (spacing.ok) return <SheetTables table={spacing.value} />;
  return (
    <ul className="drawers-refusals">
      {spacing.refusals.map((refusal) => (
        <li key={refusal.sentence}>{refusal.sentence}</li>
      ))}
    </ul>
  );
}
