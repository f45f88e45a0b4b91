import type { ReactNode } from 'react';
import { useMemo } from 'react';
import type { Edit } from '../../engine/index.ts';
import type { Reading } from '../live/reading.ts';
import { currentReading, useReading } from '../live/reading.ts';
import { cancelEdit } from '../store/sketchStore.ts';
import type { EntryUnit } from '../ui/entry.ts';
import { NumberField } from '../ui/NumberField.tsx';
import { tryEdit, tryPreview } from './edit.ts';
import type { PerPositionEdits } from './perPosition.ts';
import { SplitMark } from './SplitMark.tsx';

interface SketchNumberProps {
  readonly label: string;
  /** `length` is a length in the unit chosen for the screen. */
  readonly unit: EntryUnit | 'length';
  /** Decimals; of a millimetre where it is a length. */
  readonly digits?: number;
  readonly read: (reading: Reading) => number | null;
  readonly edit: (value: number, reading: Reading) => Edit;
  /** What an emptied field means, and the edit it makes. */
  readonly empty?: { readonly words: string; readonly edit: Edit };
  readonly perPosition?: PerPositionEdits;
  readonly allowInfinity?: boolean;
  readonly step?: number;
  readonly hint?: ReactNode;
  readonly disabled?: boolean;
}

/** A number of the sketch in a field: every change goes through the store, and why one was refused stands below. */
export function SketchNumber(props: SketchNumberProps) {
  const { label, read, edit, empty, perPosition } = props;
  const value = useReading(read);
  const lengthUnit = useReading(({ view }) => view.unit);
  const isBetween = useReading(
    ({ sketch, setting }) => setting.toNext > 0 && perPosition !== undefined && !perPosition.isCommon(sketch),
  );
  const unit = props.unit === 'length' ? lengthUnit : props.unit;
  const digits = (props.digits ?? 3) + (props.unit === 'length' && unit === 'in' ? 2 : 0);
  const editFor = (next: number | null): Edit =>
    next === null ? (empty?.edit ?? ((sketch) => sketch)) : edit(next, currentReading());
  // Kept, so that the mark renders only when it changes, not with every value.
  const aside = useMemo(
    () => perPosition && <SplitMark label={label} {...perPosition} />,
    [label, perPosition],
  );
  return (
    <NumberField
      label={label}
      value={value}
      unit={unit}
      digits={digits}
      {...(empty && { whenEmpty: empty.words })}
      {...(props.step !== undefined && { step: props.step })}
      allowInfinity={props.allowInfinity ?? false}
      disabled={(props.disabled ?? false) || isBetween}
      hint={isBetween ? 'between positions; add a position here to set it' : props.hint}
      aside={aside}
      onCommit={(next) => tryEdit(editFor(next))}
      onPreview={(next) => tryPreview(editFor(next))}
      onCancel={cancelEdit}
    />
  );
}
