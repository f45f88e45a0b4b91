import type * as v from 'valibot';
import type { Fault } from '../outcome.ts';
import { LIMITS, type Limit } from './limits.ts';
import { partLabel, quoted, valueText } from './words.ts';

type Key = string | number;

/** A fault for a schema issue found under `at`; `owner` is the entry of the file that stands there. */
export function faultOfIssue(issue: v.BaseIssue<unknown>, at: readonly Key[], root: unknown): Fault {
  const items = issue.path ?? [];
  const keys = [...at, ...items.map((item) => item.key as Key)];
  const path = pathText(keys);
  const last = items.at(-1);
  if (last?.origin === 'key' && issue.expected === 'never')
    return { path, sentence: `${unknownEntry(keys, root)}; it must be left out, or its name corrected.` };
  const subject = subjectOf(keys, root);
  if (last?.origin === 'key')
    return { path, sentence: `${subject} is missing; it must be ${allowedText(keys, null)}.` };
  return {
    path,
    sentence: `${subject} is ${valueText(issue.input)}; it must be ${allowedText(keys, issue.expected)}.`,
  };
}

/** A sentence's beginning for an entry that a sketch does not have. */
export const unknownEntry = (keys: readonly Key[], root: unknown): string =>
  `The entry ${quoted(String(keys.at(-1)))}${ownerText(keys, root)} is unknown`;

/** `parts[2].space.lengthMm` from the keys that lead there. */
export function pathText(keys: readonly Key[]): string {
  let path = '';
  for (const key of keys) path += typeof key === 'number' ? `[${key}]` : path === '' ? key : `.${key}`;
  return path;
}

const WORDS: Readonly<Record<string, string>> = {
  fNumber: 'f-number',
  diameterMm: 'aperture diameter',
  mainNm: 'main wavelength',
  shortNm: 'short wavelength',
  longNm: 'long wavelength',
  fractions: 'list of field fractions',
  notes: 'text of the notes',
  lines: 'set of wavelengths',
  size: 'size',
  partIds: 'list of parts',
  parts: 'list of parts',
  positions: 'list of positions',
  groups: 'list of groups',
  image: 'image plane',
};

const ALLOWED: Readonly<Record<string, string>> = {
  medium:
    '“air”, or an object with material, with code, with name, formula and rangeNm, or with name, index and abbeNumber',
  fractions: LIMITS.fraction.allowed,
  fNumber: LIMITS.workingFNumber.allowed,
  diameterMm: LIMITS.stopDiameterMm.allowed,
  mainNm: LIMITS.wavelengthNm.allowed,
  shortNm: LIMITS.wavelengthNm.allowed,
  longNm: LIMITS.wavelengthNm.allowed,
};

const TEXTS: ReadonlySet<string> = new Set(['title', 'notes', 'name', 'note']);

const limitOf = (key: string): Limit | undefined =>
  Object.hasOwn(LIMITS, key) ? LIMITS[key as keyof typeof LIMITS] : undefined;

/** The name of the field: the last key that is one, not a place in a list nor a position's id. */
function fieldKey(keys: readonly Key[]): string {
  const perPosition = keys.at(-2);
  if (typeof perPosition === 'string' && /^(lengthMm|distanceMm|diameterMm)$/.test(perPosition))
    return perPosition;
  return String(keys.findLast((key) => typeof key === 'string') ?? '');
}

/** Fields that need no "of the …" after their name. */
const SELF_EXPLAINING = /^(distanceMm|vignetting|fractions|na|fNumber|diameterMm|mainNm|shortNm|longNm)$/;

function subjectOf(keys: readonly Key[], root: unknown): string {
  const key = fieldKey(keys);
  const words = WORDS[key] ?? limitOf(key)?.words ?? (/^[a-z]+$/.test(key) ? key : quoted(key));
  const last = keys.at(-1);
  const owner =
    SELF_EXPLAINING.test(key) || (keys.length === 2 && typeof last === 'number') ? '' : ownerText(keys, root);
  if (typeof last === 'number') return `Entry ${last + 1} of the ${words}${owner}`;
  const position = last !== key && last !== undefined ? ` at position ${quoted(last)}` : '';
  return `The ${words}${key === 'lengthMm' ? owner.replace(/^ of/, ' behind') : owner}${position}`;
}

function ownerText(keys: readonly Key[], root: unknown): string {
  const [section, index] = keys;
  if (keys.length < 2 || typeof section !== 'string') return '';
  if (typeof index !== 'number') return ` of the ${section}`;
  if (section === 'parts') {
    const name = entry(entry(entry(root, 'parts'), index), 'name');
    return ` of ${partLabel({ name: typeof name === 'string' ? name : '' }, index)}`;
  }
  return ` of ${section.replace(/s$/, '')} ${index + 1}`;
}

function allowedText(keys: readonly Key[], expected: string | null): string {
  const key = fieldKey(keys);
  const orNull = isNullable(keys) ? ', or null' : '';
  if (expected !== null && (key === 'kind' || expected === 'Array')) return expectedText(expected);
  const allowed = ALLOWED[key] ?? (expected === 'Object' ? undefined : limitOf(key)?.allowed);
  if (allowed !== undefined)
    return (/^(above|between|from)/.test(allowed) ? 'a number ' : '') + allowed + orNull;
  if (expected === null) return TEXTS.has(key) ? 'text, which may be empty' : 'there';
  return expectedText(expected) + orNull;
}

/** The fields that may be empty; an index only where it is that of a thin part. */
function isNullable(keys: readonly Key[]): boolean {
  const key = keys.at(-1);
  if (key === 'index') return keys.length === 3;
  return (
    typeof key === 'string' &&
    /^(semiDiameterMm|abbeNumber|pixelPitchMm|registerMm|blurMm|stop|sensor)$/.test(key)
  );
}

const KINDS: Readonly<Record<string, string>> = {
  number: 'a number',
  string: 'text',
  Array: 'a list',
  Object: 'an object',
};

function expectedText(expected: string): string {
  const kinds = expected
    .replace(/[()]/g, '')
    .split(' | ')
    .map((kind) => KINDS[kind] ?? kind.replace(/^"(.*)"$/, '“$1”'));
  const last = kinds.pop() ?? '';
  return kinds.length === 0 ? last : `${kinds.join(', ')} or ${last}`;
}

function entry(of: unknown, key: Key): unknown {
  return typeof of === 'object' && of !== null ? (of as Record<Key, unknown>)[key] : undefined;
}
