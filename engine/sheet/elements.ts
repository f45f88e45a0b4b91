import type { Outcome } from '../outcome.ts';
import { none, some } from '../outcome.ts';
import { firstOrder } from '../paraxial/firstOrder.ts';
import { givenSemiDiameter, lengthOf } from '../sketch/part.ts';
import type { Part, PartId, Sketch } from '../sketch/types.ts';
import { partTrain } from '../train/slice.ts';
import type { Grid } from './grid.ts';
import { labelOf, positionLabel } from './labels.ts';
import type { PositionSheet } from './positionSheet.ts';
import { onGridInside } from './printed.ts';
import type { Block, Cell, Column } from './table.ts';
import { absentCell, textCell } from './table.ts';

/** A column of the block of elements with the way to read its cells. */
interface ElementColumn {
  readonly column: Column;
  readonly cellOf: (part: Part, index: number) => Cell;
}

/**
 * The elements, once each: focal length, thickness and reserved room where some have them, the clear diameter needed over
 * all positions at the sketch's vignetting, the position that asks for it, and the clear diameter given.
 */
export function elementBlock(sketch: Sketch, sheets: readonly PositionSheet[], grid: Grid): Block<PartId> {
  const columns = elementColumns(sketch, sheets, grid);
  return {
    columns: columns.map(({ column }) => column),
    rows: sketch.parts.map((part, index) => ({
      id: part.id,
      cells: columns.map(({ cellOf }) => cellOf(part, index)),
    })),
  };
}

function elementColumns(sketch: Sketch, sheets: readonly PositionSheet[], grid: Grid): ElementColumn[] {
  const name = (id: string, title: string, cellOf: ElementColumn['cellOf']): ElementColumn => ({
    column: { id, title, unit: '', kind: 'name' },
    cellOf,
  });
  const length = (
    id: string,
    title: string,
    read: (part: Part, index: number) => Outcome<number>,
  ): ElementColumn => ({
    column: { id, title, unit: grid.unit, kind: 'quantity' },
    cellOf: (part, index) => grid.lengthCellOf(read(part, index)),
  });
  const needs = sketch.parts.map((_, index) => clearNeed(index, sheets));
  const hasThickness = sketch.parts.some((part) => lengthOf(part) > 0);
  const hasRoom = sketch.parts.some(
    (part) => part.kind === 'thin' && (part.roomFrontMm !== 0 || part.roomBehindMm !== 0),
  );
  return [
    name('element', 'Element', (_, index) => textCell(labelOf(sketch, index))),
    length('focalLength', 'Focal length', (part, index) => focalLengthOf(part, index, sheets)),
    length(
      'clearNeeded',
      'Clear diameter needed',
      (_, index) => needs[index]?.diameterMm ?? none('no parts'),
    ),
    name('neededAt', 'Needed at', (_, index) => needs[index]?.at ?? absentCell('no parts')),
    length('clearGiven', 'Clear diameter given', (part) => {
      const semiDiameterMm = givenSemiDiameter(part);
      return semiDiameterMm === null ? none('open') : some(2 * semiDiameterMm);
    }),
    ...(hasThickness
      ? [
          length('thickness', 'Thickness', (part) =>
            part.kind === 'plate' || part.kind === 'glass'
              ? some(lengthOf(onGridInside(part, grid)))
              : none(kindWord(part)),
          ),
        ]
      : []),
    ...(hasRoom
      ? [
          length('roomFront', 'Room reserved in front', (part) =>
            part.kind === 'thin' ? some(part.roomFrontMm) : none(kindWord(part)),
          ),
          length('roomBehind', 'Room reserved behind', (part) =>
            part.kind === 'thin' ? some(part.roomBehindMm) : none(kindWord(part)),
          ),
        ]
      : []),
  ];
}

/** The largest clear diameter that any surface of the part needs at any position; absent when one position cannot say. */
function clearNeed(
  partIndex: number,
  sheets: readonly PositionSheet[],
): { readonly diameterMm: Outcome<number>; readonly at: Cell } {
  let largestMm = -1;
  let at = absentCell('no parts');
  for (const { position, analysis } of sheets) {
    for (const [surface, { neededMm }] of analysis.clear.entries()) {
      if (analysis.train.partOf[surface] !== partIndex) continue;
      if (!neededMm.ok) return { diameterMm: neededMm, at: absentCell(neededMm.why) };
      if (2 * neededMm.value <= largestMm) continue;
      largestMm = 2 * neededMm.value;
      at = textCell(positionLabel(position));
    }
  }
  return { diameterMm: largestMm < 0 ? none('no parts') : some(largestMm), at };
}

/** Of a thin part what is given, of glass 1/power in the main line; a plate and a stop have none. */
function focalLengthOf(part: Part, index: number, sheets: readonly PositionSheet[]): Outcome<number> {
  if (part.kind === 'thin') return some(part.focalLengthMm);
  const train = sheets[0] && part.kind === 'glass' ? partTrain(sheets[0].analysis.train, index) : null;
  return train === null ? none(kindWord(part)) : firstOrder(train).focalLengthMm;
}

const kindWord = (part: Part): string => (part.kind === 'thin' ? 'thin element' : part.kind);
