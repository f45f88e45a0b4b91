import { describe, expect, it } from 'vitest';
import { roughMeasure } from '../../../app/board/measure.ts';
import { recorderPen } from '../../../app/board/recorderPen.ts';
import { plotsCsv } from '../../../app/plots/csv.ts';
import { drawPlot, wrapped } from '../../../app/plots/draw.ts';
import { gridOf } from '../../../app/plots/grid.ts';
import { legendOf } from '../../../app/plots/legend.ts';
import type { CurvePlot, Plot, StemPlot } from '../../../app/plots/plot.ts';
import { emptyPlot } from '../../../app/plots/plot.ts';
import { dropReference, hasReference, keepReference, referenceOf } from '../../../app/plots/references.ts';
import type { DrawnWith } from '../../../app/plots/room.ts';
import { plotsSvg } from '../../../app/plots/svg.ts';

const curve = (to: number): CurvePlot => ({
  kind: 'curves',
  key: 'fan',
  title: 'Tangential, axis',
  notes: [],
  x: { label: 'share of the stop', unit: '', digits: 2, from: -1, to: 1 },
  y: { label: 'error', unit: 'µm', digits: 2, from: -10, to: 10 },
  curves: [
    {
      name: 'main, 587.6 nm',
      word: 'main',
      style: 'curve axial main',
      x: Float64Array.of(-1, 1),
      y: Float64Array.of(-to, to),
    },
    {
      name: 'short',
      word: 'short',
      style: 'curve axial short',
      x: Float64Array.of(-1, 1),
      y: Float64Array.of(0, 0),
    },
  ],
});

const STEMS: StemPlot = {
  kind: 'stems',
  key: 'sum',
  title: 'Coma',
  notes: [],
  y: { label: 'sum', unit: 'µm', digits: 3, from: -2, to: 2 },
  stems: [
    { surface: 0, zMm: 0, name: 'front', value: 1, sum: 1 },
    { surface: 1, zMm: 10, name: 'rear', value: -2, sum: -1 },
  ],
};

const room = { widthPx: 254, heightPx: 182 };
const axis = (zMm: number) => 100 + 5 * zMm;
const how: DrawnWith = { measure: roughMeasure, cursor: null, reference: null, axis };

function drawn(plot: Plot, more: Partial<DrawnWith> = {}) {
  const pen = recorderPen();
  drawPlot(pen, plot, room, { ...how, ...more });
  return pen.toText();
}

describe('a drawn plot', () => {
  it('has its title, the unit of its axis, ticks, and each curve in its own style', () => {
    const text = drawn(curve(10));
    for (const part of [
      '"Tangential, axis"',
      '"error, µm"',
      '"share of the stop"',
      '"−10"',
      'line [curve axial main] 48,146 242,46',
      'line [curve axial short] 48,96 242,96',
    ])
      expect(text).toContain(part);
  });

  it('numbers both ends of the stop also where six plots stand beside each other', () => {
    const pen = recorderPen();
    drawPlot(pen, curve(10), { widthPx: 157, heightPx: 182 }, how);
    for (const tick of ['"−1"', '"0"', '"1"']) expect(pen.toText()).toContain(tick);
  });

  it('shows what is read in few words, with a ring on each curve', () => {
    const text = drawn(curve(10), { cursor: 1 });
    expect(text).toContain('"at 1.00"');
    expect(text).toContain('"main  10.00 µm"');
    expect(text).toContain('circle [curve axial main] 242,46 r 2.5');
  });

  it('has the kept plot faintly under it', () => {
    expect(drawn(curve(10), { reference: curve(5) })).toContain('line [curve reference] 48,121 242,71');
  });

  it('hangs stems at the places of their surfaces on the drawing', () => {
    const text = drawn(STEMS);
    expect(text).toContain('line [curve ink main] 100,108 100,76');
    expect(text).toContain('line [curve ink main] 150,108 150,172');
    expect(text).toContain('line [curve quiet main] 100,108 100,76 150,76 150,140 254,140');
  });

  it('says in lines of its own width why it is empty', () => {
    const lines = wrapped('The image is at infinity: light leaves parallel.', 120, roughMeasure);
    expect(lines.length).toBeGreaterThan(1);
    expect(lines.join(' ')).toBe('The image is at infinity: light leaves parallel.');
    expect(drawn(emptyPlot('fan', 'Fans', 'No parts.'))).toContain('"No parts."');
  });
});

describe('plots together', () => {
  it('stand in one row where they have room, and stems in a row of their own', () => {
    const six = Array.from({ length: 6 }, () => curve(1));
    expect(gridOf(six, 1042, 220)).toEqual({ columns: 6, room: { widthPx: 158, heightPx: 220 } });
    expect(gridOf(six, 358, 220).columns).toBe(2);
    expect(gridOf(six, 120, 220).columns).toBe(1);
    expect(gridOf([STEMS], 1042, 220)).toEqual({ columns: 1, room: { widthPx: 1042, heightPx: 220 } });
  });

  it('explain each dash once, whichever field it is in', () => {
    const other: CurvePlot = {
      ...curve(1),
      curves: curve(1).curves.map((one) => ({ ...one, style: 'curve field outer main' })),
    };
    const legend = legendOf([curve(1), other], true);
    expect(legend.map(({ name }) => name)).toEqual(['main, 587.6 nm', 'short', 'reference']);
    expect(legend[0]?.style).toBe('curve ink main');
  });

  it('are kept as a reference by position and plot until that is dropped', () => {
    const wide = [{ position: 'wide', plots: [curve(5)] }];
    const now = [{ position: 'wide', plots: [curve(8)] }];
    keepReference(wide);
    expect(referenceOf('wide', curve(8))).toBe(wide[0]?.plots[0]);
    expect(referenceOf('', curve(8))).toBeNull();
    expect(hasReference(now)).toBe(true);
    dropReference(now);
    expect(hasReference(now)).toBe(false);
  });

  it('are CSV with one value in each line, quoted where a name has a comma', () => {
    const lines = plotsCsv([{ position: 'wide', plots: [curve(0.1), STEMS] }]).split('\r\n');
    expect(lines[0]).toBe('position,plot,curve,across,value,across is,value is');
    expect(lines[1]).toBe('wide,"Tangential, axis","main, 587.6 nm",-1,-0.1,share of the stop,"error, µm"');
    expect(lines).toContain('wide,Coma,"rear, sum so far",10,-1,"from the first surface, mm","sum, µm"');
    expect(lines.at(-1)).toBe('');
  });

  it('are an SVG with their legend, each at its place', () => {
    const grid = gridOf([curve(1), curve(2)], 600, 180);
    const svg = plotsSvg({
      title: 'Fans & more',
      sets: [{ position: 'wide', plots: [curve(1), curve(2)] }],
      grid,
      axis,
      measure: roughMeasure,
    });
    expect(svg).toContain('<title>Fans &amp; more</title>');
    expect(svg.match(/Tangential, axis/g)).toHaveLength(2);
    expect(svg).toContain('>wide<');
    expect(svg).not.toContain('NaN');
  });
});
