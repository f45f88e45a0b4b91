import type { PartId } from '../../engine/index.ts';
import { isCommon, partName } from '../../engine/index.ts';
import { ownFirstOrder } from '../drawing/own.ts';
import type { ScenePart } from '../drawing/scene.ts';
import type { Sight } from '../drawing/sight.ts';

/** One dimension of the ribbon. */
export interface Cell {
  readonly id: string;
  readonly kind: 'object' | 'gap' | 'thickness' | 'planes' | 'image';
  /** The part that the space follows; null in front of the first. */
  readonly after: PartId | null;
  readonly fromMm: number;
  readonly toMm: number;
  readonly valueMm: number;
  /** What the value is longer by than the number that the sketch stores: where a principal plane is measured from instead of a vertex. */
  readonly beyondMm: number;
  /** Which filling of glass it is the thickness of. */
  readonly filling: number;
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

const UNBUILDABLE_GAPS: ReadonlySet<string> = new Set([
  'negative gap',
  'rooms overlap',
  'rims clash',
  'image inside',
]);

/** The dimensions from the object to the image, left to right. Ends at infinity have none. */
export function cellsOf(sight: Sight): readonly Cell[] {
  const { reading, scene } = sight;
  const { sketch, warnings } = reading;
  const several = sketch.positions.length > 1;
  const cells: Cell[] = [];
  const { objectMm, imageMm } = scene.stage;
  const stored = (value: Parameters<typeof isCommon>[0]) => ({
    common: several && isCommon(value),
    split: !isCommon(value),
  });
  const planes = scene.parts.map((part) => planesOf(sight, part));
  const [first] = planes;
  if (objectMm !== null && first) {
    cells.push({
      ...PLAIN,
      id: 'object',
      kind: 'object',
      after: null,
      fromMm: objectMm,
      toMm: first.frontMm,
      valueMm: first.frontMm - objectMm,
      beyondMm: first.frontMm,
      label: 'object distance',
      ...stored(sketch.object.distanceMm),
      bad: warnings.some(({ kind }) => kind === 'object inside'),
    });
  }
  for (const [i, drawn] of scene.parts.entries()) {
    const { part, index } = drawn;
    const name = partName(part, index);
    const own = planes[i];
    if (!own) continue;
    cells.push(...(own.isPrincipal ? [planesCell(drawn, own, name)] : thicknessCells(drawn, name)));
    const next = scene.parts[i + 1];
    const nextMm = planes[i + 1]?.frontMm;
    const toMm = nextMm ?? imageMm;
    if (toMm === null) continue;
    const vertexMm = (next ? next.frontMm : toMm) - drawn.rearMm;
    const valueMm = toMm - own.rearMm;
    cells.push({
      ...PLAIN,
      id: `gap:${part.id}`,
      kind: next ? 'gap' : 'image',
      after: part.id,
      fromMm: own.rearMm,
      toMm,
      valueMm,
      beyondMm: own.isPrincipal || planes[i + 1]?.isPrincipal ? valueMm - vertexMm : 0,
      label: next ? `gap behind ${name}` : `${scene.sensorFixed ? 'sensor' : 'image'} behind ${name}`,
      ...(next || scene.sensorFixed ? stored(part.space.lengthMm) : {}),
      follows: !next && !scene.sensorFixed,
      bad:
        (next !== undefined || scene.sensorFixed) &&
        warnings.some(({ kind, partId }) => partId === part.id && UNBUILDABLE_GAPS.has(kind)),
    });
  }
  return cells;
}

const PLAIN = { beyondMm: 0, filling: 0, common: false, split: false, follows: false, bad: false } as const;

interface Planes {
  readonly frontMm: number;
  readonly rearMm: number;
  readonly isPrincipal: boolean;
}

/** What a part is measured from: its vertices, or the principal planes of glass when that is chosen and it has them. */
function planesOf({ reading }: Sight, { part, index, frontMm, rearMm }: ScenePart): Planes {
  const own =
    part.kind === 'glass' && reading.view.shown.equivalentGaps
      ? ownFirstOrder(reading.analysis, index)
      : null;
  if (!own?.principalFrontMm.ok || !own.principalRearMm.ok) return { frontMm, rearMm, isPrincipal: false };
  return {
    frontMm: frontMm + own.principalFrontMm.value,
    rearMm: rearMm + own.principalRearMm.value,
    isPrincipal: true,
  };
}

const planesCell = ({ part }: ScenePart, { frontMm, rearMm }: Planes, name: string): Cell => ({
  ...PLAIN,
  id: `planes:${part.id}`,
  kind: 'planes',
  after: part.id,
  fromMm: frontMm,
  toMm: rearMm,
  valueMm: rearMm - frontMm,
  label: `principal planes of ${name}`,
});

function thicknessCells({ part, frontMm }: ScenePart, name: string): readonly Cell[] {
  const thicknesses =
    part.kind === 'plate'
      ? [part.thicknessMm]
      : part.kind === 'glass'
        ? part.fillings.map(({ thicknessMm }) => thicknessMm)
        : [];
  let atMm = frontMm;
  return thicknesses.map((valueMm, filling) => {
    const fromMm = atMm;
    atMm += valueMm;
    const which = thicknesses.length === 1 ? 'thickness' : `thickness ${filling + 1}`;
    return {
      ...PLAIN,
      id: part.kind === 'plate' ? `thickness:${part.id}` : `thickness:${part.id}:${filling}`,
      kind: 'thickness',
      after: part.id,
      fromMm,
      toMm: atMm,
      valueMm,
      filling,
      label: `${which} of ${name}`,
    };
  });
}
