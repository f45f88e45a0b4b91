import { freshGroupId } from '../create.ts';
import type { GroupId, PartId, Sketch } from '../types.ts';
import { withField, withoutTies } from './change.ts';

/** Ties parts into a group that moves as one; they leave the groups they were in. Fewer than two parts change nothing. */
export function tieParts(sketch: Sketch, ids: readonly PartId[], name: string): Sketch {
  const partIds = sketch.parts.filter((part) => ids.includes(part.id)).map((part) => part.id);
  if (partIds.length < 2) return sketch;
  const same = sketch.groups.find(
    (group) => group.partIds.length === partIds.length && group.partIds.every((id) => partIds.includes(id)),
  );
  if (same !== undefined) return renameGroup(sketch, same.id, name);
  const loose = withoutTies(sketch, new Set(partIds));
  return { ...loose, groups: [...loose.groups, { id: freshGroupId(loose), name, partIds }] };
}

/** Lets the parts of a group move singly again. */
export function untie(sketch: Sketch, groupId: GroupId): Sketch {
  const groups = sketch.groups.filter((group) => group.id !== groupId);
  return groups.length === sketch.groups.length ? sketch : { ...sketch, groups };
}

/** Sets the name of a group. */
export const renameGroup = (sketch: Sketch, groupId: GroupId, name: string): Sketch =>
  withField(
    sketch,
    'groups',
    sketch.groups.map((group) => (group.id === groupId ? withField(group, 'name', name) : group)),
  );
