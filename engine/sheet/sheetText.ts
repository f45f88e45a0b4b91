import { CSV, CSV_COMMA, delimitedText, TSV } from './delimited.ts';
import { jsonText } from './json.ts';
import { markdownText } from './markdown.ts';
import type { SpacingTable } from './table.ts';

/** `'csv comma'` writes decimal commas and parts the fields by semicolons. */
export type SheetForm = 'csv' | 'csv comma' | 'tsv' | 'markdown' | 'json';

/** Every text form, in the order in which a screen may offer them. */
export const SHEET_FORMS: readonly SheetForm[] = ['csv', 'csv comma', 'tsv', 'markdown', 'json'];

/** The table as text in one form. Numbers carry an ASCII minus, so that every form reads back to the numbers shown. */
export function sheetText(table: SpacingTable, form: SheetForm): string {
  switch (form) {
    case 'csv':
      return delimitedText(table, CSV);
    case 'csv comma':
      return delimitedText(table, CSV_COMMA);
    case 'tsv':
      return delimitedText(table, TSV);
    case 'markdown':
      return markdownText(table);
    case 'json':
      return jsonText(table);
  }
}
