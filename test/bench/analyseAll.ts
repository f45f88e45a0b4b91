import { type Analysis, analyse } from '../../engine/paraxial/analyse.ts';
import type { Sketch } from '../../engine/sketch/types.ts';
import { settingAt } from '../../engine/sketch/values.ts';

/** A task that analyses the sketch at all of its positions. */
export function analyseAll(sketch: Sketch): () => number {
  const settings = sketch.positions.map(({ id }) => settingAt(id));
  return () => {
    let sum = 0;
    for (const setting of settings) sum += weigh(analyse(sketch, setting));
    return sum;
  };
}

/** A number that depends on what came last in an analysis. */
const weigh = ({ firstOrder, conjugates, light }: Analysis): number =>
  (firstOrder.focalLengthMm.ok ? firstOrder.focalLengthMm.value : 0) +
  (conjugates.magnification.ok ? conjugates.magnification.value : 0) +
  (light.imageHeightMm.ok ? light.imageHeightMm.value : 0);
