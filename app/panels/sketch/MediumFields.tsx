import type { Medium, PartId, Sketch } from '../../../engine/index.ts';
import { setMedium } from '../../../engine/index.ts';
import { MaterialField } from '../glass/MaterialField.tsx';

interface MediumFieldsProps {
  readonly label: string;
  /** Behind a part, or in object space. */
  readonly where: PartId | 'object';
}

const AIR = { value: 'air', words: 'air' } as const;

/** Air, or another medium of the catalogue or of the user's own. */
export function MediumFields({ label, where }: MediumFieldsProps) {
  return (
    <MaterialField
      label={label}
      read={({ sketch }) => mediumOf(sketch, where)}
      edit={(medium) => (sketch) => setMedium(sketch, where, medium)}
      instead={AIR}
    />
  );
}

function mediumOf(sketch: Sketch, where: PartId | 'object'): Medium {
  if (where === 'object') return sketch.object.medium;
  return sketch.parts.find(({ id }) => id === where)?.space.medium ?? 'air';
}
