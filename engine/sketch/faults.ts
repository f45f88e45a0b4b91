import type { Fault } from '../outcome.ts';
import { keeps, LIMITS, type Limit, LONGEST_TEXT } from './limits.ts';
import type { ObjectDistance, PerPosition, Sketch } from './types.ts';
import { quantityText, quoted, valueText } from './words.ts';

/* What the rules are made of: each adds to a list of faults, with a path and a sentence, what it finds broken. */

type Owner = () => { readonly path: string; readonly subject: string };

/** A value for all positions or one for each: every one within its limit, none missing, none for an unknown position. */
export function valueFaults(
  faults: Fault[],
  { positions }: Sketch,
  limit: Limit,
  value: PerPosition<ObjectDistance>,
  owner: Owner,
): void {
  if (typeof value !== 'object') {
    if (soundAt(limit, value)) return;
    const { path, subject } = owner();
    faults.push({ path, sentence: outside(subject, limit, value) });
    return;
  }
  for (let index = 0; index < positions.length; index++) {
    const position = positions[index];
    if (position === undefined || soundAt(limit, value[position.id])) continue;
    const own = value[position.id];
    const { path, subject } = owner();
    const at = `${subject} at position ${quoted(position.name || position.id)}`;
    const missing = `${at} is missing; it must be ${limit.allowed}.`;
    faults.push({
      path: `${path}.${position.id}`,
      sentence: own === undefined ? missing : outside(at, limit, own),
    });
  }
  const keys = Object.keys(value);
  if (keys.length <= positions.length && faults.length === 0) return;
  for (const key of keys) {
    if (positions.some((position) => position.id === key)) continue;
    const { path, subject } = owner();
    faults.push({
      path: `${path}.${key}`,
      sentence: `${subject} has a value for ${quoted(key)}; it must have one for each position of the sketch and no other.`,
    });
  }
}

function soundAt(limit: Limit, value: ObjectDistance | undefined): boolean {
  return typeof value === 'number'
    ? keeps(limit, value)
    : value === 'infinity' && limit === LIMITS.distanceMm;
}

function outside(subject: string, limit: Limit, value: ObjectDistance): string {
  const text = typeof value === 'number' ? quantityText(value, limit.unit) : valueText(value);
  return `${subject} is ${text}; it must be ${limit.allowed}.`;
}

/** Adds a fault when the number breaks its limit. */
export function numberFault(
  faults: Fault[],
  limit: Limit,
  value: number,
  path: string,
  owner?: string,
): void {
  if (keeps(limit, value)) return;
  const subject = owner === undefined ? `The ${limit.words}` : `The ${limit.words} of ${owner}`;
  faults.push({ path, sentence: outside(subject, limit, value) });
}

/** Adds a fault when the text is too long. */
export function textFault(
  faults: Fault[],
  path: string,
  subject: string,
  text: string,
  longest: number,
): void {
  if (text.length <= longest) return;
  faults.push({
    path,
    sentence: `${subject} has ${quantityText(text.length, '')} characters; it must have at most ${quantityText(longest, '')}.`,
  });
}

/** Adds a fault when a list is too short or too long. */
export function countFault(
  faults: Fault[],
  path: string,
  what: string,
  count: number,
  least: number,
  most: number,
): void {
  if (count >= least && count <= most) return;
  const allowed = least === 0 ? `at most ${most}` : `between ${least} and ${most}`;
  faults.push({
    path,
    sentence: `The number of ${what} is ${quantityText(count, '')}; it must be ${allowed}.`,
  });
}

const ID = /^[A-Za-z][A-Za-z0-9_-]*$/;

/** Adds a fault for each id that is taken or not usable. */
export function idFaults(
  faults: Fault[],
  path: string,
  what: string,
  items: readonly { readonly id: string }[],
): void {
  const seen = new Set<string>();
  for (let index = 0; index < items.length; index++) {
    const id = items[index]?.id ?? '';
    if (seen.has(id))
      faults.push({
        path: `${path}[${index}].id`,
        sentence: `The id ${quoted(id)} of ${what} ${index + 1} is taken; each ${what} must have an id of its own.`,
      });
    seen.add(id);
    // Names that every object has would be found where no value was given.
    if (ID.test(id) && id.length <= LONGEST_TEXT.id && !(id in {})) continue;
    faults.push({
      path: `${path}[${index}].id`,
      sentence: `The id ${quoted(id)} of ${what} ${index + 1} is not usable; it must be a letter followed by letters, digits, “-” or “_”, at most ${LONGEST_TEXT.id} in all.`,
    });
  }
}
