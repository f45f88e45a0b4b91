import { lazy, type ReactNode, type RefObject, Suspense, useId } from 'react';
import { Field } from '../../ui/Field.tsx';
import type { ChooserProps } from './Chooser.tsx';
import './glass.css';

const Chooser = lazy(async () => ({ default: (await import('./Chooser.tsx')).Chooser }));

interface ChooserFieldProps {
  readonly label: string;
  readonly opener: RefObject<HTMLButtonElement | null>;
  readonly onToggle: () => void;
  /** What the open chooser is given; null while it is closed. */
  readonly chooser: Omit<ChooserProps, 'label'> | null;
  /** What is chosen, in words. */
  readonly children: ReactNode;
}

/** A row of a card whose button opens the chooser of glass. */
export function ChooserField({ label, opener, onToggle, chooser, children }: ChooserFieldProps) {
  const id = useId();
  return (
    <Field id={id} label={label}>
      <button
        ref={opener}
        id={id}
        type="button"
        className="field-input material-button"
        aria-labelledby={`${id}-label ${id}`}
        aria-haspopup="dialog"
        aria-expanded={chooser !== null}
        onClick={onToggle}
      >
        {children}
      </button>
      {chooser && (
        <Suspense>
          <Chooser label={label} {...chooser} />
        </Suspense>
      )}
    </Field>
  );
}
