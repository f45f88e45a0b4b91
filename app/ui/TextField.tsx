import type { KeyboardEvent } from 'react';
import { useId, useState } from 'react';
import { Field } from './Field.tsx';
import { isHistoryKey } from './historyKey.ts';

interface TextFieldProps {
  readonly label: string;
  readonly labelHidden?: boolean;
  readonly value: string;
  readonly placeholder?: string;
  /** Several lines; Enter then starts a new one, and leaving commits. */
  readonly multiline?: boolean;
  /** Makes the change; answers with one sentence when it is refused. */
  readonly onCommit: (value: string) => string | null;
}

/** A text: Enter or leaving commits, Escape restores, a text left as it was changes nothing. */
export function TextField(props: TextFieldProps) {
  const { label, labelHidden = false, value, placeholder, multiline = false, onCommit } = props;
  const id = useId();
  const [draft, setDraft] = useState<string | null>(null);
  const [fault, setFault] = useState<string | null>(null);

  const untouched = draft === null || draft === value;

  const settle = () => {
    const refused = untouched ? null : onCommit(draft);
    setFault(refused);
    setDraft(null);
  };

  const onKeyDown = (event: KeyboardEvent) => {
    if (event.key === 'Enter' && !multiline) {
      event.preventDefault();
      settle();
    } else if (event.key === 'Escape' && draft !== null) {
      event.stopPropagation();
      setDraft(null);
    } else if (untouched && isHistoryKey(event)) {
      setDraft(null);
    }
  };

  const shared = {
    id,
    className: multiline ? 'field-input field-text field-area' : 'field-input field-text',
    value: draft ?? value,
    placeholder,
    autoComplete: 'off',
    'data-untouched': untouched || undefined,
    'aria-describedby': fault ? `${id}-fault` : undefined,
    onChange: (event: { readonly target: { readonly value: string } }) => setDraft(event.target.value),
    onBlur: settle,
    onKeyDown,
  };

  return (
    <Field id={id} label={label} labelHidden={labelHidden} fault={fault} wide>
      {multiline ? <textarea {...shared} rows={3} /> : <input {...shared} type="text" />}
    </Field>
  );
}
