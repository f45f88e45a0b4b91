import { useEffect, useId, useRef, useState } from 'react';

interface NameFormProps {
  readonly label: string;
  /** What stands in the field at first. */
  readonly name: string;
  /** What the button does. */
  readonly verb: string;
  readonly onName: (name: string) => void;
  /** Given when the entry was opened for this and can be left again; then it takes the focus. */
  readonly onCancel?: () => void;
}

/** A name and a button: Enter does the same as the button. */
export function NameForm({ label, name, verb, onName, onCancel }: NameFormProps) {
  const id = useId();
  const [draft, setDraft] = useState(name);
  const input = useRef<HTMLInputElement>(null);
  const opened = onCancel !== undefined;

  useEffect(() => {
    if (opened) input.current?.select();
  }, [opened]);

  return (
    <form
      className="name-form"
      onSubmit={(event) => {
        event.preventDefault();
        if (draft.trim() !== '') onName(draft);
      }}
      onKeyDown={(event) => {
        if (event.key !== 'Escape' || !onCancel) return;
        event.preventDefault();
        event.stopPropagation();
        onCancel();
      }}
    >
      <label htmlFor={id} className="name-form-label">
        {label}
      </label>
      <input
        id={id}
        ref={input}
        className="field-input name-form-input"
        value={draft}
        maxLength={80}
        autoComplete="off"
        onChange={(event) => setDraft(event.target.value)}
      />
      <button type="submit" className="text-button" disabled={draft.trim() === ''}>
        {verb}
      </button>
      {onCancel && (
        <button type="button" className="text-button" onClick={onCancel}>
          Cancel
        </button>
      )}
    </form>
  );
}
