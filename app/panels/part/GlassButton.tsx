import { lazy, Suspense, useId, useRef, useState } from 'react';
import type { SolidMedium } from '../../../engine/index.ts';
import { mediumName } from '../../../engine/index.ts';
import { Field } from '../../ui/Field.tsx';
import '../glass/glass.css';

const Chooser = lazy(async () => ({ default: (await import('../glass/Chooser.tsx')).Chooser }));

interface GlassButtonProps {
  readonly label: string;
  readonly medium: SolidMedium;
  readonly onChoose: (medium: SolidMedium) => void;
}

/** A glass that is wished for and stands in no sketch yet, with the chooser. */
export function GlassButton({ label, medium, onChoose }: GlassButtonProps) {
  const id = useId();
  const opener = useRef<HTMLButtonElement>(null);
  const [isOpen, setOpen] = useState(false);
  const close = (focusBack: boolean) => {
    setOpen(false);
    if (focusBack) opener.current?.focus();
  };
  return (
    <Field id={id} label={label}>
      <button
        ref={opener}
        id={id}
        type="button"
        className="field-input material-button"
        aria-labelledby={`${id}-label ${id}`}
        aria-haspopup="dialog"
        aria-expanded={isOpen}
        onClick={() => setOpen(!isOpen)}
      >
        {mediumName(medium)}
      </button>
      {isOpen && (
        <Suspense>
          <Chooser
            label={label}
            medium={medium}
            instead={null}
            onPreview={() => null}
            onRestore={() => undefined}
            onChoose={(next) => {
              if (next !== 'instead') onChoose(next);
              close(true);
              return null;
            }}
            onClose={close}
          />
        </Suspense>
      )}
    </Field>
  );
}
