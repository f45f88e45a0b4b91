import type { FocusEvent, KeyboardEvent, ReactNode } from 'react';
import { useId, useLayoutEffect, useRef, useState } from 'react';
import type { EntryUnit } from './entry.ts';
import { formatEntry, fromBase, parseEntry, toBase } from './entry.ts';
import { Field } from './Field.tsx';
import { formatNumber } from './format.ts';
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
  readonly allowInfinity?: boolean;
  /** How far an arrow key or a button goes, in `unit`. */
  readonly step?: number;
  /** Makes the change; answers with one sentence when it is refused. */
  readonly onCommit: (value: number | null) => string | null;
  /** Shows the change while the arrow keys step; without it every step is committed. */
  readonly onPreview?: (value: number) => string | null;
  /** Puts back what was there before the first preview. */
  readonly onCancel?: () => void;
  readonly hint?: ReactNode;
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
  'm⁻¹': 1,
  '': 0.1,
};

/**
 * One number: type freely, Enter or leaving commits, Escape restores, arrows step (Shift and Page × 10, Alt ÷ 10). It opens
 * with all stored digits, and a text left as it was changes nothing.
 */
export function NumberField(props: NumberFieldProps) {
  const { label, value, unit, digits, whenEmpty, onCommit, onPreview, onCancel } = props;
  const id = useId();
  const input = useRef<HTMLInputElement>(null);
  const [editing, setEditing] = useState(false);
  const [draft, setDraft] = useState<string | null>(null);
  const [fault, setFault] = useState<string | null>(null);
  const previewed = useRef(false);
  const leaving = useRef(false);

  useLayoutEffect(() => {
    if (editing) input.current?.select();
  }, [editing]);

  const stored = value === null ? '' : formatEntry(value, unit);
  const quietText = value === null ? '' : formatNumber(fromBase(value, unit), digits);
  const text = editing ? (draft ?? stored) : quietText;

  /** Commits what stands in the field; false when it could not be. */
  const settle = (): boolean => {
    const typed = draft?.trim() ?? stored;
    setFault(null);
    if (previewed.current && value !== null && (draft === null || typed === stored)) {
      previewed.current = false;
      return answered(onCommit(value));
    }
    if (draft === null || typed === stored) return true;
    if (typed === '' && whenEmpty !== undefined) return answered(onCommit(null));
    const entry = parseEntry(typed, { unit, current: value, allowInfinity: props.allowInfinity ?? false });
    return answered(entry.ok ? onCommit(entry.value) : entry.why);
  };

  const answered = (sentence: string | null): boolean => {
    setFault(sentence);
    if (sentence === null) setDraft(null);
    return sentence === null;
  };

  const stepBy = (direction: 1 | -1, times: number) => {
    if (value === null || !Number.isFinite(value)) return;
    const step = toBase(props.step ?? STEPS[unit], unit);
    const next = Number((value + direction * step * times).toPrecision(15));
    setDraft(null);
    if (editing && onPreview) {
      previewed.current = true;
      setFault(onPreview(next));
    } else setFault(onCommit(next));
  };

  const onKeyDown = (event: KeyboardEvent) => {
    const up = event.key === 'ArrowUp' || event.key === 'PageUp';
    const down = event.key === 'ArrowDown' || event.key === 'PageDown';
    if (up || down) {
      event.preventDefault();
      const tenfold = event.shiftKey || event.key.startsWith('Page');
      stepBy(up ? 1 : -1, tenfold ? 10 : event.altKey ? 0.1 : 1);
    } else if (event.key === 'Enter') {
      event.preventDefault();
      if (settle()) requestAnimationFrame(() => input.current?.select());
    } else if (event.key === 'Escape' && (draft !== null || previewed.current || fault !== null)) {
      event.preventDefault();
      event.stopPropagation();
      if (previewed.current) onCancel?.();
      previewed.current = false;
      setDraft(null);
      setFault(null);
    } else if (event.key === 'Escape') {
      leaving.current = true;
      input.current?.blur();
    }
  };

  const onBlur = (_event: FocusEvent) => {
    if (!leaving.current) settle();
    leaving.current = false;
    previewed.current = false;
    setDraft(null);
    setEditing(false);
  };

  const kept = fault && value !== null ? ` It stays ${quietText}${unit === '' ? '' : ` ${unit}`}.` : '';

  return (
    <Field
      id={id}
      label={label}
      labelHidden={props.labelHidden ?? false}
      unit={unit}
      fault={fault && fault + kept}
      hint={props.hint}
      aside={
        <>
          {props.aside}
          {!props.disabled && value !== null && Number.isFinite(value) && (
            <StepButtons label={label} stepBy={stepBy} />
          )}
        </>
      }
    >
      <input
        ref={input}
        id={id}
        className="field-input field-number"
        type="text"
        inputMode="text"
        enterKeyHint="done"
        autoComplete="off"
        spellCheck={false}
        value={text}
        placeholder={whenEmpty}
        disabled={props.disabled}
        aria-invalid={fault !== null}
        aria-describedby={fault ? `${id}-fault` : props.hint ? `${id}-hint` : undefined}
        // biome-ignore lint/a11y/noAutofocus: placing a part opens its focal length, so that typing goes on there
        autoFocus={props.autoFocus}
        onFocus={() => {
          setEditing(true);
          setFault(null);
        }}
        onBlur={onBlur}
        onChange={(event) => setDraft(event.target.value)}
        onKeyDown={onKeyDown}
      />
    </Field>
  );
}

interface StepButtonsProps {
  readonly label: string;
  readonly stepBy: (direction: 1 | -1, times: number) => void;
}

/** The way to step without a keyboard; the arrow keys do the same, so the buttons are no tab stops. */
function StepButtons({ label, stepBy }: StepButtonsProps) {
  const button = (direction: 1 | -1, name: string, icon: 'plus' | 'minus') => (
    <button
      type="button"
      className="field-step"
      tabIndex={-1}
      aria-label={`${label}, ${name}`}
      onPointerDown={(event) => event.preventDefault()}
      onClick={(event) => stepBy(direction, event.shiftKey ? 10 : event.altKey ? 0.1 : 1)}
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
}
