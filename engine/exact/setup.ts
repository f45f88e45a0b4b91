import { none, some } from '../outcome.ts';
import type { Quantity } from '../paraxial/absence.ts';
import type { ReferenceRays } from '../paraxial/rays.ts';
import type { ExactLine, ObjectEdge, SetupOutcome } from './types.ts';

/**
 * What the exact analyses of one setting share. `lines` has the main line first; `rays` are that line's reference rays and
 * `imagePlaneMm` its image plane in use, from the last vertex. Absent for the reason that the reference rays are; 'stop at an image' when the
 * bundle has no width at the stop.
 */
export function exactSetup(
  lines: readonly [ExactLine, ...ExactLine[]],
  rays: ReferenceRays,
  imagePlaneMm: Quantity,
): SetupOutcome {
  const { stop, marginal, chief } = rays;
  if (!stop.ok) return stop;
  if (!marginal.ok) return marginal;
  if (!chief.ok) return chief;
  const { surface } = stop.value;
  const stopRadiusMm = Math.abs(marginal.value.y[surface]!);
  if (stopRadiusMm === 0 || !Number.isFinite(1 / stopRadiusMm)) return none('stop at an image');
  const { train } = lines[0];
  const n = train.index[0]!;
  const slope = chief.value.nu[0]! / n;
  const object: ObjectEdge =
    train.objectZ === null
      ? { kind: 'infinite', slope: slope }
      : {
          kind: 'finite',
          zMm: train.objectZ,
          heightMm: chief.value.y[0]! + train.objectZ * slope,
        };
  return some({
    lines,
    stopSurface: surface,
    stopRadiusMm,
    imagePlaneMm,
    marginal: marginal.value,
    chief: chief.value,
    object,
  });
}
