import type { PartId, PositionId, Sketch } from '../../engine/index.ts';
import {
  dropStop,
  freshPartId,
  insertPart,
  newGlass,
  newPlate,
  newThin,
  rideStop,
} from '../../engine/index.ts';
import { currentReading } from '../live/reading.ts';
import { applyEdit, sketchStore } from '../store/sketchStore.ts';
import { setView, type TrayKind, viewStore } from '../store/viewStore.ts';

/** Where new parts come from, in the order of the tray. */
export const TRAY: readonly { readonly kind: TrayKind; readonly label: string }[] = [
  { kind: 'positive', label: 'positive' },
  { kind: 'negative', label: 'negative' },
  { kind: 'stop', label: 'stop' },
  { kind: 'plate', label: 'plate' },
  { kind: 'glass', label: 'glass' },
];

/** What a new thin part starts with; its entry is opened at once. */
const FIRST_FOCAL_LENGTH_MM = 50;
const FIRST_THICKNESS_MM = 1;
/** A new singlet has about the focal length of a new thin part. */
const FIRST_RADIUS_MM = 50;
const FIRST_GLASS_MM = 4;

/** A place on the axis, in mm from the first part, and the part that stands there. */
export interface Spot {
  readonly zMm: number;
  readonly onto: PartId | null;
}

/**
 * Sets a new part down, selects it and opens its focal length for typing. A stop set down on a part rides on it. The first element
 * of a sketch carries the stop until another is chosen: a lone lens is its own stop.
 */
export function setDown(kind: TrayKind, { zMm, onto }: Spot): void {
  const { at } = currentReading().setting;
  const known = new Set(sketchStore.getState().sketch.parts.map((part) => part.id));
  applyEdit((sketch) => (kind === 'stop' && onto ? rideStop(sketch, onto) : added(kind, sketch, zMm, at)));
  const made = sketchStore.getState().sketch.parts.find((part) => !known.has(part.id));
  const chosen = made?.id ?? (kind === 'stop' ? onto : null);
  // Lengths count from the first part: the sheet moves with it, so that it stays where it was dropped.
  const { camera } = viewStore.getState();
  const isFirst = known.size === 0 && made !== undefined;
  setView({
    placing: null,
    ...(isFirst && { camera: { ...camera, originMm: camera.originMm - zMm } }),
    ...(chosen && { selection: [chosen] }),
    typing: made?.kind === 'thin' ? `focal:${made.id}:rear` : null,
  });
}

function added(kind: TrayKind, sketch: Sketch, atMm: number, position: PositionId): Sketch {
  if (kind === 'stop') return dropStop(sketch, atMm, position);
  const id = freshPartId(sketch);
  if (kind === 'plate') return insertPart(sketch, newPlate(FIRST_THICKNESS_MM, id), atMm, position);
  const focalLengthMm = kind === 'positive' ? FIRST_FOCAL_LENGTH_MM : -FIRST_FOCAL_LENGTH_MM;
  const part = kind === 'glass' ? newGlass(FIRST_RADIUS_MM, FIRST_GLASS_MM, id) : newThin(focalLengthMm, id);
  const placed = insertPart(sketch, part, atMm, position);
  return sketch.parts.length === 0 ? rideStop(placed, id) : placed;
}
