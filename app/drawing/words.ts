import type { LengthUnit, Sketch } from '../../engine/index.ts';
import { partName } from '../../engine/index.ts';
import { formatLength, formatNumber } from '../ui/format.ts';
import type { Scene, SceneImage } from './scene.ts';

/** At most `digits` decimals, without trailing zeros. */
export const plain = (value: number, digits = 3): string => shortened(formatNumber(value, digits));

/** A length in `unit` with at most `digits` decimals of a millimetre, without trailing zeros, and its unit. */
export const plainLength = (lengthMm: number, unit: LengthUnit, digits = 3): string =>
  `${shortened(formatLength(lengthMm, unit, digits))} ${unit}`;

const shortened = (text: string): string => (text.includes('.') ? text.replace(/\.?0+$/, '') : text);

/** The name of the part at `index`, empty when there is none. */
export function nameAt(sketch: Sketch, index: number): string {
  const part = sketch.parts[index];
  return part ? partName(part, index) : '';
}

/** What an image between the parts is called: by the part that forms it, or as the object of the part it lies behind. */
export function imageName(image: SceneImage, { parts }: Scene): string {
  const part = parts[image.objectOf ?? image.partIndex];
  if (!part) return '';
  const name = partName(part.part, part.index);
  return image.objectOf === null ? `image of ${name}` : `object for ${name}`;
}
