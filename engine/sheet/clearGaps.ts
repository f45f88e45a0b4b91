import type { Outcome } from '../outcome.ts';
import { mapOutcome } from '../outcome.ts';
import type { Part, Sketch } from '../sketch/types.ts';
import { roomBeside } from '../train/body.ts';
import type { Grid } from './grid.ts';
import { imageWord, labelOf } from './labels.ts';
import type { ColumnSpec, PositionSheet } from './positionSheet.ts';
import { gapBehind } from './printed.ts';

/**
 * A column for every space that room narrows, reserved by a thin part or taken by the rim of glass: the printed gap less the room behind the
 * part on its left and in front of the one on its right. Negative where the rooms overlap.
 */
export function clearGapColumns(sketch: Sketch, grid: Grid): ColumnSpec[] {
  const { parts } = sketch;
  const between = (k: number): string =>
    `${labelOf(sketch, k)} to ${k === parts.length - 1 ? imageWord(sketch) : labelOf(sketch, k + 1)}`;
  return [
    ...clearColumn(
      'object',
      `object to ${labelOf(sketch, 0)}`,
      0,
      roomInFront(parts[0]),
      grid,
      ({ printed }) => printed.objectDistance,
    ),
    ...parts.flatMap((part, k) =>
      clearColumn(part.id, between(k), roomBehind(part), roomInFront(parts[k + 1]), grid, ({ printed }) =>
        gapBehind(printed, k),
      ),
    ),
  ];
}

function clearColumn(
  id: string,
  between: string,
  behindMm: number,
  inFrontMm: number,
  grid: Grid,
  gapOf: (sheet: PositionSheet) => Outcome<number>,
): ColumnSpec[] {
  const behind = grid.stepsOf(behindMm);
  const inFront = grid.stepsOf(inFrontMm);
  if ((behindMm === 0 && inFrontMm === 0) || !behind.ok || !inFront.ok) return [];
  const room = behind.value + inFront.value;
  return [
    {
      column: { id: `clear:${id}`, title: `Clear gap, ${between}`, unit: grid.unit, kind: 'clear gap' },
      cellOf: (sheet) => grid.cellOf(mapOutcome(gapOf(sheet), (gap) => gap - room)),
    },
  ];
}

const roomInFront = (part: Part | undefined): number => (part ? roomBeside(part, 'front') : 0);

const roomBehind = (part: Part): number => roomBeside(part, 'behind');
