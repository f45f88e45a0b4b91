import { partName } from '../../../engine/index.ts';
import type { LabelPlace, LabelWish, Side } from '../../board/labels.ts';
import { placeLabels } from '../../board/labels.ts';
import type { MeasureText } from '../../board/measure.ts';
import { type Pen, segment } from '../../board/pen.ts';
import type { TextStyle } from '../../board/styles.ts';
import type { Viewport } from '../../board/viewport.ts';
import { xOf, yOf } from '../../board/viewport.ts';
import type { LengthUnit } from '../../store/viewStore.ts';
import { heightOnFirstStretch, type Scene, type ScenePart } from '../scene.ts';
import { plainLength } from '../words.ts';
import { objectTipPx, SCALE_PX } from './ends.ts';

/** A text on the drawing, before its place is found. */
export interface Label extends LabelWish {
  readonly text: string;
  readonly style: TextStyle;
  /** Screen y that a hairline runs down from to the label; null for none. */
  readonly leaderFromYPx: number | null;
}

const LINE_PX = 16;
/** How far in from the left edge rays are named when they come from beyond it. */
const NAME_AT_PX = 84;

/** Every text the drawing wants to show, the most needed first. */
export function labelsOf(
  scene: Scene,
  view: Viewport,
  unit: LengthUnit,
  measure: MeasureText,
): readonly Label[] {
  const labels: Label[] = [];
  const add = (
    id: string,
    text: string,
    style: TextStyle,
    xPx: number,
    yPx: number,
    sides: readonly Side[],
    priority: number,
    distancePx = 4,
    leaderFromYPx: number | null = null,
  ) =>
    labels.push({
      id,
      text,
      style,
      xPx,
      yPx,
      sides,
      priority,
      distancePx,
      leaderFromYPx,
      widthPx: measure(text, style),
      heightPx: LINE_PX,
    });

  for (const part of scene.parts) {
    const x = xOf(view, (part.frontMm + part.rearMm) / 2);
    const style = part.selected ? 'label strong' : 'label';
    const top = yOf(view, Math.max(part.semiMm, part.carriesStop ? (scene.stop?.semiMm ?? 0) : 0));
    add(
      `part:${part.part.id}`,
      partText(part, unit),
      style,
      x,
      top,
      ['above', 'above right', 'above left'],
      9,
      10,
    );
  }
  const { stage } = scene;
  if (stage.objectMm !== null) {
    const x = xOf(view, stage.objectMm);
    const tip = objectTipPx(view, scene.objectHeightMm ?? 0);
    add(
      'object',
      objectText(scene, view, unit),
      'label quiet',
      x,
      tip,
      ['below right', 'right', 'above right'],
      8,
      10,
    );
  }
  if (stage.objectMm === null)
    add('object', 'object at infinity', 'label quiet', 8, yOf(view, 0), ['above right', 'below right'], 2);
  if (scene.parts.length === 0)
    add('image', 'image', 'label quiet', view.widthPx - 8, yOf(view, 0), ['above left'], 2);
  if (stage.imageMm !== null) {
    const x = xOf(view, stage.imageMm);
    const bottom = Math.max(
      yOf(view, -(scene.sensorSemiMm ?? 0)),
      yOf(view, scene.imageHeightMm ?? 0),
      yOf(view, 0) + 8,
    );
    add('image', scene.sensorFixed ? 'sensor' : 'image', 'label', x, bottom, ['below', 'below left'], 8, 6);
  }
  if (scene.mountMm !== null)
    add(
      'mount',
      'mount',
      'label quiet',
      xOf(view, scene.mountMm),
      yOf(view, -scene.tallestMm),
      ['below', 'above'],
      4,
    );
  for (const image of scene.images) {
    const part = scene.parts[image.objectOf ?? image.partIndex];
    if (!part) continue;
    const name = partName(part.part, part.index);
    const text = image.objectOf === null ? `image of ${name}` : `object for ${name}`;
    const x = xOf(view, image.zMm);
    const foot = yOf(view, Math.min(0, image.heightMm));
    const y = Math.max(foot, yOf(view, -scene.tallestMm));
    add(
      `image:${image.partIndex}`,
      text,
      'label quiet',
      x,
      y,
      ['below', 'below right', 'below left'],
      5,
      4,
      foot,
    );
  }
  for (const plane of scene.planes) {
    const focus = plane.name.endsWith('focus');
    const y = focus ? yOf(view, 0) + 4 : yOf(view, -(plane.semiMm ?? scene.tallestMm));
    add(
      plane.name,
      plane.name,
      'label quiet',
      xOf(view, plane.zMm),
      y,
      ['below', 'below right', 'below left'],
      3,
      10,
    );
  }
  const rayNames = [
    ['marginal ray', 'label marginal ray', scene.marginal[0]],
    ['chief ray', 'label chief ray', scene.chief],
  ] as const;
  for (const [text, style, line] of rayNames) {
    if (!line) continue;
    const z = Math.max(line[0] ?? 0, view.fold?.toMm ?? Number.NEGATIVE_INFINITY, leftOf(view));
    const y = heightOnFirstStretch(line, z);
    const upward = text === 'marginal ray';
    add(
      text,
      text,
      style,
      xOf(view, z) + 4,
      yOf(view, y),
      upward ? ['above right'] : ['below right', 'above right'],
      6,
    );
  }
  return labels;
}

/** Puts every label where it is free and writes it; returns the places, which the next frame may keep. */
export function labelsLayer(
  pen: Pen,
  labels: readonly Label[],
  view: Viewport,
  former: readonly LabelPlace[],
  frozen: ReadonlySet<string>,
): readonly LabelPlace[] {
  const bounds = { xPx: 4, yPx: 4, widthPx: view.widthPx - 8, heightPx: view.heightPx - 8 };
  const inside = labels.filter(({ xPx }) => xPx >= 0 && xPx <= view.widthPx);
  const scale = {
    xPx: view.widthPx - SCALE_PX.width,
    yPx: view.heightPx - SCALE_PX.height,
    widthPx: SCALE_PX.width,
    heightPx: SCALE_PX.height,
  };
  const places = placeLabels(inside, { bounds, obstacles: [scale], former, frozen });
  for (const [i, place] of places.entries()) {
    const label = inside[i];
    if (!label) continue;
    if (label.leaderFromYPx !== null)
      segment(pen, label.xPx, label.leaderFromYPx, label.xPx, place.yPx, 'leader');
    pen.text(place.xPx, place.yPx + place.heightPx / 2, label.text, label.style, {
      align: 'left',
      baseline: 'middle',
    });
  }
  return places;
}

function partText({ part, index, carriesStop }: ScenePart, unit: LengthUnit): string {
  const stop = carriesStop ? ', stop' : '';
  if (part.kind === 'thin') {
    const f = plainLength(part.focalLengthMm, unit).replace(` ${unit}`, '');
    return `f ${f}${stop}`;
  }
  if (part.kind === 'stop') return carriesStop ? part.name || 'stop' : partName(part, index);
  return `${partName(part, index)}${stop}`;
}

function objectText({ stage, objectHeightMm }: Scene, view: Viewport, unit: LengthUnit): string {
  const away = `object ${plainLength(-(stage.objectMm ?? 0), unit)} away`;
  const size = objectHeightMm === null ? '' : `, ±${plainLength(Math.abs(objectHeightMm), unit, 1)}`;
  return `${away}${size}${view.fold ? ', not to scale' : ''}`;
}

const leftOf = (view: Viewport): number => view.originMm + NAME_AT_PX / view.pxPerMm;
