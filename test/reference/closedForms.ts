import { derive, derive2, finite, type Quantity } from '../../engine/paraxial/absence.ts';
import { axialOf } from '../../engine/paraxial/axial.ts';
import { petzval, thinColour } from '../../engine/paraxial/colour.ts';
import { blurDepthMm, quarterWaveDepthMm } from '../../engine/paraxial/depth.ts';
import { firstOrder } from '../../engine/paraxial/firstOrder.ts';
import { light } from '../../engine/paraxial/light.ts';
import { referenceRays } from '../../engine/paraxial/rays.ts';
import { achromaticPair } from '../../engine/solve/achromat.ts';
import { objectForMagnification, objectsForTrack } from '../../engine/solve/conjugateSolves.ts';
import { buildTrain, type SurfaceSpec } from '../../engine/train/build.ts';
import { readAxisRays } from './axisRays.ts';
import { isRecord, numberIn } from './json.ts';
import { type Measured, type Reader, readTrain } from './measure.ts';
import { layOut } from './prescription.ts';
import { readBending, readFoci, readTwoElements } from './solves.ts';

/** Double-precision rounding of a short closed form, relative. */
const ROUNDING = 1e-13;

const measured = (value: Quantity): Measured => ({
  value,
  floor: value.ok ? ROUNDING * Math.abs(value.value) : 0,
});

type Form = (input: Record<string, unknown>) => Reader | null;

/** What a case without a prescription gives to trace, recognised by the members of its input; null when there is nothing. */
export function readClosedForm(input: Record<string, unknown>): Reader | null {
  for (const form of FORMS) {
    const reader = form(input);
    if (reader) return reader;
  }
  return null;
}

const numbersIn = <K extends string>(
  input: Record<string, unknown>,
  ...keys: readonly K[]
): Record<K, number> | null => {
  const found: Partial<Record<K, number>> = {};
  for (const key of keys) {
    const value = numberIn(input, key);
    if (value === null || value === 0) return null;
    found[key] = value;
  }
  return found as Record<K, number>;
};

/** A thin lens with an object so far in front of it. */
function thinFrom(focalLength: number, objectDistanceMm: number): Reader {
  const prescription = {
    thinLenses: [{ focalLength, gapAfter: 0 }],
    object: { distance: -objectDistanceMm },
  };
  const laid = layOut(prescription);
  const traced = laid && readTrain(laid, prescription);
  return (quantity) =>
    quantity === 'objectDistance' ? measured(finite(-objectDistanceMm)) : (traced?.(quantity) ?? null);
}

/** One refracting surface by itself. */
const singleSurface: Form = (input) => {
  if (!isRecord(input.surface)) return null;
  const { surface } = input;
  const prescription = {
    objectIndex: surface.indexBefore,
    surfaces: [{ radius: surface.radius, thickness: 0, index: surface.indexAfter, mirror: surface.mirror }],
    object: { distance: input.objectDistance },
  };
  const laid = layOut(prescription);
  if (laid === null) return null;
  const [paraxial, exact] = [readTrain(laid, prescription), readAxisRays(laid, input)];
  return (quantity) => paraxial(quantity) ?? exact(quantity);
};

/** A thin lens at several magnifications: the engine gives the object's distance, then the rest from a trace. */
const magnifications: Form = (input) => {
  const lens = numbersIn(input, 'focalLength');
  if (!lens || !Array.isArray(input.magnifications)) return null;
  const readers = new Map<string, Reader>();
  for (const m of input.magnifications) {
    if (typeof m !== 'number' || m === 0) return null;
    const distance = objectForMagnification(lens.focalLength, m);
    if (distance.ok) readers.set(String(m), thinFrom(lens.focalLength, distance.value));
  }
  return (quantity) => {
    const [, name = '', m = ''] = /^(\w+)\[(.+)\]$/.exec(quantity) ?? [];
    return readers.get(m)?.(name) ?? null;
  };
};

/** Two ways to put a thin lens between object and image, likewise. */
const doubleSolution: Form = (input) => {
  const given = numbersIn(input, 'focalLength', 'objectToImage');
  if (!given) return null;
  const distances = objectsForTrack(given.focalLength, given.objectToImage);
  if (!distances.ok) return null;
  const [near, far] = distances.value;
  const readers = { A: thinFrom(given.focalLength, near), B: thinFrom(given.focalLength, far) };
  return (quantity) => {
    const magnification = (key: 'A' | 'B'): Quantity =>
      readers[key]('magnification')?.value ?? finite(Number.NaN);
    if (quantity === 'magnificationProduct')
      return measured(derive2(magnification('A'), magnification('B'), (a, b) => a * b));
    const key = quantity.at(-1);
    return key === 'A' || key === 'B' ? readers[key](quantity.slice(0, -1)) : null;
  };
};

/** Two thin lenses in contact without axial colour: their powers, and what they add up to. */
const achromat: Form = (input) => {
  const f = numberIn(input, 'focalLength');
  const one = isRecord(input.glass1) ? numbersIn(input.glass1, 'index', 'abbe') : null;
  const two = isRecord(input.glass2) ? numbersIn(input.glass2, 'index', 'abbe') : null;
  if (!f || !one || !two) return null;
  const pair = achromaticPair(f, one.abbe, two.abbe);
  if (!pair.ok) return null;
  const { firstFocalLengthMm, secondFocalLengthMm } = pair.value;
  const lens = (part: number, focalLengthMm: number, abbe: number): SurfaceSpec => {
    const thinPowerPerMm = 1 / focalLengthMm;
    return { part, thinPowerPerMm, powerSpreadPerMm: thinPowerPerMm / abbe, indexAfter: 1, gapMm: 0 };
  };
  const train = buildTrain({
    objectIndex: 1,
    surfaces: [lens(0, firstFocalLengthMm, one.abbe), lens(1, secondFocalLengthMm, two.abbe)],
    stopSurface: 0,
    objectZ: null,
    imageDistanceMm: null,
  });
  const axial = axialOf(train);
  const rays = referenceRays(
    train,
    { kind: 'entrancePupilDiameter', diameterMm: 2 },
    { kind: 'angle', angleDeg: 1 },
    axial,
  );
  const petz = petzval(train, Float64Array.of(one.index, two.index));
  const spread = train.powerSpread.reduce((sum, term) => sum + Math.abs(term), 0);
  // C = y²·Σφ/V and l′ short − long = −C/u′² with y = 1 and u′ = −1/f.
  const colourSum = derive(thinColour(train, rays, axial).axialMm, (mm) => -mm / (f * f));
  const table = new Map<string, Measured>([
    ['focalLength', measured(firstOrder(train).focalLengthMm)],
    ['focalLength1', measured(finite(firstFocalLengthMm))],
    ['focalLength2', measured(finite(secondFocalLengthMm))],
    ['petzvalSum', measured(petz.sumPerMm)],
    ['petzvalRadius', measured(petz.radiusMm)],
    ['colourSum', { value: colourSum, floor: ROUNDING * spread }],
  ]);
  return (quantity) => table.get(quantity) ?? null;
};

/** The axial colour of one thin lens; the case files give it long minus short. */
const singletColour: Form = (input) => {
  const lens = numbersIn(input, 'focalLength', 'abbe');
  if (!lens) return null;
  const thinPowerPerMm = 1 / lens.focalLength;
  const train = buildTrain({
    objectIndex: 1,
    surfaces: [
      { part: 0, thinPowerPerMm, powerSpreadPerMm: thinPowerPerMm / lens.abbe, indexAfter: 1, gapMm: 0 },
    ],
    stopSurface: 0,
    objectZ: null,
    imageDistanceMm: null,
  });
  const axial = axialOf(train);
  const rays = referenceRays(
    train,
    { kind: 'entrancePupilDiameter', diameterMm: 1 },
    { kind: 'angle', angleDeg: 1 },
    axial,
  );
  const { axialMm } = thinColour(train, rays, axial);
  return (quantity) => (quantity === 'axialColourFirstOrder' ? measured(derive(axialMm, (mm) => -mm)) : null);
};

/** Depth of focus in air with sin U = 1/(2N). */
const focusDepth: Form = (input) => {
  const given = numbersIn(input, 'wavelengthNm', 'fNumber', 'blur');
  if (!given) return null;
  const table = new Map<string, number>([
    ['quarterWaveHalfDepth', quarterWaveDepthMm(given.wavelengthNm, 1 / (2 * given.fNumber), 1)],
    ['blurHalfDepth', blurDepthMm(given.blur, given.fNumber, 1)],
  ]);
  return (quantity) => {
    const value = table.get(quantity);
    return value === undefined ? null : measured(finite(value));
  };
};

/** A thin lens with the stop on it, so that its pupil magnification is 1, set to an f-number at infinity and used at m. */
const workingFNumber: Form = (input) => {
  const given = numbersIn(input, 'fNumber', 'magnification');
  if (!given) return null;
  const focalLength = 100;
  const train = buildTrain({
    objectIndex: 1,
    surfaces: [{ part: 0, thinPowerPerMm: 1 / focalLength, indexAfter: 1, gapMm: 0 }],
    stopSurface: 0,
    objectZ: focalLength * (1 / given.magnification - 1),
    imageDistanceMm: null,
  });
  const axial = axialOf(train);
  const rays = referenceRays(
    train,
    { kind: 'infinityFNumber', fNumber: given.fNumber },
    { kind: 'angle', angleDeg: 1 },
    axial,
  );
  const { workingFNumber: value } = light(train, rays, axial, firstOrder(train));
  return (quantity) => (quantity === 'workingFNumber' ? measured(value) : null);
};

const FORMS: readonly Form[] = [
  readFoci,
  readBending,
  readTwoElements,
  singleSurface,
  magnifications,
  doubleSolution,
  achromat,
  singletColour,
  focusDepth,
  workingFNumber,
];
