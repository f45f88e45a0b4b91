import { saying, type Warning } from '../paraxial/warning.ts';
import type { PositionId, Sketch } from '../sketch/types.ts';
import { partName } from '../sketch/words.ts';
import type { Train } from '../train/types.ts';
import { traceBatch } from './kernel.ts';
import { mapRays, pupilMapOf } from './pupilMap.ts';
import { CODE, lostOf, STRIDE } from './rayBuffer.ts';
import type { ExactSetup, Lost } from './types.ts';

/** Whether an exact ray can differ from the paraxial one: ideal thin parts and stops send both the same way. */
export function refracts({ count, thinPower, index }: Train): boolean {
  for (let k = 0; k < count; k++) if (thinPower[k] === 0 && index[k] !== index[k + 1]) return true;
  return false;
}

/** A field of which no exact ray gets through, and what becomes of its chief ray (or of the first ray, when that one is only clipped). */
export interface LostField {
  readonly fraction: number;
  readonly lost: Lost;
}

/** Points of the stop that are tried, x and y in turn: the meridian from rim to rim, and across it. */
const TRIED = Float64Array.of(
  ...[0, 0, 0, 0.25, 0, -0.25, 0, 0.5, 0, -0.5, 0, 0.75, 0, -0.75, 0, 1, 0, -1],
  ...[0.5, 0, 0.5, 0.5, 0.5, -0.5, 0.9, 0],
);
const TRIED_COUNT = TRIED.length / 2;

/** The fields, as shares of the largest, that are dark because every exact ray of theirs in the main line is lost; rims count. */
export function lostFields(setup: ExactSetup, fractions: readonly number[]): readonly LostField[] {
  const rays = new Float64Array(TRIED_COUNT * STRIDE);
  return fractions.flatMap((fraction) => {
    const map = pupilMapOf(setup, 0, fraction);
    if (map.lost) return [{ fraction, lost: map.lost }];
    mapRays(map, TRIED, TRIED_COUNT, rays);
    traceBatch(setup.lines[0].train, rays, TRIED_COUNT, true);
    for (let i = 0; i < TRIED_COUNT; i++) if (rays[i * STRIDE + CODE] === 0) return [];
    const lost = lostOf(rays[CODE]!);
    return lost ? [{ fraction, lost }] : [];
  });
}

/** What happened to a ray, in words: “missed surface 3 (second group)”. */
export function lostWords({ why, surface }: Lost, sketch: Sketch, train: Train): string {
  const index = train.partOf[surface] ?? -1;
  const part = sketch.parts[index];
  const where = `surface ${surface + 1}${part ? ` (${partName(part, index)})` : ''}`;
  return why === 'missed' ? `missed ${where}` : `${why} at ${where}`;
}

/** A warning for each field of the sketch that is dark in exact rays. */
export function lostFieldWarnings(
  sketch: Sketch,
  positionId: PositionId,
  setup: ExactSetup,
): readonly Warning[] {
  const { train } = setup.lines[0];
  if (!refracts(train)) return [];
  return lostFields(setup, sketch.field.fractions).map(({ fraction, lost }) => {
    const field = fraction === 0 ? 'on the axis' : `at ${Number((100 * fraction).toFixed(1))} % of the field`;
    return {
      kind: 'field lost',
      severity: 'look at this',
      partId: sketch.parts[train.partOf[lost.surface] ?? -1]?.id ?? null,
      positionId,
      sentence: saying`No exact ray ${field} gets through: ${lostWords(lost, sketch, train)}.`,
    };
  });
}
