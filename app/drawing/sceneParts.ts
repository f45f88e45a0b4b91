import type { Analysis, Body, ParaxialRay, Part, Sketch, Warning, WarningKind } from '../../engine/index.ts';
import { bodyOf } from '../../engine/index.ts';
import type { View } from '../store/viewStore.ts';
import { ownFocalLength } from './own.ts';
import type { Stage } from './stage.ts';

export interface ScenePart {
  readonly part: Part;
  readonly index: number;
  readonly frontMm: number;
  readonly rearMm: number;
  /** Half the height it is drawn at; of glass the tallest of its faces. */
  readonly semiMm: number;
  /** The true faces of glass, z from `frontMm`; null for other kinds. */
  readonly body: Body | null;
  /** 1/power of a thin part or of glass by itself in its own media; null for what has none. */
  readonly focalLengthMm: number | null;
  /** Where its rim stands: of glass between the rims of its outer faces. */
  readonly rimMm: number;
  readonly carriesStop: boolean;
  readonly selected: boolean;
}

/** What cannot be made as it is drawn, said at the part. */
export interface SceneFault {
  readonly part: ScenePart;
  readonly zMm: number;
  readonly words: string;
}

/** Height of an open part where no ray tells how tall it has to be, as a share of the stage's length. */
const BARE_SHARE = 0.12;
/** Open parts are drawn a little taller than the rays need. */
const OPEN_MARGIN = 1.15;

/** Every part of a sketch as it is drawn. */
export function partsOf(
  sketch: Sketch,
  analysis: Analysis,
  view: View,
  stage: Stage,
  marginal: ParaxialRay | null,
  chief: ParaxialRay | null,
): ScenePart[] {
  const { places, train } = analysis;
  const selection = new Set<string>(view.selection);
  const needed = new Float64Array(sketch.parts.length);
  for (let k = 0; k < train.count; k++) {
    const reach = Math.abs(marginal?.y[k] ?? 0) + Math.abs(chief?.y[k] ?? 0);
    const index = train.partOf[k] ?? 0;
    needed[index] = Math.max(needed[index] ?? 0, reach);
  }
  const bareMm = BARE_SHARE * (stage.parts.toMm - stage.parts.fromMm);
  const leastMm = 0.25 * Math.max(...needed);
  return sketch.parts.map((part, index) => {
    const place = places.parts[index];
    const open = Math.max((needed[index] ?? 0) * OPEN_MARGIN, leastMm) || bareMm;
    const body = part.kind === 'glass' ? bodyOf(part, () => open) : null;
    const frontMm = place?.frontMm ?? 0;
    const rearMm = place?.rearMm ?? 0;
    return {
      part,
      index,
      frontMm,
      rearMm,
      rimMm: body ? frontMm + rimMiddle(body) : (frontMm + rearMm) / 2,
      semiMm: body?.semiMm ?? part.semiDiameterMm ?? open,
      body,
      focalLengthMm: ownFocalLength(part, index, analysis),
      carriesStop: sketch.stop === part.id,
      selected: selection.has(part.id),
    };
  });
}

const rimMiddle = ({ faces }: Body): number => ((faces[0]?.rimMm ?? 0) + (faces.at(-1)?.rimMm ?? 0)) / 2;

const WORDS: Partial<Record<WarningKind, string>> = {
  'surfaces cross': 'surfaces cross',
  'surface ends': 'ends inside its rim',
  'rims clash': 'rims clash',
};

/** The faults of glass among the warnings, at most one for each part. */
export function faultsIn(parts: readonly ScenePart[], warnings: readonly Warning[]): readonly SceneFault[] {
  return parts.flatMap((part, i): SceneFault[] => {
    const own = warnings.find(({ kind, partId }) => partId === part.part.id && WORDS[kind] !== undefined);
    const words = own && WORDS[own.kind];
    if (!words) return [];
    const next = parts[i + 1];
    const isBetween = own.kind === 'rims clash' && next !== undefined;
    const zMm = isBetween ? (part.rearMm + next.frontMm) / 2 : part.rimMm;
    return [{ part, zMm, words }];
  });
}
