import { useRef, useState } from 'react';
import type { Edit, SolidMedium } from '../../../engine/index.ts';
import { mediumName, nominal } from '../../../engine/index.ts';
import type { Reading } from '../../live/reading.ts';
import { useReadingNow } from '../../live/reading.ts';
import { cancelEdit } from '../../store/sketchStore.ts';
import { formatNumber } from '../../ui/format.ts';
import { tryEdit, tryPreview } from '../edit.ts';
import { ChooserField } from './ChooserField.tsx';
import { mainIndexWords } from './mediumWords.ts';

/** What may stand there instead of a glass: air in a space, nothing where a thin part names no glass. */
type Instead = 'air' | null;

interface MaterialFieldProps<Other extends Instead> {
  readonly label: string;
  /** The medium as it stands; null where there is none. Select a part of the sketch, kept by identity. */
  readonly read: (reading: Reading) => SolidMedium | Instead;
  /** The edit that puts another medium there. */
  readonly edit: (material: SolidMedium | Other) => Edit;
  /** What may be chosen instead of a glass, and what the screen calls it. */
  readonly instead?: { readonly value: Other; readonly words: string };
}

/** A medium as a row of a card: its name, index and Abbe number, and the way to choose another. */
export function MaterialField<Other extends Instead = never>(props: MaterialFieldProps<Other>) {
  const { label, read, edit, instead } = props;
  const opener = useRef<HTMLButtonElement>(null);
  const medium = useReadingNow(read);
  const index = useReadingNow((reading) => figuresWords(read(reading), reading));
  /** The medium as it stood when the chooser opened. */
  const [opened, setOpened] = useState<{ readonly medium: SolidMedium | null } | null>(null);

  const close = (focusBack: boolean) => {
    setOpened(null);
    if (focusBack) opener.current?.focus();
  };
  const preview = (next: SolidMedium): string | null => {
    const refused = tryPreview(edit(next));
    // The last good preview would be another glass.
    if (refused !== null) cancelEdit();
    return refused;
  };
  const choose = (next: SolidMedium | 'instead'): string | null => {
    const refused = next === 'instead' ? instead && tryEdit(edit(instead.value)) : tryEdit(edit(next));
    if (!refused) close(true);
    return refused ?? null;
  };

  const toggle = () => {
    if (opened) cancelEdit();
    setOpened(opened ? null : { medium: solid(medium) });
  };
  const chooser = opened && {
    medium: opened.medium,
    instead: instead?.words ?? null,
    onPreview: preview,
    onRestore: cancelEdit,
    onChoose: choose,
    onClose: close,
  };

  return (
    <ChooserField label={label} opener={opener} onToggle={toggle} chooser={chooser}>
      {medium === null || medium === 'air' ? (instead?.words ?? 'none') : mediumName(medium)}
      {index !== '' && <span className="material-figures">{index}</span>}
    </ChooserField>
  );
}

const solid = (medium: SolidMedium | Instead): SolidMedium | null => (medium === 'air' ? null : medium);

/** Index in the main line and Abbe number; empty for air and where there is no glass. */
function figuresWords(medium: SolidMedium | Instead, { sketch }: Reading): string {
  if (medium === null || medium === 'air') return '';
  const { vd } = nominal(medium);
  const abbe = vd === null ? '' : `  V ${formatNumber(vd, 1)}`;
  return mainIndexWords(medium, sketch) + abbe;
}
