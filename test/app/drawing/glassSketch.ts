import type { GlassPart, GlassSurface, PartId, Sketch } from '../../../engine/index.ts';
import { emptySketch, newGlass, newThin } from '../../../engine/index.ts';

const FLAT_SURFACE: GlassSurface = { radiusMm: null, conic: 0, asphere: [], semiDiameterMm: null };

export const surface = (radiusMm: number | null, more: Partial<GlassSurface> = {}): GlassSurface => ({
  ...FLAT_SURFACE,
  radiusMm,
  ...more,
});

/** A cemented pair of borosilicate crown and dense flint, 12 mm to the rim. */
export const cementedPair = (more: Partial<GlassPart> = {}): GlassPart => ({
  ...newGlass(61.47, 6, 'p2' as PartId),
  surfaces: [surface(61.47), surface(-44.64), surface(-129.94)],
  fillings: [
    { thicknessMm: 6, material: { material: 'n-bk7' } },
    { thicknessMm: 2.5, material: { material: 'n-sf5' } },
  ],
  semiDiameterMm: 12,
  space: { lengthMm: 30, medium: 'air' },
  ...more,
});

/** Glass as "p2" between two thin elements, 20 mm behind the first and 30 mm in front of the second. */
export const withGlass = (glass: GlassPart = cementedPair(), more: Partial<Sketch> = {}): Sketch => ({
  ...emptySketch(),
  parts: [
    { ...newThin(-120, 'p1' as PartId), space: { lengthMm: 20, medium: 'air' } },
    glass,
    newThin(150, 'p3' as PartId),
  ],
  stop: 'p1' as PartId,
  ...more,
});

/** The glass of `withGlass` in a sketch. */
export function glassIn({ parts }: Sketch): GlassPart {
  const glass = parts.find(({ kind }) => kind === 'glass');
  if (glass?.kind !== 'glass') throw new Error('the sketch has glass');
  return glass;
}
