import { fc, test } from '@fast-check/vitest';
import { describe, expect, it } from 'vitest';
import type { EntryUnit } from '../../../app/ui/entry.ts';
import { formatEntry, parseEntry } from '../../../app/ui/entry.ts';

/** A converted number is cut to 15 digits: half a unit of the fifteenth, and the roundings beside it. */
const FIFTEEN_DIGITS = 1e-14;

const read = (text: string, unit: EntryUnit = 'mm', current: number | null = 10) =>
  parseEntry(text, { unit, current });

const numberFrom = (text: string, unit?: EntryUnit, current?: number | null) => {
  const entry = read(text, unit, current);
  if (!entry.ok) throw new Error(entry.why);
  return entry.value;
};

const faultOf = (text: string, unit?: EntryUnit, current?: number | null) => {
  const entry = read(text, unit, current);
  return entry.ok ? `read as ${entry.value}` : entry.why;
};

describe('parseEntry reads', () => {
  it.each([
    ['41.2', 41.2],
    ['41,2', 41.2],
    ['.5', 0.5],
    ['7.', 7],
    ['1.5e2', 150],
    [' 41.2 mm ', 41.2],
    ['2 cm', 20],
    ['0.5 m', 500],
    ['3.45 µm', 0.00345],
    ['3.45 um', 0.00345],
    ['1 in', 25.4],
    ['1"', 25.4],
    ['2″', 50.8],
    ['3/8 in', 9.525],
    ['1 in + 1 mm', 26.4],
    ['(1 + 2) * 3', 9],
    ['2×3', 6],
    ['10 ÷ 4', 2.5],
    ['41.2 mm / 2', 20.6],
  ])('%s in a length field', (text, lengthMm) => {
    expect(numberFrom(text)).toBeCloseTo(lengthMm, 12);
  });

  it('a leading plus as "add to the present value"', () => {
    expect(numberFrom('+1.2', 'mm', 40)).toBeCloseTo(41.2, 12);
    expect(numberFrom('+-1.2', 'mm', 41.2)).toBeCloseTo(40, 12);
    expect(numberFrom('+0.1 in', 'mm', 1)).toBeCloseTo(3.54, 12);
  });

  it('a leading minus always as a negative value', () => {
    expect(numberFrom('-46')).toBe(-46);
    expect(numberFrom('−46')).toBe(-46);
    expect(numberFrom('41-1.2')).toBeCloseTo(39.8, 12);
  });

  it('a bare number in the unit of the field', () => {
    expect(numberFrom('1', 'in')).toBe(25.4);
    expect(numberFrom('3.45', 'µm')).toBe(0.00345);
    expect(numberFrom('30', '%')).toBeCloseTo(0.3, 15);
    expect(numberFrom('0.546 µm', 'nm')).toBe(546);
    expect(numberFrom('0.1 rad', '°')).toBeCloseTo(5.729577951308232, 12);
  });

  it('infinity only where it is allowed', () => {
    expect(parseEntry('∞', { unit: 'mm', current: 1, allowInfinity: true })).toEqual({
      ok: true,
      value: Infinity,
    });
    expect(parseEntry('inf', { unit: 'mm', current: 1, allowInfinity: true }).ok).toBe(true);
    expect(faultOf('infinity')).toBe('This value must be finite; type a number.');
  });
});

describe('parseEntry refuses in one sentence', () => {
  it.each([
    ['', 'Type a number, such as 41.2, 41-1.2, 3/8 in or +0.5.'],
    ['abc', '“abc” is not a number this field reads; try 41.2, 41-1.2, 3/8 in or +0.5.'],
    ['1,234.5', '“1,234.5” is not a number this field reads; try 41.2, 41-1.2, 3/8 in or +0.5.'],
    ['4 furlong', 'This field does not know the unit “furlong”.'],
    ['4 constructor', 'This field does not know the unit “constructor”.'],
    ['1/0', 'Nothing can be divided by zero.'],
    ['2 mm * 3 mm', 'A length times a length is not a length.'],
    ['(1 + 2', 'A bracket is not closed.'],
    ['1e999', '“1e999” is too large a number.'],
    ['9'.repeat(200), 'An entry has at most 120 characters.'],
  ])('%s', (text, sentence) => {
    expect(faultOf(text)).toBe(sentence);
  });

  it('a sum with a present value that is not there', () => {
    expect(faultOf('+1', 'mm', null)).toBe('There is no present value to add to; type the value itself.');
    expect(faultOf('+1', 'mm', Infinity)).toBe('There is no present value to add to; type the value itself.');
  });

  test.prop([fc.string({ maxLength: 140 })])(
    'and never throws or gives a number that is not finite',
    (text) => {
      const entry = read(text);
      if (entry.ok) expect(Number.isFinite(entry.value)).toBe(true);
      else expect(entry.why).toMatch(/\.$/);
    },
  );

  test.prop([fc.array(fc.constantFrom(...'0123456789.,+-*/()emin "'), { maxLength: 60 })])(
    'nor does any heap of the characters it knows',
    (characters) => {
      const entry = read(characters.join(''));
      if (entry.ok) expect(Number.isFinite(entry.value)).toBe(true);
    },
  );
});

describe('formatEntry', () => {
  it('shows all stored digits', () => {
    expect(formatEntry(41.2187245423499, 'mm')).toBe('41.2187245423499');
    expect(formatEntry(-32, 'mm')).toBe('−32');
    expect(formatEntry(0.00345, 'µm')).toBe('3.45');
    expect(formatEntry(Infinity, 'mm')).toBe('∞');
  });

  /** Numbers so small that they are denormal have no full precision to keep. */
  const anyFinite = fc
    .double({ noNaN: true, noDefaultInfinity: true, min: -1e9, max: 1e9 })
    .map((value) => (Math.abs(value) < 1e-300 ? 0 : value));

  test.prop([anyFinite])('is read back as the very same millimetres', (value) => {
    expect(numberFrom(formatEntry(value, 'mm')) + 0).toBe(value + 0);
  });

  test.prop([anyFinite, fc.constantFrom<EntryUnit>('in', 'µm', '%', '°', 'nm', '')])(
    'is read back in every other unit to 15 digits',
    (value, unit) => {
      const back = numberFrom(formatEntry(value, unit), unit);
      expect(Math.abs(back - value)).toBeLessThanOrEqual(FIFTEEN_DIGITS * Math.abs(value));
    },
  );
});
