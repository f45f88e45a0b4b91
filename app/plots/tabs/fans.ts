import { rayFans, sentenceOf } from '../../../engine/index.ts';
import { overStop, type Values } from '../curves.ts';
import { emptyPlot, type Plot } from '../plot.ts';
import { alike } from '../scale.ts';
import { drawnFractions, type Source } from '../source.ts';
import { fieldInk, fieldName } from '../words.ts';

/** Below the least reach the errors of an ideal layout are rounding. */
const ERRORS: Values = { label: 'error', unit: 'µm', digits: 2, factor: 1000, least: 0.1 };

/** Transverse ray errors over the stop, two plots for each field: along the meridian and across it. */
export function fanPlots(source: Source): readonly Plot[] {
  const fractions = drawnFractions(source.sketch);
  return alike(
    source.fields().flatMap((field, index) => {
      const ink = fieldInk(fractions, index);
      const name = fieldName(field.fraction);
      const fans = rayFans(field);
      if (!fans.ok) return [emptyPlot(`fan ${index}`, `Ray fans, ${name}`, sentenceOf(fans.why))];
      return [
        overStop(field, `tangential fan ${index}`, `Tangential, ${name}`, fans.value.tangential, ink, ERRORS),
        overStop(field, `sagittal fan ${index}`, `Sagittal, ${name}`, fans.value.sagittal, ink, ERRORS),
      ];
    }),
  );
}
