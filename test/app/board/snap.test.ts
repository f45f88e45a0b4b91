import { describe, expect, it } from 'vitest';
import { snapTo } from '../../../app/board/snap.ts';

const catches = [
  { at: 10, name: 'rear focal plane of the first' },
  { at: 10.4, name: 'image of the second' },
];

describe('snapping', () => {
  it('goes to the nearest catch within the tolerance and names it', () => {
    expect(snapTo(catches, 10.3, 0.5)).toEqual({ value: 10.4, caught: catches[1] });
    expect(snapTo(catches, 9.6, 0.5)).toEqual({ value: 10, caught: catches[0] });
  });

  it('takes a catch exactly at the tolerance, and the first of two as near', () => {
    expect(snapTo(catches, 9.5, 0.5).value).toBe(10);
    expect(
      snapTo(
        [
          { at: 1, name: 'a' },
          { at: 3, name: 'b' },
        ],
        2,
        5,
      ).caught?.name,
    ).toBe('a');
  });

  it('leaves the value alone beyond the tolerance, when switched off, and without catches', () => {
    expect(snapTo(catches, 12, 0.5)).toEqual({ value: 12, caught: null });
    expect(snapTo(catches, 10.3, 0.5, false)).toEqual({ value: 10.3, caught: null });
    expect(snapTo([], 3, 1)).toEqual({ value: 3, caught: null });
  });
});
