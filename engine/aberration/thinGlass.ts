import type { Line, Sketch } from '../sketch/types.ts';
import { indicesIn } from '../train/indices.ts';
import type { Train } from '../train/types.ts';
import type { ThinGlass } from './seidel.ts';

/**
 * Glass and bending of the sketch's thin parts at the surfaces of its train, for `seidel`: the index of the chosen glass in the line, else the part's
 * own or the assumed one, which are relative to air; null for what is no thin part. The bending is null where the part has none.
 */
export function thinGlassOf(sketch: Sketch, train: Train, line: Line = 'main'): ThinGlass {
  const indices = indicesIn(sketch, line);
  const partAt = Array.from(train.partOf, (part) => sketch.parts[part]);
  return {
    index: partAt.map((part) => {
      if (part?.kind !== 'thin') return null;
      if (part.material !== null) return indices.of(part.material).index;
      return (part.index ?? sketch.assumedIndex) * indices.of('air').index;
    }),
    shapeFactor: partAt.map((part) => (part?.kind === 'thin' ? part.shapeFactor : null)),
  };
}
