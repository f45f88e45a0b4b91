import { analyse } from '../paraxial/analyse.ts';
import { unbuildable } from '../paraxial/warnings.ts';
import type { PartId, PositionId, Sketch } from '../sketch/types.ts';
import { settingAt } from '../sketch/values.ts';
import { positionColumns } from './columns.ts';
import { elementBlock } from './elements.ts';
import { gridOf } from './grid.ts';
import { notesOf } from './notes.ts';
import type { PositionSheet } from './positionSheet.ts';
import { printedLayout } from './printed.ts';
import type { SheetOptions, SpacingTable } from './table.ts';

/** One reason why no table is given. */
export interface Refusal {
  readonly partId: PartId | null;
  readonly positionId: PositionId | null;
  readonly sentence: string;
}

/** The table, or everything that stands against it. */
export type Spacing =
  | { readonly ok: true; readonly value: SpacingTable }
  | { readonly ok: false; readonly why: 'cannot be built'; readonly refusals: readonly Refusal[] };

/**
 * The spacing table: a row for each position, a block of clear diameters for the elements, and what the numbers assume.
 * Distances from the datum are rounded, gaps are their differences, so that the printed numbers add up exactly; the image
 * miss of every position is what that rounding does to the focus. Refused, with every reason at once, when something
 * cannot be built at any position or the datum plane does not exist. Throws a RangeError for digits beyond 0 to 6.
 */
export function spacingTable(sketch: Sketch, options: SheetOptions): Spacing {
  const grid = gridOf(options);
  if (sketch.parts.length === 0) return { ok: false, why: 'cannot be built', refusals: [NO_PARTS] };
  const refusals: Refusal[] = refusalsOf(sketch, options);
  const sheets: PositionSheet[] = [];
  for (const position of sketch.positions) {
    const setting = settingAt(position.id);
    const printed = printedLayout(sketch, setting, options.datum, grid);
    if (printed.ok) sheets.push({ position, analysis: analyse(sketch, setting), printed: printed.value });
    else refusals.push({ partId: null, positionId: position.id, sentence: printed.why });
  }
  if (refusals.length > 0) return { ok: false, why: 'cannot be built', refusals };
  const columns = positionColumns(sketch, sheets, options.datum, grid);
  return {
    ok: true,
    value: {
      title: sketch.title,
      options,
      positions: {
        columns: columns.map(({ column }) => column),
        rows: sheets.map((sheet) => ({
          id: sheet.position.id,
          cells: columns.map(({ cellOf }) => cellOf(sheet)),
        })),
      },
      elements: elementBlock(sketch, sheets, grid),
      notes: notesOf(sketch, options, grid),
    },
  };
}

const NO_PARTS: Refusal = {
  partId: null,
  positionId: null,
  sentence: 'The sketch has no parts: there is nothing to space.',
};

const NO_MOUNT: Refusal = {
  partId: null,
  positionId: null,
  sentence: 'There is no mount plane to count from: give a register distance or choose another datum.',
};

function refusalsOf(sketch: Sketch, { datum, unit }: SheetOptions): Refusal[] {
  const faulty = unbuildable(sketch).map(({ partId, positionId, sentence }) => ({
    partId,
    positionId,
    sentence: sentence(unit),
  }));
  return datum === 'mount' && sketch.registerMm === null ? [NO_MOUNT, ...faulty] : faulty;
}
