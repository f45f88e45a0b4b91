import type { PartId } from '../../../engine/index.ts';
import { setMaterial, setThickness } from '../../../engine/index.ts';
import { MaterialField } from '../glass/MaterialField.tsx';
import { SketchNumber } from '../SketchNumber.tsx';
import { partIn, readPlate } from './partReading.ts';

/** Thickness and material of a flat plate. */
export function PlateFields({ id }: { readonly id: PartId }) {
  return (
    <>
      <SketchNumber
        label="Thickness"
        unit="length"
        read={readPlate(id, (part) => part.thicknessMm)}
        edit={(value) => (sketch) => setThickness(sketch, id, value)}
      />
      <MaterialField
        label="Material"
        read={(reading) => {
          const part = partIn(reading, id);
          return part?.kind === 'plate' ? part.material : null;
        }}
        edit={(material) => (sketch) => setMaterial(sketch, id, material)}
      />
    </>
  );
}
