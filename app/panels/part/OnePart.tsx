import type { PartId } from '../../../engine/index.ts';
import { renamePart, setNote, untie } from '../../../engine/index.ts';
import { useReadingNow } from '../../live/reading.ts';
import { applyEdit } from '../../store/sketchStore.ts';
import { TextField } from '../../ui/TextField.tsx';
import { CommandRow } from '../CommandButton.tsx';
import { tryEdit } from '../edit.ts';
import { partName } from '../names.ts';
import type { Commands } from '../useCommand.ts';
import { GlassFields } from './GlassFields.tsx';
import { GlassPartFields } from './GlassPartFields.tsx';
import { LightThrough } from './LightThrough.tsx';
import { PlaceFields } from './PlaceFields.tsx';
import { PlateFields } from './PlateFields.tsx';
import { PowerFields } from './PowerFields.tsx';
import { partIn } from './partReading.ts';
import { RimField } from './RimField.tsx';
import { StopFields } from './StopFields.tsx';

interface OnePartProps {
  readonly id: PartId;
  readonly commands: Commands;
}

/** Everything about one selected part. */
export function OnePart({ id, commands }: OnePartProps) {
  const kind = useReadingNow((reading) => partIn(reading, id)?.kind);
  return (
    <>
      <PartHead id={id} />
      {kind === 'thin' && <PowerFields id={id} />}
      {kind === 'plate' && <PlateFields id={id} />}
      {kind === 'glass' && <GlassPartFields id={id} commands={commands} />}
      <PlaceFields id={id} />
      <RimField id={id} />
      <StopFields id={id} />
      {kind === 'thin' && <GlassFields id={id} commands={commands} />}
      <LightThrough id={id} />
      <PartTexts id={id} />
      <TiedIn id={id} />
      <CommandRow commands={commands} row={kind === 'thin' ? [FLIP_SIGN, ...ACTIONS] : ACTIONS} />
      <CommandRow commands={commands} row={ORDER} />
    </>
  );
}

const FLIP_SIGN = ['flipSign', 'Flip sign'] as const;
const ACTIONS = [
  ['duplicate', 'Duplicate'],
  ['delete', 'Delete'],
] as const;
const ORDER = [
  ['earlier', 'One place left'],
  ['later', 'One place right'],
] as const;

const KIND_WORDS = { thin: 'thin element', stop: 'stop', plate: 'flat plate', glass: 'glass' } as const;

function PartHead({ id }: { readonly id: PartId }) {
  const name = useReadingNow(({ sketch }) => partName(sketch, id));
  const kind = useReadingNow((reading) => {
    const part = partIn(reading, id);
    if (part?.kind !== 'thin') return part ? KIND_WORDS[part.kind] : '';
    return part.focalLengthMm > 0 ? 'positive, thin' : 'negative, thin';
  });
  return (
    <div className="card-head">
      <h2 className="panel-title" title={name}>
        {name}
      </h2>
      <span className="card-kind">{kind}</span>
    </div>
  );
}

function PartTexts({ id }: { readonly id: PartId }) {
  const name = useReadingNow((reading) => partIn(reading, id)?.name ?? '');
  const note = useReadingNow((reading) => partIn(reading, id)?.note ?? '');
  return (
    <>
      <TextField
        label="Name"
        value={name}
        onCommit={(text) => tryEdit((sketch) => renamePart(sketch, id, text.trim()))}
      />
      <TextField
        label="Note"
        value={note}
        multiline
        onCommit={(text) => tryEdit((sketch) => setNote(sketch, id, text))}
      />
    </>
  );
}

function TiedIn({ id }: { readonly id: PartId }) {
  const group = useReadingNow(({ sketch }) => sketch.groups.find(({ partIds }) => partIds.includes(id)));
  if (!group) return null;
  return (
    <p className="card-line">
      Tied in “{group.name}”, moves with it.{' '}
      <button
        type="button"
        className="card-link"
        onClick={() => applyEdit((sketch) => untie(sketch, group.id))}
      >
        Untie
      </button>
    </p>
  );
}
