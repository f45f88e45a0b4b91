import type { Block, Cell, SpacingTable } from './table.ts';

const TABLE_FORMAT = 'gapwright-spacing-table';
const TABLE_VERSION = 1;

/**
 * The table as JSON. Every row is a list of values in the order of the columns: a number as rounded, a text, or
 * `{ "absent": reason }`. Lengths are in the unit of their column.
 */
export function jsonText(table: SpacingTable): string {
  const document = {
    format: TABLE_FORMAT,
    version: TABLE_VERSION,
    title: table.title,
    ...table.options,
    positions: plainBlock(table.positions),
    elements: plainBlock(table.elements),
    notes: table.notes,
  };
  return `${JSON.stringify(document, null, 2)}\n`;
}

const plainBlock = (block: Block<string>) => ({
  columns: block.columns,
  rows: block.rows.map((row) => ({ id: row.id, values: row.cells.map(plainCell) })),
});

function plainCell(cell: Cell): number | string | { readonly absent: string } {
  if (cell.kind === 'number') return cell.value;
  return cell.kind === 'text' ? cell.text : { absent: cell.why };
}
