import { describe, expect, it } from 'vitest';
import type { CurvePlot, Plot, SpotPlot, StemPlot } from '../../../app/plots/plot.ts';
import { firstStop, nearestStop, readAt, readingText, stopBeside } from '../../../app/plots/read.ts';
import { stopUnder } from '../../../app/plots/stopUnder.ts';
import { summaryOf } from '../../../app/plots/summary.ts';

const FAN: CurvePlot = {
  kind: 'curves',
  key: 'fan',
  title: 'Tangential, axis',
  notes: ['1 ray lost'],
  x: { label: 'share of the stop', unit: '', digits: 2, from: -1, to: 1 },
  y: { label: 'error', unit: 'µm', digits: 2, from: -20, to: 20 },
  curves: [
    {
      name: 'main 587.6 nm',
      word: 'main',
      style: 'curve axial main',
      x: Float64Array.of(-1, 0, 1),
      y: Float64Array.of(-12.345, 0, 12.345),
    },
    {
      name: 'short 486.1 nm',
      word: 'short',
      style: 'curve axial short',
      x: Float64Array.of(0, 1),
      y: Float64Array.of(0, 5),
    },
  ],
};

const SPOT: SpotPlot = {
  kind: 'spots',
  key: 'spot',
  title: 'Spot, axis',
  notes: [],
  unit: 'µm',
  digits: 2,
  x: null,
  reach: 10,
  airy: 3,
  figures: ['rms 5.00 µm'],
  spots: [
    {
      at: 0,
      rms: 5,
      largest: 9,
      dots: [
        {
          name: 'main',
          line: 'main',
          style: 'dots axial',
          points: Float64Array.of(0, 0, 3, 4, 0, -9, 1, 0),
          share: Float64Array.of(0.4, 0.3, 0.2, 0.1),
          weight: 1,
        },
      ],
    },
  ],
};

const STEMS: StemPlot = {
  kind: 'stems',
  key: 'sum',
  title: 'Coma',
  notes: [],
  y: { label: 'sum', unit: 'µm', digits: 3, from: -2, to: 2 },
  stems: [
    { surface: 0, zMm: 0, name: 'front', value: 1.5, sum: 1.5 },
    { surface: 1, zMm: 7, name: 'rear', value: -2, sum: -0.5 },
  ],
};

const ROOM = { widthPx: 254, heightPx: 200 };
const axis = (zMm: number) => 100 + 10 * zMm;

describe('reading a plot', () => {
  it('gives the value of every curve at the nearest ray, with unit and a real minus', () => {
    expect(readingText(readAt(FAN, -1))).toBe(
      '−1.00 share of the stop, main 587.6 nm −12.35 µm, short 486.1 nm 0.00 µm',
    );
    expect(readAt(FAN, -1).values.map(({ word }) => word)).toEqual(['main', 'short']);
  });

  it('goes from ray to ray by keys and stays at the ends', () => {
    expect(firstStop(FAN)).toBe(1);
    expect(stopBeside(FAN, 1, -1)).toBe(0);
    expect(stopBeside(FAN, 0, 5)).toBe(1);
    expect(stopBeside(FAN, 0.1, Number.NEGATIVE_INFINITY)).toBe(-1);
  });

  it('tells how much light falls within a circle about the centroid', () => {
    expect(readAt(SPOT, 5).values[0]?.text).toBe('80.0 %');
    expect(readAt(SPOT, 10).values[0]?.text).toBe('100.0 %');
    expect(firstStop(SPOT)).toBe(5);
  });

  it('names the surface of a stem, what it adds and the sum so far', () => {
    expect(readingText(readAt(STEMS, 1))).toBe('rear, adds −2.000 µm, sum so far −0.500 µm');
  });

  it('finds what is under the pointer', () => {
    expect(stopUnder(FAN, ROOM, 240, 100, axis)).toBe(1);
    expect(stopUnder(FAN, ROOM, 44, 100, axis)).toBe(-1);
    expect(stopUnder(STEMS, ROOM, 160, 20, axis)).toBe(1);
    expect(stopUnder(SPOT, ROOM, 127, 109, axis)).toBe(0);
    expect(
      stopUnder({ kind: 'empty', key: '', title: '', notes: [], sentence: '' }, ROOM, 1, 1, axis),
    ).toBeNull();
  });

  it('is nothing where there is nothing', () => {
    const empty: Plot = { ...FAN, curves: [] };
    expect([firstStop(empty), nearestStop(empty, 0), stopBeside(empty, 0, 1)]).toEqual([null, null, null]);
  });

  it('says at a glance how far curves reach, how large spots are, and which surface adds most', () => {
    expect(summaryOf(FAN)).toBe(
      'main 587.6 nm from −12.35 µm to 12.35 µm; short 486.1 nm from 0.00 µm to 5.00 µm; 1 ray lost',
    );
    expect(summaryOf(SPOT)).toBe('rms 5.00 µm');
    expect(summaryOf(STEMS)).toBe('in all −0.500 µm; most from rear, −2.000 µm');
  });
});
