import { indexOf } from '../media/medium.ts';
import { none, type Outcome, some } from '../outcome.ts';
import { newSurface } from '../sketch/create.ts';
import type { Filling, GlassSurface, Medium, Sketch, SolidMedium } from '../sketch/types.ts';
import type { Unsolvable } from './absence.ts';
import { achromat, type Glass } from './achromat.ts';
import type { Bending } from './bending.ts';
import { type Thickness, thickLens } from './thickLens.ts';
import type { ThinEquivalent } from './thinEquivalent.ts';

/** What a thin part shall be made of. */
export type Recipe =
  | {
      readonly kind: 'singlet';
      readonly material: SolidMedium;
      readonly bending: Bending;
      readonly thickness: Thickness;
      /** Which way equal radii are curved; see `LensWish`. */
      readonly curved?: 1 | -1;
    }
  | {
      readonly kind: 'cemented pair';
      /** From left to right. */
      readonly materials: readonly [SolidMedium, SolidMedium];
      readonly thicknessesMm: readonly [number, number];
      /** Of the first of the two. */
      readonly bending: Bending;
    };

/** Glass that was solved for, and what it amounts to. */
export interface Made {
  readonly surfaces: readonly GlassSurface[];
  readonly fillings: readonly Filling[];
  readonly equivalent: ThinEquivalent;
}

/** What lies in front of and behind a part. */
export interface Surroundings {
  readonly inFront: Medium;
  readonly behind: Medium;
}

/** The glass of the recipe that has exactly 1/`focalLengthMm` of power in the main line of the sketch, between its surroundings. */
export function make(
  sketch: Sketch,
  recipe: Recipe,
  focalLengthMm: number,
  { inFront, behind }: Surroundings,
): Outcome<Made, Unsolvable> {
  const [indexInFront, indexBehind] = [glassOf(sketch, inFront), glassOf(sketch, behind)];
  if (!indexInFront.ok) return indexInFront;
  if (!indexBehind.ok) return indexBehind;
  const outside = { indexInFront: indexInFront.value.index, indexBehind: indexBehind.value.index };
  if (recipe.kind === 'singlet') {
    const { material, bending, thickness, curved = 1 } = recipe;
    const glass = glassOf(sketch, material);
    if (!glass.ok) return glass;
    const { index } = glass.value;
    const lens = thickLens({ focalLengthMm, index, bending, thickness, curved, ...outside });
    if (!lens.ok) return lens;
    return some({
      surfaces: lens.value.curvaturesPerMm.map(surfaceOf),
      fillings: [{ thicknessMm: lens.value.thicknessMm, material }],
      equivalent: lens.value,
    });
  }
  const { materials, thicknessesMm, bending } = recipe;
  const [first, second] = [glassOf(sketch, materials[0]), glassOf(sketch, materials[1])];
  if (!first.ok) return first;
  if (!second.ok) return second;
  const glasses = [first.value, second.value] as const;
  const pair = achromat({ focalLengthMm, glasses, thicknessesMm, bending, ...outside });
  if (!pair.ok) return pair;
  return some({
    surfaces: pair.value.curvaturesPerMm.map(surfaceOf),
    fillings: [
      { thicknessMm: thicknessesMm[0], material: materials[0] },
      { thicknessMm: thicknessesMm[1], material: materials[1] },
    ],
    equivalent: pair.value,
  });
}

/** A curvature below this (1/mm) is flat: no radius is longer than 1e12 mm. */
const FLAT = 1e-12;

const surfaceOf = (curvaturePerMm: number): GlassSurface =>
  newSurface(Math.abs(curvaturePerMm) < FLAT ? null : 1 / curvaturePerMm);

/** Index in the main line, and the Abbe number of the sketch's own lines. */
function glassOf({ lines, air }: Sketch, medium: Medium): Outcome<Glass, Unsolvable> {
  const [main, short, long] = [lines.mainNm, lines.shortNm, lines.longNm].map((nm) =>
    indexOf(medium, nm, lines, air),
  );
  if (!main?.ok || !short?.ok || !long?.ok) return none('no index');
  return some({ index: main.value, abbeNumber: (main.value - 1) / (short.value - long.value) });
}
