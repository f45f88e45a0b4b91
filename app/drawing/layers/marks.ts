import type { Body } from '../../../engine/index.ts';
import type { Pen } from '../../board/pen.ts';
import { segment } from '../../board/pen.ts';
import type { Viewport } from '../../board/viewport.ts';
import { xOf, yOf } from '../../board/viewport.ts';
import { onScreen } from '../project.ts';
import type { Scene, ScenePart, ScenePlane } from '../scene.ts';

const ARROW_PX = 4;
const FOCUS_PX = 3.5;
const PUPIL_BAR_PX = 6;
/** Focal points off the sheet stand this far from its edge, px. */
const EDGE_PX = 12;
/** How far below the axis a selected part's own focal points stand on their stems. */
export const FOCAL_STEM_PX = 14;
/** How far above the axis the grips of thicknesses stand. */
export const VERTEX_RISE_PX = 14;

/** Intermediate images, and the pupils, principal planes and focal points that are switched on. */
export function marksLayer(pen: Pen, scene: Scene, view: Viewport): void {
  for (const image of scene.images) {
    if (image.extension) {
      pen.polyline(onScreen(view, image.extension), 'marginal ray virtual');
      pen.polyline(onScreen(view, mirrored(image.extension)), 'marginal ray virtual');
    }
    const x = xOf(view, image.zMm);
    const foot = yOf(view, 0);
    const tip = yOf(view, image.heightMm);
    const style = image.real ? 'image' : 'image virtual';
    const back = tip < foot ? ARROW_PX : -ARROW_PX;
    segment(pen, x, foot, x, tip, style);
    pen.polyline([x - ARROW_PX, tip + back, x, tip, x + ARROW_PX, tip + back], 'image');
  }
  for (const plane of scene.planes) drawPlane(pen, plane, scene.tallestMm, view);
  for (const part of scene.parts) {
    drawOwnFocalPoints(pen, part, view);
    if (part.selected && part.body) drawGripStems(pen, part, part.body, view);
  }
}

function mirrored(line: Float64Array): Float64Array {
  return line.map((value, i) => (i % 2 === 1 ? -value : value));
}

function drawPlane(pen: Pen, plane: ScenePlane, tallestMm: number, view: Viewport): void {
  const x = xOf(view, plane.zMm);
  if (plane.name === 'front focus' || plane.name === 'rear focus') {
    pen.circle(x, yOf(view, 0), FOCUS_PX, 'focal point');
    return;
  }
  if (plane.name === 'front principal plane' || plane.name === 'rear principal plane') {
    segment(pen, x, yOf(view, tallestMm), x, yOf(view, -tallestMm), 'principal plane');
    return;
  }
  for (const side of [1, -1]) {
    const y = yOf(view, side * (plane.semiMm ?? 0));
    segment(pen, x - PUPIL_BAR_PX, y, x + PUPIL_BAR_PX, y, 'pupil');
    segment(pen, x, y, x, y - side * 12, 'pupil');
  }
}

/** Stems from the axis to the grips of selected glass: bending below it, thicknesses above. */
function drawGripStems(pen: Pen, { frontMm, rearMm }: ScenePart, { faces }: Body, view: Viewport): void {
  const y = yOf(view, 0);
  const middle = xOf(view, (frontMm + rearMm) / 2);
  segment(pen, middle, y, middle, y + FOCAL_STEM_PX, 'leader');
  for (const { vertexMm } of faces.slice(1)) {
    const x = xOf(view, frontMm + vertexMm);
    segment(pen, x, y, x, y - VERTEX_RISE_PX, 'leader');
  }
}

/** A focal point of a selected part: where it stands, or where the sheet ends towards it. */
export interface OwnFocalPoint {
  readonly end: 'front' | 'rear';
  readonly xPx: number;
  readonly isOff: boolean;
  readonly focalLengthMm: number;
}

/** The focal points of a selected thin part; none of any other. */
export function ownFocalPoints(
  { part, frontMm, selected }: ScenePart,
  view: Viewport,
): readonly OwnFocalPoint[] {
  if (part.kind !== 'thin' || !selected) return [];
  const { focalLengthMm } = part;
  return (['front', 'rear'] as const).map((end) => {
    const atPx = xOf(view, frontMm + (end === 'front' ? -focalLengthMm : focalLengthMm));
    const xPx = Math.min(view.widthPx - EDGE_PX, Math.max(EDGE_PX, atPx));
    return { end, xPx, isOff: atPx < 0 || atPx > view.widthPx, focalLengthMm };
  });
}

/** On stems below the axis; an arrow at the edge for those off the sheet. */
function drawOwnFocalPoints(pen: Pen, part: ScenePart, view: Viewport): void {
  const y = yOf(view, 0);
  for (const { xPx, isOff } of ownFocalPoints(part, view)) {
    if (isOff) {
      const outward = xPx < view.widthPx / 2 ? -1 : 1;
      const tip = xPx + outward * (EDGE_PX - 2);
      const back = tip - outward * ARROW_PX;
      const stem = y + FOCAL_STEM_PX;
      segment(pen, xPx - outward * EDGE_PX, stem, tip, stem, 'dimension');
      pen.polyline([back, stem - ARROW_PX, tip, stem, back, stem + ARROW_PX], 'dimension');
      continue;
    }
    segment(pen, xPx, y, xPx, y + FOCAL_STEM_PX, 'leader');
    pen.circle(xPx, y, 2, 'ink');
  }
}
