import { useState } from 'react';
import type { PartId, Quantity } from '../../../engine/index.ts';
import { isZeroPower, none, scaleParts, some, systemMatrix, tieParts } from '../../../engine/index.ts';
import type { Reading } from '../../live/reading.ts';
import { useReadingNow } from '../../live/reading.ts';
import { TextField } from '../../ui/TextField.tsx';
import { CommandRow } from '../CommandButton.tsx';
import { tryEdit } from '../edit.ts';
import { partName } from '../names.ts';
import { orWhy, SketchNumber } from '../SketchNumber.tsx';
import { KEEPS_SIGN, ScaleFactorField } from '../sketch/ScaleFactorField.tsx';
import type { Commands } from '../useCommand.ts';

const ACTIONS = [
  ['untie', 'Untie'],
  ['flip', 'Flip'],
  ['duplicate', 'Duplicate'],
  ['delete', 'Delete'],
] as const;

interface SeveralPartsProps {
  readonly ids: readonly PartId[];
  readonly commands: Commands;
}

/** What can be done to several selected parts at once. */
export function SeveralParts({ ids, commands }: SeveralPartsProps) {
  const names = useReadingNow(({ sketch }) => ids.map((id) => partName(sketch, id)).join(', '));
  return (
    <>
      <h2 className="panel-title">{ids.length} parts</h2>
      <p className="card-line">{names}</p>
      <SketchNumber
        label="Focal length"
        unit="length"
        read={(reading) => orWhy(focalLengthTogether(reading, ids))}
        edit={(value, reading) => {
          const together = focalLengthTogether(reading, ids);
          if (!together.ok || value / together.value <= 0) return KEEPS_SIGN;
          return (sketch) => scaleParts(sketch, ids, value / together.value);
        }}
        hint="of the run from the first to the last of them; typing scales them"
      />
      <ScaleFactorField label="Scale by" edit={(factor) => (sketch) => scaleParts(sketch, ids, factor)} />
      <TieField ids={ids} />
      <CommandRow commands={commands} row={ACTIONS} />
    </>
  );
}

/** 1/power of the surfaces from the first to the last of the parts; absent when they have none together. */
function focalLengthTogether({ analysis: { train }, sketch }: Reading, ids: readonly PartId[]): Quantity {
  const surfaces = [...train.partOf.keys()].filter((surface) => {
    const part = sketch.parts[train.partOf[surface] ?? -1];
    return part !== undefined && ids.includes(part.id);
  });
  const first = surfaces[0];
  const last = surfaces.at(-1);
  if (first === undefined || last === undefined) return none('no parts');
  const matrix = systemMatrix(train, first, last + 1);
  return isZeroPower(matrix) ? none('afocal') : some(-1 / matrix.c);
}

function TieField({ ids }: { readonly ids: readonly PartId[] }) {
  const group = useReadingNow(({ sketch }) =>
    sketch.groups.find(({ partIds }) => ids.every((id) => partIds.includes(id))),
  );
  const [name, setName] = useState('group');
  const tie = (text: string) => tryEdit((sketch) => tieParts(sketch, ids, text.trim() || 'group'));
  if (group) return <TextField label="Tied as" value={group.name} onCommit={tie} />;
  return (
    <div className="card-tie">
      <TextField
        label="Tie as a group named"
        value={name}
        onCommit={(text) => {
          setName(text);
          return null;
        }}
      />
      <button type="button" className="text-button" onClick={() => tie(name)}>
        Tie
      </button>
    </div>
  );
}
