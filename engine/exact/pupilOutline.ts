import { none, type Outcome, some } from '../outcome.ts';
import { traceBatch } from './kernel.ts';
import { aimRays, mapRays, type PupilMap } from './pupilMap.ts';
import { CODE, lostOf, STRIDE } from './rayBuffer.ts';
import type { Loss, Lost } from './types.ts';

/** The part of the stop that the bundle of one field point fills. */
export interface PupilOutline {
  /** Points of its edge, x and y in turn, in shares of the stop's radius: from the top through positive x and round. */
  readonly points: Float64Array;
  /** What cuts the bundle at each of them; null where the stop does. */
  readonly cutBy: readonly (Lost | null)[];
  /** A point inside, from which the edge was sought. */
  readonly centre: readonly [x: number, y: number];
  /** Its area as a share of the whole stop's. */
  readonly share: number;
}

/** Points a side of the grid on which light is sought when the chief ray is cut. */
const GRID = 24;

/**
 * The outline, with rims clipping and rays lost counted: `steps` directions in half a turn, the edge on each found by `halvings` halvings. With `aimed`
 * every ray is aimed, else they are mapped. Seen from its centre the outline is taken to have one edge in each direction. Absent, with the chief ray's loss, when
 * no light gets through.
 */
export function pupilOutline(
  map: PupilMap,
  aimed = false,
  steps = 32,
  halvings = 20,
): Outcome<PupilOutline, Loss> {
  const centre = centreOf(map, aimed);
  if (!centre.ok) return centre;
  const [cx, cy] = centre.value;
  const count = steps + 1;
  const sines = Float64Array.from({ length: count }, (_, k) => Math.sin((Math.PI * k) / steps));
  const cosines = Float64Array.from({ length: count }, (_, k) => Math.cos((Math.PI * k) / steps));
  const edge = sines.map((sine, k) => {
    const along = cx * sine + cy * cosines[k]!;
    return Math.sqrt(along * along + 1 - cx * cx - cy * cy) - along;
  });
  const passing = new Float64Array(count);
  const cut = Float64Array.from(edge);
  const codes = new Float64Array(count);
  const tried = Float64Array.from(edge);
  const pupil = new Float64Array(2 * count);
  const rays = new Float64Array(STRIDE * count);
  for (let step = 0; step <= halvings; step++) {
    for (let k = 0; k < count; k++) {
      pupil[2 * k] = cx + tried[k]! * sines[k]!;
      pupil[2 * k + 1] = cy + tried[k]! * cosines[k]!;
    }
    pass(map, aimed, pupil, count, rays);
    for (let k = 0; k < count; k++) {
      const code = rays[k * STRIDE + CODE]!;
      if (code === 0) passing[k] = tried[k]!;
      else [cut[k], codes[k]] = [tried[k]!, code];
      tried[k] = (passing[k]! + cut[k]!) / 2;
    }
  }
  return some(outlineOf(centre.value, passing, codes, sines, cosines));
}

/** Traces the rays to these points of the stop through the whole train, rims clipping. */
function pass(map: PupilMap, aimed: boolean, pupil: Float64Array, count: number, rays: Float64Array): void {
  const start = aimed ? aimRays : mapRays;
  start(map, pupil, count, rays);
  traceBatch(map.sight.train, rays, count, true);
}

/** The stop's centre when the chief ray gets through, else the middle of what does. */
function centreOf(map: PupilMap, aimed: boolean): Outcome<readonly [number, number], Loss> {
  const one = new Float64Array(STRIDE);
  pass(map, aimed, new Float64Array(2), 1, one);
  const lost = map.lost ?? lostOf(one[CODE]!);
  if (!lost) return some([0, 0]);
  if (map.lost) return none(lost.why);
  const inside: number[] = [];
  for (let i = 0; i < GRID * GRID; i++) {
    const [x, y] = [((i % GRID) + 0.5) / (GRID / 2) - 1, (Math.floor(i / GRID) + 0.5) / (GRID / 2) - 1];
    if (x * x + y * y < 1) inside.push(x, y);
  }
  const pupil = Float64Array.from(inside);
  const count = pupil.length / 2;
  const rays = new Float64Array(STRIDE * count);
  pass(map, aimed, pupil, count, rays);
  let [through, sumY] = [0, 0];
  for (let i = 0; i < count; i++) {
    if (rays[i * STRIDE + CODE] !== 0) continue;
    through++;
    sumY += pupil[2 * i + 1]!;
  }
  return through === 0 ? none(lost.why) : some([0, sumY / through]);
}

/** Both halves from the one on the side of positive x. */
function outlineOf(
  centre: readonly [number, number],
  radius: Float64Array,
  codes: Float64Array,
  sines: Float64Array,
  cosines: Float64Array,
): PupilOutline {
  const steps = radius.length - 1;
  const points = new Float64Array(4 * steps);
  const cutBy: (Lost | null)[] = [];
  let sum = 0;
  for (let i = 0; i < 2 * steps; i++) {
    const k = i <= steps ? i : 2 * steps - i;
    const side = i <= steps ? 1 : -1;
    points[2 * i] = centre[0] + side * radius[k]! * sines[k]!;
    points[2 * i + 1] = centre[1] + radius[k]! * cosines[k]!;
    cutBy.push(lostOf(codes[k]!));
    sum += radius[k]! * radius[k]!;
  }
  return { points, cutBy, centre, share: sum / (2 * steps) };
}
