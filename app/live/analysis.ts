import type { Analysis, Setting, Sketch, Warning } from '../../engine/index.ts';
import { analyse, exactSetupOf, lostFieldWarnings, warningsOf } from '../../engine/index.ts';

/** `compute` of a sketch at a setting, remembered by the identity of the sketch. */
export function remembering<T>(compute: (sketch: Sketch, setting: Setting) => T) {
  const remembered = new WeakMap<Sketch, Map<string, T>>();
  return (sketch: Sketch, setting: Setting): T => {
    const settings = remembered.get(sketch) ?? new Map<string, T>();
    remembered.set(sketch, settings);
    const key = `${setting.at}+${setting.toNext}`;
    const known = settings.get(key);
    if (known !== undefined) return known;
    const result = compute(sketch, setting);
    settings.set(key, result);
    return result;
  };
}

/**
 * Everything first order of a sketch at a setting. Remembered, so that drawing, ribbon and panels of one frame share one
 * computation.
 */
export const analysisOf: (sketch: Sketch, setting: Setting) => Analysis = remembering(analyse);

/** What a person should know about a sketch at a setting, what cannot be built first; remembered likewise. */
export const warningsAt: (sketch: Sketch, setting: Setting) => readonly Warning[] = remembering(
  (sketch, setting) => {
    const analysis = analysisOf(sketch, setting);
    const setup = exactSetupOf(sketch, setting, analysis);
    return [
      ...warningsOf(sketch, setting, analysis),
      ...(setup.ok ? lostFieldWarnings(sketch, setting.at, setup.value) : []),
    ];
  },
);
