import type { MeasureText } from '../board/measure.ts';
import type { Viewport } from '../board/viewport.ts';
import { lostHandles } from '../drawing/exact/handles.ts';
import { exactRaysOf } from '../drawing/exact/rays.ts';
import type { Handle } from '../drawing/handle.ts';
import { endHandles } from '../drawing/handles/ends.ts';
import { markHandles } from '../drawing/handles/marks.ts';
import { partHandles } from '../drawing/handles/parts.ts';
import { type Label, labelsOf } from '../drawing/layers/labels.ts';
import { loupeHandles, withCovered } from '../drawing/loupe/handles.ts';
import { type Loupe, loupeOf } from '../drawing/loupe/loupe.ts';
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
  readonly loupe: Loupe | null;
}

/** The scene of a reading, with its exact rays as far as they are shown. */
export function sceneOfReading(reading: Reading): Scene {
  const { sketch, analysis, view, warnings, exact } = reading;
  const { exact: asked, whiskers, largest } = view.exact;
  const rays = exact.differs && (asked || whiskers || largest) ? exactRaysOf(reading) : null;
  return sceneOf(sketch, analysis, view, warnings, exact.differs ? { shown: view.exact, rays } : null);
}

/** The picture of a reading in a view; `scene` may be passed when it is at hand. */
export function pictureOf(
  reading: Reading,
  view: Viewport,
  measure: MeasureText,
  scene: Scene = sceneOfReading(reading),
): Picture {
  const sight = sightOf(reading, scene, view);
  const loupe = loupeOf(reading, view);
  const plan = ribbonPlan(cellsOf(sight), sight, measure);
  return {
    reading,
    sight,
    view,
    scene,
    loupe,
    plan,
    labels: reading.view.shown.labels ? labelsOf(scene, view, reading.view.unit, measure) : [],
    handles: [
      ...withCovered(
        [
          ...partHandles(sight),
          ...endHandles(sight),
          ...ribbonHandles(plan, sight),
          ...markHandles(sight),
          ...lostHandles(sight),
        ],
        loupe,
      ),
      ...loupeHandles(sight, loupe),
    ],
  };
}
