import { fc, test } from '@fast-check/vitest';
import { describe, expect, it } from 'vitest';
import { formatLength, formatNumber, formatOutcome } from '../../../app/ui/format.ts';
import { none, some } from '../../../engine/index.ts';

describe('formatNumber', () => {
  it('writes fixed decimals and a real minus sign', () => {
    expect(formatNumber(41.19751, 3)).toBe('41.198');
    expect(formatNumber(-0.08, 4)).toBe('−0.0800');
    expect(formatNumber(5.6, 2)).toBe('5.60');
  });

  it('writes no minus sign before a value that rounds to zero', () => {
    expect(formatNumber(-0.0004, 3)).toBe('0.000');
    expect(formatNumber(-0, 3)).toBe('0.000');
  });

  it('writes very large values as a power of ten', () => {
    expect(formatNumber(-12_345_678.9, 3)).toBe('−1.235×10⁷');
    expect(formatNumber(1e300, 3)).toBe('1.000×10³⁰⁰');
  });

  it('has a sign for infinity and a dash for what is not a number', () => {
    expect(formatNumber(Infinity, 3)).toBe('∞');
    expect(formatNumber(-Infinity, 3)).toBe('−∞');
    expect(formatNumber(Number.NaN, 3)).toBe('–');
  });

  test.prop([fc.double(), fc.integer({ min: 0, max: 8 })])(
    'never says NaN, undefined or minus zero, whatever the number',
    (value, digits) => {
      const text = formatNumber(value, digits);
      expect(text).not.toMatch(/nan|undefined|null|-/i);
      expect(text).not.toMatch(/^−0(\.0*)?$/);
    },
  );

  test.prop([fc.double({ min: 100, max: 999, noNaN: true }), fc.integer({ min: 0, max: 6 })])(
    'keeps its width while a value is dragged within one power of ten',
    (value, digits) => {
      expect(formatNumber(value, digits).length).toBe(formatNumber(100, digits).length);
    },
  );
});

describe('formatLength', () => {
  it('shows three decimals of a millimetre, or five of an inch, unless told otherwise', () => {
    expect(formatLength(25.4, 'mm')).toBe('25.400');
    expect(formatLength(25.4, 'in')).toBe('1.00000');
    expect(formatLength(12.7, 'in', 1)).toBe('0.500');
  });
});

describe('formatOutcome', () => {
  it('gives the reason in words where there is no value', () => {
    const threeDigits = (value: number) => formatNumber(value, 3);
    expect(formatOutcome(some(1.5), threeDigits)).toBe('1.500');
    expect(formatOutcome(none('afocal'), threeDigits)).toBe('afocal');
  });
});
