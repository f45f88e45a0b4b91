import { emptySketch, newGlass, newSurface } from '../../engine/sketch/create.ts';
import type { GlassPart, PartId, Sketch } from '../../engine/sketch/types.ts';
import { realZoom } from '../engine/realZoom.ts';

const CROWN = 'n-bk7';
const FLINT = 'n-sf5';
/** Air between the two halves of a lens, mm. */
const AIR_MM = 0.2;

/**
 * A zoom in real glass of 14 elements and 28 surfaces, five fields and three lines: the seven lenses of the reference zoom, each cut flat
 * into two of catalogue glass. Invented for the bench; it images well enough that every ray of it gets through.
 */
export function zoomSketch(): Sketch {
  const zoom = realZoom();
  const parts = (zoom.parts as readonly GlassPart[]).flatMap((lens, index): readonly GlassPart[] => {
    const [front, rear] = lens.surfaces;
    const filling = lens.fillings[0];
    if (!front || !rear || !filling)
      throw new Error('zoomSketch: the reference zoom has lenses of two faces');
    const material = { material: indexIn(filling.material) > 1.6 ? FLINT : CROWN };
    const half = { thicknessMm: filling.thicknessMm / 2, material };
    const id = (place: number) => `p${2 * index + place}` as PartId;
    return [
      {
        ...newGlass(1, 1, id(1)),
        surfaces: [front, newSurface(null)],
        fillings: [half],
        space: { lengthMm: AIR_MM, medium: 'air' },
      },
      { ...newGlass(1, 1, id(2)), surfaces: [newSurface(null), rear], fillings: [half], space: lens.space },
    ];
  });
  return {
    ...zoom,
    parts,
    stop: 'p9' as PartId,
    field: { ...zoom.field, fractions: [0, 0.4, 0.7, 0.85, 1] },
    sensor: { size: { diagonalMm: 8 }, pixelPitchMm: 0.005 },
    lines: emptySketch().lines,
  };
}

const indexIn = (material: GlassPart['fillings'][number]['material']): number =>
  'index' in material ? material.index : 1.5;
