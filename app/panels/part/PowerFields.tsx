import type { PartId } from '../../../engine/index.ts';
import { setFocalLength } from '../../../engine/index.ts';
import { SketchNumber } from '../SketchNumber.tsx';
import { readThin } from './partReading.ts';

/** Focal length and power of a thin part: one number, edited either way. Power is shown per metre. */
export function PowerFields({ id }: { readonly id: PartId }) {
  return (
    <>
      <SketchNumber
        label="Focal length"
        unit="length"
        read={readThin(id, (part) => part.focalLengthMm)}
        edit={(value) => (sketch) => setFocalLength(sketch, id, value)}
      />
      <SketchNumber
        label="Power"
        unit="1/m"
        digits={4}
        read={readThin(id, (part) => 1000 / part.focalLengthMm)}
        edit={(value) => (sketch) => setFocalLength(sketch, id, 1000 / value)}
      />
    </>
  );
}
