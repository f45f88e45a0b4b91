import type { ObjectDistance, PerPosition, Position, PositionId, Setting } from './types.ts';

type Plain = number | ObjectDistance;
type Split<T> = { readonly [position: PositionId]: T };

/** True when one value holds at all positions. */
export function isCommon<T extends Plain>(value: PerPosition<T>): value is T {
  return typeof value !== 'object';
}

/** The setting that stands on a position. */
export const settingAt = (position: PositionId): Setting => ({ at: position, toNext: 0 });

/** The value at one position. Throws when the position has none: a sketch without faults has one for each. */
export function valueOn<T extends Plain>(value: PerPosition<T>, position: PositionId): T {
  if (isCommon(value)) return value;
  const own = (value as Split<T>)[position];
  if (own === undefined) throw new Error(`valueOn: no value at position ${position}`);
  return own;
}

/**
 * The value at a setting: exact on a position, a monotone cubic over the list of positions between two of them
 * (never beyond the values on either side, no corner on a position). A setting that names no position of the list
 * is taken as the first, one beyond the last as the last.
 * Slopes after Fritsch and Butland, SIAM J. Sci. Stat. Comput. 5, 300 (1984).
 */
export function valueAt(value: PerPosition, positions: readonly Position[], setting: Setting): number {
  if (isCommon(value)) return value;
  const from = indexOfPosition(positions, setting.at);
  if (!isBetween(positions, from, setting)) return valueOn(value, idAt(positions, from));
  return interpolate(
    (index) => valueOn(value, idAt(positions, index)),
    positions.length,
    from,
    setting.toNext,
  );
}

/** The object distance at a setting. Between positions its reciprocal is interpolated, infinity counting as 0. */
export function objectDistanceAt(
  value: PerPosition<ObjectDistance>,
  positions: readonly Position[],
  setting: Setting,
): ObjectDistance {
  if (isCommon(value)) return value;
  const from = indexOfPosition(positions, setting.at);
  if (!isBetween(positions, from, setting)) return valueOn(value, idAt(positions, from));
  const reciprocal = (index: number): number => {
    const distance = valueOn(value, idAt(positions, index));
    return distance === 'infinity' ? 0 : 1 / distance;
  };
  const vergence = interpolate(reciprocal, positions.length, from, setting.toNext);
  return vergence === 0 ? 'infinity' : 1 / vergence;
}

/** The value changed at one position, or at all of them when it is common; the same object when nothing changes. */
export function withValue<T extends Plain>(
  value: PerPosition<T>,
  position: PositionId,
  next: T,
): PerPosition<T> {
  if (isCommon(value)) return value === next ? value : unsigned(next);
  const own = value as Split<T>;
  return own[position] === next ? value : { ...own, [position]: unsigned(next) };
}

/** 0 for −0, which a file could not give back. */
const unsigned = <T extends Plain>(value: T): T => (value === 0 ? (0 as T) : value);

/** The value with `change` applied on every position; the same object when nothing changes. */
export function everyPosition<T extends Plain>(
  value: PerPosition<T>,
  change: (value: T) => T,
): PerPosition<T> {
  if (isCommon(value)) return unsigned(change(value));
  let changed = false;
  const next: Record<PositionId, T> = {};
  for (const id of Object.keys(value) as PositionId[]) {
    const before = valueOn(value, id);
    next[id] = unsigned(change(before));
    changed ||= next[id] !== before;
  }
  return changed ? next : value;
}

/** Two values combined position by position: common when both are. */
export function combineValues<A extends Plain, B extends Plain, T extends Plain>(
  a: PerPosition<A>,
  b: PerPosition<B>,
  positions: readonly Position[],
  combine: (a: A, b: B) => T,
): PerPosition<T> {
  if (isCommon(a) && isCommon(b)) return unsigned(combine(a, b));
  const next: Record<PositionId, T> = {};
  for (const { id } of positions) next[id] = unsigned(combine(valueOn(a, id), valueOn(b, id)));
  return next;
}

/** A common value given to each position; one that is split already stays as it is. */
export function splitValue<T extends Plain>(
  value: PerPosition<T>,
  positions: readonly Position[],
): PerPosition<T> {
  if (!isCommon(value)) return value;
  return Object.fromEntries(positions.map(({ id }) => [id, value]));
}

/** The value of one position made common to all. */
export const joinValue = <T extends Plain>(value: PerPosition<T>, position: PositionId): PerPosition<T> =>
  isCommon(value) ? value : valueOn(value, position);

/** Index of a position in the list; that of the first when it is not there. */
export function indexOfPosition(positions: readonly Position[], id: PositionId): number {
  for (let index = 0; index < positions.length; index++) if (positions[index]?.id === id) return index;
  return 0;
}

const isBetween = (positions: readonly Position[], from: number, setting: Setting): boolean =>
  setting.toNext > 0 && from < positions.length - 1;

function idAt(positions: readonly Position[], index: number): PositionId {
  const position = positions[index];
  if (position === undefined) throw new Error(`idAt: no position number ${index} of ${positions.length}`);
  return position.id;
}

function interpolate(at: (index: number) => number, count: number, from: number, share: number): number {
  const start = at(from);
  const end = at(from + 1);
  const rise = end - start;
  const riseBefore = from > 0 ? start - at(from - 1) : null;
  const riseBehind = from + 2 < count ? at(from + 2) - end : null;
  const slopeStart = riseBefore === null ? endSlope(rise, riseBehind) : innerSlope(riseBefore, rise);
  const slopeEnd = riseBehind === null ? endSlope(rise, riseBefore) : innerSlope(rise, riseBehind);
  const bend = 3 * rise - 2 * slopeStart - slopeEnd;
  const twist = slopeStart + slopeEnd - 2 * rise;
  const value = start + share * (slopeStart + share * (bend + share * twist));
  return Math.min(Math.max(value, Math.min(start, end)), Math.max(start, end));
}

/** Harmonic mean of two rises, 0 at a turning point. */
function innerSlope(before: number, behind: number): number {
  if (before === 0 || behind === 0 || before > 0 !== behind > 0) return 0;
  return (2 * before) / (1 + before / behind);
}

/** One-sided slope through three points, kept within what leaves the first stretch monotone. */
function endSlope(rise: number, neighbour: number | null): number {
  if (neighbour === null) return rise;
  const slope = 1.5 * rise - 0.5 * neighbour;
  if (rise === 0 || slope > 0 !== rise > 0) return 0;
  return Math.abs(slope) > 3 * Math.abs(rise) ? 3 * rise : slope;
}
