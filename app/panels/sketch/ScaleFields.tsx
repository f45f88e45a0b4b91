import { scaleSketch, scaleToFocalLength } from '../../../engine/index.ts';
import { useReadingNow } from '../../live/reading.ts';
import { orWhy, SketchNumber } from '../SketchNumber.tsx';
import { KEEPS_SIGN, ScaleFactorField } from './ScaleFactorField.tsx';

/** The whole sketch by a factor, or to a focal length. */
export function ScaleFields() {
  const absence = useReadingNow(({ analysis: { firstOrder } }) =>
    firstOrder.focalLengthMm.ok ? '' : firstOrder.focalLengthMm.why,
  );
  return (
    <>
      <ScaleFactorField label="Scale by" edit={(factor) => (sketch) => scaleSketch(sketch, factor)} />
      {absence === '' && (
        <SketchNumber
          label="To focal length"
          unit="length"
          read={({ analysis }) => orWhy(analysis.firstOrder.focalLengthMm)}
          edit={(value, { analysis: { firstOrder } }) => {
            const present = firstOrder.focalLengthMm;
            if (!present.ok || value / present.value <= 0) return KEEPS_SIGN;
            return (sketch) => scaleToFocalLength(sketch, present.value, value);
          }}
          hint="of this position; sensor and mount keep their size"
        />
      )}
    </>
  );
}
