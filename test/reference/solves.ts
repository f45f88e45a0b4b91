import { thinElementSums } from '../../engine/aberration/thinElement.ts';
import { coddington } from '../../engine/exact/coddington.ts';
import { traceRay } from '../../engine/exact/ray.ts';
import type { Outcome } from '../../engine/outcome.ts';
import { finite, type Quantity } from '../../engine/paraxial/absence.ts';
import { bendingOf, leastSphericalShape, positionFactor, zeroComaShape } from '../../engine/solve/bending.ts';
import { thickLens } from '../../engine/solve/thickLens.ts';
import { type TwoElements, twoForBackFocus, twoForRelay } from '../../engine/solve/twoElements.ts';
import { isRecord, numberIn } from './json.ts';
import { type Measured, type Reader, readTrain } from './measure.ts';
import { layOut } from './prescription.ts';

/** Double-precision rounding of a short closed form, relative. */
const ROUNDING = 1e-13;

const measured = (value: number, scale = Math.abs(value)): Measured => ({
  value: finite(value),
  floor: ROUNDING * scale,
});

const readTable =
  (table: ReadonlyMap<string, Measured>): Reader =>
  (quantity) =>
    table.get(quantity) ?? null;

/** A case's own quantities, then those of the layout that was solved for. */
const after =
  (own: ReadonlyMap<string, Measured>, rest: Reader | null): Reader =>
  (quantity) =>
    own.get(quantity) ?? rest?.(quantity) ?? null;

/** Best shapes of a thin lens of one index, its radii and the sums of light of a given height and field when it has them. */
export function readBending(input: Record<string, unknown>): Reader | null {
  const index = numberIn(input, 'index');
  const given = numberIn(input, 'positionFactor');
  const focalLengthMm = numberIn(input, 'focalLength');
  if (index === null) return null;
  if (given !== null) return readTable(shapesAt(index, given));
  if (focalLengthMm === null || !('magnification' in input)) return null;
  const m = numberIn(input, 'magnification') ?? 0;
  const position = positionFactor(m, 1);
  if (!position.ok) return null;
  const table = shapesAt(index, position.value);
  table.set('positionFactor', measured(position.value, 1));
  const light = lightAt(input, focalLengthMm, m);
  for (const [name, shapeFactor] of [
    ['leastSpherical', leastSphericalShape(index, position.value)],
    ['zeroComa', zeroComaShape(index, position.value)],
  ] as const) {
    const thickness = { kind: 'centre', thicknessMm: 0 } as const;
    const lens = thickLens({ focalLengthMm, index, bending: bendingOf(shapeFactor), thickness });
    if (!lens.ok) continue;
    for (const [k, c] of lens.value.curvaturesPerMm.entries())
      table.set(`${name}.radius${k + 1}`, measured(1 / c));
    const sums =
      light &&
      thinElementSums(
        { powerPerMm: 1 / focalLengthMm, mediumIndex: 1, glassIndex: index, shapeFactor },
        light,
      );
    if (!sums) continue;
    table.set(`${name}.S1`, measured(sums.spherical));
    table.set(`${name}.S2`, measured(sums.coma, Math.abs(sums.coma) + sums.spherical));
  }
  return readTable(table);
}

function shapesAt(index: number, position: number): Map<string, Measured> {
  return new Map([
    ['shapeLeastSpherical', measured(leastSphericalShape(index, position), 1)],
    ['shapeZeroComa', measured(zeroComaShape(index, position), 1)],
  ]);
}

/** Both rays at the lens, the stop at it; the object stands at f(1/m − 1). */
function lightAt(input: Record<string, unknown>, focalLength: number, m: number) {
  const y = numberIn(input, 'marginalHeight');
  const field = isRecord(input.field) ? input.field : {};
  const angleDeg = numberIn(field, 'angleDeg');
  const objectHeight = numberIn(field, 'objectHeight');
  if (y === null) return null;
  if (m === 0)
    return angleDeg === null ? null : { y, nu: 0, yChief: 0, nuChief: Math.tan((angleDeg * Math.PI) / 180) };
  const objectZ = focalLength * (1 / m - 1);
  return objectHeight === null ? null : { y, nu: -y / objectZ, yChief: 0, nuChief: objectHeight / objectZ };
}

/** Two thin lenses from focal length, gap and back focus, or between two conjugates; then traced. */
export function readTwoElements(input: Record<string, unknown>): Reader | null {
  const wanted = isRecord(input.wanted) ? input.wanted : {};
  const gapMm = numberIn(input, 'gap');
  if (gapMm === null) return null;
  const focalLengthMm = numberIn(wanted, 'focalLength');
  const backFocusMm = numberIn(wanted, 'backFocus');
  if (focalLengthMm !== null && backFocusMm !== null)
    return traced(twoForBackFocus({ focalLengthMm, backFocusMm, gapMm }), gapMm, null);
  const objectToImageMm = numberIn(wanted, 'objectToImage');
  const magnification = numberIn(wanted, 'magnification');
  const distance = numberIn(input, 'objectDistance');
  if (objectToImageMm === null || magnification === null || distance === null) return null;
  const solved = twoForRelay({ objectDistanceMm: -distance, objectToImageMm, magnification, gapMm });
  return traced(solved, gapMm, distance);
}

function traced(solved: Outcome<TwoElements>, gapMm: number, distance: number | null): Reader | null {
  if (!solved.ok) return null;
  const { firstFocalLengthMm, secondFocalLengthMm } = solved.value;
  const prescription = {
    thinLenses: [
      { focalLength: firstFocalLengthMm, gapAfter: gapMm },
      { focalLength: secondFocalLengthMm, gapAfter: 0 },
    ],
    object: { distance },
  };
  const laid = layOut(prescription);
  return after(
    new Map([
      ['focalLength1', measured(firstFocalLengthMm)],
      ['focalLength2', measured(secondFocalLengthMm)],
    ]),
    laid && readTrain(laid, prescription),
  );
}

/** Foci of a narrow parallel pencil at one surface, met at its vertex under the angles of incidence in brackets. */
export function readFoci(input: Record<string, unknown>): Reader | null {
  if (!isRecord(input.surface) || !Array.isArray(input.incidenceDeg)) return null;
  const { surface } = input;
  const laid = layOut({
    objectIndex: surface.indexBefore ?? 1,
    surfaces: [{ radius: surface.radius, thickness: 0, index: surface.indexAfter, mirror: surface.mirror }],
  });
  if (laid === null) return null;
  const { train } = laid;
  return (quantity) => {
    const [, name = '', degrees = ''] = /^(\w+)\[(.+)\]$/.exec(quantity) ?? [];
    const angle = (Number(degrees) * Math.PI) / 180;
    if (degrees === '' || !Number.isFinite(angle)) return null;
    const path = traceRay(train, [0, 0, 0], [0, Math.sin(angle), Math.cos(angle)]);
    const { tangential, sagittal } = coddington(train, path, null);
    const value = new Map<string, Quantity>([
      ['tangential', tangential],
      ['sagittal', sagittal],
    ]).get(name);
    return value ? measuredQuantity(value) : null;
  };
}

const measuredQuantity = (value: Quantity): Measured => ({
  value,
  floor: value.ok ? ROUNDING * Math.abs(value.value) : 0,
});
