import { some } from '../../engine/outcome.ts';
import { type ReferenceRays, referenceRays } from '../../engine/paraxial/rays.ts';
import { scaledRay } from '../../engine/paraxial/trace.ts';
import type { FieldSize } from '../../engine/sketch/types.ts';
import type { ApertureAt } from '../../engine/train/places.ts';
import { isRecord, numberIn } from './json.ts';
import type { Laid } from './prescription.ts';

/** Marginal and chief ray of a prescription's aperture and field, the chief ray on the side that the file says; null without them. */
export function signedRays({ train }: Laid, prescription: Record<string, unknown>): ReferenceRays | null {
  const aperture = apertureOf(prescription.aperture);
  const field = fieldOf(prescription.field);
  if (aperture === null || field === null) return null;
  const rays = referenceRays(train, aperture, field.size);
  if (!rays.chief.ok) return rays;
  const side = field.sideOf(rays.chief.value.nu[0] ?? 0);
  return { ...rays, chief: some(scaledRay(rays.chief.value, side)) };
}

/** The aperture as the engine takes it; null when none is written. */
export function apertureOf(aperture: unknown): ApertureAt | null {
  if (!isRecord(aperture)) return null;
  const entrancePupilDiameter = numberIn(aperture, 'entrancePupilDiameter');
  if (entrancePupilDiameter !== null)
    return { kind: 'entrancePupilDiameter', diameterMm: entrancePupilDiameter };
  const stopDiameter = numberIn(aperture, 'stopDiameter');
  if (stopDiameter !== null) return { kind: 'stopDiameter', diameterMm: stopDiameter };
  const fNumber = numberIn(aperture, 'fNumber');
  if (fNumber !== null) return { kind: 'infinityFNumber', fNumber };
  const na = numberIn(aperture, 'objectNA');
  return na === null ? null : { kind: 'objectNA', na };
}

/** The field as the engine takes it, by magnitude, and the sign that the file's own field has against the engine's. */
export function fieldOf(field: unknown): { size: FieldSize; sideOf: (chiefSlope: number) => number } | null {
  if (!isRecord(field)) return null;
  const angleDeg = numberIn(field, 'angleDeg');
  if (angleDeg !== null) {
    const sideOf = (slope: number) => (slope < 0 === angleDeg < 0 ? 1 : -1);
    return { size: { kind: 'angle', angleDeg: Math.abs(angleDeg) }, sideOf };
  }
  const height = numberIn(field, 'objectHeight');
  if (height === null) return null;
  return {
    size: { kind: 'objectHeight', heightMm: Math.abs(height) },
    sideOf: () => (height > 0 ? -1 : 1),
  };
}
