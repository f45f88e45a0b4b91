import { STRIDE } from '../../engine/exact/rayBuffer.ts';
import { buildTrain } from '../../engine/train/build.ts';
import type { Train } from '../../engine/train/types.ts';
import text from './prescription.txt?raw';

/** One surface of the yardstick's prescription. */
export interface PlainSurface {
  readonly curvature: number;
  /** From the last vertex, for the first surface from where the rays start. */
  readonly distance: number;
  readonly indexBefore: number;
  readonly indexAfter: number;
}

/** Thirty spheres, invented for timing; `prescription.txt` is what the program in C reads too. */
export const SURFACES: readonly PlainSurface[] = text
  .split('\n')
  .filter((line) => line !== '' && !line.startsWith('#'))
  .map((line) => {
    const [curvature = 0, distance = 0, indexBefore = 1, indexAfter = 1] = line.split(' ').map(Number);
    return { curvature, distance, indexBefore, indexAfter };
  });

/** As many as the program in C traces, and where they start. */
export const RAYS = 1024;
const PUPIL_MM = 8;
const DIRECTION = 0.139;
const GOLDEN_ANGLE = 2.399963229728653;

/** The prescription as a train; with `aspheres` every eighth surface from the third on is one, as in the program in C. */
export const benchTrain = (aspheres: boolean): Train =>
  buildTrain({
    objectIndex: SURFACES[0]?.indexBefore ?? 1,
    objectZ: null,
    imageDistanceMm: null,
    surfaces: SURFACES.map(({ curvature, indexAfter }, part) => ({
      part,
      curvaturePerMm: curvature,
      indexAfter,
      gapMm: SURFACES[part + 1]?.distance ?? 0,
      semiDiameterMm: 1e3,
      ...(aspheres && part % 8 === 2 ? { conic: -0.6, asphere: [2e-7, -3e-10] } : {}),
    })),
  });

/** The rays as they start, z from the first vertex. */
export function benchRays(): Float64Array {
  const rays = new Float64Array(RAYS * STRIDE);
  const back = SURFACES[0]?.distance ?? 0;
  for (let i = 0; i < RAYS; i++) {
    const radius = PUPIL_MM * Math.sqrt((i + 0.5) / RAYS);
    const l = DIRECTION * Math.sin(i * 0.7548776662466927);
    const m = DIRECTION * Math.sin(i * 0.5698402909980532);
    const [x, y] = [radius * Math.cos(i * GOLDEN_ANGLE), radius * Math.sin(i * GOLDEN_ANGLE)];
    rays.set([x, y, -back, l, m, Math.sqrt(1 - l * l - m * m), 0, 0], i * STRIDE);
  }
  return rays;
}
