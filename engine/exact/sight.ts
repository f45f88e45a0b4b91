import type { Train } from '../train/types.ts';
import { traceBatch } from './kernel.ts';
import { launch, type Source } from './launch.ts';
import { CODE, LOSSES, REFLECTED, STRIDE, X, Y } from './rayBuffer.ts';
import type { ExactSetup } from './types.ts';

/** One shot at the stop, and what became of the last. */
export interface Sight {
  readonly train: Train;
  readonly stopSurface: number;
  readonly stopRadiusMm: number;
  readonly ray: Float64Array;
  /** Where the last shot met the stop, in shares of its radius. */
  x: number;
  y: number;
  /** Why it did not get there; 0 when it did. */
  code: number;
}

/** A sight on the stop of the setup through the train of its line `line`. */
export function sightOf({ lines, stopSurface, stopRadiusMm }: ExactSetup, line: number): Sight {
  const { train } = lines[line] ?? lines[0];
  return { train, stopSurface, stopRadiusMm, ray: new Float64Array(STRIDE), x: 0, y: 0, code: 0 };
}

/** Shoots the ray with these launch numbers; true when it gets to the stop. Rims do not count. */
export function shoot(sight: Sight, source: Source, a: number, b: number): boolean {
  const { train, ray, stopSurface, stopRadiusMm } = sight;
  launch(source, a, b, ray, 0);
  traceBatch(train, ray, 1, false, 0, stopSurface + 1);
  sight.x = ray[X]! / stopRadiusMm;
  sight.y = ray[Y]! / stopRadiusMm;
  sight.code = reaches(ray[CODE]!, stopSurface) ? 0 : ray[CODE]!;
  return sight.code === 0;
}

/** Whether a ray with this code got to the stop: one that the stop's own surface reflects totally is there. */
export const reaches = (code: number, stopSurface: number): boolean =>
  code === 0 || code === LOSSES * stopSurface + REFLECTED;
