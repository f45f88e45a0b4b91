import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { readDispersion } from './dispersion.ts';
import { isRecord, numberIn } from './json.ts';

const FILE = new URL('./cases.json', import.meta.url);
/** Printed figures end on a digit; this keeps the conversion to binary from counting as a miss. */
const BINARY = 1e-12;
/** Relative agreement with the forty-digit computation, for indices, Abbe numbers and partial dispersions alike. */
const COMPUTED = 1e-12;

interface Case {
  readonly id: string;
  readonly kind: string;
  readonly input: Record<string, unknown>;
  readonly expected: Record<string, { readonly value: number; readonly tolerance: number }>;
  readonly computed: { readonly values: Record<string, number> };
}

const cases = (JSON.parse(readFileSync(FILE, 'utf8')) as readonly Case[]).filter(
  ({ kind }) => kind === 'dispersion',
);

describe('published dispersion', () => {
  it.each(cases)('of $title comes out to the printed digits, nothing left out', ({ input, expected }) => {
    const reader = readDispersion(input);
    for (const [quantity, { value, tolerance }] of Object.entries(expected)) {
      const got = reader?.(quantity)?.value;
      const miss = got?.ok ? Math.abs(got.value - value) : Number.NaN;
      expect(miss, quantity).toBeLessThanOrEqual(tolerance + BINARY * value);
    }
  });

  it.each(cases)('of $title agrees with a computation in forty digits', ({ input, computed }) => {
    const reader = readDispersion(input);
    const names = Object.keys(computed.values);
    expect(names.length).toBeGreaterThan(0);
    for (const quantity of names) {
      const wanted = numberIn(computed.values, quantity) ?? Number.NaN;
      const got = reader?.(quantity)?.value;
      const miss = got?.ok ? Math.abs(got.value - wanted) : Number.NaN;
      expect(miss, quantity).toBeLessThanOrEqual(COMPUTED * Math.abs(wanted));
    }
  });

  it('is read from the catalogue and from kind and coefficients as well', () => {
    const bk7 = cases.find(({ id }) => id === 'n-bk7');
    const wanted = bk7?.computed.values.V_e ?? Number.NaN;
    const named = { kind: 'cauchy', coefficients: [1.5, 0.005, -2] };
    const got = readDispersion({ material: 'n-bk7' })?.('V_e')?.value;
    expect(got?.ok && Math.abs(got.value / wanted - 1)).toBeLessThanOrEqual(COMPUTED);
    expect(readDispersion({ formula: named })?.('n(500)')?.value).toEqual({ ok: true, value: 1.52 });
  });

  it('is left alone where the formula or the quantity is not understood', () => {
    expect(readDispersion({ formula: 'n = 7', B: [1], C: [2] })).toBeNull();
    expect(readDispersion({ formula: { kind: 'odd', coefficients: [1] } })).toBeNull();
    expect(readDispersion({ material: 'n-bk7' })?.('efl')).toBeNull();
    expect(readDispersion({})?.('efl')).toBeNull();
    expect(isRecord(readDispersion({})?.('d')?.value)).toBe(true);
  });
});
