import { traceBatch } from '../../engine/exact/kernel.ts';
import { CODE, M, STRIDE } from '../../engine/exact/rayBuffer.ts';
import { type PlainRay, tracePlain } from './kernelPlain.ts';
import { benchRays, benchTrain, RAYS, SURFACES } from './kernelPrescription.ts';

/** The batch kernel on the yardstick's rays, rims and failures looked at: returns the sum of x + 10 M of the final rays, as the program in C does. */
export function batchTask(aspheres: boolean, count = RAYS): () => number {
  const train = benchTrain(aspheres);
  const start = benchRays().subarray(0, count * STRIDE);
  const rays = new Float64Array(start.length);
  return () => {
    rays.set(start);
    traceBatch(train, rays, count, true);
    let sum = 0;
    for (let at = 0; at < rays.length; at += STRIDE) {
      if (rays[at + CODE] === 0) sum += rays[at]! + 10 * rays[at + M]!;
    }
    return sum;
  };
}

/** The same rays by the version with an object for each surface, all kept until the next run. */
export function plainTask(count = RAYS): () => number {
  const rays = benchRays();
  const back = SURFACES[0]?.distance ?? 0;
  const starts = Array.from({ length: count }, (_, i) => {
    const [x = 0, y = 0, z = 0, l = 0, m = 0, n = 1] = rays.subarray(i * STRIDE);
    return { point: { x, y, z: z + back }, direction: { x: l, y: m, z: n } };
  });
  let kept: readonly PlainRay[] = [];
  return () => {
    let sum = 0;
    kept = starts.map(({ point, direction }) => tracePlain(SURFACES, point, direction));
    for (const { hits, lost } of kept) {
      const last = hits.at(-1);
      if (last && !lost) sum += last.point.x + 10 * last.direction.y;
    }
    return sum;
  };
}
