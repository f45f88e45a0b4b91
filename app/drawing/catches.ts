import type { PartId } from '../../engine/index.ts';
import { partName } from '../../engine/index.ts';
import type { Catch } from '../board/snap.ts';
import type { Sight } from './sight.ts';
import { nameAt } from './words.ts';

/**
 * Where a drag of `moving` may be caught: the focal points of the parts that stay, the images that they form in front of what
 * moves, and the image plane when it is fixed. Everything is where it was at the press, so a catch does not run away. When the drag
 * `carries` what is behind along, only what is in front of it stays.
 */
export function catchesFor(
  { reading, scene }: Sight,
  moving: readonly PartId[],
  carries = false,
): readonly Catch[] {
  const { sketch, analysis } = reading;
  const catches: Catch[] = [];
  const firstMoving = sketch.parts.findIndex((part) => moving.includes(part.id));
  for (const { part, index, frontMm } of scene.parts) {
    if (part.kind !== 'thin' || moving.includes(part.id) || (carries && index > firstMoving)) continue;
    const name = partName(part, index);
    catches.push({ at: frontMm - part.focalLengthMm, name: `front focus of ${name}` });
    catches.push({ at: frontMm + part.focalLengthMm, name: `rear focus of ${name}` });
  }
  for (const row of analysis.ledger) {
    if (row.partIndex >= firstMoving || !row.imageZ.ok) continue;
    catches.push({ at: row.imageZ.value, name: `image of ${nameAt(sketch, row.partIndex)}` });
  }
  if (scene.sensorFixed && !carries && scene.stage.imageMm !== null)
    catches.push({ at: scene.stage.imageMm, name: 'sensor' });
  return catches;
}
