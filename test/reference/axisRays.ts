import { traceRay } from '../../engine/exact/ray.ts';
import type { RayPath, Vector } from '../../engine/exact/types.ts';
import { derive, finite, type Quantity } from '../../engine/paraxial/absence.ts';
import { firstOrder } from '../../engine/paraxial/firstOrder.ts';
import type { Measured, Reader } from './measure.ts';
import type { Laid } from './prescription.ts';

/** An exact ray through a few surfaces keeps this share of its lengths and sines. */
const EXACT = 1e-12;

/**
 * Exact rays in the meridian: parallel ones at the heights `rayHeights`, or those from the axial object point at the sines `fanSines`. For
 * the N-th: `axisCrossingN` from the last vertex, `longitudinalErrorN`, `sinUN` and `sineRatioN`.
 */
export function readAxisRays({ train, firstZ, lastZ }: Laid, input: Record<string, unknown>): Reader {
  const lastVertex = train.z[train.count - 1] ?? 0;
  const starts: { start: Vector; direction: Vector }[] = [
    ...numbers(input.rayHeights).map((height) => ({
      start: [0, height, firstZ] as const,
      direction: [0, 0, 1] as const,
    })),
    ...numbers(input.fanSines).map((sine) => ({
      start: [0, 0, train.objectZ ?? firstZ] as const,
      direction: [0, sine, Math.sqrt(1 - sine * sine)] as const,
    })),
  ];
  const backFocusMm = derive(firstOrder(train).backFocusMm, (mm) => mm + lastVertex - lastZ);
  return (quantity) => {
    const [, name = '', number = ''] = /^([a-zA-Z]+)(\d+)$/.exec(quantity) ?? [];
    const ray = starts[Number(number) - 1];
    if (ray === undefined) return null;
    const path = traceRay(train, ray.start, ray.direction);
    const crossing = derive(crossingOf(path), (mm) => mm + lastVertex - lastZ);
    const sine = finite(path.hits.at(-1)?.direction?.[1] ?? Number.NaN);
    switch (name) {
      case 'axisCrossing':
        return measured(crossing, crossing);
      case 'longitudinalError':
        return backFocusMm.ok
          ? measured(
              derive(crossing, (mm) => mm - backFocusMm.value),
              backFocusMm,
            )
          : null;
      case 'sinU':
        return measured(
          derive(sine, (m) => -m),
          sine,
        );
      case 'sineRatio': {
        const ratio = derive(sine, (m) => path.direction[1] / m);
        return measured(ratio, ratio);
      }
      default:
        return null;
    }
  };
}

/** Where the ray crosses the axis behind the last surface, from its vertex. */
function crossingOf({ hits, lost }: RayPath): Quantity {
  const last = hits.at(-1);
  if (lost !== null || last?.direction == null) return finite(Number.NaN);
  const [, y, z] = last.point;
  const [, m, n] = last.direction;
  return finite(z - (y * n) / m);
}

const numbers = (list: unknown): readonly number[] =>
  Array.isArray(list) && list.every(Number.isFinite) ? (list as readonly number[]) : [];

const measured = (value: Quantity, scale: Quantity): Measured => ({
  value,
  floor: scale.ok ? EXACT * Math.abs(scale.value) : 0,
});
