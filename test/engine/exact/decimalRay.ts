import type { Decimal } from 'decimal.js';
import type { TrainSpec } from '../../../engine/train/build.ts';
import { D } from '../paraxial/decimal.ts';

/**
 * Exact rays once more, in forty digits and by other means than the engine's: the sag equation along the ray is solved as it stands, by
 * halving and Newton steps, and the ray is refracted by its part along the surface, which Snell's law scales by n/n′.
 */
export interface DecimalHit {
  readonly point: readonly [Decimal, Decimal, Decimal];
  readonly direction: readonly [Decimal, Decimal, Decimal];
  readonly cosIncidence: Decimal;
  readonly path: Decimal;
}

/** The hits of a ray in turn; shorter than the train when it ends on the way. */
export function decimalRay(
  spec: TrainSpec,
  start: readonly [number, number, number],
  direction: readonly [number, number, number],
): readonly DecimalHit[] {
  const length = direction
    .map((v) => new D(v).times(v))
    .reduce((a, b) => a.plus(b))
    .sqrt();
  let [x, y, z] = start.map((v) => new D(v)) as [Decimal, Decimal, Decimal];
  let [l, m, n] = direction.map((v) => new D(v).div(length)) as [Decimal, Decimal, Decimal];
  let path = new D(0);
  let index = new D(spec.objectIndex);
  const hits: DecimalHit[] = [];
  for (const [k, surface] of spec.surfaces.entries()) {
    const gap = spec.surfaces[k - 1]?.gapMm ?? 0;
    z = z.minus(gap);
    const along = hit(surface, [x, y, z], [l, m, n]);
    if (along === null) return hits;
    [x, y, z] = [x.plus(l.times(along)), y.plus(m.times(along)), z.plus(n.times(along))];
    path = path.plus(index.abs().times(along));
    const slope = shapeOf(surface, x.times(x).plus(y.times(y)))?.slopeOverRadius ?? new D(0);
    const unit = new D(1).div(
      slope
        .times(slope)
        .times(x.times(x).plus(y.times(y)))
        .plus(1)
        .sqrt(),
    );
    const normal = [x.times(slope).neg().times(unit), y.times(slope).neg().times(unit), unit] as const;
    const cosine = l.times(normal[0]).plus(m.times(normal[1])).plus(n.times(normal[2]));
    const behind = new D(surface.indexAfter);
    const ratio = index.div(behind).abs();
    const alongSurface = ([l, m, n] as const).map((v, i) => v.minus(cosine.times(normal[i]!)).times(ratio));
    const squared = alongSurface.map((v) => v.times(v)).reduce((a, b) => a.plus(b));
    if (squared.gt(1)) return hits;
    const side = cosine.s * (index.s * behind.s);
    const across = new D(1).minus(squared).sqrt().times(side);
    [l, m, n] = alongSurface.map((v, i) => v.plus(across.times(normal[i]!))) as [Decimal, Decimal, Decimal];
    index = behind;
    hits.push({ point: [x, y, z], direction: [l, m, n], cosIncidence: cosine.abs(), path });
  }
  return hits;
}

type Surface = TrainSpec['surfaces'][number];

/** Sag and sag′/r at the square of a radius; null beyond the conic's edge. */
function shapeOf(
  { curvaturePerMm = 0, conic = 0, asphere = [] }: Surface,
  squared: Decimal,
): { sag: Decimal; slopeOverRadius: Decimal } | null {
  const c = new D(curvaturePerMm);
  const radicand = new D(1).minus(c.times(c).times(squared).times(new D(conic).plus(1)));
  if (radicand.lte(0)) return null;
  const root = radicand.sqrt();
  let sag = c.times(squared).div(root.plus(1));
  let slopeOverRadius = c.div(root);
  let power = squared;
  for (const [j, coefficient] of asphere.entries()) {
    slopeOverRadius = slopeOverRadius.plus(power.times(coefficient).times(4 + 2 * j));
    power = power.times(squared);
    sag = sag.plus(power.times(coefficient));
  }
  return { sag, slopeOverRadius };
}

/** Looked at along the ray, each side of the tangent plane. */
const LOOKS = 300;

/**
 * Length along the ray to where z − sag changes sign in the light's direction: of all changes seen on a walk along it in doubles the one nearest to the
 * tangent plane, then halved in forty digits. Null when there is none.
 */
function hit(
  surface: Surface,
  [x, y, z]: readonly [Decimal, Decimal, Decimal],
  [l, m, n]: readonly [Decimal, Decimal, Decimal],
): Decimal | null {
  const at = (t: Decimal): { miss: Decimal; rate: Decimal } | null => {
    const [px, py] = [x.plus(l.times(t)), y.plus(m.times(t))];
    const shape = shapeOf(surface, px.times(px).plus(py.times(py)));
    if (shape === null) return null;
    return {
      miss: z.plus(n.times(t)).minus(shape.sag).times(n.s),
      rate: n.minus(shape.slopeOverRadius.times(px.times(l).plus(py.times(m)))).times(n.s),
    };
  };
  const plane = z.div(n).neg();
  const bracket = nearestChange(surface, [x, y, z].map(Number), [l, m, n].map(Number), plane.toNumber());
  if (bracket === null) return null;
  let [low, high] = bracket.map((t) => new D(t)) as [Decimal, Decimal];
  let t = low.plus(high).div(2);
  for (let step = 0; step < 400; step++) {
    const here = at(t);
    if (here === null) return null;
    if (here.miss.lt(0)) low = t;
    else high = t;
    const change = here.miss.div(here.rate);
    if (change.abs().lt('1e-35')) return t;
    const newton = t.minus(change);
    t = newton.gt(low) && newton.lt(high) ? newton : low.plus(high).div(2);
  }
  return null;
}

/** Two lengths along the ray, in front of the surface and behind it. */
function nearestChange(
  surface: Surface,
  [x = 0, y = 0, z = 0]: readonly number[],
  [l = 0, m = 0, n = 0]: readonly number[],
  plane: number,
): readonly [number, number] | null {
  const { curvaturePerMm: c = 0, conic = 0, asphere = [] } = surface;
  const miss = (t: number): number => {
    const squared = (x + l * t) ** 2 + (y + m * t) ** 2;
    const powers = asphere.reduce((sum, a, j) => sum + a * squared ** (2 + j), 0);
    const root = Math.sqrt(1 - (1 + conic) * c * c * squared);
    return (z + n * t - (c * squared) / (1 + root) - powers) * Math.sign(n);
  };
  let best: readonly [number, number] | null = null;
  for (let i = -LOOKS; i < LOOKS; i++) {
    // Steps from micrometres near the plane to decimetres.
    const place = (j: number) => plane + (j + 0.37) * (1e-3 + 3e-3 * Math.abs(j));
    const [before, after] = [place(i), place(i + 1)];
    if (!(miss(before) < 0 && miss(after) >= 0)) continue;
    if (best === null || Math.abs(before - plane) < Math.abs(best[0] - plane)) best = [before, after];
  }
  return best;
}
