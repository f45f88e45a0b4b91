import type { Edit, SolidMedium } from '../../../engine/index.ts';
import { materials } from '../../../engine/index.ts';
import type { Reading } from '../../live/reading.ts';
import { useReadingNow } from '../../live/reading.ts';
import { Select } from '../../ui/choices.tsx';
import { tryEdit } from '../edit.ts';

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
  const medium = useReadingNow(read);
  const catalogue = materials.map(({ id, name }) => ({ value: id, label: name }));
  const other = instead ? [{ value: '', label: instead.words }] : [];
  return (
    <Select
      label={label}
      value={medium !== null && medium !== 'air' && 'material' in medium ? medium.material : ''}
      choices={[...other, ...catalogue]}
      onChoose={(id) => tryEdit(id === '' && instead ? edit(instead.value) : edit({ material: id }))}
    />
  );
}
