import type { Viewport } from '../board/viewport.ts';
import type { Reading } from '../live/reading.ts';
import { formatLength } from '../ui/format.ts';
import type { Scene } from './scene.ts';

/** What handles are made from: the reading, its scene, and where the drawing looks. */
export interface Sight {
  readonly reading: Reading;
  readonly scene: Scene;
  readonly view: Viewport;
  /** A length in the unit shown, with its unit. */
  readonly length: (lengthMm: number) => string;
}

/** The sight of a reading in a view. */
export function sightOf(reading: Reading, scene: Scene, view: Viewport): Sight {
  const { unit, digits } = reading.view;
  return { reading, scene, view, length: (lengthMm) => `${formatLength(lengthMm, unit, digits)} ${unit}` };
}
