import type { ReactNode } from 'react';
import { useId } from 'react';
import { Field } from './Field.tsx';
import './controls.css';

/** One choice: the value kept, and what the screen says. */
export interface Choice<Value extends string> {
  readonly value: Value;
  readonly label: string;
}

interface ChoiceProps<Value extends string> {
  readonly label: string;
  readonly value: Value;
  readonly choices: readonly Choice<Value>[];
  readonly onChoose: (value: Value) => void;
  readonly hint?: ReactNode;
}

/** One of several in a row with a label; the browser's own list. */
export function Select<Value extends string>({ label, value, choices, onChoose, hint }: ChoiceProps<Value>) {
  const id = useId();
  return (
    <Field id={id} label={label} hint={hint}>
      <select
        id={id}
        className="field-input field-select"
        value={value}
        aria-describedby={hint ? `${id}-hint` : undefined}
        onChange={(event) => {
          const chosen = choices.find((choice) => choice.value === event.target.value);
          if (chosen) onChoose(chosen.value);
        }}
      >
        {choices.map((choice) => (
          <option key={choice.value} value={choice.value}>
            {choice.label}
          </option>
        ))}
      </select>
    </Field>
  );
}

/** One of a few, all in view. */
export function Segmented<Value extends string>({ label, value, choices, onChoose }: ChoiceProps<Value>) {
  const name = useId();
  return (
    <fieldset className="segmented">
      <legend className="segmented-label">{label}</legend>
      <div className="segmented-row">
        {choices.map((choice) => (
          <label key={choice.value} className="segmented-choice">
            <input
              type="radio"
              name={name}
              value={choice.value}
              checked={choice.value === value}
              onChange={() => onChoose(choice.value)}
            />
            <span>{choice.label}</span>
          </label>
        ))}
      </div>
    </fieldset>
  );
}

interface CheckboxProps {
  readonly label: ReactNode;
  readonly checked: boolean;
  readonly onChange: (checked: boolean) => void;
}

/** On or off. */
export function Checkbox({ label, checked, onChange }: CheckboxProps) {
  return (
    <label className="checkbox">
      <input type="checkbox" checked={checked} onChange={(event) => onChange(event.target.checked)} />
      <span>{label}</span>
    </label>
  );
}
