import type { Outcome } from '../outcome.ts';
import { mapOutcome, some } from '../outcome.ts';
import type { Sketch } from '../sketch/types.ts';
import { capitalised } from '../sketch/words.ts';
import { clearGapColumns } from './clearGaps.ts';
import type { Grid } from './grid.ts';
import { imageWord, labelOf, planeOf, positionLabel } from './labels.ts';
import type { ColumnSpec, PositionSheet } from './positionSheet.ts';
import { gapBehind } from './printed.ts';
import type { Cell, Datum } from './table.ts';
import { absentCell, numberCell, textCell } from './table.ts';

const MAGNIFICATION_DIGITS = 5;
const F_NUMBER_DIGITS = 3;
const MICROMETRE_DIGITS = 2;
const UM_PER_MM = 1000;

/** The columns of the block of positions, from left to right: what is set first, then what comes of it. */
export function positionColumns(
  sketch: Sketch,
  sheets: readonly PositionSheet[],
  datum: Datum,
  grid: Grid,
): readonly ColumnSpec[] {
  return [
    {
      column: { id: 'position', title: 'Position', unit: '', kind: 'name' },
      cellOf: ({ position }) => textCell(positionLabel(position)),
    },
    objectColumn(sketch, grid),
    ...distanceColumns(sketch, datum, grid),
    ...gapColumns(sketch, grid),
    ...clearGapColumns(sketch, grid),
    ...quantityColumns(sheets, grid),
    ...checkColumns(sketch),
  ];
}

function objectColumn(sketch: Sketch, grid: Grid): ColumnSpec {
  const title = `Object to ${labelOf(sketch, 0)} (${planeOf(sketch.parts[0])})`;
  return {
    column: { id: 'object', title, unit: grid.unit, kind: 'gap' },
    cellOf: ({ printed }) => grid.cellOf(printed.objectDistance),
  };
}

function distanceColumns(sketch: Sketch, datum: Datum, grid: Grid): ColumnSpec[] {
  const from = { 'first part': labelOf(sketch, 0), sensor: imageWord(sketch), mount: 'mount' }[datum];
  const distance = (
    id: string,
    what: string,
    read: (sheet: PositionSheet) => Outcome<number>,
  ): ColumnSpec => ({
    column: {
      id: `distance:${id}`,
      title: what === from ? `${capitalised(what)} (datum)` : `${capitalised(what)} from ${from}`,
      unit: grid.unit,
      kind: 'distance',
    },
    cellOf: (sheet) => grid.cellOf(read(sheet)),
  });
  return [
    ...sketch.parts.map((part, k) =>
      distance(part.id, labelOf(sketch, k), ({ printed }) => some(printed.parts[k]?.front ?? 0)),
    ),
    distance('image', imageWord(sketch), ({ printed }) => printed.image),
  ];
}

function gapColumns(sketch: Sketch, grid: Grid): ColumnSpec[] {
  return sketch.parts.map((part, k) => {
    const next = sketch.parts[k + 1];
    const title =
      next === undefined
        ? `${capitalised(labelOf(sketch, k))} to ${imageWord(sketch)} (from ${planeOf(part)})`
        : `${capitalised(labelOf(sketch, k))} to ${labelOf(sketch, k + 1)} (${planeOf(part)} to ${planeOf(next)})`;
    return {
      column: { id: `gap:${part.id}`, title, unit: grid.unit, kind: 'gap' },
      cellOf: ({ printed }) => grid.cellOf(gapBehind(printed, k)),
    };
  });
}

function quantityColumns(sheets: readonly PositionSheet[], grid: Grid): ColumnSpec[] {
  const length = (
    id: string,
    title: string,
    read: (sheet: PositionSheet) => Outcome<number>,
  ): ColumnSpec => ({
    column: { id, title, unit: grid.unit, kind: 'quantity' },
    cellOf: (sheet) => grid.lengthCellOf(read(sheet)),
  });
  const plain = (
    id: string,
    title: string,
    digits: number,
    read: (sheet: PositionSheet) => Outcome<number>,
  ): ColumnSpec => ({
    column: { id, title, unit: '', kind: 'quantity' },
    cellOf: (sheet) => outcomeCell(read(sheet), digits),
  });
  const afocal = sheets.some(({ analysis }) => analysis.firstOrder.afocal);
  return [
    length('focalLength', 'Focal length', ({ analysis }) => analysis.firstOrder.focalLengthMm),
    plain(
      'magnification',
      'Magnification',
      MAGNIFICATION_DIGITS,
      ({ analysis }) => analysis.conjugates.magnification,
    ),
    ...(afocal
      ? [
          plain(
            'angularMagnification',
            'Angular magnification',
            MAGNIFICATION_DIGITS,
            ({ analysis }) => analysis.firstOrder.angularMagnification,
          ),
        ]
      : []),
    plain(
      'workingFNumber',
      'Working f-number',
      F_NUMBER_DIGITS,
      ({ analysis }) => analysis.light.workingFNumber,
    ),
    length('stopDiameter', 'Stop diameter', ({ analysis }) => analysis.pupils.stopDiameterMm),
  ];
}

function checkColumns(sketch: Sketch): ColumnSpec[] {
  const micrometres = (
    id: string,
    title: string,
    read: (sheet: PositionSheet) => Outcome<number>,
  ): ColumnSpec => ({
    column: { id, title, unit: 'µm', kind: 'check' },
    cellOf: (sheet) =>
      outcomeCell(
        mapOutcome(read(sheet), (mm) => mm * UM_PER_MM),
        MICROMETRE_DIGITS,
      ),
  });
  return [
    ...(sketch.image === 'fixed'
      ? [micrometres('defocus', 'Defocus before rounding', ({ analysis }) => analysis.conjugates.defocusMm)]
      : []),
    micrometres('imageMiss', 'Image miss by rounding', ({ printed }) => printed.imageMissMm),
  ];
}

const outcomeCell = (value: Outcome<number>, digits: number): Cell =>
  value.ok ? numberCell(value.value, digits) : absentCell(value.why);
