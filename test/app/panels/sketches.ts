import type { PartId, PositionId, Sketch } from '../../../engine/index.ts';
import { emptySketch, insertPart, newThin } from '../../../engine/index.ts';

const ONLY = 'only' as PositionId;
const id = (name: string) => name as PartId;

/** Nothing on the axis. */
export const empty = (): Sketch => emptySketch();

/** One positive element, object at infinity, no stop. */
export const single = (): Sketch => insertPart(emptySketch(), newThin(50, id('p1')), 0, ONLY);

/** Two positive elements a sum of focal lengths apart. */
export const afocal = (): Sketch =>
  insertPart(insertPart(emptySketch(), newThin(50, id('p1')), 0, ONLY), newThin(100, id('p2')), 150, ONLY);
