import type { Pen } from '../../board/pen.ts';
import { segment } from '../../board/pen.ts';
import type { MarkStyle } from '../../board/styles.ts';
import type { Viewport } from '../../board/viewport.ts';
import { xOf, yOf } from '../../board/viewport.ts';
import type { Scene, ScenePart } from '../scene.ts';
import { drawGlass, drawGlassOutline, faultsLayer } from './glass.ts';

const ARROW_PX = 6.5;
const STOP_BAR_PX = 7;
const STOP_WING_PX = 16;

/** Glass and plates; they lie under the rays. */
export function glassLayer(pen: Pen, scene: Scene, view: Viewport): void {
  for (const part of scene.parts) {
    if (part.part.kind === 'plate') pen.closed(plateOutline(part, view), 'glass');
    if (part.body) drawGlass(pen, part, view);
  }
}

/** Every part in its textbook form, and the aperture stop's edges. `hovered` is the id of the part under the pointer. */
export function partsLayer(pen: Pen, scene: Scene, view: Viewport, hovered: string | null): void {
  for (const part of scene.parts) drawPart(pen, part, view, part.part.id === hovered);
  faultsLayer(pen, scene, view);
  if (scene.stop) drawStop(pen, scene.stop, view);
}

function drawPart(pen: Pen, drawn: ScenePart, view: Viewport, hovered: boolean): void {
  const style: MarkStyle = drawn.selected ? 'part selected' : hovered ? 'part hover' : 'part';
  const { part } = drawn;
  if (part.kind === 'thin') drawThin(pen, drawn, part.focalLengthMm > 0, view, style);
  else if (part.kind === 'plate') drawPlate(pen, drawn, view, style);
  else if (part.kind === 'glass') drawGlassOutline(pen, drawn, view, style);
  else if (!drawn.carriesStop) drawDiaphragm(pen, drawn, view, hovered || drawn.selected);
}

/** A line with arrowheads outward (positive) or inward (negative). */
function drawThin(pen: Pen, drawn: ScenePart, positive: boolean, view: Viewport, style: MarkStyle): void {
  const x = xOf(view, drawn.frontMm);
  const top = yOf(view, drawn.semiMm);
  const bottom = yOf(view, -drawn.semiMm);
  segment(pen, x, top, x, bottom, style);
  const back = positive ? ARROW_PX : -ARROW_PX;
  pen.polyline([x - ARROW_PX, top + back, x, top, x + ARROW_PX, top + back], style);
  pen.polyline([x - ARROW_PX, bottom - back, x, bottom, x + ARROW_PX, bottom - back], style);
  drawRoom(pen, drawn, view, top, bottom);
}

/** Dotted lines where the room reserved for real glass ends. */
function drawRoom(pen: Pen, { part, frontMm }: ScenePart, view: Viewport, top: number, bottom: number): void {
  if (part.kind !== 'thin') return;
  for (const offset of [-part.roomFrontMm, part.roomBehindMm]) {
    if (offset === 0) continue;
    const x = xOf(view, frontMm + offset);
    segment(pen, x, top, x, bottom, 'room');
  }
}

/** A plate chosen or pointed at is outlined as strongly as other parts. */
function drawPlate(pen: Pen, drawn: ScenePart, view: Viewport, style: MarkStyle): void {
  if (style === 'part') return;
  const outline = plateOutline(drawn, view);
  pen.polyline([...outline, ...outline.slice(0, 2)], style);
}

function plateOutline({ frontMm, rearMm, semiMm }: ScenePart, view: Viewport): number[] {
  const left = xOf(view, frontMm);
  const right = xOf(view, rearMm);
  const top = yOf(view, semiMm);
  const bottom = yOf(view, -semiMm);
  return [left, top, right, top, right, bottom, left, bottom];
}

/** A diaphragm that is not the aperture stop: open at its own clear diameter. */
function drawDiaphragm(pen: Pen, drawn: ScenePart, view: Viewport, strong: boolean): void {
  drawEdges(pen, view, drawn.frontMm, drawn.semiMm, strong ? 'stop hover' : 'stop');
}

function drawStop(pen: Pen, stop: NonNullable<Scene['stop']>, view: Viewport): void {
  drawEdges(pen, view, stop.zMm, stop.semiMm, 'stop');
}

function drawEdges(pen: Pen, view: Viewport, zMm: number, semiMm: number, style: MarkStyle): void {
  const x = xOf(view, zMm);
  for (const side of [1, -1]) {
    const y = yOf(view, side * semiMm);
    segment(pen, x - STOP_BAR_PX, y, x + STOP_BAR_PX, y, style);
    segment(pen, x, y, x, y - side * STOP_WING_PX, style);
  }
}
