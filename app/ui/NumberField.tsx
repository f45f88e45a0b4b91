import type { KeyboardEvent, ReactNode, RefObject } from 'react';
import { memo, useId, useLayoutEffect, useRef, useState } from 'react';
import type { EntryUnit } from './entry.ts';
import { formatEntry, fromBase, parseEntry, toBase } from './entry.ts';
import { Field } from './Field.tsx';
import { formatNumber } from './format.ts';
import { isHistoryKey } from './historyKey.ts';
import { Icon } from './Icon.tsx';

export interface NumberFieldProps {
  readonly label: string;
  /** Stands in for the label on screen where the place already says it. */
  readonly labelHidden?: boolean;
  /** In the base unit of `unit`'s family; Infinity where allowed; null when there is no value. */
  readonly value: number | null;
  readonly unit: EntryUnit;
  /** Decimals shown while the field is not edited. */
  readonly digits: number;
  /** Shown in place of a value of null, such as "open". Given, an emptied field commits null. */
  readonly whenEmpty?: string;
  /** Why there is no value, shown in its place; unlike `whenEmpty` it is nothing that can be set. */
  readonly absence?: string;
  readonly allowInfinity?: boolean;
  /** How far an arrow key or a button goes, in `unit`. */
  readonly step?: number;
  /** Makes the change, with Shift by its other rule; answers with one sentence when it is refused. */
  readonly onCommit: (value: number | null, shift: boolean) => string | null;
  /** Shows the change while the arrow keys step; without it every step is committed. */
  readonly onPreview?: (value: number, shift: boolean) => string | null;
  /** Puts back what was there before the first preview. */
  readonly onCancel?: () => void;
  readonly hint?: ReactNode;
  /** What the tooltip says. */
  readonly title?: string | undefined;
  readonly aside?: ReactNode;
  readonly disabled?: boolean;
  readonly autoFocus?: boolean;
}

const STEPS: Readonly<Record<EntryUnit, number>> = {
  mm: 1,
  in: 0.05,
  µm: 0.1,
  nm: 1,
  '°': 0.5,
  '%': 5,
  '1/m': 1,
  '': 0.1,
};

/** How many steps a key goes. */
const KEY_STEPS: Readonly<Record<string, number>> = {
  ArrowUp: 1,
  ArrowDown: -1,
  PageUp: 10,
  PageDown: -10,
};

/** Goes so many steps from where the number stands. */
type StepBy = (steps: number, shift: boolean) => void;

/**
 * One number: type freely, Enter or leaving commits, Escape restores, arrows step (Page × 10, Alt ÷ 10). Shift with Enter or a
 * step is passed on. The field opens with all stored digits, and a text left as it was changes nothing.
 */
export function NumberField(props: NumberFieldProps) {
  const { label, value, unit, digits, whenEmpty, onCommit, onPreview, onCancel } = props;
  const id = useId();
  const input = useRef<HTMLInputElement>(null);
  const [editing, setEditing] = useState(false);
  const [draft, setDraft] = useState<string | null>(null);
  const [fault, setFault] = useState<string | null>(null);
  /** Where stepping by preview has got to; keys may come faster than the page renders. */
  const stepped = useRef<{ readonly value: number; readonly shift: boolean } | null>(null);
  const leaving = useRef(false);
  const pressed = useRef(false);

  const stored = value === null ? '' : formatEntry(value, unit);
  const untouched = draft === null || draft === stored;

  // What was not typed here is selected as a whole, so that typing replaces it.
  // biome-ignore lint/correctness/useExhaustiveDependencies: also when another number comes to stand in the field
  useLayoutEffect(() => {
    if (editing && draft === null) input.current?.select();
  }, [editing, draft, stored]);

  const quietText = value === null ? '' : formatNumber(fromBase(value, unit), digits);
  const text = editing ? (draft ?? stored) : quietText;

  /** Commits what stands in the field; false when it could not be. */
  const settle = (shift = false): boolean => {
    const typed = draft?.trim() ?? stored;
    setFault(null);
    const reached = stepped.current;
    if (reached !== null && (draft === null || typed === stored)) {
      stepped.current = null;
      return answered(onCommit(reached.value, shift || reached.shift));
    }
    if (draft === null || typed === stored) return true;
    if (typed === '' && whenEmpty !== undefined) return answered(onCommit(null, shift));
    const entry = parseEntry(typed, { unit, current: value, allowInfinity: props.allowInfinity ?? false });
    return answered(entry.ok ? onCommit(entry.value, shift) : entry.why);
  };

  const answered = (sentence: string | null): boolean => {
    setFault(sentence);
    if (sentence === null) setDraft(null);
    return sentence === null;
  };

  const stepBy: StepBy = (steps, shift) => {
    const from = stepped.current?.value ?? value;
    if (from === null || !Number.isFinite(from)) return;
    const step = toBase(props.step ?? STEPS[unit], unit);
    const next = Number((from + step * steps).toPrecision(15));
    const previews = editing && onPreview !== undefined;
    const refusal = previews ? onPreview(next, shift) : onCommit(next, shift);
    if (previews && refusal === null) stepped.current = { value: next, shift };
    setDraft(null);
    setFault(refusal);
  };

  const latestStep = useRef(stepBy);
  latestStep.current = stepBy;

  const onKeyDown = (event: KeyboardEvent) => {
    const steps = KEY_STEPS[event.key];
    const goesBack = untouched && isHistoryKey(event);
    const restores = event.key === 'Escape' && (draft !== null || stepped.current !== null || fault !== null);
    if (steps !== undefined) {
      event.preventDefault();
      stepBy(event.altKey ? steps / 10 : steps, event.shiftKey);
    } else if (event.key === 'Enter') {
      event.preventDefault();
      if (settle(event.shiftKey)) input.current?.select();
    } else if (restores || (goesBack && stepped.current !== null)) {
      event.preventDefault();
      event.stopPropagation();
      if (stepped.current !== null) onCancel?.();
      stepped.current = null;
      setDraft(null);
      setFault(null);
    } else if (goesBack) {
      setDraft(null);
    } else if (event.key === 'Escape') {
      leaving.current = true;
      input.current?.blur();
    }
  };

  const onBlur = () => {
    // A bad entry typed over a stepped value leaves the step as the last good one.
    if (!leaving.current && !settle() && stepped.current !== null)
      onCommit(stepped.current.value, stepped.current.shift);
    leaving.current = false;
    stepped.current = null;
    setDraft(null);
    setEditing(false);
  };

  const kept = fault && value !== null ? ` It stays ${quietText}${unit === '' ? '' : ` ${unit}`}.` : '';

  return (
    <Field
      id={id}
      label={label}
      labelHidden={props.labelHidden ?? false}
      unit={editing || Number.isFinite(value) ? unit : ''}
      fault={fault && fault + kept}
      hint={props.hint}
      aside={props.aside}
    >
      <input
        ref={input}
        id={id}
        className={`field-input field-number${value === null && props.absence ? ' field-number-absent' : ''}`}
        type="text"
        inputMode="text"
        enterKeyHint="done"
        autoComplete="off"
        spellCheck={false}
        value={text}
        title={props.title}
        data-untouched={untouched || undefined}
        placeholder={whenEmpty ?? props.absence}
        disabled={props.disabled}
        aria-invalid={fault !== null}
        aria-describedby={fault ? `${id}-fault` : props.hint ? `${id}-hint` : undefined}
        // biome-ignore lint/a11y/noAutofocus: placing a part opens its focal length, so that typing goes on there
        autoFocus={props.autoFocus}
        onFocus={() => {
          setEditing(true);
          setFault(null);
        }}
        onPointerDown={() => {
          pressed.current = !editing;
        }}
        // The press that opens the field would set a caret and undo the selection when it is released.
        onMouseUp={(event) => {
          if (pressed.current) {
            event.preventDefault();
            event.currentTarget.select();
          }
          pressed.current = false;
        }}
        onBlur={onBlur}
        onChange={(event) => setDraft(event.target.value)}
        onKeyDown={onKeyDown}
      />
      {!props.disabled && value !== null && Number.isFinite(value) && (
        <StepButtons labelId={`${id}-label`} stepBy={latestStep} />
      )}
    </Field>
  );
}

interface StepButtonsProps {
  readonly labelId: string;
  /** By reference, so that the buttons stay as they are while the number beside them changes. */
  readonly stepBy: RefObject<StepBy>;
}

/** The way to step without a keyboard; the arrow keys do the same, so the buttons are no tab stops. */
const StepButtons = memo(function StepButtons({ labelId, stepBy }: StepButtonsProps) {
  const button = (direction: 1 | -1, name: string, icon: 'plus' | 'minus') => (
    <button
      type="button"
      className="field-step"
      tabIndex={-1}
      aria-label={name}
      aria-describedby={labelId}
      onPointerDown={(event) => event.preventDefault()}
      onClick={(event) => stepBy.current(event.altKey ? direction / 10 : direction, event.shiftKey)}
    >
      <Icon name={icon} />
    </button>
  );
  return (
    <span className="field-steps">
      {button(-1, 'less', 'minus')}
      {button(1, 'more', 'plus')}
    </span>
  );
});
