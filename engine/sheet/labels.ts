import type { Part, Position, Sketch } from '../sketch/types.ts';

/** What a part is called in the table: its name, or its number along the axis. */
export const labelOf = (sketch: Sketch, index: number): string =>
  sketch.parts[index]?.name.trim() || `part ${index + 1}`;

/** What a position is called in the table. */
export const positionLabel = (position: Position): string => position.name.trim() || position.id;

/** What a part offers to measure from: a thin part its principal plane, a plate a face, a stop its plane. */
export function planeOf(part: Part | undefined): string {
  if (part?.kind === 'thin') return 'principal plane';
  return part?.kind === 'plate' ? 'face' : 'stop plane';
}

/** What the image plane is called: the sensor when it is fixed. */
export const imageWord = (sketch: Sketch): string =>
  sketch.image === 'fixed' ? 'sensor' : 'image at the focus';
