import type { Fault } from '../outcome.ts';
import type { Part } from './types.ts';

/** A number as it stands in a sentence: all its digits, a real minus sign, thousands apart from 10,000 on. */
export function numberText(value: number): string {
  if (Number.isNaN(value)) return 'not a number';
  if (!Number.isFinite(value)) return value > 0 ? 'infinite' : 'minus infinity';
  const [whole = '', rest] = String(Math.abs(value)).replace('e+', 'e').replace('e-', 'e−').split('.');
  const grouped = /^\d{5,}$/.test(whole) ? whole.replace(/\B(?=(\d{3})+$)/g, ',') : whole;
  return (value < 0 ? '−' : '') + grouped + (rest === undefined ? '' : `.${rest}`);
}

/** A number with its unit; the unit is left out where there is no number. */
export const quantityText = (value: number, unit: string): string =>
  Number.isFinite(value) && unit !== ''
    ? `${numberText(value)}${unit === '°' ? '' : ' '}${unit}`
    : numberText(value);

/** What an unknown value looks like in a sentence: text in quotes, cut when long; lists and objects by their kind. */
export function valueText(value: unknown): string {
  if (typeof value === 'number') return numberText(value);
  if (typeof value === 'string') return quoted(value);
  if (value === null) return 'empty (null)';
  if (Array.isArray(value)) return 'a list';
  if (typeof value === 'object') return 'an object';
  return String(value);
}

const LONGEST_QUOTE = 40;

/** The text in quotation marks, cut after 40 characters. */
export const quoted = (text: string): string =>
  `“${text.length > LONGEST_QUOTE ? `${text.slice(0, LONGEST_QUOTE - 1)}…` : text}”`;

const KIND_NAMES = { thin: 'element', stop: 'stop', plate: 'plate', glass: 'glass' } as const;

/** What a part is called: its name, or its kind and number along the axis. */
export const partName = (part: Pick<Part, 'name' | 'kind'>, index: number): string =>
  part.name.trim() || `${KIND_NAMES[part.kind]} ${index + 1}`;

/** The text with a capital at its beginning. */
export const capitalised = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);

/** What a part is called in a sentence: its name in quotes, or its number along the axis. */
export const partLabel = (part: Pick<Part, 'name'> | undefined, index: number): string =>
  part === undefined || part.name === '' ? `part ${index + 1}` : quoted(part.name);

/** At most `most` faults; what is left out is counted in a last one. */
export function capped(faults: readonly Fault[], most = 50): readonly Fault[] {
  if (faults.length <= most) return faults;
  const left = faults.length - most + 1;
  return [...faults.slice(0, most - 1), { path: '', sentence: `There are ${numberText(left)} more faults.` }];
}
