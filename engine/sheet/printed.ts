import type { Outcome } from '../outcome.ts';
import { mapOutcome, none, some } from '../outcome.ts';
import { conjugates } from '../paraxial/conjugates.ts';
import { lengthOf } from '../sketch/part.ts';
import type { Part, Setting, Sketch } from '../sketch/types.ts';
import { placesOf } from '../train/places.ts';
import { trainOf } from '../train/train.ts';
import type { Grid } from './grid.ts';
import type { Datum } from './table.ts';

/** The layout at one position as it is printed: whole steps of the last digit, counted from the datum. */
export interface PrintedLayout {
  /** Front and rear vertex of every part. */
  readonly parts: readonly { readonly front: number; readonly rear: number }[];
  /** The sensor plane, or the paraxial image where the image follows the focus. */
  readonly image: Outcome<number>;
  /** From the object to the first part, positive. */
  readonly objectDistance: Outcome<number>;
  /**
   * How far the paraxial image moves from the image plane when everything stands where it is printed; positive when it
   * falls behind. Defocus that the sketch has already is not counted.
   */
  readonly imageMissMm: Outcome<number>;
}

/**
 * `sketch` at `setting` on the grid. Distances from the datum are rounded; a plate and each piece of glass keep their own rounded
 * thickness, so it is the same at every position. Absent, with a sentence, when the datum plane does not exist.
 */
export function printedLayout(
  sketch: Sketch,
  setting: Setting,
  datum: Datum,
  grid: Grid,
): Outcome<PrintedLayout> {
  const places = placesOf(sketch, setting);
  const { imagePlaneMm, defocusMm } = conjugates(trainOf(sketch, setting));
  const lastRearMm = places.parts.at(-1)?.rearMm ?? 0;
  const imageMm = mapOutcome(imagePlaneMm, (fromLast) => lastRearMm + fromLast);
  const datumMm = datumPlane(sketch, datum, imageMm);
  if (!datumMm.ok) return datumMm;
  const onGrid = (mm: number): Outcome<number> => grid.stepsOf(mm - datumMm.value);

  const parts: { front: number; rear: number }[] = [];
  for (const [k, place] of places.parts.entries()) {
    const front = onGrid(place.frontMm);
    const thickness = grid.stepsOf(lengthOf(onGridInside(sketch.parts[k] as Part, grid)));
    if (!front.ok || !thickness.ok)
      return none('The image plane lies too far away to be the datum: choose the first part as the datum.');
    parts.push({ front: front.value, rear: front.value + thickness.value });
  }
  const image = imageMm.ok ? onGrid(imageMm.value) : imageMm;
  const objectDistance: Outcome<number> =
    places.objectMm === null ? none('object at infinity') : grid.stepsOf(-places.objectMm);
  const printed = { parts, image, objectDistance };
  return some({ ...printed, imageMissMm: imageMiss(sketch, setting, printed, defocusMm, grid) });
}

/** The part with every thickness inside it rounded to the grid; one too large to round stays as it is. */
export function onGridInside(part: Part, grid: Grid): Part {
  const rounded = (mm: number): number => {
    const steps = grid.stepsOf(mm);
    return steps.ok ? grid.mmOf(steps.value) : mm;
  };
  if (part.kind === 'plate') return { ...part, thicknessMm: rounded(part.thicknessMm) };
  if (part.kind !== 'glass') return part;
  const fillings = part.fillings.map((filling) => ({
    ...filling,
    thicknessMm: rounded(filling.thicknessMm),
  }));
  return { ...part, fillings };
}

function datumPlane(sketch: Sketch, datum: Datum, imageMm: Outcome<number>): Outcome<number> {
  if (datum === 'first part') return some(0);
  if (!imageMm.ok)
    return none(
      `There is no image plane to count from (${imageMm.why}): choose the first part as the datum.`,
    );
  return some(datum === 'mount' ? imageMm.value - (sketch.registerMm ?? 0) : imageMm.value);
}

/** The image of the layout built with the printed numbers, against the printed image plane. */
function imageMiss(
  sketch: Sketch,
  setting: Setting,
  printed: Omit<PrintedLayout, 'imageMissMm'>,
  defocusMm: Outcome<number>,
  grid: Grid,
): Outcome<number> {
  const { parts, image, objectDistance } = printed;
  if (!image.ok) return image;
  if (!defocusMm.ok) return defocusMm;
  const built: Sketch = {
    ...sketch,
    object: {
      ...sketch.object,
      distanceMm: objectDistance.ok ? grid.mmOf(objectDistance.value) : 'infinity',
    },
    parts: sketch.parts.map((part, k): Part => {
      const here = parts[k] ?? { front: 0, rear: 0 };
      const next = parts[k + 1]?.front ?? image.value;
      const space = { ...part.space, lengthMm: grid.mmOf(next - here.rear) };
      return { ...onGridInside(part, grid), space };
    }),
  };
  const lastRear = parts.at(-1)?.rear ?? 0;
  const printedMm = grid.mmOf(image.value - lastRear);
  return mapOutcome(
    conjugates(trainOf(built, setting)).imageDistanceMm,
    (imageDistanceMm) => imageDistanceMm - printedMm - defocusMm.value,
  );
}

/** The printed gap behind part `k` in steps: to the next part, behind the last one to the image plane. */
export function gapBehind({ parts, image }: PrintedLayout, k: number): Outcome<number> {
  const rear = parts[k]?.rear ?? 0;
  const next = parts[k + 1];
  return next === undefined ? mapOutcome(image, (plane) => plane - rear) : some(next.front - rear);
}
