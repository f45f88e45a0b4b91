import { none, type Outcome, some } from '../outcome.ts';

const SENTENCES = {
  'no parts': 'There is nothing on the axis yet: add a part.',
  afocal: 'The layout has no power: parallel light leaves parallel, so it has no focal length.',
  'not afocal': 'The layout has power: see its focal length instead.',
  'object at infinity': 'The object is at infinity: type an object distance to get this.',
  'image at infinity':
    'The image is at infinity: light leaves parallel. Change a power or a gap to bring it nearer.',
  'pupil at infinity': 'The pupil is at infinity (telecentric), so it has no position or size.',
  'window at infinity': 'The window is at infinity, so it has no position or size.',
  'stop at a focus':
    'Every chief ray is parallel to the axis on the object side, so a field angle sets nothing: give the field as a height, with an object at a finite distance.',
  'stop at an image':
    'The stop stands where the object or the image is formed, so it cannot limit the bundle: move the stop.',
  'no stop': 'Nothing limits the bundle: choose a stop or give a clear diameter.',
  'no stop to size': 'The aperture is a stop diameter, but no part is the stop: choose one.',
  'no sensor': 'No sensor is given: type its size.',
  'only a diagonal': 'Only the diagonal of the sensor is given: type its width and height.',
  'object not at infinity': 'The object is at a finite distance: see the field as a size instead.',
  'no pixel pitch': 'No pixel pitch is given: type it with the sensor.',
  'no blur': 'No blur is given: type a blur or a pixel pitch.',
  'no Abbe number': 'No part has an Abbe number: type one to see colour.',
  'no mount': 'No register distance is given: type the distance from the mount plane to the sensor.',
  'flat field': 'The Petzval sum is zero: the field is flat and has no radius.',
  'no field stop': 'Nothing limits the field: give the sensor a size or a part a clear diameter.',
  'NA beyond the medium': 'The numerical aperture must be smaller than the index in front of the first part.',
  'reaches infinity': 'Everything from the near limit to infinity is sharp.',
  'reaches the first part': 'Everything up to the first part is sharp.',
  'no real object': 'No object in front of the first part is sharp on this image plane.',
  'no bundle': 'The bundle has no width here.',
  'ray lost': 'The exact ray does not get through: the drawing shows where it ends, and why.',
  'no ray through':
    'No exact ray of this bundle reaches the image: the drawing shows where they end, and why.',
  'pupil at the image':
    'The exit pupil stands on the image, so there is no sphere to measure the wavefront against: move the stop.',
  'thin parts':
    'Thin parts have no optical path of their own: thicken them to see the wavefront across the meridian.',
  'no image height':
    'The paraxial chief ray meets this image plane on the axis, so there is no height to compare with.',
  'out of range': 'The numbers grow too large to compute: check for extreme powers and gaps.',
} as const;

/** Why a quantity does not exist: a short phrase that can stand in its place on the screen. */
export type Absence = keyof typeof SENTENCES;

/** One plain sentence that explains the absence and, where something can be done, says what. */
export const sentenceOf = (absence: Absence): string => SENTENCES[absence];

/** A number, or why there is none. */
export type Quantity = Outcome<number, Absence>;

/** The number as an outcome, never −0; 'out of range' when it overflowed. The only way numbers leave this room. */
export const finite = (value: number): Quantity =>
  Number.isFinite(value) ? some(value + 0) : none('out of range');

/** `change` of a quantity, kept finite; an absent one stays absent. */
export const derive = (quantity: Quantity, change: (value: number) => number): Quantity =>
  quantity.ok ? finite(change(quantity.value)) : quantity;

/** `change` of two quantities, kept finite; the first that is absent says why. */
export const derive2 = (a: Quantity, b: Quantity, change: (a: number, b: number) => number): Quantity => {
  if (!a.ok) return a;
  return b.ok ? finite(change(a.value, b.value)) : b;
};
