/**
 * Points of the unit pupil, +y up, each with the share of the pupil's area that it stands for. A layout with an axis sends the points
 * (x, y) and (−x, y) of a field in the meridian to places that mirror each other, so only those with x ≥ 0 are listed and need a ray.
 */
export interface PupilGrid {
  /** Points of the whole grid. */
  readonly count: number;
  /** Points listed: those with x ≥ 0. */
  readonly traced: number;
  readonly x: Float64Array;
  readonly y: Float64Array;
  /** Of the listed point; its mirror image weighs as much. Over the whole grid they add up to 1. */
  readonly weight: Float64Array;
}

/**
 * `rings` rings of 6, 12, 18, … points about a central one, the outermost on the rim: 1 + 3·rings·(rings + 1) points of equal spacing. The
 * rings are weighted by Gregory's rule, which integrates smooth functions over the disc to the fourth order of the ring spacing; plain
 * areas of annuli would place the outermost half ring on the rim and make spots larger by some percent.
 */
export function hexapolarGrid(rings: number): PupilGrid {
  const points: Point[] = [];
  const centre = rings === 0 ? 1 : 1 / (6 * rings * rings);
  points.push({ x: 0, y: 0, weight: centre });
  for (let ring = 1; ring <= rings; ring++) {
    const radius = ring / rings;
    const weight = (2 * radius * gregory(rings, rings - ring)) / rings / (6 * ring);
    for (let i = 0; i < 6 * ring; i++) {
      const angle = (Math.PI / 3) * (i / ring);
      points.push({ x: radius * sineOf(i, ring), y: radius * Math.cos(angle), weight });
    }
  }
  return gridOf(points);
}

/** The square lattice of `across` points over the diameter, those inside the circle, each standing for one cell. */
export function squareGrid(across: number): PupilGrid {
  const points: Point[] = [];
  for (let row = 0; row < across; row++) {
    for (let column = 0; column < across; column++) {
      const x = cellCentre(column, across);
      const y = cellCentre(row, across);
      if (x * x + y * y <= 1) points.push({ x, y, weight: 1 });
    }
  }
  return gridOf(points);
}

interface Point {
  readonly x: number;
  readonly y: number;
  readonly weight: number;
}

/** Exact mirror images about 0, so that the two halves of the lattice are told apart without a tolerance. */
const cellCentre = (place: number, across: number): number => (2 * place + 1 - across) / across;

/** sin(60° · i/ring), exactly 0 on the meridian and exactly odd about it. */
function sineOf(i: number, ring: number): number {
  const half = 3 * ring;
  if (i % half === 0) return 0;
  return i < half ? Math.sin((Math.PI / 3) * (i / ring)) : -Math.sin((Math.PI / 3) * ((2 * half - i) / ring));
}

/** Weights at the end of a run, by the order of Gregory's rule that so few rings allow (Hildebrand, Introduction to Numerical Analysis, 5.9). */
const GREGORY: readonly (readonly number[])[] = [
  [],
  [1 / 2],
  [5 / 12, 13 / 12],
  [3 / 8, 7 / 6, 23 / 24],
  [251 / 720, 299 / 240, 211 / 240, 739 / 720],
];

const gregory = (rings: number, fromRim: number): number =>
  GREGORY[Math.min(rings, GREGORY.length - 1)]?.[fromRim] ?? 1;

function gridOf(points: readonly Point[]): PupilGrid {
  const whole = points.reduce((sum, { weight }) => sum + weight, 0);
  const traced = points.filter(({ x }) => x >= 0);
  return {
    count: points.length,
    traced: traced.length,
    x: Float64Array.from(traced, ({ x }) => x),
    y: Float64Array.from(traced, ({ y }) => y),
    weight: Float64Array.from(traced, ({ weight }) => weight / whole),
  };
}
