import { faceAt } from '../../../engine/index.ts';
import type { Pen } from '../../board/pen.ts';
import type { Viewport } from '../../board/viewport.ts';
import { xOf, yOf } from '../../board/viewport.ts';
import type { Scene } from '../scene.ts';

/** Straight pieces of a face. */
const PIECES = 40;

/** Lights up one surface, counted through all parts, where something else on the screen points at it. */
export function glowLayer(pen: Pen, { parts }: Scene, view: Viewport, surface: number | null): void {
  if (surface === null) return;
  let left = surface;
  for (const { body, part, frontMm, rearMm, semiMm } of parts) {
    const faces = body?.faces ?? null;
    const count = faces?.length ?? (part.kind === 'plate' ? 2 : 1);
    if (left >= count) {
      left -= count;
      continue;
    }
    const face = faces?.[left];
    const vertexMm = left === 0 || faces ? frontMm : rearMm;
    const reachMm = face?.reachMm ?? semiMm;
    const points: number[] = [];
    for (let i = 0; i <= PIECES; i++) {
      const height = reachMm * ((2 * i) / PIECES - 1);
      const sag = face ? faceAt(face, Math.abs(height)) : 0;
      points.push(xOf(view, vertexMm + sag), yOf(view, height));
    }
    pen.polyline(points, 'glow');
    return;
  }
}
