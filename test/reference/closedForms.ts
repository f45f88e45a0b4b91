import { derive, finite, type Quantity } from '../../engine/paraxial/absence.ts';
import { axialOf } from '../../engine/paraxial/axial.ts';
import { petzval, thinColour } from '../../engine/paraxial/colour.ts';
import { blurDepthMm, quarterWaveDepthMm } from '../../engine/paraxial/depth.ts';
import { firstOrder } from '../../engine/paraxial/firstOrder.ts';
import { light } from '../../engine/paraxial/light.ts';
import { referenceRays } from '../../engine/paraxial/rays.ts';
import { buildTrain, type SurfaceSpec } from '../../engine/train/build.ts';
import { isRecord, numberIn } from './json.ts';
import { type Measured, type Reader, readTrain } from './measure.ts';
import { layOut } from './prescription.ts';

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

const thinAt = (focalLength: number, distance: number): Reader | null => {
  const prescription = { thinLenses: [{ focalLength, gapAfter: 0 }], object: { distance } };
  const laid = layOut(prescription);
  return laid && readTrain(laid, prescription);
};

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
  return laid && readTrain(laid, prescription);
};

/** A thin lens at several magnifications: the object stands at f(1/m − 1), the engine gives the rest. */
const magnifications: Form = (input) => {
  const lens = numbersIn(input, 'focalLength');
  if (!lens || !Array.isArray(input.magnifications)) return null;
  const readers = new Map<string, Reader>();
  for (const m of input.magnifications) {
    if (typeof m !== 'number' || m === 0) return null;
    const reader = thinAt(lens.focalLength, lens.focalLength * (1 / m - 1));
    if (reader) readers.set(String(m), reader);
  }
  return (quantity) => {
    const [, name = '', m = ''] = /^(\w+)\[(.+)\]$/.exec(quantity) ?? [];
    return readers.get(m)?.(name) ?? null;
  };
};

/** Two ways to put a thin lens between object and image: the object at −(L ± √(L² − 4fL))/2, the engine gives the rest. */
const doubleSolution: Form = (input) => {
  const given = numbersIn(input, 'focalLength', 'objectToImage');
  if (!given) return null;
  const { focalLength: f, objectToImage: L } = given;
  const root = Math.sqrt(L * L - 4 * f * L);
  if (!(root > 0)) return null;
  const readers = { A: thinAt(f, -(L - root) / 2), B: thinAt(f, -(L + root) / 2) };
  return (quantity) => {
    const magnification = (key: 'A' | 'B'): Quantity =>
      readers[key]?.('magnification')?.value ?? finite(Number.NaN);
    if (quantity === 'magnificationProduct') {
      const other = magnification('B');
      return measured(derive(magnification('A'), (m) => m * (other.ok ? other.value : Number.NaN)));
    }
    const key = quantity.at(-1);
    return key === 'A' || key === 'B' ? (readers[key]?.(quantity.slice(0, -1)) ?? null) : null;
  };
};

/** Two thin lenses in contact with φ₁ = φV₁/(V₁ − V₂), φ₂ = −φV₂/(V₁ − V₂): what they add up to. */
const achromat: Form = (input) => {
  const f = numberIn(input, 'focalLength');
  const one = isRecord(input.glass1) ? numbersIn(input.glass1, 'index', 'abbe') : null;
  const two = isRecord(input.glass2) ? numbersIn(input.glass2, 'index', 'abbe') : null;
  if (!f || !one || !two || one.abbe === two.abbe) return null;
  const lens = (part: number, glass: { abbe: number }, other: { abbe: number }): SurfaceSpec => {
    const thinPowerPerMm = glass.abbe / (glass.abbe - other.abbe) / f;
    return { part, thinPowerPerMm, powerSpreadPerMm: thinPowerPerMm / glass.abbe, indexAfter: 1, gapMm: 0 };
  };
  const train = buildTrain({
    objectIndex: 1,
    surfaces: [lens(0, one, two), lens(1, two, one)],
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
  singleSurface,
  magnifications,
  doubleSolution,
  achromat,
  singletColour,
  focusDepth,
  workingFNumber,
];
