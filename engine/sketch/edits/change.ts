import type { Group, Part, PartId, PerPosition, Sketch, Space } from '../types.ts';

/** The record with one entry changed; the same object when the entry holds the same data already. −0 is stored as 0. */
export function withField<T extends object, K extends keyof T>(record: T, key: K, value: T[K]): T {
  return sameData(record[key], value) ? record : { ...record, [key]: value === 0 ? 0 : value };
}

/** The record with several entries changed; the same object when all hold these data already. */
export function withFields<T extends object>(record: T, changes: Partial<T>): T {
  let next = record;
  for (const key of Object.keys(changes) as (keyof T)[])
    next = withField(next, key, changes[key] as T[keyof T]);
  return next;
}

/** The sketch with one part changed; the same object when the part does not exist or `change` gives it back. */
export function changePart(sketch: Sketch, partId: PartId, change: (part: Part) => Part): Sketch {
  return changePartAt(sketch, indexOfPart(sketch, partId), change);
}

/** As `changePart`, by the part's place in the list; a place that does not exist changes nothing. */
function changePartAt(sketch: Sketch, index: number, change: (part: Part) => Part): Sketch {
  const part = sketch.parts[index];
  if (part === undefined) return sketch;
  const next = change(part);
  return next === part ? sketch : { ...sketch, parts: sketch.parts.with(index, next) };
}

/** The sketch with the space behind a part changed. */
export const changeSpaceAt = (sketch: Sketch, index: number, change: (space: Space) => Space): Sketch =>
  changePartAt(sketch, index, (part) => withSpace(part, change(part.space)));

/** The part with another space behind it; the same object when it is the same space. */
export const withSpace = (part: Part, space: Space): Part =>
  part.space === space ? part : { ...part, space };

/** The part with another length of the space behind it. */
export const withGap = (part: Part, lengthMm: PerPosition): Part =>
  part.space.lengthMm === lengthMm ? part : { ...part, space: { ...part.space, lengthMm } };

/** Index of a part along the axis, −1 when there is none of that id. */
export const indexOfPart = (sketch: Sketch, partId: PartId | null): number =>
  sketch.parts.findIndex((part) => part.id === partId);

/** The ids with every part added that is tied to one of them. Order follows the axis. */
export function withGroups(sketch: Sketch, ids: readonly PartId[]): readonly PartId[] {
  const wanted = new Set(ids);
  for (const group of sketch.groups)
    if (group.partIds.some((id) => wanted.has(id))) for (const id of group.partIds) wanted.add(id);
  return sketch.parts.filter((part) => wanted.has(part.id)).map((part) => part.id);
}

/** Takes parts out of all groups; a group of fewer than two parts falls apart. */
export function withoutTies(sketch: Sketch, ids: ReadonlySet<PartId>): Sketch {
  const tied = (group: Group): boolean => group.partIds.some((id) => ids.has(id));
  if (!sketch.groups.some(tied)) return sketch;
  const groups = sketch.groups
    .map((group) => (tied(group) ? { ...group, partIds: group.partIds.filter((id) => !ids.has(id)) } : group))
    .filter((group) => group.partIds.length > 1);
  return { ...sketch, groups };
}

function sameData(a: unknown, b: unknown): boolean {
  if (a === b) return true;
  if (typeof a !== 'object' || typeof b !== 'object' || a === null || b === null) return false;
  const keys = Object.keys(a);
  if (keys.length !== Object.keys(b).length || Array.isArray(a) !== Array.isArray(b)) return false;
  return keys.every(
    (key) =>
      Object.hasOwn(b, key) &&
      sameData((a as Record<string, unknown>)[key], (b as Record<string, unknown>)[key]),
  );
}
