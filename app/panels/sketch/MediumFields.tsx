import type { Edit, FixedMedium, Medium, PartId, Sketch } from '../../../engine/index.ts';
import { mediumName, setMedium } from '../../../engine/index.ts';
import type { Reading } from '../../live/reading.ts';
import { useReadingNow } from '../../live/reading.ts';
import { Select } from '../../ui/choices.tsx';
import { TextField } from '../../ui/TextField.tsx';
import { tryEdit } from '../edit.ts';
import { SketchNumber } from '../SketchNumber.tsx';

interface MediumFieldsProps {
  readonly label: string;
  /** Behind a part, or in object space. */
  readonly where: PartId | 'object';
}

const WATER: FixedMedium = { name: 'water', index: 1.333, abbeNumber: 55.8 };

/** Air, or a medium given by its index. */
export function MediumFields({ label, where }: MediumFieldsProps) {
  const medium = useReadingNow((reading) => mediumOf(reading.sketch, where));
  return (
    <>
      <Select
        label={label}
        value={medium === 'air' ? 'air' : 'other'}
        choices={[
          { value: 'air', label: 'air' },
          { value: 'other', label: medium === 'air' ? 'another…' : mediumName(medium) || 'unnamed' },
        ]}
        onChoose={(chosen) => tryEdit((sketch) => setMedium(sketch, where, chosen === 'air' ? 'air' : WATER))}
      />
      {medium !== 'air' && <OtherMedium where={where} name={mediumName(medium)} />}
    </>
  );
}

function OtherMedium({ where, name }: { readonly where: PartId | 'object'; readonly name: string }) {
  const withChange =
    (change: Partial<FixedMedium>): Edit =>
    (sketch) => {
      const medium = mediumOf(sketch, where);
      return medium === 'air' || !('index' in medium)
        ? sketch
        : setMedium(sketch, where, { ...medium, ...change });
    };
  const read = (pick: (medium: FixedMedium) => number | null) => (reading: Reading) => {
    const medium = mediumOf(reading.sketch, where);
    return medium === 'air' || !('index' in medium) ? null : pick(medium);
  };
  return (
    <>
      <SketchNumber
        label="Its index"
        unit=""
        digits={5}
        step={0.01}
        read={read(({ index }) => index)}
        edit={(value) => withChange({ index: value })}
      />
      <SketchNumber
        label="Its Abbe number"
        unit=""
        digits={2}
        step={1}
        read={read(({ abbeNumber }) => abbeNumber)}
        edit={(value) => withChange({ abbeNumber: value })}
        empty={{ words: 'unknown', edit: withChange({ abbeNumber: null }) }}
      />
      <TextField
        label="Its name"
        value={name}
        onCommit={(text) => tryEdit(withChange({ name: text.trim() }))}
      />
    </>
  );
}

function mediumOf(sketch: Sketch, where: PartId | 'object'): Medium {
  if (where === 'object') return sketch.object.medium;
  return sketch.parts.find(({ id }) => id === where)?.space.medium ?? 'air';
}
