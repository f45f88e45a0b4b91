import type { ReactNode } from 'react';
import './controls.css';
import './field.css';

interface FieldProps {
  /** Of the input that the label belongs to. */
  readonly id: string;
  readonly label: ReactNode;
  readonly labelHidden?: boolean;
  readonly unit?: string;
  readonly fault?: string | null;
  readonly hint?: ReactNode;
  readonly aside?: ReactNode;
  /** The input takes the whole width under its label. */
  readonly wide?: boolean;
  readonly children: ReactNode;
}

/** A labelled row: label, input, unit, and what stands beside it; below it a hint, or the sentence on a bad entry. */
export function Field({ id, label, labelHidden, unit, fault, hint, aside, wide, children }: FieldProps) {
  return (
    <div className={wide ? 'field field-wide' : 'field'}>
      <label id={`${id}-label`} htmlFor={id} className={labelHidden ? 'visually-hidden' : 'field-label'}>
        {label}
      </label>
      <span className="field-value">{children}</span>
      {unit !== undefined && <span className="field-unit">{unit}</span>}
      <span className="field-aside">{aside}</span>
      {fault ? (
        <p id={`${id}-fault`} className="field-fault" role="alert">
          {fault}
        </p>
      ) : (
        hint && (
          <p id={`${id}-hint`} className="field-hint">
            {hint}
          </p>
        )
      )}
    </div>
  );
}
