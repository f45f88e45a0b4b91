import type { PartId } from '../../engine/index.ts';
import { isCommon, partName } from '../../engine/index.ts';
import type { Sight } from '../drawing/sight.ts';

/** One dimension of the ribbon. */
export interface Cell {
  readonly id: string;
  readonly kind: 'object' | 'gap' | 'thickness' | 'image';
  /** The part that the space follows; null in front of the first. */
  readonly after: PartId | null;
  readonly fromMm: number;
  readonly toMm: number;
  readonly valueMm: number;
  /** "gap behind second group". */
  readonly label: string;
  /** All positions share it, and there is more than one. */
  readonly common: boolean;
  /** Its value is stored for each position, so between positions it cannot be edited. */
  readonly split: boolean;
  /** It follows from other numbers: the distance to the focus. */
  readonly follows: boolean;
  /** It cannot be built: parts stand behind each other or their rooms overlap. */
  readonly bad: boolean;
}

const UNBUILDABLE_GAPS: ReadonlySet<string> = new Set(['negative gap', 'rooms overlap', 'image inside']);

/** The dimensions from the object to the image, left to right. Ends at infinity have none. */
export function cellsOf({ reading, scene }: Sight): readonly Cell[] {
  const { sketch, warnings } = reading;
  const several = sketch.positions.length > 1;
  const cells: Cell[] = [];
  const { objectMm, imageMm } = scene.stage;
  const stored = (value: Parameters<typeof isCommon>[0]) => ({
    common: several && isCommon(value),
    split: !isCommon(value),
  });
  if (objectMm !== null && scene.parts.length > 0) {
    cells.push({
      id: 'object',
      kind: 'object',
      after: null,
      fromMm: objectMm,
      toMm: 0,
      valueMm: -objectMm,
      label: 'object distance',
      ...stored(sketch.object.distanceMm),
      follows: false,
      bad: warnings.some(({ kind }) => kind === 'object inside'),
    });
  }
  for (const [i, { part, index, frontMm, rearMm }] of scene.parts.entries()) {
    const name = partName(part, index);
    if (part.kind === 'plate') {
      cells.push({
        id: `thickness:${part.id}`,
        kind: 'thickness',
        after: part.id,
        fromMm: frontMm,
        toMm: rearMm,
        valueMm: part.thicknessMm,
        label: `thickness of ${name}`,
        common: false,
        split: false,
        follows: false,
        bad: false,
      });
    }
    const next = scene.parts[i + 1];
    const toMm = next ? next.frontMm : imageMm;
    if (toMm === null) continue;
    cells.push({
      id: `gap:${part.id}`,
      kind: next ? 'gap' : 'image',
      after: part.id,
      fromMm: rearMm,
      toMm,
      valueMm: toMm - rearMm,
      label: next ? `gap behind ${name}` : `${scene.sensorFixed ? 'sensor' : 'image'} behind ${name}`,
      ...(next || scene.sensorFixed ? stored(part.space.lengthMm) : { common: false, split: false }),
      follows: !next && !scene.sensorFixed,
      bad:
        (next !== undefined || scene.sensorFixed) &&
        warnings.some(({ kind, partId }) => partId === part.id && UNBUILDABLE_GAPS.has(kind)),
    });
  }
  return cells;
}
