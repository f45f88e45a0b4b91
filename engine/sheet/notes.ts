import { firstOrder } from '../paraxial/firstOrder.ts';
import type { Sketch } from '../sketch/types.ts';
import { objectDistanceAt, settingAt } from '../sketch/values.ts';
import { roomBeside } from '../train/body.ts';
import { trainOf } from '../train/train.ts';
import type { Grid } from './grid.ts';
import { imageWord, labelOf } from './labels.ts';
import type { Datum, SheetOptions } from './table.ts';

const LIGHT_CAUTION =
  'Caution: this layout can concentrate collimated light. Sunlight or a laser beam that enters it can burn eyes, skin and material. Assess the hazard by IEC 60825-1 and your local rules, with your laser safety officer.';

/**
 * The caution that every hand-over of a layout for collimated light carries: where the object is at infinity, or the
 * layout afocal, at one of its positions. Null for all others, and while there is no part.
 */
export const cautionOf = (sketch: Sketch): string | null =>
  sketch.parts.length > 0 &&
  sketch.positions.some((position) => {
    const setting = settingAt(position.id);
    return (
      objectDistanceAt(sketch.object.distanceMm, sketch.positions, setting) === 'infinity' ||
      firstOrder(trainOf(sketch, setting)).afocal
    );
  })
    ? LIGHT_CAUTION
    : null;

/** What the numbers of the table assume, most important first. */
export function notesOf(sketch: Sketch, options: SheetOptions, grid: Grid): readonly string[] {
  const caution = cautionOf(sketch);
  return [
    ...(caution === null ? [] : [caution]),
    `Spacing table of ${sketch.title}, from paraxial rays in the main line, ${sketch.lines.mainNm} nm.`,
    `Distances are counted from ${datumWords(sketch, options.datum)}, positive to the right, the way the light runs.`,
    ...gapNotes(sketch),
    roundingNote(grid),
    imageNote(sketch),
    ...stopNotes(sketch),
    'Focal length is 1/power. Working f-number is 1/(2 n′ |u′|) of the marginal ray at the image.',
    clearNote(sketch),
  ];
}

function datumWords(sketch: Sketch, datum: Datum): string {
  if (datum === 'first part') return `${labelOf(sketch, 0)}, the first part`;
  return datum === 'sensor'
    ? `the ${imageWord(sketch)}`
    : `the mount plane, ${sketch.registerMm} mm in front of the ${imageWord(sketch)}`;
}

function gapNotes(sketch: Sketch): readonly string[] {
  const thin = sketch.parts.filter((part) => part.kind === 'thin');
  const narrowed = sketch.parts.some(
    (part) => roomBeside(part, 'front') !== 0 || roomBeside(part, 'behind') !== 0,
  );
  return [
    ...(thin.length > 0
      ? [
          'Elements are thin: gaps run from principal plane to principal plane. The vertices of real glass stand elsewhere.',
        ]
      : []),
    ...(sketch.parts.some((part) => part.kind === 'glass')
      ? ['Gaps in front of and behind glass run to its vertices on the axis.']
      : []),
    ...(narrowed
      ? ['A clear gap is the gap less the room that glass takes up, or has reserved, on both of its sides.']
      : []),
  ];
}

function stopNotes(sketch: Sketch): readonly string[] {
  if (sketch.stop === null)
    return ['No stop is given: the rim that limits the axial bundle takes its place.'];
  const index = sketch.parts.findIndex((part) => part.id === sketch.stop);
  if (sketch.parts[index]?.kind === 'stop') return [];
  return [`The stop rides on ${labelOf(sketch, index)}, in front of its refraction.`];
}

function roundingNote(grid: Grid): string {
  const step = `${(10 ** -grid.digits).toFixed(grid.digits)} ${grid.unit}`;
  const inch = grid.unit === 'in' ? ' Inches are exact: 25.4 mm.' : '';
  return `Lengths are rounded to ${step}: distances from the datum first, gaps as their differences, so that they add up.${inch} Image miss is how far that rounding moves the paraxial image from the image plane, positive behind it.`;
}

const imageNote = (sketch: Sketch): string =>
  sketch.image === 'fixed'
    ? 'The sensor is fixed. Defocus is the paraxial image minus the sensor plane in the sketch as drawn.'
    : 'The image plane follows the paraxial focus of the main line.';

function clearNote({ field }: Sketch): string {
  const share =
    field.vignetting === 0
      ? 'without vignetting'
      : `with ${Number((100 * field.vignetting).toFixed(1))} % of the pupil height lost`;
  return `Clear diameters needed are the largest over all positions, for the largest field ${share}.`;
}
