import type { ExactSetup, FieldRays, SpotSize, Weighted } from '../../../engine/index.ts';
import { airyRadius, sentenceOf, spotSize } from '../../../engine/index.ts';
import type { CurveInk } from '../../board/styles.ts';
import { formatNumber } from '../../ui/format.ts';
import { type Dots, emptyPlot, type Plot, type Spot } from '../plot.ts';
import { alike, roundReach } from '../scale.ts';
import { drawnFractions, type Source } from '../source.ts';
import { fieldInk, fieldName, lengthScale, lineDash, lineName, lostNote } from '../words.ts';

const MICRO = 1000;
const DIGITS = 2;
/** The least half side of a spot's square, µm. */
const LEAST = 0.5;
/** Planes strung along the axis. */
const PLANES = 7;
/** How many times the depth of focus for a quarter wave they reach at least, each way. */
const DEPTHS = 3;
/** How many times as far as the least spot. */
const BEYOND = 1.5;

/** Where the rays of each field meet the image plane, or planes along the axis about it. */
export function spotPlots(source: Source): readonly Plot[] {
  return source.view.spots === 'plane' ? onThePlane(source) : throughFocus(source);
}

function onThePlane(source: Source): readonly Plot[] {
  return ofFields(source, (field, landings, ink, key, title, airy) => {
    const size = spotSize(landings);
    if (!size.ok) return emptyPlot(key, title, sentenceOf(size.why));
    const spot = spotOf(field.setup, landings, size.value, ink, 0, 0);
    return {
      kind: 'spots',
      key,
      title,
      unit: 'µm',
      digits: DIGITS,
      x: null,
      spots: [spot],
      airy,
      reach: roundReach(Math.max(spot.largest, airy ?? 0) * 1.05, LEAST),
      figures: [
        `rms ${formatNumber(spot.rms, DIGITS)} µm`,
        `largest ${formatNumber(spot.largest, DIGITS)} µm`,
        ...(airy === null ? [] : [`Airy ${formatNumber(airy, DIGITS)} µm`]),
      ],
      notes: lostNote(size.value.lost),
    };
  });
}

function throughFocus(source: Source): readonly Plot[] {
  const reachMm = focusReach(source);
  const length = lengthScale(source.unit, 3);
  return ofFields(source, (field, landings, ink, key, title, airy) => {
    const spots: Spot[] = [];
    for (let i = 0; i < PLANES; i++) {
      const shiftMm = reachMm * ((2 * i) / (PLANES - 1) - 1);
      const size = spotSize(landings, shiftMm);
      if (!size.ok) return emptyPlot(key, title, sentenceOf(size.why));
      spots.push(spotOf(field.setup, landings, size.value, ink, shiftMm, shiftMm * length.perMm));
    }
    const least = spots.reduce((best, spot) => (spot.rms < best.rms ? spot : best));
    const to = reachMm * length.perMm;
    return {
      kind: 'spots',
      key,
      title,
      unit: 'µm',
      digits: DIGITS,
      x: { label: 'behind the image plane', unit: length.unit, digits: length.digits, from: -to, to },
      spots,
      airy,
      reach: roundReach(Math.max(...spots.map(({ largest }) => largest), airy ?? 0), LEAST),
      figures: [
        `least rms ${formatNumber(least.rms, DIGITS)} µm at ${formatNumber(least.at, length.digits)} ${length.unit}`,
      ],
      notes: lostNote(landings.reduce((sum, { landing }) => sum + landing.lost, 0)),
    };
  });
}

type Make = (
  field: FieldRays,
  landings: readonly Weighted[],
  ink: CurveInk,
  key: string,
  title: string,
  airy: number | null,
) => Plot;

function ofFields(source: Source, make: Make): readonly Plot[] {
  const fractions = drawnFractions(source.sketch);
  const airy = airyRadius(source.setup);
  return alike(
    source.fields().map((field, index) => {
      const key = `spot ${index}`;
      const title = `Spot, ${fieldName(field.fraction)}`;
      const landings = source.landings(field);
      if (!landings.ok) return emptyPlot(key, title, sentenceOf(landings.why));
      const ink = fieldInk(fractions, index);
      return make(field, landings.value, ink, key, title, airy.ok ? airy.value * MICRO : null);
    }),
  );
}

/** The spot of these landings on the plane `shiftMm` behind the image plane, lengths in µm. */
function spotOf(
  setup: ExactSetup,
  landings: readonly Weighted[],
  { centroidXMm, centroidYMm, rmsMm, largestMm }: SpotSize,
  ink: CurveInk,
  shiftMm: number,
  at: number,
): Spot {
  const dots = landings.map(({ landing, weight }, line): Dots => {
    const { x, y, slopeX, slopeY, count } = landing;
    const points = new Float64Array(2 * count);
    for (let i = 0; i < count; i++) {
      points[2 * i] = ((x[i] ?? 0) + shiftMm * (slopeX[i] ?? 0) - centroidXMm) * MICRO;
      points[2 * i + 1] = ((y[i] ?? 0) + shiftMm * (slopeY[i] ?? 0) - centroidYMm) * MICRO;
    }
    return {
      name: lineName(setup, line),
      line: lineDash(setup, line),
      style: `dots ${ink}`,
      points,
      share: landing.weight.subarray(0, count),
      weight,
    };
  });
  return { at, dots, rms: rmsMm * MICRO, largest: largestMm * MICRO };
}

/** How far the planes reach each way, mm: some depths of focus, or well beyond the field's least spot that is furthest off. */
function focusReach(source: Source): number {
  const [main] = source.setup.lines;
  const nu = source.setup.marginal.nu[main.train.count] ?? 0;
  const index = main.train.index[main.train.count] ?? 1;
  const quarterWaveMm = (main.wavelengthNm * 1e-6 * Math.abs(index)) / (2 * nu * nu);
  const depthsMm = DEPTHS * quarterWaveMm;
  const leastMm = source.fields().map((field) => {
    const landings = source.landings(field);
    return landings.ok ? leastShift(landings.value, depthsMm) : 0;
  });
  const wanted = Math.max(depthsMm, ...leastMm.map((mm) => BEYOND * Math.abs(mm)));
  return Number.isFinite(wanted) ? roundReach(wanted, 1e-4) : 1;
}

/** Where the rms radius is least: its square is a parabola in the shift, told by three planes. */
function leastShift(landings: readonly Weighted[], stepMm: number): number {
  const [before, here, behind] = [-stepMm, 0, stepMm].map((shiftMm) => {
    const size = spotSize(landings, shiftMm);
    return size.ok ? size.value.rmsMm ** 2 : 0;
  }) as [number, number, number];
  const curved = before - 2 * here + behind;
  return curved > 0 ? (stepMm * (before - behind)) / (2 * curved) : 0;
}
