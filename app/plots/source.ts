import type {
  Analysis,
  ChiefSweep,
  ExactSetup,
  FieldRays,
  LengthUnit,
  Sample,
  Setting,
  Sketch,
} from '../../engine/index.ts';
import {
  bufferSize,
  chiefSweep,
  fieldShares,
  hexapolarGrid,
  landingsOf,
  sampleOf,
  traceFields,
} from '../../engine/index.ts';
import type { PlotsView } from '../store/viewStore.ts';

/** How much is traced: coarse while a hand moves, fine when it rests. */
export type Quality = 'coarse' | 'fine';

/** What the rays of the drawn fields are traced for. */
export interface Wants {
  readonly fans: boolean;
  readonly spots: boolean;
}

/** What the plots of one sketch at one setting are made from. Rays are traced when first asked for, and serve every plot. */
export interface Source {
  readonly sketch: Sketch;
  readonly setting: Setting;
  readonly analysis: Analysis;
  readonly setup: ExactSetup;
  readonly view: PlotsView;
  readonly unit: LengthUnit;
  readonly quality: Quality;
  /** The fields of the sketch as drawn, from the axis outwards. */
  readonly fields: () => readonly FieldRays[];
  /** Where the grid of one of these fields lands on the image plane. */
  readonly landings: (field: FieldRays) => ReturnType<typeof landingsOf>;
  /** The axial bundle with a fan. */
  readonly axis: () => FieldRays;
  /** Fields at equal steps of the share, with spots: for curves over the field. */
  readonly sweepFields: () => readonly FieldRays[];
  /** Chief rays over the field in each line, the main one first. */
  readonly sweeps: () => readonly ChiefSweep[];
  readonly shares: Float64Array;
}

interface Amount {
  readonly fanRays: number;
  readonly rings: number;
  readonly sweepRings: number;
  readonly shares: number;
  readonly wideShares: number;
}

/** Rays of a fan, rings of a spot (eight: 217 rays, ten: 331), points over the field with and without spots. */
const AMOUNTS: Readonly<Record<Quality, Amount>> = {
  coarse: { fanRays: 21, rings: 8, sweepRings: 4, shares: 7, wideShares: 5 },
  fine: { fanRays: 41, rings: 10, sweepRings: 7, shares: 21, wideShares: 11 },
};

/** So many drawn fields make a curve over the field. */
const ENOUGH = 4;

const SAMPLES = new Map<string, Sample>();

/** The sample of so many rays in a fan and rings in a spot, 0 for none; made once. */
function sampleFor(fanRays: number, rings: number, fine: boolean): Sample {
  const key = `${fanRays} ${rings} ${fine}`;
  const sample = SAMPLES.get(key) ?? sampleOf(fanRays, rings === 0 ? null : hexapolarGrid(rings), { fine });
  SAMPLES.set(key, sample);
  return sample;
}

type Given = Pick<Source, 'sketch' | 'setting' | 'analysis' | 'setup' | 'view' | 'unit' | 'quality'>;

/** The source whose drawn fields are traced for what is wanted. */
export function sourceOf(given: Given, wants: Wants): Source {
  const { sketch, setup, quality } = given;
  const amount = AMOUNTS[quality];
  const fine = quality === 'fine';
  const shares = fieldShares(amount.shares);
  const fractions = drawnFractions(sketch);
  const fields = once(() => {
    const sample = sampleFor(wants.fans ? amount.fanRays : 0, wants.spots ? amount.rings : 0, fine);
    return traced('drawn', setup, fractions, sample);
  });
  // While a hand moves, what is drawn will do, where there is enough of it.
  const drawnWillDo =
    !fine && wants.spots && fractions.length >= ENOUGH && fractions.every((share) => share >= 0);
  return {
    ...given,
    shares,
    fields,
    landings: byField(landingsOf),
    axis: once(() => oneField(setup, amount.fanRays, fine)),
    sweepFields: once(() =>
      drawnWillDo
        ? fields()
        : traced('sweep', setup, [...fieldShares(amount.wideShares)], sampleFor(0, amount.sweepRings, fine)),
    ),
    sweeps: once(() => setup.lines.map((_, line) => chiefSweep(setup, line, shares))),
  };
}

const BUFFERS = new Map<string, Float64Array<ArrayBuffer>>();

/** The fields traced into a buffer that is used again at the next source: a plot keeps none of its numbers. */
function traced(
  use: 'drawn' | 'sweep',
  setup: ExactSetup,
  fractions: readonly number[],
  sample: Sample,
): readonly FieldRays[] {
  const size = bufferSize(setup, fractions.length, sample);
  let buffer = BUFFERS.get(use);
  if (buffer === undefined || buffer.length < size) {
    buffer = new Float64Array(size);
    BUFFERS.set(use, buffer);
  }
  return traceFields(setup, fractions, sample, buffer);
}

/** The fields drawn, from the axis outwards. */
export const drawnFractions = ({ field }: Sketch): readonly number[] =>
  [...new Set(field.fractions)].sort((a, b) => Math.abs(a) - Math.abs(b) || a - b);

function oneField(setup: ExactSetup, fanRays: number, fine: boolean): FieldRays {
  const [field] = traceFields(setup, [0], sampleFor(fanRays, 0, fine));
  if (!field) throw new Error('oneField: no field was traced');
  return field;
}

/** `compute`, called once for each field. */
function byField<T>(compute: (field: FieldRays) => T): (field: FieldRays) => T {
  const known = new Map<FieldRays, T>();
  return (field) => {
    const before = known.get(field);
    if (before !== undefined) return before;
    const result = compute(field);
    known.set(field, result);
    return result;
  };
}

/** `compute`, called once at most. */
function once<T>(compute: () => T): () => T {
  let known: { readonly value: T } | null = null;
  return () => {
    known ??= { value: compute() };
    return known.value;
  };
}
