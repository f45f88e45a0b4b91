import { buildTrain, type SurfaceSpec } from '../../engine/train/build.ts';
import type { Train } from '../../engine/train/types.ts';
import { isRecord, numberIn } from './json.ts';

/** The train of a prescription, and where its first and last surface stand in it. A stop standing free is a surface of its own. */
export interface Laid {
  readonly train: Train;
  readonly firstZ: number;
  readonly lastZ: number;
  /** Each surface or thin lens alone, in its own media. */
  readonly elements: readonly Train[];
}

/**
 * Lays out a prescription of the case files, with some gaps replaced (by 0-based index); null when it is not one or has something that
 * cannot be expressed.
 */
export function layOut(prescription: unknown, gaps: Readonly<Record<string, unknown>> = {}): Laid | null {
  if (!isRecord(prescription)) return null;
  const objectIndex = prescription.objectIndex === undefined ? 1 : numberIn(prescription, 'objectIndex');
  if (objectIndex === null || objectIndex === 0) return null;
  const surfaces = surfacesOf(prescription, objectIndex, gaps);
  const objectZ = objectOf(prescription.object);
  if (surfaces === null || objectZ === undefined) return null;
  const spec = withStop(surfaces, prescription.stop, objectIndex);
  if (spec === null) return null;
  const { stopSurface, shift } = spec;
  const train = buildTrain({
    objectIndex,
    surfaces: spec.surfaces,
    stopSurface,
    objectZ: objectZ === null ? null : objectZ + shift,
    imageDistanceMm: null,
  });
  const places = spec.surfaces.flatMap(({ part }, k) => (part >= 0 ? [train.z[k] ?? 0] : []));
  return {
    train,
    firstZ: places[0] ?? 0,
    lastZ: places.at(-1) ?? 0,
    elements: surfaces.map((surface, k) =>
      buildTrain({
        objectIndex: surfaces[k - 1]?.indexAfter ?? objectIndex,
        surfaces: [surface],
        objectZ: null,
        imageDistanceMm: null,
      }),
    ),
  };
}

function surfacesOf(
  prescription: Record<string, unknown>,
  objectIndex: number,
  gaps: Readonly<Record<string, unknown>>,
): SurfaceSpec[] | null {
  const { surfaces, thinLenses } = prescription;
  const list = Array.isArray(surfaces) ? surfaces : thinLenses;
  if (!Array.isArray(list) || list.length === 0) return null;
  const specs: SurfaceSpec[] = [];
  let index = objectIndex;
  for (const [k, entry] of list.entries()) {
    if (!isRecord(entry)) return null;
    const gapMm = gapOf(k in gaps ? gaps[k] : (entry.thickness ?? entry.gapAfter));
    const spec =
      list === surfaces ? surfaceOf(entry, index, k, gapMm ?? 0) : thinLensOf(entry, k, gapMm ?? 0);
    if (gapMm === null || spec === null) return null;
    specs.push(spec);
    index = spec.indexAfter;
  }
  return specs;
}

/** A gap that is not written is the last one, which has no meaning. */
const gapOf = (gap: unknown): number | null =>
  gap === undefined || gap === null ? 0 : typeof gap === 'number' && Number.isFinite(gap) ? gap : null;

function surfaceOf(
  entry: Record<string, unknown>,
  indexBefore: number,
  part: number,
  gapMm: number,
): SurfaceSpec | null {
  const { radius, mirror } = entry;
  const indexAfter = mirror === true ? -indexBefore : numberIn(entry, 'index');
  const spreadAfter = entry.dispersion === undefined ? 0 : numberIn(entry, 'dispersion');
  if (indexAfter === null || indexAfter === 0 || spreadAfter === null) return null;
  if (radius !== null && (typeof radius !== 'number' || radius === 0)) return null;
  const conic = numberIn(entry, 'conic') ?? 0;
  const asphere = asphereOf(entry.asphere);
  if (asphere === null) return null;
  const curvaturePerMm = radius === null ? 0 : 1 / radius;
  return { part, curvaturePerMm, conic, asphere, indexAfter, spreadAfter, gapMm };
}

/** Coefficients of r⁴, r⁶, … from `{ "4": A4, "6": A6 }`; null when some power is odd, below four or no number. */
function asphereOf(asphere: unknown): readonly number[] | null {
  if (asphere === undefined || asphere === null) return [];
  if (!isRecord(asphere)) return null;
  const coefficients: number[] = [];
  for (const power of Object.keys(asphere)) {
    const place = Number(power) / 2 - 2;
    const value = numberIn(asphere, power);
    if (value === null || !Number.isInteger(place) || place < 0 || place > MOST_POWERS) return null;
    coefficients[place] = value;
  }
  return Array.from(coefficients, (value) => value ?? 0);
}

/** No written surface goes beyond r⁴⁰. */
const MOST_POWERS = 18;

function thinLensOf(entry: Record<string, unknown>, part: number, gapMm: number): SurfaceSpec | null {
  const focalLength = numberIn(entry, 'focalLength');
  return focalLength === null || focalLength === 0
    ? null
    : { part, thinPowerPerMm: 1 / focalLength, indexAfter: 1, gapMm };
}

/** z of the object, null at infinity, undefined when it is neither. */
function objectOf(object: unknown): number | null | undefined {
  if (object === undefined || object === null) return null;
  if (!isRecord(object)) return undefined;
  return object.distance === undefined || object.distance === null
    ? null
    : (numberIn(object, 'distance') ?? undefined);
}

interface WithStop {
  readonly surfaces: SurfaceSpec[];
  readonly stopSurface: number;
  /** How far the first real surface stands behind the first one of the list. */
  readonly shift: number;
}

/** The stop with an offset becomes a surface (part −1) behind its surface, or in front of it when the offset is negative. */
function withStop(surfaces: SurfaceSpec[], stop: unknown, objectIndex: number): WithStop | null {
  if (stop === undefined || stop === null) return { surfaces, stopSurface: -1, shift: 0 };
  if (!isRecord(stop)) return null;
  const surface = numberIn(stop, 'surface');
  const offset = stop.offset === undefined ? 0 : numberIn(stop, 'offset');
  const carrier = surface === null ? undefined : surfaces[surface];
  if (surface === null || offset === null || carrier === undefined) return null;
  if (offset === 0) return { surfaces, stopSurface: surface, shift: 0 };
  const before = offset > 0 ? surface : surface - 1;
  const inFront = surfaces[before];
  const indexAfter = inFront?.indexAfter ?? objectIndex;
  const spreadAfter = inFront?.spreadAfter ?? 0;
  const toStop = offset > 0 ? offset : (inFront?.gapMm ?? 0) + offset;
  const behindStop = offset > 0 ? carrier.gapMm - offset : -offset;
  const laid = [...surfaces];
  if (inFront) laid[before] = { ...inFront, gapMm: toStop };
  laid.splice(before + 1, 0, { part: -1, indexAfter, spreadAfter, gapMm: behindStop });
  return { surfaces: laid, stopSurface: before + 1, shift: inFront ? 0 : -offset };
}
