import { scaleSketch, scaleToFocalLength } from '../../../engine/index.ts';
import { useReading } from '../../live/reading.ts';
import { SketchNumber } from '../SketchNumber.tsx';
import { ScaleFactorField } from './ScaleFactorField.tsx';

/** The whole sketch by a factor, or to a focal length. */
export function ScaleFields() {
  const absence = useReading(({ analysis: { firstOrder } }) =>
    firstOrder.focalLengthMm.ok ? '' : firstOrder.focalLengthMm.why,
  );
  return (
    <>
      <ScaleFactorField label="Scale by" edit={(factor) => (sketch) => scaleSketch(sketch, factor)} />
      {absence === '' && (
        <SketchNumber
          label="To focal length"
          unit="length"
          read={({ analysis: { firstOrder } }) =>
            firstOrder.focalLengthMm.ok ? firstOrder.focalLengthMm.value : null
          }
          edit={(value, { analysis: { firstOrder } }) =>
            (sketch) =>
              firstOrder.focalLengthMm.ok
                ? scaleToFocalLength(sketch, firstOrder.focalLengthMm.value, value)
                : sketch
            }
          hint="of this position; sensor and mount keep their size"
        />
      )}
    </>
  );
}
