import type { Fault } from '../outcome.ts';
import { pathText } from './issues.ts';
import { MOST } from './limits.ts';
import { numberText, quoted } from './words.ts';

/** A sketch is never nested deeper; what lies below is refused by the schema for its kind. */
const DEEPEST = 8;
/** No object of a sketch has more entries: one for each position and some to spare. */
const MOST_ENTRIES = 100;

/**
 * What must be refused before a file is read entry by entry: lists and objects beyond any measure, and names that
 * every object has of itself, as "__proto__". Bounded work on any JSON value.
 */
export function treeFaults(body: unknown): readonly Fault[] {
  const faults: Fault[] = [];
  visit(body, [], faults);
  return faults;
}

function visit(value: unknown, keys: readonly (string | number)[], faults: Fault[]): void {
  if (typeof value !== 'object' || value === null || keys.length > DEEPEST) return;
  if (Array.isArray(value)) {
    const most = mostIn(keys);
    if (value.length > most) {
      const sentence = `The list “${pathText(keys)}” has ${numberText(value.length)} entries; it must have at most ${most}.`;
      faults.push({ path: pathText(keys), sentence });
      return;
    }
    for (const [index, item] of value.entries()) visit(item, [...keys, index], faults);
    return;
  }
  const names = Object.keys(value);
  if (names.length > MOST_ENTRIES) {
    const where = keys.length === 0 ? 'The sketch' : `The entry “${pathText(keys)}”`;
    const sentence = `${where} has ${numberText(names.length)} entries; it must have at most ${MOST_ENTRIES}.`;
    faults.push({ path: pathText(keys), sentence });
    return;
  }
  for (const name of names) {
    const at = [...keys, name];
    if (name in {})
      faults.push({
        path: pathText(at),
        sentence: `The entry ${quoted(name)} is unknown; it must be left out.`,
      });
    else visit((value as Record<string, unknown>)[name], at, faults);
  }
}

function mostIn(keys: readonly (string | number)[]): number {
  const key = keys.at(-1);
  if (key === 'partIds') return MOST.parts;
  return typeof key === 'string' && Object.hasOwn(MOST, key) ? MOST[key as keyof typeof MOST] : MOST_ENTRIES;
}
