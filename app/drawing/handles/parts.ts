import type { Edit, PartId } from '../../../engine/index.ts';
import {
  isCommon,
  moveParts,
  partName,
  setFocalLength,
  setSemiDiameter,
  setThickness,
  withGroups,
} from '../../../engine/index.ts';
import { snapTo } from '../../board/snap.ts';
import { xOf, yOf } from '../../board/viewport.ts';
import { selectedParts } from '../../store/viewStore.ts';
import { catchesFor } from '../catches.ts';
import type { Handle, LayoutDrag, Move } from '../handle.ts';
import { BETWEEN, plainMove } from '../handle.ts';
import { FOCAL_STEM_PX, ownFocalPoints, VERTEX_RISE_PX } from '../layers/marks.ts';
import type { ScenePart } from '../scene.ts';
import type { Sight } from '../sight.ts';
import { glassHandles, sharedSemi } from './glass.ts';

/** Lengths that a drag may not shrink below, mm. */
const LEAST_MM = 0.01;
/** Under deep zoom glass fills the sheet, which must still be panned. */
const MOST_HALF_PX = 40;

/** The grips of all parts: each can be moved; a selected one also shows its focal points, rims and thickness. */
export function partHandles(sight: Sight): readonly Handle[] {
  return sight.scene.parts.flatMap((part) => [
    moveHandle(sight, part),
    ...(part.selected
      ? [
          ...focalHandles(sight, part),
          ...rimHandles(sight, part),
          ...thicknessHandle(sight, part),
          ...glassHandles(sight, part),
        ]
      : []),
  ]);
}

/** The parts that move when `part` is dragged: all selected ones when it is one of them, each with its group. */
function movingWith({ reading }: Sight, id: PartId): readonly PartId[] {
  const { sketch, view } = reading;
  const selected = selectedParts(sketch, view);
  return withGroups(sketch, selected.includes(id) ? selected : [id]);
}

/** Drags, steps and types the place of a part; also used by its tick on the ribbon. */
export function placing(sight: Sight, part: ScenePart): Pick<Handle, 'drag' | 'step' | 'entry' | 'why'> {
  const { reading } = sight;
  const { sketch, setting } = reading;
  const ids = movingWith(sight, part.part.id);
  const move = (deltaMm: number, other: boolean): Edit => {
    const rule = other ? 'carry' : 'neighbours';
    return (before) => moveParts(before, ids, deltaMm, setting.at, rule);
  };
  const label = `${partName(part.part, part.index)}, behind the first part`;
  if (isBetween(sight) && touchesSplitGap(sight, ids))
    return { drag: null, step: null, entry: null, why: BETWEEN };
  const movesFirst = ids.includes(sketch.parts[0]?.id as PartId);
  return {
    drag: (drag) => dragPart(sight, part, ids, drag, move),
    step: move,
    // The first part is what places are measured from: what moves with it has no place to type.
    entry: movesFirst
      ? null
      : {
          label,
          unit: 'mm',
          value: part.frontMm,
          set: (value) => move(value - part.frontMm, reading.view.otherRule),
        },
    why: null,
  };
}

function dragPart(
  sight: Sight,
  part: ScenePart,
  ids: readonly PartId[],
  drag: LayoutDrag,
  move: (deltaMm: number, other: boolean) => Edit,
): Move {
  const catches = catchesFor(sight, ids, drag.other);
  const snapped = snapTo(catches, part.frontMm + drag.dzMm, drag.toleranceMm, drag.snap);
  const deltaMm = snapped.value - part.frontMm;
  const movesFirst = ids.includes(sight.reading.sketch.parts[0]?.id as PartId);
  return {
    edit: move(deltaMm, drag.other),
    says: movesFirst ? signed(sight, deltaMm) : plainFixed(sight, snapped.value),
    caught: snapped.caught,
    frameMm: movesFirst ? deltaMm : 0,
  };
}

function moveHandle(sight: Sight, part: ScenePart): Handle {
  const { view } = sight;
  const name = partName(part.part, part.index);
  const top = yOf(view, part.semiMm);
  const bottom = yOf(view, -part.semiMm);
  const middle = (part.frontMm + part.rearMm) / 2;
  const halfPx = xOf(view, part.rearMm) - xOf(view, middle);
  return {
    id: `part:${part.part.id}`,
    order: 6,
    xPx: xOf(view, middle),
    yPx: yOf(view, 0),
    line: { topPx: top, bottomPx: bottom },
    // Glass can be taken anywhere on it.
    ...(part.body && { halfWidthPx: Math.min(MOST_HALF_PX, halfPx) }),
    cursor: 'ew-resize',
    label: `${name}, position`,
    slider: {
      valueNow: part.frontMm,
      valueText:
        part.index === 0
          ? `${name}, first part`
          : `${name}, ${plainFixed(sight, part.frontMm)} behind the first part`,
      orientation: 'horizontal',
    },
    tabStop: part.selected,
    selects: part.part.id,
    look: 'none',
    ...placing(sight, part),
  };
}

function focalHandles(sight: Sight, drawn: ScenePart): readonly Handle[] {
  const { part, index, frontMm } = drawn;
  if (part.kind !== 'thin') return [];
  const { view } = sight;
  const points = ownFocalPoints(drawn, view);
  const f = part.focalLengthMm;
  const set =
    (focalLengthMm: number): Edit =>
    (sketch) =>
      setFocalLength(sketch, part.id, focalLengthMm);
  const kept = (value: number) => Math.sign(f) * Math.max(LEAST_MM, value * Math.sign(f));
  return ([-1, 1] as const).map((side) => ({
    id: `focal:${part.id}:${side < 0 ? 'front' : 'rear'}`,
    order: 2,
    xPx: points[side < 0 ? 0 : 1]?.xPx ?? xOf(view, frontMm + side * f),
    yPx: yOf(view, 0) + FOCAL_STEM_PX,
    line: null,
    cursor: 'ew-resize',
    label: `${partName(part, index)}, ${side < 0 ? 'front' : 'rear'} focal point`,
    slider: { valueNow: f, valueText: `focal length ${plainFixed(sight, f)}`, orientation: 'horizontal' },
    tabStop: side > 0,
    selects: part.id,
    look: 'round',
    drag: (drag: LayoutDrag) => {
      const snapped = snapTo(
        catchesFor(sight, [part.id]),
        frontMm + side * f + drag.dzMm,
        drag.toleranceMm,
        drag.snap,
      );
      const focalLengthMm = kept(side * (snapped.value - frontMm));
      return {
        ...plainMove(set(focalLengthMm), `f ${plainFixed(sight, focalLengthMm)}`),
        caught: snapped.caught,
      };
    },
    step: (amountMm: number) => set(kept(f + side * amountMm)),
    entry: { label: 'focal length', unit: 'mm', value: f, set },
    why: null,
  }));
}

function rimHandles(sight: Sight, drawn: ScenePart): readonly Handle[] {
  const { part, index, rimMm, carriesStop } = drawn;
  const semiMm = sharedSemi(drawn);
  if ((part.kind === 'stop' && carriesStop) || semiMm === null) return [];
  const { view } = sight;
  const set =
    (value: number): Edit =>
    (sketch) =>
      setSemiDiameter(sketch, part.id, Math.max(LEAST_MM, value));
  return ([1, -1] as const).map((side) => ({
    id: `rim:${part.id}:${side > 0 ? 'upper' : 'lower'}`,
    order: 4.5,
    xPx: xOf(view, rimMm),
    yPx: yOf(view, side * semiMm),
    line: null,
    cursor: 'ns-resize',
    label: `${partName(part, index)}, ${side > 0 ? 'upper' : 'lower'} rim`,
    slider: {
      valueNow: semiMm,
      valueText: `clear diameter ${plainFixed(sight, 2 * semiMm)}${part.semiDiameterMm === null ? ', open' : ''}`,
      orientation: 'vertical',
    },
    tabStop: side > 0,
    selects: part.id,
    look: 'square',
    drag: (drag: LayoutDrag) => {
      const semi = Math.max(LEAST_MM, semiMm + side * drag.dyMm);
      return plainMove(set(semi), `clear ⌀ ${plainFixed(sight, 2 * semi)}`);
    },
    step: (amountMm: number) => set(semiMm + side * amountMm),
    entry: {
      label: 'clear diameter',
      unit: 'mm',
      value: 2 * semiMm,
      set: (diameter: number) => (sketch) => setSemiDiameter(sketch, part.id, diameter / 2),
    },
    why: null,
  }));
}

function thicknessHandle(sight: Sight, { part, index, rearMm }: ScenePart): readonly Handle[] {
  if (part.kind !== 'plate') return [];
  const { view } = sight;
  const set =
    (value: number): Edit =>
    (sketch) =>
      setThickness(sketch, part.id, value);
  const kept = (value: number) => Math.max(LEAST_MM, value);
  return [
    {
      id: `thickness:${part.id}`,
      order: 3,
      xPx: xOf(view, rearMm),
      yPx: yOf(view, 0) - VERTEX_RISE_PX,
      line: null,
      cursor: 'ew-resize',
      label: `${partName(part, index)}, thickness`,
      slider: {
        valueNow: part.thicknessMm,
        valueText: `thickness ${plainFixed(sight, part.thicknessMm)}`,
        orientation: 'horizontal',
      },
      tabStop: true,
      selects: part.id,
      look: 'square',
      drag: (drag) => {
        const thickness = kept(part.thicknessMm + drag.dzMm);
        return plainMove(set(thickness), `thickness ${plainFixed(sight, thickness)}`);
      },
      step: (amountMm) => set(kept(part.thicknessMm + amountMm)),
      entry: { label: 'thickness', unit: 'mm', value: part.thicknessMm, set },
      why: null,
    },
  ];
}

const isBetween = ({ reading }: Sight): boolean => reading.setting.toNext !== 0;

/** Whether moving these parts would change a gap that every position has for itself. */
function touchesSplitGap({ reading }: Sight, ids: readonly PartId[]): boolean {
  const { parts, object } = reading.sketch;
  return parts.some((part, i) => {
    const inFront = i === 0 ? object.distanceMm : parts[i - 1]?.space.lengthMm;
    const split = !isCommon(part.space.lengthMm) || (inFront !== undefined && !isCommon(inFront));
    return ids.includes(part.id) && split;
  });
}

const plainFixed = (sight: Sight, lengthMm: number): string => sight.length(lengthMm);
const signed = (sight: Sight, lengthMm: number): string =>
  `${lengthMm < 0 ? '' : '+'}${sight.length(lengthMm)}`;
