import type {
  Bending,
  GlassPart,
  Outcome,
  Part,
  PartId,
  Recipe,
  Remade,
  Sketch,
  SolidMedium,
  ThinPart,
} from '../../../engine/index.ts';
import {
  bendGlassToShape,
  bendingOf,
  bestShapes,
  indexOf,
  none,
  setShapeFactor,
  settingAt,
  some,
  thickenPart,
  unsolvableSentence,
} from '../../../engine/index.ts';
import { analysisOf } from '../../live/analysis.ts';
import type { Reading } from '../../live/reading.ts';

export type BendingChoice =
  | 'equi'
  | 'flat behind'
  | 'flat in front'
  | 'equal radii, centres right'
  | 'equal radii, centres left'
  | 'least spherical'
  | 'zero coma'
  | 'number';

/** What the form asks for; all of it stays there while one or the other kind is chosen. */
export interface ThickenWish {
  readonly kind: Recipe['kind'];
  readonly materials: readonly [SolidMedium, SolidMedium];
  readonly bending: BendingChoice;
  readonly shapeFactor: number;
  readonly thickness: 'centre' | 'edge';
  readonly thicknessMm: number;
  readonly pairMm: readonly [number, number];
}

/** Least thickness of an edge or of the middle of a negative lens, and it as a share of the diameter, as opticians like it. */
const LEAST_MM = 1;
const LEAST_SHARE = 0.08;
/** Thickness of the two elements of a pair as shares of the diameter, the positive one first. */
const PAIR_SHARES = [0.3, 0.12] as const;
/** Where neither a rim nor a ray tells how wide the glass has to be, mm. */
const BARE_SEMI_MM = 5;
const CROWN: SolidMedium = { material: 'n-bk7' };
const FLINT: SolidMedium = { material: 'n-sf5' };

/** Half the diameter that the glass is made for: the rim that is given, or what the rays need at any position. */
export function semiFor({ sketch }: Pick<Reading, 'sketch'>, id: PartId): number {
  const index = sketch.parts.findIndex((part) => part.id === id);
  const given = sketch.parts[index]?.semiDiameterMm ?? null;
  if (given !== null) return given;
  const needs = sketch.positions.map((position) => {
    const { clear, train } = analysisOf(sketch, settingAt(position.id));
    const need = clear[train.partOf.indexOf(index)]?.neededMm;
    return need?.ok ? need.value : 0;
  });
  return Math.max(...needs) || BARE_SEMI_MM;
}

/** What the form begins with for a part. */
export function firstWish(reading: Reading, part: ThinPart): ThickenWish {
  const diameterMm = 2 * semiFor(reading, part.id);
  const round = (mm: number) => Math.max(LEAST_MM, Math.ceil(2 * mm) / 2);
  const [strong, weak] = PAIR_SHARES.map((share) => round(share * diameterMm));
  const isPositive = part.focalLengthMm > 0;
  const pairMm = isPositive ? ([strong ?? 1, weak ?? 1] as const) : ([weak ?? 1, strong ?? 1] as const);
  return {
    kind: 'singlet',
    materials: [part.material ?? CROWN, FLINT],
    bending: part.shapeFactor === null ? 'equi' : 'number',
    shapeFactor: part.shapeFactor ?? 0,
    thickness: isPositive ? 'edge' : 'centre',
    thicknessMm: round(LEAST_SHARE * diameterMm),
    pairMm,
  };
}

/** The recipe of a wish for a part in its layout, or a sentence on why there is none. */
function recipeOf(wish: ThickenWish, reading: Reading, id: PartId): Outcome<Recipe, string> {
  const { materials, pairMm, thicknessMm } = wish;
  const bent = bendingFor(wish, reading, id);
  if (!bent.ok) return bent;
  const { bending, curved } = bent.value;
  if (wish.kind === 'cemented pair')
    return some({ kind: 'cemented pair', materials, thicknessesMm: pairMm, bending });
  const thickness =
    wish.thickness === 'centre'
      ? ({ kind: 'centre', thicknessMm } as const)
      : ({ kind: 'edge', thicknessMm, semiDiameterMm: semiFor(reading, id) } as const);
  return some({ kind: 'singlet', material: materials[0], bending, thickness, curved });
}

function bendingFor(
  { bending, shapeFactor, materials }: ThickenWish,
  reading: Reading,
  id: PartId,
): Outcome<{ readonly bending: Bending; readonly curved: 1 | -1 }, string> {
  const to = (value: Bending, curved: 1 | -1 = 1) =>
    ({ ok: true, value: { bending: value, curved } }) as const;
  switch (bending) {
    case 'equi':
      return to({ front: 1, rear: -1 });
    case 'flat behind':
      return to({ front: 1, rear: 0 });
    case 'flat in front':
      return to({ front: 0, rear: -1 });
    case 'equal radii, centres right':
      return to({ front: 1, rear: 1 }, 1);
    case 'equal radii, centres left':
      return to({ front: 1, rear: 1 }, -1);
    case 'number':
      return to(bendingOf(shapeFactor));
    default: {
      const best = bestShapeOf(reading, id, materials[0]);
      return best.ok ? to(bendingOf(best.value[bending])) : best;
    }
  }
}

type BestShape = 'least spherical' | 'zero coma';

/** The best bendings of a part of this glass for its own conjugates, or a sentence on why there are none. */
function bestShapeOf(
  { sketch, analysis }: Pick<Reading, 'sketch' | 'analysis'>,
  id: PartId,
  material: SolidMedium,
): Outcome<Readonly<Record<BestShape, number>>, string> {
  const { lines, air } = sketch;
  const index = indexOf(material, lines.mainNm, lines, air);
  return index.ok ? shapesFor({ sketch, analysis }, id, index.value) : none(unsolvableSentence('no index'));
}

function shapesFor(
  { sketch, analysis }: Pick<Reading, 'sketch' | 'analysis'>,
  id: PartId,
  index: number,
): Outcome<Readonly<Record<BestShape, number>>, string> {
  const part = sketch.parts.findIndex((other) => other.id === id);
  const shapes = bestShapes(analysis.train, part, index);
  if (!shapes.ok) return none(unsolvableSentence(shapes.why));
  const { leastSpherical, zeroComa } = shapes.value;
  return some({ 'least spherical': leastSpherical, 'zero coma': zeroComa });
}

/** Whether a part can be bent to a best form: one lens of one glass, real or meant. */
export const hasBestForm = (part: Part | undefined): part is ThinPart | GlassPart =>
  part?.kind === 'thin' || (part?.kind === 'glass' && part.fillings.length === 1);

/** The sketch with a lens bent to its best form at constant power, or a sentence on why that cannot be. */
export function bentToBest(
  reading: Pick<Reading, 'sketch' | 'analysis'>,
  part: ThinPart | GlassPart,
  best: BestShape,
): Outcome<Sketch, string> {
  const { sketch } = reading;
  const material = part.kind === 'thin' ? part.material : (part.fillings[0]?.material ?? null);
  const shapes =
    material === null && part.kind === 'thin'
      ? shapesFor(reading, part.id, part.index ?? sketch.assumedIndex)
      : bestShapeOf(reading, part.id, material ?? CROWN);
  if (!shapes.ok) return shapes;
  if (part.kind === 'thin') return some(setShapeFactor(sketch, part.id, shapes.value[best]));
  const bent = bendGlassToShape(sketch, part.id, shapes.value[best]);
  return bent.ok ? some(bent.value.sketch) : none(unsolvableSentence(bent.why));
}

/** The sketch with the part thickened as wished, or a sentence on why that cannot be. */
export function thickened(wish: ThickenWish, reading: Reading, id: PartId): Outcome<Remade, string> {
  const recipe = recipeOf(wish, reading, id);
  if (!recipe.ok) return recipe;
  const made = thickenPart(reading.sketch, id, recipe.value);
  return made.ok ? made : none(unsolvableSentence(made.why));
}
