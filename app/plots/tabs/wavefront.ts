import { sentenceOf, wavefrontFans } from '../../../engine/index.ts';
import { emptyPlot, type Plot } from '../plot.ts';
import { alike } from '../scale.ts';
import { drawnFractions, type Source } from '../source.ts';
import { fieldInk, fieldName } from '../words.ts';
import { overStop, type Values } from './fans.ts';

const WAVES: Values = { label: 'wavefront', unit: 'waves', digits: 3, factor: 1, least: 0.01 };

/** Wavefront errors over the stop, two plots for each field; one where thin parts have no path across the meridian. */
export function wavefrontPlots(source: Source): readonly Plot[] {
  const fractions = drawnFractions(source.sketch);
  return alike(
    source.fields().flatMap((field, index) => {
      const ink = fieldInk(fractions, index);
      const name = fieldName(field.fraction);
      const fans = wavefrontFans(field);
      if (!fans.ok) return [emptyPlot(`wavefront ${index}`, `Wavefront, ${name}`, sentenceOf(fans.why))];
      const { tangential, sagittal } = fans.value;
      const keys = [`tangential wavefront ${index}`, `sagittal wavefront ${index}`] as const;
      return [
        overStop(field, keys[0], `Tangential, ${name}`, tangential, ink, WAVES),
        sagittal.ok
          ? overStop(field, keys[1], `Sagittal, ${name}`, sagittal.value, ink, WAVES)
          : emptyPlot(keys[1], `Sagittal, ${name}`, sentenceOf(sagittal.why)),
      ];
    }),
  );
}
