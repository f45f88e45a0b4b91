import { fc, test } from '@fast-check/vitest';
import { describe, expect } from 'vitest';
import type { Position } from '../../../engine/sketch/types.ts';
import {
  combineValues,
  everyPosition,
  joinValue,
  objectDistanceAt,
  settingAt,
  splitValue,
  valueAt,
  valueOn,
  withValue,
} from '../../../engine/sketch/values.ts';
import { anyNumber } from './arbitrary.ts';
import { at } from './layout.ts';

const positionsOf = (count: number): readonly Position[] =>
  ['a', 'b', 'c', 'd', 'e', 'f'].slice(0, count).map((name) => ({ id: at(name), name }));

const splitOver = (numbers: readonly number[]) =>
  Object.fromEntries(numbers.map((number, index) => [positionsOf(6)[index]?.id, number]));

const between = (name: string, toNext: number) => ({ at: at(name), toNext });

describe('a value between positions', () => {
  test('is the common value everywhere', () => {
    expect(valueAt(12.5, positionsOf(3), between('b', 0.3))).toBe(12.5);
  });

  test('is halfway on the straight line between two positions', () => {
    expect(valueAt(splitOver([10, 30]), positionsOf(2), between('a', 0.5))).toBe(20);
  });

  test('keeps a straight run straight', () => {
    expect(valueAt(splitOver([0, 10, 20, 30]), positionsOf(4), between('b', 0.25))).toBeCloseTo(12.5, 12);
  });

  test('rests at a turning point', () => {
    // Rises 10 and −10: slope 0 at b, so just behind b the loss grows with the square of the share.
    const fall = (share: number) => 10 - valueAt(splitOver([0, 10, 0]), positionsOf(3), between('b', share));
    expect(fall(0.002) / fall(0.001)).toBeCloseTo(4, 1);
  });

  test('takes a setting of no known position as the first, and one beyond the last as the last', () => {
    const value = splitOver([1, 2]);
    expect(valueAt(value, positionsOf(2), between('gone', 0))).toBe(1);
    expect(valueAt(value, positionsOf(2), between('b', 0.5))).toBe(2);
  });

  test.prop([fc.array(anyNumber(-1e6, 1e6), { minLength: 2, maxLength: 6 }), fc.nat(), anyNumber(0, 0.999)])(
    'never leaves the two values it lies between',
    (numbers, index, share) => {
      const from = index % (numbers.length - 1);
      const [low, high] = [numbers[from] ?? 0, numbers[from + 1] ?? 0].toSorted((a, b) => a - b);
      const setting = { at: positionsOf(6)[from]?.id ?? at('a'), toNext: share };
      const value = valueAt(splitOver(numbers), positionsOf(numbers.length), setting);
      expect(value).toBeGreaterThanOrEqual(low ?? 0);
      expect(value).toBeLessThanOrEqual(high ?? 0);
    },
  );

  test.prop([fc.array(anyNumber(-100, 100), { minLength: 2, maxLength: 6 }), fc.nat()])(
    'meets every position exactly, without a jump or a corner',
    (numbers, index) => {
      const positions = positionsOf(numbers.length);
      const from = index % numbers.length;
      const here = positions[from];
      const value = splitOver(numbers);
      if (here === undefined) return;
      expect(valueAt(value, positions, settingAt(here.id))).toBe(numbers[from]);
      const before = positions[from - 1];
      if (before === undefined || from === numbers.length - 1) return;
      // Second differences of a smooth curve fall with the square of the step; of a corner only with the step.
      const bend = (step: number) =>
        valueAt(value, positions, { at: before.id, toNext: 1 - step }) +
        valueAt(value, positions, { at: here.id, toNext: step }) -
        2 * valueAt(value, positions, settingAt(here.id));
      expect(Math.abs(bend(1e-4))).toBeLessThan(1e-4);
    },
  );
});

describe('an object distance between positions', () => {
  test('is interpolated in its reciprocal, infinity counting as 0', () => {
    const value = { [at('a')]: 'infinity', [at('b')]: 500 } as const;
    expect(objectDistanceAt(value, positionsOf(2), between('a', 0))).toBe('infinity');
    expect(objectDistanceAt(value, positionsOf(2), between('a', 0.5))).toBe(1000);
    expect(objectDistanceAt(value, positionsOf(2), between('b', 0))).toBe(500);
  });

  test('stays at infinity between two positions at infinity', () => {
    const value = { [at('a')]: 'infinity', [at('b')]: 'infinity' } as const;
    expect(objectDistanceAt(value, positionsOf(2), between('a', 0.7))).toBe('infinity');
    expect(objectDistanceAt('infinity', positionsOf(2), between('a', 0.7))).toBe('infinity');
  });
});

describe('changing a value', () => {
  test('changes a common one for all positions and a split one where it stands', () => {
    expect(withValue<number>(5, at('b'), 7)).toBe(7);
    expect(withValue<number>(splitOver([1, 2, 3]), at('b'), 7)).toEqual({ a: 1, b: 7, c: 3 });
  });

  test('gives the same object back when nothing changes', () => {
    const value = splitOver([1, 2, 3]);
    expect(withValue(value, at('b'), 2)).toBe(value);
    expect(everyPosition(value, (number) => number)).toBe(value);
    expect(splitValue(value, positionsOf(3))).toBe(value);
  });

  test('splits and joins', () => {
    expect(splitValue<number>(4, positionsOf(2))).toEqual({ a: 4, b: 4 });
    expect(joinValue(splitOver([1, 2]), at('b'))).toBe(2);
    expect(combineValues(1, splitOver([1, 2]), positionsOf(2), (a, b) => a + b)).toEqual({ a: 2, b: 3 });
  });

  test('stores 0 for −0, which a file could not give back', () => {
    expect(withValue<number>(5, at('a'), -0)).toBe(0);
    expect(everyPosition<number>(-1, (number) => number * 0)).toBe(0);
  });

  test('throws when it is asked for a position that has no value', () => {
    expect(() => valueOn(splitOver([1]), at('b'))).toThrow('valueOn: no value at position b');
  });
});
