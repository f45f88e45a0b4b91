import { scaleLinear } from 'd3';
import type { MapDirection, Material, Nominal } from '../../../engine/index.ts';
import { materials } from '../../../engine/index.ts';

/** Abbe numbers run down to the right and indices up, as glass makers draw their maps. */
const ABBE = [99, 14] as const;
const INDEX = [1.31, 2.04] as const;

const across = scaleLinear(ABBE, [0, 100]);
const up = scaleLinear(INDEX, [100, 0]);

/** A place on the map, in per cent of its width from the left and of its height from the top. */
export interface MapPlace {
  readonly x: number;
  readonly y: number;
}

/** Where an index and an Abbe number stand; null when one is missing or they lie beyond the map. */
export function placeOn({ nd, vd }: Nominal): MapPlace | null {
  if (nd === null || vd === null) return null;
  const place = { x: across(vd), y: up(nd) };
  return place.x >= 0 && place.x <= 100 && place.y >= 0 && place.y <= 100 ? place : null;
}

/** A material of the catalogue with its place. */
export interface MapMark extends MapPlace {
  readonly material: Material;
}

/** The materials that stand on the map. */
export const MARKS: readonly MapMark[] = materials.flatMap((material) => {
  const place = placeOn(material);
  return place === null ? [] : [{ ...place, material }];
});

/** The materials that lie beyond the map, or of which it does not know index or Abbe number. */
export const BEYOND: readonly Material[] = materials.filter((material) => placeOn(material) === null);

/** Round values of the two axes with their places. */
export const ABBE_TICKS = across.ticks(8).map((value) => ({ text: String(value), at: across(value) }));
export const INDEX_TICKS = up.ticks(6).map((value) => ({ text: value.toFixed(1), at: up(value) }));

/** The mark nearest to a point within reach, all in px; null when none is. */
export function nearestMark(
  marks: readonly MapMark[],
  point: { readonly xPx: number; readonly yPx: number },
  size: { readonly widthPx: number; readonly heightPx: number },
  reachPx: number,
): MapMark | null {
  let best: MapMark | null = null;
  let least = reachPx;
  for (const mark of marks) {
    const dx = (mark.x / 100) * size.widthPx - point.xPx;
    const dy = (mark.y / 100) * size.heightPx - point.yPx;
    const distance = Math.hypot(dx, dy);
    if (distance > least) continue;
    best = mark;
    least = distance;
  }
  return best;
}

/** What the arrow keys mean on the map. */
export const ARROWS: Readonly<Record<string, MapDirection>> = {
  ArrowUp: 'higher index',
  ArrowDown: 'lower index',
  ArrowLeft: 'higher Abbe number',
  ArrowRight: 'lower Abbe number',
};
