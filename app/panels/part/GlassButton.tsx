import { useRef, useState } from 'react';
import type { SolidMedium } from '../../../engine/index.ts';
import { mediumName } from '../../../engine/index.ts';
import { ChooserField } from '../glass/ChooserField.tsx';

interface GlassButtonProps {
  readonly label: string;
  readonly medium: SolidMedium;
  readonly onChoose: (medium: SolidMedium) => void;
}

/** A glass that is wished for and stands in no sketch yet, with the chooser. */
export function GlassButton({ label, medium, onChoose }: GlassButtonProps) {
  const opener = useRef<HTMLButtonElement>(null);
  const [isOpen, setOpen] = useState(false);
  const close = (focusBack: boolean) => {
    setOpen(false);
    if (focusBack) opener.current?.focus();
  };
  const chooser = {
    medium,
    instead: null,
    onPreview: () => null,
    onRestore: () => undefined,
    onChoose: (next: SolidMedium | 'instead') => {
      if (next !== 'instead') onChoose(next);
      close(true);
      return null;
    },
    onClose: close,
  };
  return (
    <ChooserField
      label={label}
      opener={opener}
      onToggle={() => setOpen(!isOpen)}
      chooser={isOpen ? chooser : null}
    >
      {mediumName(medium)}
    </ChooserField>
  );
}
