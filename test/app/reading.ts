import { analysisOf, warningsAt } from '../../app/live/analysis.ts';
import { exactOf } from '../../app/live/exact.ts';
import type { Reading } from '../../app/live/reading.ts';
import { settingIn, type View, viewStore } from '../../app/store/viewStore.ts';
import type { Sketch } from '../../engine/index.ts';

/** What the app reads from a sketch in a view that differs from the first one by `change`. */
export function readingOf(sketch: Sketch, change: Partial<View> = {}): Reading {
  const view = { ...viewStore.getInitialState(), ...change };
  const setting = settingIn(sketch, view);
  return {
    sketch,
    view,
    setting,
    analysis: analysisOf(sketch, setting),
    get exact() {
      return exactOf(sketch, setting);
    },
    warnings: warningsAt(sketch, setting),
  };
}
