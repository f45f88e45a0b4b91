import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { type Path, tracePath } from '../../../app/board/trim.ts';
import { SEED } from './generators.ts';

type Call = ['move' | 'line', number, number];

function traced(points: readonly number[], from = 0, to = points.length / 2): readonly Call[] {
  const calls: Call[] = [];
  const path: Path = {
    moveTo: (x, y) => calls.push(['move', x, y]),
    lineTo: (x, y) => calls.push(['line', x, y]),
  };
  tracePath(path, points, from, to);
  return calls;
}

describe('tracing a line', () => {
  it('goes through its points', () => {
    expect(traced([0, 1, 2, 3, 4, 5])).toEqual([
      ['move', 0, 1],
      ['line', 2, 3],
      ['line', 4, 5],
    ]);
    expect(traced([9, 9, 0, 1, 2, 3, 9, 9], 1, 3)).toHaveLength(2);
  });

  it('draws nothing for one point', () => {
    expect(traced([3, 4])).toEqual([]);
  });

  it('cuts a far end off on the line itself', () => {
    const calls = traced([0, 0, 1e9, 2e9]);
    expect(calls[0]).toEqual(['move', 0, 0]);
    expect(calls[1]).toEqual(['line', 15000, 30000]);
  });

  it('leaves out pieces that pass far away, and pieces that are not numbers', () => {
    expect(traced([-1e9, 1e8, 1e9, 1e8])).toEqual([]);
    expect(traced([0, 0, Number.NaN, 4])).toEqual([]);
  });

  it('stays on the line and within reach wherever the ends are', () => {
    const far = fc.double({ min: -1e8, max: 1e8, noNaN: true });
    fc.assert(
      fc.property(far, far, fc.double({ min: -900, max: 900, noNaN: true }), (x, y, near) => {
        const [there, back] = [traced([near, 300, x, y]), traced([x, y, near, 300])];
        const calls = [...there, ...back];
        const length = Math.hypot(x - near, y - 300);
        expect(calls).toHaveLength(4);
        for (const [, px, py] of calls) {
          expect(Math.max(Math.abs(px), Math.abs(py))).toBeLessThanOrEqual(30000 * (1 + 1e-9));
          const off = Math.abs((px - near) * (y - 300) - (py - 300) * (x - near)) / (length || 1);
          expect(off).toBeLessThan(1e-6);
        }
      }),
      SEED,
    );
  });
});
