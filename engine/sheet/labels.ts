import type { Part, Position, Sketch } from '../sketch/types.ts';
import { partName } from '../sketch/words.ts';

/** What the part at `index` is called in the table. */
export function labelOf(sketch: Sketch, index: number): string {
  const part = sketch.parts[index];
  return part ? partName(part, index) : '';
}

/** What a position is called in the table. */
export const positionLabel = (position: Position): string => position.name.trim() || position.id;

/** What a part offers to measure from: a thin part its principal plane, a plate a face, glass a vertex, a stop its plane. */
export function planeOf(part: Part | undefined): string {
  if (part?.kind === 'thin') return 'principal plane';
  if (part?.kind === 'glass') return 'vertex';
  return part?.kind === 'plate' ? 'face' : 'stop plane';
}

/** What the image plane is called: the sensor when it is fixed. */
export const imageWord = (sketch: Sketch): string =>
  sketch.image === 'fixed' ? 'sensor' : 'image at the focus';
