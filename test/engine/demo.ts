import { emptySketch, newThin } from '../../engine/sketch/create.ts';
import type { PartId, PositionId, Sketch, ThinPart } from '../../engine/sketch/types.ts';

export const WIDE = 'wide' as PositionId;
export const MIDDLE = 'middle' as PositionId;
export const NARROW = 'narrow' as PositionId;

/** Three lengths, one per position from wide to narrow. */
const zoom = (wide: number, middle: number, narrow: number) => ({
  [WIDE]: wide,
  [MIDDLE]: middle,
  [NARROW]: narrow,
});

/**
 * The inspection camera of a seed-sorting line: four thin groups, the stop riding on the second, the fourth fixed 84 mm and the sensor 110 mm
 * behind the first, magnifications −0.05, −0.08 and −0.12.
 */
export function inspectionZoom(): Sketch {
  const group = (
    id: string,
    name: string,
    focalLengthMm: number,
    lengthMm: ThinPart['space']['lengthMm'],
  ) => ({
    ...newThin(focalLengthMm, id as PartId),
    name,
    space: { lengthMm, medium: 'air' } as const,
  });
  return {
    ...emptySketch('Inspection zoom'),
    object: { distanceMm: 500, medium: 'air' },
    parts: [
      group('p1', 'first group', -32, zoom(41.2187245423499, 26.2723430337247, 15.9437475806799)),
      group('p2', 'second group', 28, zoom(16.5123679494863, 25.3145182543316, 41.9317551092688)),
      group('p3', 'third group', -46, zoom(26.2689075081639, 32.4131387119437, 26.1244973100513)),
      group('p4', 'fourth group', 48, 26),
    ],
    image: 'fixed',
    sensor: { size: { widthMm: 8.8, heightMm: 6.6 }, pixelPitchMm: 0.00345 },
    stop: 'p2' as PartId,
    aperture: { kind: 'workingFNumber', fNumber: 5.6 },
    field: { size: { kind: 'imageHeight', heightMm: 5.5 }, fractions: [0, 0.7, 1], vignetting: 0 },
    positions: [
      { id: WIDE, name: 'wide' },
      { id: MIDDLE, name: 'middle' },
      { id: NARROW, name: 'narrow' },
    ],
  };
}
