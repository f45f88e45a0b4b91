import { coddington } from '../../engine/exact/coddington.ts';
import { traceRay } from '../../engine/exact/ray.ts';
import type { Quantity } from '../../engine/paraxial/absence.ts';
import { buildTrain } from '../../engine/train/build.ts';
import { isRecord, numberIn } from './json.ts';
import type { Reader } from './measure.ts';

/** Double-precision rounding of a short closed form, relative. */
const ROUNDING = 1e-13;

/** `tangential[i]` and `sagittal[i]`: the foci of a parallel pencil that meets one surface at i degrees of incidence. Null when it is no such case. */
export function readCoddington(input: Record<string, unknown>): Reader | null {
  const { surface, incidenceDeg } = input;
  const radius = isRecord(surface) ? numberIn(surface, 'radius') : null;
  if (!isRecord(surface) || radius === null || !Array.isArray(incidenceDeg)) return null;
  const mirror = surface.mirror === true;
  const train = buildTrain({
    objectIndex: 1,
    surfaces: [
      {
        part: 0,
        curvaturePerMm: 1 / radius,
        indexAfter: mirror ? -1 : (numberIn(surface, 'index') ?? 1),
        gapMm: 0,
      },
    ],
    objectZ: null,
    imageDistanceMm: null,
  });
  return (quantity) => {
    const [, which, angle] = /^(tangential|sagittal)\[([\d.]+)\]$/.exec(quantity) ?? [];
    if (which === undefined || !incidenceDeg.includes(Number(angle))) return null;
    const height = Math.abs(radius) * Math.sin((Number(angle) * Math.PI) / 180);
    const foci = coddington(train, traceRay(train, [0, height, -2 * Math.abs(radius)], [0, 0, 1]), null);
    const value: Quantity = which === 'tangential' ? foci.tangential : foci.sagittal;
    // The cosine of the incidence is the root of a difference, 1 − sin², and carries its rounding.
    const lost = 1 / Math.cos((Number(angle) * Math.PI) / 180) ** 2;
    return { value, floor: value.ok ? ROUNDING * lost * Math.abs(value.value) : 0 };
  };
}
