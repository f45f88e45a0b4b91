import { describe, expect, it } from 'vitest';
import { emptyPlot, type Plot } from '../../../app/plots/plot.ts';
import { alike, evenAxis, roundReach, ticksOf } from '../../../app/plots/scale.ts';

const curves = (to: number): Plot => ({
  kind: 'curves',
  key: `${to}`,
  title: '',
  notes: [],
  x: { label: '', unit: '', digits: 1, from: 0, to: 1 },
  y: evenAxis('error', 'µm', 2, to, 0.1),
  curves: [],
});

describe('the scale of a plot', () => {
  it('reaches the next round number, so that it stays while a curve moves a little', () => {
    expect([0.97, 1, 1.01, 14, 37, 401].map((value) => roundReach(value, 0.1))).toEqual([
      1, 1, 1.5, 15, 40, 500,
    ]);
  });

  it('does not blow up what is rounding', () => {
    expect(roundReach(3e-13, 0.1)).toBe(0.1);
    expect(roundReach(0, 0.1)).toBe(0.1);
  });

  it('is the same for plots that are compared by eye', () => {
    const plots = alike([curves(3), emptyPlot('none', 'None', 'Nothing.'), curves(70)]);
    expect(plots.map((plot) => plot.kind === 'curves' && [plot.y.from, plot.y.to])).toEqual([
      [-80, 80],
      false,
      [-80, 80],
    ]);
  });

  it('has ticks with as many decimals as tell them apart', () => {
    expect(ticksOf({ from: -0.02, to: 0.02 }, 120, 30)).toEqual({
      values: [-0.02, -0.01, 0, 0.01, 0.02],
      digits: 2,
    });
    expect(ticksOf({ from: -400, to: 400 }, 120, 30).digits).toBe(0);
  });
});
