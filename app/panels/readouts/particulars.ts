import { nameAt, plain, plainLength } from '../../drawing/words.ts';
import type { Reading } from '../../live/reading.ts';

/** Front and rear focal length; empty for an afocal layout. */
export function focalLengths({ analysis: { firstOrder }, view: { unit } }: Reading): string {
  const { frontFocalLengthMm: front, rearFocalLengthMm: rear } = firstOrder;
  if (!front.ok || !rear.ok) return '';
  return `Front focal length −n/φ ${plainLength(front.value, unit)}, rear focal length n′/φ ${plainLength(rear.value, unit)}.`;
}

/** What limits the axial bundle when no stop is given; empty otherwise. */
export function limitingRim(reading: Reading): string {
  const { limitedBy, stopSurface } = reading.analysis.pupils;
  return limitedBy === 'rim' && stopSurface.ok
    ? `No stop is given: the rim of ${partAt(reading, stopSurface.value)} limits the axial bundle.`
    : '';
}

/** What limits the field; empty when nothing does. */
export function fieldLimit(reading: Reading): string {
  const { fieldStop } = reading.analysis.windows;
  if (!fieldStop.ok) return '';
  return fieldStop.value.kind === 'sensor'
    ? 'The sensor limits the field.'
    : `The rim of ${partAt(reading, fieldStop.value.surface)} limits the field.`;
}

/** The index assumed of thin parts that give none; empty when all give theirs. */
export function assumedIndex({ sketch }: Reading): string {
  const assumed = sketch.parts.some((part) => part.kind === 'thin' && part.index === null);
  return assumed ? `Thin parts without an index of their own count as ${plain(sketch.assumedIndex, 4)}.` : '';
}

/** The parts that a colour sum leaves out; empty when there are none. */
export function leftOutOfColour({ sketch, analysis: { colour } }: Reading): string {
  const names = colour.partsLeftOut.map((index) => nameAt(sketch, index));
  return names.length === 0 || !colour.axialMm.ok
    ? ''
    : `Without an Abbe number, and so left out: ${names.join(', ')}.`;
}

/** Between which heights in the stop, as shares of its radius, the bundle of the field at `index` passes, and what cuts it. */
export function meridian(reading: Reading, index: number): string {
  const { vignetting } = reading.analysis;
  const field = vignetting.ok ? vignetting.value[index] : undefined;
  if (!field?.meridian) return '';
  const { lower, upper, lowerSurface, upperSurface } = field.meridian;
  const cut = (surface: number | null): string => (surface === null ? 'the stop' : partAt(reading, surface));
  return `In the meridian it passes from ${plain(lower)} (${cut(lowerSurface)}) to ${plain(upper)} (${cut(upperSurface)}) of the stop’s radius.`;
}

const partAt = ({ sketch, analysis }: Reading, surface: number): string =>
  nameAt(sketch, analysis.train.partOf[surface] ?? -1);
