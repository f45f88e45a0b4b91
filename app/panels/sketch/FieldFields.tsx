import { setField, setFractions, setVignetting } from '../../../engine/index.ts';
import { currentReading, useReading, useReadingNow } from '../../live/reading.ts';
import { Select } from '../../ui/choices.tsx';
import { parseEntry } from '../../ui/entry.ts';
import { TextField } from '../../ui/TextField.tsx';
import { tryEdit } from '../edit.ts';
import { SketchNumber } from '../SketchNumber.tsx';
import { FIELD_CHOICES, FIELD_VALUE, fieldOfKind, fieldValue, withFieldValue } from './apertureKinds.ts';

/** How large the field is, which fields are drawn, and what may be lost at its edge. */
export function FieldFields() {
  const kind = useReadingNow(({ sketch }) => sketch.field.size.kind);
  const trouble = useReading(({ analysis }) => (analysis.rays.chief.ok ? '' : analysis.rays.chief.why));
  return (
    <>
      <Select
        label="Field by"
        value={kind}
        choices={FIELD_CHOICES}
        onChoose={(chosen) => {
          const size = fieldOfKind(chosen, currentReading().analysis);
          tryEdit((sketch) => (chosen === sketch.field.size.kind ? sketch : setField(sketch, size)));
        }}
        hint={trouble === '' ? undefined : `no chief ray: ${trouble}`}
      />
      <FieldValue />
      <Fractions />
      <SketchNumber
        label="Vignetting"
        unit="%"
        digits={0}
        read={({ sketch }) => sketch.field.vignetting}
        edit={(value) => (sketch) => setVignetting(sketch, value)}
        hint="share of the bundle’s height that may be lost at the edge"
      />
    </>
  );
}

function FieldValue() {
  const kind = useReadingNow(({ sketch }) => sketch.field.size.kind);
  return (
    <SketchNumber
      key={kind}
      {...FIELD_VALUE[kind]}
      read={({ sketch }) => fieldValue(sketch.field.size)}
      edit={(value) => (sketch) => setField(sketch, withFieldValue(sketch.field.size, value))}
    />
  );
}

function Fractions() {
  const text = useReadingNow(({ sketch }) => sketch.field.fractions.join(' '));
  const commit = (typed: string): string | null => {
    const entries = typed
      .split(/[\s;]+|,\s+/)
      .filter((word) => word !== '')
      .map((word) => parseEntry(word.replace(/,$/, ''), { unit: '', current: null }));
    const bad = entries.find((entry) => !entry.ok);
    if (bad && !bad.ok) return bad.why;
    return tryEdit((sketch) =>
      setFractions(
        sketch,
        entries.flatMap((entry) => (entry.ok ? [entry.value] : [])),
      ),
    );
  };
  return <TextField label="Fields drawn, as shares from −1 to 1" value={text} onCommit={commit} />;
}
