import { type Analysis, analyse } from '../../engine/paraxial/analyse.ts';
import { moveParts } from '../../engine/sketch/edits/gaps.ts';
import { propose, unsettled } from '../../engine/sketch/propose.ts';
import type { Setting, Sketch } from '../../engine/sketch/types.ts';
import { settingAt } from '../../engine/sketch/values.ts';

/** What a frame does with a new analysis: a scene, the texts of the panels. Returns a number that depends on its work. */
export type FrameStep = (sketch: Sketch, setting: Setting, analysis: Analysis) => number;

const MOVES = 64;
const REACH_MM = 1.5;

/**
 * A task that is one pointer move of a drag on the middle part: the edit made on the sketch at the press, the rules and the
 * settling, the whole analysis at the position in view, then every one of `frame`. Nothing is painted. Successive
 * runs move the part to and fro, each to a place of its own.
 */
export function liveUpdate(pressed: Sketch, frame: readonly FrameStep[] = []): () => number {
  const part = pressed.parts[pressed.parts.length >> 1];
  const position = pressed.positions[0];
  if (part === undefined || position === undefined)
    throw new Error('liveUpdate: the sketch has no part to drag');
  const setting = settingAt(position.id);
  let move = 0;
  return () => {
    move = (move + 1) % MOVES;
    const deltaMm = REACH_MM * Math.sin((2 * Math.PI * (move + 0.5)) / MOVES);
    const edit = (sketch: Sketch): Sketch => moveParts(sketch, [part.id], deltaMm, position.id);
    const { sketch } = propose(pressed, edit, unsettled);
    const analysis = analyse(sketch, setting);
    let sum = weigh(analysis);
    for (const step of frame) sum += step(sketch, setting, analysis);
    return sum;
  };
}

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
