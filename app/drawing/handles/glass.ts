import type { Edit, Face, GlassPart } from '../../../engine/index.ts';
import { bendGlass, partName, setSurface, setThickness, unsolvableSentence } from '../../../engine/index.ts';
import { xOf, yOf } from '../../board/viewport.ts';
import type { Handle, LayoutDrag, Move } from '../handle.ts';
import { plainMove } from '../handle.ts';
import { faceZ } from '../layers/glass.ts';
import { FOCAL_STEM_PX, VERTEX_RISE_PX } from '../layers/marks.ts';
import type { ScenePart } from '../scene.ts';
import type { Sight } from '../sight.ts';
import { curvatureForSag, radiusOf, sagOfConic } from './sag.ts';

/** Lengths that a drag may not shrink below, mm. */
const LEAST_MM = 0.01;
/** The grip of a radius stands at this share of its face's height, above the axis and below it in turn, so that neighbours keep apart. */
const RADIUS_AT = 0.72;

/** The rim goes about twice as far as its sag changes, as the vertex gives way for the principal planes to stay. */
const BENT_SHARE = 0.5;

/** The grips of selected glass: radii, bending at constant power, thicknesses on the axis, rims. */
export function glassHandles(sight: Sight, drawn: ScenePart): readonly Handle[] {
  const { part, body } = drawn;
  if (part.kind !== 'glass' || !body) return [];
  return [
    ...body.faces.map((face, k) => radiusHandle(sight, drawn, part, face, k)),
    bendHandle(sight, drawn, part),
    ...part.fillings.map((_, k) => thicknessHandle(sight, drawn, part, k)),
    ...body.faces.flatMap((face, k) =>
      part.surfaces[k]?.semiDiameterMm == null ? [] : ownRimHandles(sight, drawn, part, face, k),
    ),
  ];
}

/** A radius as it is said: flat has none. */
const radiusText = (sight: Sight, radiusMm: number | null): string =>
  radiusMm === null ? 'flat' : `R ${sight.length(radiusMm)}`;

/** Dragging the profile sideways changes its sag there, and so the radius; conic and powers stay. */
function radiusHandle(sight: Sight, drawn: ScenePart, part: GlassPart, face: Face, k: number): Handle {
  const { view } = sight;
  const side = k % 2 === 0 ? 1 : -1;
  const heightMm = RADIUS_AT * face.reachMm;
  const { conic = 0, radiusMm = null } = part.surfaces[k] ?? {};
  const presentMm = sagOfConic(face.profile, heightMm);
  const set =
    (radius: number | null): Edit =>
    (sketch) =>
      setSurface(sketch, part.id, k, { radiusMm: radius });
  const radiusAt = (dzMm: number): number | null =>
    dzMm === 0 ? radiusMm : radiusOf(curvatureForSag(presentMm + dzMm, heightMm, conic));
  const name = `${partName(part, drawn.index)}, radius of surface ${k + 1}`;
  return {
    id: `radius:${part.id}:${k}`,
    order: 3.5,
    xPx: xOf(view, faceZ(drawn, face, heightMm)),
    yPx: yOf(view, side * heightMm),
    line: null,
    cursor: 'ew-resize',
    label: name,
    slider: {
      valueNow: radiusMm ?? 0,
      valueText: `radius of surface ${k + 1} ${radiusMm === null ? 'flat' : sight.length(radiusMm)}`,
      orientation: 'horizontal',
    },
    tabStop: true,
    selects: part.id,
    look: 'round',
    drag: (drag) => {
      const radius = radiusAt(drag.dzMm);
      return plainMove(set(radius), radiusText(sight, radius));
    },
    step: (amountMm) => set(radiusAt(amountMm)),
    entry: {
      label: `radius of surface ${k + 1}`,
      unit: 'mm',
      value: radiusMm ?? Number.POSITIVE_INFINITY,
      allowInfinity: true,
      set: (radius) => set(Number.isFinite(radius) ? radius : null),
    },
    why: null,
  };
}

/** All faces bent together: the rim of the first follows the hand, the power stays, and so do the principal planes. */
function bendHandle(sight: Sight, drawn: ScenePart, part: GlassPart): Handle {
  const { view, reading } = sight;
  const face = drawn.body?.faces[0];
  const conic = part.surfaces[0]?.conic ?? 0;
  const radiusMm = part.surfaces[0]?.radiusMm ?? null;
  const heightMm = face?.reachMm ?? 0;
  const presentMm = face ? sagOfConic(face.profile, heightMm) : 0;
  const present = radiusMm === null ? 0 : 1 / radiusMm;
  const curvatureAt = (dzMm: number) =>
    dzMm === 0 ? present : curvatureForSag(presentMm + BENT_SHARE * dzMm, heightMm, conic);
  const bend =
    (curvature: number): Edit =>
    (sketch) => {
      const bent = bendGlass(sketch, part.id, curvature);
      return bent.ok ? bent.value.sketch : sketch;
    };
  const moved = (curvature: number): Move => {
    const bent = bendGlass(reading.sketch, part.id, curvature);
    if (!bent.ok) return plainMove((sketch) => sketch, unsolvableSentence(bent.why));
    return {
      ...plainMove(bend(curvature), `bent to ${radiusText(sight, radiusOf(curvature))} in front`),
      frameMm: drawn.index === 0 ? bent.value.frontByMm : 0,
    };
  };
  return {
    id: `bend:${part.id}`,
    order: 2,
    xPx: xOf(view, (drawn.frontMm + drawn.rearMm) / 2),
    yPx: yOf(view, 0) + FOCAL_STEM_PX,
    line: null,
    cursor: 'ew-resize',
    label: `${partName(part, drawn.index)}, bending at constant power`,
    slider: {
      valueNow: present,
      valueText: `bent to ${radiusMm === null ? 'flat' : `a radius of ${sight.length(radiusMm)}`} in front, power kept`,
      orientation: 'horizontal',
    },
    tabStop: true,
    selects: part.id,
    look: 'round',
    drag: (drag) => moved(curvatureAt(drag.dzMm)),
    step: (amountMm) => bend(curvatureAt(amountMm)),
    entry: {
      label: 'front radius, power kept',
      unit: 'mm',
      value: radiusMm ?? Number.POSITIVE_INFINITY,
      allowInfinity: true,
      set: (radius) => bend(Number.isFinite(radius) ? 1 / radius : 0),
    },
    why: null,
  };
}

function thicknessHandle(sight: Sight, drawn: ScenePart, part: GlassPart, k: number): Handle {
  const { view } = sight;
  const thicknessMm = part.fillings[k]?.thicknessMm ?? 0;
  const rearMm = drawn.frontMm + (drawn.body?.faces[k + 1]?.vertexMm ?? 0);
  const which = part.fillings.length === 1 ? 'thickness' : `thickness ${k + 1}`;
  const set =
    (value: number): Edit =>
    (sketch) =>
      setThickness(sketch, part.id, value, k);
  const kept = (dzMm: number) => Math.max(Math.min(LEAST_MM, thicknessMm), thicknessMm + dzMm);
  return {
    id: `thickness:${part.id}:${k}`,
    order: 3,
    xPx: xOf(view, rearMm),
    yPx: yOf(view, 0) - VERTEX_RISE_PX,
    line: null,
    cursor: 'ew-resize',
    label: `${partName(part, drawn.index)}, ${which}`,
    slider: {
      valueNow: thicknessMm,
      valueText: `${which} ${sight.length(thicknessMm)}`,
      orientation: 'horizontal',
    },
    tabStop: true,
    selects: part.id,
    look: 'square',
    drag: (drag) => plainMove(set(kept(drag.dzMm)), `thickness ${sight.length(kept(drag.dzMm))}`),
    step: (amountMm) => set(kept(amountMm)),
    entry: { label: which, unit: 'mm', value: thicknessMm, set },
    why: null,
  };
}

/** A face with a rim of its own has grips on it. */
function ownRimHandles(
  sight: Sight,
  drawn: ScenePart,
  part: GlassPart,
  face: Face,
  k: number,
): readonly Handle[] {
  const { view } = sight;
  const { semiMm } = face;
  const set =
    (value: number): Edit =>
    (sketch) =>
      setSurface(sketch, part.id, k, { semiDiameterMm: Math.max(LEAST_MM, value) });
  return ([1, -1] as const).map((side) => ({
    id: `rim:${part.id}:${k}:${side > 0 ? 'upper' : 'lower'}`,
    order: 4.4,
    xPx: xOf(view, drawn.frontMm + face.rimMm),
    yPx: yOf(view, side * semiMm),
    line: null,
    cursor: 'ns-resize',
    label: `${partName(part, drawn.index)}, ${side > 0 ? 'upper' : 'lower'} rim of surface ${k + 1}`,
    slider: {
      valueNow: semiMm,
      valueText: `clear diameter of surface ${k + 1} ${sight.length(2 * semiMm)}`,
      orientation: 'vertical',
    },
    tabStop: side > 0,
    selects: part.id,
    look: 'square',
    drag: (drag: LayoutDrag) => {
      const semi = Math.max(LEAST_MM, semiMm + side * drag.dyMm);
      return plainMove(set(semi), `clear ⌀ ${sight.length(2 * semi)}`);
    },
    step: (amountMm: number) => set(semiMm + side * amountMm),
    entry: {
      label: `clear diameter of surface ${k + 1}`,
      unit: 'mm',
      value: 2 * semiMm,
      set: (diameter: number) => (sketch) => setSurface(sketch, part.id, k, { semiDiameterMm: diameter / 2 }),
    },
    why: null,
  }));
}

/** Half the diameter of the faces that take the part's rim, where the part's own rim grip stands; null when none does. */
export function sharedSemi({ part, body, semiMm }: ScenePart): number | null {
  if (part.kind !== 'glass' || !body) return semiMm;
  const sharing = body.faces.filter((_, k) => part.surfaces[k]?.semiDiameterMm == null);
  return sharing[0]?.semiMm ?? null;
}
