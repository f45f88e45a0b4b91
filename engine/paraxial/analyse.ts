import type { Outcome } from '../outcome.ts';
import type { Setting, Sketch } from '../sketch/types.ts';
import { indicesIn } from '../train/indices.ts';
import { type ApertureAt, apertureAt, type Places, placesOf } from '../train/places.ts';
import { trainOf } from '../train/train.ts';
import type { Train } from '../train/types.ts';
import type { Absence } from './absence.ts';
import { axialOf } from './axial.ts';
import { type ClearNeed, clearDiameters } from './clear.ts';
import { type Colour, type Petzval, petzval, thinColour } from './colour.ts';
import { type Conjugates, conjugates } from './conjugates.ts';
import { type Depth, depth } from './depth.ts';
import { type FirstOrder, firstOrder } from './firstOrder.ts';
import { conjugateChain, type LedgerRow } from './ledger.ts';
import { type Light, light } from './light.ts';
import { type Pupils, pupils, type Windows, windows } from './pupils.ts';
import { type ReferenceRays, referenceRays } from './rays.ts';
import { halfDiagonal, type SensorView, sensorView } from './sensor.ts';
import { type Vignetting, vignettingAt } from './vignetting.ts';
import { type PartWork, work } from './work.ts';

/** Everything first order about a sketch at one setting, in the main line. */
export interface Analysis {
  readonly train: Train;
  readonly places: Places;
  readonly aperture: ApertureAt;
  readonly firstOrder: FirstOrder;
  readonly conjugates: Conjugates;
  readonly ledger: readonly LedgerRow[];
  readonly rays: ReferenceRays;
  readonly pupils: Pupils;
  readonly windows: Windows;
  readonly light: Light;
  /** One entry per surface of the train. */
  readonly clear: readonly ClearNeed[];
  /** One entry per field fraction of the sketch. */
  readonly vignetting: Outcome<readonly Vignetting[], Absence>;
  readonly depth: Depth;
  readonly petzval: Petzval;
  readonly colour: Colour;
  readonly work: readonly PartWork[];
  readonly sensor: SensorView;
}

/** The whole first-order analysis of `sketch` at `setting`. Quantities that do not exist say why. */
export function analyse(sketch: Sketch, setting: Setting): Analysis {
  const train = trainOf(sketch, setting);
  const aperture = apertureAt(sketch, setting);
  const axial = axialOf(train);
  const first = firstOrder(train);
  const ends = conjugates(train, axial);
  const rays = referenceRays(train, aperture, sketch.field.size, axial);
  const lightOf = light(train, rays, axial, first);
  const clear = clearDiameters(train, rays, sketch.field.vignetting);
  const { sensor, registerMm, parts } = sketch;
  const wavelengthNm = sketch.lines.mainNm;
  return {
    train,
    places: placesOf(sketch, setting),
    aperture,
    firstOrder: first,
    conjugates: ends,
    ledger: conjugateChain(train, axial),
    rays,
    pupils: pupils(train, rays),
    windows: windows(train, rays, axial, sensor ? halfDiagonal(sensor) : null),
    light: lightOf,
    clear,
    vignetting: vignettingAt(train, rays, sketch.field.fractions),
    depth: depth(train, rays, axial, lightOf, wavelengthNm, sketch.blurMm ?? sensor?.pixelPitchMm ?? null),
    petzval: petzval(train, glassIndices(sketch, train)),
    colour: thinColour(train, rays, axial),
    work: work(train, rays, clear),
    sensor: sensorView(train, { sensor, registerMm, parts, wavelengthNm }, first, ends, lightOf),
  };
}

/** The index of glass taken for the thin part at each surface: its glass's, its own, else the sketch's assumed one. */
function glassIndices(sketch: Sketch, train: Train): Float64Array {
  const { glassOf } = indicesIn(sketch, 'main');
  const indices = new Float64Array(train.count);
  for (let k = 0; k < train.count; k++) {
    const part = sketch.parts[train.partOf[k]!];
    const own = part?.kind === 'thin' ? (glassOf(part) ?? part.index) : null;
    indices[k] = own ?? sketch.assumedIndex;
  }
  return indices;
}
