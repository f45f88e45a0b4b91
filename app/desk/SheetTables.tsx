import type { Block, Cell, ColumnKind, SpacingTable } from '../../engine/index.ts';
import { formatNumber } from '../ui/format.ts';

/** The columns of positions in the groups that are read together; their order is the engine's. */
const GROUPS: readonly { readonly title: string; readonly kinds: readonly ColumnKind[] }[] = [
  { title: 'Distances', kinds: ['distance'] },
  { title: 'Gaps', kinds: ['gap', 'clear gap'] },
  { title: 'What comes of it', kinds: ['quantity', 'check'] },
];

/** The spacing table for the eye: a row for each position, the columns parted by what they are for; then the elements. */
export function SheetTables({ table }: { readonly table: SpacingTable }) {
  return (
    <>
      {GROUPS.map(({ title, kinds }) => {
        const block = columnsOf(table.positions, ['name', ...kinds]);
        return block.columns.length > 1 && <BlockTable key={title} title={title} block={block} />;
      })}
      <BlockTable title="Elements" block={table.elements} />
    </>
  );
}

/** The block with only the columns of these kinds. */
function columnsOf(block: Block<string>, kinds: readonly ColumnKind[]): Block<string> {
  const kept = block.columns.map((column) => kinds.includes(column.kind));
  return {
    columns: block.columns.filter((_, index) => kept[index]),
    rows: block.rows.map((row) => ({ ...row, cells: row.cells.filter((_, index) => kept[index]) })),
  };
}

function BlockTable({ title, block }: { readonly title: string; readonly block: Block<string> }) {
  return (
    // biome-ignore lint/a11y/noNoninteractiveTabindex: a region that scrolls must be reachable by keyboard (WCAG 2.1.1)
    <section className="sheet-table-scroll" tabIndex={0} aria-label={title}>
      <table className="sheet-table">
        <caption className="desk-head">{title}</caption>
        <thead>
          <tr>
            {block.columns.map((column, index) => (
              <th key={column.id} scope="col" className={index === 0 ? 'sheet-table-name' : undefined}>
                {column.title}
                {column.unit !== '' && <span className="sheet-table-unit"> {column.unit}</span>}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {block.rows.map((row) => (
            <tr key={row.id}>
              {block.columns.map((column, index) => {
                const cell = row.cells[index];
                return index === 0 ? (
                  <th key={column.id} scope="row" className="sheet-table-name">
                    {textOf(cell)}
                  </th>
                ) : (
                  <td key={column.id} className={cell?.kind === 'number' ? undefined : 'sheet-table-words'}>
                    {textOf(cell)}
                  </td>
                );
              })}
            </tr>
          ))}
        </tbody>
      </table>
    </section>
  );
}

function textOf(cell: Cell | undefined): string {
  if (cell === undefined) return '';
  if (cell.kind === 'number') return formatNumber(cell.value, cell.digits);
  return cell.kind === 'text' ? cell.text : cell.why;
}
