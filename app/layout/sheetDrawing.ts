import type { MeasureText } from '../board/measure.ts';
import { PALETTES } from '../board/styles.ts';
import { svgPen } from '../board/svgPen.ts';
import type { Reading } from '../live/reading.ts';
import { fitCamera, foldIn, viewportOf } from './camera.ts';
import { paintParts, paintRays } from './paint.ts';
import { pictureOf, sceneOfReading } from './picture.ts';

/** The size of the exported drawing, px. */
const SIZE = { widthPx: 1180, heightPx: 520 };

/**
 * The dimensioned drawing of a reading on paper as an SVG text: the same layers as on screen, fitted to the parts, nothing selected.
 */
export function sheetDrawing(reading: Reading, measure: MeasureText): string {
  const plainReading = withoutHand(reading);
  const scene = sceneOfReading(plainReading);
  const camera = fitCamera(scene, SIZE, 'parts');
  const view = viewportOf(camera, SIZE, foldIn(scene, camera));
  const picture = pictureOf(plainReading, view, measure, scene);
  const { title } = reading.sketch;
  const pen = svgPen({ ...SIZE, palette: PALETTES.paper, title, description: summaryOf(reading) });
  pen.group('rays', () => paintRays(pen, picture));
  pen.group('parts', () => paintParts(pen, picture, null, [], new Set()));
  return pen.document();
}

/** How the exported drawing is scaled, in words. */
export function sheetScale(reading: Reading): string {
  const scene = sceneOfReading(withoutHand(reading));
  const camera = fitCamera(scene, SIZE, 'parts');
  const heights = Number(camera.stretch.toPrecision(3));
  return heights === 1
    ? 'not to a drawing scale; heights as lengths'
    : `not to a drawing scale; heights ×${heights}`;
}

const withoutHand = ({ sketch, setting, view, analysis, warnings }: Reading): Reading => ({
  sketch,
  setting,
  view: { ...view, selection: [], typing: null },
  analysis,
  warnings,
});

function summaryOf({ sketch, setting }: Reading): string {
  const position = sketch.positions.find(({ id }) => id === setting.at)?.name ?? '';
  return `Layout of ${sketch.parts.length} parts${sketch.positions.length > 1 ? `, position ${position}` : ''}`;
}
