import type { WavefrontFans } from '../../../engine/index.ts';
import { sentenceOf, wavefrontFans } from '../../../engine/index.ts';
import { overStop, type Values } from '../curves.ts';
import { emptyPlot, type Plot } from '../plot.ts';
import { alike } from '../scale.ts';
import { drawnFractions, type Source } from '../source.ts';
import { fieldInk, fieldName } from '../words.ts';

const WAVES: Values = { label: 'wavefront', unit: 'waves', digits: 3, factor: 1, least: 0.01 };

/** Wavefront errors over the stop, along the meridian and across it for each field; where there is none across it, that is said once. */
export function wavefrontPlots(source: Source): readonly Plot[] {
  const fractions = drawnFractions(source.sketch);
  let across: WavefrontFans['sagittal'] | null = null;
  const plots = source.fields().flatMap((field, index): Plot[] => {
    const ink = fieldInk(fractions, index);
    const name = fieldName(field.fraction);
    const fans = wavefrontFans(field);
    if (!fans.ok) return [emptyPlot(`wavefront ${index}`, `Wavefront, ${name}`, sentenceOf(fans.why))];
    const { tangential, sagittal } = fans.value;
    across = sagittal;
    const along = overStop(
      field,
      `tangential wavefront ${index}`,
      `Tangential, ${name}`,
      tangential,
      ink,
      WAVES,
    );
    if (!sagittal.ok) return [along];
    return [
      along,
      overStop(field, `sagittal wavefront ${index}`, `Sagittal, ${name}`, sagittal.value, ink, WAVES),
    ];
  });
  const missing = across as WavefrontFans['sagittal'] | null;
  return alike(
    missing && !missing.ok
      ? [...plots, emptyPlot('sagittal wavefront', 'Sagittal', sentenceOf(missing.why))]
      : plots,
  );
}
