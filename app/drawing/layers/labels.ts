import type { LengthUnit } from '../../../engine/index.ts';
import { partName } from '../../../engine/index.ts';
import type { Box, LabelPlace, LabelWish, Side } from '../../board/labels.ts';
import { placeLabels } from '../../board/labels.ts';
import type { MeasureText } from '../../board/measure.ts';
import { type Pen, segment } from '../../board/pen.ts';
import type { TextStyle } from '../../board/styles.ts';
import type { Viewport } from '../../board/viewport.ts';
import { xOf, yOf } from '../../board/viewport.ts';
import { heightOnFirstStretch, type Scene, type ScenePart } from '../scene.ts';
import { imageName, plainLength } from '../words.ts';
import { objectTipPx } from './ends.ts';
import { FOCAL_STEM_PX, ownFocalPoints } from './marks.ts';

/** A text on the drawing, before its place is found. */
export interface Label extends LabelWish {
  readonly text: string;
  readonly style: TextStyle;
  /** The hairline to the label: always, from either end of what is named; only to a label that had to move away; or never. */
  readonly leader: { readonly topPx: number; readonly bottomPx: number } | 'when far' | null;
}

type Draft = Omit<Label, 'widthPx' | 'heightPx'>;

const LINE_PX = 16;
/** How far in from the left edge rays are named when they come from beyond it. */
const NAME_AT_PX = 84;
/** Where along a ray's first stretch its name may stand, in the order they are liked. */
const NAMED_AT = [0, 0.25, 0.5, 0.75];
const ANY_SIDE: readonly Side[] = ['above right', 'below right', 'above left', 'below left'];
/** Steeper rays would run through a name on the side they climb to. */
const STEEP = 0.1;
/** Labels stay this far from the upper and lower edge, px. */
const HIGHEST_PX = 32;
const BESIDE_LINE_PX = 8;
/** A leader begins this far from what is named, px. */
const NEAR_PX = 4;
/** Among many images those without a near place for their name go without; pointing at them tells it. */
const MOST_IMAGE_STEPS = 2;
/** Least distance between two labels, one above the other and side by side, px. */
const APART_PX = 4;
const ASIDE_PX = 12;

/** Every text the drawing wants to show, the most needed first. */
export function labelsOf(
  scene: Scene,
  view: Viewport,
  unit: LengthUnit,
  measure: MeasureText,
): readonly Label[] {
  return [
    ...scene.parts.map((part) => partLabel(scene, part, view, unit)),
    ...faultLabels(scene, view),
    ...endLabels(scene, view, unit),
    ...imageLabels(scene, view),
    ...planeLabels(scene, view),
    ...focalLabels(scene, view, unit),
    ...rayLabels(scene, view),
  ].map((draft) => ({ ...draft, widthPx: measure(draft.text, draft.style), heightPx: LINE_PX }));
}

function partLabel(scene: Scene, part: ScenePart, view: Viewport, unit: LengthUnit): Draft {
  const topMm = Math.max(part.semiMm, part.carriesStop ? (scene.stop?.semiMm ?? 0) : 0);
  return {
    id: `part:${part.part.id}`,
    text: partText(part, unit),
    style: part.selected ? 'label strong' : 'label',
    xPx: xOf(view, part.rimMm),
    yPx: Math.max(HIGHEST_PX, yOf(view, topMm)),
    sides: ['above', 'above right', 'above left'],
    priority: part.selected ? 10 : 9,
    distancePx: 10,
    leader: 'when far',
  };
}

/** What cannot be made is said under the part. */
function faultLabels({ faults }: Scene, view: Viewport): readonly Draft[] {
  return faults.map(({ part, zMm, words }) => ({
    id: `fault:${part.part.id}`,
    text: words,
    style: 'label bad',
    xPx: xOf(view, zMm),
    yPx: Math.min(view.heightPx - HIGHEST_PX, yOf(view, -part.semiMm)),
    sides: ['below', 'below right', 'below left'],
    priority: 10,
    distancePx: 10,
    leader: 'when far',
  }));
}

function endLabels(scene: Scene, view: Viewport, unit: LengthUnit): readonly Draft[] {
  const { stage } = scene;
  const axisPx = yOf(view, 0);
  const drafts: Draft[] = [];
  if (stage.objectMm !== null)
    drafts.push({
      id: 'object',
      text: objectText(scene, view, unit),
      style: 'label quiet',
      xPx: xOf(view, stage.objectMm) + BESIDE_LINE_PX,
      yPx: objectTipPx(view, scene.objectHeightMm ?? 0),
      // Beyond a fold no rays start at the tip.
      sides: view.fold ? ['right', 'above right', 'below right'] : ['below right', 'right', 'above right'],
      priority: 8,
      distancePx: view.fold ? 4 : 8,
      leader: null,
    });
  else
    drafts.push({
      id: 'object',
      text: 'object at infinity',
      style: 'label quiet',
      xPx: 8,
      yPx: axisPx,
      sides: ['above right', 'below right'],
      priority: 2,
      leader: null,
    });
  if (scene.parts.length === 0)
    drafts.push({
      id: 'image',
      text: 'image',
      style: 'label quiet',
      xPx: view.widthPx - 8,
      yPx: axisPx,
      sides: ['above left'],
      priority: 2,
      leader: null,
    });
  if (stage.imageMm !== null) {
    const semiMm = scene.sensorSemiMm ?? 0;
    const bottomPx = Math.max(yOf(view, -semiMm), yOf(view, scene.imageHeightMm ?? 0), axisPx + 8);
    drafts.push({
      id: 'image',
      text: scene.sensorFixed ? 'sensor' : 'image',
      style: 'label',
      xPx: xOf(view, stage.imageMm),
      yPx: Math.min(view.heightPx - HIGHEST_PX, bottomPx),
      sides: ['below', 'below left', 'below right'],
      priority: 8,
      distancePx: 6,
      leader: 'when far',
    });
  }
  if (scene.mountMm !== null)
    drafts.push({
      id: 'mount',
      text: 'mount',
      style: 'label quiet',
      xPx: xOf(view, scene.mountMm),
      yPx: yOf(view, -scene.tallestMm),
      sides: ['below', 'above'],
      priority: 4,
      leader: 'when far',
    });
  return drafts;
}

function imageLabels(scene: Scene, view: Viewport): readonly Draft[] {
  return scene.images.flatMap((image): Draft[] => {
    const text = imageName(image, scene);
    if (text === '') return [];
    const bottomPx = yOf(view, Math.min(0, image.heightMm));
    const topPx = yOf(view, Math.max(0, image.heightMm));
    const xPx = xOf(view, image.zMm);
    const above = Math.min(topPx, yOf(view, scene.tallestMm));
    return [
      {
        id: `image:${image.partIndex}`,
        text,
        style: 'label quiet',
        xPx,
        yPx: Math.max(bottomPx, yOf(view, -scene.tallestMm)),
        sides: ['below', 'below right', 'below left'],
        otherwise: [{ xPx, yPx: above, sides: ['above', 'above right', 'above left'] }],
        priority: 5,
        mostSteps: MOST_IMAGE_STEPS,
        leader: { topPx, bottomPx },
      },
    ];
  });
}

function planeLabels(scene: Scene, view: Viewport): readonly Draft[] {
  return scene.planes.map((plane): Draft => {
    const isFocus = plane.name.endsWith('focus');
    const xPx = xOf(view, plane.zMm);
    const semiMm = plane.semiMm ?? scene.tallestMm;
    return {
      id: plane.name,
      text: plane.name,
      style: 'label quiet',
      xPx,
      yPx: isFocus ? yOf(view, 0) + 4 : yOf(view, -semiMm),
      sides: ['below', 'below right', 'below left'],
      otherwise: [
        {
          xPx,
          yPx: isFocus ? yOf(view, 0) - 4 : yOf(view, semiMm),
          sides: ['above', 'above right', 'above left'],
        },
      ],
      priority: 3,
      distancePx: 10,
      leader: 'when far',
    };
  });
}

/** A focal point of a selected part that lies off the sheet is told at the edge. */
function focalLabels(scene: Scene, view: Viewport, unit: LengthUnit): readonly Draft[] {
  return scene.parts.flatMap((part) =>
    ownFocalPoints(part, view)
      .filter(({ isOff }) => isOff)
      .map(
        ({ end, xPx, focalLengthMm }): Draft => ({
          id: `focal:${part.part.id}:${end}`,
          text: `f ${plainLength(focalLengthMm, unit)}`,
          style: 'label strong',
          xPx,
          yPx: yOf(view, 0) + FOCAL_STEM_PX,
          sides:
            xPx < view.widthPx / 2
              ? ['right', 'below right', 'above right']
              : ['left', 'below left', 'above left'],
          priority: 7,
          distancePx: 10,
          leader: null,
        }),
      ),
  );
}

/** The two rays that have names, named where they come into the sheet or further along in front of the first part. */
function rayLabels(scene: Scene, view: Viewport): readonly Draft[] {
  const rays = [
    ['marginal ray', 'label marginal ray', scene.marginal[0], 'above'],
    ['chief ray', 'label chief ray', scene.chief, 'below'],
  ] as const;
  return rays.flatMap(([text, style, line, liked]): Draft[] => {
    if (!line) return [];
    const startMm = Math.max(line[0] ?? 0, view.fold?.toMm ?? Number.NEGATIVE_INFINITY);
    const seenMm = xOf(view, startMm) < 0 ? leftOf(view) : startMm;
    const endMm = Math.max(seenMm, line[2] ?? seenMm);
    const pointAt = (share: number) => {
      const zMm = seenMm + share * (endMm - seenMm);
      return { xPx: xOf(view, zMm) + 4, yPx: yOf(view, heightOnFirstStretch(line, zMm)) };
    };
    const [start, end] = [pointAt(0), pointAt(1)];
    const slope = (start.yPx - end.yPx) / Math.max(1, end.xPx - start.xPx);
    const sides = sidesOfRay(slope, liked);
    const shares = sides[0]?.endsWith('left') ? [...NAMED_AT].reverse() : NAMED_AT;
    const [first = 0, ...further] = shares;
    return [
      {
        id: text,
        text,
        style,
        ...pointAt(first),
        otherwise: further.map(pointAt),
        sides,
        priority: 6,
        mostSteps: 1,
        leader: null,
      },
    ];
  });
}

/** The sides on which a ray of this slope, positive upward, does not run through its own name. */
function sidesOfRay(slope: number, liked: 'above' | 'below'): readonly Side[] {
  const steep = Math.abs(slope) > STEEP;
  const above: Side = steep && slope > 0 ? 'above left' : 'above right';
  const below: Side = steep && slope < 0 ? 'below left' : 'below right';
  const clear: readonly Side[] = liked === 'above' ? [above, below] : [below, above];
  return [...clear, ...ANY_SIDE.filter((side) => !clear.includes(side))];
}

/** Puts every label where it is free and writes it; returns the places, which the next frame may keep. */
export function labelsLayer(
  pen: Pen,
  labels: readonly Label[],
  scene: Scene,
  view: Viewport,
  obstacles: readonly Box[],
  former: readonly LabelPlace[],
  frozen: ReadonlySet<string>,
): readonly LabelPlace[] {
  const bounds = { xPx: 4, yPx: 4, widthPx: view.widthPx - 8, heightPx: view.heightPx - 8 };
  const inside = new Map(
    labels.filter(({ xPx }) => xPx >= 0 && xPx <= view.widthPx).map((label) => [label.id, label]),
  );
  const room = {
    bounds,
    obstacles,
    lines: uprights(scene, view),
    apartPx: APART_PX,
    asidePx: ASIDE_PX,
    former,
    frozen,
  };
  const places = placeLabels([...inside.values()], room).filter(({ crowded }) => !crowded);
  for (const place of places) {
    const label = inside.get(place.id);
    if (!label) continue;
    drawLeader(pen, label, place);
    pen.text(place.xPx, place.yPx + place.heightPx / 2, label.text, label.style, {
      align: 'left',
      baseline: 'middle',
    });
  }
  return places;
}

/** A hairline from what is named to a label that stands away from it. */
function drawLeader(pen: Pen, label: Label, place: LabelPlace): void {
  const { leader, xPx, otherwise } = label;
  if (leader === null || (leader === 'when far' && place.step === 0)) return;
  const isBelow = place.side.startsWith('below');
  const pointPx = otherwise?.[place.point - 1]?.yPx ?? label.yPx;
  const ends = leader === 'when far' ? { topPx: pointPx - NEAR_PX, bottomPx: pointPx + NEAR_PX } : leader;
  const fromPx = isBelow ? ends.bottomPx : ends.topPx;
  segment(pen, xPx, fromPx, xPx, isBelow ? place.yPx : place.yPx + place.heightPx, 'leader');
}

/** The upright lines of the drawing, which labels would rather not cross. */
function uprights({ parts, stage, sensorSemiMm, objectHeightMm }: Scene, view: Viewport): readonly Box[] {
  const upright = (zMm: number, oneYPx: number, otherYPx: number): Box => ({
    xPx: xOf(view, zMm) - 1,
    yPx: Math.min(oneYPx, otherYPx),
    widthPx: 2,
    heightPx: Math.abs(otherYPx - oneYPx),
  });
  const lines = parts.map(({ frontMm, semiMm }) => upright(frontMm, yOf(view, semiMm), yOf(view, -semiMm)));
  if (stage.objectMm !== null)
    lines.push(upright(stage.objectMm, yOf(view, 0), objectTipPx(view, objectHeightMm ?? 0)));
  if (stage.imageMm !== null && sensorSemiMm !== null)
    lines.push(upright(stage.imageMm, yOf(view, sensorSemiMm), yOf(view, -sensorSemiMm)));
  return lines;
}

function partText({ part, index, carriesStop, focalLengthMm }: ScenePart, unit: LengthUnit): string {
  const stop = carriesStop ? ', stop' : '';
  const isLens = part.kind === 'thin' || part.kind === 'glass';
  if (isLens && focalLengthMm !== null) {
    const f = plainLength(focalLengthMm, unit).replace(` ${unit}`, '');
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
