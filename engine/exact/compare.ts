import { none, type Outcome, some } from '../outcome.ts';
import { type Absence, derive, derive2, finite, type Quantity } from '../paraxial/absence.ts';
import { axialOf } from '../paraxial/axial.ts';
import { firstOrder } from '../paraxial/firstOrder.ts';
import type { ParaxialRay } from '../paraxial/trace.ts';
import { crossing, paraxialOn, yOn } from './imagePlane.ts';
import { aimRays, pupilMapOf } from './pupilMap.ts';
import { CODE, M, N, STRIDE, X, Y } from './rayBuffer.ts';
import { traceThrough } from './through.ts';
import type { ExactSetup } from './types.ts';

/** One quantity twice, and exact less paraxial. */
export interface Compared {
  readonly paraxial: Quantity;
  readonly exact: Quantity;
  readonly difference: Quantity;
}

/** The first order beside exact rays, main line. Lengths in mm, image side from the last vertex. */
export interface Comparison {
  /** Exact: h/(n′ sin U′) of the ray parallel to the axis at the height h where the marginal ray meets the first vertex plane. */
  readonly focalLengthMm: Compared;
  /** Exact: where that parallel ray crosses the axis. */
  readonly backFocusMm: Compared;
  /** Chief ray height on the image plane over object height. */
  readonly magnification: Compared;
  /** Where the marginal ray crosses the axis; the difference is the longitudinal error. */
  readonly imageDistanceMm: Compared;
  /** Heights on the image plane. */
  readonly marginalHeightMm: Compared;
  readonly chiefHeightMm: Compared;
  /** Chief ray height over the paraxial one, less 1; paraxial 0. */
  readonly distortion: Compared;
  /** 1/(2 n′ u′), exact 1/(2 n′ sin U′). */
  readonly workingFNumber: Compared;
}

/**
 * What exact marginal and chief rays say in place of the first order. Sines stand where the sine condition has them, so an ideal thin part, which keeps
 * tangents, differs in focal length and f-number. An exact ray that is lost makes its quantities absent:
 * 'ray lost'.
 */
export function compare(setup: ExactSetup): Comparison {
  const { train } = setup.lines[0];
  const { count } = train;
  const first = firstOrder(train);
  const axial = axialOf(train);
  const { imagePlaneMm: plane, object } = setup;
  const nRear = Math.abs(train.index[count]!);
  const axis = aimed(setup, 0, Math.sign(setup.marginal.y[setup.stopSurface]!));
  const marginal = traced(setup, axis);
  const chief = traced(setup, aimed(setup, 1, 0));
  const parallel = parallelAt(setup, axis);
  const sine = (ray: Ray): Quantity => (ray.ok ? finite(ray.value[M]!) : ray);
  const cross = (ray: Ray): Quantity => (ray.ok ? finite(crossing(ray.value, 0)) : ray);
  const height = (ray: Ray): Quantity => (ray.ok ? derive(plane, (mm) => yOn(ray.value, 0, mm)) : ray);
  const paraxialHeight = (ray: ParaxialRay): Quantity => derive(plane, (mm) => paraxialOn(setup, ray, mm));
  const objectHeight: Quantity =
    object.kind === 'infinite' ? none('object at infinity') : finite(object.heightMm);
  const [chiefExact, chiefParaxial] = [height(chief), paraxialHeight(setup.chief)];
  const expected: Quantity =
    chiefParaxial.ok && chiefParaxial.value === 0 ? none('no image height') : chiefParaxial;
  const over = (a: Quantity, b: Quantity) => derive2(b, a, (below, above) => above / below);
  return {
    focalLengthMm: compared(
      first.focalLengthMm,
      when(
        first.focalLengthMm,
        derive2(heightAtStart(axis), sine(parallel), (h, m) => -h / (nRear * m)),
      ),
    ),
    backFocusMm: compared(first.backFocusMm, when(first.backFocusMm, cross(parallel))),
    magnification: compared(over(chiefParaxial, objectHeight), over(chiefExact, objectHeight)),
    imageDistanceMm: compared(axial.imageDistanceMm, when(axial.imageDistanceMm, cross(marginal))),
    marginalHeightMm: compared(paraxialHeight(setup.marginal), height(marginal)),
    chiefHeightMm: compared(chiefParaxial, chiefExact),
    distortion: compared(
      derive(expected, () => 0),
      derive2(expected, chiefExact, (p, e) => e / p - 1),
    ),
    workingFNumber: compared(
      derive(axial.imageDistanceMm, () => 1 / (2 * Math.abs(setup.marginal.nu[count]!))),
      when(
        axial.imageDistanceMm,
        derive(sine(marginal), (m) => 1 / (2 * nRear * Math.abs(m))),
      ),
    ),
  };
}

type Ray = Outcome<Float64Array, Absence>;

const compared = (paraxial: Quantity, exact: Quantity): Compared => ({
  paraxial,
  exact,
  difference: derive2(paraxial, exact, (p, e) => e - p),
});

/** `value` where `condition` exists, else the reason why that does not. */
const when = (condition: Quantity, value: Quantity): Quantity => (condition.ok ? value : condition);

/** The main line's ray of a field to the height `pupil` in the stop, in the first vertex plane. */
function aimed(setup: ExactSetup, fraction: number, pupil: number): Ray {
  const ray = new Float64Array(STRIDE);
  aimRays(pupilMapOf(setup, 0, fraction), [0, pupil], 1, ray);
  return ray[CODE] === 0 ? some(ray) : none('ray lost');
}

/** The ray behind the last surface. */
function traced({ lines }: ExactSetup, start: Ray): Ray {
  if (!start.ok) return start;
  const ray = start.value.slice();
  traceThrough(lines[0].train, ray, 1);
  return ray[CODE] === 0 ? some(ray) : none('ray lost');
}

/** The traced ray that meets the first vertex plane where `start` does, but parallel to the axis. */
function parallelAt(setup: ExactSetup, start: Ray): Ray {
  if (!start.ok) return start;
  const ray = new Float64Array(STRIDE);
  ray[X] = start.value[X]!;
  ray[Y] = start.value[Y]!;
  ray[N] = 1;
  return traced(setup, some(ray));
}

const heightAtStart = (ray: Ray): Quantity => (ray.ok ? finite(ray.value[Y]!) : ray);
