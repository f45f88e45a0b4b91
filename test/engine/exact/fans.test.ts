import type { Decimal } from 'decimal.js';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { type FieldRays, sampleOf, traceFields } from '../../../engine/exact/bundles.ts';
import type { Curve } from '../../../engine/exact/curve.ts';
import { rayFans, wavefrontFans } from '../../../engine/exact/fans.ts';
import { aimRays, pupilMapOf } from '../../../engine/exact/pupilMap.ts';
import { L, STRIDE, X } from '../../../engine/exact/rayBuffer.ts';
import type { ExactSetup } from '../../../engine/exact/types.ts';
import { exitPupil, pathsFromErrors } from '../../../engine/exact/wavefront.ts';
import { firstOrder } from '../../../engine/paraxial/firstOrder.ts';
import { buildTrain } from '../../../engine/train/build.ts';
import { D } from '../paraxial/decimal.ts';
import { given } from '../quantity.ts';
import { between } from './anyRay.ts';
import { decimalRay } from './decimalRay.ts';
import { type Drawn, setupOf, specOf } from './setupOf.ts';

/** Of a wave of 500 nm: what the paths of a 500-mm system hold in doubles. */
const WAVES = 1e-9;
/** Places on the image plane of such a system, mm. */
const PLACE_MM = 1e-12;

/** A plano-hyperbolic lens, stigmatic for infinity: f = 20 mm. */
const HYPERBOLIC = [
  { indexAfter: 1.6, gapMm: 6 },
  { curvaturePerMm: -1 / 12, conic: -2.56, indexAfter: 1, gapMm: 0 },
] as const;
const DISH: Drawn = {
  surfaces: [{ curvaturePerMm: -1 / 1000, conic: -1, indexAfter: -1, gapMm: 0 }],
  aperture: { kind: 'entrancePupilDiameter', diameterMm: 200 },
};
/** A cemented doublet of f = 500 mm or so, made up. */
const TELESCOPE: Drawn = {
  surfaces: [
    { curvaturePerMm: 1 / 305, indexAfter: 1.5168, gapMm: 12 },
    { curvaturePerMm: -1 / 224, indexAfter: 1.62, gapMm: 6 },
    { curvaturePerMm: -1 / 690, indexAfter: 1, gapMm: 0 },
  ],
  aperture: { kind: 'entrancePupilDiameter', diameterMm: 60 },
  field: { kind: 'angle', angleDeg: 1 },
};

/** The whole field in all lines, every ray aimed. */
const traced = (setup: ExactSetup, fraction = 1, fanRays = 21): FieldRays =>
  traceFields(setup, [fraction], sampleOf(fanRays, null, { fine: true }))[0]!;
const largest = (curves: readonly Curve[]): number =>
  Math.max(...curves.flatMap(({ value }) => [...value].map(Math.abs)));
const only = (curves: readonly Curve[]): Curve => {
  expect(curves).toHaveLength(1);
  return curves[0]!;
};

describe('fans of a perfect lens', () => {
  it.each([
    [
      'a hyperbolic lens',
      { surfaces: HYPERBOLIC, aperture: { kind: 'entrancePupilDiameter', diameterMm: 16 } },
    ],
    ['a paraboloid mirror', DISH],
    [
      'an ideal thin lens off the axis',
      {
        surfaces: [{ thinPowerPerMm: 1 / 100, indexAfter: 1, gapMm: 0 }],
        objectZ: -250,
        aperture: { kind: 'entrancePupilDiameter', diameterMm: 40 },
      },
    ],
  ] as const)('are straight lines on the axis: %s', (name, drawn) => {
    const setup = setupOf(drawn);
    for (const fraction of name.startsWith('an ideal') ? [0, 0.5, 1] : [0]) {
      const field = traced(setup, fraction);
      const fans = given(rayFans(field));
      expect(largest([...fans.tangential, ...fans.sagittal])).toBeLessThan(100 * PLACE_MM);
      const waves = given(wavefrontFans(field));
      expect(largest(waves.tangential)).toBeLessThan(WAVES);
      if (waves.sagittal.ok) expect(largest(waves.sagittal.value)).toBeLessThan(WAVES);
    }
  });

  it('show a shift of the plane as n′·δ·(1 − cos U′), the pupil at infinity on the image side', () => {
    const front = given(firstOrder(buildTrain(specOf({ ...DISH, surfaces: HYPERBOLIC }))).frontFocusMm);
    const setup = setupOf({
      surfaces: [{ indexAfter: 1, gapMm: -front }, ...HYPERBOLIC],
      aperture: { kind: 'entrancePupilDiameter', diameterMm: 12 },
    });
    const field = traced(setup, 0);
    const { tangential, sphere } = given(wavefrontFans(field, 0.01));
    expect(sphere.radiusMm).toEqual({ ok: false, why: 'pupil at infinity' });
    const { at, value } = only(tangential);
    const plane = given(setup.imagePlaneMm);
    for (const [i, pupil] of at.entries()) {
      // The sine condition does not hold for this lens: the angle comes from the ray's own slope.
      const ray = Float64Array.from(field.bundles[0]!.rays.subarray((1 + i) * STRIDE, (2 + i) * STRIDE));
      const wanted = (0.01 * (1 - Math.cos(Math.asin(ray[L + 1]!)))) / 500e-6;
      expect(Math.abs(value[i]! - wanted)).toBeLessThan(WAVES);
      expect(pupil).toBeCloseTo(-1 + i / 10, 14);
    }
    expect(plane).toBeCloseTo(20, 12);
  });
});

describe('transverse and wavefront errors', () => {
  it('of undercorrected spherical aberration are below the axis at the upper rim, and + S_I/8 in the wavefront', () => {
    // One surface, R = 100, n = 1.5, y = 2: S_I = −(y/R)²·y·Δ(u/n), Δ(u/n) = −y(n − 1)/(R n²).
    const [radius, n, y] = [100, 1.5, 2];
    const setup = setupOf({
      surfaces: [{ curvaturePerMm: 1 / radius, indexAfter: n, gapMm: 0 }],
      aperture: { kind: 'entrancePupilDiameter', diameterMm: 2 * y },
    });
    const field = traced(setup, 0);
    const seidel = ((y / radius) ** 2 * y * y * (n - 1)) / (radius * n * n);
    const { value } = only(given(wavefrontFans(field)).tangential);
    // The next order is some (y/R)² of this one.
    expect(Math.abs((value[20]! * 500e-6) / (seidel / 8) - 1)).toBeLessThan(3e-3);
    expect(value[0]).toBeCloseTo(value[20]!, 12);
    const { value: errors } = only(given(rayFans(field)).tangential);
    expect(errors[20]).toBeLessThan(0);
    // ε = −dW/dy · R/n′ for a fourth-order wavefront: 4W/y, R = n′y/(n′u′).
    const reach = (y * n) / (n * (y / (radius * n)) * (n - 1));
    expect(Math.abs(errors[20]! / ((-4 * seidel * reach) / (8 * n * y)) - 1)).toBeLessThan(1e-2);
  });

  it('of a plate behind an ideal lens are overcorrected by the closed form, along the meridian alone', () => {
    const setup = setupOf({
      surfaces: [
        { thinPowerPerMm: 1 / 100, indexAfter: 1, gapMm: 60 },
        { indexAfter: 1.5, gapMm: 15 },
        { indexAfter: 1, gapMm: 0 },
      ],
      aperture: { kind: 'entrancePupilDiameter', diameterMm: 10 },
    });
    const waves = given(wavefrontFans(traced(setup, 0)));
    const [n, t, u] = [1.5, 15, 0.05];
    const seidel = (-(n * n - 1) * t * u ** 4) / n ** 3;
    expect(Math.abs((only(waves.tangential).value[20]! * 500e-6) / (seidel / 8) - 1)).toBeLessThan(0.01);
    expect(waves.sagittal).toEqual({ ok: false, why: 'thin parts' });
  });

  it('agree with each other: paths integrated from the errors are the paths traced', () => {
    fc.assert(
      fc.property(between(-0.02, 0.02), between(-0.02, 0.02), between(-1, 1), (c1, c2, fraction) => {
        const setup = setupOf({
          surfaces: [
            { indexAfter: 1, gapMm: 5 },
            { curvaturePerMm: c1 + 0.02, indexAfter: 1.6, gapMm: 8 },
            { curvaturePerMm: c2 - 0.02, indexAfter: 1, gapMm: 0 },
          ],
          objectZ: -300,
          aperture: { kind: 'entrancePupilDiameter', diameterMm: 12 },
        });
        const focal = firstOrder(setup.lines[0].train).focalLengthMm;
        fc.pre(focal.ok && focal.value > 15 && focal.value < 200);
        const field = traced(setup, fraction, 41);
        const waves = given(wavefrontFans(field));
        const { value } = only(waves.tangential);
        const errors = only(given(rayFans(field)).tangential).value;
        const cosines = Float64Array.from(
          errors,
          (_, i) => field.bundles[0]!.rays[(1 + i) * STRIDE + L + 1]!,
        );
        const paths = new Float64Array(errors.length);
        pathsFromErrors(errors, cosines, 1, 20, paths);
        const size = largest(waves.tangential) + 1;
        // Up to the foot: what lies between the foot and the sphere is ε²cos²U/2R.
        const radius = given(waves.sphere.radiusMm);
        for (const [i, path] of paths.entries()) {
          const error = errors[i]! * Math.sqrt(1 - cosines[i]! ** 2);
          const wave = -(path + error ** 2 / (2 * radius)) / 500e-6;
          // Cubics through rays a fortieth of the stop apart.
          expect(Math.abs(wave - value[i]!)).toBeLessThan(1e-4 * size);
        }
      }),
      { numRuns: 60 },
    );
  });

  it('stand in each line against the chief ray and the sphere of the main line', () => {
    const setup = setupOf({
      ...TELESCOPE,
      more: [
        { wavelengthNm: 480, indices: [1.5228, 1.632, 1] },
        { wavelengthNm: 640, indices: [1.5143, 1.6155, 1] },
      ],
    });
    const field = traced(setup);
    const fans = given(rayFans(field));
    expect(fans.tangential.map(({ line }) => line)).toEqual([0, 1, 2]);
    const middles = fans.tangential.map(({ value }) => value[10]!);
    // Lateral colour shows where the fans cross the axis; the main line's passes through nought.
    expect(middles[0]).toBe(0);
    expect(middles[1]! * middles[2]!).toBeLessThan(0);
    for (const { value } of given(wavefrontFans(field)).tangential) expect(value[10]).toBe(0);
  });

  it('are odd and even across the meridian', () => {
    const field = traced(setupOf(TELESCOPE));
    const { value: across } = only(given(rayFans(field)).sagittal);
    const { value: waves } = only(given(given(wavefrontFans(field)).sagittal));
    for (let i = 0; i < 21; i++) {
      expect(across[20 - i]).toBe(-across[i]! + 0);
      expect(waves[20 - i]).toBe(waves[i]);
    }
  });
});

describe('the wavefront of a 500-mm system', () => {
  it.each([
    ['from infinity', TELESCOPE],
    ['from 1500 mm', { ...TELESCOPE, objectZ: -1500 }],
    ['from a kilometre', { ...TELESCOPE, objectZ: -1e6 }],
  ] as const)('agrees with forty digits to 1e-9 waves, %s', (_, drawn) => {
    const setup = setupOf({ ...drawn, wavelengthNm: 500 });
    const sample = sampleOf(11, null, { fine: true });
    for (const fraction of [0, 0.7, 1]) {
      const field = traceFields(setup, [fraction], sample)[0]!;
      const waves = given(wavefrontFans(field));
      const starts = new Float64Array(sample.count * STRIDE);
      aimRays(pupilMapOf(setup, 0, fraction), sample.points, sample.count, starts);
      const paths = Array.from({ length: 12 }, (_, i) =>
        decimalPath(drawn, setup, fraction, starts.subarray(i * STRIDE, (i + 1) * STRIDE), starts),
      );
      const { value } = only(waves.tangential);
      for (let i = 0; i < 11; i++) {
        const wanted = paths[0]!
          .minus(paths[i + 1]!)
          .div(500e-6)
          .toNumber();
        expect(Math.abs(value[i]! - wanted)).toBeLessThan(WAVES);
      }
    }
  });
});

/** Path from the object (or the plane wave) to the reference sphere in forty digits, for a ray as it starts in the first vertex plane. */
function decimalPath(
  drawn: Drawn,
  setup: ExactSetup,
  fraction: number,
  start: Float64Array,
  chief: Float64Array,
): Decimal {
  const exact = (ray: Float64Array) => {
    const [x, y, z, l, m, n] = ray.subarray(X, X + 6);
    const hit = decimalRay(specOf(drawn), [x!, y!, z!], [l!, m!, n!]).at(-1);
    if (!hit) throw new Error('the ray is lost');
    return hit;
  };
  const last = exact(start);
  const principal = exact(chief);
  const plane = new D(given(setup.imagePlaneMm));
  const pupil = new D(given(exitPupil(setup.lines[0].train, setup.stopSurface)));
  const on = ({ point, direction }: typeof last, z: Decimal) =>
    point.map((v, i) => v.plus(direction[i]!.times(z.minus(point[2]).div(direction[2]))));
  const [centre, edge] = [on(principal, plane), on(principal, pupil)];
  const dot = (a: readonly Decimal[], b: readonly Decimal[]) =>
    a.map((v, i) => v.times(b[i]!)).reduce((p, q) => p.plus(q));
  const less = (a: readonly Decimal[], b: readonly Decimal[]) => a.map((v, i) => v.minus(b[i]!));
  const arm = less(last.point, centre);
  const squared = dot(less(edge, centre), less(edge, centre));
  const b = dot(last.direction, arm);
  const root = b.times(b).minus(dot(arm, arm).minus(squared)).sqrt();
  // The sphere is met on the pupil's side of the image point, which the light runs away from.
  const toSphere = b.neg().minus(root);
  const { object } = setup;
  const before =
    object.kind === 'finite'
      ? dot(
          [new D(start[X]!), new D(start[X + 1]!).minus(fraction * object.heightMm), new D(object.zMm)],
          [new D(start[X]!), new D(start[X + 1]!).minus(fraction * object.heightMm), new D(object.zMm)],
        ).sqrt()
      : new D(start[X + 1]!).times(start[L + 1]!);
  return before.plus(last.path).plus(toSphere);
}

describe('fans that do not exist', () => {
  const thin = (powers: readonly number[], gapMm: number, more: Partial<Drawn> = {}): Drawn => ({
    surfaces: powers.map((thinPowerPerMm) => ({ thinPowerPerMm, indexAfter: 1, gapMm })),
    aperture: { kind: 'entrancePupilDiameter', diameterMm: 10 },
    ...more,
  });

  it('are those of an afocal layout', () => {
    const field = traced(setupOf(thin([1 / 100, 1 / 50], 150)));
    expect(rayFans(field)).toEqual({ ok: false, why: 'image at infinity' });
    expect(wavefrontFans(field)).toEqual({ ok: false, why: 'image at infinity' });
  });

  it('are those without a chief ray', () => {
    const ball: Drawn = {
      surfaces: [
        { curvaturePerMm: 1 / 10, indexAfter: 1.5, gapMm: 40 },
        { curvaturePerMm: -1 / 10, indexAfter: 1, gapMm: 0 },
      ],
      stopSurface: 0,
      aperture: { kind: 'entrancePupilDiameter', diameterMm: 2 },
      field: { kind: 'angle', angleDeg: 60 },
    };
    const field = traced(setupOf(ball));
    expect(field.bundles[0]!.lost).toMatchObject({ why: 'missed', surface: 1 });
    expect(rayFans(field)).toEqual({ ok: false, why: 'ray lost' });
    expect(wavefrontFans(field)).toEqual({ ok: false, why: 'ray lost' });
  });

  it('have no sphere when the exit pupil stands on the image plane', () => {
    const field = traced(setupOf(thin([1 / 100], 0, { imageDistanceMm: 0 })));
    expect(wavefrontFans(field)).toEqual({ ok: false, why: 'pupil at the image' });
    expect(wavefrontFans(field, 5).ok).toBe(true);
  });

  it('are measured against the chief ray though a rim cuts it', () => {
    const setup = setupOf({
      surfaces: [
        { indexAfter: 1, gapMm: 50 },
        { indexAfter: 1, gapMm: 0, semiDiameterMm: 25 },
        { thinPowerPerMm: 1 / 100, indexAfter: 1, gapMm: 0 },
      ],
      aperture: { kind: 'stopDiameter', diameterMm: 4 },
      field: { kind: 'angle', angleDeg: 27 },
    });
    // The chief ray passes the rim 0.48 mm outside: of the rays 0.2 mm apart eight of the lower ten get by.
    const field = traceFields(setup, [1], sampleOf(21, null))[0]!;
    const { at, value, lost } = only(given(rayFans(field)).tangential);
    expect(field.bundles[0]!.lost).toBe(null);
    expect([at.length, lost]).toEqual([8, 13]);
    expect(largest([{ line: 0, at, value, lost }])).toBeLessThan(100 * PLACE_MM);
    // Behind thin parts the wavefront is followed ray by ray from the chief ray, whose neighbours are gone here.
    expect(only(given(wavefrontFans(field)).tangential).lost).toBe(21);
  });

  it('lose the rays that a rim cuts, and count them', () => {
    const drawn = thin([1 / 100], 0);
    const [surface] = drawn.surfaces;
    const setup = setupOf({ ...drawn, surfaces: [{ ...surface!, semiDiameterMm: 3.1 }] });
    const cut = traceFields(setup, [0], sampleOf(21, null))[0]!;
    const { tangential, sagittal } = given(rayFans(cut));
    // Half a stop of 5 mm in steps of 0.5 mm: six to each side of the chief ray lie within 3.1 mm.
    for (const curve of [only(tangential), only(sagittal)]) {
      expect(curve.lost).toBe(8);
      expect([...curve.at].map((at) => Number(at.toFixed(9)))).toEqual(
        Array.from({ length: 13 }, (_, i) => (i - 6) / 10 + 0),
      );
    }
    expect(only(given(wavefrontFans(cut)).tangential).lost).toBe(8);
    const open = traceFields(setup, [0], sampleOf(21, null, { clip: false }))[0]!;
    expect(only(given(rayFans(open)).tangential).lost).toBe(0);
  });
});
