import type { Box, LabelPlace } from '../board/labels.ts';
import type { Pen } from '../board/pen.ts';
import { endsLayer, scaleBox, scaleLayer } from '../drawing/layers/ends.ts';
import { glowLayer } from '../drawing/layers/glow.ts';
import { labelsLayer } from '../drawing/layers/labels.ts';
import { marksLayer } from '../drawing/layers/marks.ts';
import { glassLayer, partsLayer } from '../drawing/layers/parts.ts';
import { raysLayer } from '../drawing/layers/rays.ts';
import { loupeLayer } from '../drawing/loupe/layer.ts';
import { extensionLines, ribbonLayer } from '../ribbon/layer.ts';
import type { Picture } from './picture.ts';

/** The scale bar stands this far above the ribbon, px. */
const SCALE_ABOVE_PX = 26;

/** Draws glass, rays and marks, the part of the picture that changes with every move. */
export function paintRays(pen: Pen, { scene, view, plan }: Picture): void {
  extensionLines(pen, plan, view);
  pen.clipped({ kind: 'box', xPx: 0, yPx: 0, widthPx: view.widthPx, heightPx: plan.topPx }, () => {
    glassLayer(pen, scene, view);
    raysLayer(pen, scene, view);
    marksLayer(pen, scene, view);
  });
}

/** Draws the loupe over parts and labels; nothing while it is not shown. */
export function paintLoupe(pen: Pen, { loupe, scene, reading }: Picture): void {
  if (loupe) loupeLayer(pen, loupe, reading.view.exact, scene.sensorFixed);
}

/** What places labels besides the picture. */
export interface LabelKeep {
  /** Where they stood in the last frame. */
  readonly former: readonly LabelPlace[];
  /** Those that stay there. */
  readonly frozen: ReadonlySet<string>;
  /** What lies over the drawing. */
  readonly covered: readonly Box[];
}

const AFRESH: LabelKeep = { former: [], frozen: new Set(), covered: [] };

/** Draws parts, ends, ribbon and labels; returns where the labels stand, which the next frame may keep. */
export function paintParts(
  pen: Pen,
  { reading, scene, view, plan, labels }: Picture,
  hovered: string | null = null,
  { former, frozen, covered }: LabelKeep = AFRESH,
): readonly LabelPlace[] {
  const hoveredPart = hovered?.startsWith('part:') ? hovered.slice('part:'.length) : null;
  endsLayer(pen, scene, view);
  glowLayer(pen, scene, view, reading.view.glow);
  const sheet = { kind: 'box', xPx: 0, yPx: 0, widthPx: view.widthPx, heightPx: plan.topPx } as const;
  pen.clipped(sheet, () => partsLayer(pen, scene, view, hoveredPart));
  const { unit } = reading.view;
  const scaleBottomPx = view.heightPx - SCALE_ABOVE_PX;
  scaleLayer(pen, view, unit, scaleBottomPx);
  ribbonLayer(pen, plan, view, hovered);
  const obstacles = [scaleBox(view, unit, scaleBottomPx), ...covered];
  return labelsLayer(pen, labels, scene, view, obstacles, former, frozen);
}
