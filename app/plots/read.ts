import type { CurvePlot, Plot, PlotCurve, Spot, SpotPlot, StemPlot } from './plot.ts';
import { valueText } from './plot.ts';

/** Circles that the light within can be read in, from the centroid to the edge of the square. */
const CIRCLES = 40;

/** Values where a plot can be read, ascending: places of its level axis, radii about a single spot, or numbers of surfaces. */
export function stopsOf(plot: Plot): readonly number[] {
  switch (plot.kind) {
    case 'curves':
      return [...longest(plot.curves).x];
    case 'spots':
      return plot.x === null
        ? Array.from({ length: CIRCLES + 1 }, (_, i) => (plot.reach * i) / CIRCLES)
        : plot.spots.map(({ at }) => at);
    case 'stems':
      return plot.stems.map(({ surface }) => surface);
    case 'empty':
      return [];
  }
}

/** The stop nearest to `value`; null when the plot has none. */
export function nearestStop(plot: Plot, value: number): number | null {
  let best: number | null = null;
  for (const stop of stopsOf(plot)) {
    if (best === null || Math.abs(stop - value) < Math.abs(best - value)) best = stop;
  }
  return best;
}

/** The stop so many steps from the one nearest to `value`, at most the outermost. */
export function stopBeside(plot: Plot, value: number, steps: number): number | null {
  const stops = stopsOf(plot);
  const here = stops.indexOf(nearestStop(plot, value) ?? Number.NaN);
  return stops[Math.min(stops.length - 1, Math.max(0, here + steps))] ?? null;
}

/** Where reading begins by keys: the end of a field or a stop, the circle that holds four fifths of the light, the middle plane, the first surface. */
export function firstStop(plot: Plot): number | null {
  const stops = stopsOf(plot);
  if (plot.kind === 'curves') return stops.at(-1) ?? null;
  if (plot.kind === 'stems') return stops[0] ?? null;
  if (plot.kind !== 'spots') return null;
  const [spot] = plot.spots;
  if (plot.x !== null || !spot) return stops[Math.floor(stops.length / 2)] ?? null;
  return stops.find((radius) => lightWithin(spot, radius) >= 0.8) ?? stops.at(-1) ?? null;
}

/** One value that is read off, under its name. */
export interface ReadValue {
  readonly name: string;
  /** The name where there is little room; the name itself when absent. */
  readonly word?: string;
  readonly text: string;
}

/** What is read at a stop: the place in words, and the values there. */
export interface PlotReading {
  readonly place: string;
  /** The place where there is little room. */
  readonly shortPlace: string;
  readonly values: readonly ReadValue[];
}

/** What the plot says at `stop`, one of its stops. */
export function readAt(plot: Plot, stop: number): PlotReading {
  switch (plot.kind) {
    case 'curves':
      return readCurves(plot, stop);
    case 'spots':
      return readSpots(plot, stop);
    case 'stems':
      return readStems(plot, stop);
    case 'empty':
      return { place: plot.sentence, shortPlace: '', values: [] };
  }
}

/** A reading as one sentence, for a screen reader. */
export const readingText = ({ place, values }: PlotReading): string =>
  [place, ...values.map(({ name, text }) => `${name} ${text}`)].join(', ');

/** The place of the sample nearest to `x`; −1 when the curve has none. */
export function sampleNear({ x }: PlotCurve, at: number): number {
  let best = -1;
  for (let i = 0; i < x.length; i++)
    if (best < 0 || Math.abs((x[i] ?? 0) - at) < Math.abs((x[best] ?? 0) - at)) best = i;
  return best;
}

function readCurves({ x, y, curves }: CurvePlot, stop: number): PlotReading {
  return {
    place: `${valueText(stop, x)} ${x.unit === '' ? x.label : ''}`.trim(),
    shortPlace: `at ${valueText(stop, x)}`,
    values: curves.map((curve) => {
      const value = curve.y[sampleNear(curve, stop)];
      return {
        name: curve.name,
        word: curve.word,
        text: value === undefined ? 'no ray' : valueText(value, y),
      };
    }),
  };
}

function readSpots(plot: SpotPlot, stop: number): PlotReading {
  const spot = plot.x === null ? plot.spots[0] : plot.spots.find(({ at }) => at === stop);
  if (!spot) return { place: '', shortPlace: '', values: [] };
  if (plot.x === null)
    return {
      place: `within ${valueText(stop, plot)}`,
      shortPlace: `within ${valueText(stop, plot)}`,
      values: [{ name: 'light', text: valueText(100 * lightWithin(spot, stop), { digits: 1, unit: '%' }) }],
    };
  return {
    place: `${valueText(stop, plot.x)} ${plot.x.label}`,
    shortPlace: `at ${valueText(stop, plot.x)}`,
    values: [
      { name: 'rms', text: valueText(spot.rms, plot) },
      { name: 'largest', text: valueText(spot.largest, plot) },
    ],
  };
}

function readStems({ stems, y }: StemPlot, stop: number): PlotReading {
  const stem = stems.find(({ surface }) => surface === stop);
  if (!stem) return { place: '', shortPlace: '', values: [] };
  return {
    place: stem.name,
    shortPlace: stem.name,
    values: [
      { name: 'adds', text: valueText(stem.value, y) },
      { name: 'sum so far', text: valueText(stem.sum, y) },
    ],
  };
}

/** The share of the light that falls within a radius of the centroid. */
function lightWithin({ dots }: Spot, radius: number): number {
  let [within, all] = [0, 0];
  for (const { points, share, weight: line } of dots) {
    for (let i = 0; i < share.length; i++) {
      const weight = line * (share[i] ?? 0);
      all += weight;
      if (Math.hypot(points[2 * i] ?? 0, points[2 * i + 1] ?? 0) <= radius * (1 + 1e-12)) within += weight;
    }
  }
  return all === 0 ? 0 : within / all;
}

const NONE: PlotCurve = { name: '', word: '', style: 'curve', x: new Float64Array(), y: new Float64Array() };

const longest = (curves: readonly PlotCurve[]): PlotCurve =>
  curves.reduce((best, curve) => (curve.x.length > best.x.length ? curve : best), NONE);
