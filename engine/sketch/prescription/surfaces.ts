import { mediumName } from '../../media/medium.ts';
import type { Medium } from '../types.ts';
import { numberText, quantityText, quoted } from '../words.ts';
import { type CellRead, isFlat, mediumIn, numberIn, radiusIn, valueIn } from './cells.ts';
import type { Role } from './columns.ts';
import type { Line } from './split.ts';

/** One cell of a pasted table: its text, how it is read, and why it cannot be. */
export interface PrescriptionCell {
  readonly text: string;
  /** Empty where nothing is taken from it. */
  readonly words: string;
  readonly fault: string | null;
}

/** One line of a pasted table. */
export interface PrescriptionRow {
  /** Counted from 1 in the text. */
  readonly line: number;
  /** What the line becomes: a surface, the stop, or one end of the axis, which is left out. */
  readonly becomes: string;
  /** One for each column. */
  readonly cells: readonly PrescriptionCell[];
}

/** One surface as its line tells it: thickness and medium are what lies behind it. */
export interface Surface {
  readonly line: number;
  readonly isStop: boolean;
  readonly radiusMm: number | null;
  readonly thicknessMm: number;
  readonly medium: Medium;
  readonly conic: number;
  readonly semiDiameterMm: number | null;
}

interface Surfaces {
  readonly rows: readonly PrescriptionRow[];
  readonly surfaces: readonly Surface[];
  readonly faults: readonly string[];
  readonly remarks: readonly string[];
}

/** Reads the lines of a table by what its columns hold. */
export function readSurfaces(lines: readonly Line[], roles: readonly Role[]): Surfaces {
  const rows: PrescriptionRow[] = [];
  const surfaces: Surface[] = [];
  const faults: string[] = [];
  const remarks: string[] = [];
  const commaIsOdd = hasBothDecimals(lines);
  const last = lines.findLast((line) => endOf(line) === null);
  for (const line of lines) {
    const end = endOf(line);
    if (end === null) {
      const { surface, cells } = readLine(line, roles, line === last, commaIsOdd);
      for (const { fault } of cells) if (fault !== null) faults.push(`Line ${line.number}: ${fault}.`);
      surfaces.push(surface);
      const becomes = surface.isStop && surface.medium === 'air' ? 'stop' : `surface ${surfaces.length}`;
      rows.push({ line: line.number, becomes, cells });
    } else {
      const cells = roles.map((_, at) => ({ text: line.cells[at] ?? '', words: '', fault: null }));
      remarks.push(`Line ${line.number} is the ${end} and is left out.`);
      rows.push({ line: line.number, becomes: end, cells });
    }
  }
  return { rows, surfaces, faults, remarks };
}

const OBJECT = /^(obj(ect)?|o)\.?$/i;
const IMAGE = /^(im(a|g|age)?|image plane|film|sensor|bild)\.?$/i;
const STOP = /^\(?(sto|stop|aperture|aperture stop|as|diaphragm|iris|blende)\)?\.?$/i;

function endOf({ cells }: Line): 'object' | 'image' | null {
  const words = cells.slice(0, 2);
  if (words.some((cell) => OBJECT.test(cell))) return 'object';
  return words.some((cell) => IMAGE.test(cell)) ? 'image' : null;
}

/** With points elsewhere, a comma may as well stand between thousands. */
function hasBothDecimals(lines: readonly Line[]): boolean {
  const numbers = lines.flatMap(({ cells }) => cells.filter((cell) => numberIn(cell) !== null));
  return numbers.some((cell) => cell.includes('.')) && numbers.some((cell) => cell.includes(','));
}

/** What a cell tells: how it is read, and what that says of the surface; or why it is not read. */
interface Told {
  readonly words: string;
  readonly fault?: string;
  readonly change?: Partial<Surface>;
}

function readLine(
  line: Line,
  roles: readonly Role[],
  isLast: boolean,
  commaIsOdd: boolean,
): { readonly surface: Surface; readonly cells: readonly PrescriptionCell[] } {
  let surface: Surface = {
    line: line.number,
    isStop: line.cells.some((cell) => STOP.test(cell)),
    radiusMm: null,
    thicknessMm: 0,
    medium: 'air',
    conic: 0,
    semiDiameterMm: null,
  };
  const cells = roles.map((): PrescriptionCell => ({ text: '', words: '', fault: null }));
  // An Abbe number belongs to an index, which may stand behind it.
  const places = [...roles.keys()].sort(
    (one, other) => Number(roles[one] === 'abbe') - Number(roles[other] === 'abbe') || one - other,
  );
  for (const at of places) {
    const text = line.cells[at] ?? '';
    const read = READERS[roles[at] ?? 'unused'];
    const odd = commaIsOdd && text.includes(',') && numberIn(text) !== null;
    const told: Told = odd ? unread(ODD(text)) : read(STOP.test(text) ? '' : text, surface, isLast);
    cells[at] = { text, words: told.words, fault: told.fault ?? null };
    surface = { ...surface, ...told.change };
  }
  return { surface, cells };
}

const ODD = (text: string): string =>
  `${quoted(text)} has a comma where other numbers have a point; write both the same way`;

/** How a cell is read by what its column holds, knowing what its line has told so far. */
const READERS: Readonly<Record<Role, (text: string, surface: Surface, isLast: boolean) => Told>> = {
  radius: (text, { isStop }) =>
    text === '' && isStop
      ? { words: 'flat' }
      : told(needed(text, 'radius', radiusIn), radiusWords, (radiusMm) => ({ radiusMm })),
  thickness: (text, _, isLast) =>
    isLast && (isBlank(text) || isFlat(text))
      ? { words: 'open' }
      : told(needed(text, 'thickness', thicknessIn), mm, (thicknessMm) => ({ thicknessMm })),
  medium: (text, { medium }) =>
    told(mediumIn(text), mediumWords, (read) => ({ medium: isNamed(medium) ? medium : read })),
  abbe: (text, { medium }) => {
    if (text === '') return SILENT;
    if (medium === 'air' || isBlank(text)) return { words: 'not used' };
    if (!('index' in medium)) return { words: 'not needed' };
    return told(valueIn(text, 'Abbe number'), abbeWords, (abbeNumber) => ({
      medium: { ...medium, abbeNumber },
    }));
  },
  diameter: (text) =>
    isBlank(text)
      ? SILENT
      : told(valueIn(text, 'clear diameter'), clearWords, (size) => ({ semiDiameterMm: size / 2 })),
  semiDiameter: (text) =>
    isBlank(text)
      ? SILENT
      : told(
          valueIn(text, 'semi-diameter'),
          (half) => clearWords(2 * half),
          (semiDiameterMm) => ({ semiDiameterMm }),
        ),
  conic: (text) =>
    isBlank(text) ? SILENT : told(valueIn(text, 'conic constant'), numberText, (conic) => ({ conic })),
  number: () => SILENT,
  unused: (text) => (text === '' ? SILENT : { words: 'not used' }),
};

const SILENT: Told = { words: '' };
const unread = (fault: string): Told => ({ words: 'not read', fault });

const told = <T>(
  read: CellRead<T>,
  words: (value: T) => string,
  change: (value: T) => Partial<Surface>,
): Told => (read.ok ? { words: words(read.value), change: change(read.value) } : unread(read.why));

const isBlank = (text: string): boolean => /^[-\u2013\u2014\u2212]*$/.test(text);

const needed = <T>(text: string, what: string, read: (text: string) => CellRead<T>): CellRead<T> =>
  text === '' ? { ok: false, why: `the ${what} is missing` } : read(text);

const thicknessIn = (text: string): CellRead<number> => valueIn(text, 'thickness');

const mm = (value: number): string => quantityText(value, 'mm');
const radiusWords = (radiusMm: number | null): string => (radiusMm === null ? 'flat' : mm(radiusMm));
const clearWords = (diameterMm: number): string => `⌀ ${mm(diameterMm)}`;
const abbeWords = (abbeNumber: number): string => `V ${numberText(abbeNumber)}`;

function mediumWords(medium: Medium): string {
  if (medium === 'air') return 'air';
  return 'code' in medium ? `glass code ${medium.code}` : mediumName(medium);
}

/** Where a table has both a glass and its index, the name is kept. */
const isNamed = (medium: Medium): boolean => medium !== 'air' && !('index' in medium);
