import type { Edit } from '../../engine/index.ts';
import {
  partName,
  setGap,
  setObjectDistance,
  setThickness,
  splitGap,
  splitObjectDistance,
} from '../../engine/index.ts';
import { xOf } from '../board/viewport.ts';
import type { Handle } from '../drawing/handle.ts';
import { BETWEEN, plainMove, readOnly } from '../drawing/handle.ts';
import { placing } from '../drawing/handles/parts.ts';
import type { Sight } from '../drawing/sight.ts';
import type { PlacedCell, RibbonPlan } from './layout.ts';

const LEAST_MM = 0.01;
const FOLDED_PER_PX = 0.002;

/** The ribbon's grips: the values (click types, a sideways drag scrubs) and the ticks, which are the parts. */
export function ribbonHandles(plan: RibbonPlan, sight: Sight): readonly Handle[] {
  return [
    ...plan.cells.map((cell) => (cell.kind === 'planes' ? planesHandle(cell) : valueHandle(cell, sight))),
    ...tickHandles(plan, sight),
    ...plan.cells.flatMap(splitHandle),
    ...trackHandle(plan),
  ];
}

function valueHandle(cell: PlacedCell, sight: Sight): Handle {
  const { reading, view } = sight;
  const between = cell.split && reading.setting.toNext !== 0;
  const set = setterOf(cell, sight);
  const folded = cell.kind === 'object' && view.fold !== null;
  const scrubbed = (dzMm: number, dxPx: number) =>
    folded ? cell.valueMm * (1 + dxPx * FOLDED_PER_PX) : cell.valueMm + dzMm;
  const kept = (value: number) =>
    cell.kind === 'object' || cell.kind === 'thickness'
      ? Math.max(Math.min(LEAST_MM, cell.valueMm), value)
      : value;
  const first = cell.kind === 'object';
  return {
    id: `cell:${cell.id}`,
    order: 8,
    xPx: cell.textXPx,
    yPx: cell.textYPx,
    line: { topPx: cell.textYPx - 6, bottomPx: cell.textYPx + 6 },
    halfWidthPx: cell.halfTextPx,
    cursor: between ? 'default' : 'ew-resize',
    label: cell.label,
    slider: {
      valueNow: cell.valueMm,
      valueText: `${sight.length(cell.valueMm)}${cell.common ? ', the same at all positions' : ''}${cell.follows ? ', follows the focus' : ''}`,
      orientation: 'horizontal',
    },
    tabStop: true,
    selects: null,
    look: 'none',
    drag: between
      ? null
      : (drag) => {
          const value = kept(scrubbed(drag.dzMm, drag.dxPx));
          return {
            ...plainMove(set(value, drag.other), sight.length(value)),
            frameMm: first && !folded ? value - cell.valueMm : 0,
          };
        },
    step: between ? null : (amountMm, other) => set(kept(cell.valueMm + amountMm), other),
    entry: between
      ? null
      : {
          label: cell.label,
          unit: 'mm',
          value: cell.valueMm,
          allowInfinity: cell.kind === 'object',
          set: (value) => set(value, reading.view.otherRule),
        },
    why: between ? BETWEEN : null,
  };
}

function setterOf(cell: PlacedCell, { reading }: Sight): (value: number, other: boolean) => Edit {
  const { at } = reading.setting;
  const { after, beyondMm, filling } = cell;
  if (after === null)
    return (value) => (sketch) =>
      setObjectDistance(sketch, Number.isFinite(value) ? value - beyondMm : 'infinity', at);
  if (cell.kind === 'thickness') return (value) => (sketch) => setThickness(sketch, after, value, filling);
  return (value, other) => (sketch) =>
    setGap(sketch, after, value - beyondMm, at, other ? 'neighbours' : 'carry');
}

/** The distance between principal planes follows from the glass and says so. */
const planesHandle = (cell: PlacedCell): Handle =>
  readOnly(
    `cell:${cell.id}`,
    cell.label,
    'The principal planes follow from the radii, the thickness and the glass.',
    { xPx: cell.textXPx, yPx: cell.textYPx, line: null, halfWidthPx: cell.halfTextPx },
  );

/** The mark "= all": a click gives every position its own value. */
function splitHandle(cell: PlacedCell): readonly Handle[] {
  const { after, mark } = cell;
  if (!cell.common || mark === null) return [];
  const label = `${cell.label}, the same at all positions`;
  const why = 'Click the mark to give every position its own value.';
  return [
    {
      ...readOnly(`split:${cell.id}`, label, why, onText(mark)),
      cursor: 'pointer',
      press: (sketch) => (after === null ? splitObjectDistance(sketch) : splitGap(sketch, after)),
    },
  ];
}

/** The overall dimension follows from the others and says so. */
function trackHandle({ overall }: RibbonPlan): readonly Handle[] {
  if (!overall) return [];
  const why = 'The track follows from the gaps: it runs from the first part to the image plane.';
  return [readOnly('track', 'track', why, onText({ xPx: overall.textXPx, yPx: overall.linePx - 12 }))];
}

const onText = ({ xPx, yPx }: { readonly xPx: number; readonly yPx: number }) => ({
  xPx,
  yPx,
  line: null,
  halfWidthPx: 14,
});

function tickHandles(plan: RibbonPlan, sight: Sight): readonly Handle[] {
  const { scene, view } = sight;
  const linePx = plan.cells[0]?.linePx;
  if (linePx === undefined) return [];
  return scene.parts.map((part) => ({
    id: `tick:${part.part.id}`,
    order: 8.5,
    xPx: xOf(view, part.frontMm),
    yPx: linePx,
    line: null,
    cursor: 'ew-resize',
    label: `${partName(part.part, part.index)}, position`,
    slider: null,
    tabStop: false,
    selects: part.part.id,
    look: 'none',
    ...placing(sight, part),
  }));
}
