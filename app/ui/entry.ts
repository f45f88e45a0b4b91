import type { Outcome } from '../../engine/index.ts';
import { MM_PER_INCH, none, some } from '../../engine/index.ts';

/** What a number field holds; the empty unit is a bare number. Values are stored in the base of each unit's family. */
export type EntryUnit = 'mm' | 'in' | 'µm' | 'nm' | '°' | '%' | '1/m' | '';

export interface EntryContext {
  /** The unit of a number typed without one. */
  readonly unit: EntryUnit;
  /** The present value in the base unit, to which a leading + adds; null when there is none. */
  readonly current: number | null;
  readonly allowInfinity?: boolean;
}

interface Family {
  /** How many base units each unit is. */
  readonly factors: Readonly<Record<string, number>>;
  readonly example: string;
}

const LENGTH: Family = {
  factors: {
    mm: 1,
    cm: 10,
    m: 1000,
    µm: 1e-3,
    um: 1e-3,
    nm: 1e-6,
    in: MM_PER_INCH,
    inch: MM_PER_INCH,
    '"': MM_PER_INCH,
    '″': MM_PER_INCH,
  },
  example: '41.2, 41-1.2, 3/8 in or +0.5',
};
const WAVELENGTH: Family = { factors: { nm: 1, µm: 1000, um: 1000, mm: 1e6 }, example: '546.07 or 0.546 µm' };
const ANGLE: Family = { factors: { '°': 1, deg: 1, rad: 180 / Math.PI }, example: '12.5 or 0.2 rad' };
const SHARE: Family = { factors: { '%': 0.01 }, example: '30 or 100/3' };
const POWER: Family = { factors: { dpt: 1 }, example: '20 or 1/0.05' };
const BARE: Family = { factors: {}, example: '5.6, 1/3 or +0.1' };

const FAMILIES: Readonly<Record<EntryUnit, Family>> = {
  mm: LENGTH,
  in: LENGTH,
  µm: LENGTH,
  nm: WAVELENGTH,
  '°': ANGLE,
  '%': SHARE,
  '1/m': POWER,
  '': BARE,
};

const LONGEST_ENTRY = 120;
const INFINITE = /^[+]?(∞|inf|infinity|infinite|flat)$/i;

/** A number of `unit` in the base unit of its family. */
export const toBase = (amount: number, unit: EntryUnit): number => times(amount, factorOf(unit));

/** A number of base units in `unit`. */
export const fromBase = (value: number, unit: EntryUnit): number => value / factorOf(unit);

const factorOf = (unit: EntryUnit): number => FAMILIES[unit].factors[unit] ?? 1;

/** A converted number is cut to the 15 digits that a double always keeps, so that 3.45 µm is stored as 0.00345 mm. */
const times = (amount: number, factor: number): number =>
  factor === 1 ? amount : Number((amount * factor).toPrecision(15));

/**
 * The number that `text` means, in the base unit of the field's family (mm, nm, degrees, a share, a bare number), or one
 * sentence on what is wrong. Understands arithmetic, units, the decimal comma and ×10 exponents. A leading + adds to the
 * present value; a leading − is a negative value. Never throws, never gives a number that is not finite unless infinity is
 * allowed.
 */
export function parseEntry(text: string, context: EntryContext): Outcome<number, string> {
  const trimmed = text.trim();
  const family = FAMILIES[context.unit];
  if (trimmed === '') return none(`Type a number, such as ${family.example}.`);
  if (trimmed.length > LONGEST_ENTRY) return none(`An entry has at most ${LONGEST_ENTRY} characters.`);
  if (INFINITE.test(trimmed)) {
    return context.allowInfinity ? some(Infinity) : none('This value must be finite; type a number.');
  }
  const adds = trimmed.startsWith('+');
  if (adds && !Number.isFinite(context.current ?? Number.NaN)) {
    return none('There is no present value to add to; type the value itself.');
  }
  const read = evaluate(adds ? trimmed.slice(1) : trimmed, family);
  if (!read.ok) return none(read.why === 'unread' ? unread(trimmed, family) : read.why);
  const { amount, factor } = read.value;
  const value = times(amount, factor ?? factorOf(context.unit)) + (adds ? (context.current ?? 0) : 0);
  return Number.isFinite(value) ? some(value) : none(`“${trimmed}” is too large a number.`);
}

function unread(text: string, family: Family): string {
  return `“${text}” is not a number this field reads; try ${family.example}.`;
}

/** A number of units of `factor` base units each, or a bare number. */
interface Quantity {
  readonly amount: number;
  readonly factor: number | null;
}
type Read = Outcome<Quantity, string>;

/** Recursive descent over sums, products, signs, brackets and a unit behind a number. */
function evaluate(text: string, family: Family): Read {
  const tokens = tokensOf(text);
  if (!tokens) return none('unread');
  let at = 0;

  const sum = (): Read => {
    let left = product();
    while (left.ok && (tokens[at] === '+' || tokens[at] === '-')) {
      const sign = tokens[at++] === '+' ? 1 : -1;
      const right = product();
      left = right.ok ? add(left.value, right.value, sign) : right;
    }
    return left;
  };

  const product = (): Read => {
    let left = signed();
    while (left.ok && (tokens[at] === '*' || tokens[at] === '/')) {
      const divides = tokens[at++] === '/';
      const right = signed();
      left = !right.ok
        ? right
        : divides
          ? divide(left.value, right.value)
          : multiply(left.value, right.value);
    }
    return left;
  };

  const signed = (): Read => {
    let sign = 1;
    while (tokens[at] === '+' || tokens[at] === '-') if (tokens[at++] === '-') sign = -sign;
    const read = withUnit();
    return read.ok ? some({ ...read.value, amount: sign * read.value.amount }) : read;
  };

  const withUnit = (): Read => {
    const read = primary();
    if (!read.ok) return read;
    const word = tokens[at];
    if (word === undefined || !isWord(word)) return read;
    const factor = Object.hasOwn(family.factors, word) ? family.factors[word] : undefined;
    if (factor === undefined) return none(`This field does not know the unit “${word}”.`);
    at++;
    return read.value.factor === null ? some({ amount: read.value.amount, factor }) : none('unread');
  };

  const primary = (): Read => {
    const token = tokens[at++];
    if (token === '(') {
      const inner = sum();
      return inner.ok && tokens[at++] !== ')' ? none('A bracket is not closed.') : inner;
    }
    const amount = token === undefined || isWord(token) ? Number.NaN : Number(token);
    return Number.isNaN(amount) || token === '' ? none('unread') : some({ amount, factor: null });
  };

  const total = sum();
  return total.ok && at < tokens.length ? none('unread') : total;
}

/** A bare number beside one with a unit counts in that unit: `40 + 1.2 mm`. */
function add(left: Quantity, right: Quantity, sign: 1 | -1): Read {
  if (left.factor !== null && right.factor !== null) {
    const rightAmount =
      left.factor === right.factor ? right.amount : (right.amount * right.factor) / left.factor;
    return some({ amount: left.amount + sign * rightAmount, factor: left.factor });
  }
  return some({ amount: left.amount + sign * right.amount, factor: left.factor ?? right.factor });
}

function multiply(left: Quantity, right: Quantity): Read {
  if (left.factor !== null && right.factor !== null) return none('A length times a length is not a length.');
  return some({ amount: left.amount * right.amount, factor: left.factor ?? right.factor });
}

/** `3/8 in` is three eighths of an inch; a length over a length is a bare number. */
function divide(left: Quantity, right: Quantity): Read {
  if (right.amount === 0) return none('Nothing can be divided by zero.');
  const amount = left.amount / right.amount;
  if (left.factor !== null && right.factor !== null)
    return some({ amount: (amount * left.factor) / right.factor, factor: null });
  return some({ amount, factor: left.factor ?? right.factor });
}

const TOKEN = /\s*(?:(\d+(?:[.,]\d*)?(?:e[+-]?\d+)?|[.,]\d+(?:e[+-]?\d+)?)|([a-zµ°%"″]+)|([+\-*/()]))/iy;

/** The tokens of `text` with every sign in its ASCII form, or null when something in it is none. */
function tokensOf(text: string): string[] | null {
  const plain = text
    .replaceAll(/[\u2212\u2013]/g, '-')
    .replaceAll(/[×·]/g, '*')
    .replaceAll(/[÷:]/g, '/')
    .replaceAll('μ', 'µ')
    .trimEnd();
  const tokens: string[] = [];
  TOKEN.lastIndex = 0;
  while (TOKEN.lastIndex < plain.length) {
    const found = TOKEN.exec(plain);
    if (!found) return null;
    const [, number, word, sign] = found;
    tokens.push(number?.replace(',', '.').toLowerCase() ?? word?.toLowerCase() ?? sign ?? '');
  }
  return tokens;
}

const isWord = (token: string): boolean => /^[a-zµ°%"″]/.test(token);

/**
 * `value` (in the base unit) with all its stored digits in `unit`, as a field shows it while it is edited. Reading it back
 * gives `value` again; where another unit makes that impossible, to 15 digits.
 */
export function formatEntry(value: number, unit: EntryUnit): string {
  if (value === Infinity) return '∞';
  const exact = fromBase(value, unit);
  const short = Number(exact.toPrecision(15));
  return String(toBase(short, unit) === value ? short : exact).replace('-', '\u2212');
}
