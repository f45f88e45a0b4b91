import type { Edit, FixedMedium, PartId } from '../../../engine/index.ts';
import { mediumName, setMaterial, setThickness } from '../../../engine/index.ts';
import { useReadingNow } from '../../live/reading.ts';
import { TextField } from '../../ui/TextField.tsx';
import { tryEdit } from '../edit.ts';
import { SketchNumber } from '../SketchNumber.tsx';
import { partIn, readPlate } from './partReading.ts';

/** Thickness and material of a flat plate. */
export function PlateFields({ id }: { readonly id: PartId }) {
  const name = useReadingNow((reading) => {
    const part = partIn(reading, id);
    return part?.kind === 'plate' ? mediumName(part.material) : '';
  });
  const withMaterial =
    (change: Partial<FixedMedium>): Edit =>
    (sketch) => {
      const part = sketch.parts.find((other) => other.id === id);
      return part?.kind === 'plate' && 'index' in part.material
        ? setMaterial(sketch, id, { ...part.material, ...change })
        : sketch;
    };
  return (
    <>
      <SketchNumber
        label="Thickness"
        unit="length"
        read={readPlate(id, (part) => part.thicknessMm)}
        edit={(value) => (sketch) => setThickness(sketch, id, value)}
      />
      <SketchNumber
        label="Index"
        unit=""
        digits={5}
        step={0.01}
        read={readPlate(id, ({ material }) => ('index' in material ? material.index : null))}
        edit={(value) => withMaterial({ index: value })}
      />
      <SketchNumber
        label="Abbe number"
        unit=""
        digits={2}
        step={1}
        read={readPlate(id, ({ material }) => ('index' in material ? material.abbeNumber : null))}
        edit={(value) => withMaterial({ abbeNumber: value })}
        empty={{ words: 'unknown', edit: withMaterial({ abbeNumber: null }) }}
      />
      <TextField
        label="Material"
        value={name}
        onCommit={(text) => tryEdit(withMaterial({ name: text.trim() }))}
      />
    </>
  );
}
