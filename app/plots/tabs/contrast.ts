import { contrastOf, diffractionLimit, sentenceOf, spotSize } from '../../../engine/index.ts';
import type { CurveInk, CurveLine } from '../../board/styles.ts';
import { formatNumber } from '../../ui/format.ts';
import { OVER_FIELD } from '../curves.ts';
import { curveStyle, emptyPlot, type Plot, type PlotCurve } from '../plot.ts';
import type { Source } from '../source.ts';

const PER_CENT = 100;
/** An rms radius of so many periods spreads the traced rays too thin to tell a contrast near 0. */
const PERIODS = 2;

/** The curves of one plot: what of a contrast each shows, its colour and its dash. */
const CURVES = [
  { name: 'tangential', word: 'tangential', part: 'tangential', ink: 'ink', line: 'main' },
  { name: 'sagittal', word: 'sagittal', part: 'sagittal', ink: 'ink', line: 'short' },
  {
    name: 'tangential, diffraction alone',
    word: 'alone, tangential',
    part: 'tangentialLimit',
    ink: 'quiet',
    line: 'main',
  },
  {
    name: 'sagittal, diffraction alone',
    word: 'alone, sagittal',
    part: 'sagittalLimit',
    ink: 'quiet',
    line: 'short',
  },
] as const satisfies readonly { name: string; word: string; part: string; ink: CurveInk; line: CurveLine }[];

const FREQUENCIES = [
  { part: 'atNyquist', key: 'contrast at Nyquist', name: 'At Nyquist', share: 1 },
  { part: 'atHalfNyquist', key: 'contrast at half Nyquist', name: 'At half Nyquist', share: 0.5 },
] as const;

/** Contrast over the field at the sensor's Nyquist frequency and at half of it, from the spots, with what diffraction alone would leave. */
export function contrastPlots(source: Source): readonly Plot[] {
  const pitchMm = source.sketch.sensor?.pixelPitchMm ?? null;
  if (pitchMm === null) return [emptyPlot('contrast', 'Contrast', sentenceOf('no pixel pitch'))];
  const nyquistPerMm = 1 / (2 * pitchMm);
  const fields = source.sweepFields();
  const [main] = source.setup.lines;
  const values = fields.map((field) => {
    const landings = source.landings(field);
    const first = landings.ok ? landings.value[0] : undefined;
    if (!landings.ok || !first) return null;
    const limit = diffractionLimit(first.landing, field.bundles[0]?.index ?? 1, main.wavelengthNm);
    const contrast = contrastOf(landings.value, nyquistPerMm, limit);
    const size = spotSize(landings.value);
    const wide = size.ok && size.value.rmsMm * nyquistPerMm > PERIODS;
    return contrast.ok ? { share: field.fraction, contrast: contrast.value, wide } : null;
  });
  if (!source.setup.imagePlaneMm.ok)
    return [emptyPlot('contrast', 'Contrast', sentenceOf(source.setup.imagePlaneMm.why))];
  const known = values.filter((value) => value !== null);
  if (known.length === 0) return [emptyPlot('contrast', 'Contrast', sentenceOf('no ray through'))];
  const at = Float64Array.from(known, ({ share }) => share);
  const dark = values.length - known.length;
  return FREQUENCIES.map(({ part: frequency, key, name, share }): Plot => {
    const curves = CURVES.map(
      ({ name: curve, word, part, ink, line }): PlotCurve => ({
        name: curve,
        word,
        style: curveStyle(ink, line),
        x: at,
        y: Float64Array.from(known, ({ contrast }) => contrast[frequency][part] * PER_CENT),
      }),
    );
    return {
      kind: 'curves',
      key,
      title: `${name}, ${formatNumber(nyquistPerMm * share, 1)} line pairs per mm`,
      x: OVER_FIELD,
      y: { label: 'contrast', unit: '%', digits: 1, from: 0, to: 100 },
      curves,
      notes: [
        ...(dark === 0 ? [] : [`no light at ${dark} of ${values.length} fields`]),
        ...(known.some(({ wide }) => wide) ? ['spots wider than the pattern: only roughly'] : []),
      ],
    };
  });
}
