import type { ReactNode } from 'react';
import { useMemo } from 'react';
import type { Edit, Quantity } from '../../engine/index.ts';
import { digitsIn } from '../../engine/index.ts';
import type { Reading } from '../live/reading.ts';
import { currentReading, useReadingNow } from '../live/reading.ts';
import { cancelEdit } from '../store/sketchStore.ts';
import type { EntryUnit } from '../ui/entry.ts';
import { NumberField } from '../ui/NumberField.tsx';
import { tryEdit, tryPreview } from './edit.ts';
import type { PerPositionEdits } from './perPosition.ts';
import { SplitMark } from './SplitMark.tsx';

/** A quantity as a field reads it: its value, or the reason why it has none. */
export const orWhy = (quantity: Quantity): number | string => (quantity.ok ? quantity.value : quantity.why);

interface SketchNumberProps {
  readonly label: string;
  /** The place already says the label, as in a table. */
  readonly labelHidden?: boolean;
  /** `length` is a length in the unit chosen for the screen. */
  readonly unit: EntryUnit | 'length';
  /** Decimals; of a millimetre where it is a length. */
  readonly digits?: number;
  /** A number, null where the sketch leaves it open, or the reason why there is none. */
  readonly read: (reading: Reading) => number | string | null;
  /** The edit that makes the change, `other` by the other rule of absorption; or one sentence on why there is none. */
  readonly edit: (value: number, reading: Reading, other: boolean) => Edit | string;
  /** What an emptied field means, and the edit it makes. */
  readonly empty?: { readonly words: string; readonly edit: Edit };
  readonly perPosition?: PerPositionEdits;
  readonly allowInfinity?: boolean;
  readonly step?: number;
  readonly hint?: ReactNode;
  readonly title?: string;
  readonly disabled?: boolean;
}

/** A number of the sketch in a field: every change goes through the store, and why one was refused stands below. */
export function SketchNumber(props: SketchNumberProps) {
  const { label, read, edit, empty, perPosition } = props;
  const shown = useReadingNow(read);
  const lengthUnit = useReadingNow(({ view }) => view.unit);
  const isBetween = useReadingNow(
    ({ sketch, setting }) => setting.toNext > 0 && perPosition !== undefined && !perPosition.isCommon(sketch),
  );
  const unit = props.unit === 'length' ? lengthUnit : props.unit;
  const digits = props.unit === 'length' ? digitsIn(lengthUnit, props.digits ?? 3) : (props.digits ?? 3);
  const change = (
    next: number | null,
    shift: boolean,
    make: (edit: Edit) => string | null,
  ): string | null => {
    const reading = currentReading();
    const asked = next === null ? empty?.edit : edit(next, reading, shift !== reading.view.otherRule);
    return typeof asked === 'string' ? asked : make(asked ?? ((sketch) => sketch));
  };
  // Kept, so that the mark renders only when it changes, not with every value.
  const aside = useMemo(
    () => perPosition && <SplitMark label={label} {...perPosition} />,
    [label, perPosition],
  );
  return (
    <NumberField
      label={label}
      {...(props.labelHidden && { labelHidden: true })}
      value={typeof shown === 'number' ? shown : null}
      {...(typeof shown === 'string' && { absence: shown })}
      unit={unit}
      digits={digits}
      {...(empty && { whenEmpty: empty.words })}
      {...(props.step !== undefined && { step: props.step })}
      allowInfinity={props.allowInfinity ?? false}
      disabled={(props.disabled ?? false) || isBetween}
      hint={isBetween ? 'between positions; add a position here to set it' : props.hint}
      title={props.title}
      aside={aside}
      onCommit={(next, shift) => change(next, shift, tryEdit)}
      onPreview={(next, shift) => change(next, shift, tryPreview)}
      onCancel={cancelEdit}
    />
  );
}
