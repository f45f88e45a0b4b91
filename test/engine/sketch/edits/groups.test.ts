import { describe, expect, test } from 'vitest';
import { withGroups } from '../../../../engine/sketch/edits/change.ts';
import { renameGroup, tieParts, untie } from '../../../../engine/sketch/edits/groups.ts';
import type { GroupId } from '../../../../engine/sketch/types.ts';
import { id, row } from '../layout.ts';

const front = () => tieParts(row(1, 1, 1, 1), [id('p2'), id('p1')], 'front');

describe('tying parts into a group', () => {
  test('names them in the order along the axis', () => {
    expect(front().groups).toEqual([{ id: 'g1', name: 'front', partIds: ['p1', 'p2'] }]);
  });

  test('takes them out of the groups they were in; a group of one falls apart', () => {
    expect(tieParts(front(), [id('p2'), id('p3')], 'middle').groups).toEqual([
      { id: 'g1', name: 'middle', partIds: ['p2', 'p3'] },
    ]);
  });

  test('of the same parts again only renames the group', () => {
    expect(tieParts(front(), [id('p1'), id('p2')], 'first').groups).toEqual([
      { id: 'g1', name: 'first', partIds: ['p1', 'p2'] },
    ]);
    const sketch = front();
    expect(tieParts(sketch, [id('p1'), id('p2')], 'front')).toBe(sketch);
  });

  test('needs two parts', () => {
    const sketch = row(1, 1);
    expect(tieParts(sketch, [id('p1'), id('p9')], 'x')).toBe(sketch);
  });

  test('adds the tied parts to a selection', () => {
    expect(withGroups(front(), [id('p2'), id('p4')])).toEqual(['p1', 'p2', 'p4']);
  });

  test('is undone by untying', () => {
    expect(untie(front(), 'g1' as GroupId)).toEqual(row(1, 1, 1, 1));
    const sketch = front();
    expect(untie(sketch, 'g9' as GroupId)).toBe(sketch);
    expect(renameGroup(sketch, 'g9' as GroupId, 'x')).toBe(sketch);
  });
});
