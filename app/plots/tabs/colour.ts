import type { Sketch, TrainAt } from '../../../engine/index.ts';
import { axialColour, lateralColour, longitudinal, sentenceOf, trainOf } from '../../../engine/index.ts';
import { focusAxis, lineCurve, OVER_FIELD } from '../curves.ts';
import { curveStyle, emptyPlot, type Plot, type PlotCurve } from '../plot.ts';
import { evenAxis, reachOf } from '../scale.ts';
import type { Source } from '../source.ts';
import { lengthScale, lostNote } from '../words.ts';

const MICRO = 1000;
/** The zone of the stop whose rays tell the exact focus of a wavelength: half of its light is within. */
const ZONE = Math.SQRT1_2;
/** Points over wavelength, when the hand rests. */
const WAVELENGTHS = 15;

/** Focus over the stop in each line, focus over wavelength, and lateral colour over the field. */
export const colourPlots = (source: Source): readonly Plot[] => [
  longitudinalPlot(source),
  axialPlot(source),
  lateralPlot(source),
];

function longitudinalPlot(source: Source): Plot {
  const [key, title] = ['longitudinal', 'Longitudinal error'];
  const found = longitudinal(source.axis());
  if (!found.ok) return emptyPlot(key, title, sentenceOf(found.why));
  const length = lengthScale(source.unit, 3);
  const curves = found.value.map((curve) => lineCurve(source.setup, 'axial', curve, length.perMm));
  return {
    kind: 'curves',
    key,
    title,
    x: { label: 'share of the stop', unit: '', digits: 2, from: 0, to: 1 },
    y: focusAxis(length, curves),
    curves,
    notes: lostNote(Math.max(...found.value.map(({ lost }) => lost))),
  };
}

function axialPlot(source: Source): Plot {
  const [key, title] = ['axial colour', 'Axial colour'];
  const trains = trainsOf(source);
  const found = axialColour(source.setup, trains, ZONE);
  if (!found.ok) return emptyPlot(key, title, sentenceOf(found.why));
  const length = lengthScale(source.unit, 3);
  const curveOf = (name: string, part: 'paraxialMm' | 'exactMm', line: 'main' | 'short'): PlotCurve => {
    const known = found.value.flatMap((focus) => {
      const quantity = focus[part];
      return quantity.ok ? [[focus.wavelengthNm, quantity.value * length.perMm] as const] : [];
    });
    return {
      name,
      word: line === 'main' ? 'exact' : 'paraxial',
      style: curveStyle('axial', line),
      x: Float64Array.from(known, ([nm]) => nm),
      y: Float64Array.from(known, ([, value]) => value),
    };
  };
  const curves = [
    curveOf('exact at 0.71 of the stop', 'exactMm', 'main'),
    curveOf('paraxial', 'paraxialMm', 'short'),
  ];
  return {
    kind: 'curves',
    key,
    title,
    x: {
      label: 'wavelength',
      unit: 'nm',
      digits: 1,
      from: trains[0]?.wavelengthNm ?? 0,
      to: trains.at(-1)?.wavelengthNm ?? 1,
    },
    y: focusAxis(length, curves),
    curves,
    notes: [],
  };
}

/**
 * The trains of equal steps from the shortest to the longest line of the sketch, within which every index is known; while a hand moves, those of
 * the lines, which are there already.
 */
function trainsOf({ sketch, setting, setup, quality }: Source): readonly TrainAt[] {
  const lines = [...setup.lines].sort((a, b) => a.wavelengthNm - b.wavelengthNm);
  if (quality === 'coarse') return lines.map(({ wavelengthNm, train }) => ({ wavelengthNm, train }));
  const [low, high] = [lines[0]?.wavelengthNm ?? 0, lines.at(-1)?.wavelengthNm ?? 0];
  return Array.from({ length: WAVELENGTHS }, (_, i) => {
    const wavelengthNm = low + ((high - low) * i) / (WAVELENGTHS - 1);
    return { wavelengthNm, train: trainOf(inWavelength(sketch, wavelengthNm), setting, 'fourth') };
  });
}

/** The sketch with this wavelength as its fourth line. */
const inWavelength = (sketch: Sketch, wavelengthNm: number): Sketch => ({
  ...sketch,
  lines: { ...sketch.lines, more: [{ wavelengthNm, weight: 0 }] },
});

function lateralPlot(source: Source): Plot {
  const [key, title] = ['lateral colour', 'Lateral colour'];
  const [main, ...others] = source.sweeps();
  const found = main && lateralColour(main, others);
  if (!found?.ok) return emptyPlot(key, title, sentenceOf(found ? found.why : 'ray lost'));
  const curves = found.value.map((curve) => lineCurve(source.setup, 'ink', curve, MICRO));
  return {
    kind: 'curves',
    key,
    title,
    x: OVER_FIELD,
    y: evenAxis('height less that of main', 'µm', 2, reachOf(curves), 0.1),
    curves,
    notes: lostNote(Math.max(0, ...found.value.map(({ lost }) => lost))),
  };
}
