import type { PartId, ThinPart } from '../../../engine/index.ts';
import { setAbbeNumber, setIndex, setMaterial, setRoom, setShapeFactor } from '../../../engine/index.ts';
import type { Reading } from '../../live/reading.ts';
import { useReadingNow } from '../../live/reading.ts';
import { formatNumber } from '../../ui/format.ts';
import { CommandRow } from '../CommandButton.tsx';
import { MaterialField } from '../glass/MaterialField.tsx';
import { SketchNumber } from '../SketchNumber.tsx';
import type { Commands } from '../useCommand.ts';
import { partIn, readThin } from './partReading.ts';
import { ThickenForm } from './ThickenForm.tsx';

interface GlassFieldsProps {
  readonly id: PartId;
  readonly commands: Commands;
}

/** What is assumed of the glass that a thin part will become, and the room kept for it. */
export function GlassFields({ id, commands }: GlassFieldsProps) {
  const hasGlass = useReadingNow((reading) => readGlassOf(reading, id) !== null);
  const thickening = useReadingNow((reading) =>
    reading.view.thickening === id ? thinIn(reading, id) : null,
  );
  return (
    <>
      <MaterialField
        label="Glass"
        read={(reading) => readGlassOf(reading, id)}
        edit={(material) => (sketch) => setMaterial(sketch, id, material)}
        instead={{ value: null, words: 'none chosen' }}
      />
      {!hasGlass && <AssumedFields id={id} />}
      <SketchNumber
        label="Bending"
        unit=""
        digits={3}
        read={readThin(id, (part) => part.shapeFactor)}
        edit={(value) => (sketch) => setShapeFactor(sketch, id, value)}
        empty={{ words: 'not chosen', edit: (sketch) => setShapeFactor(sketch, id, null) }}
        title="Shape factor (R2 + R1)/(R2 − R1) meant for the glass: 0 equi-convex, 1 flat behind, −1 flat in front"
      />
      <RoomFields id={id} />
      {thickening ? (
        <ThickenForm key={id} part={thickening} />
      ) : (
        <CommandRow commands={commands} row={COMMANDS} />
      )}
    </>
  );
}

const COMMANDS = [
  ['thicken', 'Thicken…'],
  ['bendLeastSpherical', 'Bend: least spherical'],
  ['bendZeroComa', 'Bend: zero coma'],
] as const;

const thinIn = (reading: Reading, id: PartId): ThinPart | null => {
  const part = partIn(reading, id);
  return part?.kind === 'thin' ? part : null;
};

const readGlassOf = (reading: Reading, id: PartId) => thinIn(reading, id)?.material ?? null;

/** Without a glass: what colour and the Petzval sum go by. */
function AssumedFields({ id }: { readonly id: PartId }) {
  const assumed = useReadingNow(({ sketch }) => formatNumber(sketch.assumedIndex, 4));
  return (
    <>
      <SketchNumber
        label="Abbe number"
        unit=""
        digits={2}
        step={1}
        read={readThin(id, (part) => part.abbeNumber)}
        edit={(value) => (sketch) => setAbbeNumber(sketch, id, value)}
        empty={{ words: 'unknown', edit: (sketch) => setAbbeNumber(sketch, id, null) }}
      />
      <SketchNumber
        label="Assumed index"
        unit=""
        digits={4}
        step={0.01}
        read={readThin(id, (part) => part.index)}
        edit={(value) => (sketch) => setIndex(sketch, id, value)}
        empty={{ words: assumed, edit: (sketch) => setIndex(sketch, id, null) }}
      />
    </>
  );
}

function RoomFields({ id }: { readonly id: PartId }) {
  return (
    <>
      <SketchNumber
        label="Room in front"
        unit="length"
        read={readThin(id, (part) => part.roomFrontMm)}
        edit={(value) => (sketch) => setRoom(sketch, id, 'front', value)}
      />
      <SketchNumber
        label="Room behind"
        unit="length"
        read={readThin(id, (part) => part.roomBehindMm)}
        edit={(value) => (sketch) => setRoom(sketch, id, 'behind', value)}
      />
    </>
  );
}
