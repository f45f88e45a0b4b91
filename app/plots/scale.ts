import { scaleLinear, tickStep } from 'd3';
import type { Axis, Plot } from './plot.ts';

const ROUND = [1, 1.5, 2, 3, 4, 5, 6, 8, 10];

/** The least round number that is not below `value` nor `least`: while something is dragged, an axis changes in few steps. */
export function roundReach(value: number, least: number): number {
  if (!(value > least)) return least;
  const power = 10 ** Math.floor(Math.log10(value));
  const factor = ROUND.find((round) => round * power >= value * (1 - 1e-9)) ?? 10;
  return Number.isFinite(factor * power) ? factor * power : value;
}

/** The greatest size of a value of these curves; 0 without any. */
export function reachOf(curves: readonly { readonly y: Float64Array }[]): number {
  let reach = 0;
  for (const { y } of curves) for (const value of y) reach = Math.max(reach, Math.abs(value));
  return reach;
}

/** An axis that runs as far down as up. */
export const evenAxis = (
  label: string,
  unit: string,
  digits: number,
  values: number,
  least: number,
): Axis => {
  const to = roundReach(values, least);
  return { label, unit, digits, from: -to, to };
};

/** The plots with their upright axes (or the sides of their spots) made alike, so that they can be compared by eye. */
export function alike(plots: readonly Plot[]): readonly Plot[] {
  let [from, to, reach] = [0, 0, 0];
  for (const plot of plots) {
    if (plot.kind === 'curves' || plot.kind === 'stems')
      [from, to] = [Math.min(from, plot.y.from), Math.max(to, plot.y.to)];
    if (plot.kind === 'spots') reach = Math.max(reach, plot.reach);
  }
  return plots.map((plot): Plot => {
    if (plot.kind === 'curves' || plot.kind === 'stems') return { ...plot, y: { ...plot.y, from, to } };
    return plot.kind === 'spots' ? { ...plot, reach } : plot;
  });
}

/** Ticks of an axis over so many px, at round values, not nearer to each other than `apartPx`; and the decimals they need. */
export function ticksOf(
  { from, to }: Pick<Axis, 'from' | 'to'>,
  lengthPx: number,
  apartPx: number,
): { readonly values: readonly number[]; readonly digits: number } {
  const count = Math.max(1, Math.floor(lengthPx / apartPx));
  const step = tickStep(from, to, count);
  const digits = step > 0 ? Math.min(12, Math.max(0, -Math.floor(Math.log10(step) + 1e-9))) : 0;
  return { values: scaleLinear([from, to], [0, lengthPx]).ticks(count), digits };
}

/** The px of a value on an axis laid between two px. */
export const pxScale = ({ from, to }: Pick<Axis, 'from' | 'to'>, startPx: number, endPx: number) =>
  scaleLinear([from, to], [startPx, endPx]);
