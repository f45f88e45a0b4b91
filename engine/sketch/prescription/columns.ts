import { isFlat, mediumIn, numberIn } from './cells.ts';
import type { Line } from './split.ts';

/** What a column of a pasted table may hold. */
export const ROLES = [
  'number',
  'radius',
  'thickness',
  'medium',
  'abbe',
  'diameter',
  'semiDiameter',
  'conic',
  'unused',
] as const;
export type Role = (typeof ROLES)[number];

/** What the columns of a table hold, the lines of its surfaces, and those of no use. */
export interface Columns {
  readonly roles: readonly Role[];
  readonly data: readonly Line[];
  readonly besides: readonly Line[];
}

/** Told apart from a heading by any number or plane in it. */
const isData = ({ cells }: Line): boolean => cells.some((cell) => numberIn(cell) !== null || isFlat(cell));

/**
 * What each column holds: by the heading where there is one that names radius and thickness, else by the order in which such
 * tables are printed: number of the surface, radius, thickness, index or glass, Abbe number. The number may be missing.
 */
export function columnsOf(lines: readonly Line[]): Columns {
  const data = lines.filter(isData);
  const besides = lines.filter((line) => !isData(line));
  const width = Math.max(0, ...data.map(({ cells }) => cells.length));
  const first = data[0];
  const headings = first === undefined ? [] : besides.filter(({ number }) => number < first.number);
  for (const heading of headings.toReversed()) {
    const roles = rolesNamed(heading.cells, width);
    if (roles !== null) return { roles, data, besides: besides.filter((line) => line !== heading) };
  }
  return { roles: rolesByOrder(data, width), data, besides };
}

/** A half diameter is asked for before a diameter, whose word it holds. */
const NAMES: readonly (readonly [Role, RegExp])[] = [
  ['number', /^(#|no|nr|num|number|surf(ace)?s?|surface (no|number)|s|i|fl(ä|ae)che)$/],
  ['conic', /^(k|cc|conic|conic constant|kappa|κ)$/],
  ['semiDiameter', /semi|half|radius of aperture|aperture radius/],
  ['diameter', /^(ø|⌀|d(ia(m(eter)?)?)?clear)$|diam|\bdia\b|aperture/],
  ['radius', /^(r|ri|radi(us|i).*|curvature radius|roc|kr(ü|ue)mmungsradius)$/],
  ['thickness', /^(t|d|di|th|thick(ness)?|dist(ance)?|spac(e|ing)|separation|gap|dicke|abstand)( .*)?$/],
  ['abbe', /^(v|ν|vd|νd|ve|νe|abbe|abbe (no|number|value|zahl)|abbezahl|v[- ]?(no|number))$/],
  ['medium', /^(n|nd|ne|ni|index|refractive index|glass|material|medium|glas|brechzahl)$/],
];

function rolesNamed(cells: readonly string[], width: number): readonly Role[] | null {
  if (cells.length > width) return null;
  const roles = cells.map(roleNamed);
  if (!roles.includes('radius') || !roles.includes('thickness')) return null;
  return [...roles, ...new Array<Role>(width - roles.length).fill('unused')];
}

function roleNamed(cell: string): Role {
  const word = cell
    .toLowerCase()
    .replaceAll(/[([{].*$|[.:_]/g, '')
    .trim();
  return NAMES.find(([, names]) => names.test(word))?.[0] ?? 'unused';
}

function rolesByOrder(data: readonly Line[], width: number): readonly Role[] {
  const columns = Array.from({ length: width }, (_, at) => data.map(({ cells }) => cells[at] ?? ''));
  const numbered = width > 3 && isNumbering(columns[0] ?? []);
  const order: Role[] = [...(numbered ? (['number'] as const) : []), 'radius', 'thickness', 'medium'];
  const abbeAt = order.length;
  const roles = columns.map((_, at) => order[at] ?? 'unused');
  if (isAbbe(columns[abbeAt] ?? [], columns[abbeAt - 1] ?? [])) roles[abbeAt] = 'abbe';
  return roles;
}

/** Surfaces counted up by one, perhaps with a letter in front or a star behind, or called by a word. */
function isNumbering(column: readonly string[]): boolean {
  const numbers = column.map((cell) => /^[a-z]?(\d{1,3})\*?$/i.exec(cell)?.[1]);
  let before: number | null = null;
  for (const [at, digits] of numbers.entries()) {
    if (digits === undefined) {
      if (!/^[a-z]{1,9}\.?$/i.test(column[at] ?? '') || isFlat(column[at] ?? '')) return false;
      continue;
    }
    const number = Number(digits);
    if (before !== null && number <= before) return false;
    if (before !== null && number - before > 2) return false;
    before = number;
  }
  return before !== null;
}

/** Numbers of the size of an Abbe number, and only where there is glass. */
function isAbbe(column: readonly string[], media: readonly string[]): boolean {
  let some = false;
  for (const [at, cell] of column.entries()) {
    const medium = mediumIn(media[at] ?? '');
    const inGlass = medium.ok && medium.value !== 'air';
    const value = numberIn(cell);
    if (inGlass && value !== null && value > 10 && value < 150) some = true;
    else if (inGlass ? cell !== '' : value !== null && value !== 0) return false;
  }
  return some;
}
