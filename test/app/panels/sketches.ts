import type { PartId, PositionId, Sketch } from '../../../engine/index.ts';
import { emptySketch, insertPart, newThin, parseSketch } from '../../../engine/index.ts';

const ONLY = 'only' as PositionId;
const id = (name: string) => name as PartId;

/** Nothing on the axis. */
export const empty = (): Sketch => emptySketch();

/** One positive element, object at infinity, no stop. */
export const single = (): Sketch => insertPart(emptySketch(), newThin(50, id('p1')), 0, ONLY);

/** Two positive elements a sum of focal lengths apart. */
export const afocal = (): Sketch =>
  insertPart(insertPart(emptySketch(), newThin(50, id('p1')), 0, ONLY), newThin(100, id('p2')), 150, ONLY);

/** A sketch file's text read; throws on a fault, which would be the test's own mistake. */
export function readSketch(text: string): Sketch {
  const parsed = parseSketch(text);
  if (!parsed.ok) throw new Error(parsed.faults.map(({ sentence }) => sentence).join(' '));
  return parsed.sketch;
}
