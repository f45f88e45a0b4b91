import type { Analysis, LengthUnit, RayOutcome, Sketch, Train } from '../../engine/index.ts';
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
      ...(isCurved(train)
        ? [row('radius', 'length', 4, [null, ...surfaces.map((k) => radiusOf(train, k)), null])]
        : []),
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
      ...(isCurved(train)
        ? [
            row('i', 'number', 6, [null, ...surfaces.map((k) => incidence(train, rays.marginal, k)), null]),
            row('ī', 'number', 6, [null, ...surfaces.map((k) => incidence(train, rays.chief, k)), null]),
          ]
        : []),
    ],
  };
}

const isCurved = ({ curvature }: Train): boolean => curvature.some((c) => c !== 0);

/** Null at flat surfaces and thin parts. */
const radiusOf = ({ curvature }: Train, k: number): number | null => {
  const c = curvature[k] ?? 0;
  return c === 0 ? null : 1 / c;
};

/** Paraxial angle of incidence u + c y in rad; null at a thin part, which has no normal. */
function incidence({ thinPower, curvature, index }: Train, ray: RayOutcome, k: number): number | null {
  if (!ray.ok || thinPower[k] !== 0) return null;
  return (ray.value.nu[k] ?? 0) / (index[k] ?? 1) + (curvature[k] ?? 0) * (ray.value.y[k] ?? 0);
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

/** A part with two surfaces names them front and rear, one with more counts them, the number first: long names are cut. */
function surfaceName(sketch: Sketch, { train }: Analysis, surface: number): string {
  const part = train.partOf[surface] ?? -1;
  const name = nameAt(sketch, part);
  const first = train.partOf.indexOf(part);
  const last = train.partOf.lastIndexOf(part);
  if (first === last) return name;
  if (last - first > 1) return `surface ${surface - first + 1} of ${name}`;
  return surface === first ? `${name}, front` : `${name}, rear`;
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
