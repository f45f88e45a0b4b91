import type { MeasureText } from '../../app/board/measure.ts';
import { settingAt } from '../../engine/sketch/values.ts';
import { trainOf } from '../../engine/train/train.ts';
import { analyseAll } from './analyseAll.ts';
import { bareRays, traceBareRays } from './bareRays.ts';
import { benchSketch } from './benchSketch.ts';
import { kernelRows } from './kernelRows.ts';
import { liveUpdate } from './liveUpdate.ts';
import { liveZoom, UPDATE_RAYS, zoomRays } from './liveZoom.ts';
import { measure, sunk } from './measure.ts';
import { type BenchRow, timeRow } from './row.ts';
import { zoomSketch } from './zoomSketch.ts';

const ELEMENTS = 12;
const POSITIONS = 6;
const SIZES = [4, 8, 16, 32, 64];
const MOST_PER_DOUBLING = 2.2;
const DRAWN_FIELDS = 3;
const DRAWN_RAYS = 7;
const REFERENCE_RAYS = 2;
/** A whole update may take so many times as long as its rays. */
const MOST_OVER_RAYS = 3;

/** Every row; `measureText` is how labels are measured here. Throws when what was measured did not give numbers. */
export function runBench(measureText: MeasureText): readonly BenchRow[] {
  // The kernel first: what the later rows leave behind is cleared away in the background, which slows it.
  const rows = [
    ...kernelRows(),
    ...analysisRows(),
    ...liveRows(measureText),
    ...zoomRows(measureText),
    ...growthRows(measureText),
  ];
  if (!Number.isFinite(sunk())) throw new Error(`runBench: the results add up to ${sunk()}`);
  return rows;
}

/** All positions analysed, against the marginal and the chief ray of each. */
function analysisRows(): BenchRow[] {
  const sketch = benchSketch(ELEMENTS, POSITIONS);
  const trains = sketch.positions.map(({ id }) => trainOf(sketch, settingAt(id)));
  const rays = bareRays(trains, REFERENCE_RAYS);
  const { bare, whole } = measure({ bare: () => traceBareRays(rays), whole: analyseAll(sketch) });
  const size = `${ELEMENTS} elements, ${POSITIONS} positions`;
  return [
    timeRow(`bare arithmetic: ${REFERENCE_RAYS} rays, ${size}`, bare, bare, 'itself'),
    timeRow(`first-order analysis: ${size}`, whole, bare, 'bare arithmetic'),
  ];
}

/** One move of a drag, against the rays that a drawing of one position shows. */
function liveRows(measureText: MeasureText): BenchRow[] {
  const sketch = benchSketch(ELEMENTS, POSITIONS);
  const shown = sketch.positions.slice(0, 1).map(({ id }) => trainOf(sketch, settingAt(id)));
  const rays = bareRays(shown, REFERENCE_RAYS + DRAWN_FIELDS * DRAWN_RAYS);
  const { bare, whole } = measure({
    bare: () => traceBareRays(rays),
    whole: liveUpdate(sketch, measureText),
  });
  const size = `${ELEMENTS} elements, ${POSITIONS} positions`;
  return [
    timeRow(
      `bare arithmetic: ${rays.raysPerTrain} rays, ${ELEMENTS} elements, 1 position`,
      bare,
      bare,
      'itself',
    ),
    timeRow(`live update without painting: ${size}`, whole, bare, 'bare arithmetic'),
  ];
}

/** One move of a drag in a real zoom with all its plots, against the kernel on the rays that these plots trace. */
function zoomRows(measureText: MeasureText): BenchRow[] {
  const sketch = zoomSketch();
  const { bare, whole } = measure({ bare: zoomRays(sketch), whole: liveZoom(sketch, measureText) });
  const { through, toStop } = UPDATE_RAYS;
  const size = '14 elements, 28 surfaces, 5 fields, 3 lines';
  return [
    timeRow(`batch kernel: ${through} rays, 28 surfaces, and ${toStop} up to the stop`, bare, bare, 'itself'),
    timeRow(`live update with all plots: ${size}`, whole, bare, `batch kernel; at most ${MOST_OVER_RAYS}`),
  ];
}

/** The analysis and the whole live update of one position at growing numbers of elements, each against half as many. */
function growthRows(measureText: MeasureText): BenchRow[] {
  return [
    ...doublings('analysis, 1 position', (elements) => analyseAll(benchSketch(elements, 1))),
    ...doublings('live update, 1 position', (elements) => liveUpdate(benchSketch(elements, 1), measureText)),
  ];
}

function doublings(name: string, taskOf: (elements: number) => () => number): BenchRow[] {
  const timings = measure(Object.fromEntries(SIZES.map((elements) => [elements, taskOf(elements)])));
  return SIZES.flatMap((elements) => {
    const timing = timings[elements];
    const half = timings[elements / 2];
    if (timing === undefined) return [];
    const sized = `${name}: ${elements} elements`;
    return half === undefined
      ? [timeRow(sized, timing, timing, 'itself')]
      : [timeRow(sized, timing, half, `${elements / 2} elements; at most ${MOST_PER_DOUBLING}`)];
  });
}

/** The rows as JSON: a list of `{ name, median, unit, ratio }`. */
export const rowsJson = (rows: readonly BenchRow[]): string =>
  `${JSON.stringify(
    rows.map(({ name, median, unit, ratio }) => ({ name, median, unit, ratio })),
    null,
    2,
  )}\n`;

/** The rows as a table to read. */
export function rowsTable(rows: readonly BenchRow[]): string {
  const lines = [
    ['', 'min', 'median', '', 'ratio', 'to'],
    ...rows.map(({ name, min, median, unit, ratio, against }) => [
      name,
      min.toFixed(2),
      median.toFixed(2),
      unit,
      ratio.toFixed(2),
      against,
    ]),
  ];
  const widths = [0, 1, 2, 3, 4, 5].map((column) =>
    Math.max(...lines.map((line) => line[column]?.length ?? 0)),
  );
  const isNumber = (column: number): boolean => column === 1 || column === 2 || column === 4;
  return lines
    .map((line) =>
      line
        .map((text, column) => {
          const width = widths[column] ?? 0;
          return isNumber(column) ? text.padStart(width) : text.padEnd(width);
        })
        .join('  ')
        .trimEnd()
        .concat('\n'),
    )
    .join('');
}
