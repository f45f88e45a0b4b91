import type { Block, Cell, SpacingTable } from './table.ts';
import { cellText, headingOf } from './table.ts';

/** How the values of one record are parted, and how a number is written. */
interface Dialect {
  readonly separator: ',' | ';' | '\t';
  readonly decimal: '.' | ',';
}

export const CSV: Dialect = { separator: ',', decimal: '.' };
export const CSV_COMMA: Dialect = { separator: ';', decimal: ',' };
export const TSV: Dialect = { separator: '\t', decimal: '.' };

/**
 * The table as delimited text after RFC 4180: records end with CRLF, a field that holds a separator, a quote or a line
 * break is quoted and its quotes are doubled, and every record has the same number of fields. In order: the positions
 * under their headings, an empty record, the elements under theirs, an empty record, a note in each record.
 *
 * A text that a spreadsheet would take for a formula (it begins with = + - @, a tab or a line break) gets an
 * apostrophe in front. Numbers are left alone, so a negative number stays a number. In tab-separated text, which is
 * made for pasting, tabs and line breaks inside a text become blanks.
 */
export function delimitedText(table: SpacingTable, dialect: Dialect): string {
  const records = [
    ...recordsOf(table.positions, dialect),
    [],
    ...recordsOf(table.elements, dialect),
    [],
    ...table.notes.map((note) => [textField(note, dialect)]),
  ];
  const width = Math.max(...records.map((record) => record.length));
  return records
    .map((record) => {
      const blanks = new Array<string>(width - record.length).fill('');
      return `${[...record, ...blanks].join(dialect.separator)}\r\n`;
    })
    .join('');
}

function recordsOf(block: Block<string>, dialect: Dialect): string[][] {
  return [
    block.columns.map((column) => textField(headingOf(column), dialect)),
    ...block.rows.map((row) => row.cells.map((cell) => cellField(cell, dialect))),
  ];
}

function cellField(cell: Cell, dialect: Dialect): string {
  const text = cellText(cell);
  return cell.kind === 'number' ? text.replace('.', dialect.decimal) : textField(text, dialect);
}

function textField(text: string, { separator }: Dialect): string {
  const harmless = /^[=+\-@\t\r\n]/.test(text) ? `'${text}` : text;
  const oneLine = separator === '\t' ? harmless.replace(/[\t\r\n]+/g, ' ') : harmless;
  const needsQuotes = oneLine.includes(separator) || /["\r\n]/.test(oneLine);
  return needsQuotes ? `"${oneLine.replaceAll('"', '""')}"` : oneLine;
}
