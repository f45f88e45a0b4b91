import type { Analysis, Setting, Sketch } from '../../engine/index.ts';
import { analyse } from '../../engine/index.ts';

const remembered = new WeakMap<Sketch, Map<string, Analysis>>();

/**
 * Everything first order of `sketch` at `setting`. Remembered by the identity of the sketch, so that drawing, ribbon and
 * panels of one frame share one computation.
 */
export function analysisOf(sketch: Sketch, setting: Setting): Analysis {
  let settings = remembered.get(sketch);
  if (!settings) {
    settings = new Map();
    remembered.set(sketch, settings);
  }
  const key = `${setting.at}+${setting.toNext}`;
  let analysis = settings.get(key);
  if (!analysis) {
    analysis = analyse(sketch, setting);
    settings.set(key, analysis);
  }
  return analysis;
}
