import { emptySketch, newGlass, newSurface } from '../../engine/sketch/create.ts';
import { writeSketch } from '../../engine/sketch/file.ts';
import type { PartId, PositionId, Sketch } from '../../engine/sketch/types.ts';

const NEAR = 'near' as PositionId;
const FAR = 'far' as PositionId;

/** Two lenses of catalogue glass with the stop on the first, at two gaps, as the text of a file. */
export function glassPairText(): string {
  const crown = { ...newGlass(60, 6, 'p1' as PartId) };
  const flint = {
    ...newGlass(1, 1, 'p2' as PartId),
    surfaces: [newSurface(-45), newSurface(-200)],
    fillings: [{ thicknessMm: 2, material: { material: 'n-sf5' } }],
  };
  const sketch: Sketch = {
    ...emptySketch('Glass pair'),
    positions: [
      { id: NEAR, name: 'near' },
      { id: FAR, name: 'far' },
    ],
    parts: [{ ...crown, space: { lengthMm: { [NEAR]: 4, [FAR]: 8 }, medium: 'air' } }, flint],
    stop: 'p1' as PartId,
    aperture: { kind: 'infinityFNumber', fNumber: 10 },
    field: { size: { kind: 'angle', angleDeg: 4 }, fractions: [0, 0.7, 1], vignetting: 0 },
    sensor: { size: { diagonalMm: 12 }, pixelPitchMm: 0.005 },
  };
  return writeSketch(sketch);
}
