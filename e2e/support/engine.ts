import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import type { Analysis, Sketch } from '../../engine/index.ts';
import { analyse, parseSketch, settingAt } from '../../engine/index.ts';

/** The text of a file in `public/sketches`. */
export const sketchText = (file: string): string =>
  readFileSync(fileURLToPath(new URL(`../../public/sketches/${file}`, import.meta.url)), 'utf8');

/** The sketch in a text; a text that holds none is a fault of the test. */
export function sketchIn(text: string): Sketch {
  const parsed = parseSketch(text);
  if (!parsed.ok) throw new Error(`sketchIn: ${parsed.faults.map(({ sentence }) => sentence).join(' ')}`);
  return parsed.sketch;
}

/** The demo: the inspection camera of a seed-sorting line. */
export const DEMO = sketchIn(sketchText('inspection-zoom.json'));

/** What the engine says of a sketch at its position number `index`. */
export function analysisAt(sketch: Sketch, index: number): Analysis {
  const position = sketch.positions[index];
  if (!position) throw new Error(`analysisAt: there is no position ${index}`);
  return analyse(sketch, settingAt(position.id));
}
