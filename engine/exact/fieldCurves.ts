import { mapOutcome, none, type Outcome, some } from '../outcome.ts';
import type { Absence } from '../paraxial/absence.ts';
import { type ChiefSweep, sweepHeight } from './chiefSweep.ts';
import { focusDepths } from './coddington.ts';
import { type Curve, curveOf } from './curve.ts';
import { paraxialOn } from './imagePlane.ts';

/** Where narrow pencils about the exact chief rays focus, in mm from the image plane, over the share of the field. */
export interface FieldCurves {
  readonly tangential: Curve;
  readonly sagittal: Curve;
}

/** The field curves of the sweep's line, by Coddington's equations along each chief ray; 'image at infinity'. */
export const fieldCurves = (sweep: ChiefSweep): Outcome<FieldCurves, Absence> =>
  mapOutcome(sweep.setup.imagePlaneMm, (plane) => {
    const { setup, line, fractions, starts } = sweep;
    const { train } = setup.lines[line] ?? setup.lines[0];
    const depths = focusDepths(train, starts, fractions.length, train.objectZ);
    const curve = (depth: Float64Array) =>
      curveOf(
        line,
        fractions.slice(),
        depth.map((z) => z - plane),
      );
    return { tangential: curve(depths.tangential), sagittal: curve(depths.sagittal) };
  });

/** What the height of the exact chief ray is measured against: the paraxial height, f·tan θ from infinity, or f·θ in its place. */
export type DistortionAgainst = 'paraxial' | 'fTheta';

/**
 * Distortion over the share of the field: exact chief ray height over the expected one, less 1 (a share; positive is pincushion). On the
 * axis it is the limit 0. 'image at infinity'; 'object not at infinity' for f·θ; 'no image height' when the paraxial chief ray has none on this plane.
 */
export function distortion(sweep: ChiefSweep, against: DistortionAgainst): Outcome<Curve, Absence> {
  const { setup, line, fractions } = sweep;
  const { imagePlaneMm, object } = setup;
  if (!imagePlaneMm.ok) return imagePlaneMm;
  if (against === 'fTheta' && object.kind === 'finite') return none('object not at infinity');
  const edge = paraxialOn(setup, setup.chief, imagePlaneMm.value);
  if (edge === 0) return none('no image height');
  const values = fractions.map((fraction, i) => {
    if (fraction === 0) return 0;
    const slope = object.kind === 'infinite' ? fraction * object.slope : 0;
    const share = against === 'fTheta' && slope !== 0 ? Math.atan(slope) / slope : 1;
    return sweepHeight(sweep, i, imagePlaneMm.value) / (fraction * edge * share) - 1;
  });
  return some(curveOf(line, fractions.slice(), values));
}

/**
 * Lateral colour over the share of the field: for each sweep but the first (the main line) the height of its chief ray on the image plane less that
 * of the main line's, in mm. The sweeps must run over the same shares. 'image at infinity'.
 */
export const lateralColour = (main: ChiefSweep, others: readonly ChiefSweep[]): Outcome<Curve[], Absence> =>
  mapOutcome(main.setup.imagePlaneMm, (plane) =>
    others.map((sweep) =>
      curveOf(
        sweep.line,
        main.fractions.slice(),
        main.fractions.map((_, i) => sweepHeight(sweep, i, plane) - sweepHeight(main, i, plane)),
      ),
    ),
  );
