import type { Air, Aperture, FieldSize, Lines, PositionId, Sketch } from '../types.ts';
import { joinValue, splitValue, withValue } from '../values.ts';
import { withField, withFields } from './change.ts';

/*
 * −0 plus 0 is 0: the file could not give −0 back.
 */

/** Sets kind and value of the aperture. */
export const setAperture = (sketch: Sketch, aperture: Aperture): Sketch =>
  withField(sketch, 'aperture', aperture);

/** Sets the stop diameter in mm, at the position or at all when common. An aperture of another kind becomes a stop diameter. */
export function setStopDiameter(sketch: Sketch, diameterMm: number, positionId: PositionId): Sketch {
  const { aperture } = sketch;
  const before = aperture.kind === 'stopDiameter' ? aperture.diameterMm : diameterMm;
  return setAperture(sketch, { kind: 'stopDiameter', diameterMm: withValue(before, positionId, diameterMm) });
}

/** Gives each position its own stop diameter, at first the same; an aperture of another kind stays as it is. */
export const splitStopDiameter = (sketch: Sketch): Sketch =>
  sketch.aperture.kind === 'stopDiameter'
    ? setAperture(sketch, {
        kind: 'stopDiameter',
        diameterMm: splitValue(sketch.aperture.diameterMm, sketch.positions),
      })
    : sketch;

/** Makes the stop diameter of one position that of all. */
export const joinStopDiameter = (sketch: Sketch, positionId: PositionId): Sketch =>
  sketch.aperture.kind === 'stopDiameter'
    ? setAperture(sketch, {
        kind: 'stopDiameter',
        diameterMm: joinValue(sketch.aperture.diameterMm, positionId),
      })
    : sketch;

/** Sets kind and size of the largest field, a magnitude. */
export function setField(sketch: Sketch, size: FieldSize): Sketch {
  const plain: FieldSize =
    size.kind === 'angle'
      ? { ...size, angleDeg: size.angleDeg + 0 }
      : { ...size, heightMm: size.heightMm + 0 };
  return withField(sketch, 'field', withField(sketch.field, 'size', plain));
}

/** Sets the fields drawn, as shares of the largest, each from −1 to 1. */
export function setFractions(sketch: Sketch, fractions: readonly number[]): Sketch {
  const plain = fractions.map((fraction) => fraction + 0);
  return withField(sketch, 'field', withField(sketch.field, 'fractions', plain));
}

/** Sets the share of the pupil's height, 0 to 1, that may be lost at the largest field. */
export const setVignetting = (sketch: Sketch, vignetting: number): Sketch =>
  withField(sketch, 'field', withField(sketch.field, 'vignetting', vignetting));

/** Changes wavelengths in nm, weights, or the further lines. */
export const setLines = (sketch: Sketch, change: Partial<Lines>): Sketch =>
  withField(sketch, 'lines', withFields(sketch.lines, change));

/** Takes air as index 1, or by the formula for standard air. */
export const setAir = (sketch: Sketch, air: Air): Sketch => withField(sketch, 'air', air);

/** Sets the index assumed for thin parts that do not name one. */
export const setAssumedIndex = (sketch: Sketch, assumedIndex: number): Sketch =>
  withField(sketch, 'assumedIndex', assumedIndex);

/** Sets the blur diameter in mm for the depths of focus and field; null takes one pixel. */
export const setBlur = (sketch: Sketch, blurMm: number | null): Sketch => withField(sketch, 'blurMm', blurMm);
