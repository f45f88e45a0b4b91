import { axisText, type Plot } from './plot.ts';

/** Plots under the name of their position; empty when only one is shown. */
export interface PlotSet {
  readonly position: string;
  readonly plots: readonly Plot[];
}

const HEAD = ['position', 'plot', 'curve', 'across', 'value', 'across is', 'value is'];

/** All values of the plots, one in each line, by RFC 4180; numbers with all their digits and a decimal point. */
export const plotsCsv = (sets: readonly PlotSet[]): string =>
  [HEAD, ...sets.flatMap(({ position, plots }) => plots.flatMap((plot) => rowsOf(position, plot)))]
    .map((cells) => cells.map(quoted).join(','))
    .join('\r\n')
    .concat('\r\n');

type Row = readonly (string | number)[];

function rowsOf(position: string, plot: Plot): readonly Row[] {
  const { title } = plot;
  switch (plot.kind) {
    case 'curves':
      return plot.curves.flatMap(({ name, x, y }) =>
        Array.from(
          x,
          (at, i): Row => [position, title, name, at, y[i] ?? '', axisText(plot.x), axisText(plot.y)],
        ),
      );
    case 'spots':
      return plot.spots.flatMap(({ at, dots }) => {
        const plane = plot.x === null ? title : `${title}, ${at} ${plot.x.unit} ${plot.x.label}`;
        return dots.flatMap(({ name, points }) =>
          Array.from(
            { length: points.length / 2 },
            (_, i): Row => [
              position,
              plane,
              name,
              points[2 * i] ?? '',
              points[2 * i + 1] ?? '',
              `sagittal from centroid, ${plot.unit}`,
              `tangential from centroid, ${plot.unit}`,
            ],
          ),
        );
      });
    case 'stems':
      return plot.stems.flatMap(({ name, zMm, value, sum }): Row[] => [
        [position, title, `${name}, adds`, zMm, value, 'from the first surface, mm', axisText(plot.y)],
        [position, title, `${name}, sum so far`, zMm, sum, 'from the first surface, mm', axisText(plot.y)],
      ]);
    case 'empty':
      return [[position, title, plot.sentence, '', '', '', '']];
  }
}

const quoted = (cell: string | number): string => {
  const text = String(cell);
  return /[",\r\n]/.test(text) ? `"${text.replaceAll('"', '""')}"` : text;
};
