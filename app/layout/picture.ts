import type { MeasureText } from '../board/measure.ts';
import type { Viewport } from '../board/viewport.ts';
import type { Handle } from '../drawing/handle.ts';
import { endHandles } from '../drawing/handles/ends.ts';
import { markHandles } from '../drawing/handles/marks.ts';
import { partHandles } from '../drawing/handles/parts.ts';
import { type Label, labelsOf } from '../drawing/layers/labels.ts';
import type { Scene } from '../drawing/scene.ts';
import { sceneOf } from '../drawing/scene.ts';
import { type Sight, sightOf } from '../drawing/sight.ts';
import type { Reading } from '../live/reading.ts';
import { cellsOf } from '../ribbon/cells.ts';
import { ribbonHandles } from '../ribbon/handles.ts';
import { type RibbonPlan, ribbonPlan } from '../ribbon/layout.ts';

/** Everything that one frame of the board shows and offers to the hand. */
export interface Picture {
  readonly reading: Reading;
  readonly view: Viewport;
  readonly scene: Scene;
  readonly plan: RibbonPlan;
  readonly labels: readonly Label[];
  readonly handles: readonly Handle[];
  readonly sight: Sight;
}

/** The scene of a reading. */
export const sceneOfReading = ({ sketch, analysis, view, warnings }: Reading): Scene =>
  sceneOf(sketch, analysis, view, warnings);

/** The picture of a reading in a view; `scene` may be passed when it is at hand. */
export function pictureOf(
  reading: Reading,
  view: Viewport,
  measure: MeasureText,
  scene: Scene = sceneOfReading(reading),
): Picture {
  const sight = sightOf(reading, scene, view);
  const plan = ribbonPlan(cellsOf(sight), sight, measure);
  return {
    reading,
    sight,
    view,
    scene,
    plan,
    labels: reading.view.shown.labels ? labelsOf(scene, view, reading.view.unit, measure) : [],
    handles: [
      ...partHandles(sight),
      ...endHandles(sight),
      ...ribbonHandles(plan, sight),
      ...markHandles(sight),
    ],
  };
}
