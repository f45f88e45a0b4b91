import { none, type Outcome, some } from '../outcome.ts';
import type { Absence, Quantity } from '../paraxial/absence.ts';
import { axialOf } from '../paraxial/axial.ts';
import type { Train } from '../train/types.ts';
import { type FieldRays, TANGENTIAL } from './bundles.ts';
import { type Curve, curveOf } from './curve.ts';
import { crossing } from './imagePlane.ts';
import { aimRays, pupilMapOf } from './pupilMap.ts';
import { STRIDE } from './rayBuffer.ts';
import { traceThrough } from './through.ts';
import type { ExactSetup } from './types.ts';

/**
 * Where the rays of the axial bundle cross the axis, in mm from the image plane, over the share of the stop's radius from 0 to 1, a curve for each line.
 * At 0 stands the paraxial image of the line. `axis` is the field at share 0 with a fan. 'image at infinity', 'ray lost' when no line has a chief ray.
 */
export function longitudinal(axis: FieldRays): Outcome<readonly Curve[], Absence> {
  const { setup, sample, bundles } = axis;
  if (!setup.imagePlaneMm.ok) return setup.imagePlaneMm;
  const plane = setup.imagePlaneMm.value;
  const half = (sample.fanRays - 1) / 2;
  const curves: Curve[] = [];
  for (const [line, { lost, rays }] of bundles.entries()) {
    if (lost || sample.fanRays === 0) continue;
    const value = new Float64Array(half + 1);
    for (let i = 0; i <= half; i++) {
      value[i] = i === 0 ? 0 : crossing(rays, (TANGENTIAL + half + i) * STRIDE) - plane;
    }
    const paraxial = axialOf((setup.lines[line] ?? setup.lines[0]).train).imageDistanceMm;
    value[0] = paraxial.ok ? paraxial.value - plane : Number.NaN;
    curves.push(
      curveOf(
        line,
        Float64Array.from({ length: half + 1 }, (_, i) => i / half),
        value,
      ),
    );
  }
  return curves.length === 0 ? none('ray lost') : some(curves);
}

/** The train at one wavelength. */
export interface TrainAt {
  readonly wavelengthNm: number;
  readonly train: Train;
}

/** The focus at one wavelength, in mm from the image plane. */
export interface FocusAt {
  readonly wavelengthNm: number;
  readonly paraxialMm: Quantity;
  /** Where the ray through the share of the stop's radius asked for crosses the axis; 'ray lost'. */
  readonly exactMm: Quantity;
}

/** Axial colour: the focus over wavelength, of the paraxial ray and of the exact ray through `share` of the stop's radius. 'image at infinity'. */
export function axialColour(
  setup: ExactSetup,
  trains: readonly TrainAt[],
  share: number,
): Outcome<readonly FocusAt[], Absence> {
  if (!setup.imagePlaneMm.ok) return setup.imagePlaneMm;
  const plane = setup.imagePlaneMm.value;
  const ray = new Float64Array(STRIDE);
  return some(
    trains.map(({ wavelengthNm, train }) => {
      const paraxial = axialOf(train).imageDistanceMm;
      const map = pupilMapOf({ ...setup, lines: [{ ...setup.lines[0], wavelengthNm, train }] }, 0, 0);
      aimRays(map, [0, share], 1, ray);
      traceThrough(train, ray, 1);
      const exact = crossing(ray, 0) - plane;
      return {
        wavelengthNm,
        paraxialMm: paraxial.ok ? some(paraxial.value - plane) : paraxial,
        exactMm: Number.isFinite(exact) ? some(exact) : none('ray lost'),
      };
    }),
  );
}
