import type { Analysis, FirstOrder, Part } from '../../engine/index.ts';
import { firstOrder, partTrain } from '../../engine/index.ts';

/** The first-order numbers of one part by itself, in the media it stands in; null when no ray runs through it. */
export function ownFirstOrder({ train }: Analysis, partIndex: number): FirstOrder | null {
  const own = partTrain(train, partIndex);
  return own && firstOrder(own);
}

/** 1/power of a part by itself in mm; null for a stop, a plate, or glass without power. */
export function ownFocalLength(part: Part, index: number, analysis: Analysis): number | null {
  if (part.kind === 'thin') return part.focalLengthMm;
  const focal = part.kind === 'glass' ? ownFirstOrder(analysis, index)?.focalLengthMm : undefined;
  return focal?.ok ? focal.value : null;
}
