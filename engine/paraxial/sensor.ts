import { none, some } from '../outcome.ts';
import type { Part, Sensor } from '../sketch/types.ts';
import { roomBeside } from '../train/body.ts';
import type { Train } from '../train/types.ts';
import { derive, derive2, type Quantity } from './absence.ts';
import type { Conjugates } from './conjugates.ts';
import type { FirstOrder } from './firstOrder.ts';
import type { Light } from './light.ts';

/** What the sensor sees and what the housing leaves. Lengths in mm, angles in rad. */
export interface SensorView {
  readonly halfDiagonalMm: Quantity;
  /** What the sensor's width, height and diagonal cover at the object; 'object at infinity'. */
  readonly objectWidthMm: Quantity;
  readonly objectHeightMm: Quantity;
  readonly objectDiagonalMm: Quantity;
  /** The full angles they cover with the object at infinity: 2 arctan(size/(2|f|)). */
  readonly widthAngleRad: Quantity;
  readonly heightAngleRad: Quantity;
  readonly diagonalAngleRad: Quantity;
  /** One pixel at the object, mm. */
  readonly pixelAtObjectMm: Quantity;
  /** First dark ring: 2.44 λ N, N the working f-number. */
  readonly airyDiameterMm: Quantity;
  readonly airyPixels: Quantity;
  /** Contrast that diffraction leaves at one line pair per two pixels, 0 to 1 (incoherent, circular pupil). */
  readonly nyquistContrast: Quantity;
  /** From the last part, its room included, to the mount plane; negative when it reaches behind it. */
  readonly mountClearanceMm: Quantity;
  /** From the object to the front rim of the first part, its room included. */
  readonly workingDistanceMm: Quantity;
}

/** Half the sensor's diagonal in mm. */
export const halfDiagonal = ({ size }: Sensor): number =>
  'diagonalMm' in size ? size.diagonalMm / 2 : Math.hypot(size.widthMm, size.heightMm) / 2;

/** 2.44 λ N in mm: the diameter of the first dark ring (Airy; Born and Wolf, Principles of Optics, 8.5). */
const airyDiameter = (wavelengthNm: number, workingFNumber: number): number =>
  2.44 * wavelengthNm * 1e-6 * workingFNumber;

/**
 * Contrast at `perMm` line pairs per mm of a perfect circular pupil in incoherent light: (2/π)(arccos ν − ν √(1 − ν²)), ν the
 * frequency over 1/(λN); 0 beyond (Hopkins; Born and Wolf, Principles of Optics, 9.5).
 */
export function diffractionContrast(perMm: number, wavelengthNm: number, workingFNumber: number): number {
  const nu = perMm * wavelengthNm * 1e-6 * workingFNumber;
  return nu >= 1 ? 0 : (2 / Math.PI) * (Math.acos(nu) - nu * Math.sqrt((1 - nu) * (1 + nu)));
}

/** The sensor seen from the object, its pixels against diffraction, and the clearances at both ends. */
export function sensorView(
  train: Train,
  setup: {
    readonly sensor: Sensor | null;
    readonly registerMm: number | null;
    readonly parts: readonly Part[];
    readonly wavelengthNm: number;
  },
  first: FirstOrder,
  ends: Conjugates,
  lightOf: Light,
): SensorView {
  const { sensor, registerMm, parts, wavelengthNm } = setup;
  const half: Quantity = sensor ? some(halfDiagonal(sensor)) : none('no sensor');
  const side = (key: 'widthMm' | 'heightMm'): Quantity =>
    sensor && !('diagonalMm' in sensor.size)
      ? some(sensor.size[key])
      : none(sensor ? 'only a diagonal' : 'no sensor');
  const [width, height, diagonal] = [side('widthMm'), side('heightMm'), derive(half, (value) => 2 * value)];
  const atObject = (size: Quantity): Quantity =>
    derive2(size, ends.magnification, (mm, m) => mm / Math.abs(m));
  const angle = (size: Quantity): Quantity =>
    train.objectZ === null
      ? derive2(size, first.focalLengthMm, (mm, focal) => 2 * Math.atan(mm / (2 * Math.abs(focal))))
      : none('object not at infinity');
  const pitch: Quantity = !sensor
    ? none('no sensor')
    : sensor.pixelPitchMm === null
      ? none('no pixel pitch')
      : some(sensor.pixelPitchMm);
  const airy = derive(lightOf.workingFNumber, (fNumber) => airyDiameter(wavelengthNm, fNumber));
  const firstPart = parts[0];
  const lastPart = parts.at(-1);
  const roomFront = firstPart ? roomBeside(firstPart, 'front') : 0;
  const roomBehind = lastPart ? roomBeside(lastPart, 'behind') : 0;
  return {
    halfDiagonalMm: half,
    objectWidthMm: atObject(width),
    objectHeightMm: atObject(height),
    objectDiagonalMm: atObject(diagonal),
    widthAngleRad: angle(width),
    heightAngleRad: angle(height),
    diagonalAngleRad: angle(diagonal),
    pixelAtObjectMm: atObject(pitch),
    airyDiameterMm: airy,
    airyPixels: derive2(airy, pitch, (mm, pixel) => mm / pixel),
    nyquistContrast: derive2(pitch, lightOf.workingFNumber, (pixel, fNumber) =>
      diffractionContrast(1 / (2 * pixel), wavelengthNm, fNumber),
    ),
    mountClearanceMm:
      registerMm === null
        ? none('no mount')
        : derive(ends.imagePlaneMm, (plane) => plane - registerMm - roomBehind),
    workingDistanceMm:
      train.count === 0
        ? none('no parts')
        : derive(ends.objectDistanceMm, (distance) => distance - roomFront),
  };
}
