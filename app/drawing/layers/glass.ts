import type { Body, Face } from '../../../engine/index.ts';
import { faceAt } from '../../../engine/index.ts';
import type { Pen } from '../../board/pen.ts';
import { segment } from '../../board/pen.ts';
import type { MarkStyle } from '../../board/styles.ts';
import type { Viewport } from '../../board/viewport.ts';
import { heightOf, xOf, yOf } from '../../board/viewport.ts';
import type { Scene, ScenePart } from '../scene.ts';

/** Straight pieces that the visible stretch of a face is drawn with. */
const PIECES = 72;
/** Nothing is drawn further off the sheet than this, px: outlines stay closed under deep zoom. */
const FAR_PX = 20_000;
const HATCH_PX = 5;

/** Each piece of glass of a part with its own outline, so that cemented faces are seen; it lies under the rays. */
export function drawGlass(pen: Pen, part: ScenePart, view: Viewport): void {
  const faces = part.body?.faces ?? [];
  for (const [k, rear] of faces.slice(1).entries()) {
    const front = faces[k];
    if (front) pen.closed(outline([front, rear], part.frontMm, view), 'glass');
  }
}

/** The outer outline of glass that is chosen or pointed at, and its cemented faces. */
export function drawGlassOutline(pen: Pen, part: ScenePart, view: Viewport, style: MarkStyle): void {
  const { body, frontMm } = part;
  if (!body || style === 'part') return;
  const points = outline(body.faces, frontMm, view);
  pen.polyline([...points, ...points.slice(0, 2)], style);
  for (const face of body.faces.slice(1, -1)) pen.polyline(facePoints(face, frontMm, view), 'glass seam');
}

/** Points on screen of a face, from its lower to its upper rim. */
function facePoints(face: Face, frontMm: number, view: Viewport): number[] {
  const points: number[] = [];
  for (const height of heightsOf(face.reachMm, view))
    points.push(...onSheet(view, frontMm + faceAt(face, Math.abs(height)), height));
  return points;
}

/** Heights from −reach to +reach: both rims, and in between a fine row where the sheet shows them, finer still towards its ends. */
function heightsOf(reachMm: number, view: Viewport): number[] {
  const marginMm = heightOf(view, 0) - heightOf(view, view.heightPx);
  const within = (mm: number) => Math.min(reachMm, Math.max(-reachMm, mm));
  const low = within(heightOf(view, view.heightPx) - marginMm / 4);
  const high = within(heightOf(view, 0) + marginMm / 4);
  const heights = low > -reachMm ? [-reachMm] : [];
  for (let i = 0; i <= PIECES; i++)
    heights.push((low + high) / 2 + ((high - low) / 2) * Math.sin(Math.PI * (i / PIECES - 0.5)));
  if (high < reachMm) heights.push(reachMm);
  return heights;
}

/** The closed outline of glass between its first and last face: faces of different rims are joined by flats and a cylinder. */
function outline(faces: readonly Face[], frontMm: number, view: Viewport): number[] {
  const [first, last] = [faces[0], faces.at(-1)];
  if (!first || !last) return [];
  const upper: number[] = [];
  for (const [k, rear] of faces.slice(1).entries()) {
    const front = faces[k];
    if (!front) continue;
    const tallMm = Math.max(front.reachMm, rear.reachMm);
    upper.push(
      ...onSheet(view, frontMm + front.rimMm, tallMm),
      ...onSheet(view, frontMm + rear.rimMm, tallMm),
    );
  }
  const axisPx = yOf(view, 0);
  const lower = reversed(upper).map((value, i) => (i % 2 === 1 ? 2 * axisPx - value : value));
  return [
    ...facePoints(first, frontMm, view),
    ...upper,
    ...reversed(facePoints(last, frontMm, view)),
    ...lower,
  ];
}

/** The points in the other order. */
function reversed(points: readonly number[]): number[] {
  const turned: number[] = [];
  for (let i = points.length - 2; i >= 0; i -= 2) turned.push(points[i] ?? 0, points[i + 1] ?? 0);
  return turned;
}

function onSheet(view: Viewport, zMm: number, yMm: number): readonly [number, number] {
  return [near(xOf(view, zMm)), near(yOf(view, yMm))];
}

const near = (px: number): number => Math.min(FAR_PX, Math.max(-FAR_PX, px));

/** A hatch where faces have crossed: inside the glass, or between two neighbours that clash. */
export function faultsLayer(pen: Pen, scene: Scene, view: Viewport): void {
  for (const { part } of scene.faults) {
    const { body, frontMm } = part;
    for (const [k, rear] of (body?.faces ?? []).slice(1).entries()) {
      const front = body?.faces[k];
      const upToMm = front ? Math.min(front.reachMm, rear.reachMm) : 0;
      if (front)
        hatch(
          pen,
          view,
          upToMm,
          (y) => frontMm + faceAt(front, y),
          (y) => frontMm + faceAt(rear, y),
        );
    }
    const next = scene.parts[part.index + 1];
    const [rear, front] = [body?.faces.at(-1), next?.body?.faces[0]];
    if (!next || !rear || !front) continue;
    const upToMm = Math.min(part.semiMm, next.semiMm);
    hatch(
      pen,
      view,
      upToMm,
      (y) => frontMm + faceAt(rear, y),
      (y) => next.frontMm + faceAt(front, y),
    );
  }
}

/** Strokes at every height that is on the sheet and where what should stand left stands right. */
function hatch(
  pen: Pen,
  view: Viewport,
  upToMm: number,
  leftMm: (yMm: number) => number,
  rightMm: (yMm: number) => number,
): void {
  const top = Math.max(0, yOf(view, upToMm));
  const bottom = Math.min(view.heightPx, yOf(view, -upToMm));
  for (let y = top; y <= bottom; y += HATCH_PX) {
    const heightMm = Math.abs(heightOf(view, y));
    const [left, right] = [leftMm(heightMm), rightMm(heightMm)];
    if (left > right)
      segment(pen, near(xOf(view, right)) - 2, y + 2, near(xOf(view, left)) + 2, y - 2, 'hatch');
  }
}

/** Where a face stands at a height, for the grips on it: z in mm from the first part. */
export const faceZ = ({ frontMm }: ScenePart, face: Body['faces'][number], heightMm: number): number =>
  frontMm + faceAt(face, heightMm);
