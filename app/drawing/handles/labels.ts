import { partName } from '../../../engine/index.ts';
import type { LabelPlace } from '../../board/labels.ts';
import type { Handle } from '../handle.ts';
import type { Sight } from '../sight.ts';
import { placing } from './parts.ts';

const PREFIX = 'label:';

/** The parts' labels as grips: a click on one types the focal length, a drag moves the part. */
export function labelHandles(sight: Sight, places: readonly LabelPlace[]): readonly Handle[] {
  return places.flatMap((place) => {
    if (!place.id.startsWith('part:')) return [];
    const part = sight.scene.parts.find((drawn) => `part:${drawn.part.id}` === place.id);
    if (part?.part.kind !== 'thin') return [];
    const middlePx = place.yPx + place.heightPx / 2;
    return [
      {
        id: `${PREFIX}${part.part.id}`,
        order: 8,
        xPx: place.xPx + place.widthPx / 2,
        yPx: middlePx,
        line: { topPx: middlePx - 4, bottomPx: middlePx + 4 },
        halfWidthPx: place.widthPx / 2,
        cursor: 'text',
        label: `${partName(part.part, part.index)}, focal length`,
        slider: null,
        tabStop: false,
        selects: part.part.id,
        look: 'none' as const,
        ...placing(sight, part),
      },
    ];
  });
}

/** The grip that types what a label says; null when the grip is no label. */
export const typedByLabel = (handleId: string): string | null =>
  handleId.startsWith(PREFIX) ? `focal:${handleId.slice(PREFIX.length)}:rear` : null;

/** The label of what a grip belongs to: it stays where it is while the grip is pointed at or has the focus; null without. */
export function labelOf(handleId: string): string | null {
  const [kind, of] = handleId.split(':');
  if (kind === 'object' || kind === 'image') return kind;
  if (kind === 'field') return 'image';
  return of !== undefined && PART_GRIPS.has(kind ?? '') ? `part:${of}` : null;
}

const PART_GRIPS: ReadonlySet<string> = new Set([
  'part',
  'label',
  'focal',
  'rim',
  'thickness',
  'radius',
  'bend',
  'tick',
]);
