import type { Train } from '../train/types.ts';
import { traceBatch } from './kernel.ts';
import { CODE, L, LOSSES, lostOf, M, MISSED, N, PATH, STRIDE, X, Y, Z } from './rayBuffer.ts';
import { normalAt } from './surface.ts';
import type { Hit, RayPath, Vector } from './types.ts';

/**
 * One ray through the train with every point, direction, cosine and path on its way. `start` has its z from the first vertex (mm),
 * `direction` may be of any length. With `clip` the rims end it. Behind thin parts the path is a length and no phase.
 */
export function traceRay(train: Train, start: Vector, direction: Vector, clip = false): RayPath {
  const ray = new Float64Array(STRIDE);
  const unit = unitOf(direction);
  ray.set(start, X);
  ray.set(unit, L);
  const hits: Hit[] = [];
  for (let k = 0; k < train.count && ray[CODE] === 0; k++) {
    const before = directionOf(ray);
    traceBatch(train, ray, 1, clip, k, k + 1);
    const code = ray[CODE]!;
    if (code === LOSSES * k + MISSED) break;
    const normal = normalAt(train, k, ray[X]!, ray[Y]!);
    const after = code === 0 ? directionOf(ray) : null;
    hits.push({
      point: [ray[X]!, ray[Y]!, ray[Z]!],
      direction: after,
      normal: dot(after ?? before, normal) < 0 ? [-normal[0], -normal[1], -normal[2]] : normal,
      cosIncidence: Math.abs(dot(before, normal)),
      cosRefraction: after && Math.abs(dot(after, normal)),
      opticalPathMm: ray[PATH]!,
    });
  }
  return { start, direction: unit, hits, lost: lostOf(ray[CODE]!) };
}

const directionOf = (ray: Float64Array): Vector => [ray[L]!, ray[M]!, ray[N]!];

const dot = (a: Vector, b: Vector): number => a[0] * b[0] + a[1] * b[1] + a[2] * b[2];

function unitOf([x, y, z]: Vector): Vector {
  const length = Math.hypot(x, y, z);
  return [x / length, y / length, z / length];
}
