import type { PartId, PositionId, Sketch } from '../../engine/index.ts';
import { dropStop, freshPartId, insertPart, newPlate, newThin } from '../../engine/index.ts';
import { currentReading } from '../live/reading.ts';
import { applyEdit, sketchStore } from '../store/sketchStore.ts';
import { setView, type TrayKind } from '../store/viewStore.ts';

/** Where new parts come from, in the order of the tray. */
export const TRAY: readonly { readonly kind: TrayKind; readonly label: string }[] = [
  { kind: 'positive', label: 'positive' },
  { kind: 'negative', label: 'negative' },
  { kind: 'stop', label: 'stop' },
  { kind: 'plate', label: 'plate' },
];

const FIRST_FOCAL_LENGTH_MM = 50;

function insertOf(kind: TrayKind, sketch: Sketch, atMm: number, position: PositionId): Sketch {
  if (kind === 'stop') return dropStop(sketch, atMm, position);
  const id = freshPartId(sketch);
  if (kind === 'plate') return insertPart(sketch, newPlate(1, id), atMm, position);
  const focalLengthMm = kind === 'positive' ? FIRST_FOCAL_LENGTH_MM : -FIRST_FOCAL_LENGTH_MM;
  return insertPart(sketch, newThin(focalLengthMm, id), atMm, position);
}

/** Sets a new part down at `atMm` from the first part, selects it and opens its focal length for typing. */
export function setDown(kind: TrayKind, atMm: number): PartId | null {
  const { at } = currentReading().setting;
  const known = new Set(sketchStore.getState().sketch.parts.map((part) => part.id));
  applyEdit((sketch) => insertOf(kind, sketch, atMm, at));
  const added = sketchStore.getState().sketch.parts.find((part) => !known.has(part.id));
  if (!added) {
    setView({ placing: null });
    return null;
  }
  const typing = added.kind === 'thin' ? `focal:${added.id}:rear` : null;
  setView({ placing: null, selection: [added.id], typing });
  return added.id;
}
