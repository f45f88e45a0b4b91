import type { MeasureText } from '../board/measure.ts';
import { PALETTES } from '../board/styles.ts';
import { svgPen } from '../board/svgPen.ts';
import type { Reading } from '../live/reading.ts';
import { fitCamera, foldIn, viewportOf } from './camera.ts';
import { paintParts, paintRays } from './paint.ts';
import { pictureOf, sceneOfReading } from './picture.ts';

/** The size of the exported drawing, px. */
const SIZE = { widthPx: 1180, heightPx: 520 };
/** Where the position is named, from both edges, px. */
const CORNER_PX = 20;

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
  pen.group('parts', () => paintParts(pen, picture));
  const where = positionWords(reading);
  if (where !== '') pen.text(CORNER_PX, CORNER_PX, where, 'label', { baseline: 'top' });
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

const withoutHand = ({ sketch, setting, view, analysis, exact, warnings }: Reading): Reading => ({
  sketch,
  setting,
  view: { ...view, selection: [], typing: null },
  analysis,
  exact,
  warnings,
});

const summaryOf = (reading: Reading): string =>
  [`Layout of ${reading.sketch.parts.length} parts`, positionWords(reading)].filter(Boolean).join(', ');

/** At which of several positions the layout is drawn; empty when there is but one. */
function positionWords({ sketch: { positions }, setting }: Reading): string {
  if (positions.length === 1) return '';
  const index = positions.findIndex(({ id }) => id === setting.at);
  const [at, next] = [positions[index], positions[index + 1]];
  return setting.toNext > 0 && next ? `between ${at?.name} and ${next.name}` : `drawn at ${at?.name}`;
}
