import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { sampleOf, traceFields } from '../../../engine/exact/bundles.ts';
import { chiefSweep, fieldShares } from '../../../engine/exact/chiefSweep.ts';
import type { Curve } from '../../../engine/exact/curve.ts';
import { distortion, fieldCurves, lateralColour } from '../../../engine/exact/fieldCurves.ts';
import { illumination } from '../../../engine/exact/illumination.ts';
import { axialColour, longitudinal } from '../../../engine/exact/longitudinal.ts';
import type { ExactSetup } from '../../../engine/exact/types.ts';
import { axialOf } from '../../../engine/paraxial/axial.ts';
import { petzval } from '../../../engine/paraxial/colour.ts';
import { given } from '../quantity.ts';
import { between } from './anyRay.ts';
import { type Drawn, setupOf, setupOutcome } from './setupOf.ts';

/** Of lengths of some hundred mm through a few surfaces. */
const PLACE_MM = 1e-11;

const thinLens = (more: Partial<Drawn> = {}): Drawn => ({
  surfaces: [{ thinPowerPerMm: 1 / 100, indexAfter: 1, gapMm: 0 }],
  aperture: { kind: 'entrancePupilDiameter', diameterMm: 10 },
  field: { kind: 'angle', angleDeg: 40 },
  ...more,
});
/** A meniscus with its stop behind, made up, in three lines. */
const LANDSCAPE: Drawn = {
  surfaces: [
    { curvaturePerMm: -1 / 60, indexAfter: 1.5168, gapMm: 3 },
    { curvaturePerMm: -1 / 28, indexAfter: 1, gapMm: 8 },
    { indexAfter: 1, gapMm: 0 },
  ],
  stopSurface: 2,
  aperture: { kind: 'stopDiameter', diameterMm: 6 },
  field: { kind: 'angle', angleDeg: 20 },
  more: [
    { wavelengthNm: 480, indices: [1.5228, 1, 1] },
    { wavelengthNm: 640, indices: [1.5143, 1, 1] },
  ],
};
const sweepOf = (setup: ExactSetup, line = 0, count = 11) => chiefSweep(setup, line, fieldShares(count));
const rows = ({ at, value }: Curve) => [...at].map((share, i) => [share, value[i]!] as const);

describe('field curves', () => {
  it('are flat for an ideal thin lens, tangential and sagittal', () => {
    const curves = given(fieldCurves(sweepOf(setupOf(thinLens({ objectZ: -300 })))));
    for (const curve of [curves.tangential, curves.sagittal]) {
      expect(curve).toMatchObject({ line: 0, lost: 0 });
      for (const [, z] of rows(curve)) expect(Math.abs(z)).toBeLessThan(PLACE_MM * 100);
    }
  });

  it('of a spherical mirror with its stop at the centre are one sphere of half the radius', () => {
    // Every chief ray meets it at right angles: t′ = s′ = R/2, so the image lies on the sphere about the centre.
    const setup = setupOf({
      surfaces: [
        { indexAfter: 1, gapMm: 200 },
        { curvaturePerMm: -1 / 200, indexAfter: -1, gapMm: 0 },
      ],
      aperture: { kind: 'stopDiameter', diameterMm: 10 },
      field: { kind: 'angle', angleDeg: 30 },
    });
    const sweep = sweepOf(setup);
    const { tangential, sagittal } = given(fieldCurves(sweep));
    for (const [i, [share, z]] of rows(tangential).entries()) {
      const angle = Math.atan(share * Math.tan(Math.PI / 6));
      expect(Math.abs(z - 100 * (Math.cos(angle) - 1))).toBeLessThan(PLACE_MM * 100);
      expect(Math.abs(sagittal.value[i]! - z)).toBeLessThan(PLACE_MM * 100);
    }
  });

  it('start as Petzval curvature and astigmatism say: three parts of S_III to the tangential, one to the sagittal', () => {
    const setup = setupOf({ ...LANDSCAPE, field: { kind: 'angle', angleDeg: 2 } });
    const { tangential, sagittal } = given(fieldCurves(sweepOf(setup)));
    const sum = given(petzval(setup.lines[0].train, new Float64Array(3).fill(1.5)).sumPerMm);
    const height =
      given(setup.imagePlaneMm) && setup.chief.y[2]! + given(setup.imagePlaneMm) * setup.chief.nu[3]!;
    const [t, s] = [tangential.value[10]!, sagittal.value[10]!];
    // To the third order the Petzval surface lies as far from the sagittal focus as half the tangential one does from it.
    const petzvalSag = s - (t - s) / 2;
    expect(Math.abs(petzvalSag / ((-sum * height * height) / 2) - 1)).toBeLessThan(0.02);
  });

  it('do not exist without an image', () => {
    const afocal = setupOf({
      surfaces: [
        { thinPowerPerMm: 1 / 100, indexAfter: 1, gapMm: 150 },
        { thinPowerPerMm: 1 / 50, indexAfter: 1, gapMm: 0 },
      ],
      aperture: { kind: 'entrancePupilDiameter', diameterMm: 10 },
    });
    const sweep = sweepOf(afocal);
    const absent = { ok: false, why: 'image at infinity' };
    expect(fieldCurves(sweep)).toEqual(absent);
    expect(distortion(sweep, 'paraxial')).toEqual(absent);
    expect(lateralColour(sweep, [])).toEqual(absent);
    expect(illumination(afocal, fieldShares(3))).toEqual(absent);
    expect(longitudinal(traceFields(afocal, [0], sampleOf(5, null))[0]!)).toEqual(absent);
    expect(axialColour(afocal, [], 1)).toEqual(absent);
  });
});

describe('distortion', () => {
  it('of an ideal thin lens is nought against f·tan θ, and tan θ/θ − 1 against f·θ', () => {
    const sweep = sweepOf(setupOf(thinLens()));
    for (const [, share] of rows(given(distortion(sweep, 'paraxial')))) {
      expect(Math.abs(share)).toBeLessThan(1e-14);
    }
    for (const [at, share] of rows(given(distortion(sweep, 'fTheta')))) {
      const angle = Math.atan(at * Math.tan((40 * Math.PI) / 180));
      expect(share).toBeCloseTo(at === 0 ? 0 : Math.tan(angle) / angle - 1, 12);
    }
  });

  it('grows with the square of a small field', () => {
    const setup = setupOf({ ...LANDSCAPE, field: { kind: 'angle', angleDeg: 1 } });
    const { value } = given(distortion(sweepOf(setup), 'paraxial'));
    expect(value[0]).toBe(0);
    // The next power of the field is some thousandth of this one.
    expect(value[10]! / value[5]!).toBeCloseTo(4, 2);
  });

  it('is not measured against f·θ from a near object, nor where the paraxial height is nought', () => {
    expect(distortion(sweepOf(setupOf(thinLens({ objectZ: -300 }))), 'fTheta')).toEqual({
      ok: false,
      why: 'object not at infinity',
    });
    const atLens = setupOf(thinLens({ imageDistanceMm: 0 }));
    expect(distortion(sweepOf(atLens), 'paraxial')).toEqual({ ok: false, why: 'no image height' });
  });

  it('leaves out the fields whose chief ray is lost, and counts them', () => {
    const setup = setupOf({
      surfaces: [
        { curvaturePerMm: 1 / 10, indexAfter: 1.5, gapMm: 40 },
        { curvaturePerMm: -1 / 10, indexAfter: 1, gapMm: 0 },
      ],
      aperture: { kind: 'entrancePupilDiameter', diameterMm: 2 },
      field: { kind: 'angle', angleDeg: 60 },
    });
    const curve = given(distortion(sweepOf(setup), 'paraxial'));
    expect(curve.lost).toBeGreaterThan(0);
    expect(curve.at.length + curve.lost).toBe(11);
    expect([...curve.value].every(Number.isFinite)).toBe(true);
  });
});

describe('colour and longitudinal error', () => {
  it('of a single lens: blue is nearer, its image smaller or larger, and the curve of each line starts at its paraxial image', () => {
    const setup = setupOf(LANDSCAPE);
    const plane = given(setup.imagePlaneMm);
    const curves = given(longitudinal(traceFields(setup, [0], sampleOf(21, null, { fine: true }))[0]!));
    expect(curves.map(({ line, at }) => [line, at.length])).toEqual([
      [0, 11],
      [1, 11],
      [2, 11],
    ]);
    for (const [i, { at, value }] of curves.entries()) {
      const image = given(axialOf(setup.lines[i]!.train).imageDistanceMm);
      expect(value[0]).toBeCloseTo(image - plane, 12);
      // Spherical aberration of a positive lens runs towards it as the square of the height.
      expect(value[10]).toBeLessThan(value[0]!);
      expect((value[2]! - value[0]!) / (value[1]! - value[0]!)).toBeCloseTo(4, 1);
      expect(at[10]).toBe(1);
    }
    expect(curves[1]!.value[0]).toBeLessThan(0);
    expect(curves[2]!.value[0]).toBeGreaterThan(0);
  });

  it('over wavelength: the paraxial focus of each train, and that of the ray through the zone', () => {
    const setup = setupOf(LANDSCAPE);
    const points = given(axialColour(setup, setup.lines, 0.7));
    const plane = given(setup.imagePlaneMm);
    const curves = given(longitudinal(traceFields(setup, [0], sampleOf(21, null, { fine: true }))[0]!));
    expect(points.map(({ wavelengthNm }) => wavelengthNm)).toEqual([500, 480, 640]);
    for (const [i, { paraxialMm, exactMm }] of points.entries()) {
      expect(given(paraxialMm)).toBe(given(axialOf(setup.lines[i]!.train).imageDistanceMm) - plane);
      expect(given(exactMm)).toBeCloseTo(curves[i]!.value[7]!, 10);
    }
  });

  it('lateral colour is nought on the axis and for one line by itself, and the difference of the chief rays elsewhere', () => {
    const setup = setupOf(LANDSCAPE);
    const [main, ...others] = [0, 1, 2].map((line) => sweepOf(setup, line));
    const curves = given(lateralColour(main!, [main!, ...others]));
    expect(curves.map(({ line }) => line)).toEqual([0, 1, 2]);
    expect([...curves[0]!.value]).toEqual(new Array(11).fill(0));
    expect(curves[1]!.value[0]).toBe(0);
    expect(curves[1]!.value[10]! * curves[2]!.value[10]!).toBeLessThan(0);
  });
});

describe('relative illumination', () => {
  it('of an ideal thin lens falls by the fourth power of the cosine', () => {
    const curve = given(illumination(setupOf(thinLens()), fieldShares(9)));
    for (const [share, value] of rows(curve)) {
      const angle = Math.atan(share * Math.tan((40 * Math.PI) / 180));
      // The law is that of a small pupil; this one is f/10.
      expect(value / Math.cos(angle) ** 4).toBeCloseTo(1, 2);
    }
  });

  it('is even where the image side is telecentric and the lens obeys the sine condition', () => {
    // A ball lens with its stop at the centre sees every field alike, but for the obliquity of the plane.
    const setup = setupOf({
      surfaces: [
        { curvaturePerMm: 1 / 20, indexAfter: 1.6, gapMm: 20 },
        { indexAfter: 1.6, gapMm: 20 },
        { curvaturePerMm: -1 / 20, indexAfter: 1, gapMm: 0 },
      ],
      stopSurface: 1,
      aperture: { kind: 'stopDiameter', diameterMm: 2 },
      field: { kind: 'angle', angleDeg: 30 },
    });
    const curve = given(illumination(setup, fieldShares(5), { fine: true }));
    // The stop is seen foreshortened, cos θ, and lights the plane obliquely, cos θ.
    for (const [share, value] of rows(curve)) {
      const angle = Math.atan(share * Math.tan(Math.PI / 6));
      expect(value).toBeCloseTo(Math.cos(angle) ** 2, 2);
    }
  });

  it('counts vignetting: half the light is gone where a rim cuts through the middle of the bundle, none is left beyond', () => {
    const setup = setupOf({
      surfaces: [
        { indexAfter: 1, gapMm: 50 },
        { indexAfter: 1, gapMm: 0, semiDiameterMm: 25 },
        { thinPowerPerMm: 1 / 1000, indexAfter: 1, gapMm: 0 },
      ],
      aperture: { kind: 'stopDiameter', diameterMm: 0.1 },
      field: { kind: 'angle', angleDeg: 45 },
    });
    const at = Float64Array.of(0.25, 0.5, 0.75);
    const clipped = given(illumination(setup, at, { fine: true }));
    const open = given(illumination(setup, at, { fine: true, clip: false }));
    const left = [...clipped.value].map((value, i) => value / open.value[i]!);
    expect(left[0]).toBeCloseTo(1, 12);
    // The rim is 500 times larger than the bundle, so its edge is nearly straight; it cuts a corner off the polygon of 192 sides.
    expect(Math.abs(left[1]! - 0.5)).toBeLessThan(1 / 96);
    expect(left[2]).toBe(0);
  });

  it('of one field is that field alone', () => {
    expect(given(illumination(setupOf(thinLens()), Float64Array.of(0)))).toMatchObject({ lost: 0 });
    expect([...given(illumination(setupOf(thinLens()), Float64Array.of(0))).value]).toEqual([1]);
  });
});

describe('any curve over the field', () => {
  const anyLens = fc
    .tuple(between(-0.02, 0.02), between(-0.02, 0.02), between(1.4, 1.9), between(-6, 6), between(2, 25))
    .map(
      ([c1, c2, index, stop, angleDeg]): Drawn => ({
        surfaces: [
          { curvaturePerMm: c1, indexAfter: index, gapMm: 4 },
          { curvaturePerMm: c2, indexAfter: 1, gapMm: Math.abs(stop) },
          { indexAfter: 1, gapMm: 0 },
        ],
        stopSurface: stop < 0 ? 0 : 2,
        aperture: { kind: 'stopDiameter', diameterMm: 4 },
        field: { kind: 'angle', angleDeg },
      }),
    );
  const scaled = (drawn: Drawn, factor: number): Drawn => ({
    ...drawn,
    surfaces: drawn.surfaces.map((surface) => ({
      ...surface,
      curvaturePerMm: (surface.curvaturePerMm ?? 0) / factor,
      gapMm: surface.gapMm * factor,
    })),
    aperture: { kind: 'stopDiameter', diameterMm: 4 * factor },
  });

  it('scales with the layout, or keeps still where it is a share', () => {
    fc.assert(
      fc.property(anyLens, between(0.2, 5), (drawn, factor) => {
        const [small, large] = [setupOutcome(drawn), setupOutcome(scaled(drawn, factor))];
        fc.pre(small.ok && large.ok && small.value.imagePlaneMm.ok);
        const [one, other] = [given(small), given(large)];
        fc.pre(Math.abs(given(one.imagePlaneMm)) < 500);
        const [sweep, sweepLarge] = [sweepOf(one, 0, 5), sweepOf(other, 0, 5)];
        const pairs: [Curve, Curve, number][] = [
          [given(distortion(sweep, 'paraxial')), given(distortion(sweepLarge, 'paraxial')), 1],
          [given(fieldCurves(sweep)).tangential, given(fieldCurves(sweepLarge)).tangential, factor],
          [given(fieldCurves(sweep)).sagittal, given(fieldCurves(sweepLarge)).sagittal, factor],
          [given(illumination(one, fieldShares(3))), given(illumination(other, fieldShares(3))), 1],
        ];
        for (const [a, b, by] of pairs) {
          expect(b.at.length).toBe(a.at.length);
          for (let i = 0; i < a.at.length; i++) {
            // Aiming stops at 1e-11 of the stop; far foci magnify it.
            const size = 1 + Math.abs(a.value[i]!) * (1 + Math.abs(a.value[i]!));
            expect(Math.abs(b.value[i]! / by - a.value[i]!)).toBeLessThan(1e-8 * size);
          }
        }
      }),
      { numRuns: 60 },
    );
  });
});
