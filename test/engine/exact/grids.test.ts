import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { hexapolarGrid, type PupilGrid, squareGrid } from '../../../engine/exact/grids.ts';

/** Adding some hundred weights, each rounded once. */
const ROUNDING = 1e-13;

const sumOver = (grid: PupilGrid, value: (x: number, y: number) => number): number => {
  let sum = 0;
  for (let i = 0; i < grid.count; i++) sum += grid.weight[i]! * value(grid.x[i]!, grid.y[i]!);
  return sum;
};
const gaps = (values: number[]): number[] => values.slice(1).map((value, i) => value - values[i]!);

describe('points of the pupil', () => {
  it('are 1, 7, 19, 37 … on hexagonal rings, the outermost on the rim', () => {
    expect([0, 1, 2, 3, 8].map((rings) => hexapolarGrid(rings).count)).toEqual([1, 7, 19, 37, 217]);
    const { x, y } = hexapolarGrid(8);
    const radii = [...x].map((_, i) => Math.hypot(x[i]!, y[i]!));
    expect(Math.max(...radii)).toBeCloseTo(1, 15);
    expect(radii.filter((radius) => radius > 1 - ROUNDING)).toHaveLength(48);
    expect(radii.filter((radius) => radius < ROUNDING)).toHaveLength(1);
  });

  it('stand in a square lattice, all inside the circle, none twice', () => {
    const { count, x, y } = squareGrid(16);
    expect(count).toBe(208);
    expect([...x].every((_, i) => Math.hypot(x[i]!, y[i]!) <= 1)).toBe(true);
    expect(new Set([...x].map((_, i) => `${x[i]} ${y[i]}`)).size).toBe(count);
    const columns = [...new Set(x)].sort((a, b) => a - b);
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

  it('come first where a ray is needed, and the rest mirror those exactly', () => {
    for (const grid of [hexapolarGrid(7), squareGrid(15), squareGrid(14)]) {
      const { count, traced, x, y, weight, mirrorOf } = grid;
      expect(mirrorOf).toHaveLength(count - traced);
      for (let i = 0; i < traced; i++) expect(x[i]).toBeGreaterThanOrEqual(0);
      for (const [i, from] of mirrorOf.entries()) {
        const here = traced + i;
        expect([x[here], y[here], weight[here]]).toEqual([-x[from]!, y[from], weight[from]]);
      }
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
