import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { traceRay } from '../../../engine/exact/ray.ts';
import { buildTrain } from '../../../engine/train/build.ts';
import { anyExactTrain, anyStart, HEIGHT_MM } from './anyRay.ts';
import { type DecimalHit, decimalRay } from './decimalRay.ts';

/** Of the size of what was added up, at least 1 mm: some thousand roundings of a double. */
const AGREEMENT = 1e-12;
/** Steeper than that, rounding is multiplied at every surface. */
const LEAST_COSINE = 0.1;
/** Further out even powers go wild and a ray may meet a surface several times. */
const FARTHEST_MM = 1.5 * HEIGHT_MM;
const PRESCRIPTIONS = 300;

const far = ({ point: [x, y] }: DecimalHit): boolean => Math.hypot(x.toNumber(), y.toNumber()) > FARTHEST_MM;

describe('rays through random prescriptions, traced again in forty digits', () => {
  it('agree in place, direction and path at every surface to 1e-12', { timeout: 60_000 }, () => {
    const samples = fc.sample(fc.tuple(anyExactTrain(), anyStart()), { seed: 20261201, numRuns: 440 });
    const counts = { through: 0, missed: 0, 'totally reflected': 0, clipped: 0 };
    let worst = 0;
    for (const [spec, { start, direction }] of samples) {
      const where = JSON.stringify({ spec, start, direction });
      const hits = decimalRay(spec, start, direction);
      const end = hits.findIndex((hit) => hit.cosIncidence.lt(LEAST_COSINE) || far(hit));
      const wanted = end < 0 ? hits : hits.slice(0, end);
      const got = traceRay(buildTrain(spec), start, direction);
      const through = got.hits.filter((hit) => hit.direction !== null);
      if (end < 0) {
        expect(through.length, where).toBe(wanted.length);
        counts[got.lost?.why ?? 'through']++;
      }
      let scale = 1;
      for (const [k, hit] of wanted.entries()) {
        const mine = through[k];
        if (!mine) throw new Error(`surface ${k + 1} is missing in ${where}`);
        scale = Math.max(scale, ...hit.point.map((v) => Math.abs(v.toNumber())), hit.path.abs().toNumber());
        const off = (a: readonly number[], b: typeof hit.point) =>
          Math.max(
            ...b.map((v, i) =>
              v
                .minus(a[i] ?? Number.NaN)
                .abs()
                .toNumber(),
            ),
          );
        const misses = [
          off(mine.point, hit.point) / scale,
          off(mine.direction ?? [], hit.direction),
          hit.path.minus(mine.opticalPathMm).abs().toNumber() / scale,
        ];
        worst = Math.max(worst, ...misses);
        expect(Math.max(...misses), `surface ${k + 1} of ${where}`).toBeLessThanOrEqual(AGREEMENT);
      }
    }
    process.stdout.write(
      `exact rays in forty digits: ${counts.through} prescriptions, ${counts.missed} missed, ${counts['totally reflected']} totally reflected, off by ${worst.toExponential(1)} at most\n`,
    );
    expect(counts.through).toBeGreaterThanOrEqual(PRESCRIPTIONS);
    expect(counts.missed + counts['totally reflected']).toBeGreaterThanOrEqual(20);
  });
});
