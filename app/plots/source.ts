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
  readonly wavelengths: number;
}

/** Rays of a fan, rings of a spot (eight: 217 rays, ten: 331), points over the field with and without spots, points over wavelength. */
export const AMOUNTS: Readonly<Record<Quality, Amount>> = {
  coarse: { fanRays: 21, rings: 8, sweepRings: 4, shares: 9, wideShares: 5, wavelengths: 5 },
  fine: { fanRays: 41, rings: 10, sweepRings: 7, shares: 21, wideShares: 11, wavelengths: 15 },
};

/** So many drawn fields make a curve over the field. */
const ENOUGH = 4;

const GRIDS = new Map<number, ReturnType<typeof hexapolarGrid>>();

function gridOf(rings: number): ReturnType<typeof hexapolarGrid> {
  const grid = GRIDS.get(rings) ?? hexapolarGrid(rings);
  GRIDS.set(rings, grid);
  return grid;
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
    const grid = wants.spots ? gridOf(amount.rings) : null;
    return traced('drawn', setup, fractions, sampleOf(wants.fans ? amount.fanRays : 0, grid, { fine }));
  });
  // While a hand moves, what is drawn will do, where there is enough of it.
  const drawnWillDo =
    !fine && wants.spots && fractions.length >= ENOUGH && fractions.every((share) => share >= 0);
  return {
    ...given,
    shares,
    fields,
    axis: once(() => oneField(setup, amount.fanRays, fine)),
    sweepFields: once(() =>
      drawnWillDo
        ? fields()
        : traced(
            'sweep',
            setup,
            [...fieldShares(amount.wideShares)],
            sampleOf(0, gridOf(amount.sweepRings), { fine }),
          ),
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
  const [field] = traceFields(setup, [0], sampleOf(fanRays, null, { fine }));
  if (!field) throw new Error('oneField: no field was traced');
  return field;
}

/** `compute`, called once at most. */
function once<T>(compute: () => T): () => T {
  let known: { readonly value: T } | null = null;
  return () => {
    known ??= { value: compute() };
    return known.value;
  };
}
