import type { Part } from './types.ts';

/** From the part's front to its rear vertex in mm: 0 for a thin part or a stop. */
export function lengthOf(part: Part): number {
  if (part.kind === 'plate') return part.thicknessMm;
  if (part.kind !== 'glass') return 0;
  return part.fillings.reduce((sum, { thicknessMm }) => sum + thicknessMm, 0);
}

/** The rim of the part in mm: for glass the widest of its surfaces' own or the part's; null when one of them is open. */
export function givenSemiDiameter(part: Part): number | null {
  if (part.kind !== 'glass') return part.semiDiameterMm;
  let widest = 0;
  for (const surface of part.surfaces) {
    const semi = surface.semiDiameterMm ?? part.semiDiameterMm;
    if (semi === null) return null;
    widest = Math.max(widest, semi);
  }
  return widest;
}
