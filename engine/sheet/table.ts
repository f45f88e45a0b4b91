import type { PartId, PositionId } from '../sketch/types.ts';
import type { LengthUnit } from '../units.ts';

/** The plane that distances are counted from; positive to the right of it. */
export type Datum = 'first part' | 'sensor' | 'mount';

export interface SheetOptions {
  readonly datum: Datum;
  /** Digits behind the decimal point of a length in mm, 0 to 6; lengths in inches carry two more. */
  readonly digits: number;
  readonly unit: LengthUnit;
}

/** Datum at the first part, 0.001 mm. */
export const DEFAULT_SHEET_OPTIONS: SheetOptions = { datum: 'first part', digits: 3, unit: 'mm' };

/** What stands at one place of the table; a number is shown with exactly `digits` behind the point. */
export type Cell =
  | { readonly kind: 'number'; readonly value: number; readonly digits: number }
  | { readonly kind: 'text'; readonly text: string }
  /** There is no such number; `why` is a short phrase. */
  | { readonly kind: 'absent'; readonly why: string };

/** What a column holds; it decides nothing but how a screen may group the columns. */
export type ColumnKind = 'name' | 'distance' | 'gap' | 'clear gap' | 'quantity' | 'check';

export interface Column {
  readonly id: string;
  readonly title: string;
  /** Empty for a text or a plain number. */
  readonly unit: '' | LengthUnit | 'µm';
  readonly kind: ColumnKind;
}

export interface Row<RowId extends string> {
  readonly id: RowId;
  /** One for each column, in their order. */
  readonly cells: readonly Cell[];
}

export interface Block<RowId extends string> {
  readonly columns: readonly Column[];
  readonly rows: readonly Row<RowId>[];
}

/** What a mechanical designer cuts to: plain data, rounded as it is printed. */
export interface SpacingTable {
  readonly title: string;
  readonly options: SheetOptions;
  readonly positions: Block<PositionId>;
  readonly elements: Block<PartId>;
  /** What the numbers assume, a sentence or two each. */
  readonly notes: readonly string[];
}

/** The cell that shows `value`; −0 becomes 0, so that no sign stands before a nought. */
export const numberCell = (value: number, digits: number): Cell => {
  const shown = Number(value.toFixed(digits));
  return { kind: 'number', value: shown === 0 ? 0 : shown, digits };
};

export const textCell = (text: string): Cell => ({ kind: 'text', text });

export const absentCell = (why: string): Cell => ({ kind: 'absent', why });

/** The text of a cell with an ASCII minus and a decimal point; an absent number gives its reason. */
export function cellText(cell: Cell): string {
  if (cell.kind === 'number') return cell.value.toFixed(cell.digits);
  return cell.kind === 'text' ? cell.text : cell.why;
}

/** The title of a column with its unit behind it in brackets. */
export const headingOf = (column: Column): string =>
  column.unit === '' ? column.title : `${column.title} (${column.unit})`;
