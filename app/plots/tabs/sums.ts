import type { Analysis, Seidel, Sketch, SumName, ThinGlass, ThinPart } from '../../../engine/index.ts';
import { indexOf, SUM_WORDS, seidel, sentenceOf } from '../../../engine/index.ts';
import { nameAt } from '../../drawing/words.ts';
import { emptyPlot, type Plot, type Stem } from '../plot.ts';
import { evenAxis } from '../scale.ts';
import type { Source } from '../source.ts';

const MICRO = 1000;

/** What the plot of the sums is made from: paraxial rays only, so it is there without exact ones. */
export type SumSource = Pick<Source, 'sketch' | 'analysis' | 'view'>;

/** One Seidel sum as stems under the surfaces that add to it, with the sum so far. */
export function sumPlots({ sketch, analysis, view }: SumSource): readonly Plot[] {
  const key = `sum ${view.sum}`;
  const title = capital(SUM_WORDS[view.sum]);
  const found = sumsOf(sketch, analysis);
  if (!found.ok) return [emptyPlot(key, title, sentenceOf(found.why))];
  const { train } = analysis;
  let sum = 0;
  const stems = Array.from(found.value.perSurface[view.sum], (term, surface): Stem => {
    sum += term * MICRO;
    const name = surfaceName(sketch, analysis, surface);
    return { surface, zMm: train.z[surface] ?? 0, name, value: term * MICRO + 0, sum: sum + 0 };
  });
  const reach = Math.max(...stems.map((stem) => Math.max(Math.abs(stem.value), Math.abs(stem.sum))));
  return [
    {
      kind: 'stems',
      key,
      title,
      y: evenAxis('sum', 'µm', 3, reach, 0.01),
      stems,
      notes: leftOut(sketch, found.value, view.sum),
    },
  ];
}

/** The sums of a sketch, its thin parts with the glass and bending that are meant for them. */
const sumsOf = (sketch: Sketch, { train, rays }: Analysis) => seidel(train, rays, thinGlassOf(sketch, train));

function thinGlassOf(sketch: Sketch, train: Analysis['train']): ThinGlass {
  const parts = Array.from(train.partOf, (part) => sketch.parts[part]);
  return {
    index: parts.map((part) => (part?.kind === 'thin' ? glassIndex(sketch, part) : null)),
    shapeFactor: parts.map((part) => (part?.kind === 'thin' ? part.shapeFactor : null)),
  };
}

function glassIndex({ lines, air, assumedIndex }: Sketch, { material, index }: ThinPart): number | null {
  if (material === null) return index ?? assumedIndex;
  const known = indexOf(material, lines.mainNm, lines, air);
  return known.ok ? known.value : null;
}

/** A surface by its part, and by its place in it where there are several. */
function surfaceName(sketch: Sketch, { train }: Analysis, surface: number): string {
  const part = train.partOf[surface] ?? 0;
  const own = Array.from(train.partOf.keys()).filter((k) => train.partOf[k] === part);
  const name = nameAt(sketch, part);
  return own.length === 1 ? name : `${name}, surface ${own.indexOf(surface) + 1}`;
}

/** The five sums need a bending; colour does not. */
function leftOut(sketch: Sketch, { partsLeftOut }: Seidel, sum: SumName): readonly string[] {
  if (partsLeftOut.length === 0 || sum === 'axialColour' || sum === 'lateralColour') return [];
  const names = partsLeftOut.map((part) => nameAt(sketch, part)).join(', ');
  return [`without ${names}: no bending is given`];
}

const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);
