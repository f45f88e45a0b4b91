import type { Aperture, FieldSize, GlassSurface, ObjectDistance, Part, PartId, Sketch } from '../types.ts';
import { everyPosition } from '../values.ts';
import { withField, withFields, withGap } from './change.ts';

/**
 * The whole layout made larger by a factor: focal lengths, radii, gaps, object distance, diameters, room and the field's heights.
 * Sensor, mount and blur are given from outside and stay. A factor that is not a positive number changes nothing.
 */
export function scaleSketch(sketch: Sketch, factor: number): Sketch {
  if (!isFactor(factor)) return sketch;
  const distanceMm = everyPosition(sketch.object.distanceMm, (distance: ObjectDistance) =>
    distance === 'infinity' ? distance : distance * factor,
  );
  return withFields(sketch, {
    object: withField(sketch.object, 'distanceMm', distanceMm),
    parts: sketch.parts.map((part) => scaledGap(scaledPart(part, factor), factor)),
    aperture: scaledAperture(sketch.aperture, factor),
    field: withField(sketch.field, 'size', scaledField(sketch.field.size, factor)),
  });
}

/** The whole layout scaled so that its focal length goes from `presentMm` to `wantedMm`; unlike signs change nothing. */
export const scaleToFocalLength = (sketch: Sketch, presentMm: number, wantedMm: number): Sketch =>
  scaleSketch(sketch, wantedMm / presentMm);

/**
 * Some parts made larger by a factor: focal lengths, radii, diameters, thickness, room, and the gaps between two chosen neighbours.
 * The first of them stays; what is behind moves along. A factor that is not a positive number changes nothing.
 */
export function scaleParts(sketch: Sketch, ids: readonly PartId[], factor: number): Sketch {
  if (!isFactor(factor) || !sketch.parts.some((part) => ids.includes(part.id))) return sketch;
  const parts = sketch.parts.map((part, index) => {
    if (!ids.includes(part.id)) return part;
    const next = sketch.parts[index + 1];
    const scaled = scaledPart(part, factor);
    return next !== undefined && ids.includes(next.id) ? scaledGap(scaled, factor) : scaled;
  });
  return withField(sketch, 'parts', parts);
}

const isFactor = (factor: number): boolean => factor > 0 && Number.isFinite(factor) && factor !== 1;

const scaledGap = (part: Part, factor: number): Part =>
  withGap(
    part,
    everyPosition(part.space.lengthMm, (gap) => gap * factor),
  );

function scaledPart(part: Part, factor: number): Part {
  const semiDiameterMm = part.semiDiameterMm === null ? null : part.semiDiameterMm * factor;
  if (part.kind === 'stop') return withField(part, 'semiDiameterMm', semiDiameterMm);
  if (part.kind === 'plate')
    return withFields(part, { semiDiameterMm, thicknessMm: part.thicknessMm * factor });
  if (part.kind === 'glass')
    return {
      ...part,
      semiDiameterMm,
      surfaces: part.surfaces.map((surface) => scaledSurface(surface, factor)),
      fillings: part.fillings.map((filling) => ({ ...filling, thicknessMm: filling.thicknessMm * factor })),
    };
  return withFields(part, {
    semiDiameterMm,
    focalLengthMm: part.focalLengthMm * factor,
    roomFrontMm: part.roomFrontMm * factor,
    roomBehindMm: part.roomBehindMm * factor,
  });
}

/** Sag and height grow alike, so the coefficient of r⁴ falls as the cube of the factor, that of r⁶ as the fifth power. */
const scaledSurface = (surface: GlassSurface, factor: number): GlassSurface => ({
  radiusMm: surface.radiusMm === null ? null : surface.radiusMm * factor,
  conic: surface.conic,
  asphere: surface.asphere.map((coefficient, term) => coefficient * factor ** -(2 * term + 3)),
  semiDiameterMm: surface.semiDiameterMm === null ? null : surface.semiDiameterMm * factor,
});

function scaledAperture(aperture: Aperture, factor: number): Aperture {
  if (aperture.kind === 'stopDiameter') {
    const diameterMm = everyPosition(aperture.diameterMm, (diameter) => diameter * factor);
    return { ...aperture, diameterMm };
  }
  if (aperture.kind === 'entrancePupilDiameter')
    return { ...aperture, diameterMm: aperture.diameterMm * factor };
  return aperture;
}

const scaledField = (size: FieldSize, factor: number): FieldSize =>
  size.kind === 'angle' ? size : { ...size, heightMm: size.heightMm * factor };
