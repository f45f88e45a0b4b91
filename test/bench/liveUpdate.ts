import type { MeasureText } from '../../app/board/measure.ts';
import { fitCamera, foldIn, viewportOf } from '../../app/layout/camera.ts';
import { type Picture, pictureOf, sceneOfReading } from '../../app/layout/picture.ts';
import type { Reading } from '../../app/live/reading.ts';
import { documentOf, preview } from '../../app/store/document.ts';
import type { Sketch } from '../../engine/sketch/types.ts';
import { readingOf } from '../app/reading.ts';
import { panelTexts } from './panelTexts.ts';

/** What one frame of a drag comes to. */
export interface LiveFrame {
  readonly reading: Reading;
  readonly picture: Picture;
  readonly texts: readonly string[];
}

const MOVES = 64;
const REACH_MM = 1.5;
/** The board of a desktop page, px. */
const SIZE = { widthPx: 1080, heightPx: 720 };

/**
 * Every call is one pointer move of a drag on the middle part, as the app does it: the grip's edit made on the sketch at the press
 * and proposed, the analysis and the warnings, the scene with ribbon, labels and grips, and all texts of the panels. Nothing is
 * painted. Successive calls move the part to and fro, each to a place of its own.
 */
export function liveFrames(pressed: Sketch, measureText: MeasureText): () => LiveFrame {
  const part = pressed.parts[pressed.parts.length >> 1];
  if (part === undefined) throw new Error('liveFrames: the sketch has no part to drag');
  const shown = { selection: [part.id] };
  const atPress = readingOf(pressed, shown);
  const scene = sceneOfReading(atPress);
  const camera = fitCamera(scene, SIZE, 'parts');
  const view = viewportOf(camera, SIZE, foldIn(scene, camera));
  const { handles } = pictureOf(atPress, view, measureText, scene);
  const drag = handles.find(({ id }) => id === `part:${part.id}`)?.drag;
  if (!drag) throw new Error('liveFrames: the part cannot be dragged');
  let doc = documentOf(pressed);
  let count = 0;
  return () => {
    count = (count + 1) % MOVES;
    const dzMm = REACH_MM * Math.sin((2 * Math.PI * (count + 0.5)) / MOVES);
    const move = drag({
      dzMm,
      dyMm: 0,
      dxPx: dzMm * view.pxPerMm,
      other: false,
      // Everything that could catch it is looked at; nothing does, so that every place is another.
      snap: true,
      toleranceMm: 0,
    });
    doc = preview(doc, move.edit);
    const reading = readingOf(doc.sketch, shown);
    return { reading, picture: pictureOf(reading, view, measureText), texts: panelTexts(reading) };
  };
}

/** A task that is one such move; its number depends on all that came of it. */
export function liveUpdate(pressed: Sketch, measureText: MeasureText): () => number {
  const next = liveFrames(pressed, measureText);
  return () => {
    const { picture, texts } = next();
    const { scene, plan, labels, handles } = picture;
    let sum = scene.bundles.length + labels.length + handles.length;
    for (const cell of plan.cells) sum += cell.textXPx;
    for (const line of scene.axial) sum += line.at(-1) ?? 0;
    for (const text of texts) sum += text.length;
    return sum;
  };
}
