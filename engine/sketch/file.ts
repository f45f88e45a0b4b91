import type { Sketch } from './types.ts';

/** The mark that every sketch file carries. */
export const SKETCH_FORMAT = 'gapwright-sketch';
/** The version of the file form that is written, and the latest that is read. */
export const SKETCH_VERSION = 2;

/** The sketch as the text of a file: JSON, two spaces deep, format and version first, every number with all its digits. */
export function writeSketch(sketch: Sketch): string {
  return `${JSON.stringify({ format: SKETCH_FORMAT, version: SKETCH_VERSION, ...sketch }, null, 2)}\n`;
}
