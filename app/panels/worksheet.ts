import type { Analysis, LengthUnit, RayOutcome, Sketch } from '../../engine/index.ts';
import { heightInSpace, mmPer, powerAt } from '../../engine/index.ts';
import { nameAt } from '../drawing/words.ts';
import { formatLength, formatNumber } from '../ui/format.ts';

/** The trace sheet: quantities as rows, surfaces as columns between object and image. Cells are null where there is none. */
export interface Worksheet {
  readonly columns: readonly string[];
  readonly rows: readonly WorksheetRow[];
}

export interface WorksheetRow {
  readonly label: string;
  readonly kind: 'length' | 'perLength' | 'number';
  readonly digits: number;
  readonly cells: readonly (number | null)[];
}

/**
 * The y–nu worksheet of the marginal and the chief ray. Gap, index and nu in a column are those behind its surface; in the first
 * column those between the object and the first surface. Lengths in mm, powers in 1/mm.
 */
export function worksheetOf(sketch: Sketch, analysis: Analysis): Worksheet {
  const { train, conjugates, rays } = analysis;
  const surfaces = [...train.z.keys()];
  const plane = conjugates.imagePlaneMm.ok ? conjugates.imagePlaneMm.value : null;
  const object = train.objectZ;
  const spaces = (array: Float64Array) => [...array, null];
  return {
    columns: ['object', ...surfaces.map((surface) => surfaceName(sketch, analysis, surface)), 'image'],
    rows: [
      row('power', 'perLength', 6, [null, ...surfaces.map((surface) => powerAt(train, surface)), null]),
      row('gap behind', 'length', 4, [
        object === null ? null : -object,
        ...surfaces.slice(0, -1).map((surface) => train.gap[surface] ?? 0),
        ...(surfaces.length === 0 ? [] : [plane]),
        null,
      ]),
      row('index behind', 'number', 5, spaces(train.index)),
      row('y', 'length', 4, heights(analysis, rays.marginal, plane)),
      row('nu behind', 'number', 6, slopes(rays.marginal, train.count)),
      row('ȳ', 'length', 4, heights(analysis, rays.chief, plane)),
      row('nū behind', 'number', 6, slopes(rays.chief, train.count)),
    ],
  };
}

function row(
  label: string,
  kind: WorksheetRow['kind'],
  digits: number,
  cells: WorksheetRow['cells'],
): WorksheetRow {
  return { label, kind, digits, cells };
}

function heights({ train }: Analysis, ray: RayOutcome, planeMm: number | null): (number | null)[] {
  if (!ray.ok || train.count === 0) return Array.from({ length: train.count + 2 }, () => null);
  const last = train.z[train.count - 1] ?? 0;
  return [
    train.objectZ === null ? null : heightInSpace(train, ray.value, 0, train.objectZ),
    ...ray.value.y,
    planeMm === null ? null : heightInSpace(train, ray.value, train.count, last + planeMm),
  ];
}

const slopes = (ray: RayOutcome, count: number): (number | null)[] =>
  ray.ok ? [...ray.value.nu, null] : Array.from({ length: count + 2 }, () => null);

/** A part with two surfaces names them front and rear. */
function surfaceName(sketch: Sketch, { train }: Analysis, surface: number): string {
  const part = train.partOf[surface] ?? -1;
  const name = nameAt(sketch, part);
  if (train.partOf[surface + 1] === part) return `${name}, front`;
  return train.partOf[surface - 1] === part ? `${name}, rear` : name;
}

/** One cell as it is shown, in `unit`; empty where there is none. */
export function cellText(value: number | null, { kind, digits }: WorksheetRow, unit: LengthUnit): string {
  if (value === null) return '';
  if (kind === 'length') return formatLength(value, unit, digits);
  const perUnit = kind === 'perLength' ? mmPer(unit) : 1;
  return formatNumber(value * perUnit, digits);
}

/** What a row's numbers are counted in. */
export function rowUnit({ kind }: WorksheetRow, unit: LengthUnit): string {
  return kind === 'length' ? unit : kind === 'perLength' ? `1/${unit}` : '';
}

/** The worksheet as tab-separated text with all digits and plain signs, in mm, for pasting into a spreadsheet. */
export function worksheetTsv({ columns, rows }: Worksheet): string {
  const head = ['', 'unit', ...columns.map((column) => column.replaceAll(/[\t\r\n]+/g, ' '))];
  const body = rows.map((line) => [line.label, rowUnit(line, 'mm'), ...line.cells.map((cell) => cell ?? '')]);
  return [head, ...body].map((cells) => `${cells.join('\t')}\n`).join('');
}
