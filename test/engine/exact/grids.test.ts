import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { hexapolarGrid, type PupilGrid, squareGrid } from '../../../engine/exact/grids.ts';

/** Adding some hundred weights, each rounded once. */
const ROUNDING = 1e-13;

/** The points listed, and those that mirror them. */
const whole = ({ x, y, weight }: PupilGrid) =>
  [...x].flatMap((x1, i) => {
    const point = { x: x1, y: y[i]!, weight: weight[i]! };
    return x1 === 0 ? [point] : [point, { ...point, x: -x1 }];
  });
const sumOver = (grid: PupilGrid, value: (x: number, y: number) => number): number => {
  let sum = 0;
  for (const { x, y, weight } of whole(grid)) sum += weight * value(x, y);
  return sum;
};
const gaps = (values: number[]): number[] => values.slice(1).map((value, i) => value - values[i]!);

describe('points of the pupil', () => {
  it('are 1, 7, 19, 37 … on hexagonal rings, the outermost on the rim', () => {
    expect([0, 1, 2, 3, 8].map((rings) => hexapolarGrid(rings).count)).toEqual([1, 7, 19, 37, 217]);
    const radii = whole(hexapolarGrid(8)).map(({ x, y }) => Math.hypot(x, y));
    expect(Math.max(...radii)).toBeCloseTo(1, 15);
    expect(radii.filter((radius) => radius > 1 - ROUNDING)).toHaveLength(48);
    expect(radii.filter((radius) => radius < ROUNDING)).toHaveLength(1);
  });

  it('stand in a square lattice, all inside the circle, none twice', () => {
    const points = whole(squareGrid(16));
    expect(points).toHaveLength(208);
    expect(points.every(({ x, y }) => Math.hypot(x, y) <= 1)).toBe(true);
    expect(new Set(points.map(({ x, y }) => `${x} ${y}`)).size).toBe(208);
    const columns = [...new Set(points.map(({ x }) => x))].sort((a, b) => a - b);
    for (const gap of gaps(columns)) expect(gap).toBeCloseTo(2 / 16, 14);
  });

  it('are few where few are asked for', () => {
    expect(squareGrid(1)).toMatchObject({ count: 1, traced: 1 });
    expect([...squareGrid(1).weight]).toEqual([1]);
    expect([...hexapolarGrid(0).weight]).toEqual([1]);
  });

  it('weigh up to one and are balanced about the centre, whatever their number', () => {
    const anyGrid = fc.oneof(
      fc.integer({ min: 0, max: 24 }).map(hexapolarGrid),
      fc.integer({ min: 1, max: 40 }).map(squareGrid),
    );
    fc.assert(
      fc.property(anyGrid, (grid) => {
        expect(Math.abs(sumOver(grid, () => 1) - 1)).toBeLessThanOrEqual(ROUNDING);
        expect(Math.abs(sumOver(grid, (x) => x))).toBeLessThanOrEqual(ROUNDING);
        expect(Math.abs(sumOver(grid, (_, y) => y))).toBeLessThanOrEqual(ROUNDING);
        expect(grid.weight.every((weight) => weight > 0)).toBe(true);
      }),
    );
  });

  it('are listed where a ray is needed: on the meridian and to one side of it', () => {
    for (const grid of [hexapolarGrid(7), squareGrid(15), squareGrid(14)]) {
      expect(grid.x).toHaveLength(grid.traced);
      expect(whole(grid)).toHaveLength(grid.count);
      expect(grid.x.every((x) => x >= 0)).toBe(true);
    }
  });

  it('integrate over the disc as the closed forms say: r² to 1/2, x² to 1/4, r⁶ to 1/4', () => {
    // Gregory's rule with differences up to the third leaves an error of the fifth order of the ring spacing.
    const grid = hexapolarGrid(8);
    expect(sumOver(grid, (x, y) => x * x + y * y)).toBeCloseTo(1 / 2, 4);
    expect(sumOver(grid, (x) => x * x)).toBeCloseTo(1 / 4, 4);
    expect(Math.abs(sumOver(grid, (x, y) => (x * x + y * y) ** 3) * 4 - 1)).toBeLessThan(0.003);
    // A lattice whose edge is a staircase does worse, and better with more points.
    const error = (across: number) => Math.abs(sumOver(squareGrid(across), (x, y) => x * x + y * y) * 2 - 1);
    expect(error(16)).toBeLessThan(0.04);
    expect(error(128)).toBeLessThan(0.002);
  });
});
