import type { Edit } from '../../../engine/index.ts';
import { NumberField } from '../../ui/NumberField.tsx';
import { tryEdit } from '../edit.ts';

/** Said where a focal length of the other sign is typed to scale to. */
export const KEEPS_SIGN = 'Scaling keeps the sign: type a focal length of the same sign.';

interface ScaleFactorFieldProps {
  readonly label: string;
  readonly edit: (factor: number) => Edit;
}

/** A factor to scale by; once it is done the field stands at 1 again. */
export function ScaleFactorField({ label, edit }: ScaleFactorFieldProps) {
  const scale = (factor: number | null): string | null => {
    if (factor === null || factor <= 0) return 'A scale factor is a number above 0.';
    return tryEdit(edit(factor));
  };
  return <NumberField label={label} value={1} unit="" digits={3} onCommit={scale} />;
}
