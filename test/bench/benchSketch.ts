import { emptySketch, newThin } from '../../engine/sketch/create.ts';
import type {
  PartId,
  PerPosition,
  Position,
  PositionId,
  Sketch,
  ThinPart,
} from '../../engine/sketch/types.ts';

const SEED = 20261201;

/** Of the parts in turn, give or take a tenth: a channel that keeps rays near the axis however long it is. */
const FOCAL_LENGTHS_MM = [60, -120, 90, 200];

/**
 * A made-up sketch of `elements` thin parts at `positions` positions, the same at every call: focal lengths of both
 * signs, gaps from 4 to 12 mm of which every second one differs by position, rims (some of which cut the edge of the
 * field) and Abbe numbers given, the stop on the second part, a fixed sensor.
 */
export function benchSketch(elements: number, positions: number): Sketch {
  const random = numbers(SEED);
  const named: Position[] = Array.from({ length: positions }, (_, k) => ({
    id: `pos${k + 1}` as PositionId,
    name: `position ${k + 1}`,
  }));
  const gap = (k: number): PerPosition =>
    k % 2 === 0 ? 4 + 8 * random() : Object.fromEntries(named.map(({ id }) => [id, 4 + 8 * random()]));
  const focalLength = (k: number): number => (FOCAL_LENGTHS_MM[k % 4] ?? 1) * (0.9 + 0.2 * random());
  const parts = Array.from(
    { length: elements },
    (_, k): ThinPart => ({
      ...newThin(focalLength(k), `p${k + 1}` as PartId),
      name: `Element ${k + 1}`,
      semiDiameterMm: 4 + 4 * random(),
      abbeNumber: 30 + 40 * random(),
      space: { lengthMm: gap(k), medium: 'air' },
    }),
  );
  return {
    ...emptySketch('Bench'),
    object: { distanceMm: 400, medium: 'air' },
    parts,
    image: 'fixed',
    sensor: { size: { widthMm: 8.8, heightMm: 6.6 }, pixelPitchMm: 0.00345 },
    stop: parts[1]?.id ?? null,
    aperture: { kind: 'stopDiameter', diameterMm: 8 },
    field: { size: { kind: 'objectHeight', heightMm: 20 }, fractions: [0, 0.7, 1], vignetting: 0 },
    positions: named,
  };
}

/** Numbers from 0 up to 1, the same for the same seed: the generator of Park and Miller, Comm. ACM 31, 1192 (1988). */
function numbers(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state * 48271) % 2147483647;
    return state / 2147483647;
  };
}
